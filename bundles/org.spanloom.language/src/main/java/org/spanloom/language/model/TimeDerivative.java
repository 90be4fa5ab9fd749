/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.List;

/**
 * Differentiates terms with respect to time, exactly.
 *
 * <p>Where a function has a corner the mean of both one-sided derivatives is taken: at {@code
 * abs(u)} for u = 0, at {@code min(u, v)} and {@code max(u, v)} for u = v. The jump of {@code
 * sign(u)} counts for nothing, and neither do those of a choice or a pulse. Shared sub-terms stay
 * shared.
 */
public final class TimeDerivative {

  private final TermTape tape;
  private final Term[] derivatives;

  private TimeDerivative(TermTape tape) {
    this.tape = tape;
    this.derivatives = new Term[tape.size()];
  }

  /**
   * Returns the derivative of a term, in its unit over the unit of time, coherent SI units
   * throughout.
   */
  public static Term of(Term term) {
    return new TimeDerivative(TermTape.of(term)).last();
  }

  private Term last() {
    for (int i = 0; i < derivatives.length; i++) {
      derivatives[i] = tape.varies(i) ? derivative(i) : Term.ZERO;
    }
    return derivatives[derivatives.length - 1];
  }

  private Term derivative(int i) {
    return switch (tape.node(i)) {
      case Term.Constant number -> Term.ZERO;
      case Term.Time t -> Term.ONE;
      case Term.ParameterTerm parameter -> below(i, 0);
      case Term.LetTerm let -> below(i, 0);
      case Term.Sum sum -> Simplifier.sum(below(i, 0), below(i, 1));
      case Term.Difference difference -> Simplifier.difference(below(i, 0), below(i, 1));
      case Term.Product(Term u, Term v) ->
          Simplifier.sum(Simplifier.product(below(i, 0), v), Simplifier.product(u, below(i, 1)));
      case Term.Quotient(Term u, Term v) -> quotient(tape.node(i), below(i, 0), v, below(i, 1));
      case Term.Negation negation -> Simplifier.negation(below(i, 0));
      case Term.Power(Term u, Term v) -> power(tape.node(i), u, below(i, 0), v, below(i, 1));
      case Term.Switch(Term gap, boolean atZero, Term a, Term b) ->
          Simplifier.choice(gap, atZero, below(i, 1), below(i, 2));
      case Term.Pulse pulse -> Term.ZERO;
      case Term.CurveTerm(String name, PiecewiseCurve curve, Term time) ->
          Simplifier.product(Simplifier.curve(name + "'", curve.derivative(), time), below(i, 0));
      case Term.FunctionTerm(Function f, List<Term> u) ->
          u.size() == 1
              ? Simplifier.product(outer(f, tape.node(i), u.getFirst()), below(i, 0))
              : choice(f, u, below(i, 0), below(i, 1));
    };
  }

  private Term below(int i, int which) {
    return derivatives[tape.operand(i, which)];
  }

  /** (u/v)' = (u' - (u/v) v') / v. */
  private static Term quotient(Term q, Term du, Term v, Term dv) {
    return Simplifier.quotient(Simplifier.difference(du, Simplifier.product(q, dv)), v);
  }

  /**
   * (u^v)' = v u^(v-1) u' + u^v log(u) v'; each part only where it does not vanish by structure.
   */
  private static Term power(Term p, Term u, Term du, Term v, Term dv) {
    Term ofBase = Term.ZERO;
    if (!Simplifier.isZero(du)) {
      Term lower = Simplifier.power(u, Simplifier.difference(v, Term.ONE));
      ofBase = Simplifier.product(Simplifier.product(v, lower), du);
    }
    if (Simplifier.isZero(dv)) {
      return ofBase;
    }
    Term ofExponent =
        Simplifier.product(Simplifier.product(p, Simplifier.call(Function.LOG, u)), dv);
    return Simplifier.sum(ofBase, ofExponent);
  }

  /** The derivative of f at u; {@code f} itself is at hand as a term. */
  private static Term outer(Function function, Term f, Term u) {
    return switch (function) {
      case SIN -> Simplifier.call(Function.COS, u);
      case COS -> Simplifier.negation(Simplifier.call(Function.SIN, u));
      case TAN -> Simplifier.sum(Term.ONE, square(f));
      case ASIN -> Simplifier.quotient(Term.ONE, legOfUnitCircle(u));
      case ACOS -> Simplifier.negation(Simplifier.quotient(Term.ONE, legOfUnitCircle(u)));
      case ATAN -> Simplifier.quotient(Term.ONE, Simplifier.sum(Term.ONE, square(u)));
      case SINH -> Simplifier.call(Function.COSH, u);
      case COSH -> Simplifier.call(Function.SINH, u);
      case TANH ->
          Simplifier.product(Simplifier.difference(Term.ONE, f), Simplifier.sum(Term.ONE, f));
      case EXP -> f;
      case LOG -> Simplifier.quotient(Term.ONE, u);
      case LOG10 ->
          Simplifier.quotient(
              Term.ONE, Simplifier.product(u, new Term.Constant(Function.LOG.apply(10))));
      case SQRT -> Simplifier.quotient(new Term.Constant(0.5), f);
      case ABS -> Simplifier.call(Function.SIGN, u);
      case SIGN -> Term.ZERO;
      case MIN, MAX -> throw new IllegalArgumentException(function.code() + " has two arguments");
    };
  }

  /** sqrt((1 - u) (1 + u)), which loses no digits near u = 1. */
  private static Term legOfUnitCircle(Term u) {
    return Simplifier.call(
        Function.SQRT,
        Simplifier.product(Simplifier.difference(Term.ONE, u), Simplifier.sum(Term.ONE, u)));
  }

  /** min(u, v)' = (u' + v')/2 - sign(u - v) (u' - v')/2, and max with the other sign. */
  private static Term choice(Function function, List<Term> arguments, Term du, Term dv) {
    Term half = new Term.Constant(0.5);
    Term sign =
        Simplifier.call(
            Function.SIGN, Simplifier.difference(arguments.getFirst(), arguments.getLast()));
    Term mean = Simplifier.product(half, Simplifier.sum(du, dv));
    Term turn = Simplifier.product(sign, Simplifier.product(half, Simplifier.difference(du, dv)));
    return function == Function.MIN
        ? Simplifier.difference(mean, turn)
        : Simplifier.sum(mean, turn);
  }

  private static Term square(Term u) {
    return Simplifier.power(u, new Term.Constant(2));
  }
}
