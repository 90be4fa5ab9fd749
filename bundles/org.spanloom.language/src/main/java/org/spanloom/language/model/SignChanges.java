/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import org.spanloom.language.model.Corners.Corner;

/**
 * Finds every time at which a term changes its sign, by halving a range until interval arithmetic
 * shows that the term has no zero or only one. None is missed, but two that are nearer to each
 * other than 1e-12 of the range count as none.
 *
 * <p>Source: Moore, Kearfott and Cloud, Introduction to Interval Analysis, 2009, sections 6.4 and
 * 8.1 (from memory).
 */
final class SignChanges {

  private static final double RESOLUTION = 1e-12;
  private static final int MOST_NODES = 20_000_000;
  private static final int MOST_RANGES = 400_000;
  private static final int FEWEST_RANGES = 4_000;

  private final TimeGrid grid;
  private final int root;
  private final TermIntervals values;
  private final int slopeRoot;
  private final TermIntervals slopes;
  private final TermEvaluator value;
  private final double resolution;
  private final List<Corner> found = new ArrayList<>();
  private int patience;
  private OptionalDouble untraced = OptionalDouble.empty();

  /**
   * Prepares.
   *
   * @param tape the term, laid out
   */
  SignChanges(Term term, TermTape tape, TimeGrid grid, Map<String, Double> replaced) {
    this.grid = grid;
    this.root = tape.size() - 1;
    this.values = new TermIntervals(tape, replaced);
    TermTape slope = TermTape.of(TimeDerivative.of(term));
    this.slopeRoot = slope.size() - 1;
    this.slopes = new TermIntervals(slope, replaced);
    this.value = TermEvaluator.of(term, replaced);
    this.resolution = RESOLUTION * (grid.to() - grid.from());
    this.patience = Math.clamp(MOST_NODES / tape.size(), FEWEST_RANGES, MOST_RANGES);
  }

  /** Returns from where on signs could not be followed with bounded work. */
  OptionalDouble untraced() {
    return untraced;
  }

  /**
   * Returns the changes of sign.
   *
   * @param inner corners of what the term is built of, in order; a change right at one of them is
   *     not listed again
   */
  List<Corner> between(List<Corner> inner) {
    double start = grid.from();
    for (Corner corner : inner) {
      search(start, Math.min(corner.before(), grid.to()));
      start = Math.max(start, corner.after());
    }
    search(start, grid.to());
    return found;
  }

  private record Range(double from, double to) {}

  private void search(double from, double to) {
    Deque<Range> open = new ArrayDeque<>();
    if (from < to) {
      open.push(new Range(from, to));
    }
    while (!open.isEmpty() && untraced.isEmpty()) {
      Range range = open.pop();
      Interval times = new Interval(grid.base(range.from()), grid.base(range.to()));
      values.enclose(times);
      if (!mayChange(values.of(root))) {
        continue;
      }
      slopes.enclose(times);
      Interval slope = slopes.of(slopeRoot);
      boolean steady = !slope.isEmpty() && !slope.contains(0);
      double middle = range.from() + (range.to() - range.from()) / 2;
      boolean fine =
          range.to() - range.from() <= resolution || middle == range.from() || middle == range.to();
      if (steady || fine) {
        settle(range);
      } else if (mayChange(sharper(times, slope))) {
        if (--patience < 0) {
          untraced = OptionalDouble.of(range.from());
          return;
        }
        open.push(new Range(middle, range.to()));
        open.push(new Range(range.from(), middle));
      }
    }
  }

  private static boolean mayChange(Interval range) {
    return !range.isEmpty() && range.contains(0) && !(range.low() == 0 && range.high() == 0);
  }

  /** Encloses the term by its mean value form. */
  private Interval sharper(Interval times, Interval slope) {
    if (!slope.isBounded()) {
      return Interval.ALL;
    }
    Interval centre = Interval.at(times.low() + (times.high() - times.low()) / 2);
    values.enclose(centre);
    return values.of(root).plus(slope.times(times.minus(centre)));
  }

  /** Looks at the ends of a range with at most one change. */
  private void settle(Range range) {
    int first = sign(range.from());
    int last = sign(range.to());
    if (first == last) {
      return;
    }
    double before = first == 0 ? range.from() : edge(range.from(), range.to(), first);
    double after = last == 0 ? range.to() : edge(range.to(), range.from(), last);
    found.add(TimeGrid.corner(before, after, after));
  }

  /** Returns the last time of a sign, going from a time that has it to one that has not. */
  private double edge(double from, double to, int sign) {
    double near = from;
    double far = to;
    for (double middle = near + (far - near) / 2;
        middle != near && middle != far;
        middle = near + (far - near) / 2) {
      if (sign(middle) == sign) {
        near = middle;
      } else {
        far = middle;
      }
    }
    return near;
  }

  private int sign(double time) {
    double x = value.at(grid.base(time));
    return x > 0 ? 1 : x < 0 ? -1 : 0;
  }
}
