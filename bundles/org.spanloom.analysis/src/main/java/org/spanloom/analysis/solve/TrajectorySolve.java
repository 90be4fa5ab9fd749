/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.solve;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.stream.DoubleStream;
import java.util.stream.IntStream;
import org.spanloom.analysis.coefficients.CompiledSystem;
import org.spanloom.language.model.InitialValues;
import org.spanloom.language.model.TimeInterval;
import org.spanloom.numerics.Outcome;
import org.spanloom.numerics.Progress;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.solution.MethodChoice;
import org.spanloom.numerics.solution.Solution;
import org.spanloom.numerics.solution.SolutionSolver;

/** Solves an initial value problem of a model and lists the solution. */
public final class TrajectorySolve {

  private TrajectorySolve() {}

  /**
   * Solves.
   *
   * @param request what to solve
   * @param progress watched and asked while working
   * @return the table, or why there is none
   */
  public static SolveAnswer solve(SolveRequest request, Progress progress) {
    try {
      return answer(request, progress);
    } catch (Choice.RefusedException refused) {
      return new SolveAnswer.Refused(refused.isUsage(), refused.getMessage());
    }
  }

  private static SolveAnswer answer(SolveRequest request, Progress progress)
      throws Choice.RefusedException {
    CompiledSystem system = Choice.system(request.model(), request.system(), request.parameters());
    InitialValues initial = initial(system, request.initial());
    double accuracy = Choice.accuracy(request.accuracy(), system);
    Optional<MethodChoice> method = MethodNames.read(request.method());
    double t0 = system.time(initial.time());
    double[] times = times(request, system, t0);
    Listing.checkSize(
        (long) times.length * (1 + system.dimension() + system.model().outputs().size()));
    double first = Math.min(t0, Arrays.stream(times).min().orElse(t0));
    double last = Math.max(t0, Arrays.stream(times).max().orElse(t0));
    Outcome<Solution> outcome =
        SolutionSolver.trajectory(
            system.linear(),
            t0,
            system.values(initial),
            new TimeRange(first, last),
            system.accuracy(accuracy),
            method,
            progress);
    return switch (outcome) {
      case Outcome.Solved<Solution> s ->
          new SolveAnswer.Solved(
              Listing.table(
                  system,
                  initial.name(),
                  s.value(),
                  listed(request.sampling(), times, s.value()),
                  request.sampling() instanceof Sampling.Curve,
                  accuracy));
      case Outcome.Cancelled<Solution> c -> new SolveAnswer.Cancelled();
      case Outcome.Unsolved<Solution> u -> new SolveAnswer.Refused(false, Refusals.text(system, u));
    };
  }

  /** Picks initial values: those named, else those of the declarations, else the only ones. */
  static InitialValues initial(CompiledSystem system, Optional<String> wanted)
      throws Choice.RefusedException {
    List<InitialValues> all = system.model().initialValues();
    if (all.isEmpty()) {
      throw new Choice.RefusedException(
          false,
          "system "
              + system.model().name()
              + " has no complete set of initial values; give each state one, as in 'state x ="
              + " 1'.");
    }
    if (wanted.isEmpty() && all.getFirst().name().isEmpty()) {
      return all.getFirst();
    }
    return Choice.pick(
        "initial values", all, InitialValues::name, wanted, "system " + system.model().name());
  }

  private static double[] times(SolveRequest request, CompiledSystem system, double t0)
      throws Choice.RefusedException {
    if (request.sampling() instanceof Sampling.At at) {
      return Listing.named(system, at);
    }
    TimeInterval interval = system.model().interval();
    boolean startsAtInitial = interval.startOpen() || !Double.isFinite(interval.start());
    double from =
        request.from().isEmpty() && startsAtInitial
            ? t0
            : Choice.end(system, request.from(), interval.start(), false, Choice.End.START);
    double until =
        Choice.end(system, request.until(), interval.end(), interval.endOpen(), Choice.End.STOP);
    if (from > until) {
      throw new Choice.RefusedException(
          true,
          "the range from " + Choice.number(from) + " to " + Choice.number(until) + " is empty.");
    }
    return Listing.even(request.sampling(), from, until, 1L + system.dimension());
  }

  private static double[] listed(Sampling sampling, double[] times, Solution solution) {
    if (!(sampling instanceof Sampling.Curve curve)) {
      return times;
    }
    double first = times[0];
    double last = times[times.length - 1];
    double[] nodes = Arrays.stream(solution.nodes()).filter(t -> first <= t && t <= last).toArray();
    int stride = 1 + nodes.length / Math.max(1, curve.most() - times.length);
    DoubleStream some =
        IntStream.range(0, nodes.length).filter(i -> i % stride == 0).mapToDouble(i -> nodes[i]);
    // A time of a jump stands there twice, for the value before and the one after it.
    double[] jumps =
        Arrays.stream(solution.jumpTimes())
            .filter(t -> first < t && t <= last)
            .limit(curve.most())
            .toArray();
    double[] single =
        DoubleStream.concat(Arrays.stream(times), DoubleStream.concat(some, Arrays.stream(jumps)))
            .distinct()
            .toArray();
    return DoubleStream.concat(Arrays.stream(single), Arrays.stream(jumps)).sorted().toArray();
  }
}
