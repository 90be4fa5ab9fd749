/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.solve;

import java.util.List;

/** At which times a solution is listed. */
public sealed interface Sampling {

  /**
   * Even steps, both ends included.
   *
   * @param count number of times, at least 2
   */
  record Even(int count) implements Sampling {}

  /**
   * Given times, in the order given.
   *
   * @param times in the time unit of the system
   */
  record At(List<Double> times) implements Sampling {
    /** Copies the list. */
    public At {
      times = List.copyOf(times);
    }
  }

  /**
   * For drawing: even steps and the steps of the method, so that no fast change is missed. A time
   * at which the solution jumps stands there twice, first for the value before the jump.
   *
   * @param count number of even steps
   * @param most bound on the number of times
   */
  record Curve(int count, int most) implements Sampling {}
}
