/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.IdentityHashMap;
import java.util.Map;

/**
 * Values of terms without time that are plainly defined: every step towards them has a finite value
 * and lies well inside the domain of its operation. Each parameter and each named expression is
 * looked at once, so that most coefficients of a large model are settled in no time.
 */
final class KnownConstants {

  /** Says that a term depends on time, or that it takes a closer look. */
  private static final double UNKNOWN = Double.NaN;

  /** Steps for one term; sub-terms that are shared without a name could repeat without end. */
  private static final int MOST_STEPS = 1000;

  private final Map<Object, Double> values = new IdentityHashMap<>();
  private int steps;

  /** Tells whether a term has one finite value at all times; no where that is not plain. */
  boolean isKnown(Term term) {
    steps = 0;
    return !Double.isNaN(value(term));
  }

  private double value(Term term) {
    if (++steps > MOST_STEPS) {
      return UNKNOWN;
    }
    double value =
        switch (term) {
          case Term.Constant number -> number.value();
          case Term.ParameterTerm(Parameter parameter) -> named(parameter, parameter.value());
          case Term.LetTerm(Let let) -> let.dependsOnTime() ? UNKNOWN : named(let, let.value());
          case Term.Sum(Term a, Term b) -> value(a) + value(b);
          case Term.Difference(Term a, Term b) -> value(a) - value(b);
          case Term.Product(Term a, Term b) -> value(a) * value(b);
          case Term.Quotient(Term a, Term b) -> value(a) / value(b);
          case Term.Negation(Term a) -> -value(a);
          case Term.Power(Term base, Term exponent) -> power(value(base), value(exponent));
          case Term.FunctionTerm call -> call(call);
          case Term.Switch(Term gap, boolean atZero, Term a, Term b) -> {
            double size = value(gap);
            boolean holds = atZero ? size <= 0 : size < 0;
            yield Double.isNaN(size) ? UNKNOWN : value(holds ? a : b);
          }
          case Term.Pulse pulse -> UNKNOWN;
          case Term.CurveTerm curve -> UNKNOWN;
          case Term.Time time -> UNKNOWN;
        };
    return Double.isFinite(value) ? value : UNKNOWN;
  }

  private double named(Object named, Term value) {
    Double known = values.get(named);
    if (known == null) {
      known = value(value);
      values.put(named, known);
    }
    return known;
  }

  private static double power(double base, double exponent) {
    return base > 0 ? TermEvaluator.power(base, exponent) : UNKNOWN;
  }

  private double call(Term.FunctionTerm call) {
    double first = value(call.arguments().getFirst());
    boolean inside =
        switch (call.function().domain()) {
          case EVERYWHERE -> true;
          case POSITIVE, NOT_NEGATIVE -> first > 0;
          case FROM_MINUS_ONE_TO_ONE -> Math.abs(first) < 1;
          case NOT_ODD_QUARTER_TURNS -> false;
        };
    if (!inside) {
      return UNKNOWN;
    }
    return call.arguments().size() == 1
        ? call.function().apply(first)
        : call.function().apply(first, value(call.arguments().get(1)));
  }
}
