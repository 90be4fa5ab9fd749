/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.basis;

/**
 * How sound a basis is at one time.
 *
 * @param time the time
 * @param singularValues singular values of X(t), largest first; copied on the way in and out
 * @param raw 2-norm condition number of X(t); infinite when the smallest singular value is 0
 * @param scaled 2-norm condition number after each column was scaled to unit 2-norm (van der Sluis
 *     1969)
 * @param logDeterminant ln |det X(t)|; negative infinity when singular
 * @param determinantSign -1, 0 or 1
 * @param liouvilleLogDeterminant ln |det X(t0)| + integral of trace A from t0 to t
 * @param error largest error estimate of an entry of X(t), relative to the norm of its column
 */
public record ConditionSample(
    double time,
    double[] singularValues,
    double raw,
    double scaled,
    double logDeterminant,
    int determinantSign,
    double liouvilleLogDeterminant,
    double error) {

  /** Copies its array. */
  public ConditionSample {
    singularValues = singularValues.clone();
  }

  @Override
  public double[] singularValues() {
    return singularValues.clone();
  }

  /**
   * Returns |ln det X - Liouville's value|, the relative mismatch of the determinant for small
   * values.
   */
  public double liouvilleMismatch() {
    return logDeterminant == liouvilleLogDeterminant
        ? 0
        : Math.abs(logDeterminant - liouvilleLogDeterminant);
  }

  /**
   * Returns the decimal digits that survive solving with this basis: {@code -log10(scaled *
   * max(error, u))}, not below 0, where u = 2^-53.
   */
  public double digitsLeft() {
    return Math.max(0, -Math.log10(scaled * Math.max(error, 0x1p-53)));
  }

  /**
   * Tells whether the condition is beyond what double precision can tell: the smallest singular
   * value is no larger than the errors of the columns, so that the condition numbers are given as
   * infinite.
   */
  public boolean beyondResolution() {
    return Double.isInfinite(scaled);
  }
}
