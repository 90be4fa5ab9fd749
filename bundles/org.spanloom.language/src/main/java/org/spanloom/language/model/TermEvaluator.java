/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.Map;

/**
 * Computes values of a term by walking through it: the reference for what a term means in floating
 * point, and the way to constants. Coefficients of a run are compiled instead.
 *
 * <p>A power with the exponent 2 is a product; other powers and all functions are those of {@link
 * StrictMath}. Values are not a number or infinite where the term is undefined or overflows; {@link
 * Definedness} tells where.
 */
public final class TermEvaluator {

  private final TermTape tape;
  private final Map<String, Double> replaced;
  private final double[] values;

  private TermEvaluator(TermTape tape, Map<String, Double> replaced) {
    this.tape = tape;
    this.replaced = Map.copyOf(replaced);
    this.values = new double[tape.size()];
  }

  /**
   * Returns an evaluator that takes parameters as declared; not for use by several threads at once.
   */
  public static TermEvaluator of(Term term) {
    return of(TermTape.of(term));
  }

  /** Returns an evaluator of a term that is laid out already. */
  static TermEvaluator of(TermTape tape) {
    return new TermEvaluator(tape, Map.of());
  }

  /**
   * Returns an evaluator that replaces values of parameters; not for use by several threads at
   * once.
   *
   * @param term the term
   * @param replaced values in coherent SI units by name of parameter
   */
  public static TermEvaluator of(Term term, Map<String, Double> replaced) {
    return new TermEvaluator(TermTape.of(term), replaced);
  }

  /** Returns the value of a term without time, parameters as declared, in coherent SI units. */
  public static double constant(Term term) {
    return term instanceof Term.Constant(double value) ? value : of(term).at(Double.NaN);
  }

  /** Returns the values of all nodes, those without time as {@link #constant} has them. */
  double[] constants() {
    at(Double.NaN);
    return values.clone();
  }

  /**
   * Returns the value at a time.
   *
   * @param time in coherent SI units
   * @return the value in coherent SI units
   */
  public double at(double time) {
    for (int i = 0; i < values.length; i++) {
      values[i] = value(i, time);
    }
    return values[values.length - 1];
  }

  private double value(int i, double time) {
    return switch (tape.node(i)) {
      case Term.Constant number -> number.value();
      case Term.Time t -> time;
      case Term.ParameterTerm parameter -> {
        Double other = replaced.get(parameter.parameter().name());
        yield other == null ? operand(i, 0) : other;
      }
      case Term.LetTerm let -> operand(i, 0);
      case Term.Sum sum -> operand(i, 0) + operand(i, 1);
      case Term.Difference difference -> operand(i, 0) - operand(i, 1);
      case Term.Product product -> operand(i, 0) * operand(i, 1);
      case Term.Quotient quotient -> operand(i, 0) / operand(i, 1);
      case Term.Negation negation -> -operand(i, 0);
      case Term.Power power -> power(operand(i, 0), operand(i, 1));
      case Term.Switch choice -> operand(i, choice.holds(operand(i, 0)) ? 1 : 2);
      case Term.Pulse pulse ->
          new PulseTrain(operand(i, 1), operand(i, 2), operand(i, 3)).at(operand(i, 0));
      case Term.CurveTerm curve -> curve.curve().at(operand(i, 0));
      case Term.FunctionTerm call ->
          call.arguments().size() == 1
              ? call.function().apply(operand(i, 0))
              : call.function().apply(operand(i, 0), operand(i, 1));
    };
  }

  /** Returns a power as a model means it. */
  public static double power(double base, double exponent) {
    return exponent == 2 ? base * base : StrictMath.pow(base, exponent);
  }

  private double operand(int i, int which) {
    return values[tape.operand(i, which)];
  }
}
