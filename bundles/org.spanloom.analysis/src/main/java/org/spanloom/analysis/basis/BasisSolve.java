/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.basis;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Optional;
import org.spanloom.analysis.coefficients.CompiledSystem;
import org.spanloom.analysis.solve.Choice;
import org.spanloom.analysis.solve.MethodNames;
import org.spanloom.analysis.solve.Refusals;
import org.spanloom.language.model.Basis;
import org.spanloom.language.model.StateComponent;
import org.spanloom.language.model.TimeInterval;
import org.spanloom.numerics.Outcome;
import org.spanloom.numerics.Progress;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.basis.ConditionProfile;
import org.spanloom.numerics.basis.ConditionSample;
import org.spanloom.numerics.solution.Solution;

/** Lists a basis of a model at times, with its conditioning. */
public final class BasisSolve {

  private BasisSolve() {}

  /**
   * Solves.
   *
   * @param request what to list
   * @param progress watched and asked while working
   * @return the table, or why there is none
   */
  public static BasisAnswer solve(BasisRequest request, Progress progress) {
    return solve(request, false, progress);
  }

  /**
   * Solves for the principal basis of the start of the interval, whatever is declared.
   *
   * @param request what to list; its basis does not matter
   * @param progress watched and asked while working
   * @return the table, or why there is none
   */
  public static BasisAnswer principal(BasisRequest request, Progress progress) {
    return solve(request, true, progress);
  }

  private static BasisAnswer solve(BasisRequest request, boolean principal, Progress progress) {
    try {
      return answer(request, principal, progress);
    } catch (Choice.RefusedException refused) {
      return new BasisAnswer.Refused(refused.isUsage(), refused.getMessage());
    }
  }

  private static BasisAnswer answer(BasisRequest request, boolean principal, Progress progress)
      throws Choice.RefusedException {
    CompiledSystem system = Choice.system(request.model(), request.system(), request.parameters());
    List<Double> times = new ArrayList<>();
    for (double t : request.times()) {
      times.add(Choice.inside(system, t));
    }
    if (times.isEmpty()) {
      return new BasisAnswer.Refused(true, "no time was given; name at least one.");
    }
    List<Basis> declared = system.model().bases();
    if (principal || declared.isEmpty() && request.basis().isEmpty()) {
      BasisColumns basis = BasisColumns.principal(system, start(system, times));
      return columns(request, system, basis, times, progress);
    }
    if (declared.isEmpty()) {
      return new BasisAnswer.Refused(
          true,
          "system "
              + system.model().name()
              + " declares no basis; leave the name out to get the principal one.");
    }
    Basis basis =
        Choice.pick(
            "basis", declared, Basis::name, request.basis(), "system " + system.model().name());
    return switch (basis) {
      case Basis.Principal b ->
          columns(request, system, BasisColumns.of(system, b), times, progress);
      case Basis.Given b -> columns(request, system, BasisColumns.of(system, b), times, progress);
      case Basis.ClosedForm b -> {
        if (request.method().isPresent()) {
          yield new BasisAnswer.Refused(
              true,
              "basis "
                  + b.name()
                  + " is given in closed form and needs no method; leave the method out.");
        }
        Solution candidate = new ClosedFormCandidate(system, b, hull(times, times.getFirst()));
        yield table(system, b.name(), candidate, times, progress);
      }
    };
  }

  private static double start(CompiledSystem system, List<Double> times) {
    TimeInterval interval = system.model().interval();
    return Double.isFinite(interval.start()) && !interval.startOpen()
        ? interval.start()
        : Collections.min(times);
  }

  private static TimeRange hull(List<Double> times, double start) {
    return new TimeRange(
        Math.min(start, Collections.min(times)), Math.max(start, Collections.max(times)));
  }

  private static BasisAnswer columns(
      BasisRequest request,
      CompiledSystem system,
      BasisColumns basis,
      List<Double> times,
      Progress progress)
      throws Choice.RefusedException {
    Outcome<Solution> outcome =
        basis.solve(
            system,
            system.linear(),
            hull(times, basis.startTime()),
            Math.min(request.settings().basisAccuracy(), system.model().accuracy()),
            MethodNames.read(request.method()),
            progress);
    return switch (outcome) {
      case Outcome.Solved<Solution> s -> table(system, basis.name(), s.value(), times, progress);
      case Outcome.Cancelled<Solution> c -> new BasisAnswer.Cancelled();
      case Outcome.Unsolved<Solution> u -> new BasisAnswer.Refused(false, Refusals.text(system, u));
    };
  }

  private static BasisAnswer table(
      CompiledSystem system,
      String name,
      Solution solution,
      List<Double> times,
      Progress progress) {
    int n = system.dimension();
    int m = solution.columns();
    List<BasisTable.Row> rows = new ArrayList<>();
    double[] x = new double[n * m];
    double[] e = new double[n * m];
    for (double t : times) {
      solution.value(t, Side.AFTER, x);
      solution.errorEstimate(t, e);
      for (int j = 0; j < m; j++) {
        rows.add(new BasisTable.Row(t, j + 1, column(x, n, m, j), column(e, n, m, j)));
      }
    }
    Outcome<List<ConditionSample>> conditioning =
        ConditionProfile.at(system.linear(), solution, times, progress);
    Optional<List<ConditionSample>> samples =
        switch (conditioning) {
          case Outcome.Solved<List<ConditionSample>> s -> Optional.of(s.value());
          case Outcome.Cancelled<List<ConditionSample>> c -> Optional.empty();
          case Outcome.Unsolved<List<ConditionSample>> u -> Optional.of(List.of());
        };
    return samples
        .<BasisAnswer>map(list ->
            new BasisAnswer.Solved(
                new BasisTable(
                    system.model().name(),
                    name,
                    system.model().timeName(),
                    system.model().timeUnit().code(),
                    system.model().states().stream().map(StateComponent::label).toList(),
                    m,
                    rows,
                    list,
                    solution.method())))
        .orElse(new BasisAnswer.Cancelled());
  }

  private static double[] column(double[] x, int n, int m, int j) {
    double[] column = new double[n];
    for (int i = 0; i < n; i++) {
      column[i] = x[i * m + j];
    }
    return column;
  }
}
