/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.requirement;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.stream.Stream;
import org.spanloom.analysis.Figures;
import org.spanloom.analysis.SystemSolutions;
import org.spanloom.analysis.coefficients.AffineEvaluator;
import org.spanloom.analysis.coefficients.AffineEvaluator.Estimate;
import org.spanloom.analysis.coefficients.CompiledSystem;
import org.spanloom.analysis.requirement.RequirementResult.Status;
import org.spanloom.analysis.solve.Refusals;
import org.spanloom.language.model.Requirement;
import org.spanloom.language.model.StateComponent;
import org.spanloom.language.model.Term;
import org.spanloom.numerics.Outcome;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.solution.Solution;

/** Requirements on a trajectory: at a time, throughout, nonnegative. */
final class TrajectoryRequirements {

  private final SystemSolutions solutions;
  private final CompiledSystem system;

  TrajectoryRequirements(SystemSolutions solutions) {
    this.solutions = solutions;
    this.system = solutions.system();
  }

  /** A trajectory, or the result that says why there is none. */
  private sealed interface Found {
    record Trajectory(Solution solution) implements Found {}

    record Missing(RequirementResult result) implements Found {}
  }

  private Found find(Requirement requirement, String under) {
    if (solutions.range().isEmpty()) {
      return missing(requirement, "the interval is not bounded; add 'until TIME'");
    }
    Optional<Outcome<Solution>> outcome = solutions.named(under);
    if (outcome.isEmpty()) {
      return missing(
          requirement,
          under.isEmpty()
              ? "no set of initial values is complete in the declarations; name one with 'under"
                  + " NAME'"
              : "there is no complete set of initial values and no one solution of boundary"
                  + " conditions '"
                  + under
                  + "'");
    }
    return switch (outcome.get()) {
      case Outcome.Solved<Solution> s -> new Found.Trajectory(s.value());
      case Outcome.Cancelled<Solution> c -> missing(requirement, "the check was cancelled");
      case Outcome.Unsolved<Solution> u -> missing(requirement, Refusals.text(system, u));
    };
  }

  private Found missing(Requirement requirement, String why) {
    return new Found.Missing(Margins.plain(system.model(), requirement, Status.UNDECIDED, why));
  }

  RequirementResult atTime(Requirement.AtTime requirement) {
    return switch (find(requirement, requirement.under())) {
      case Found.Missing m -> m.result();
      case Found.Trajectory found -> {
        int n = system.dimension();
        double t = found.solution().range().start();
        Estimate left =
            new AffineEvaluator(system, requirement.left(), found.solution())
                .at(t, new double[n], new double[n]);
        Estimate right =
            new AffineEvaluator(system, requirement.right(), found.solution())
                .at(t, new double[n], new double[n]);
        List<Double> times = AffineEvaluator.namedTimes(system, requirement.left());
        yield Margins.compared(
            system.model(),
            requirement,
            requirement.relation(),
            left,
            right,
            requirement.left().unit(),
            times.size() == 1 ? OptionalDouble.of(times.getFirst()) : OptionalDouble.empty());
      }
    };
  }

  RequirementResult throughout(Requirement.Throughout requirement) {
    return switch (find(requirement, requirement.under())) {
      case Found.Missing m -> m.result();
      case Found.Trajectory found -> {
        Solution solution = found.solution();
        AffineEvaluator left = new AffineEvaluator(system, requirement.left(), solution);
        AffineEvaluator right = new AffineEvaluator(system, requirement.right(), solution);
        Along along = new Along(solution);
        Along.Sided margin =
            (t, side) ->
                Margins.margin(
                    requirement.relation(),
                    along.estimate(left, t, side).value(),
                    along.estimate(right, t, side).value());
        double[] nodes =
            Stream.of(
                    solution.nodes(),
                    system.besideCorners(requirement.left(), solution.range()),
                    system.besideCorners(requirement.right(), solution.range()))
                .flatMapToDouble(Arrays::stream)
                .sorted()
                .toArray();
        Place worst = along.least(margin, nodes, range(solution, requirement.until()));
        yield Margins.compared(
            system.model(),
            requirement,
            requirement.relation(),
            along.estimate(left, worst.time(), worst.side()),
            along.estimate(right, worst.time(), worst.side()),
            requirement.left().unit(),
            OptionalDouble.of(worst.time()));
      }
    };
  }

  private TimeRange range(Solution solution, Optional<Term> until) {
    TimeRange whole = solution.range();
    double end = until.map(system::time).orElse(whole.end());
    return new TimeRange(whole.start(), Math.clamp(end, whole.start(), whole.end()));
  }

  RequirementResult nonnegative(Requirement.Nonnegative requirement) {
    return switch (find(requirement, requirement.under())) {
      case Found.Missing m -> m.result();
      case Found.Trajectory found -> nonnegative(requirement, found);
    };
  }

  private RequirementResult nonnegative(
      Requirement.Nonnegative requirement, Found.Trajectory found) {
    Solution solution = found.solution();
    Along along = new Along(solution);
    int worst = -1;
    Place worstPlace = new Place(solution.range().start(), Side.AFTER);
    double worstMargin = Double.POSITIVE_INFINITY;
    for (int i = 0; i < system.dimension(); i++) {
      int component = i;
      Place least =
          along.least(
              (t, side) -> along.state(t, side)[component], solution.nodes(), solution.range());
      double beyondError =
          along.state(least.time(), least.side())[i] + along.error(least.time(), least.side())[i];
      double scale = system.model().states().get(i).scale();
      if (beyondError / scale < worstMargin) {
        worstMargin = beyondError / scale;
        worst = i;
        worstPlace = least;
      }
    }
    if (worst < 0) {
      return Margins.plain(system.model(), requirement, Status.HELD, "there are no states");
    }
    StateComponent state = system.model().states().get(worst);
    double worstTime = worstPlace.time();
    double value = along.state(worstTime, worstPlace.side())[worst];
    double error = along.error(worstTime, worstPlace.side())[worst];
    String detail =
        "least is %s = %s at %s, with an estimated error of %s"
            .formatted(
                state.label(),
                Figures.text(value, 4, state.unit().code()),
                Figures.at(system.model(), worstTime),
                Figures.text(error, 1, state.unit().code()));
    return new RequirementResult(
        system.model().name(),
        requirement.text(),
        worstMargin >= 0 ? Status.HELD : Status.FAILED,
        value,
        0,
        value,
        error,
        state.unit().code(),
        OptionalDouble.of(worstTime),
        detail,
        requirement.span());
  }

  /** A time and the side of it that is meant. */
  private record Place(double time, Side side) {}

  /** Reads a solution at running times, with arrays of its own. */
  private final class Along {
    private final Solution solution;
    private final double[] x = new double[system.dimension()];
    private final double[] e = new double[system.dimension()];

    Along(Solution solution) {
      this.solution = solution;
    }

    /** A value along the solution, on either side of a time. */
    private interface Sided {
      double at(double t, Side side);
    }

    Estimate estimate(AffineEvaluator evaluator, double t, Side side) {
      return evaluator.at(t, state(t, side), error(t, side));
    }

    double[] state(double t, Side side) {
      solution.value(t, side, x);
      return x;
    }

    double[] error(double t, Side side) {
      solution.errorEstimate(t, side, e);
      return e;
    }

    /** Finds where a value is least, the limits before jumps inside the range included. */
    Place least(Sided value, double[] nodes, TimeRange range) {
      double time = Minimum.of(t -> value.at(t, Side.AFTER), nodes, range);
      Place place = new Place(time, Side.AFTER);
      double least = value.at(time, Side.AFTER);
      for (double jump : solution.jumpTimes()) {
        double before =
            jump > range.start() && jump <= range.end()
                ? value.at(jump, Side.BEFORE)
                : Double.POSITIVE_INFINITY;
        if (before < least) {
          least = before;
          place = new Place(jump, Side.BEFORE);
        }
      }
      return place;
    }
  }
}
