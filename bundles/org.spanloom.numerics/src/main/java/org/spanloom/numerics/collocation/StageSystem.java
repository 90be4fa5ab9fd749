/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.collocation;

import org.spanloom.numerics.internal.algebra.LuFactors;
import org.spanloom.numerics.internal.work.Watch;

/**
 * The collocation conditions of one step, {@code (D (x) I - h diag(A_i)) Z = R}, with s n unknowns
 * per column, factored once for all columns.
 */
final class StageSystem {

  private final CollocationTableau tableau;
  private final StageCoefficients coefficients;
  private final double h;
  private final LuFactors factors;
  private final Watch watch;

  private StageSystem(
      CollocationTableau tableau,
      StageCoefficients coefficients,
      double h,
      LuFactors factors,
      Watch watch) {
    this.tableau = tableau;
    this.coefficients = coefficients;
    this.h = h;
    this.factors = factors;
    this.watch = watch;
  }

  /** Assembles and factors the conditions of a step of signed length h. */
  static StageSystem of(
      CollocationTableau tableau, StageCoefficients coefficients, double h, Watch watch) {
    int n = coefficients.dimension();
    int s = tableau.stages();
    double[][] rows = new double[s * n][s * n];
    for (int i = 0; i < s; i++) {
      double[] a = coefficients.matrix(i);
      for (int row = 0; row < n; row++) {
        double[] out = rows[i * n + row];
        for (int column = 0; column < n; column++) {
          out[i * n + column] = -h * a[row * n + column];
        }
        for (int j = 0; j < s; j++) {
          out[j * n + row] += tableau.derivative(i, j);
        }
      }
    }
    return new StageSystem(tableau, coefficients, h, LuFactors.of(rows, watch), watch);
  }

  /** Returns the same conditions for another step of the same length whose matrix is the same. */
  StageSystem with(StageCoefficients others) {
    return new StageSystem(tableau, others, h, factors, watch);
  }

  double length() {
    return h;
  }

  StageCoefficients coefficients() {
    return coefficients;
  }

  /**
   * Returns Z for columns that start at x, s n by m.
   *
   * @param x values at the start, n by m
   */
  double[][] solve(double[][] x, int m) {
    double[][] right = right(x, m);
    for (int i = 0; i < tableau.stages(); i++) {
      coefficients.addForcing(i, h, right, i * coefficients.dimension(), m);
    }
    return factors.solve(right, m, watch);
  }

  /**
   * Returns Z for errors that start at e, obey the homogeneous equations, and are driven by
   * rounding: the products with A are taken to be off by a share of their terms' sizes.
   *
   * @param e errors at the start, n by m
   * @param x the values they belong to
   * @param shares signed share of each row, about the unit roundoff
   */
  double[][] solveErrors(double[][] e, double[][] x, double[] shares, int m) {
    double[][] right = right(e, m);
    for (int i = 0; i < tableau.stages(); i++) {
      coefficients.addSizes(i, h, x, shares, right, i * coefficients.dimension(), m);
    }
    return factors.solve(right, m, watch);
  }

  private double[][] right(double[][] x, int m) {
    int n = coefficients.dimension();
    int s = tableau.stages();
    double[][] right = new double[s * n][m];
    for (int i = 0; i < s; i++) {
      coefficients.addProduct(i, h, x, right, i * n, m);
    }
    return right;
  }

  /** Returns the values at the end of the step, n by m. */
  double[][] end(double[][] x, double[][] z, int m) {
    int n = x.length;
    int s = tableau.stages();
    double[][] result = new double[n][];
    for (int row = 0; row < n; row++) {
      double[] out = x[row].clone();
      for (int i = tableau.endsAtPoint() ? s - 1 : 0; i < s; i++) {
        double[] zi = z[i * n + row];
        double weight = tableau.end(i);
        for (int j = 0; j < m; j++) {
          out[j] += weight * zi[j];
        }
      }
      result[row] = out;
    }
    return result;
  }
}
