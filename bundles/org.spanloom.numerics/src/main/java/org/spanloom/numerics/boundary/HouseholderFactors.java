/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.boundary;

import org.spanloom.numerics.internal.work.Watch;

/**
 * {@code M = Q (U, 0)'} of a tall matrix by reflections (Golub &amp; Van Loan, Matrix Computations,
 * 4th ed. 2013, section 5.2; from memory). Q is kept as its reflections, so that right sides which
 * come later can follow.
 */
final class HouseholderFactors {

  private final double[][] rows;
  private final double[] diagonal;
  private final double[] beta;

  private HouseholderFactors(double[][] rows, double[] diagonal, double[] beta) {
    this.rows = rows;
    this.diagonal = diagonal;
    this.beta = beta;
  }

  /**
   * Factors.
   *
   * @param rows the matrix, at least as many rows as columns; taken over and overwritten
   */
  static HouseholderFactors of(double[][] rows, Watch watch) {
    int p = rows.length;
    int n = rows[0].length;
    double[] diagonal = new double[n];
    double[] beta = new double[n];
    for (int k = 0; k < n; k++) {
      double norm = 0;
      for (int i = k; i < p; i++) {
        norm = Math.hypot(norm, rows[i][k]);
      }
      double head = rows[k][k];
      double alpha = head > 0 ? -norm : norm;
      diagonal[k] = alpha;
      if (norm == 0) {
        continue;
      }
      // v = x - alpha e_1, scaled so that its first entry is 1.
      double first = head - alpha;
      beta[k] = -first / alpha;
      rows[k][k] = 1;
      for (int i = k + 1; i < p; i++) {
        rows[i][k] /= first;
      }
      for (int j = k + 1; j < n; j++) {
        reflect(rows, k, beta[k], rows, j);
      }
      watch.spend(4.0 * (p - k) * (n - k));
    }
    return new HouseholderFactors(rows, diagonal, beta);
  }

  /** Applies the reflection whose vector stands in column k to column j of a matrix. */
  private static void reflect(double[][] vectors, int k, double beta, double[][] target, int j) {
    double dot = 0;
    for (int i = k; i < target.length; i++) {
      dot += vectors[i][k] * target[i][j];
    }
    dot *= beta;
    for (int i = k; i < target.length; i++) {
      target[i][j] -= dot * vectors[i][k];
    }
  }

  /** Replaces a matrix with as many rows by Q' times it. */
  void applyTransposed(double[][] target, Watch watch) {
    int m = target[0].length;
    for (int k = 0; k < diagonal.length; k++) {
      if (beta[k] != 0) {
        for (int j = 0; j < m; j++) {
          reflect(rows, k, beta[k], target, j);
        }
        watch.spend(4.0 * (target.length - k) * m);
      }
    }
  }

  /** Solves {@code U x = c} in place for the first n rows of c. */
  void solveUpper(double[][] c, Watch watch) {
    int n = diagonal.length;
    int m = c[0].length;
    for (int i = n - 1; i >= 0; i--) {
      for (int k = i + 1; k < n; k++) {
        double factor = rows[i][k];
        for (int j = 0; j < m; j++) {
          c[i][j] -= factor * c[k][j];
        }
      }
      for (int j = 0; j < m; j++) {
        c[i][j] /= diagonal[i];
      }
      watch.spend(2.0 * (n - i) * m);
    }
  }

  /** Solves {@code U' y = c} in place for the first n rows of c. */
  void solveUpperTransposed(double[][] c, Watch watch) {
    int n = diagonal.length;
    int m = c[0].length;
    for (int i = 0; i < n; i++) {
      for (int k = 0; k < i; k++) {
        double factor = rows[k][i];
        for (int j = 0; j < m; j++) {
          c[i][j] -= factor * c[k][j];
        }
      }
      for (int j = 0; j < m; j++) {
        c[i][j] /= diagonal[i];
      }
      watch.spend(2.0 * i * m);
    }
  }
}
