/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.structure;

import java.util.Arrays;
import java.util.Comparator;
import java.util.stream.IntStream;
import org.spanloom.numerics.SparsityPattern;

/**
 * An order of the states in which the entries of the matrix stay near the diagonal (reverse
 * Cuthill-McKee; Cuthill &amp; McKee 1969, George &amp; Liu 1981; from memory).
 *
 * @param order states in the new order; {@code order[k]} is the old number of the k-th
 * @param bandwidth largest distance of an entry from the diagonal in this order
 */
public record BandOrder(int[] order, int bandwidth) {

  /** Copies its array. */
  public BandOrder {
    order = order.clone();
  }

  @Override
  public int[] order() {
    return order.clone();
  }

  /** Finds the order for a pattern, or keeps the given one where that is as good. */
  public static BandOrder of(SparsityPattern pattern) {
    int n = pattern.dimension();
    int[][] neighbours = neighbours(pattern);
    int[] natural = IntStream.range(0, n).toArray();
    int[] found = cuthillMcKee(neighbours);
    int before = bandwidth(neighbours, natural);
    int after = bandwidth(neighbours, found);
    return after < before ? new BandOrder(found, after) : new BandOrder(natural, before);
  }

  private static int[][] neighbours(SparsityPattern pattern) {
    int n = pattern.dimension();
    int[] rowStart = pattern.rowStart();
    int[] columns = pattern.columns();
    int[] count = new int[n];
    for (int i = 0; i < n; i++) {
      for (int p = rowStart[i]; p < rowStart[i + 1]; p++) {
        count[i]++;
        count[columns[p]]++;
      }
    }
    int[][] result = new int[n][];
    for (int i = 0; i < n; i++) {
      result[i] = new int[count[i]];
    }
    int[] filled = new int[n];
    for (int i = 0; i < n; i++) {
      for (int p = rowStart[i]; p < rowStart[i + 1]; p++) {
        int j = columns[p];
        result[i][filled[i]++] = j;
        result[j][filled[j]++] = i;
      }
    }
    for (int i = 0; i < n; i++) {
      result[i] = Arrays.stream(result[i]).sorted().distinct().toArray();
    }
    return result;
  }

  private static int[] cuthillMcKee(int[][] neighbours) {
    int n = neighbours.length;
    boolean[] seen = new boolean[n];
    int[] order = new int[n];
    int count = 0;
    int[] byDegree =
        IntStream.range(0, n)
            .boxed()
            .sorted(Comparator.comparingInt(i -> neighbours[i].length))
            .mapToInt(Integer::intValue)
            .toArray();
    for (int seed : byDegree) {
      if (seen[seed]) {
        continue;
      }
      int start = farthest(neighbours, farthest(neighbours, seed));
      int head = count;
      order[count++] = start;
      seen[start] = true;
      while (head < count) {
        int[] next =
            Arrays.stream(neighbours[order[head++]])
                .filter(j -> !seen[j])
                .boxed()
                .sorted(Comparator.comparingInt(j -> neighbours[j].length))
                .mapToInt(Integer::intValue)
                .toArray();
        for (int j : next) {
          seen[j] = true;
          order[count++] = j;
        }
      }
    }
    for (int i = 0; i < n / 2; i++) {
      int other = order[n - 1 - i];
      order[n - 1 - i] = order[i];
      order[i] = other;
    }
    return order;
  }

  /** Returns the last state that a search from a given one reaches. */
  private static int farthest(int[][] neighbours, int from) {
    boolean[] seen = new boolean[neighbours.length];
    int[] queue = new int[neighbours.length];
    int count = 0;
    queue[count++] = from;
    seen[from] = true;
    for (int head = 0; head < count; head++) {
      for (int j : neighbours[queue[head]]) {
        if (!seen[j]) {
          seen[j] = true;
          queue[count++] = j;
        }
      }
    }
    return queue[count - 1];
  }

  private static int bandwidth(int[][] neighbours, int[] order) {
    int[] place = new int[order.length];
    for (int k = 0; k < order.length; k++) {
      place[order[k]] = k;
    }
    int bandwidth = 0;
    for (int i = 0; i < neighbours.length; i++) {
      for (int j : neighbours[i]) {
        bandwidth = Math.max(bandwidth, Math.abs(place[i] - place[j]));
      }
    }
    return bandwidth;
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof BandOrder that
        && bandwidth == that.bandwidth
        && Arrays.equals(order, that.order);
  }

  @Override
  public int hashCode() {
    return 31 * bandwidth + Arrays.hashCode(order);
  }

  @Override
  public String toString() {
    return "BandOrder[n=" + order.length + ", bandwidth=" + bandwidth + "]";
  }
}
