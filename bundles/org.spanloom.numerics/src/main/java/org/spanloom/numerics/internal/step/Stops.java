/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.internal.step;

import org.spanloom.numerics.LinearSystem;

/** Times at which a step has to end. */
public final class Stops {

  private Stops() {}

  /**
   * Returns the times to stop at from t0 to the end: breakpoints in between in the order in which
   * they are reached, then the end.
   */
  public static double[] between(LinearSystem system, double t0, double end) {
    double low = Math.min(t0, end);
    double high = Math.max(t0, end);
    double[] inside = system.breakpoints(low, high);
    double[] stops = new double[inside.length + 1];
    for (int k = 0; k < inside.length; k++) {
      stops[k] = end > t0 ? inside[k] : inside[inside.length - 1 - k];
    }
    stops[inside.length] = end;
    return stops;
  }
}
