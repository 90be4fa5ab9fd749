/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.structure;

import java.util.Arrays;
import org.spanloom.numerics.SparsityPattern;

/**
 * An order of the states in which the matrix is block upper triangular: no state depends on one
 * that stands before its own block.
 *
 * <p>The blocks are the strong components of the graph with an arc from i to j where {@code a_ij}
 * may differ from zero (Tarjan 1972, SIAM J. Comput. 1, 146; the use for block triangular form:
 * Duff &amp; Reid 1978, ACM TOMS 4, 137; from memory). A model without feedback, such as a decay
 * chain, has blocks of one state only: its matrix is triangular in this order.
 *
 * @param order states in the new order; {@code order[k]} is the old number of the k-th
 * @param blockStart first position of each block, and n at the end
 */
public record TriangularOrder(int[] order, int[] blockStart) {

  /** Copies its arrays. */
  public TriangularOrder {
    order = order.clone();
    blockStart = blockStart.clone();
  }

  @Override
  public int[] order() {
    return order.clone();
  }

  @Override
  public int[] blockStart() {
    return blockStart.clone();
  }

  /** Returns the number of blocks. */
  public int blocks() {
    return blockStart.length - 1;
  }

  /** Tells whether every block holds one state, so that the matrix is triangular in this order. */
  public boolean isTriangular() {
    return blocks() == order.length;
  }

  /** Returns for each position whether its block holds this state alone. */
  public boolean[] alone() {
    boolean[] alone = new boolean[order.length];
    for (int b = 0; b < blocks(); b++) {
      alone[blockStart[b]] = blockStart[b + 1] - blockStart[b] == 1;
    }
    return alone;
  }

  /** Finds the order for a pattern. */
  public static TriangularOrder of(SparsityPattern pattern) {
    return new Search(pattern.rowStart(), pattern.columns()).run();
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof TriangularOrder that
        && Arrays.equals(order, that.order)
        && Arrays.equals(blockStart, that.blockStart);
  }

  @Override
  public int hashCode() {
    return 31 * Arrays.hashCode(order) + Arrays.hashCode(blockStart);
  }

  @Override
  public String toString() {
    return "TriangularOrder[n=" + order.length + ", blocks=" + blocks() + "]";
  }

  /** Tarjan's search with its own stack, so that long chains do not overflow the thread's. */
  private static final class Search {
    private final int[] rowStart;
    private final int[] columns;
    private final int n;
    private final int[] number;
    private final int[] low;
    private final int[] next;
    private final int[] path;
    private final int[] open;
    private final boolean[] isOpen;
    private final int[] emitted;
    private final int[] sizes;
    private int pathLength;
    private int openCount;
    private int emittedCount;
    private int blockCount;
    private int counter;

    Search(int[] rowStart, int[] columns) {
      this.rowStart = rowStart;
      this.columns = columns;
      n = rowStart.length - 1;
      number = new int[n];
      low = new int[n];
      next = new int[n];
      path = new int[n];
      open = new int[n];
      isOpen = new boolean[n];
      emitted = new int[n];
      sizes = new int[n];
    }

    TriangularOrder run() {
      for (int root = 0; root < n; root++) {
        if (number[root] == 0) {
          enter(root);
          while (pathLength > 0) {
            step(path[pathLength - 1]);
          }
        }
      }
      // Components come out with those that depend on nothing first; the matrix is upper triangular
      // the other way round.
      int[] order = new int[n];
      int[] start = new int[blockCount + 1];
      int end = n;
      int position = 0;
      for (int b = 0; b < blockCount; b++) {
        int size = sizes[blockCount - 1 - b];
        start[b] = position;
        int[] block = Arrays.copyOfRange(emitted, end - size, end);
        Arrays.sort(block);
        System.arraycopy(block, 0, order, position, size);
        end -= size;
        position += size;
      }
      start[blockCount] = n;
      return new TriangularOrder(order, start);
    }

    private void enter(int v) {
      number[v] = ++counter;
      low[v] = counter;
      next[v] = rowStart[v];
      path[pathLength++] = v;
      open[openCount++] = v;
      isOpen[v] = true;
    }

    private void step(int v) {
      if (next[v] < rowStart[v + 1]) {
        int w = columns[next[v]++];
        if (number[w] == 0) {
          enter(w);
        } else if (isOpen[w]) {
          low[v] = Math.min(low[v], number[w]);
        }
        return;
      }
      pathLength--;
      if (pathLength > 0) {
        int parent = path[pathLength - 1];
        low[parent] = Math.min(low[parent], low[v]);
      }
      if (low[v] == number[v]) {
        int size = 0;
        int w;
        do {
          w = open[--openCount];
          isOpen[w] = false;
          emitted[emittedCount++] = w;
          size++;
        } while (w != v);
        sizes[blockCount++] = size;
      }
    }
  }
}
