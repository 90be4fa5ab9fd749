/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.coefficients;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.spanloom.language.model.CornerSearch;
import org.spanloom.language.model.Corners;
import org.spanloom.language.model.Corners.Corner;
import org.spanloom.language.model.Term;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.TimeRange;

/**
 * The times at which coefficients of a system have a corner or a jump, and how to take their sides.
 * Those of a bounded range are found at once; of an unbounded one, those of the part that is asked
 * for. Safe for use by several threads.
 */
final class Breakpoints {

  /** Parts of an endless range kept at a time. */
  private static final int KEPT = 8;

  private final List<Term> terms;
  private final double factor;
  private final Map<String, Double> parameters;
  private final TimeRange range;

  /** Parts looked through so far, the latest first; replaced as a whole. */
  private volatile List<Window> windows;

  private volatile Optional<Corners.Gap> gap = Optional.empty();

  /** The corners of one part of the range, as columns, those at its ends included. */
  private record Window(double from, double to, double[] times, double[] before, double[] after) {

    static Window of(double from, double to, List<Corner> corners) {
      return new Window(
          from,
          to,
          corners.stream().mapToDouble(Corner::time).toArray(),
          corners.stream().mapToDouble(Corner::before).toArray(),
          corners.stream().mapToDouble(Corner::after).toArray());
    }

    /** Returns the first corner at or behind a time. */
    int first(double time) {
      int at = Arrays.binarySearch(times, time);
      return at < 0 ? -1 - at : at;
    }
  }

  /**
   * Takes the coefficients.
   *
   * @param terms the coefficients, in coherent SI units
   * @param factor the unit of time in coherent SI units
   * @param parameters values that replace those of parameters, by name, in coherent SI units
   * @param range the interval of the system, in the unit of time
   */
  Breakpoints(List<Term> terms, double factor, Map<String, Double> parameters, TimeRange range) {
    this.terms = List.copyOf(terms);
    this.factor = factor;
    this.parameters = Map.copyOf(parameters);
    this.range = range;
    this.windows = range.isBounded() ? List.of(search(range.start(), range.end())) : List.of();
  }

  private Window search(double from, double to) {
    CornerSearch search = new CornerSearch(from, to, factor, parameters);
    terms.forEach(search::add);
    Corners corners = search.result();
    gap = corners.gap();
    return Window.of(from, to, corners.list());
  }

  /** Returns why breakpoints may be missing from the part looked through so far. */
  Optional<Corners.Gap> gap() {
    return gap;
  }

  /** Returns the times strictly inside the range; none where it is not bounded. */
  double[] times() {
    return range.isBounded() ? between(range.start(), range.end()) : new double[0];
  }

  /** Returns the times strictly between two, increasing. */
  double[] between(double from, double to) {
    Window at = window(from, to);
    int first = at.first(Math.nextUp(from));
    int end = at.first(to);
    return first < end ? Arrays.copyOfRange(at.times(), first, end) : new double[0];
  }

  private Window window(double from, double to) {
    List<Window> known = windows;
    for (Window part : known) {
      if (from >= part.from() && to <= part.to()) {
        return part;
      }
    }
    Window found = search(from, to);
    List<Window> more = new ArrayList<>(known.subList(0, Math.min(known.size(), KEPT - 1)));
    more.addFirst(found);
    windows = List.copyOf(more);
    return found;
  }

  /**
   * Returns the time at which to evaluate a coefficient for a one-sided value; at every other time
   * than a breakpoint the sides are one.
   */
  double beside(double t, Side side) {
    for (Window part : windows) {
      int at = part.first(t);
      if (at < part.times().length && part.times()[at] == t) {
        return side == Side.BEFORE ? part.before()[at] : part.after()[at];
      }
    }
    return t;
  }
}
