/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.solve;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.stream.DoubleStream;
import java.util.stream.IntStream;
import org.spanloom.analysis.Reached;
import org.spanloom.analysis.coefficients.AffineEvaluator;
import org.spanloom.analysis.coefficients.CompiledSystem;
import org.spanloom.language.model.InitialValues;
import org.spanloom.language.model.Output;
import org.spanloom.language.model.StateComponent;
import org.spanloom.language.model.TimeInterval;
import org.spanloom.numerics.Outcome;
import org.spanloom.numerics.Progress;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.solution.Solution;
import org.spanloom.numerics.solution.SolutionSolver;

/** Solves an initial value problem of a model and lists the solution. */
public final class TrajectorySolve {

  /** Most numbers in a table; about 400 MB with their errors. */
  public static final int MOST_NUMBERS = 25_000_000;

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
    double accuracy = request.accuracy().orElse(system.model().accuracy());
    if (!(accuracy > 0 && accuracy < 1)) {
      throw new Choice.RefusedException(
          true, "the accuracy must be a number between 0 and 1, for example 1e-8.");
    }
    double t0 = system.time(initial.time());
    double[] times = times(request, system, t0);
    checkSize((long) times.length * (1 + system.dimension() + system.model().outputs().size()));
    double first = Math.min(t0, Arrays.stream(times).min().orElse(t0));
    double last = Math.max(t0, Arrays.stream(times).max().orElse(t0));
    Outcome<Solution> outcome =
        SolutionSolver.trajectory(
            system.linear(),
            t0,
            system.values(initial),
            new TimeRange(first, last),
            system.accuracy(accuracy),
            progress);
    return switch (outcome) {
      case Outcome.Solved<Solution> s ->
          new SolveAnswer.Solved(
              table(
                  system,
                  initial,
                  s.value(),
                  listed(request.sampling(), times, s.value()),
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
              + " has no complete set of initial values; give each state one, as in 'state x = 1'.");
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
      if (at.times().isEmpty()) {
        throw new Choice.RefusedException(true, "no time was given; name at least one.");
      }
      double[] times = new double[at.times().size()];
      for (int i = 0; i < times.length; i++) {
        times[i] = Choice.inside(system, at.times().get(i));
      }
      return times;
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
    int count =
        switch (request.sampling()) {
          case Sampling.Even even -> even.count();
          case Sampling.Curve curve -> curve.count();
          case Sampling.At at -> at.times().size();
        };
    if (count < 2) {
      throw new Choice.RefusedException(true, "at least 2 points are needed, not " + count + ".");
    }
    checkSize((long) count * (1 + system.dimension()));
    double[] times = new double[count];
    for (int i = 0; i < count; i++) {
      double share = (double) i / (count - 1);
      times[i] = i == count - 1 ? until : from + share * (until - from);
    }
    return times;
  }

  private static void checkSize(long numbers) throws Choice.RefusedException {
    if (numbers > MOST_NUMBERS) {
      throw new Choice.RefusedException(
          true,
          "the table would hold "
              + numbers
              + " numbers; the limit is "
              + MOST_NUMBERS
              + ". Ask for fewer points.");
    }
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
    return DoubleStream.concat(Arrays.stream(times), some).sorted().distinct().toArray();
  }

  private static SolutionTable table(
      CompiledSystem system,
      InitialValues initial,
      Solution solution,
      double[] times,
      double accuracy) {
    int n = system.dimension();
    List<Output> outputs = system.model().outputs();
    List<AffineEvaluator> evaluators =
        outputs.stream().map(o -> new AffineEvaluator(system, o.value(), solution)).toList();
    double[][] values = new double[n + outputs.size()][times.length];
    double[][] errors = new double[n + outputs.size()][times.length];
    double[] x = new double[n];
    double[] e = new double[n];
    for (int k = 0; k < times.length; k++) {
      solution.value(times[k], Side.AFTER, x);
      solution.errorEstimate(times[k], e);
      for (int i = 0; i < n; i++) {
        values[i][k] = x[i];
        errors[i][k] = e[i];
      }
      for (int j = 0; j < outputs.size(); j++) {
        AffineEvaluator.Estimate estimate = evaluators.get(j).at(times[k], x, e);
        values[n + j][k] = outputs.get(j).unit().fromBase(estimate.value());
        errors[n + j][k] = estimate.error() / outputs.get(j).unit().factor();
      }
    }
    List<SolutionTable.Column> columns = new ArrayList<>();
    for (int i = 0; i < n; i++) {
      StateComponent state = system.model().states().get(i);
      columns.add(
          new SolutionTable.Column(
              state.label(), state.unit().code(), SolutionTable.Kind.STATE, values[i], errors[i]));
    }
    for (int j = 0; j < outputs.size(); j++) {
      columns.add(
          new SolutionTable.Column(
              outputs.get(j).name(),
              outputs.get(j).unit().code(),
              SolutionTable.Kind.OUTPUT,
              values[n + j],
              errors[n + j]));
    }
    SolutionTable.Column time =
        new SolutionTable.Column(
            system.model().timeName(),
            system.model().timeUnit().code(),
            SolutionTable.Kind.TIME,
            times,
            new double[times.length]);
    return new SolutionTable(
        system.model().name(),
        initial.name(),
        time,
        columns,
        solution.method(),
        accuracy,
        Reached.worst(system, solution).relative());
  }
}
