/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.math.BigDecimal;
import java.util.Map;
import org.spanloom.language.units.UnitOfMeasure;

/** When a jump takes place. */
public sealed interface JumpTimes {

  /** Most times that the jumps of one system may have together. */
  int LIMIT = 100_000;

  /** A time this close before the last one, in periods, is the last one. */
  double SLACK = 1e-9;

  /** {@code at 6}, in coherent SI units. */
  record Once(Term time) implements JumpTimes {}

  /** {@code every 8 from 0 to 40}, in coherent SI units; the ends are included. */
  record Repeated(Term period, Term first, Term last) implements JumpTimes {}

  /**
   * Returns how many times there are; 0 where the period is not positive, the ends are in the wrong
   * order, or some time is not finite.
   *
   * @param replaced values of parameters in coherent SI units, by name, that are not as declared
   */
  default long count(Map<String, Double> replaced) {
    return switch (this) {
      case Once(Term time) ->
          Double.isFinite(TermEvaluator.of(time, replaced).at(Double.NaN)) ? 1 : 0;
      case Repeated(Term period, Term first, Term last) -> {
        double step = TermEvaluator.of(period, replaced).at(Double.NaN);
        double from = TermEvaluator.of(first, replaced).at(Double.NaN);
        double to = TermEvaluator.of(last, replaced).at(Double.NaN);
        boolean sound = step > 0 && to >= from && Double.isFinite(from) && Double.isFinite(to);
        double periods = Math.floor((to - from) / step + SLACK);
        yield sound ? (long) Math.min(periods, Long.MAX_VALUE / 2) + 1 : 0;
      }
    };
  }

  /**
   * Returns the times in ascending order. They are multiples of the period in decimal digits, so
   * that the third of {@code every 0.1 from 0} is 0.3 and not a neighbour of it: a time named
   * elsewhere is the same number.
   *
   * @param unit the unit of time
   * @param replaced values of parameters in coherent SI units, by name, that are not as declared
   * @throws IllegalArgumentException if there are more than {@link #LIMIT}
   */
  default double[] times(UnitOfMeasure unit, Map<String, Double> replaced) {
    long count = count(replaced);
    if (count > LIMIT) {
      throw new IllegalArgumentException("more than " + LIMIT + " jumps");
    }
    double[] times = new double[(int) count];
    if (count == 0) {
      return times;
    }
    switch (this) {
      case Once(Term time) ->
          times[0] = unit.fromBase(TermEvaluator.of(time, replaced).at(Double.NaN));
      case Repeated(Term period, Term first, Term last) -> {
        BigDecimal step = decimal(period, unit, replaced);
        BigDecimal from = decimal(first, unit, replaced);
        double to = unit.fromBase(TermEvaluator.of(last, replaced).at(Double.NaN));
        for (int k = 0; k < times.length; k++) {
          double time = from.add(step.multiply(BigDecimal.valueOf(k))).doubleValue();
          times[k] = to - time < SLACK * step.doubleValue() ? to : time;
        }
      }
    }
    return times;
  }

  private static BigDecimal decimal(Term term, UnitOfMeasure unit, Map<String, Double> replaced) {
    return new BigDecimal(
        Double.toString(unit.fromBase(TermEvaluator.of(term, replaced).at(Double.NaN))));
  }
}
