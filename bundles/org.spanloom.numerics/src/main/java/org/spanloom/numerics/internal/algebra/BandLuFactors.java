/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.internal.algebra;

import org.spanloom.numerics.internal.work.Watch;

/**
 * Factors of a band matrix by Gaussian elimination with partial pivoting; the upper band grows by
 * the lower one (Golub &amp; Van Loan 2013, section 4.3; from memory).
 *
 * <p>Row i is kept from column {@code i - lower} on, {@code 2 lower + upper + 1} entries long.
 */
public final class BandLuFactors {

  private final double[][] rows;
  private final int[] pivots;
  private final int lower;
  private final int upper;
  private final double[][] factors;

  private BandLuFactors(double[][] rows, int[] pivots, int lower, int upper, double[][] factors) {
    this.rows = rows;
    this.pivots = pivots;
    this.lower = lower;
    this.upper = upper;
    this.factors = factors;
  }

  /**
   * Factors a band matrix. A singular one gives solutions that are not finite.
   *
   * @param band entry (i, j) at {@code band[i][j - i + lower]}, each row {@code lower + upper + 1}
   *     long or longer; left as it is
   * @param lower number of diagonals below the main one
   * @param upper number of diagonals above it
   */
  public static BandLuFactors of(double[][] band, int lower, int upper, Watch watch) {
    int n = band.length;
    int width = lower + upper + 1;
    // Row i shifted left as far as it is reduced: column k of the active part stands at index 0.
    double[][] rows = new double[n][];
    for (int i = 0; i < n; i++) {
      rows[i] = new double[width + lower];
      int first = Math.max(0, lower - i);
      System.arraycopy(band[i], first, rows[i], 0, width - first);
    }
    int[] pivots = new int[n];
    double[][] factors = new double[n][];
    for (int k = 0; k < n; k++) {
      int last = Math.min(n - 1, k + lower);
      int pivot = k;
      for (int i = k + 1; i <= last; i++) {
        if (Math.abs(rows[i][0]) > Math.abs(rows[pivot][0])) {
          pivot = i;
        }
      }
      double[] row = rows[pivot];
      rows[pivot] = rows[k];
      rows[k] = row;
      pivots[k] = pivot;
      factors[k] = new double[last - k];
      int length = lower + upper + 1;
      for (int i = k + 1; i <= last; i++) {
        double factor = rows[i][0] / row[0];
        factors[k][i - k - 1] = factor;
        shiftAndSubtract(rows[i], row, factor, length);
      }
      watch.spend(2.0 * (last - k) * length);
    }
    return new BandLuFactors(rows, pivots, lower, upper, factors);
  }

  private static void shiftAndSubtract(double[] target, double[] source, double factor, int to) {
    for (int j = 1; j < to; j++) {
      target[j - 1] = target[j] - factor * source[j];
    }
    target[to - 1] = 0;
  }

  /**
   * Solves for right sides side by side.
   *
   * @param right the right sides, n by m; receives the solutions
   */
  public void solve(double[][] right, int m, Watch watch) {
    int n = rows.length;
    for (int k = 0; k < n; k++) {
      double[] row = right[pivots[k]];
      right[pivots[k]] = right[k];
      right[k] = row;
      for (int i = 0; i < factors[k].length; i++) {
        Rows.addScaled(right[k + 1 + i], -factors[k][i], row, 0, m);
      }
    }
    for (int k = n - 1; k >= 0; k--) {
      double[] x = right[k];
      double[] u = rows[k];
      int last = Math.min(n - 1 - k, lower + upper);
      for (int j = 1; j <= last; j++) {
        Rows.addScaled(x, -u[j], right[k + j], 0, m);
      }
      for (int j = 0; j < m; j++) {
        x[j] /= u[0];
      }
    }
    watch.spend(2.0 * n * m * (2.0 * lower + upper));
  }
}
