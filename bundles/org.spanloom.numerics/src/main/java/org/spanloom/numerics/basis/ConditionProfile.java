/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.basis;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.OptionalDouble;
import java.util.TreeSet;
import java.util.function.DoublePredicate;
import java.util.function.Predicate;
import java.util.function.ToDoubleFunction;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Outcome;
import org.spanloom.numerics.Progress;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.internal.work.Cancelled;
import org.spanloom.numerics.internal.work.Hopeless;
import org.spanloom.numerics.internal.work.Watch;
import org.spanloom.numerics.solution.Solution;

/**
 * How sound a basis is along a range: condition samples at the steps of the method and between
 * them, with the worst ones refined.
 *
 * <p>The raw condition number mixes size and direction of the columns; scaling each to length 1 is
 * within sqrt(n) of the best column scaling (van der Sluis, Numer. Math. 14 (1969) 14; from
 * memory), so the scaled one tells about the directions alone.
 */
public final class ConditionProfile {

  private static final int EVEN = 100;
  private static final int FEWEST_SAMPLES = 40;
  private static final int MOST_SAMPLES = 400;
  private static final double MOST_WORK = 2e9;
  private static final int REFINEMENTS = 24;
  private static final double GOLDEN = (Math.sqrt(5) - 1) / 2;

  private final ConditionMeter meter;
  private final List<ConditionSample> samples;
  private final double startTime;
  private final ConditionSample worstRaw;
  private final ConditionSample worstScaled;

  private ConditionProfile(ConditionMeter meter, List<ConditionSample> samples, double startTime) {
    this.meter = meter;
    this.samples = List.copyOf(samples);
    this.startTime = startTime;
    this.worstRaw = worst(ConditionSample::raw);
    this.worstScaled = worst(ConditionSample::scaled);
  }

  /**
   * Follows the conditioning of a basis.
   *
   * @param system the system
   * @param basis columns that solve the homogeneous system; as many as states, or fewer
   * @param over where to look; bounded and inside the range of the basis
   * @param progress watched and asked while working
   * @return the profile
   */
  public static Outcome<ConditionProfile> of(
      LinearSystem system, Solution basis, TimeRange over, Progress progress) {
    try {
      ConditionMeter meter = new ConditionMeter(system, basis, new Watch(progress));
      List<ConditionSample> samples = new ArrayList<>();
      double[] times = times(basis, over);
      for (int k = 0; k < times.length; k++) {
        addSamples(meter, basis, times[k], samples);
        progress.worked((k + 1.0) / times.length);
      }
      return new Outcome.Solved<>(new ConditionProfile(meter, samples, basis.startTime()));
    } catch (Cancelled cancelled) {
      return new Outcome.Cancelled<>();
    } catch (Hopeless hopeless) {
      return hopeless.outcome();
    }
  }

  /**
   * Takes samples at given times only.
   *
   * @param system the system
   * @param basis columns that solve the homogeneous system
   * @param times times inside the range of the basis, in any order
   * @param progress asked while working
   * @return one sample for each time, in the order given
   */
  public static Outcome<List<ConditionSample>> at(
      LinearSystem system, Solution basis, List<Double> times, Progress progress) {
    try {
      ConditionMeter meter = new ConditionMeter(system, basis, new Watch(progress));
      return new Outcome.Solved<>(times.stream().map(meter::at).toList());
    } catch (Cancelled cancelled) {
      return new Outcome.Cancelled<>();
    } catch (Hopeless hopeless) {
      return hopeless.outcome();
    }
  }

  /**
   * Looks for the time nearest to the start of a basis at which its scaled condition number exceeds
   * a limit; looks no further than that.
   *
   * @param system the system
   * @param basis columns that solve the homogeneous system, given at the first time of the range
   * @param over where to look; bounded and inside the range of the basis
   * @param limit the limit
   * @param progress asked while working
   * @return the time, found to a thousandth of its distance from the start; empty if the limit
   *     holds
   */
  static Outcome<OptionalDouble> firstScaledAbove(
      LinearSystem system, Solution basis, TimeRange over, double limit, Progress progress) {
    try {
      ConditionMeter meter = new ConditionMeter(system, basis, new Watch(progress));
      List<ConditionSample> samples = new ArrayList<>();
      for (double t : times(basis, over)) {
        addSamples(meter, basis, t, samples);
        if (samples.getLast().scaled() > limit) {
          break;
        }
      }
      ConditionProfile profile = new ConditionProfile(meter, samples, basis.startTime());
      return new Outcome.Solved<>(profile.firstScaledAbove(limit));
    } catch (Cancelled cancelled) {
      return new Outcome.Cancelled<>();
    } catch (Hopeless hopeless) {
      return hopeless.outcome();
    }
  }

  /** Adds the sample at a time, and where the basis jumps inside the range the one before it. */
  private static void addSamples(
      ConditionMeter meter, Solution basis, double t, List<ConditionSample> samples) {
    if (!samples.isEmpty() && Arrays.binarySearch(basis.jumpTimes(), t) >= 0) {
      samples.add(meter.at(t, Side.BEFORE));
    }
    samples.add(meter.at(t));
  }

  /**
   * Both ends, the steps of the method thinned out to what the work allows, and an even grid where
   * there are none: a time between steps costs more than one at a step.
   */
  private static double[] times(Solution basis, TimeRange over) {
    if (over.length() == 0) {
      return new double[] {over.start()};
    }
    double cost = 40.0 * Math.pow(Math.max(1, basis.dimension()), 3);
    int most = (int) Math.clamp(MOST_WORK / cost, FEWEST_SAMPLES, MOST_SAMPLES);
    int even = Math.min(EVEN, most / 2);
    double[] nodes = Arrays.stream(basis.nodes()).filter(over::contains).toArray();
    TreeSet<Double> times = new TreeSet<>(List.of(over.start(), over.end()));
    int stride = 1 + nodes.length / (most - even);
    for (int k = 0; k < nodes.length; k += stride) {
      times.add(nodes[k]);
    }
    double[] jumps = Arrays.stream(basis.jumpTimes()).filter(over::contains).toArray();
    for (int k = 0; k < jumps.length; k += 1 + jumps.length / most) {
      times.add(jumps[k]);
    }
    for (int cell = 0; cell < even; cell++) {
      double from = over.start() + over.length() * (cell / (double) even);
      double to = over.start() + over.length() * ((cell + 1.0) / even);
      if (times.subSet(from, false, to, false).isEmpty()) {
        times.add(nearestInside(nodes, from, to));
      }
    }
    return times.stream().mapToDouble(Double::doubleValue).toArray();
  }

  /** Returns a node between two times, or their middle when there is none. */
  private static double nearestInside(double[] nodes, double from, double to) {
    int found = Arrays.binarySearch(nodes, from);
    int next = found >= 0 ? found + 1 : -found - 1;
    return next < nodes.length && nodes[next] < to ? nodes[next] : from + (to - from) / 2;
  }

  /** Returns the samples by time. */
  public List<ConditionSample> samples() {
    return samples;
  }

  /**
   * Returns the sample of the largest raw condition number; where it is infinite, the one nearest
   * to the start.
   */
  public ConditionSample worstRaw() {
    return worstRaw;
  }

  /**
   * Returns the sample of the largest scaled condition number; where it is infinite, the one
   * nearest to the start.
   */
  public ConditionSample worstScaled() {
    return worstScaled;
  }

  private ConditionSample worst(ToDoubleFunction<ConditionSample> measure) {
    Comparator<ConditionSample> bySize = Comparator.comparingDouble(measure);
    Comparator<ConditionSample> byDistance =
        Comparator.comparingDouble(s -> -Math.abs(s.time() - startTime));
    ConditionSample largest = samples.stream().max(bySize.thenComparing(byDistance)).orElseThrow();
    if (Double.isInfinite(measure.applyAsDouble(largest))) {
      return largest;
    }
    int k = samples.indexOf(largest);
    double a = samples.get(Math.max(0, k - 1)).time();
    double b = samples.get(Math.min(samples.size() - 1, k + 1)).time();
    if (b - a <= resolution(largest.time())) {
      return largest;
    }
    ConditionSample c = meter.at(b - GOLDEN * (b - a));
    ConditionSample d = meter.at(a + GOLDEN * (b - a));
    for (int step = 0; step < REFINEMENTS && b - a > resolution(largest.time()); step++) {
      if (measure.applyAsDouble(c) > measure.applyAsDouble(d)) {
        b = d.time();
        d = c;
        c = meter.at(b - GOLDEN * (b - a));
      } else {
        a = c.time();
        c = d;
        d = meter.at(a + GOLDEN * (b - a));
      }
    }
    return List.of(largest, c, d).stream().max(bySize).orElseThrow();
  }

  /**
   * Times are found to a thousandth of the time since the start, where transients are short, or of
   * a millionth of the range.
   */
  private double resolution(double t) {
    double length = samples.getLast().time() - samples.getFirst().time();
    return 1e-3 * Math.max(Math.abs(t - startTime), 1e-6 * length);
  }

  /** Returns the time nearest to the start at which the scaled condition number exceeds a limit. */
  public OptionalDouble firstScaledAbove(double limit) {
    return first(t -> meter.at(t).scaled() > limit, s -> s.scaled() > limit);
  }

  /** Returns the time nearest to the start at which the raw condition number exceeds a limit. */
  public OptionalDouble firstRawAbove(double limit) {
    return first(t -> meter.at(t).raw() > limit, s -> s.raw() > limit);
  }

  /** Returns the time nearest to the start at which fewer decimal digits than wanted are left. */
  public OptionalDouble firstDigitsBelow(double wanted) {
    return first(t -> meter.at(t).digitsLeft() < wanted, s -> s.digitsLeft() < wanted);
  }

  private OptionalDouble first(DoublePredicate crossedAt, Predicate<ConditionSample> crossed) {
    OptionalDouble nearest =
        samples.stream()
            .filter(crossed)
            .mapToDouble(ConditionSample::time)
            .boxed()
            .min(Comparator.comparingDouble(t -> Math.abs(t - startTime)))
            .map(OptionalDouble::of)
            .orElse(OptionalDouble.empty());
    if (nearest.isEmpty()) {
      return nearest;
    }
    double beyond = nearest.getAsDouble();
    boolean later = beyond >= startTime;
    double before =
        samples.stream()
            .mapToDouble(ConditionSample::time)
            .filter(t -> later ? t < beyond && t >= startTime : t > beyond && t <= startTime)
            .boxed()
            .min(Comparator.comparingDouble(t -> Math.abs(t - beyond)))
            .orElse(beyond);
    return OptionalDouble.of(refined(crossedAt, before, beyond));
  }

  /** Halves until the crossing is found well enough, or until nobody waits for it any more. */
  private double refined(DoublePredicate crossedAt, double uncrossed, double crossed) {
    double before = uncrossed;
    double after = crossed;
    try {
      for (int step = 0;
          step < REFINEMENTS && Math.abs(after - before) > resolution(before);
          step++) {
        double middle = before + (after - before) / 2;
        if (crossedAt.test(middle)) {
          after = middle;
        } else {
          before = middle;
        }
      }
    } catch (Cancelled cancelled) {
      return after;
    }
    return after;
  }
}
