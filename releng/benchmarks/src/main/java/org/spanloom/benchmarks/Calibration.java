/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.benchmarks;

import java.util.function.DoubleFunction;

/**
 * Finds how much accuracy a code has to be asked for, so that an error is reached: what is compared
 * are times to the same error, not to the same tolerance.
 */
final class Calibration {

  private Calibration() {}

  /** Most that is asked for. */
  private static final double FINEST = 1e-14;

  /**
   * Returns the loosest of the tolerances 1e-1, 3e-2, 1e-2 ... with which the error is reached, or
   * 0 when none does.
   *
   * @param solve gives the values for a tolerance
   * @param reference what is right
   * @param target largest error allowed
   */
  static double tolerance(DoubleFunction<double[]> solve, double[] reference, double target) {
    for (double decade = 0.1; decade > FINEST; decade /= 10) {
      for (double tolerance : new double[] {decade, 0.3 * decade}) {
        if (PeerProblem.error(solve.apply(tolerance), reference) <= target) {
          return tolerance;
        }
      }
    }
    return 0;
  }
}
