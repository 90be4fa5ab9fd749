/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.solve;

import java.util.ArrayList;
import java.util.List;
import org.spanloom.analysis.Reached;
import org.spanloom.analysis.coefficients.AffineEvaluator;
import org.spanloom.analysis.coefficients.CompiledSystem;
import org.spanloom.language.model.Output;
import org.spanloom.language.model.StateComponent;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.solution.Solution;

/** Lists solutions at times, with outputs, in declared units. */
public final class Listing {

  /** Most numbers in a table; about 400 MB with their errors. */
  public static final int MOST_NUMBERS = 25_000_000;

  private Listing() {}

  /** Refuses a table that would be too large. */
  static void checkSize(long numbers) throws Choice.RefusedException {
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

  /** Returns how many times are listed. */
  private static int count(Sampling sampling) throws Choice.RefusedException {
    int count =
        switch (sampling) {
          case Sampling.Even even -> even.count();
          case Sampling.Curve curve -> curve.count();
          case Sampling.At at -> at.times().size();
        };
    if (count < 2) {
      throw new Choice.RefusedException(true, "at least 2 points are needed, not " + count + ".");
    }
    return count;
  }

  /**
   * Returns even times.
   *
   * @param columns how many numbers stand at each
   */
  static double[] even(Sampling sampling, double from, double until, long columns)
      throws Choice.RefusedException {
    int count = count(sampling);
    checkSize(count * columns);
    double[] times = new double[count];
    for (int i = 0; i < count; i++) {
      double share = (double) i / (count - 1);
      times[i] = i == count - 1 ? until : from + share * (until - from);
    }
    return times;
  }

  /** Returns the times that are named, checked. */
  static double[] named(CompiledSystem system, Sampling.At at) throws Choice.RefusedException {
    if (at.times().isEmpty()) {
      throw new Choice.RefusedException(true, "no time was given; name at least one.");
    }
    double[] times = new double[at.times().size()];
    for (int i = 0; i < times.length; i++) {
      times[i] = Choice.inside(system, at.times().get(i));
    }
    return times;
  }

  /**
   * Returns the times at which to list a solution that is known on a range.
   *
   * @param system the system
   * @param sampling named or even times
   * @param range where the solution is known
   */
  public static double[] times(CompiledSystem system, Sampling sampling, TimeRange range)
      throws Choice.RefusedException {
    long columns = 1L + system.dimension() + system.model().outputs().size();
    if (!(sampling instanceof Sampling.At at)) {
      return even(sampling, range.start(), range.end(), columns);
    }
    double[] times = named(system, at);
    for (double t : times) {
      if (!range.contains(t)) {
        throw new Choice.RefusedException(
            true,
            "%s = %s lies outside the times that the conditions name, %s to %s; choose a time between them."
                .formatted(
                    system.model().timeName(),
                    Choice.number(t),
                    Choice.number(range.start()),
                    Choice.number(range.end())));
      }
    }
    checkSize(times.length * columns);
    return times;
  }

  /**
   * Lists a solution.
   *
   * @param system the system
   * @param name name of the initial values or boundary conditions; empty for those of the
   *     declarations
   * @param solution one column, known at all times asked for
   * @param times times to list, in this order
   * @param accuracy relative error asked for
   */
  public static SolutionTable table(
      CompiledSystem system, String name, Solution solution, double[] times, double accuracy) {
    return table(system, name, solution, times, false, accuracy);
  }

  /**
   * Lists a solution.
   *
   * @param twice whether the first of two equal times stands for the values before a jump there
   */
  static SolutionTable table(
      CompiledSystem system,
      String name,
      Solution solution,
      double[] times,
      boolean twice,
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
      boolean before = twice && k + 1 < times.length && times[k] == times[k + 1];
      Side side = before ? Side.BEFORE : Side.AFTER;
      solution.value(times[k], side, x);
      solution.errorEstimate(times[k], side, e);
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
        name,
        time,
        columns,
        solution.method(),
        accuracy,
        Reached.worst(system, solution).relative());
  }
}
