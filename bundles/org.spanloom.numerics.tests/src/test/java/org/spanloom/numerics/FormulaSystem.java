/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics;

/**
 * A system given by formulas, for tests.
 *
 * @param dimension number of states
 * @param range where it is defined
 * @param coefficients writes A(t)
 * @param force writes b(t)
 * @param hasConstantMatrix whether A is constant
 * @param hasConstantForcing whether b is constant
 * @param corners times where either may jump
 */
public record FormulaSystem(
    int dimension,
    TimeRange range,
    Formula coefficients,
    Formula force,
    boolean hasConstantMatrix,
    boolean hasConstantForcing,
    double... corners)
    implements LinearSystem {

  /** All of time. */
  public static final TimeRange ALWAYS =
      new TimeRange(Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY);

  /** Values as a function of time. */
  @FunctionalInterface
  public interface Formula {
    /** Writes all values. */
    void write(double t, Side side, double[] values);
  }

  /** Returns a system with constant A, row by row, without forcing. */
  public static FormulaSystem constant(int n, double... a) {
    return forced(n, a, new double[n]);
  }

  /** Returns a system with constant A, row by row, and constant b. */
  public static FormulaSystem forced(int n, double[] a, double[] b) {
    return new FormulaSystem(n, ALWAYS, copy(a), copy(b), true, true);
  }

  /** Returns a system with constant A and varying b. */
  public static FormulaSystem driven(int n, double[] a, Formula force) {
    return new FormulaSystem(n, ALWAYS, copy(a), force, true, false);
  }

  /** Returns a system with varying A and no forcing. */
  public static FormulaSystem varying(int n, TimeRange range, Formula a, double... corners) {
    return new FormulaSystem(n, range, a, copy(new double[n]), false, true, corners);
  }

  private static Formula copy(double[] from) {
    double[] values = from.clone();
    return (t, side, to) -> System.arraycopy(values, 0, to, 0, values.length);
  }

  @Override
  public void matrix(double t, Side side, double[] a) {
    coefficients.write(t, side, a);
  }

  @Override
  public void forcing(double t, Side side, double[] b) {
    force.write(t, side, b);
  }

  @Override
  public SparsityPattern pattern() {
    return SparsityPattern.dense(dimension);
  }

  @Override
  public double[] breakpoints() {
    return corners.clone();
  }
}
