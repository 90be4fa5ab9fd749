/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.basis;

import java.util.Arrays;
import java.util.Optional;

/**
 * A column that is a combination of the columns before it.
 *
 * <p>For true solutions of a homogeneous linear system independence at one time decides for all
 * times, so initial vectors are all that needs to be looked at.
 *
 * @param column the first such column, from 0
 * @param factors factors of the columns before it, length {@code column}; those that are only
 *     rounding are 0
 */
public record Dependence(int column, double[] factors) {

  /** Distance of a unit vector from the span of others below which it is rounding error. */
  private static final double ROUNDING = 1e-14;

  /** Copies its array. */
  public Dependence {
    factors = factors.clone();
  }

  @Override
  public double[] factors() {
    return factors.clone();
  }

  /**
   * Looks for a dependent column, by Gram-Schmidt with a second pass on columns scaled to length 1.
   *
   * @param x columns side by side, n by m, row by row, finite
   * @param n number of rows
   * @param m number of columns
   * @return the first column that depends on those before it; a column of zeros does, with no
   *     factors
   */
  public static Optional<Dependence> among(double[] x, int n, int m) {
    double[][] directions = new double[m][];
    double[][] triangle = new double[m][];
    double[] norms = new double[m];
    for (int j = 0; j < m; j++) {
      double[] column = new double[n];
      for (int i = 0; i < n; i++) {
        column[i] = x[i * m + j];
      }
      norms[j] = JacobiSingularValues.norm(column);
      if (norms[j] == 0) {
        return Optional.of(new Dependence(j, new double[j]));
      }
      for (int i = 0; i < n; i++) {
        column[i] /= norms[j];
      }
      triangle[j] = new double[j + 1];
      for (int pass = 0; pass < 2; pass++) {
        for (int k = 0; k < j; k++) {
          double share = dot(directions[k], column);
          triangle[j][k] += share;
          for (int i = 0; i < n; i++) {
            column[i] -= share * directions[k][i];
          }
        }
      }
      double rest = JacobiSingularValues.norm(column);
      if (rest <= ROUNDING * Math.max(n, 4)) {
        return Optional.of(new Dependence(j, factors(triangle, norms, j)));
      }
      triangle[j][j] = rest;
      for (int i = 0; i < n; i++) {
        column[i] /= rest;
      }
      directions[j] = column;
    }
    return Optional.empty();
  }

  /** Solves the triangular system of the projections back to the columns themselves. */
  private static double[] factors(double[][] triangle, double[] norms, int column) {
    double[] y = Arrays.copyOf(triangle[column], column);
    for (int k = column - 1; k >= 0; k--) {
      y[k] /= triangle[k][k];
      for (int i = 0; i < k; i++) {
        y[i] -= y[k] * triangle[k][i];
      }
    }
    double largest = Arrays.stream(y).map(Math::abs).max().orElse(0);
    for (int k = 0; k < column; k++) {
      y[k] = Math.abs(y[k]) <= 1e-12 * largest ? 0 : y[k] * (norms[column] / norms[k]);
    }
    return y;
  }

  private static double dot(double[] a, double[] b) {
    double sum = 0;
    for (int i = 0; i < a.length; i++) {
      sum += a[i] * b[i];
    }
    return sum;
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof Dependence that
        && column == that.column
        && Arrays.equals(factors, that.factors);
  }

  @Override
  public int hashCode() {
    return 31 * column + Arrays.hashCode(factors);
  }

  @Override
  public String toString() {
    return "Dependence[" + column + ", " + Arrays.toString(factors) + "]";
  }
}
