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
import java.util.function.ToDoubleFunction;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Outcome;
import org.spanloom.numerics.Outcome.Reason;
import org.spanloom.numerics.Progress;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.internal.work.Cancelled;
import org.spanloom.numerics.internal.work.Hopeless;
import org.spanloom.numerics.internal.work.Watch;
import org.spanloom.numerics.solution.Solution;

/**
 * How sound a basis is along a range: samples at the solver's nodes and in between.
 *
 * <p>Immutable; the questions for single times look at the basis again.
 */
public final class ConditionProfile {

  /**
   * Work for all samples, in floating point operations; it bounds their number where there are many
   * states.
   */
  private static final double MOST_WORK = 4e9;

  private static final int MOST_SAMPLES = 400;
  private static final int FEWEST_SAMPLES = 40;

  /**
   * The time of a maximum or a crossing is found to this share of the range, or of the time since
   * its start if that is finer.
   */
  private static final double TIME_SHARE = 1e-3;

  private final LinearSystem system;
  private final Solution basis;
  private final TimeRange over;
  private final double startLog;
  private final List<ConditionSample> samples;

  private ConditionProfile(
      LinearSystem system,
      Solution basis,
      TimeRange over,
      double startLog,
      List<ConditionSample> samples) {
    this.system = system;
    this.basis = basis;
    this.over = over;
    this.startLog = startLog;
    this.samples = List.copyOf(samples);
  }

  /**
   * Samples a basis.
   *
   * @param system the system that the columns solve
   * @param basis the columns, at least one and at most as many as states
   * @param over bounded part of the basis' range to look at
   * @param progress watched and asked while working
   * @return the samples, at most 400, or why there are none
   */
  public static Outcome<ConditionProfile> of(
      LinearSystem system, Solution basis, TimeRange over, Progress progress) {
    if (!basis.range().contains(over.start()) || !basis.range().contains(over.end())) {
      return new Outcome.Unsolved<>(
          Reason.RANGE,
          over.start(),
          "the basis is known from " + basis.range().start() + " to " + basis.range().end());
    }
    if (basis.columns() < 1 || basis.columns() > basis.dimension()) {
      return new Outcome.Unsolved<>(
          Reason.RANGE,
          over.start(),
          basis.columns() + " columns cannot be a basis of " + basis.dimension() + " states");
    }
    try {
      return new Outcome.Solved<>(sampled(system, basis, over, new Watch(progress)));
    } catch (Cancelled cancelled) {
      return new Outcome.Cancelled<>();
    } catch (Hopeless hopeless) {
      return hopeless.outcome();
    }
  }

  private static ConditionProfile sampled(
      LinearSystem system, Solution basis, TimeRange over, Watch watch) {
    TraceIntegral trace = new TraceIntegral(system, watch);
    double t0 = basis.startTime();
    double startLog = new BasisAt(basis, t0).determinant().log();
    double[] times = chooseTimes(basis, over);
    List<ConditionSample> samples = new ArrayList<>();
    double integral = trace.between(t0, times[0]);
    for (int k = 0; k < times.length; k++) {
      watch.ask();
      integral += k == 0 ? 0 : trace.between(times[k - 1], times[k]);
      samples.add(new BasisAt(basis, times[k]).sample(times[k], startLog + integral));
      watch.worked((k + 1.0) / times.length);
    }
    return new ConditionProfile(system, basis, over, startLog, samples);
  }

  /** Nodes of the solver where it has them, an even grid where it has none, both ends. */
  private static double[] chooseTimes(Solution basis, TimeRange over) {
    if (over.length() == 0) {
      return new double[] {over.start()};
    }
    double n = basis.dimension();
    int count = (int) Math.clamp(MOST_WORK / (60 * n * n * n), FEWEST_SAMPLES, MOST_SAMPLES);
    double[] nodes =
        Arrays.stream(basis.nodes()).filter(t -> t > over.start() && t < over.end()).toArray();
    TreeSet<Double> times = new TreeSet<>();
    times.add(over.start());
    times.add(over.end());
    int stride = Math.max(1, (int) Math.ceil(nodes.length / (count / 2.0 - 1)));
    for (int k = 0; k < nodes.length; k += stride) {
      times.add(nodes[k]);
    }
    int cells = count / 2 - 1;
    for (int cell = 0; cell < cells; cell++) {
      double from = over.start() + over.length() * (cell / (double) cells);
      double to = over.start() + over.length() * ((cell + 1.0) / cells);
      if (times.subSet(from, true, to, true).isEmpty()) {
        int next = Arrays.binarySearch(nodes, from);
        int index = next >= 0 ? next : -next - 1;
        times.add(
            index < nodes.length && nodes[index] <= to ? nodes[index] : from + (to - from) / 2);
      }
    }
    return times.stream().mapToDouble(Double::doubleValue).toArray();
  }

  /** Returns the samples in the order of time, at least one. */
  public List<ConditionSample> samples() {
    return samples;
  }

  /** Returns the part of the range that was looked at. */
  public TimeRange over() {
    return over;
  }

  /**
   * Looks at another time.
   *
   * @param t time inside {@link #over()}
   */
  public ConditionSample at(double t) {
    if (!over.contains(t)) {
      throw new IllegalArgumentException("time " + t + " is outside " + over);
    }
    double integral = new TraceIntegral(system, Watch.NONE).between(basis.startTime(), t);
    return new BasisAt(basis, t).sample(t, startLog + integral);
  }

  /** Returns where the raw condition number is largest; the first such time when it is infinite. */
  public ConditionSample worstRaw() {
    return worst(ConditionSample::raw);
  }

  /**
   * Returns where the scaled condition number is largest; the first such time when it is infinite.
   */
  public ConditionSample worstScaled() {
    return worst(ConditionSample::scaled);
  }

  /**
   * Returns the first time at which the scaled condition number exceeds a limit; empty when it
   * never does.
   */
  public OptionalDouble firstScaledAbove(double limit) {
    return firstAbove(limit, ConditionSample::scaled);
  }

  /**
   * Returns the first time at which the raw condition number exceeds a limit; empty when it never
   * does.
   */
  public OptionalDouble firstRawAbove(double limit) {
    return firstAbove(limit, ConditionSample::raw);
  }

  private ConditionSample worst(ToDoubleFunction<ConditionSample> measure) {
    int k = 0;
    for (int i = 1; i < samples.size(); i++) {
      if (measure.applyAsDouble(samples.get(i)) > measure.applyAsDouble(samples.get(k))) {
        k = i;
      }
    }
    ConditionSample best = samples.get(k);
    double left = samples.get(Math.max(k - 1, 0)).time();
    double right = samples.get(Math.min(k + 1, samples.size() - 1)).time();
    // Where nothing but noise is left, a finer search would only find another piece of noise.
    while (!best.beyondResolution() && right - left > resolution(best.time())) {
      boolean probeLeft = best.time() - left > right - best.time();
      double t =
          probeLeft
              ? best.time() - 0.4 * (best.time() - left)
              : best.time() + 0.4 * (right - best.time());
      if (t == best.time() || t <= left || t >= right) {
        break;
      }
      ConditionSample other = at(t);
      boolean better = measure.applyAsDouble(other) > measure.applyAsDouble(best);
      double edge = better ? best.time() : t;
      if (probeLeft == better) {
        right = edge;
      } else {
        left = edge;
      }
      best = better ? other : best;
    }
    return best;
  }

  private OptionalDouble firstAbove(double limit, ToDoubleFunction<ConditionSample> measure) {
    for (int k = 0; k < samples.size(); k++) {
      if (!(measure.applyAsDouble(samples.get(k)) > limit)) {
        continue;
      }
      if (k == 0) {
        return OptionalDouble.of(samples.get(0).time());
      }
      double below = samples.get(k - 1).time();
      double above = samples.get(k).time();
      while (above - below > resolution(below)) {
        double middle = below + (above - below) / 2;
        if (middle == below || middle == above) {
          break;
        }
        if (measure.applyAsDouble(at(middle)) > limit) {
          above = middle;
        } else {
          below = middle;
        }
      }
      return OptionalDouble.of(above);
    }
    return OptionalDouble.empty();
  }

  private double resolution(double t) {
    double sinceStart = Math.abs(t - basis.startTime());
    double finest = 1e-9 * over.length();
    return TIME_SHARE * Math.clamp(sinceStart, Math.min(finest, over.length()), over.length());
  }

  /** Returns the sample nearest to a time. */
  public ConditionSample nearest(double t) {
    return samples.stream()
        .min(Comparator.comparingDouble(sample -> Math.abs(sample.time() - t)))
        .orElseThrow();
  }
}
