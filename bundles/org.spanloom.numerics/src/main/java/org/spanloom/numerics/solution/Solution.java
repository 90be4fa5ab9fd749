/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.solution;

import org.spanloom.numerics.Side;
import org.spanloom.numerics.TimeRange;

/**
 * One or several solutions side by side, known at every time of a range (dense output), each number
 * with an estimate of its global error.
 *
 * <p>Values are n by m, row by row: entry {@code i*m + j} is component i of column j. A trajectory
 * has m = 1.
 */
public interface Solution {

  /** Returns n, the number of states. */
  int dimension();

  /** Returns m, the number of columns. */
  int columns();

  /** Returns the time at which the columns were given. */
  double startTime();

  /** Returns the range on which the solution is known. */
  TimeRange range();

  /**
   * Writes the values at a time.
   *
   * @param t time inside {@link #range()}
   * @param side the side to take where the solution jumps
   * @param x receives n*m values, row by row
   */
  void value(double t, Side side, double[] x);

  /**
   * Writes estimates of the absolute global error of what {@link #value} writes; where the solution
   * jumps, for the value after it.
   *
   * @param t time inside {@link #range()}
   * @param error receives n*m numbers, not negative, finite
   */
  void errorEstimate(double t, double[] error);

  /**
   * Writes estimates of the absolute global error of what {@link #value} writes for a side.
   *
   * @param t time inside {@link #range()}
   * @param side the side to take where the solution jumps
   * @param error receives n*m numbers, not negative, finite
   */
  default void errorEstimate(double t, Side side, double[] error) {
    errorEstimate(t, error);
  }

  /** Returns the times in the range at which the solution itself jumps, increasing. */
  default double[] jumpTimes() {
    return new double[0];
  }

  /**
   * Returns the times at which the method stepped, increasing, with both ends of the range; a fresh
   * array.
   */
  double[] nodes();

  /** Returns the name of the method used, for reports, for example "matrix exponential". */
  String method();
}
