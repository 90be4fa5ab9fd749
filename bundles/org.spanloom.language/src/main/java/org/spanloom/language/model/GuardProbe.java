/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

/**
 * Looks at the node of one guard: at a time, over a range of times, and for the time where it
 * vanishes.
 */
final class GuardProbe {

  private static final int MOST_HALVINGS = 200;

  private final Guard guard;
  private final TermTape tape;
  private final TermIntervals intervals;
  private final Liveness liveness;
  private final TermTape slopeTape;
  private final TermIntervals slope;
  private final TermEvaluator slopeValue;

  /**
   * Prepares a probe.
   *
   * @param intervals enclosures of the tape; left at other times after each use
   */
  GuardProbe(Guard guard, TermTape tape, TermIntervals intervals) {
    this.guard = guard;
    this.tape = tape;
    this.intervals = intervals;
    this.liveness = new Liveness(tape);
    Term derivative = TimeDerivative.of(tape.node(guard.node()));
    this.slopeTape = TermTape.of(derivative);
    this.slope = new TermIntervals(slopeTape);
    this.slopeValue = TermEvaluator.of(derivative);
  }

  /** Returns the exponent where the guard is one of a power. */
  static Interval exponent(Guard guard, TermIntervals intervals) {
    return guard.kind() == Guard.Kind.POWER ? intervals.exponent(guard.owner()) : Interval.EMPTY;
  }

  /**
   * Judges the guard at one time. In a branch that is not taken then it holds, unless it keeps a
   * value from growing without bound as the branch is left.
   */
  Guard.Verdict judge(double time) {
    intervals.enclose(Interval.at(time));
    liveness.update(intervals);
    if (!liveness.mayMatter(guard) && !guard.keepsBounded(exponent(guard, intervals))) {
      return Guard.Verdict.HOLDS;
    }
    return guard.judge(intervals.of(guard.node()), exponent(guard, intervals));
  }

  /** Encloses, at one time, what must not vanish or become negative. */
  Interval value(double time) {
    intervals.enclose(Interval.at(time));
    Interval x = intervals.of(guard.node());
    return switch (guard.kind()) {
      case TANGENT -> IntervalFunctions.image(Function.COS, x);
      case INVERSE -> Interval.at(1).minus(x.absolute());
      case DIVISOR, LOGARITHM, ROOT, POWER, FINITE -> x;
    };
  }

  /**
   * Encloses the node more sharply than by its operations, by the mean value form {@code f(c) +
   * f'(T) (T - c)}. Source: Moore, Kearfott and Cloud, Introduction to Interval Analysis, 2009,
   * section 6.4 (from memory).
   */
  Interval sharper(Interval times) {
    double centre = times.low() + (times.high() - times.low()) / 2;
    slope.enclose(times);
    Interval change = slope.of(slopeTape.size() - 1);
    if (change.isEmpty() || !change.isBounded()) {
      return Interval.ALL;
    }
    intervals.enclose(Interval.at(centre));
    return intervals.of(guard.node()).plus(change.times(times.minus(Interval.at(centre))));
  }

  /** Returns 1 or -1 for a value that surely has this sign, else 0. */
  static int sign(Interval value) {
    return value.low() > 0 ? 1 : value.high() < 0 ? -1 : 0;
  }

  /**
   * Returns a time at which the value vanishes, between two at which it surely has opposite signs.
   */
  double zeroBetween(double from, double to) {
    int signFrom = sign(value(from));
    double near = from;
    double far = to;
    for (int i = 0; i < MOST_HALVINGS; i++) {
      double middle = near + (far - near) / 2;
      if (middle == near || middle == far) {
        break;
      }
      int sign = sign(value(middle));
      if (sign == 0) {
        return middle;
      }
      if (sign == signFrom) {
        near = middle;
      } else {
        far = middle;
      }
    }
    return far;
  }

  /**
   * Returns the first time at which the guard fails, between one where it does not and one where it
   * does.
   */
  double failureBetween(double from, double to) {
    double near = from;
    double far = to;
    for (int i = 0; i < MOST_HALVINGS; i++) {
      double middle = near + (far - near) / 2;
      if (middle == near || middle == far) {
        break;
      }
      if (judge(middle) == Guard.Verdict.FAILS) {
        far = middle;
      } else {
        near = middle;
      }
    }
    return far;
  }

  /**
   * Returns the time near a given one at which the value touches 0 without changing its sign: where
   * its derivative does. Rounding hides the value itself there.
   *
   * @param time where the value cannot be told from 0
   * @param width how far to look at first
   * @param limit how far to look at most
   */
  double touchNear(double time, double width, double limit) {
    for (double h = width; h > 0 && h <= limit; h *= 2) {
      double below = slopeValue.at(time - h);
      double above = slopeValue.at(time + h);
      if (below * above < 0) {
        return slopeZero(time - h, time + h, below);
      }
    }
    return time;
  }

  private double slopeZero(double from, double to, double slopeFrom) {
    double near = from;
    double far = to;
    for (int i = 0; i < MOST_HALVINGS; i++) {
      double middle = near + (far - near) / 2;
      if (middle == near || middle == far) {
        break;
      }
      double value = slopeValue.at(middle);
      if (value == 0) {
        return middle;
      }
      if (value * slopeFrom > 0) {
        near = middle;
      } else {
        far = middle;
      }
    }
    return far;
  }

  /** Tells whether the node has no jump over the range of times last enclosed. */
  boolean isContinuous(Interval times) {
    intervals.enclose(times);
    for (int i = 0; i <= guard.node(); i++) {
      if (tape.varies(i) && mayJump(i)) {
        return false;
      }
    }
    return true;
  }

  private boolean mayJump(int i) {
    return switch (tape.node(i)) {
      case Term.FunctionTerm call ->
          call.function() == Function.SIGN && intervals.of(tape.operand(i, 0)).contains(0);
      case Term.Switch choice -> Branch.of(choice, intervals.of(tape.operand(i, 0))) == Branch.OPEN;
      case Term.Pulse pulse -> !intervals.of(i).isPoint();
      case Term.CurveTerm curve -> curve.curve().jumps() && !intervals.of(i).isPoint();
      default -> false;
    };
  }
}
