/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.internal.algebra;

import org.spanloom.numerics.internal.work.Watch;

/**
 * Factors {@code P M = L U} of a square matrix by Gaussian elimination with partial pivoting, in
 * panels (Golub &amp; Van Loan, Matrix Computations, 4th ed. 2013, section 3.4; from memory).
 *
 * <p>Solves for many right sides side by side; asks the watch while it works.
 */
public final class LuFactors {

  private static final int PANEL = 16;

  private final double[][] rows;
  private final int[] order;
  private final int sign;
  private final boolean singular;

  private LuFactors(double[][] rows, int[] order, int sign, boolean singular) {
    this.rows = rows;
    this.order = order;
    this.sign = sign;
    this.singular = singular;
  }

  /**
   * Factors a matrix.
   *
   * @param m the rows, n by n; taken over and overwritten
   * @param watch asked while working
   */
  public static LuFactors of(double[][] m, Watch watch) {
    int n = m.length;
    int[] order = new int[n];
    for (int i = 0; i < n; i++) {
      order[i] = i;
    }
    int sign = 1;
    boolean singular = false;
    for (int k0 = 0; k0 < n; k0 += PANEL) {
      int k1 = Math.min(n, k0 + PANEL);
      for (int k = k0; k < k1; k++) {
        int pivot = pivotRow(m, k);
        if (pivot != k) {
          double[] row = m[pivot];
          m[pivot] = m[k];
          m[k] = row;
          int number = order[pivot];
          order[pivot] = order[k];
          order[k] = number;
          sign = -sign;
        }
        if (!(Math.abs(m[k][k]) > 0)) {
          singular = true;
          continue;
        }
        eliminate(m, k, k1);
      }
      updateTrailing(m, k0, k1, watch);
      watch.spend(2.0 * (k1 - k0) * (k1 - k0) * (n - k0));
    }
    return new LuFactors(m, order, sign, singular);
  }

  private static int pivotRow(double[][] m, int k) {
    int pivot = k;
    double largest = Math.abs(m[k][k]);
    for (int i = k + 1; i < m.length; i++) {
      double size = Math.abs(m[i][k]);
      if (size > largest) {
        largest = size;
        pivot = i;
      }
    }
    return pivot;
  }

  private static void eliminate(double[][] m, int k, int panelEnd) {
    double[] top = m[k];
    double pivot = top[k];
    for (int i = k + 1; i < m.length; i++) {
      double[] row = m[i];
      if (row[k] != 0) {
        double factor = row[k] / pivot;
        row[k] = factor;
        Rows.addScaled(row, -factor, top, k + 1, panelEnd);
      }
    }
  }

  private static void updateTrailing(double[][] m, int k0, int k1, Watch watch) {
    int n = m.length;
    for (int i = k0 + 1; i < n; i++) {
      double[] row = m[i];
      int end = Math.min(i, k1);
      int k = k0;
      for (; k + 3 < end; k += 4) {
        subtractFour(
            row,
            row[k],
            m[k],
            row[k + 1],
            m[k + 1],
            row[k + 2],
            m[k + 2],
            row[k + 3],
            m[k + 3],
            k1,
            n);
      }
      for (; k < end; k++) {
        Rows.addScaled(row, -row[k], m[k], k1, n);
      }
      watch.spend(2.0 * (end - k0) * (n - k1));
    }
  }

  private static void subtractFour(
      double[] c,
      double f0,
      double[] b0,
      double f1,
      double[] b1,
      double f2,
      double[] b2,
      double f3,
      double[] b3,
      int from,
      int to) {
    if (f0 == 0 && f1 == 0 && f2 == 0 && f3 == 0) {
      return;
    }
    for (int j = from; j < to; j++) {
      c[j] -= f0 * b0[j] + f1 * b1[j] + f2 * b2[j] + f3 * b3[j];
    }
  }

  /** Tells whether a pivot was zero or not a number. */
  public boolean isSingular() {
    return singular;
  }

  /** Returns the smallest pivot over the largest, without their signs; 1 for an order of 0. */
  public double pivotRatio() {
    double least = Double.POSITIVE_INFINITY;
    double most = 0;
    for (int k = 0; k < rows.length; k++) {
      least = Math.min(least, Math.abs(rows[k][k]));
      most = Math.max(most, Math.abs(rows[k][k]));
    }
    return rows.length == 0 ? 1 : least / most;
  }

  /** Returns ln |det|; negative infinity when singular. */
  public double logDeterminant() {
    double sum = 0;
    for (int i = 0; i < rows.length; i++) {
      sum += Math.log(Math.abs(rows[i][i]));
    }
    return sum;
  }

  /** Returns the sign of the determinant: -1, 0 or 1. */
  public int determinantSign() {
    int result = singular ? 0 : sign;
    for (int i = 0; i < rows.length; i++) {
      if (rows[i][i] < 0) {
        result = -result;
      }
    }
    return result;
  }

  /**
   * Returns the solution for right sides side by side.
   *
   * @param right the right sides, n by m; left as they are
   * @param m how many
   */
  public double[][] solve(double[][] right, int m, Watch watch) {
    int n = rows.length;
    double[][] x = new double[n][];
    for (int i = 0; i < n; i++) {
      x[i] = right[order[i]].clone();
    }
    if (m == 1) {
      return solveOne(x);
    }
    for (int i = 1; i < n; i++) {
      reduce(x, i, 0, i, m);
      watch.spend(2.0 * i * m);
    }
    for (int i = n - 1; i >= 0; i--) {
      reduce(x, i, i + 1, n, m);
      double pivot = rows[i][i];
      double[] xi = x[i];
      for (int j = 0; j < m; j++) {
        xi[j] /= pivot;
      }
      watch.spend(2.0 * (n - i) * m);
    }
    return x;
  }

  private void reduce(double[][] x, int i, int from, int to, int m) {
    double[] f = rows[i];
    int k = from;
    for (; k + 3 < to; k += 4) {
      subtractFour(
          x[i], f[k], x[k], f[k + 1], x[k + 1], f[k + 2], x[k + 2], f[k + 3], x[k + 3], 0, m);
    }
    for (; k < to; k++) {
      Rows.addScaled(x[i], -f[k], x[k], 0, m);
    }
  }

  private double[][] solveOne(double[][] x) {
    int n = rows.length;
    double[] y = new double[n];
    for (int i = 0; i < n; i++) {
      y[i] = x[i][0] - dot(rows[i], y, 0, i);
    }
    for (int i = n - 1; i >= 0; i--) {
      y[i] = (y[i] - dot(rows[i], y, i + 1, n)) / rows[i][i];
    }
    for (int i = 0; i < n; i++) {
      x[i][0] = y[i];
    }
    return x;
  }

  private static double dot(double[] a, double[] b, int from, int to) {
    double s0 = 0;
    double s1 = 0;
    double s2 = 0;
    double s3 = 0;
    int k = from;
    for (; k + 3 < to; k += 4) {
      s0 += a[k] * b[k];
      s1 += a[k + 1] * b[k + 1];
      s2 += a[k + 2] * b[k + 2];
      s3 += a[k + 3] * b[k + 3];
    }
    for (; k < to; k++) {
      s0 += a[k] * b[k];
    }
    return (s0 + s1) + (s2 + s3);
  }
}
