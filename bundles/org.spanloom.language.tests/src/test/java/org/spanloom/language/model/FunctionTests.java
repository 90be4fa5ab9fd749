/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
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
import static org.spanloom.language.model.TestTerms.sub;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.EnumSource;
import org.spanloom.language.units.Dimension;

class FunctionTests {

  private static final Dimension LENGTH = new Dimension(new int[] {1, 0, 0, 0, 0, 0, 0});

  @ParameterizedTest
  @CsvSource({
    // Abramowitz and Stegun, Handbook of Mathematical Functions, tables 4.6 to 4.16 and 1.1 (from
    // memory)
    "sin, 1, 0.8414709848078965",
    "cos, 1, 0.5403023058681398",
    "tan, 1, 1.5574077246549023",
    "asin, 0.5, 0.5235987755982989",
    "acos, 0.5, 1.0471975511965979",
    "atan, 1, 0.7853981633974483",
    "sinh, 1, 1.1752011936438014",
    "cosh, 1, 1.5430806348152437",
    "tanh, 1, 0.7615941559557649",
    "exp, 1, 2.718281828459045",
    "log, 2, 0.6931471805599453",
    "log10, 2, 0.3010299956639812",
    "sqrt, 2, 1.4142135623730951",
    "abs, -2, 2",
    "sign, -2, -1"
  })
  void valuesAreThoseOfTheTables(String name, double x, double value) {
    assertEquals(value, Function.named(name).orElseThrow().apply(x), 4e-16 * Math.max(1, value));
  }

  @ParameterizedTest
  @EnumSource(Function.class)
  void namesLeadBack(Function function) {
    assertEquals(Optional.of(function), Function.named(function.code()));
    assertEquals(
        Optional.empty(), Function.named(function.code().toUpperCase(java.util.Locale.ROOT)));
    assertThrows(IllegalArgumentException.class, () -> function.apply(1, 2, 3));
  }

  @Test
  void dimensionsFollowTheRules() {
    Dimension area = LENGTH.power(2);
    assertEquals(Optional.of(LENGTH), Function.SQRT.dimension(List.of(area)));
    assertEquals(Optional.empty(), Function.SQRT.dimension(List.of(LENGTH)));
    assertEquals(Optional.of(LENGTH), Function.ABS.dimension(List.of(LENGTH)));
    assertEquals(Optional.of(Dimension.NONE), Function.SIGN.dimension(List.of(LENGTH)));
    assertEquals(Optional.of(LENGTH), Function.MIN.dimension(List.of(LENGTH, LENGTH)));
    assertEquals(Optional.empty(), Function.MAX.dimension(List.of(LENGTH, area)));
    assertEquals(Optional.empty(), Function.SIN.dimension(List.of(LENGTH)));
    assertEquals(Optional.of(Dimension.NONE), Function.EXP.dimension(List.of(Dimension.NONE)));
  }

  @Test
  void piIsNamed() {
    assertEquals(Optional.of(NamedConstant.PI), NamedConstant.named("pi"));
    assertEquals(Math.PI, NamedConstant.PI.value());
    assertEquals(Optional.empty(), NamedConstant.named("e"));
  }

  @Test
  void termsReadAsTheyWereWritten() {
    Term k = p(parameter("k", c(3)));
    Term door = let("door", T, true);
    Term area = let("area", k, false);
    assertEquals("k*(t - 21600)", TermPrinter.text(mul(k, sub(T, c(21600))), "t"));
    assertEquals("t - (k - 1)", TermPrinter.text(sub(T, sub(k, c(1))), "t"));
    assertEquals("k/(t*area)", TermPrinter.text(div(k, mul(T, area)), "t"));
    assertEquals("k/t*area", TermPrinter.text(mul(div(k, T), area), "t"));
    assertEquals("(-t)^2", TermPrinter.text(pow(neg(T), 2), "t"));
    assertEquals("-t^2", TermPrinter.text(neg(pow(T, 2)), "t"));
    assertEquals("k*(-t)", TermPrinter.text(mul(k, neg(T)), "t"));
    assertEquals("max(door(s), 0.5)", TermPrinter.text(f(Function.MAX, door, c(0.5)), "s"));
    assertEquals("1.5e-7 + 2^t", TermPrinter.text(add(c(1.5e-7), pow(c(2), T)), "t"));
  }

  @Test
  void parametersCanBeReplaced() {
    Parameter k = parameter("k", c(3));
    Parameter twice = parameter("twice", mul(c(2), p(k)));
    Term term = add(p(twice), T);
    assertEquals(7, TermEvaluator.of(term).at(1));
    assertEquals(21, TermEvaluator.of(term, Map.of("k", 10.0)).at(1));
    assertEquals(5, TermEvaluator.of(term, Map.of("k", 10.0, "twice", 4.0)).at(1));
    assertEquals(6, TermEvaluator.constant(p(twice)));
    assertTrue(Double.isNaN(TermEvaluator.constant(term)));
  }
}
