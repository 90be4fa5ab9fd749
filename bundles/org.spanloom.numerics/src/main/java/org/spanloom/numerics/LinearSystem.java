/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics;

import java.util.Arrays;
import java.util.List;

/**
 * A linear system {@code x'(t) = A(t) x(t) + b(t)} on an interval, as the solvers see it: arrays
 * only.
 *
 * <p>All numbers are in the units of the caller; the solvers never convert. {@code A} and {@code b}
 * are continuous on the range except at the declared {@link #breakpoints()}, where each side has
 * its own value. Implementations are safe for use by several threads as long as each passes its own
 * arrays.
 */
public interface LinearSystem {

  /** Returns the number of states n, at least 0. */
  int dimension();

  /** Returns the interval on which the system is defined; its ends may be infinite. */
  TimeRange range();

  /**
   * Writes A(t).
   *
   * @param t time inside {@link #range()}
   * @param side which one-sided value to take; matters at a breakpoint only
   * @param a receives A row by row, length n*n; every entry is written
   */
  void matrix(double t, Side side, double[] a);

  /**
   * Writes b(t).
   *
   * @param t time inside {@link #range()}
   * @param side which one-sided value to take; matters at a breakpoint only
   * @param b receives b, length n; every entry is written
   */
  void forcing(double t, Side side, double[] b);

  /** Tells whether A is the same at all times of the range. */
  boolean hasConstantMatrix();

  /** Tells whether b is the same at all times of the range. */
  boolean hasConstantForcing();

  /** Returns the entries of A that are not zero by structure, at any time. */
  SparsityPattern pattern();

  /**
   * Returns the times inside the range where A or b may jump, strictly increasing; a fresh array.
   */
  double[] breakpoints();

  /**
   * Returns the changes of the states at fixed times inside {@link #range()}, by time; those at one
   * time take place one after another. Solutions are continuous from the right at them.
   */
  default List<Jump> jumps() {
    return List.of();
  }

  /**
   * Returns the times strictly between two where A or b may jump, strictly increasing. A system
   * whose range is not bounded may know them only so.
   *
   * @param from a time inside {@link #range()}
   * @param to a later one
   */
  default double[] breakpoints(double from, double to) {
    return Arrays.stream(breakpoints()).filter(t -> t > from && t < to).toArray();
  }
}
