/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.requirement;

import java.util.Arrays;
import java.util.List;
import java.util.OptionalDouble;
import org.spanloom.numerics.Jump;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.TimeRange;

/** Whether the jumps of a system repeat after a period; those at the ends of the interval may. */
final class JumpPeriod {

  private static final double REPEATS = 1e-9;

  private final List<Jump> jumps;
  private final TimeRange range;
  private final double period;

  JumpPeriod(LinearSystem system, double period) {
    this.jumps = system.jumps();
    this.range = system.range();
    this.period = period;
  }

  /** Returns the time of the first jump that is not repeated or repeats nothing. */
  OptionalDouble firstWithoutCounterpart() {
    for (Jump jump : jumps) {
      if (isLonely(jump, period) || isLonely(jump, -period)) {
        return OptionalDouble.of(jump.time());
      }
    }
    return OptionalDouble.empty();
  }

  private boolean isLonely(Jump jump, double distance) {
    double there = jump.time() + distance;
    double slack = REPEATS * period;
    boolean inside = there > range.start() + slack && there < range.end() - slack;
    boolean atEnd = jump.time() <= range.start() + slack || jump.time() >= range.end() - slack;
    if (!inside || atEnd) {
      return false;
    }
    return Jump.within(jumps, there - slack, there + slack).stream()
        .noneMatch(other -> isSame(jump, other));
  }

  private static boolean isSame(Jump a, Jump b) {
    if (a.rows().size() != b.rows().size()) {
      return false;
    }
    for (int k = 0; k < a.rows().size(); k++) {
      Jump.Row left = a.rows().get(k);
      Jump.Row right = b.rows().get(k);
      boolean same =
          left.row() == right.row()
              && Arrays.equals(left.columns(), right.columns())
              && isNear(left.shift(), right.shift());
      for (int j = 0; same && j < left.factors().length; j++) {
        same = isNear(left.factors()[j], right.factors()[j]);
      }
      if (!same) {
        return false;
      }
    }
    return true;
  }

  private static boolean isNear(double a, double b) {
    return Math.abs(a - b) <= REPEATS * Math.max(Math.abs(a), Math.abs(b));
  }
}
