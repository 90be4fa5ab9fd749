/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.List;

/**
 * A resolved scalar expression in coherent SI units; depends on parameters and, it may be, on time,
 * never on states. Terms are values and may share sub-terms; nothing in them depends on the text.
 */
public sealed interface Term {

  /** The number 0. */
  Term ZERO = new Constant(0);

  /** The number 1. */
  Term ONE = new Constant(1);

  /** A number, for example {@code 0.6 [kW/K]} as 600. */
  record Constant(double value) implements Term {}

  /** The independent variable in coherent SI units (seconds where it is a time). */
  record Time() implements Term {}

  /** A parameter; its value can be replaced by a run. */
  record ParameterTerm(Parameter parameter) implements Term {}

  /** A named expression; compile it once and share the value. */
  record LetTerm(Let let) implements Term {}

  /** {@code a + b}. */
  record Sum(Term left, Term right) implements Term {}

  /** {@code a - b}. */
  record Difference(Term left, Term right) implements Term {}

  /** {@code a * b}. */
  record Product(Term left, Term right) implements Term {}

  /** {@code a / b}. */
  record Quotient(Term left, Term right) implements Term {}

  /** {@code -a}. */
  record Negation(Term operand) implements Term {}

  /** {@code a ^ b}; a whole constant exponent is multiplied out where that is exact. */
  record Power(Term base, Term exponent) implements Term {}

  /**
   * {@code if gap < 0 then a else b}; only the branch that is taken needs a value.
   *
   * @param gap the smaller side of the condition as written minus the larger one
   * @param atZero whether the first branch is taken where the gap is 0, too
   * @param then the value where the condition holds
   * @param otherwise the value elsewhere
   */
  record Switch(Term gap, boolean atZero, Term then, Term otherwise) implements Term {

    /** Tells whether the condition holds for a value of the gap; not for one that is no number. */
    public boolean holds(double value) {
      return atZero ? value <= 0 : value < 0;
    }
  }

  /**
   * {@code pulse(t, period = P, width = W, start = S)}; see {@link PulseTrain}.
   *
   * @param time the running time, or a time put in its place
   * @param period without time
   * @param width without time
   * @param start without time
   */
  record Pulse(Term time, Term period, Term width, Term start) implements Term {}

  /**
   * The value of a table at a time.
   *
   * @param name name of the table
   * @param curve its interpolation, or a derivative of it
   * @param time the running time, or a time put in its place
   */
  record CurveTerm(String name, PiecewiseCurve curve, Term time) implements Term {}

  /** A call of a built-in function, for example {@code sin(w*t)}. */
  record FunctionTerm(Function function, List<Term> arguments) implements Term {
    /** Copies the list. */
    public FunctionTerm {
      arguments = List.copyOf(arguments);
    }
  }
}
