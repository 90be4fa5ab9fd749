/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.List;
import java.util.Optional;

/**
 * The times at which terms change their formula: ends of the branches of a choice, edges of pulses,
 * and where {@code abs}, {@code sign}, {@code min} and {@code max} turn. Between two of them terms
 * are as smooth as their smooth functions.
 *
 * <p>Times are in the unit of the caller. A corner is known to within rounding, so each carries the
 * last time at which the old formula surely holds and the first at which the new one does.
 *
 * @param list the corners, in order of time, those at the ends of the range included
 * @param gap what keeps the list from being complete, if anything does
 */
public record Corners(List<Corner> list, Optional<Gap> gap) {

  /** Corners that are told apart at most; more are not listed. */
  public static final int LIMIT = 1_000_000;

  /** Copies the list. */
  public Corners {
    list = List.copyOf(list);
  }

  /**
   * One time.
   *
   * @param time the time to stop at
   * @param before where to take values from the left, a few rounding errors away at most
   * @param after where to take values from the right
   */
  public record Corner(double time, double before, double after) {}

  /** Why corners may be missing. */
  public sealed interface Gap {}

  /**
   * The sign of a term could not be followed with bounded work.
   *
   * @param term the term
   * @param time from where on
   */
  public record Untraced(Term term, double time) implements Gap {}

  /** There are more corners than {@link #LIMIT}. */
  public record TooMany() implements Gap {}
}
