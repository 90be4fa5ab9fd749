/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics;

import java.util.Arrays;

/**
 * Which entries of an n by n matrix may differ from zero, in compressed row form.
 *
 * @param rowStart length n+1; the columns of row i stand at {@code rowStart[i]..rowStart[i+1]-1}
 * @param columns column numbers, increasing within a row
 */
public record SparsityPattern(int[] rowStart, int[] columns) {

  /** Copies its arrays. */
  public SparsityPattern {
    rowStart = rowStart.clone();
    columns = columns.clone();
  }

  @Override
  public int[] rowStart() {
    return rowStart.clone();
  }

  @Override
  public int[] columns() {
    return columns.clone();
  }

  /** Returns n. */
  public int dimension() {
    return rowStart.length - 1;
  }

  /** Returns the number of entries that may differ from zero. */
  public int count() {
    return columns.length;
  }

  /** Tells whether entry (row, column) may differ from zero. */
  public boolean contains(int row, int column) {
    return Arrays.binarySearch(columns, rowStart[row], rowStart[row + 1], column) >= 0;
  }

  /**
   * Writes a matrix with this pattern in full.
   *
   * @param values its entries in the order of the pattern
   * @param full receives n*n values row by row
   */
  public void scatter(double[] values, double[] full) {
    int n = dimension();
    Arrays.fill(full, 0, n * n, 0);
    for (int i = 0; i < n; i++) {
      for (int k = rowStart[i]; k < rowStart[i + 1]; k++) {
        full[i * n + columns[k]] = values[k];
      }
    }
  }

  /** Returns the pattern of a full matrix. */
  public static SparsityPattern dense(int n) {
    int[] start = new int[n + 1];
    int[] columns = new int[n * n];
    for (int i = 0; i < n; i++) {
      start[i + 1] = (i + 1) * n;
      for (int j = 0; j < n; j++) {
        columns[i * n + j] = j;
      }
    }
    return new SparsityPattern(start, columns);
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof SparsityPattern that
        && Arrays.equals(rowStart, that.rowStart)
        && Arrays.equals(columns, that.columns);
  }

  @Override
  public int hashCode() {
    return 31 * Arrays.hashCode(rowStart) + Arrays.hashCode(columns);
  }

  @Override
  public String toString() {
    return "SparsityPattern[n=" + dimension() + ", count=" + count() + "]";
  }
}
