/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.collocation;

import org.spanloom.numerics.internal.work.Watch;

/**
 * The collocation conditions of one step, {@code (D (x) I - h diag(A_i)) Z = R}, with s n unknowns
 * per column, factored once for all columns.
 */
final class StageSystem {

  private final CollocationTableau tableau;
  private final StageCoefficients coefficients;
  private final double h;
  private final Watch watch;
  private StageFactors factors;

  private StageSystem(
      CollocationTableau tableau,
      StageCoefficients coefficients,
      double h,
      StageFactors factors,
      Watch watch) {
    this.tableau = tableau;
    this.coefficients = coefficients;
    this.h = h;
    this.factors = factors;
    this.watch = watch;
  }

  /**
   * Assembles and factors the conditions of a step.
   *
   * @param h its signed length
   * @param columns how many columns will be solved for
   */
  static StageSystem of(
      CollocationTableau tableau,
      StageCoefficients coefficients,
      double h,
      int columns,
      Watch watch) {
    StageFactors factors = StageFactors.of(tableau, coefficients, h, columns, watch);
    return new StageSystem(tableau, coefficients, h, factors, watch);
  }

  /** Returns the same conditions for another step of the same length whose matrix is the same. */
  StageSystem with(StageCoefficients others) {
    return new StageSystem(tableau, others, h, factors.with(others), watch);
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
   * @param precision how exactly
   */
  double[][] solve(double[][] x, int m, StageFactors.Precision precision) {
    double[][] right = right(x, m);
    for (int i = 0; i < tableau.stages(); i++) {
      coefficients.addForcing(i, h, right, i * coefficients.dimension(), m);
    }
    return solved(right, m, precision);
  }

  private double[][] solved(double[][] right, int m, StageFactors.Precision precision) {
    return factors
        .solve(right, m, precision, watch)
        .orElseGet(() -> {
          factors = StageFactors.Dense.of(tableau, coefficients, h, watch);
          return factors.solve(right, m, precision, watch).orElseThrow();
        });
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
    return solved(right, m, StageFactors.Precision.ofErrors());
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
