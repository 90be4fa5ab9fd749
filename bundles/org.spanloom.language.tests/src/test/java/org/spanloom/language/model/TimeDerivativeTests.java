/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.spanloom.language.model.TestTerms.T;
import static org.spanloom.language.model.TestTerms.c;
import static org.spanloom.language.model.TestTerms.f;
import static org.spanloom.language.model.TestTerms.pow;
import static org.spanloom.language.model.TestTerms.sub;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.hipparchus.analysis.differentiation.DSFactory;
import org.hipparchus.analysis.differentiation.DerivativeStructure;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

/** Compares derivatives with those that Hipparchus computes beside the values. */
class TimeDerivativeTests {

  private static final DSFactory ONE_VARIABLE = new DSFactory(1, 1);

  /** Evaluates a term with its derivative by the rules of Hipparchus. */
  private static DerivativeStructure oracle(Term term, double time) {
    return switch (term) {
      case Term.Constant number -> ONE_VARIABLE.constant(number.value());
      case Term.Time t -> ONE_VARIABLE.variable(0, time);
      case Term.ParameterTerm parameter -> oracle(parameter.parameter().value(), time);
      case Term.LetTerm let -> oracle(let.let().value(), time);
      case Term.Sum(Term a, Term b) -> oracle(a, time).add(oracle(b, time));
      case Term.Difference(Term a, Term b) -> oracle(a, time).subtract(oracle(b, time));
      case Term.Product(Term a, Term b) -> oracle(a, time).multiply(oracle(b, time));
      case Term.Quotient(Term a, Term b) -> oracle(a, time).divide(oracle(b, time));
      case Term.Negation(Term a) -> oracle(a, time).negate();
      case Term.Power(Term a, Term.Constant n) -> oracle(a, time).pow(n.value());
      case Term.Power(Term a, Term b) -> oracle(a, time).pow(oracle(b, time));
      case Term.Switch choice ->
          choice.holds(TermEvaluator.of(choice.gap()).at(time))
              ? oracle(choice.then(), time)
              : oracle(choice.otherwise(), time);
      case Term.CurveTerm curve -> throw new IllegalArgumentException("no oracle for " + curve);
      case Term.Pulse pulse -> ONE_VARIABLE.constant(TermEvaluator.of(pulse).at(time));
      case Term.FunctionTerm(Function function, List<Term> a) -> call(function, a, time);
    };
  }

  private static DerivativeStructure call(Function function, List<Term> arguments, double time) {
    List<DerivativeStructure> x = new ArrayList<>();
    arguments.forEach(a -> x.add(oracle(a, time)));
    DerivativeStructure u = x.getFirst();
    return switch (function) {
      case SIN -> u.sin();
      case COS -> u.cos();
      case TAN -> u.tan();
      case ASIN -> u.asin();
      case ACOS -> u.acos();
      case ATAN -> u.atan();
      case SINH -> u.sinh();
      case COSH -> u.cosh();
      case TANH -> u.tanh();
      case EXP -> u.exp();
      case LOG -> u.log();
      case LOG10 -> u.log10();
      case SQRT -> u.sqrt();
      case ABS -> u.abs();
      case SIGN -> u.sign();
      case MIN -> u.getValue() < x.get(1).getValue() ? u : x.get(1);
      case MAX -> u.getValue() > x.get(1).getValue() ? u : x.get(1);
    };
  }

  private static void compare(Term term, double time, double tolerance) {
    double expected = oracle(term, time).getPartialDerivative(1);
    double actual = TermEvaluator.of(TimeDerivative.of(term)).at(time);
    if (Double.isFinite(expected) && Double.isFinite(actual)) {
      double scale = Math.max(1, Math.abs(expected));
      assertEquals(
          expected, actual, tolerance * scale, TermPrinter.text(term, "t") + " at " + time);
    }
  }

  @ParameterizedTest
  @EnumSource(Function.class)
  void everyFunctionAgrees(Function function) {
    Term u = TestTerms.add(TestTerms.mul(c(0.4), T), TestTerms.mul(c(0.1), TestTerms.mul(T, T)));
    Term term = function.arity() == 1 ? f(function, u) : f(function, u, sub(c(1), T));
    int compared = 0;
    for (double t = 0.05; t < 1.3; t += 0.1) {
      assertTrue(Double.isFinite(TermEvaluator.of(TimeDerivative.of(term)).at(t)));
      compare(term, t, 1e-13);
      compared++;
    }
    assertTrue(compared > 10);
  }

  @Test
  void powersAgree() {
    for (double t : new double[] {0.3, 1, 2.5}) {
      compare(pow(T, 3), t, 1e-14);
      compare(pow(T, -2), t, 1e-14);
      compare(pow(T, 0.5), t, 1e-14);
      compare(pow(c(2), T), t, 1e-14);
      compare(pow(T, T), t, 1e-14);
      compare(pow(sub(T, c(5)), 3), t, 1e-14);
    }
  }

  @Test
  void randomTermsAgree() {
    Random random = new Random(5);
    for (int i = 0; i < 1500; i++) {
      Term term = TestTerms.random(random, 4, true);
      for (double t : new double[] {-0.9, 0.21, 1.3}) {
        compare(term, t, 1e-10);
      }
    }
  }

  @Test
  void constantsVanishByStructure() {
    Term k = TestTerms.p(TestTerms.parameter("k", c(3)));
    assertEquals(Term.ZERO, TimeDerivative.of(TestTerms.mul(k, TestTerms.sin(k))));
    assertEquals(k, TimeDerivative.of(TestTerms.mul(k, T)));
  }

  @Test
  void aCornerHasTheMeanOfBothSides() {
    assertEquals(0, TermEvaluator.of(TimeDerivative.of(f(Function.ABS, T))).at(0));
    assertEquals(0.5, TermEvaluator.of(TimeDerivative.of(f(Function.MAX, T, c(0)))).at(0));
    assertEquals(1, TermEvaluator.of(TimeDerivative.of(f(Function.MAX, T, c(0)))).at(2));
    assertEquals(0, TermEvaluator.of(TimeDerivative.of(f(Function.MIN, T, c(0)))).at(2));
  }
}
