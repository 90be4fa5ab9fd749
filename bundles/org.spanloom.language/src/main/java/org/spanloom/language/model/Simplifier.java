/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayDeque;
import java.util.Deque;
import java.util.List;

/**
 * Builds terms and leaves out what does nothing, so that structural zeros are seen and matrices
 * stay sparse.
 *
 * <p>Only identities that hold bit for bit in floating point are used, up to the sign of a zero:
 * {@code 0 + x = x}, {@code 1 x = x}, {@code -(-x) = x}, {@code a - (-b) = a + b}, {@code x - x =
 * 0} and {@code 0 x = 0} where x surely has a value, and the arithmetic of numbers, done as a run
 * would do it. Nothing is reordered or multiplied out. A factor that may be undefined somewhere,
 * such as {@code 1/t}, is kept even beside a zero, so that the place is reported.
 */
public final class Simplifier {

  /** Nodes looked at before a question of structure is answered with no. */
  private static final int PATIENCE = 200;

  private Simplifier() {}

  /** Tells whether a term is zero by structure. */
  public static boolean isZero(Term term) {
    return isNumber(term, 0);
  }

  /** Tells whether a term is one by structure. */
  public static boolean isOne(Term term) {
    return isNumber(term, 1);
  }

  /** Returns {@code a + b}. */
  public static Term sum(Term a, Term b) {
    if (isZero(a)) {
      return b;
    }
    if (isZero(b)) {
      return a;
    }
    if (b instanceof Term.Negation negation) {
      return difference(a, negation.operand());
    }
    return folded(new Term.Sum(a, b));
  }

  /** Returns {@code a - b}. */
  public static Term difference(Term a, Term b) {
    if (isZero(b)) {
      return a;
    }
    if (isZero(a)) {
      return negation(b);
    }
    if (b instanceof Term.Negation negation) {
      return sum(a, negation.operand());
    }
    if (isSame(a, b) && surelyHasAValue(a)) {
      return Term.ZERO;
    }
    return folded(new Term.Difference(a, b));
  }

  /** Returns {@code a * b}. */
  public static Term product(Term a, Term b) {
    if (isOne(a)) {
      return b;
    }
    if (isOne(b)) {
      return a;
    }
    if (isZero(a) && surelyHasAValue(b) || isZero(b) && surelyHasAValue(a)) {
      return Term.ZERO;
    }
    if (isNumber(a, -1)) {
      return negation(b);
    }
    if (isNumber(b, -1)) {
      return negation(a);
    }
    if (a instanceof Term.Negation left && b instanceof Term.Negation right) {
      return product(left.operand(), right.operand());
    }
    return folded(new Term.Product(a, b));
  }

  /** Returns {@code a / b}. */
  public static Term quotient(Term a, Term b) {
    if (isOne(b)) {
      return a;
    }
    if (isNumber(b, -1)) {
      return negation(a);
    }
    if (a instanceof Term.Negation left && b instanceof Term.Negation right) {
      return quotient(left.operand(), right.operand());
    }
    return folded(new Term.Quotient(a, b));
  }

  /** Returns {@code -a}. */
  public static Term negation(Term a) {
    return switch (a) {
      case Term.Negation negation -> negation.operand();
      case Term.Difference difference -> new Term.Difference(difference.right(), difference.left());
      case Term.Constant number ->
          number.value() == 0 ? Term.ZERO : new Term.Constant(-number.value());
      case Term.Time t -> new Term.Negation(a);
      case Term.ParameterTerm p -> new Term.Negation(a);
      case Term.LetTerm let -> new Term.Negation(a);
      case Term.Sum sum -> new Term.Negation(a);
      case Term.Product product -> new Term.Negation(a);
      case Term.Quotient quotient -> new Term.Negation(a);
      case Term.Power power -> new Term.Negation(a);
      case Term.Switch choice -> new Term.Negation(a);
      case Term.Pulse pulse -> new Term.Negation(a);
      case Term.CurveTerm curve -> new Term.Negation(a);
      case Term.FunctionTerm call -> new Term.Negation(a);
    };
  }

  /** Returns {@code a ^ b}. */
  public static Term power(Term a, Term b) {
    if (isOne(b)) {
      return a;
    }
    if (isZero(b) && surelyHasAValue(a)) {
      return Term.ONE;
    }
    return folded(new Term.Power(a, b));
  }

  /**
   * Returns {@code if gap < 0 then a else b}, or {@code <=}; a branch that is never taken is left
   * out.
   */
  public static Term choice(Term gap, boolean atZero, Term then, Term otherwise) {
    Term.Switch choice = new Term.Switch(gap, atZero, then, otherwise);
    if (gap instanceof Term.Constant(double value)) {
      return choice.holds(value) ? then : otherwise;
    }
    return isSame(then, otherwise) && surelyHasAValue(gap) ? then : choice;
  }

  /** Returns {@code pulse(time, period, width, start)}. */
  public static Term pulse(Term time, Term period, Term width, Term start) {
    return folded(new Term.Pulse(time, period, width, start));
  }

  /** Returns the value of a table at a time. */
  public static Term curve(String name, PiecewiseCurve curve, Term time) {
    return folded(new Term.CurveTerm(name, curve, time));
  }

  /** Returns the value of a function. */
  public static Term call(Function function, List<Term> arguments) {
    return folded(new Term.FunctionTerm(function, arguments));
  }

  /** Returns the value of a function of one argument. */
  public static Term call(Function function, Term argument) {
    return call(function, List.of(argument));
  }

  /**
   * An operation on numbers is done at once, unless the result is not finite: its place is to be
   * reported.
   */
  private static Term folded(Term operation) {
    for (Term operand : TermTape.operands(operation)) {
      if (!(operand instanceof Term.Constant)) {
        return operation;
      }
    }
    double value = TermEvaluator.constant(operation);
    return Double.isFinite(value) ? new Term.Constant(value) : operation;
  }

  private static boolean isNumber(Term term, double value) {
    return term instanceof Term.Constant number && number.value() == value;
  }

  /**
   * Tells whether a term has a value for every time and every parameter: no division, power or
   * function that is not defined everywhere occurs in it.
   */
  static boolean surelyHasAValue(Term term) {
    Deque<Term> open = new ArrayDeque<>(List.of(term));
    for (int seen = 0; !open.isEmpty(); seen++) {
      Term next = open.pop();
      if (seen == PATIENCE || !isTotal(next)) {
        return false;
      }
      TermTape.operands(next).forEach(open::push);
    }
    return true;
  }

  private static boolean isTotal(Term term) {
    return switch (term) {
      case Term.Constant number -> Double.isFinite(number.value());
      case Term.Quotient quotient ->
          quotient.right() instanceof Term.Constant number && number.value() != 0;
      case Term.Power power ->
          power.exponent() instanceof Term.Constant n
              && n.value() >= 0
              && n.value() == Math.rint(n.value());
      case Term.FunctionTerm call -> call.function().domain() == Function.Domain.EVERYWHERE;
      case Term.Time t -> true;
      case Term.ParameterTerm p -> true;
      case Term.LetTerm let -> true;
      case Term.Sum sum -> true;
      case Term.Difference difference -> true;
      case Term.Product product -> true;
      case Term.Negation negation -> true;
      case Term.Switch choice -> true;
      case Term.Pulse pulse -> true;
      case Term.CurveTerm curve -> true;
    };
  }

  /** Tells whether two terms are built alike; no after a bounded search. */
  static boolean isSame(Term a, Term b) {
    Deque<Term[]> open = new ArrayDeque<>();
    open.push(new Term[] {a, b});
    for (int seen = 0; !open.isEmpty(); seen++) {
      Term[] pair = open.pop();
      if (pair[0] == pair[1]) {
        continue;
      }
      if (seen == PATIENCE || !isSameKind(pair[0], pair[1])) {
        return false;
      }
      if (pair[0] instanceof Term.ParameterTerm || pair[0] instanceof Term.LetTerm) {
        continue;
      }
      List<Term> left = TermTape.operands(pair[0]);
      List<Term> right = TermTape.operands(pair[1]);
      for (int i = 0; i < left.size(); i++) {
        open.push(new Term[] {left.get(i), right.get(i)});
      }
    }
    return true;
  }

  private static boolean isSameKind(Term a, Term b) {
    return switch (a) {
      case Term.Constant x -> b instanceof Term.Constant y && x.value() == y.value();
      case Term.ParameterTerm x ->
          b instanceof Term.ParameterTerm y && x.parameter() == y.parameter();
      case Term.LetTerm x -> b instanceof Term.LetTerm y && x.let() == y.let();
      case Term.FunctionTerm x -> b instanceof Term.FunctionTerm y && x.function() == y.function();
      case Term.Time x -> b instanceof Term.Time;
      case Term.Sum x -> b instanceof Term.Sum;
      case Term.Difference x -> b instanceof Term.Difference;
      case Term.Product x -> b instanceof Term.Product;
      case Term.Quotient x -> b instanceof Term.Quotient;
      case Term.Negation x -> b instanceof Term.Negation;
      case Term.Power x -> b instanceof Term.Power;
      case Term.Switch x -> b instanceof Term.Switch y && x.atZero() == y.atZero();
      case Term.Pulse x -> b instanceof Term.Pulse;
      case Term.CurveTerm x -> b instanceof Term.CurveTerm y && x.curve() == y.curve();
    };
  }
}
