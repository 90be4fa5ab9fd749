/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.internal.algebra;

import java.util.Arrays;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.SingularValueDecomposition_F64;

/**
 * Singular values, largest first.
 *
 * <p>EJML's decomposition gives them with an error of about n u times the largest. Where the
 * smallest is not far above that, one-sided Jacobi rotations take over: they give every singular
 * value of a matrix with differently scaled columns to a relative error that depends on the
 * condition after scaling only (Demmel &amp; Veseli&#263; 1992, SIAM J. Matrix Anal. Appl. 13,
 * 1204; from memory).
 */
public final class SingularValues {

  private static final double ENOUGH_FOR_GENERAL = 1e9;
  private static final int MOST_COLUMNS_FOR_ROTATIONS = 160;
  private static final int FEW_COLUMNS = 6;
  private static final int MOST_SWEEPS = 40;

  private SingularValues() {}

  /**
   * Computes them.
   *
   * @param x the matrix, n by m with m at most n; left as it is
   * @param m number of columns, at least 1
   */
  public static double[] of(double[][] x, int m) {
    double largest = 0;
    for (double[] row : x) {
      for (int j = 0; j < m; j++) {
        largest = Math.max(largest, Math.abs(row[j]));
      }
    }
    if (largest == 0) {
      return new double[m];
    }
    // Scaled by a power of two, so that squares neither overflow nor vanish.
    int exponent = Math.getExponent(largest);
    double[][] columns = new double[m][x.length];
    for (int i = 0; i < x.length; i++) {
      for (int j = 0; j < m; j++) {
        columns[j][i] = Math.scalb(x[i][j], -exponent);
      }
    }
    double[] values = m > FEW_COLUMNS ? general(columns) : new double[m];
    boolean doubtful = !(values[0] < ENOUGH_FOR_GENERAL * values[m - 1]);
    if (doubtful && m <= MOST_COLUMNS_FOR_ROTATIONS) {
      values = byRotations(columns);
    }
    for (int k = 0; k < m; k++) {
      values[k] = Math.scalb(values[k], exponent);
    }
    return values;
  }

  private static double[] general(double[][] columns) {
    int m = columns.length;
    int n = columns[0].length;
    DMatrixRMaj matrix = new DMatrixRMaj(m, n, true, Rows.flat(columns, n));
    SingularValueDecomposition_F64<DMatrixRMaj> svd =
        DecompositionFactory_DDRM.svd(m, n, false, false, true);
    if (!svd.decompose(matrix)) {
      return new double[m];
    }
    double[] values = Arrays.copyOf(svd.getSingularValues(), m);
    return descending(values);
  }

  private static double[] descending(double[] values) {
    Arrays.sort(values);
    for (int k = 0; k < values.length / 2; k++) {
      double last = values[values.length - 1 - k];
      values[values.length - 1 - k] = values[k];
      values[k] = last;
    }
    return values;
  }

  /** Rotates pairs of columns until all are orthogonal; their lengths are the singular values. */
  private static double[] byRotations(double[][] c) {
    int m = c.length;
    boolean rotated = true;
    for (int sweep = 0; sweep < MOST_SWEEPS && rotated; sweep++) {
      rotated = false;
      for (int p = 0; p < m - 1; p++) {
        putLongestFirst(c, p);
        for (int q = p + 1; q < m; q++) {
          rotated |= rotate(c[p], c[q]);
        }
      }
    }
    double[] values = new double[m];
    for (int k = 0; k < m; k++) {
      values[k] = Math.sqrt(dot(c[k], c[k]));
    }
    return descending(values);
  }

  /**
   * De Rijk's order, with which graded columns converge quickly (1989, SIAM J. Sci. Stat. Comput.
   * 10, 359; from memory).
   */
  private static void putLongestFirst(double[][] c, int p) {
    int longest = p;
    double length = dot(c[p], c[p]);
    for (int q = p + 1; q < c.length; q++) {
      double other = dot(c[q], c[q]);
      if (other > length) {
        longest = q;
        length = other;
      }
    }
    double[] column = c[p];
    c[p] = c[longest];
    c[longest] = column;
  }

  private static boolean rotate(double[] a, double[] b) {
    double aa = dot(a, a);
    double bb = dot(b, b);
    double ab = dot(a, b);
    if (!(Math.abs(ab) > 0x1p-52 * Math.sqrt(aa) * Math.sqrt(bb)) || aa == 0 || bb == 0) {
      return false;
    }
    double zeta = (bb - aa) / (2 * ab);
    double t = Math.copySign(1, zeta) / (Math.abs(zeta) + Math.hypot(1, zeta));
    double cos = 1 / Math.sqrt(1 + t * t);
    double sin = cos * t;
    for (int i = 0; i < a.length; i++) {
      double ai = a[i];
      double bi = b[i];
      a[i] = cos * ai - sin * bi;
      b[i] = sin * ai + cos * bi;
    }
    return true;
  }

  private static double dot(double[] a, double[] b) {
    double s0 = 0;
    double s1 = 0;
    int i = 0;
    for (; i + 1 < a.length; i += 2) {
      s0 += a[i] * b[i];
      s1 += a[i + 1] * b[i + 1];
    }
    if (i < a.length) {
      s0 += a[i] * b[i];
    }
    return s0 + s1;
  }
}
