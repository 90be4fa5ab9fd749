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

  /** Error, over the error allowed, that the next step is meant to have. */
  private static final double AIM = 0.25;

  private final int stages;
  private double lastRatio;
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
    double ratio = AIM / Math.max(error, 1e-12);
    double exponent = 2.0 * stages;
    double factor =
        lastRatio == 0
            ? Math.pow(ratio, 1 / exponent)
            : Math.pow(ratio, 0.7 / exponent) * Math.pow(lastRatio, -0.4 / exponent);
    lastRatio = Math.min(ratio, 1e4);
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
    return h * Math.clamp(Math.pow(AIM / error, 1 / exponent), 0.08, 0.8);
  }
}
