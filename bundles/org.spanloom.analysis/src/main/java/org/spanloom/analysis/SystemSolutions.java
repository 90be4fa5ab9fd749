/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis;

import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;
import java.util.TreeSet;
import org.spanloom.analysis.boundary.BoundaryProblem;
import org.spanloom.analysis.coefficients.AffineEvaluator;
import org.spanloom.analysis.coefficients.CompiledSystem;
import org.spanloom.analysis.settings.Settings;
import org.spanloom.language.model.AffineValue;
import org.spanloom.language.model.Basis;
import org.spanloom.language.model.Boundary;
import org.spanloom.language.model.InitialValues;
import org.spanloom.language.model.Requirement;
import org.spanloom.language.model.TimeInterval;
import org.spanloom.numerics.Jump;
import org.spanloom.numerics.Outcome;
import org.spanloom.numerics.Progress;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.boundary.BoundaryAnswer;
import org.spanloom.numerics.solution.Solution;
import org.spanloom.numerics.solution.SolutionSolver;

/** One system during a check: what was solved once is not solved again. For one thread. */
public final class SystemSolutions {

  private final CompiledSystem system;
  private final Settings settings;
  private final Progress progress;
  private final Optional<TimeRange> range;
  private final Map<String, Outcome<Solution>> trajectories = new LinkedHashMap<>();
  private final Map<String, Outcome<BoundaryAnswer>> boundaries = new LinkedHashMap<>();

  /** Prepares; nothing is solved yet. */
  public SystemSolutions(CompiledSystem system, Settings settings, Progress progress) {
    this.system = system;
    this.settings = settings;
    this.progress = progress;
    this.range = rangeOf(system);
  }

  /** Returns the system. */
  public CompiledSystem system() {
    return system;
  }

  /** Returns the settings of the project. */
  public Settings settings() {
    return settings;
  }

  /** Returns what watches and cancels the work. */
  public Progress progress() {
    return progress;
  }

  /**
   * Returns the times that are looked at, in the time unit: the interval, where an end that is open
   * or infinite gives way to the outermost time that the model names; empty where that leaves no
   * bounded range.
   */
  public Optional<TimeRange> range() {
    return range;
  }

  private static Optional<TimeRange> rangeOf(CompiledSystem system) {
    TimeInterval interval = system.model().interval();
    TreeSet<Double> named = new TreeSet<>();
    for (InitialValues initial : system.model().initialValues()) {
      named.add(system.time(initial.time()));
    }
    for (Basis basis : system.model().bases()) {
      switch (basis) {
        case Basis.Principal p -> named.add(system.time(p.time()));
        case Basis.Given g -> named.add(system.time(g.time()));
        case Basis.ClosedForm c -> {}
      }
    }
    for (Boundary boundary : system.model().boundaries()) {
      for (Boundary.Condition condition : boundary.conditions()) {
        condition.samples().forEach(s -> s.at().map(system::time).ifPresent(named::add));
      }
    }
    for (Requirement requirement : system.model().requirements()) {
      switch (requirement) {
        case Requirement.AtTime r -> {
          addTimes(system, r.left(), named);
          addTimes(system, r.right(), named);
        }
        case Requirement.Throughout r -> r.until().map(system::time).ifPresent(named::add);
        case Requirement.Condition r -> r.until().map(system::time).ifPresent(named::add);
        case Requirement.Period r -> addPeriod(system, r, named);
        case Requirement.Stable r -> {}
        case Requirement.Invariant r -> {}
        case Requirement.Nonnegative r -> {}
      }
    }
    for (Jump jump : system.linear().jumps()) {
      named.add(jump.time());
    }
    boolean hasStart = Double.isFinite(interval.start()) && !interval.startOpen();
    boolean hasEnd = Double.isFinite(interval.end()) && !interval.endOpen();
    if ((!hasStart || !hasEnd) && named.isEmpty()) {
      return Optional.empty();
    }
    double start = hasStart ? interval.start() : named.first();
    double end = hasEnd ? interval.end() : named.last();
    return start < end || hasStart && hasEnd
        ? Optional.of(new TimeRange(start, end))
        : Optional.empty();
  }

  private static void addTimes(CompiledSystem system, AffineValue value, TreeSet<Double> named) {
    named.addAll(AffineEvaluator.namedTimes(system, value));
  }

  /** A stated period is looked at over one period from the first time that is named. */
  private static void addPeriod(
      CompiledSystem system, Requirement.Period requirement, TreeSet<Double> named) {
    double period = system.time(requirement.period());
    double start = system.model().interval().start();
    if (Double.isFinite(start)) {
      named.add(start + period);
    } else if (!named.isEmpty()) {
      named.add(named.first() + period);
    }
  }

  /** Returns the initial values of a name; the empty name is the set of the declarations. */
  public Optional<InitialValues> initial(String name) {
    return system.model().initialValues().stream().filter(v -> v.name().equals(name)).findFirst();
  }

  /** Returns the trajectory of initial values over {@link #range()}, which must be there. */
  public Outcome<Solution> trajectory(InitialValues initial) {
    return trajectories.computeIfAbsent(
        initial.name(),
        name ->
            SolutionSolver.trajectory(
                system.linear(),
                system.time(initial.time()),
                system.values(initial),
                range.orElseThrow(),
                system.accuracy(system.model().accuracy()),
                progress));
  }

  /** Returns what is known of boundary conditions of the system. */
  public Outcome<BoundaryAnswer> boundary(Boundary boundary) {
    return boundaries.computeIfAbsent(
        boundary.name(),
        name -> BoundaryProblem.of(system, boundary).solve(system.model().accuracy(), progress));
  }

  /**
   * Returns the solution of initial values or boundary conditions of a name; empty where there is
   * none or not exactly one.
   *
   * @param name the name; the empty one is that of the values in the declarations
   */
  public Optional<Outcome<Solution>> named(String name) {
    Optional<InitialValues> initial = initial(name);
    if (initial.isPresent()) {
      return initial.map(this::trajectory);
    }
    Optional<Boundary> found =
        system.model().boundaries().stream().filter(b -> b.name().equals(name)).findFirst();
    if (found.isEmpty()) {
      return Optional.empty();
    }
    return switch (boundary(found.get())) {
      case Outcome.Solved<BoundaryAnswer> s ->
          s.value() instanceof BoundaryAnswer.Unique unique
              ? Optional.of(new Outcome.Solved<>(unique.solution()))
              : Optional.empty();
      case Outcome.Cancelled<BoundaryAnswer> c -> Optional.of(new Outcome.Cancelled<>());
      case Outcome.Unsolved<BoundaryAnswer> u ->
          Optional.of(new Outcome.Unsolved<>(u.reason(), u.time(), u.detail()));
    };
  }
}
