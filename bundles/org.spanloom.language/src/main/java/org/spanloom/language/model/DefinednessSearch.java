/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.spanloom.language.units.UnitOfMeasure;

/**
 * Looks from a start to both sides for the nearest time at which a guard of a term fails.
 *
 * <p>A range of times over which every guard holds by interval arithmetic is done with; one over
 * which some guard fails ends the search; any other is halved, the half nearer to the start first.
 * A range as short as the resolution is settled by what happens at its ends: a change of sign, a
 * value that cannot be told from 0, a failure. What then still is open is halved on down to
 * neighbouring numbers.
 */
final class DefinednessSearch {

  /**
   * Ranges of times looked at on one side before the question is left open: at most and, in large
   * terms, at least.
   */
  private static final int MOST_RANGES = 5000;

  private static final int FEWEST_RANGES = 100;

  /** Nodes looked at on one side, some 0.1 s of work. */
  private static final int MOST_NODES = 500_000;

  private static final double RESOLUTION = 1e-9;
  private static final double FINEST = 1e-17;

  /** A value this much smaller than those at the resolution's distance on both sides is a zero. */
  private static final double VANISHING = 1e-6;

  private static final MathContext SHOWN = new MathContext(12);

  private static final String SPENT =
      "the other expressions of the system took up the work that is spent on this";

  private final TermTape tape;
  private final SearchBudget budget;
  private final TermIntervals intervals;
  private final Liveness liveness;
  private final TermEvaluator value;
  private final double[] constants;
  private final List<Guard> guards = new ArrayList<>();
  private final Map<Guard, GuardProbe> probes = new HashMap<>();
  private final TimeInterval interval;
  private final UnitOfMeasure timeUnit;
  private final double first;
  private final double last;
  private final double origin;
  private final double unitOfLength;

  DefinednessSearch(
      TermTape tape,
      TimeInterval interval,
      UnitOfMeasure timeUnit,
      double start,
      SearchBudget budget) {
    this.tape = tape;
    this.budget = budget;
    budget.spend(4L * tape.size());
    this.intervals = new TermIntervals(tape);
    this.liveness = new Liveness(tape);
    this.value = TermEvaluator.of(tape);
    this.constants = value.constants();
    this.interval = interval;
    this.timeUnit = timeUnit;
    this.first = timeUnit.toBase(interval.start());
    this.last = timeUnit.toBase(interval.end());
    this.unitOfLength = interval.isBounded() ? last - first : timeUnit.factor();
    this.origin = inside(timeUnit.toBase(start));
  }

  /** What a search to one side came to. */
  private sealed interface Finding {}

  private record Clear() implements Finding {}

  private record Fault(double time, Guard guard, Definedness.Cause cause) implements Finding {}

  private record Open(double time, Guard guard, String reason) implements Finding {}

  private record Range(double near, double far) {
    Interval times() {
      return new Interval(Math.min(near, far), Math.max(near, far));
    }

    double length() {
      return Math.abs(far - near);
    }
  }

  Definedness result() {
    if (!(first <= last)) {
      return new Definedness.Defined();
    }
    for (Guard guard : Guard.of(tape)) {
      if (tape.varies(guard.node())
          || tape.varies(guard.owner()) && guard.kind() == Guard.Kind.POWER) {
        guards.add(guard);
      } else if (failsAlways(guard) && mayBeAvoided(guard)) {
        guards.add(guard);
      } else if (failsAlways(guard)) {
        double at = shown(origin);
        return new Definedness.Undefined(
            at, plainCause(guard), tape.node(guard.shown()), true, at, at);
      }
    }
    int root = tape.size() - 1;
    if (!tape.varies(root)) {
      double at = shown(origin);
      return Double.isFinite(value.at(origin))
          ? new Definedness.Defined()
          : new Definedness.Undefined(
              at, Definedness.Cause.OVERFLOW, tape.node(root), true, at, at);
    }
    if (interval.isBounded()) {
      guards.add(new Guard(Guard.Kind.FINITE, root, root, root));
    }
    Finding right = guards.isEmpty() ? new Clear() : search(origin, last, interval.endOpen());
    Finding left =
        guards.isEmpty() || origin == first
            ? new Clear()
            : search(origin, first, interval.startOpen());
    return combined(left, right);
  }

  /** Tells whether a guard stands in a branch that is not always taken. */
  private boolean mayBeAvoided(Guard guard) {
    intervals.enclose(new Interval(first, last));
    liveness.update(intervals);
    return !liveness.matters(guard);
  }

  private boolean failsAlways(Guard guard) {
    double x = constants[guard.node()];
    Interval exponent = GuardProbe.exponent(guard, intervals);
    return Double.isNaN(x) || guard.judge(Interval.at(x), exponent) == Guard.Verdict.FAILS;
  }

  private Definedness combined(Finding left, Finding right) {
    if (left instanceof Fault || right instanceof Fault) {
      Fault nearest = nearer(left, right);
      double from = end(left, interval.start());
      double to = end(right, interval.end());
      boolean atOrigin = nearest.time() == origin;
      double time = shown(nearest.time());
      return new Definedness.Undefined(
          time,
          nearest.cause(),
          tape.node(nearest.guard().shown()),
          false,
          atOrigin ? time : from,
          atOrigin ? time : to);
    }
    if (right instanceof Open open) {
      return new Definedness.Undecided(
          shown(open.time()), tape.node(open.guard().shown()), open.reason());
    }
    if (left instanceof Open open) {
      return new Definedness.Undecided(
          shown(open.time()), tape.node(open.guard().shown()), open.reason());
    }
    return new Definedness.Defined();
  }

  private Fault nearer(Finding left, Finding right) {
    if (left instanceof Fault a && right instanceof Fault b) {
      return Math.abs(a.time() - origin) < Math.abs(b.time() - origin) ? a : b;
    }
    return left instanceof Fault a ? a : (Fault) right;
  }

  private double end(Finding finding, double declared) {
    return switch (finding) {
      case Clear clear -> declared;
      case Fault fault -> shown(fault.time());
      case Open open -> shown(open.time());
    };
  }

  private Finding search(double from, double end, boolean endOpen) {
    int patience = Math.clamp(MOST_NODES / tape.size(), FEWEST_RANGES, MOST_RANGES);
    Deque<Range> ranges = new ArrayDeque<>();
    ranges.push(new Range(from, end));
    for (int work = 0; !ranges.isEmpty(); work++) {
      Range range = ranges.pop();
      budget.spend(tape.size());
      Optional<Guard> doubtful = firstInDoubt(range);
      if (doubtful.isEmpty()) {
        continue;
      }
      Guard guard = doubtful.get();
      if (budget.isSpent()) {
        return new Open(range.near(), guard, SPENT);
      }
      if (work >= patience) {
        return new Open(range.near(), guard, "bounds on its values are too wide to tell");
      }
      if (judged(guard) == Guard.Verdict.FAILS && liveness.matters(guard)) {
        return fault(range.near(), guard);
      }
      boolean endsOpen = endOpen && range.far() == end;
      if (range.length() <= resolution(range.near())) {
        Finding settled = settle(range, endsOpen, guard);
        if (!(settled instanceof Clear)) {
          return settled;
        }
        if (!mustHalve(range, endsOpen)) {
          continue;
        }
      }
      double middle = middle(range);
      if (middle == range.near() || middle == range.far() || Double.isInfinite(middle)) {
        if (Double.isInfinite(range.far())) {
          return new Open(
              range.near(), guard, "it is not bounded away from the limit as time grows");
        }
        continue;
      }
      ranges.push(new Range(middle, range.far()));
      ranges.push(new Range(range.near(), middle));
    }
    return new Clear();
  }

  private double resolution(double near) {
    double length =
        interval.isBounded() ? unitOfLength : Math.max(unitOfLength, Math.abs(near - origin));
    return RESOLUTION * length;
  }

  private double middle(Range range) {
    if (Double.isInfinite(range.far())) {
      double step = Math.max(unitOfLength, Math.abs(range.near() - origin));
      return range.near() + Math.copySign(step, range.far());
    }
    return range.near() + (range.far() - range.near()) / 2;
  }

  /**
   * Returns the first guard that does not surely hold, with the enclosures left as they are over
   * the range.
   */
  private Optional<Guard> firstInDoubt(Range range) {
    Interval times = range.times();
    intervals.enclose(times);
    liveness.update(intervals);
    Map<Integer, Interval> known = new HashMap<>();
    for (Guard guard : guards) {
      if (!liveness.mayMatter(guard)) {
        continue;
      }
      Guard.Verdict verdict = judged(guard);
      if (verdict == Guard.Verdict.OPEN && times.isBounded() && guard.kind() != Guard.Kind.FINITE) {
        GuardProbe probe = probe(guard);
        if (probe.isContinuous(times)) {
          known.merge(guard.node(), probe.sharper(times), Interval::intersect);
        }
        intervals.enclose(times);
        known.forEach((node, better) -> intervals.narrow(node, better, times));
        verdict = judged(guard);
      }
      if (verdict != Guard.Verdict.HOLDS) {
        return Optional.of(guard);
      }
    }
    return Optional.empty();
  }

  private Guard.Verdict judged(Guard guard) {
    return guard.judge(intervals.of(guard.node()), GuardProbe.exponent(guard, intervals));
  }

  private GuardProbe probe(Guard guard) {
    return probes.computeIfAbsent(guard, g -> new GuardProbe(g, tape, intervals));
  }

  /**
   * Says what the ends of a range as short as the resolution show; clear where they show no fault.
   */
  private Finding settle(Range range, boolean endOpen, Guard guard) {
    if (guard.kind() == Guard.Kind.FINITE) {
      return settleSize(range, endOpen, guard);
    }
    double inner = endOpen ? beforeEnd(range) : range.far();
    GuardProbe probe = probe(guard);
    intervals.enclose(range.times());
    return guard.avoidsZero(GuardProbe.exponent(guard, intervals))
        ? settleZero(range, inner, endOpen, guard, probe)
        : settleBound(range, inner, endOpen, guard, probe);
  }

  private Finding settleZero(
      Range range, double inner, boolean endOpen, Guard guard, GuardProbe probe) {
    Interval atNear = probe.value(range.near());
    Interval atInner = probe.value(inner);
    if (isZero(atNear)) {
      return fault(range.near(), guard);
    }
    int near = GuardProbe.sign(atNear);
    int far = GuardProbe.sign(atInner);
    if (near * far < 0) {
      return probe.isContinuous(range.times())
          ? fault(probe.zeroBetween(range.near(), inner), guard)
          : new Clear();
    }
    if (isZero(atInner)) {
      return fault(inner, guard);
    }
    if (endOpen) {
      return new Clear();
    }
    return near == 0 || far == 0
        ? fault(touch(range, near == 0 ? range.near() : inner, probe), guard)
        : settleTouch(range, guard, probe);
  }

  private Finding settleBound(
      Range range, double inner, boolean endOpen, Guard guard, GuardProbe probe) {
    Guard.Verdict near = probe.judge(range.near());
    if (near == Guard.Verdict.FAILS) {
      return fault(range.near(), guard);
    }
    Guard.Verdict far = probe.judge(inner);
    if (far == Guard.Verdict.FAILS) {
      return fault(probe.failureBetween(range.near(), inner), guard);
    }
    if (endOpen) {
      return new Clear();
    }
    boolean bothHold = near == Guard.Verdict.HOLDS && far == Guard.Verdict.HOLDS;
    if (guard.kind() == Guard.Kind.LOGARITHM) {
      return bothHold
          ? settleTouch(range, guard, probe)
          : fault(touch(range, near == Guard.Verdict.OPEN ? range.near() : inner, probe), guard);
    }
    if (bothHold) {
      return new Clear();
    }
    return new Open(range.near(), guard, "it meets its limit as nearly as can be computed");
  }

  private double touch(Range range, double doubtful, GuardProbe probe) {
    return probe.touchNear(doubtful, range.length(), 1e5 * resolution(range.near()));
  }

  /** Finds a zero between two values of equal sign, such as that of {@code abs(t)}. */
  private Finding settleTouch(Range range, Guard guard, GuardProbe probe) {
    Interval times = range.times();
    double middle = times.low() + range.length() / 2;
    double least = probe.touchNear(middle, range.length() / 2, range.length());
    double size = Math.abs(TermEvaluator.of(tape.node(guard.node())).at(least));
    double around =
        probe.value(range.near()).absolute().hull(probe.value(range.far()).absolute()).high();
    boolean vanishes = times.contains(least) && size <= VANISHING * around;
    return vanishes ? fault(least, guard) : new Clear();
  }

  private Finding settleSize(Range range, boolean endOpen, Guard guard) {
    double inner = endOpen ? beforeEnd(range) : range.far();
    if (!Double.isFinite(value.at(range.near()))) {
      return fault(range.near(), guard);
    }
    if (!Double.isFinite(value.at(inner))) {
      double near = range.near();
      double far = inner;
      for (double middle = (near + far) / 2;
          middle != near && middle != far;
          middle = near + (far - near) / 2) {
        if (Double.isFinite(value.at(middle))) {
          near = middle;
        } else {
          far = middle;
        }
      }
      return fault(far, guard);
    }
    return new Clear();
  }

  /** Tells whether a short range whose ends show no fault is looked at more closely. */
  private boolean mustHalve(Range range, boolean endOpen) {
    double size = Math.max(Math.abs(range.near()), Math.abs(range.far()));
    return !endOpen && range.length() > Math.max(4 * Math.ulp(size), FINEST * unitOfLength);
  }

  private static double beforeEnd(Range range) {
    return range.near() + (range.far() - range.near()) * (1 - 0x1p-20);
  }

  private static boolean isZero(Interval value) {
    return value.low() == 0 && value.high() == 0;
  }

  private Fault fault(double time, Guard guard) {
    return new Fault(time, guard, cause(time, guard));
  }

  private static Definedness.Cause plainCause(Guard guard) {
    return switch (guard.kind()) {
      case DIVISOR -> Definedness.Cause.POLE;
      case TANGENT -> Definedness.Cause.TANGENT;
      case LOGARITHM -> Definedness.Cause.LOGARITHM;
      case ROOT -> Definedness.Cause.ROOT;
      case INVERSE -> Definedness.Cause.INVERSE;
      case POWER -> Definedness.Cause.POWER;
      case FINITE -> Definedness.Cause.OVERFLOW;
    };
  }

  private Definedness.Cause cause(double time, Guard guard) {
    return guard.kind() == Guard.Kind.DIVISOR && isGap(time, guard)
        ? Definedness.Cause.GAP
        : plainCause(guard);
  }

  /**
   * Tells whether the dividend vanishes with the divisor and the quotient stays bounded on the way
   * there.
   */
  private boolean isGap(double time, Guard guard) {
    double room = Math.max(4 * Math.ulp(time), 1e-12 * unitOfLength);
    intervals.enclose(new Interval(time - room, time + room));
    if (!intervals.of(tape.operand(guard.owner(), 0)).contains(0)) {
      return false;
    }
    TermEvaluator quotient = TermEvaluator.of(tape.node(guard.owner()));
    double scale = 1e-4 * unitOfLength;
    for (int side : new int[] {-1, 1}) {
      double farther = time + side * scale;
      if (farther >= first && farther <= last) {
        double far = Math.abs(quotient.at(farther));
        double near = Math.abs(quotient.at(time + side * scale / 100));
        if (!(near <= 2 * far + Double.MIN_NORMAL)) {
          return false;
        }
      }
    }
    return true;
  }

  /** Moves the start into the interval, off an open end. */
  private double inside(double start) {
    double time = Double.isNaN(start) ? first : Math.max(first, Math.min(start, last));
    boolean onOpenEnd = time == first && interval.startOpen() || time == last && interval.endOpen();
    if (!onOpenEnd && Double.isFinite(time)) {
      return time;
    }
    if (interval.isBounded()) {
      return first + (last - first) / 2;
    }
    if (Double.isFinite(first)) {
      return first + unitOfLength;
    }
    return Double.isFinite(last) ? last - unitOfLength : 0;
  }

  /** Returns a time in its unit, without digits beyond those that were found. */
  private double shown(double time) {
    double exact = timeUnit.fromBase(time);
    if (!Double.isFinite(exact)) {
      return exact;
    }
    double rounded = new BigDecimal(exact).round(SHOWN).doubleValue();
    return Math.abs(rounded - exact) <= RESOLUTION * unitOfLength / timeUnit.factor()
        ? rounded
        : exact;
  }
}
