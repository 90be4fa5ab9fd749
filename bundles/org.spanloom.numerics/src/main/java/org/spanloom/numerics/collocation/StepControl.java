/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.collocation;

/**
 * Chooses step lengths from error estimates: a proportional-integral controller (Gustafsson 1991,
 * ACM Trans. Math. Softw. 17, 533; from memory).
 */
final class StepControl {

  private static final double MARGIN = 0.85;

  private final int stages;
  private double lastError = 1;
  private int failures;

  /** Controls a method of this many stages. */
  StepControl(int stages) {
    this.stages = stages;
  }

  /**
   * Returns the next step after one that was accepted.
   *
   * @param h its length
   * @param error its error over the error allowed, at most 1
   */
  double afterSuccess(double h, double error) {
    double bounded = Math.max(error, 1e-12);
    double exponent = 2.0 * stages;
    double factor =
        MARGIN * Math.pow(bounded, -0.7 / exponent) * Math.pow(lastError, 0.4 / exponent);
    if (lastError == 1) {
      factor = MARGIN * Math.pow(bounded, -1 / exponent);
    }
    lastError = Math.max(bounded, 1e-4);
    double most = failures > 0 ? 1 : 6;
    failures = 0;
    return h * Math.clamp(factor, 0.3, most);
  }

  /**
   * Returns the next step after one that was refused.
   *
   * @param h its length
   * @param error its error over the error allowed, above 1, possibly infinite
   */
  double afterFailure(double h, double error) {
    failures++;
    if (!(error < 1e30)) {
      return h * 0.1;
    }
    double exponent = failures > 1 ? stages + 2.0 : 2.0 * stages;
    return h * Math.clamp(MARGIN * Math.pow(error, -1 / exponent), 0.08, 0.8);
  }
}
