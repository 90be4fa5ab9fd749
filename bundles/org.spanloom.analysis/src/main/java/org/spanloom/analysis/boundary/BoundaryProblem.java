/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.boundary;

import java.util.ArrayList;
import java.util.List;
import java.util.TreeSet;
import org.spanloom.analysis.coefficients.CompiledSystem;
import org.spanloom.language.model.AffineValue;
import org.spanloom.language.model.Boundary;
import org.spanloom.language.model.TimeInterval;
import org.spanloom.language.units.UnitOfMeasure;
import org.spanloom.numerics.Outcome;
import org.spanloom.numerics.Progress;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.boundary.BoundaryAnswer;
import org.spanloom.numerics.boundary.BoundaryCondition;
import org.spanloom.numerics.boundary.BoundarySolver;

/**
 * Conditions of a model in the units of the numerics.
 *
 * @param system the system
 * @param name name of the conditions
 * @param range the interval, where it is bounded, else from the first to the last time named
 * @param conditions one for each component
 */
public record BoundaryProblem(
    CompiledSystem system, String name, TimeRange range, List<BoundaryCondition> conditions) {

  /** Copies the list. */
  public BoundaryProblem {
    conditions = List.copyOf(conditions);
  }

  /** Converts the conditions. */
  public static BoundaryProblem of(CompiledSystem system, Boundary boundary) {
    List<BoundaryCondition> conditions = new ArrayList<>();
    TreeSet<Double> times = new TreeSet<>();
    TimeInterval interval = system.model().interval();
    for (Boundary.Condition condition : boundary.conditions()) {
      List<BoundaryCondition.Sample> samples = new ArrayList<>();
      double value = system.terms().constant(condition.rightSide());
      for (AffineValue.Sample sample : condition.samples()) {
        UnitOfMeasure unit = system.model().states().get(sample.component()).unit();
        double coefficient = system.terms().constant(sample.coefficient());
        double time =
            Math.clamp(system.time(sample.at().orElseThrow()), interval.start(), interval.end());
        times.add(time);
        value -= coefficient * unit.toBase(0);
        samples.add(
            new BoundaryCondition.Sample(
                time,
                sample.before() ? Side.BEFORE : Side.AFTER,
                sample.component(),
                coefficient * unit.factor()));
      }
      conditions.add(new BoundaryCondition(samples, value));
    }
    boolean hasStart = Double.isFinite(interval.start()) && !interval.startOpen();
    boolean hasEnd = Double.isFinite(interval.end()) && !interval.endOpen();
    TimeRange range =
        new TimeRange(
            hasStart ? interval.start() : times.first(), hasEnd ? interval.end() : times.last());
    return new BoundaryProblem(system, boundary.name(), range, conditions);
  }

  /**
   * Decides the problem.
   *
   * @param accuracy relative error asked for
   * @param progress watched and asked while working
   */
  public Outcome<BoundaryAnswer> solve(double accuracy, Progress progress) {
    return BoundarySolver.solve(
        system.linear(), range, conditions, system.accuracy(accuracy), progress);
  }
}
