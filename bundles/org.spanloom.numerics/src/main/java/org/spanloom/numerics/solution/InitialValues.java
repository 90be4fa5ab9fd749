/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.solution;

import java.util.Arrays;
import org.spanloom.numerics.Accuracy;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.TimeRange;

/**
 * A system with the values it starts from, as the methods get it.
 *
 * @param system the system
 * @param forced whether its forcing counts
 * @param t0 time of the values, inside {@code span}
 * @param x0 the values, n by m, row by row
 * @param columns how many columns m
 * @param span range to be covered, in both directions from t0
 * @param accuracy error asked for, with n scales
 */
public record InitialValues(
    LinearSystem system,
    boolean forced,
    double t0,
    double[] x0,
    int columns,
    TimeRange span,
    Accuracy accuracy) {

  /** Checks that the sizes fit, and copies. */
  public InitialValues {
    int n = system.dimension();
    if (x0.length != n * columns) {
      throw new IllegalArgumentException(
          x0.length + " values are not " + columns + " columns of " + n + " states");
    }
    if (accuracy.scale().length != n) {
      throw new IllegalArgumentException(
          accuracy.scale().length + " scales do not fit " + n + " states");
    }
    x0 = x0.clone();
  }

  @Override
  public double[] x0() {
    return x0.clone();
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof InitialValues that
        && system.equals(that.system)
        && forced == that.forced
        && t0 == that.t0
        && Arrays.equals(x0, that.x0)
        && columns == that.columns
        && span.equals(that.span)
        && accuracy.equals(that.accuracy);
  }

  @Override
  public int hashCode() {
    return 31 * system.hashCode() + Arrays.hashCode(x0);
  }

  @Override
  public String toString() {
    return "InitialValues[n=" + system.dimension() + ", m=" + columns + ", t0=" + t0 + "]";
  }
}
