/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.internal.algebra;

import org.spanloom.numerics.internal.work.Watch;

/**
 * Factors {@code P M = L U} of a complex matrix, real and imaginary parts as rows of their own,
 * with partial pivoting.
 */
public final class ComplexLuFactors {

  private final double[][] re;
  private final double[][] im;
  private final int[] order;

  private ComplexLuFactors(double[][] re, double[][] im, int[] order) {
    this.re = re;
    this.im = im;
    this.order = order;
  }

  /**
   * Factors a matrix. A singular one gives solutions that are not finite.
   *
   * @param re real parts, n by n; taken over and overwritten
   * @param im imaginary parts, n by n; taken over and overwritten
   * @param watch asked while working
   */
  public static ComplexLuFactors of(double[][] re, double[][] im, Watch watch) {
    int n = re.length;
    int[] order = new int[n];
    for (int i = 0; i < n; i++) {
      order[i] = i;
    }
    for (int k = 0; k < n; k++) {
      int pivot = k;
      for (int i = k + 1; i < n; i++) {
        if (size(re, im, i, k) > size(re, im, pivot, k)) {
          pivot = i;
        }
      }
      swap(re, k, pivot);
      swap(im, k, pivot);
      int number = order[pivot];
      order[pivot] = order[k];
      order[k] = number;
      double pr = re[k][k];
      double pi = im[k][k];
      double modulus = pr * pr + pi * pi;
      for (int i = k + 1; i < n; i++) {
        double ar = re[i][k];
        double ai = im[i][k];
        if (ar == 0 && ai == 0) {
          continue;
        }
        double fr = (ar * pr + ai * pi) / modulus;
        double fi = (ai * pr - ar * pi) / modulus;
        re[i][k] = fr;
        im[i][k] = fi;
        subtract(re[i], im[i], fr, fi, re[k], im[k], k + 1, n);
      }
      watch.spend(8.0 * (n - k) * (n - k));
    }
    return new ComplexLuFactors(re, im, order);
  }

  private static double size(double[][] re, double[][] im, int i, int k) {
    return Math.abs(re[i][k]) + Math.abs(im[i][k]);
  }

  private static void swap(double[][] rows, int a, int b) {
    double[] row = rows[a];
    rows[a] = rows[b];
    rows[b] = row;
  }

  private static void subtract(
      double[] tr, double[] ti, double fr, double fi, double[] sr, double[] si, int from, int to) {
    for (int j = from; j < to; j++) {
      tr[j] -= fr * sr[j] - fi * si[j];
      ti[j] -= fr * si[j] + fi * sr[j];
    }
  }

  /**
   * Solves for right sides side by side.
   *
   * @param right real parts of the right sides, n by m; receives those of the solutions
   * @param rightIm imaginary parts; receives those of the solutions
   */
  public void solve(double[][] right, double[][] rightIm, int m, Watch watch) {
    int n = re.length;
    double[][] xr = new double[n][];
    double[][] xi = new double[n][];
    for (int i = 0; i < n; i++) {
      xr[i] = right[order[i]];
      xi[i] = rightIm[order[i]];
    }
    for (int i = 1; i < n; i++) {
      reduce(xr, xi, i, 0, i, m);
      watch.spend(8.0 * i * m);
    }
    for (int i = n - 1; i >= 0; i--) {
      reduce(xr, xi, i, i + 1, n, m);
      double pr = re[i][i];
      double pi = im[i][i];
      double modulus = pr * pr + pi * pi;
      for (int j = 0; j < m; j++) {
        double vr = xr[i][j];
        double vi = xi[i][j];
        xr[i][j] = (vr * pr + vi * pi) / modulus;
        xi[i][j] = (vi * pr - vr * pi) / modulus;
      }
      watch.spend(8.0 * (n - i) * m);
    }
    System.arraycopy(xr, 0, right, 0, n);
    System.arraycopy(xi, 0, rightIm, 0, n);
  }

  private void reduce(double[][] xr, double[][] xi, int i, int from, int to, int m) {
    if (m == 1) {
      double sumRe = 0;
      double sumIm = 0;
      double[] fr = re[i];
      double[] fi = im[i];
      for (int k = from; k < to; k++) {
        sumRe += fr[k] * xr[k][0] - fi[k] * xi[k][0];
        sumIm += fr[k] * xi[k][0] + fi[k] * xr[k][0];
      }
      xr[i][0] -= sumRe;
      xi[i][0] -= sumIm;
      return;
    }
    for (int k = from; k < to; k++) {
      subtract(xr[i], xi[i], re[i][k], im[i][k], xr[k], xi[k], 0, m);
    }
  }
}
