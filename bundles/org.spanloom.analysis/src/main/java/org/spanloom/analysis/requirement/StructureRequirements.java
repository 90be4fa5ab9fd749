/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.requirement;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.spanloom.analysis.Figures;
import org.spanloom.analysis.SystemSolutions;
import org.spanloom.analysis.coefficients.CompiledSystem;
import org.spanloom.analysis.coefficients.CompiledTerms;
import org.spanloom.analysis.requirement.RequirementResult.Status;
import org.spanloom.analysis.solve.Refusals;
import org.spanloom.language.model.AffineValue;
import org.spanloom.language.model.Relation;
import org.spanloom.language.model.Requirement;
import org.spanloom.language.model.SystemModel;
import org.spanloom.language.model.Term;
import org.spanloom.language.model.TimeDerivative;
import org.spanloom.language.model.TimeInterval;
import org.spanloom.language.units.UnitOfMeasure;
import org.spanloom.numerics.Jump;
import org.spanloom.numerics.JumpSelection;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Outcome;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.solution.Solution;
import org.spanloom.numerics.solution.SolutionSolver;
import org.spanloom.numerics.spectrum.Spectrum;

/** Requirements that the coefficients settle: stable, invariant, period. */
final class StructureRequirements {

  private static final int SAMPLES = 101;

  /**
   * Cancellation of equal terms leaves about 1e-16; ten thousand times that is a term that is
   * there.
   */
  private static final double CANCELLED = 1e-12;

  /** A phase written with ten digits repeats to about this. */
  private static final double REPEATS = 1e-9;

  private final SystemSolutions solutions;
  private final CompiledSystem system;
  private final SystemModel model;

  StructureRequirements(SystemSolutions solutions) {
    this.solutions = solutions;
    this.system = solutions.system();
    this.model = system.model();
  }

  /**
   * Decided for constant A by its spectral abscissa, for a stated period by the largest multiplier.
   */
  RequirementResult stable(Requirement.Stable requirement) {
    if (Double.isFinite(model.interval().end())) {
      return Margins.plain(
          model,
          requirement,
          Status.UNDECIDED,
          "stability is a property for all later times; leave out the end of the interval");
    }
    if (system.linear().hasConstantMatrix()) {
      int n = system.dimension();
      double[] a = new double[n * n];
      system.linear().matrix(anyTime(), Side.AFTER, a);
      Spectrum spectrum = Spectrum.of(a, n);
      return stable(
          requirement,
          spectrum.abscissa(),
          0,
          spectrum.abscissaError(),
          "the largest real part of an eigenvalue of A");
    }
    Optional<Requirement.Period> period =
        model.requirements().stream()
            .filter(r -> r instanceof Requirement.Period)
            .map(r -> (Requirement.Period) r)
            .findFirst();
    return period
        .map(p -> stable(requirement, p))
        .orElseGet(() ->
            Margins.plain(
                model,
                requirement,
                Status.UNDECIDED,
                "A varies with time; state its period with 'require period P'"));
  }

  private RequirementResult stable(
      Requirement.Stable requirement, double value, double limit, double error, String what) {
    double margin = limit - value;
    String detail =
        "%s is %s, with an estimated error of %s"
            .formatted(what, Figures.text(value, 6), Figures.text(error, 1));
    return new RequirementResult(
        model.name(),
        requirement.text(),
        Margins.status(Relation.LESS, margin, error),
        value,
        limit,
        margin,
        error,
        "1",
        OptionalDouble.empty(),
        detail,
        requirement.span());
  }

  private RequirementResult stable(Requirement.Stable requirement, Requirement.Period period) {
    int n = system.dimension();
    double start = anyTime();
    double length = system.time(period.period());
    double[] identity = new double[n * n];
    for (int i = 0; i < n; i++) {
      identity[i * n + i] = 1;
    }
    Outcome<Solution> outcome =
        SolutionSolver.homogeneous(
            JumpSelection.without(system.linear()),
            start,
            identity,
            new TimeRange(start, start + length),
            system.accuracy(solutions.settings().basisAccuracy()),
            solutions.progress());
    return switch (outcome) {
      case Outcome.Solved<Solution> s -> {
        double[] monodromy = new double[n * n];
        double[] errors = new double[n * n];
        s.value().value(start + length, Side.BEFORE, monodromy);
        s.value().errorEstimate(start + length, errors);
        Spectrum spectrum = Spectrum.of(monodromy, n);
        double error = spectrum.radiusError(errors);
        yield stable(
            requirement, spectrum.radius(), 1, error, "the largest multiplier over one period");
      }
      case Outcome.Cancelled<Solution> c ->
          Margins.plain(model, requirement, Status.UNDECIDED, "the check was cancelled");
      case Outcome.Unsolved<Solution> u ->
          Margins.plain(model, requirement, Status.UNDECIDED, Refusals.text(system, u));
    };
  }

  private double anyTime() {
    TimeInterval interval = model.interval();
    if (solutions.range().isPresent()) {
      return solutions.range().get().start();
    }
    if (Double.isFinite(interval.start())) {
      return interval.startOpen() ? interval.start() + 1 : interval.start();
    }
    return Double.isFinite(interval.end()) ? interval.end() - 1 : 0;
  }

  private double[] sampleTimes() {
    TimeRange range = solutions.range().orElseGet(() -> new TimeRange(anyTime(), anyTime() + 1));
    double[] times = new double[SAMPLES];
    for (int k = 0; k < SAMPLES; k++) {
      times[k] = range.start() + range.length() * k / (SAMPLES - 1);
    }
    return times;
  }

  /**
   * The value v = c(t) x + d(t) keeps its value on every solution exactly when c' + c A = 0 and d'
   * + c b = 0. Each sum is compared with the size of its terms, at {@value #SAMPLES} times.
   */
  RequirementResult invariant(Requirement.Invariant requirement) {
    int n = system.dimension();
    Flow flow = new Flow(requirement.value());
    double worst = 0;
    double worstTime = anyTime();
    for (double t : sampleTimes()) {
      double drift = flow.drift(t);
      if (!(drift <= worst)) {
        worst = drift;
        worstTime = t;
      }
    }
    Optional<Jump> guilty = Optional.empty();
    for (Jump jump : system.linear().jumps()) {
      double change = flow.change(jump);
      if (!(change <= worst) && change > CANCELLED) {
        worst = change;
        worstTime = jump.time();
        guilty = Optional.of(jump);
      }
    }
    String detail =
        n == 0
            ? "there are no states"
            : guilty
                .map(j -> "the jump at " + Figures.at(model, j.time()) + " changes it")
                .orElse(
                    "its rate of change, relative to the terms it is made of, is at most "
                        + Figures.text(worst, 2));
    return new RequirementResult(
        model.name(),
        requirement.text(),
        worst <= CANCELLED ? Status.HELD : Status.FAILED,
        worst,
        CANCELLED,
        CANCELLED - worst,
        0,
        "1",
        OptionalDouble.of(worstTime),
        detail,
        requirement.span());
  }

  /**
   * The rate of change of an affine value on the solutions, in coherent SI units over the declared
   * time.
   */
  private final class Flow {
    private final int n = system.dimension();
    private final double[] c = new double[n];
    private final double[] dc = new double[n];
    private final double[] a = new double[n * n];
    private final double[] b = new double[n];
    private final List<AffineValue.Sample> samples;
    private final CompiledTerms terms;

    Flow(AffineValue value) {
      samples = value.samples();
      List<Term> all = new ArrayList<>();
      for (AffineValue.Sample sample : samples) {
        all.add(sample.coefficient());
        all.add(TimeDerivative.of(sample.coefficient()));
      }
      all.add(TimeDerivative.of(value.constant()));
      terms = system.terms().compile(all);
    }

    /** Returns how much a jump changes the value, relative to the terms of the change. */
    double change(Jump jump) {
      drift(jump.time());
      double worst = 0;
      double[] sums = new double[n];
      double[] sizes = new double[n];
      double shift = 0;
      double shiftSize = 0;
      for (Jump.Row row : jump.rows()) {
        int i = row.row();
        int[] columns = row.columns();
        double[] factors = row.factors();
        sums[i] -= c[i];
        sizes[i] += Math.abs(c[i]);
        for (int k = 0; k < columns.length; k++) {
          sums[columns[k]] += c[i] * factors[k];
          sizes[columns[k]] += Math.abs(c[i] * factors[k]);
        }
        shift += c[i] * row.shift();
        shiftSize += Math.abs(c[i] * row.shift());
      }
      for (int j = 0; j < n; j++) {
        worst = Math.max(worst, relative(sums[j], sizes[j]));
      }
      return Math.max(worst, relative(shift, shiftSize));
    }

    double drift(double t) {
      double second = model.timeUnit().factor();
      double[] values = terms.at(t);
      Arrays.fill(c, 0);
      Arrays.fill(dc, 0);
      for (int k = 0; k < samples.size(); k++) {
        int j = samples.get(k).component();
        UnitOfMeasure unit = model.states().get(j).unit();
        c[j] += values[2 * k] * unit.factor();
        dc[j] += values[2 * k + 1] * unit.factor() * second;
      }
      LinearSystem linear = system.linear();
      linear.matrix(t, Side.AFTER, a);
      linear.forcing(t, Side.AFTER, b);
      double worst = 0;
      for (int j = 0; j < n; j++) {
        double sum = dc[j];
        double size = Math.abs(dc[j]);
        for (int i = 0; i < n; i++) {
          sum += c[i] * a[i * n + j];
          size += Math.abs(c[i] * a[i * n + j]);
        }
        worst = Math.max(worst, relative(sum, size));
      }
      double sum = values[2 * samples.size()] * second;
      double size = Math.abs(sum);
      for (int i = 0; i < n; i++) {
        sum += c[i] * b[i];
        size += Math.abs(c[i] * b[i]);
      }
      return Math.max(worst, relative(sum, size));
    }
  }

  private static double relative(double sum, double size) {
    return size == 0 ? 0 : Math.abs(sum) / size;
  }

  /** A(t + P) = A(t) and b(t + P) = b(t), compared at many times of the interval. */
  RequirementResult period(Requirement.Period requirement) {
    double length = system.time(requirement.period());
    TimeInterval interval = model.interval();
    double start = anyTime();
    double last = Math.min(start + length, interval.end() - length);
    if (!(length > 0) || !(last >= start)) {
      return Margins.plain(
          model,
          requirement,
          Status.UNDECIDED,
          "the interval must hold at least one whole positive period");
    }
    int n = system.dimension();
    double[] now = new double[n * n + n];
    double[] later = new double[n * n + n];
    double largest = 0;
    double worst = 0;
    double worstTime = start;
    for (int k = 0; k < SAMPLES; k++) {
      double t = start + (last - start) * k / (SAMPLES - 1);
      coefficients(t, now);
      coefficients(t + length, later);
      for (int i = 0; i < now.length; i++) {
        largest = Math.max(largest, Math.abs(now[i]));
        double difference = Math.abs(now[i] - later[i]);
        if (!(difference <= worst)) {
          worst = difference;
          worstTime = t;
        }
      }
    }
    double share = largest == 0 ? 0 : worst / largest;
    OptionalDouble lonely = new JumpPeriod(system.linear(), length).firstWithoutCounterpart();
    if (lonely.isPresent()) {
      return Margins.plain(
          model,
          requirement,
          Status.FAILED,
          "the jump at "
              + Figures.at(model, lonely.getAsDouble())
              + " does not take place one period earlier or later");
    }
    return new RequirementResult(
        model.name(),
        requirement.text(),
        share <= REPEATS ? Status.HELD : Status.FAILED,
        share,
        REPEATS,
        REPEATS - share,
        0,
        "1",
        OptionalDouble.of(worstTime),
        "coefficients one period apart differ by a relative " + Figures.text(share, 2) + " at most",
        requirement.span());
  }

  private void coefficients(double t, double[] all) {
    int n = system.dimension();
    double[] a = new double[n * n];
    double[] b = new double[n];
    system.linear().matrix(t, Side.AFTER, a);
    system.linear().forcing(t, Side.AFTER, b);
    System.arraycopy(a, 0, all, 0, n * n);
    System.arraycopy(b, 0, all, n * n, n);
  }
}
