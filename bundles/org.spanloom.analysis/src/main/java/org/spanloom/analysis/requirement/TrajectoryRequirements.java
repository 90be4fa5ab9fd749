/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.requirement;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.DoubleUnaryOperator;
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
        DoubleUnaryOperator margin =
            t ->
                Margins.margin(
                    requirement.relation(),
                    along.estimate(left, t).value(),
                    along.estimate(right, t).value());
        double worst = Minimum.of(margin, solution.nodes(), range(solution, requirement.until()));
        yield Margins.compared(
            system.model(),
            requirement,
            requirement.relation(),
            along.estimate(left, worst),
            along.estimate(right, worst),
            requirement.left().unit(),
            OptionalDouble.of(worst));
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
    double worstTime = solution.range().start();
    double worstMargin = Double.POSITIVE_INFINITY;
    for (int i = 0; i < system.dimension(); i++) {
      int component = i;
      double t = Minimum.of(s -> along.state(s)[component], solution.nodes(), solution.range());
      double beyondError = along.state(t)[i] + along.error(t)[i];
      double scale = system.model().states().get(i).scale();
      if (beyondError / scale < worstMargin) {
        worstMargin = beyondError / scale;
        worst = i;
        worstTime = t;
      }
    }
    if (worst < 0) {
      return Margins.plain(system.model(), requirement, Status.HELD, "there are no states");
    }
    StateComponent state = system.model().states().get(worst);
    double value = along.state(worstTime)[worst];
    double error = along.error(worstTime)[worst];
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

  /** Reads a solution at running times, with arrays of its own. */
  private final class Along {
    private final Solution solution;
    private final double[] x = new double[system.dimension()];
    private final double[] e = new double[system.dimension()];

    Along(Solution solution) {
      this.solution = solution;
    }

    Estimate estimate(AffineEvaluator evaluator, double t) {
      return evaluator.at(t, state(t), error(t));
    }

    double[] state(double t) {
      solution.value(t, Side.AFTER, x);
      return x;
    }

    double[] error(double t) {
      solution.errorEstimate(t, e);
      return e;
    }
  }
}
