/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.Optional;
import org.spanloom.language.model.Corners.Corner;

/**
 * The times of a range as a run takes them: numbers in the unit of the caller, which are multiplied
 * by its factor before a term sees them.
 *
 * @param from start of the range
 * @param to end of the range
 * @param factor the unit in coherent SI units
 */
record TimeGrid(double from, double to, double factor) {

  /** Numbers looked at for the one with the fewest digits. */
  private static final int CANDIDATES = 16;

  /** Returns a time in coherent SI units, as a run rounds it. */
  double base(double time) {
    return factor == 1 ? time : time * factor;
  }

  /**
   * Returns the corner of a function that steps at a time in coherent SI units, if it is inside.
   */
  Optional<Corner> step(double base) {
    double after = base / factor;
    while (base(after) < base) {
      after = Math.nextUp(after);
    }
    while (base(Math.nextDown(after)) >= base) {
      after = Math.nextDown(after);
    }
    boolean inside = after >= from && after <= to;
    return inside
        ? Optional.of(corner(Math.nextDown(after), after, base / factor))
        : Optional.empty();
  }

  /**
   * Returns a corner between two times.
   *
   * @param before the last time of the old formula
   * @param after the first time of the new one
   * @param close a time in or near the range between them
   */
  static Corner corner(double before, double after, double close) {
    double time = rounder(after, Math.max(before, close));
    double candidate = before;
    for (int i = 0; i < CANDIDATES && candidate <= after; i++) {
      time = rounder(time, candidate);
      candidate = Math.nextUp(candidate);
    }
    return new Corner(time, Math.min(before, Math.nextDown(time)), after);
  }

  /** Returns the number with fewer digits, the first one in doubt. */
  static double rounder(double first, double second) {
    return Double.toString(second).length() < Double.toString(first).length() ? second : first;
  }
}
