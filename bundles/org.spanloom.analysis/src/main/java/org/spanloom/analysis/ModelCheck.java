/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.SequencedMap;
import org.spanloom.analysis.basis.BasisProfiles;
import org.spanloom.analysis.boundary.BoundaryCheck;
import org.spanloom.analysis.coefficients.CompiledSystem;
import org.spanloom.analysis.coefficients.SystemCompiler;
import org.spanloom.analysis.requirement.RequirementCheck;
import org.spanloom.analysis.requirement.RequirementResult;
import org.spanloom.analysis.settings.Settings;
import org.spanloom.analysis.solve.Refusals;
import org.spanloom.language.model.Corners;
import org.spanloom.language.model.InitialValues;
import org.spanloom.language.model.Model;
import org.spanloom.language.model.Requirement;
import org.spanloom.language.model.SystemModel;
import org.spanloom.language.problem.Problem;
import org.spanloom.numerics.CoupledSystem;
import org.spanloom.numerics.Outcome;
import org.spanloom.numerics.Progress;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.solution.Solution;

/** Checks a whole model: text, well-posedness, solutions, bases, requirements. */
public final class ModelCheck {

  /** Reciprocal condition of a mass matrix below which its rows cannot be told apart. */
  private static final double SINGULAR = 1e-14;

  private static final int MASS_SAMPLES = 33;

  private final Settings settings;
  private final Progress progress;
  private final List<Finding> findings = new ArrayList<>();

  private ModelCheck(Settings settings, Progress progress) {
    this.settings = settings;
    this.progress = progress;
  }

  /**
   * Checks.
   *
   * @param model the model as read
   * @param settings thresholds of the project
   * @param progress watched and asked while working
   * @return everything found; never throws for a model that is wrong
   */
  public static CheckReport check(Model model, Settings settings, Progress progress) {
    return new ModelCheck(settings, progress).check(model);
  }

  private CheckReport check(Model model) {
    for (Problem problem : model.problems()) {
      findings.add(Finding.of(problem));
    }
    List<SystemReport> reports = new ArrayList<>();
    int count = model.systems().size();
    for (int k = 0; k < count && !progress.isCancelled(); k++) {
      SystemModel system = model.systems().get(k);
      if (model.isSound(system)) {
        reports.add(check(system, part(k, count)));
      }
    }
    List<Finding> ordered =
        findings.stream().sorted(Comparator.comparingInt(f -> f.span().start())).toList();
    return new CheckReport(model, reports, ordered, progress.isCancelled());
  }

  /**
   * Each solution of a system reports from 0 to 1, so only what goes beyond the last report is
   * passed on.
   */
  private Progress part(int k, int count) {
    return new Progress() {
      private double reported;

      @Override
      public void worked(double fraction) {
        if (fraction > reported) {
          reported = fraction;
          progress.worked((k + fraction) / count);
        }
      }

      @Override
      public boolean isCancelled() {
        return progress.isCancelled();
      }
    };
  }

  private SystemReport check(SystemModel model, Progress part) {
    CompiledSystem system = SystemCompiler.compile(model, new LinkedHashMap<>());
    SystemSolutions solutions = new SystemSolutions(system, settings, part);
    if (hasTooManyBreakpoints(system) || hasSingularMass(system, solutions)) {
      return new SystemReport(model, List.of(), List.of(), List.of());
    }
    trajectories(system, solutions);
    BoundaryCheck boundaries = new BoundaryCheck(solutions);
    findings.addAll(boundaries.findings());
    BasisProfiles bases = new BasisProfiles(solutions);
    findings.addAll(bases.findings());
    RequirementCheck check = new RequirementCheck(solutions, bases);
    List<RequirementResult> results = new ArrayList<>();
    for (Requirement requirement : model.requirements()) {
      RequirementResult result = check.check(requirement);
      results.add(result);
      requirement(result);
    }
    return new SystemReport(model, boundaries.reports(), bases.reports(), results);
  }

  /** Reports what keeps the breakpoints of a system from being known; too many cannot be solved. */
  private boolean hasTooManyBreakpoints(CompiledSystem system) {
    if (system.gap().isPresent()) {
      Corners.Gap gap = system.gap().get();
      FindingKind kind =
          switch (gap) {
            case Corners.Untraced u -> FindingKind.SWITCHING_UNTRACED;
            case Corners.TooMany m -> FindingKind.TOO_MANY_BREAKPOINTS;
          };
      findings.add(
          kind.at(system.model().nameSpan(), Refusals.text(system, gap), new LinkedHashMap<>()));
    }
    return system.gap().filter(Corners.TooMany.class::isInstance).isPresent();
  }

  private boolean hasSingularMass(CompiledSystem system, SystemSolutions solutions) {
    if (system.coupling().isEmpty()) {
      return false;
    }
    CoupledSystem coupled = system.coupling().get();
    TimeRange range = solutions.range().orElse(new TimeRange(0, 0));
    for (int k = 0; k < MASS_SAMPLES; k++) {
      double t = range.start() + range.length() * k / (MASS_SAMPLES - 1);
      double quality = coupled.massQuality(t);
      if (!(quality > SINGULAR)) {
        SequencedMap<String, Double> numbers = new LinkedHashMap<>();
        numbers.put("time", t);
        findings.add(
            FindingKind.MASS_MATRIX_SINGULAR.at(
                system.model().nameSpan(),
                "the highest derivatives of system %s are coupled by a singular matrix at %s, so the equations do not determine them; look at the coefficients of the primed states"
                    .formatted(system.model().name(), Figures.at(system.model(), t)),
                numbers));
        return true;
      }
    }
    return false;
  }

  /**
   * Solves for every set of initial values, so that what cannot be solved is known before it is
   * needed.
   */
  private void trajectories(CompiledSystem system, SystemSolutions solutions) {
    if (solutions.range().isEmpty()) {
      return;
    }
    for (InitialValues initial : system.model().initialValues()) {
      switch (solutions.trajectory(initial)) {
        case Outcome.Solved<Solution> s -> accuracy(system, initial, s.value());
        case Outcome.Cancelled<Solution> c -> {}
        case Outcome.Unsolved<Solution> u ->
            findings.add(
                FindingKind.SOLUTION_MISSING.at(
                    initial.span(), Refusals.text(system, u), new LinkedHashMap<>()));
      }
    }
  }

  /** Compares the estimated error with the one asked for, at the steps of the method. */
  private void accuracy(CompiledSystem system, InitialValues initial, Solution solution) {
    double asked = system.model().accuracy();
    Reached worst = Reached.worst(system, solution);
    if (worst.relative() > asked) {
      String whose = initial.name().isEmpty() ? "" : " of " + initial.name();
      findings.add(worst.finding(system, asked, whose));
    }
  }

  private void requirement(RequirementResult result) {
    SequencedMap<String, Double> numbers = new LinkedHashMap<>();
    put(numbers, "value", result.value());
    put(numbers, "limit", result.limit());
    put(numbers, "margin", result.margin());
    put(numbers, "error", result.error());
    result.time().ifPresent(t -> put(numbers, "time", t));
    switch (result.status()) {
      case HELD -> {}
      case FAILED ->
          findings.add(
              FindingKind.REQUIREMENT_FAILED.at(
                  result.span(),
                  "'" + result.text() + "' does not hold: " + result.detail(),
                  numbers));
      case UNDECIDED ->
          findings.add(
              FindingKind.REQUIREMENT_UNDECIDED.at(
                  result.span(),
                  "'" + result.text() + "' cannot be decided: " + result.detail(),
                  numbers));
    }
  }

  private static void put(SequencedMap<String, Double> numbers, String name, double value) {
    if (!Double.isNaN(value)) {
      numbers.put(name, value);
    }
  }
}
