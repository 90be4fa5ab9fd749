/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.coefficients;

import java.util.ArrayList;
import java.util.List;
import org.spanloom.language.model.AffineValue;
import org.spanloom.language.model.Term;
import org.spanloom.language.units.UnitOfMeasure;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.solution.Solution;

/**
 * Evaluates a value that is affine in the states along a trajectory, with its error: {@code sum
 * c_j(t) x_j + d(t)}, where x_j stands at the running time or at a named one.
 */
public final class AffineEvaluator {

  private static final double ROUNDING = 0x1p-52;

  /**
   * A number and the estimate of its absolute error.
   *
   * @param value the number, in coherent SI units
   * @param error estimated absolute error, in coherent SI units, not negative
   */
  public record Estimate(double value, double error) {}

  private final CompiledSystem system;
  private final List<AffineValue.Sample> samples;
  private final CompiledTerms coefficients;
  private final double[] namedValues;
  private final double[] namedErrors;
  private final double[] work;

  /**
   * Compiles a value and reads the states at named times from a solution. For one thread at a time.
   *
   * @param system the system
   * @param value the value
   * @param solution one column; must cover every named time
   */
  public AffineEvaluator(CompiledSystem system, AffineValue value, Solution solution) {
    this.system = system;
    this.samples = value.samples();
    List<Term> terms =
        new ArrayList<>(samples.stream().map(AffineValue.Sample::coefficient).toList());
    terms.add(value.constant());
    this.coefficients = system.terms().compile(terms);
    this.work = new double[coefficients.size()];
    this.namedValues = new double[samples.size()];
    this.namedErrors = new double[samples.size()];
    double[] x = new double[system.dimension()];
    for (int k = 0; k < samples.size(); k++) {
      AffineValue.Sample sample = samples.get(k);
      if (sample.at().isPresent()) {
        double t = clamp(system.time(sample.at().get()), solution);
        solution.value(t, sample.before() ? Side.BEFORE : Side.AFTER, x);
        namedValues[k] = x[sample.component()];
        solution.errorEstimate(t, sample.before() ? Side.BEFORE : Side.AFTER, x);
        namedErrors[k] = x[sample.component()];
      }
    }
  }

  /** Unit conversion may move a time by a rounding error past an end of the range. */
  private static double clamp(double t, Solution solution) {
    return Math.clamp(t, solution.range().start(), solution.range().end());
  }

  /** Returns the times it names, in the declared unit. */
  public static List<Double> namedTimes(CompiledSystem system, AffineValue value) {
    return value.samples().stream()
        .flatMap(s -> s.at().stream())
        .map(system::time)
        .distinct()
        .toList();
  }

  /**
   * Evaluates.
   *
   * @param t running time, in the declared unit
   * @param x states at the running time, in declared units
   * @param e their errors
   */
  public Estimate at(double t, double[] x, double[] e) {
    coefficients.evaluate(t, work);
    double sum = work[samples.size()];
    double size = Math.abs(sum);
    double error = 0;
    for (int k = 0; k < samples.size(); k++) {
      AffineValue.Sample sample = samples.get(k);
      UnitOfMeasure unit = system.model().states().get(sample.component()).unit();
      boolean named = sample.at().isPresent();
      double share = work[k] * unit.toBase(named ? namedValues[k] : x[sample.component()]);
      sum += share;
      size += Math.abs(share);
      error += Math.abs(work[k] * unit.factor()) * (named ? namedErrors[k] : e[sample.component()]);
    }
    return new Estimate(sum, error + ROUNDING * size);
  }
}
