/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.spectrum;

import java.util.Optional;
import java.util.OptionalDouble;
import org.spanloom.analysis.coefficients.CompiledSystem;
import org.spanloom.analysis.solve.Answer;
import org.spanloom.analysis.solve.Choice;
import org.spanloom.analysis.solve.Refusals;
import org.spanloom.language.model.Requirement;
import org.spanloom.language.model.StateComponent;
import org.spanloom.language.model.TimeInterval;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Outcome;
import org.spanloom.numerics.Progress;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.spectrum.Equilibrium;
import org.spanloom.numerics.spectrum.FloquetMultipliers;
import org.spanloom.numerics.spectrum.LogarithmicNorm;
import org.spanloom.numerics.spectrum.Modes;
import org.spanloom.numerics.structure.ConservedQuantities;

/** Lists the spectrum of a model: eigenvalues, or multipliers where a period is stated. */
public final class SpectrumSolve {

  private SpectrumSolve() {}

  /**
   * Computes.
   *
   * @param request whose spectrum
   * @param progress watched and asked while working
   * @return the spectrum, or why there is none
   */
  public static Answer<SystemSpectrum> solve(SpectrumRequest request, Progress progress) {
    try {
      return answer(request, progress);
    } catch (Choice.RefusedException refused) {
      return new Answer.Refused<>(refused.isUsage(), refused.getMessage());
    }
  }

  private static Answer<SystemSpectrum> answer(SpectrumRequest request, Progress progress)
      throws Choice.RefusedException {
    CompiledSystem system = Choice.system(request.model(), request.system(), request.parameters());
    Optional<Requirement.Period> period =
        system.model().requirements().stream()
            .filter(Requirement.Period.class::isInstance)
            .map(Requirement.Period.class::cast)
            .findFirst();
    if (request.at().isPresent()) {
      double t = Choice.inside(system, request.at().getAsDouble());
      return eigenvalues(system, t, OptionalDouble.of(t), progress);
    }
    if (system.linear().hasConstantMatrix()) {
      return eigenvalues(system, anyTime(system), OptionalDouble.empty(), progress);
    }
    if (period.isPresent()) {
      double tolerance = Math.min(request.settings().basisAccuracy(), system.model().accuracy());
      return multipliers(system, system.time(period.get().period()), tolerance, progress);
    }
    return new Answer.Refused<>(
        true,
        "A varies with "
            + system.model().timeName()
            + " in system "
            + system.model().name()
            + "; name a time to freeze it at, or state its period with 'require period P' to get"
            + " the multipliers.");
  }

  private static double anyTime(CompiledSystem system) {
    TimeInterval interval = system.model().interval();
    if (Double.isFinite(interval.start())) {
      return interval.startOpen() ? Math.nextUp(interval.start()) : interval.start();
    }
    return Double.isFinite(interval.end()) ? Math.nextDown(interval.end()) : 0;
  }

  private static SystemSpectrum.Subject subject(CompiledSystem system, double from, double length) {
    TimeInterval interval = system.model().interval();
    double end = Double.isFinite(interval.end()) ? interval.end() : from + length;
    double[] scale = scale(system);
    ConservedQuantities conserved =
        ConservedQuantities.of(system.linear(), new TimeRange(from, Math.max(from, end)), scale);
    return new SystemSpectrum.Subject(
        system.model().name(),
        system.model().timeName(),
        system.model().timeUnit().code(),
        system.model().states().stream().map(StateComponent::label).toList(),
        conserved);
  }

  private static double[] scale(CompiledSystem system) {
    return system.model().states().stream().mapToDouble(StateComponent::scale).toArray();
  }

  private static Answer<SystemSpectrum> eigenvalues(
      CompiledSystem system, double t, OptionalDouble at, Progress progress) {
    LinearSystem linear = system.linear();
    int n = system.dimension();
    double[] a = new double[n * n];
    double[] b = new double[n];
    linear.matrix(t, Side.AFTER, a);
    linear.forcing(t, Side.AFTER, b);
    double[] scale = scale(system);
    boolean nonnegative = true;
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        if (!Double.isFinite(a[i * n + j]) || !Double.isFinite(b[i])) {
          return new Answer.Refused<>(
              false, "a coefficient is not a finite number at that time; choose another time.");
        }
        nonnegative &= i == j || a[i * n + j] >= 0;
      }
    }
    boolean standsStill = linear.hasConstantMatrix() && linear.hasConstantForcing();
    boolean nonnegativeMatrix = nonnegative;
    return switch (Modes.of(a, scale, progress)) {
      case Outcome.Solved<Modes> s ->
          new Answer.Solved<>(
              new SystemSpectrum.Eigenvalues(
                  subject(system, anyTime(system), 1),
                  at,
                  s.value().modes(),
                  LogarithmicNorm.of(a, scale),
                  nonnegativeMatrix,
                  standsStill ? Optional.of(Equilibrium.of(a, b, scale)) : Optional.empty()));
      case Outcome.Cancelled<Modes> c -> new Answer.Cancelled<>();
      case Outcome.Unsolved<Modes> u -> new Answer.Refused<>(false, Refusals.text(system, u));
    };
  }

  private static Answer<SystemSpectrum> multipliers(
      CompiledSystem system, double period, double tolerance, Progress progress) {
    double start = anyTime(system);
    Outcome<FloquetMultipliers> outcome =
        FloquetMultipliers.of(system.linear(), start, period, system.accuracy(tolerance), progress);
    return switch (outcome) {
      case Outcome.Solved<FloquetMultipliers> s ->
          new Answer.Solved<>(
              new SystemSpectrum.Multipliers(subject(system, start, period), s.value()));
      case Outcome.Cancelled<FloquetMultipliers> c -> new Answer.Cancelled<>();
      case Outcome.Unsolved<FloquetMultipliers> u ->
          new Answer.Refused<>(false, Refusals.text(system, u));
    };
  }
}
