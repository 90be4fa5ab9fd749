/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.internal.algebra;

import java.util.Arrays;
import org.spanloom.numerics.internal.work.Watch;

/** Products, norms and conversions of matrices kept as rows. */
public final class Rows {

  private Rows() {}

  /** Returns the rows of a matrix given row by row in one array. */
  public static double[][] of(double[] flat, int n, int m) {
    double[][] rows = new double[n][m];
    for (int i = 0; i < n; i++) {
      System.arraycopy(flat, i * m, rows[i], 0, m);
    }
    return rows;
  }

  /** Returns the matrix row by row in one array. */
  public static double[] flat(double[][] rows, int m) {
    double[] flat = new double[rows.length * m];
    for (int i = 0; i < rows.length; i++) {
      System.arraycopy(rows[i], 0, flat, i * m, m);
    }
    return flat;
  }

  /** Returns a copy. */
  public static double[][] copy(double[][] rows) {
    double[][] result = new double[rows.length][];
    for (int i = 0; i < rows.length; i++) {
      result[i] = rows[i].clone();
    }
    return result;
  }

  /** Returns the identity of order n. */
  public static double[][] identity(int n) {
    double[][] rows = new double[n][n];
    for (int i = 0; i < n; i++) {
      rows[i][i] = 1;
    }
    return rows;
  }

  /** Returns the product of a (n by k) and b (k by m). */
  public static double[][] product(double[][] a, double[][] b, int m, Watch watch) {
    double[][] c = new double[a.length][m];
    for (int i = 0; i < a.length; i++) {
      rowTimes(a[i], b, c[i], m);
      watch.spend(2.0 * b.length * m);
    }
    return c;
  }

  /** Writes the product of a row of length k and b (k by m) into c. */
  private static void rowTimes(double[] row, double[][] b, double[] c, int m) {
    int k = b.length;
    Arrays.fill(c, 0, m, 0);
    int p = 0;
    for (; p + 3 < k; p += 4) {
      addFour(c, row[p], b[p], row[p + 1], b[p + 1], row[p + 2], b[p + 2], row[p + 3], b[p + 3], m);
    }
    for (; p < k; p++) {
      addScaled(c, row[p], b[p], 0, m);
    }
  }

  private static void addFour(
      double[] c,
      double f0,
      double[] b0,
      double f1,
      double[] b1,
      double f2,
      double[] b2,
      double f3,
      double[] b3,
      int m) {
    if (f0 == 0 && f1 == 0 && f2 == 0 && f3 == 0) {
      return;
    }
    for (int j = 0; j < m; j++) {
      c[j] += f0 * b0[j] + f1 * b1[j] + f2 * b2[j] + f3 * b3[j];
    }
  }

  /** Adds {@code factor * source} to {@code target} on the columns from..to-1. */
  public static void addScaled(double[] target, double factor, double[] source, int from, int to) {
    if (factor == 0) {
      return;
    }
    for (int j = from; j < to; j++) {
      target[j] += factor * source[j];
    }
  }

  /** Returns the matrix times a number. */
  public static double[][] scaled(double[][] a, double factor) {
    double[][] result = copy(a);
    for (double[] row : result) {
      for (int j = 0; j < row.length; j++) {
        row[j] *= factor;
      }
    }
    return result;
  }

  /** Returns the largest column sum of absolute values; NaN when an entry is NaN. */
  public static double oneNorm(double[][] a) {
    if (a.length == 0) {
      return 0;
    }
    double[] sums = new double[a[0].length];
    for (double[] row : a) {
      for (int j = 0; j < row.length; j++) {
        sums[j] += Math.abs(row[j]);
      }
    }
    double norm = 0;
    for (double sum : sums) {
      norm = Math.max(norm, sum);
    }
    return norm;
  }

  /** Tells whether every entry is a finite number. */
  public static boolean areFinite(double[][] a) {
    for (double[] row : a) {
      if (!isFinite(row)) {
        return false;
      }
    }
    return true;
  }

  /** Tells whether every entry is a finite number. */
  public static boolean isFinite(double[] a) {
    double sum = 0;
    for (double x : a) {
      sum += x * 0;
    }
    return sum == 0;
  }

  /** Tells whether every entry is zero. */
  public static boolean isZero(double[] a) {
    for (double x : a) {
      if (x != 0) {
        return false;
      }
    }
    return true;
  }
}
