/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.internal.algebra;

import java.util.Arrays;

/** Products and solutions of square matrices kept row by row in one array, without allocation. */
public final class Flat {

  private Flat() {}

  /** Writes the product of a and b (both n by n) into c, which is neither of them. */
  public static void product(double[] a, double[] b, double[] c, int n) {
    if (n == 4) {
      productOfFour(a, b, c);
    } else {
      product(a, b, c, n, n);
    }
  }

  /** Writes the product of a (n by n) and b (n by m) into c, which is neither of them. */
  public static void product(double[] a, double[] b, double[] c, int n, int m) {
    Arrays.fill(c, 0, n * m, 0);
    for (int i = 0; i < n; i++) {
      int row = i * n;
      int out = i * m;
      int k = 0;
      for (; k + 3 < n; k += 4) {
        double f0 = a[row + k];
        double f1 = a[row + k + 1];
        double f2 = a[row + k + 2];
        double f3 = a[row + k + 3];
        if (f0 != 0 || f1 != 0 || f2 != 0 || f3 != 0) {
          int b0 = k * m;
          int b1 = b0 + m;
          int b2 = b1 + m;
          int b3 = b2 + m;
          for (int j = 0; j < m; j++) {
            c[out + j] += f0 * b[b0 + j] + f1 * b[b1 + j] + f2 * b[b2 + j] + f3 * b[b3 + j];
          }
        }
      }
      for (; k < n; k++) {
        double f = a[row + k];
        if (f != 0) {
          int from = k * m;
          for (int j = 0; j < m; j++) {
            c[out + j] += f * b[from + j];
          }
        }
      }
    }
  }

  private static void productOfFour(double[] a, double[] b, double[] c) {
    double b00 = b[0];
    double b01 = b[1];
    double b02 = b[2];
    double b03 = b[3];
    double b10 = b[4];
    double b11 = b[5];
    double b12 = b[6];
    double b13 = b[7];
    double b20 = b[8];
    double b21 = b[9];
    double b22 = b[10];
    double b23 = b[11];
    double b30 = b[12];
    double b31 = b[13];
    double b32 = b[14];
    double b33 = b[15];
    for (int i = 0; i < 16; i += 4) {
      double f0 = a[i];
      double f1 = a[i + 1];
      double f2 = a[i + 2];
      double f3 = a[i + 3];
      c[i] = f0 * b00 + f1 * b10 + f2 * b20 + f3 * b30;
      c[i + 1] = f0 * b01 + f1 * b11 + f2 * b21 + f3 * b31;
      c[i + 2] = f0 * b02 + f1 * b12 + f2 * b22 + f3 * b32;
      c[i + 3] = f0 * b03 + f1 * b13 + f2 * b23 + f3 * b33;
    }
  }

  /** Returns the largest column sum of absolute values; NaN when an entry is NaN. */
  public static double oneNorm(double[] a, int n) {
    double norm = 0;
    for (int j = 0; j < n; j++) {
      double sum = 0;
      for (int i = j; i < n * n; i += n) {
        sum += Math.abs(a[i]);
      }
      norm = Math.max(norm, sum);
    }
    return norm;
  }

  /**
   * Solves {@code a x = b} by Gaussian elimination with partial pivoting; a singular matrix gives
   * values that are not finite.
   *
   * @param a n by n; overwritten
   * @param b right sides, n by m; receives the solutions
   */
  public static void solve(double[] a, double[] b, int n, int m) {
    for (int k = 0; k < n; k++) {
      int pivot = k;
      for (int i = k + 1; i < n; i++) {
        if (Math.abs(a[i * n + k]) > Math.abs(a[pivot * n + k])) {
          pivot = i;
        }
      }
      if (pivot != k) {
        swap(a, k * n, pivot * n, k, n);
        swap(b, k * m, pivot * m, 0, m);
      }
      int top = k * n;
      double inverse = 1 / a[top + k];
      for (int i = k + 1; i < n; i++) {
        double factor = a[i * n + k] * inverse;
        if (factor != 0) {
          int row = i * n;
          for (int j = k + 1; j < n; j++) {
            a[row + j] -= factor * a[top + j];
          }
          subtract(b, i * m, factor, k * m, m);
        }
      }
    }
    for (int k = n - 1; k >= 0; k--) {
      for (int j = k + 1; j < n; j++) {
        subtract(b, k * m, a[k * n + j], j * m, m);
      }
      double inverse = 1 / a[k * n + k];
      for (int j = 0; j < m; j++) {
        b[k * m + j] *= inverse;
      }
    }
  }

  private static void subtract(double[] b, int target, double factor, int source, int m) {
    for (int j = 0; j < m; j++) {
      b[target + j] -= factor * b[source + j];
    }
  }

  private static void swap(double[] a, int one, int other, int from, int to) {
    for (int j = from; j < to; j++) {
      double kept = a[one + j];
      a[one + j] = a[other + j];
      a[other + j] = kept;
    }
  }
}
