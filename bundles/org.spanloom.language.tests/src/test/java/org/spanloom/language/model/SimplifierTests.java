/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.spanloom.language.model.TestTerms.T;
import static org.spanloom.language.model.TestTerms.add;
import static org.spanloom.language.model.TestTerms.c;
import static org.spanloom.language.model.TestTerms.div;
import static org.spanloom.language.model.TestTerms.f;
import static org.spanloom.language.model.TestTerms.let;
import static org.spanloom.language.model.TestTerms.mul;
import static org.spanloom.language.model.TestTerms.neg;
import static org.spanloom.language.model.TestTerms.p;
import static org.spanloom.language.model.TestTerms.parameter;
import static org.spanloom.language.model.TestTerms.pow;

import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.spanloom.language.units.UnitOfMeasure;

class SimplifierTests {

  private static final Term K = p(parameter("k", c(3)));

  @Test
  void leavesOutZerosAndOnes() {
    assertSame(K, Simplifier.sum(Term.ZERO, K));
    assertSame(K, Simplifier.sum(K, Term.ZERO));
    assertSame(K, Simplifier.difference(K, Term.ZERO));
    assertEquals(neg(K), Simplifier.difference(Term.ZERO, K));
    assertSame(K, Simplifier.product(Term.ONE, K));
    assertSame(K, Simplifier.product(K, Term.ONE));
    assertSame(K, Simplifier.quotient(K, Term.ONE));
    assertSame(K, Simplifier.power(K, Term.ONE));
    assertEquals(Term.ONE, Simplifier.power(K, Term.ZERO));
    assertEquals(neg(K), Simplifier.product(c(-1), K));
    assertEquals(neg(K), Simplifier.quotient(K, c(-1)));
  }

  @Test
  void structuralZerosAreSeen() {
    assertTrue(Simplifier.isZero(Simplifier.product(Term.ZERO, K)));
    assertTrue(Simplifier.isZero(Simplifier.product(TestTerms.sin(T), Term.ZERO)));
    assertTrue(Simplifier.isZero(Simplifier.difference(mul(K, T), mul(K, T))));
    assertTrue(Simplifier.isZero(Simplifier.product(let("a", add(K, T), true), Term.ZERO)));
  }

  @Test
  void aPlaceWithoutValueIsKept() {
    Term pole = div(c(1), T);
    assertEquals(mul(Term.ZERO, pole), Simplifier.product(Term.ZERO, pole));
    assertEquals(TestTerms.sub(pole, pole), Simplifier.difference(pole, pole));
    assertEquals(pow(pole, 0), Simplifier.power(pole, Term.ZERO));
    Term hidden = let("a", pole, true);
    assertEquals(mul(hidden, Term.ZERO), Simplifier.product(hidden, Term.ZERO));
    assertEquals(div(c(1), c(0)), Simplifier.quotient(c(1), c(0)));
    assertEquals(f(Function.LOG, c(-1)), Simplifier.call(Function.LOG, c(-1)));
    assertEquals(div(Term.ZERO, K), Simplifier.quotient(Term.ZERO, K));
  }

  @Test
  void signsMoveOutward() {
    assertSame(K, Simplifier.negation(neg(K)));
    assertEquals(TestTerms.sub(T, K), Simplifier.sum(T, neg(K)));
    assertEquals(add(T, K), Simplifier.difference(T, neg(K)));
    assertEquals(mul(T, K), Simplifier.product(neg(T), neg(K)));
    assertEquals(div(T, K), Simplifier.quotient(neg(T), neg(K)));
    assertEquals(TestTerms.sub(K, T), Simplifier.negation(TestTerms.sub(T, K)));
  }

  @Test
  void numbersAreWorkedOut() {
    assertEquals(c(5), Simplifier.sum(c(2), c(3)));
    assertEquals(c(0.1 + 0.2), Simplifier.sum(c(0.1), c(0.2)));
    assertEquals(c(8), Simplifier.power(c(2), c(3)));
    assertEquals(c(3), Simplifier.call(Function.MAX, List.of(c(2), c(3))));
    assertEquals(c(-2), Simplifier.negation(c(2)));
  }

  /** Rebuilds a term through the simplifier. */
  private static Term rebuilt(Term term) {
    return switch (term) {
      case Term.Constant number -> number;
      case Term.Time t -> t;
      case Term.ParameterTerm parameter -> parameter;
      case Term.LetTerm let -> let;
      case Term.Sum(Term a, Term b) -> Simplifier.sum(rebuilt(a), rebuilt(b));
      case Term.Difference(Term a, Term b) -> Simplifier.difference(rebuilt(a), rebuilt(b));
      case Term.Product(Term a, Term b) -> Simplifier.product(rebuilt(a), rebuilt(b));
      case Term.Quotient(Term a, Term b) -> Simplifier.quotient(rebuilt(a), rebuilt(b));
      case Term.Negation(Term a) -> Simplifier.negation(rebuilt(a));
      case Term.Power(Term a, Term b) -> Simplifier.power(rebuilt(a), rebuilt(b));
      case Term.Switch(Term gap, boolean atZero, Term a, Term b) ->
          Simplifier.choice(rebuilt(gap), atZero, rebuilt(a), rebuilt(b));
      case Term.CurveTerm curve -> curve;
      case Term.Pulse(Term time, Term period, Term width, Term start) ->
          Simplifier.pulse(rebuilt(time), period, width, start);
      case Term.FunctionTerm(Function f, List<Term> a) ->
          Simplifier.call(f, a.stream().map(SimplifierTests::rebuilt).toList());
    };
  }

  @Test
  void theValueStaysTheSameBitForBit() {
    Random random = new Random(11);
    int compared = 0;
    for (int i = 0; i < 1500; i++) {
      Term term = TestTerms.random(random, 5, i % 2 == 0);
      Term simpler = rebuilt(term);
      TermEvaluator before = TermEvaluator.of(term);
      TermEvaluator after = TermEvaluator.of(simpler);
      for (double t : new double[] {-1.7, 0.3, 1, 2.9}) {
        double expected = before.at(t);
        TimeInterval now = new TimeInterval(t, false, t, false);
        if (Definedness.of(term, now, UnitOfMeasure.ONE, t) instanceof Definedness.Defined) {
          // Adding 0 makes both zeros one.
          assertEquals(expected + 0.0, after.at(t) + 0.0, TermPrinter.text(term, "t"));
          compared++;
        }
      }
    }
    assertTrue(compared > 3000);
  }

  @Test
  void aLongSumNeedsNoDepth() {
    Term sum = T;
    for (int i = 0; i < 200_000; i++) {
      sum = Simplifier.sum(sum, T);
    }
    assertEquals(200_001, TermEvaluator.of(sum).at(1));
    assertEquals(200_001, TermEvaluator.constant(TimeDerivative.of(sum)));
    assertEquals(TimeDependence.TIME, TimeDependence.of(sum));
    assertEquals(new Interval(200_001, 400_002), TermIntervals.range(sum, new Interval(1, 2)));
    assertTrue(TermPrinter.text(sum, "t").length() <= 200);
  }

  @Test
  void sharedTermsAreTakenOnce() {
    Term doubled = add(K, T);
    for (int i = 0; i < 60; i++) {
      doubled = let("x" + i, mul(add(doubled, doubled), c(0.5)), true);
    }
    assertEquals(5, TermEvaluator.of(doubled).at(2));
    assertEquals(1, TermEvaluator.of(TimeDerivative.of(doubled)).at(2));
  }

  @Test
  void dependenceIsStructural() {
    assertEquals(TimeDependence.NUMBER, TimeDependence.of(f(Function.SIN, c(1))));
    assertEquals(TimeDependence.PARAMETERS, TimeDependence.of(mul(K, c(2))));
    assertEquals(TimeDependence.TIME, TimeDependence.of(let("a", mul(K, T), true)));
    assertEquals(TimeDependence.PARAMETERS, TimeDependence.of(let("b", mul(K, K), false)));
  }
}
