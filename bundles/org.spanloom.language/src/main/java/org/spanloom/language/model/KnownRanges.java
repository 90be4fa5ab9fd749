/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.IdentityHashMap;
import java.util.Map;
import java.util.Optional;

/**
 * What encloses the values of named expressions over a bounded interval, for those that plainly
 * have a finite value at every time of it. Each is enclosed once, from what encloses those that it
 * rests on, so that a long chain of them takes work in proportion to its length.
 */
final class KnownRanges {

  private final Map<Let, Interval> ranges = new IdentityHashMap<>();
  private final Interval times;

  /** Prepares an interval of times in coherent SI units; nothing is known if it is not bounded. */
  KnownRanges(Interval times) {
    this.times = times;
  }

  /** Notes a named expression whose value is known. */
  void note(Let let, Interval range) {
    ranges.put(let, range);
  }

  /**
   * Encloses the values of a term.
   *
   * @return an interval, or empty if it takes a closer look whether the term has a finite value
   *     everywhere
   */
  Optional<Interval> range(Term term) {
    if (!times.isBounded()) {
      return Optional.empty();
    }
    TermTape tape = TermTape.of(term, ranges.keySet());
    TermIntervals intervals = new TermIntervals(tape, Map.of(), ranges);
    intervals.enclose(times);
    for (Guard guard : Guard.of(tape)) {
      Interval exponent = GuardProbe.exponent(guard, intervals);
      if (guard.judge(intervals.of(guard.node()), exponent) != Guard.Verdict.HOLDS) {
        return Optional.empty();
      }
    }
    Interval whole = intervals.of(tape.size() - 1);
    return whole.isBounded() && !whole.isEmpty() ? Optional.of(whole) : Optional.empty();
  }
}
