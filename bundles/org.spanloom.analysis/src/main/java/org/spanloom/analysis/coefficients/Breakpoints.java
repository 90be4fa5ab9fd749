/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.coefficients;

import java.util.Arrays;
import org.spanloom.numerics.Side;

/**
 * The times at which coefficients of a system have a corner or a jump, and how to take their sides.
 */
final class Breakpoints {

  private final double[] times;

  /**
   * Takes the times.
   *
   * @param times strictly inside the range, increasing
   */
  Breakpoints(double[] times) {
    this.times = times.clone();
  }

  /** Returns the times, in a fresh array. */
  double[] times() {
    return times.clone();
  }

  /**
   * Returns the time at which to evaluate a coefficient. A breakpoint is known to a rounding error,
   * so its sides are taken a few of them away; at every other time the sides are one.
   */
  double beside(double t, Side side) {
    if (Arrays.binarySearch(times, t) < 0) {
      return t;
    }
    double step = 4 * Math.ulp(t);
    return side == Side.BEFORE ? t - step : t + step;
  }
}
