/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.basis;

import java.util.Arrays;
import org.spanloom.numerics.internal.work.Watch;

/**
 * Singular values by one-sided Jacobi rotations (Hestenes 1958). For a matrix {@code B D} with D
 * diagonal they come out to a relative accuracy governed by the condition of B alone, however wild
 * D is (Demmel and Veselic, SIAM J. Matrix Anal. Appl. 13 (1992) 1204; from memory).
 */
final class JacobiSingularValues {

  private static final int SWEEPS = 40;
  private static final double ORTHOGONAL = 0x1p-50;

  private JacobiSingularValues() {}

  /**
   * Returns the singular values, largest first.
   *
   * @param x n by m matrix, row by row, finite, n at least m
   * @param watch asked while working
   */
  static double[] of(double[] x, int n, int m, Watch watch) {
    double[][] columns = new double[m][n];
    for (int j = 0; j < m; j++) {
      for (int i = 0; i < n; i++) {
        columns[j][i] = x[i * m + j];
      }
    }
    boolean turned = true;
    for (int sweep = 0; sweep < SWEEPS && turned; sweep++) {
      turned = false;
      for (int p = 0; p < m; p++) {
        for (int q = p + 1; q < m; q++) {
          turned |= rotate(columns[p], columns[q]);
        }
        watch.spend(10.0 * n * (m - p));
      }
    }
    double[] values =
        Arrays.stream(columns).mapToDouble(JacobiSingularValues::norm).sorted().toArray();
    for (int k = 0; k < m / 2; k++) {
      double other = values[k];
      values[k] = values[m - 1 - k];
      values[m - 1 - k] = other;
    }
    return values;
  }

  /**
   * Makes two columns orthogonal; tells whether they were not. Works on scaled columns, so nothing
   * overflows.
   */
  private static boolean rotate(double[] p, double[] q) {
    double sizeP = norm(p);
    double sizeQ = norm(q);
    if (sizeP == 0 || sizeQ == 0) {
      return false;
    }
    double cosine = 0;
    for (int i = 0; i < p.length; i++) {
      cosine += p[i] / sizeP * (q[i] / sizeQ);
    }
    if (Math.abs(cosine) <= ORTHOGONAL) {
      return false;
    }
    double ratio = sizeQ / sizeP;
    double zeta = (ratio - 1 / ratio) / (2 * cosine);
    double tangent =
        Double.isInfinite(zeta)
            ? 0
            : Math.copySign(1, zeta) / (Math.abs(zeta) + Math.hypot(1, zeta));
    double c = 1 / Math.hypot(1, tangent);
    double s = c * tangent;
    if (s == 0) {
      return false;
    }
    for (int i = 0; i < p.length; i++) {
      double old = p[i];
      p[i] = c * old - s * q[i];
      q[i] = s * old + c * q[i];
    }
    return true;
  }

  /** The 2-norm, safe from overflow and underflow. */
  static double norm(double[] v) {
    double largest = 0;
    for (double entry : v) {
      largest = Math.max(largest, Math.abs(entry));
    }
    if (largest == 0 || Double.isInfinite(largest)) {
      return largest;
    }
    double sum = 0;
    for (double entry : v) {
      sum += entry / largest * (entry / largest);
    }
    return largest * Math.sqrt(sum);
  }
}
