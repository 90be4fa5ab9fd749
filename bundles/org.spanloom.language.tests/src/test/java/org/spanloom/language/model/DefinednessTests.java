/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertTimeoutPreemptively;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.spanloom.language.model.TestTerms.T;
import static org.spanloom.language.model.TestTerms.add;
import static org.spanloom.language.model.TestTerms.c;
import static org.spanloom.language.model.TestTerms.cos;
import static org.spanloom.language.model.TestTerms.div;
import static org.spanloom.language.model.TestTerms.exp;
import static org.spanloom.language.model.TestTerms.f;
import static org.spanloom.language.model.TestTerms.let;
import static org.spanloom.language.model.TestTerms.mul;
import static org.spanloom.language.model.TestTerms.p;
import static org.spanloom.language.model.TestTerms.parameter;
import static org.spanloom.language.model.TestTerms.pow;
import static org.spanloom.language.model.TestTerms.sin;
import static org.spanloom.language.model.TestTerms.sub;

import java.time.Duration;
import java.util.Random;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;
import org.spanloom.language.model.Definedness.Cause;
import org.spanloom.language.units.Dimension;
import org.spanloom.language.units.UnitOfMeasure;

/** Where terms have no value; the places are exact, found by hand. */
class DefinednessTests {

  private static final UnitOfMeasure SECOND = new UnitOfMeasure("s", Dimension.TIME, 1, 0);
  private static final UnitOfMeasure HOUR = new UnitOfMeasure("h", Dimension.TIME, 3600, 0);
  private static final double NO_END = Double.POSITIVE_INFINITY;

  private static TimeInterval closed(double a, double b) {
    return new TimeInterval(a, false, b, false);
  }

  private static TimeInterval open(double a, double b) {
    return new TimeInterval(a, true, b, true);
  }

  private static Definedness examine(Term term, TimeInterval interval) {
    double start = Double.isFinite(interval.start()) ? interval.start() : 0;
    return Definedness.of(term, interval, SECOND, start);
  }

  static Stream<Arguments> faults() {
    Term square = add(sub(mul(T, T), mul(c(2), T)), c(1));
    return Stream.of(
        Arguments.of(div(c(1), sub(T, c(3))), closed(0, 10), 3, Cause.POLE),
        Arguments.of(div(c(1), T), closed(0, 10), 0, Cause.POLE),
        Arguments.of(div(c(1), T), closed(-10, 10), 0, Cause.POLE),
        Arguments.of(div(c(1), sub(c(10), T)), closed(0, 10), 10, Cause.POLE),
        Arguments.of(div(c(1), pow(sub(T, c(1)), 2)), closed(0, 3), 1, Cause.POLE),
        Arguments.of(div(c(1), square), closed(0, 3), 1, Cause.POLE),
        Arguments.of(div(c(1), square), closed(0, 4.1), 1, Cause.POLE),
        Arguments.of(div(c(1), sub(c(1), cos(sub(T, c(1))))), closed(0, 3), 1, Cause.POLE),
        Arguments.of(div(c(1), sub(sin(T), c(1))), closed(0, 3), Math.PI / 2, Cause.POLE),
        Arguments.of(div(c(1), sin(T)), closed(1, 100), Math.PI, Cause.POLE),
        Arguments.of(div(c(1), cos(mul(c(2), T))), closed(0, 100), Math.PI / 4, Cause.POLE),
        Arguments.of(div(c(1), mul(sub(T, c(5)), sub(T, c(2)))), closed(0, 9), 2, Cause.POLE),
        Arguments.of(div(c(1), mul(c(3), pow(sub(T, c(2)), 3))), closed(0, 9), 2, Cause.POLE),
        Arguments.of(div(c(1), f(Function.SQRT, sub(T, c(2)))), closed(2, 9), 2, Cause.POLE),
        Arguments.of(div(c(1), f(Function.ABS, sub(T, c(2)))), closed(0, 9), 2, Cause.POLE),
        Arguments.of(div(c(1), sub(exp(T), c(2))), closed(0, 9), Math.log(2), Cause.POLE),
        Arguments.of(pow(sub(T, c(4)), -1), closed(0, 9), 4, Cause.POWER),
        Arguments.of(pow(sub(c(4), T), 0.5), closed(0, 9), 4, Cause.POWER),
        Arguments.of(pow(sub(c(4), T), -0.5), closed(0, 9), 4, Cause.POWER),
        Arguments.of(f(Function.TAN, T), closed(0, 9), Math.PI / 2, Cause.TANGENT),
        Arguments.of(f(Function.LOG, sub(c(4), T)), closed(0, 9), 4, Cause.LOGARITHM),
        Arguments.of(f(Function.LOG10, sub(T, c(4))), closed(0, 9), 0, Cause.LOGARITHM),
        Arguments.of(f(Function.LOG, T), closed(0, 9), 0, Cause.LOGARITHM),
        Arguments.of(
            f(Function.LOG, sub(c(1), cos(T))), closed(1, 9), 2 * Math.PI, Cause.LOGARITHM),
        Arguments.of(f(Function.SQRT, sub(c(4), T)), closed(0, 9), 4, Cause.ROOT),
        Arguments.of(f(Function.SQRT, sin(T)), closed(1, 9), Math.PI, Cause.ROOT),
        Arguments.of(f(Function.ASIN, T), closed(0, 9), 1, Cause.INVERSE),
        Arguments.of(f(Function.ACOS, div(T, c(5))), closed(0, 9), 5, Cause.INVERSE),
        Arguments.of(exp(T), closed(0, 1000), 709.782712893384, Cause.OVERFLOW),
        Arguments.of(
            div(c(1), exp(mul(c(-1), T))), closed(0, 1000), 709.782712893384, Cause.OVERFLOW),
        Arguments.of(div(sin(T), T), closed(0, 9), 0, Cause.GAP),
        Arguments.of(div(sin(T), T), closed(-9, 9), 0, Cause.GAP),
        Arguments.of(div(sub(T, c(2)), sub(T, c(2))), closed(0, 9), 2, Cause.GAP),
        Arguments.of(div(sin(T), mul(T, T)), closed(-9, 9), 0, Cause.POLE),
        Arguments.of(
            div(c(1), sub(T, c(3))), new TimeInterval(0, false, NO_END, true), 3, Cause.POLE),
        Arguments.of(
            div(c(1), sub(T, c(3e6))), new TimeInterval(0, false, NO_END, true), 3e6, Cause.POLE),
        Arguments.of(
            div(c(1), add(T, c(3))), new TimeInterval(-NO_END, true, NO_END, true), -3, Cause.POLE),
        Arguments.of(
            f(Function.TAN, T),
            new TimeInterval(0, false, NO_END, true),
            Math.PI / 2,
            Cause.TANGENT));
  }

  @ParameterizedTest
  @MethodSource("faults")
  void findsThePlace(Term term, TimeInterval interval, double time, Cause cause) {
    Definedness.Undefined undefined =
        assertInstanceOf(
            Definedness.Undefined.class, examine(term, interval), TermPrinter.text(term, "t"));
    double length =
        interval.isBounded() ? interval.end() - interval.start() : Math.max(1, Math.abs(time));
    assertEquals(time, undefined.time(), 1e-9 * length);
    assertEquals(cause, undefined.cause());
  }

  static Stream<Arguments> sound() {
    Term square = add(sub(mul(T, T), mul(c(2), T)), c(1));
    return Stream.of(
        Arguments.of(T, closed(0, 10)),
        Arguments.of(c(4), closed(0, 10)),
        Arguments.of(div(c(1), sub(T, c(3))), closed(3.0000001, 10)),
        Arguments.of(div(c(1), sub(T, c(3))), new TimeInterval(3, true, 10, false)),
        Arguments.of(div(c(1), T), open(0, 10)),
        Arguments.of(div(c(1), T), open(0, NO_END)),
        Arguments.of(div(c(1), mul(T, sub(c(10), T))), open(0, 10)),
        Arguments.of(div(c(1), add(c(2), sin(T))), closed(0, 1e6)),
        Arguments.of(div(c(1), add(c(2), sin(T))), open(-NO_END, NO_END)),
        Arguments.of(div(c(1), add(c(1), mul(T, T))), open(-NO_END, NO_END)),
        Arguments.of(div(c(1), add(square, c(1e-6))), closed(0, 3)),
        Arguments.of(div(c(1), add(mul(T, T), c(1e-20))), closed(-1, 1)),
        Arguments.of(f(Function.LOG, T), new TimeInterval(0, true, 10, false)),
        Arguments.of(f(Function.SQRT, T), closed(0, 10)),
        Arguments.of(f(Function.SQRT, sub(c(10), T)), closed(0, 10)),
        Arguments.of(f(Function.SQRT, pow(sin(T), 2)), closed(0, 10)),
        Arguments.of(f(Function.ASIN, sin(T)), closed(0, 10)),
        Arguments.of(pow(T, 1.5), closed(0, 10)),
        Arguments.of(pow(sub(T, c(5)), 3), closed(0, 10)),
        Arguments.of(pow(c(2), T), closed(-10, 10)),
        Arguments.of(pow(T, T), new TimeInterval(0, true, 10, false)),
        Arguments.of(exp(mul(c(-1), T)), new TimeInterval(0, false, NO_END, true)),
        Arguments.of(exp(T), new TimeInterval(0, false, NO_END, true)),
        Arguments.of(f(Function.TAN, T), open(-Math.PI / 2, Math.PI / 2)),
        Arguments.of(div(c(1), exp(T)), closed(0, 700)),
        Arguments.of(div(c(1), f(Function.MAX, T, c(1))), closed(-5, 5)),
        Arguments.of(div(c(1), add(f(Function.SIGN, sub(T, c(1))), c(3))), closed(0, 5)));
  }

  @ParameterizedTest
  @MethodSource("sound")
  void provesThatThereIsNone(Term term, TimeInterval interval) {
    assertEquals(new Definedness.Defined(), examine(term, interval), TermPrinter.text(term, "t"));
  }

  @Test
  void namesTheLargestIntervalAroundTheStart() {
    Term term = div(c(1), mul(sub(T, c(2)), sub(T, c(7))));
    Definedness.Undefined middle =
        assertInstanceOf(
            Definedness.Undefined.class, Definedness.of(term, closed(0, 10), SECOND, 6));
    assertEquals(7, middle.time());
    assertEquals(2, middle.from());
    assertEquals(7, middle.to());
    Definedness.Undefined end =
        assertInstanceOf(
            Definedness.Undefined.class, Definedness.of(term, closed(0, 10), SECOND, 10));
    assertEquals(7, end.time());
    assertEquals(7, end.from());
    assertEquals(10, end.to());
    Definedness.Undefined on =
        assertInstanceOf(
            Definedness.Undefined.class, Definedness.of(term, closed(0, 10), SECOND, 2));
    assertEquals(2, on.from());
    assertEquals(2, on.to());
  }

  @Test
  void speaksInTheUnitOfTime() {
    Term term = div(c(1), sub(T, c(6 * 3600)));
    Definedness.Undefined undefined =
        assertInstanceOf(Definedness.Undefined.class, Definedness.of(term, closed(0, 48), HOUR, 0));
    assertEquals(6, undefined.time());
    assertEquals(0, undefined.from());
    assertEquals(6, undefined.to());
    assertEquals("t - 21600", TermPrinter.text(undefined.operand(), "t"));
  }

  @Test
  void aFaultyConstantIsFaultyAlways() {
    Parameter zero = parameter("k", c(0));
    Definedness.Undefined divided =
        assertInstanceOf(Definedness.Undefined.class, examine(div(T, p(zero)), closed(0, 1)));
    assertTrue(divided.always());
    assertEquals("k", TermPrinter.text(divided.operand(), "t"));
    Definedness.Undefined root =
        assertInstanceOf(
            Definedness.Undefined.class,
            examine(f(Function.SQRT, sub(p(zero), c(1))), closed(0, 1)));
    assertEquals(Cause.ROOT, root.cause());
    Definedness.Undefined large =
        assertInstanceOf(Definedness.Undefined.class, examine(exp(c(1000)), closed(0, 1)));
    assertEquals(Cause.OVERFLOW, large.cause());
  }

  @Test
  void looksIntoNamedExpressions() {
    Term door = let("door", sub(T, c(4)), true);
    Definedness.Undefined undefined =
        assertInstanceOf(Definedness.Undefined.class, examine(div(c(1), door), closed(0, 10)));
    assertEquals(4, undefined.time());
  }

  @Test
  void aHardQuestionIsLeftOpenInTime() {
    Term hard = c(0.001);
    for (int i = 1; i < 40; i++) {
      hard = add(hard, pow(sin(mul(c(i), T)), 2));
      hard = sub(hard, mul(sin(mul(c(i), T)), sin(mul(c(i), T))));
    }
    Term term = div(c(1), hard);
    Definedness answer =
        assertTimeoutPreemptively(Duration.ofSeconds(20), () -> examine(term, closed(0, 1e5)));
    assertInstanceOf(Definedness.Undecided.class, answer);
  }

  @Test
  void agreesWithDenseSampling() {
    Random random = new Random(7);
    int undefined = 0;
    int defined = 0;
    for (int i = 0; i < 2000; i++) {
      Term term = TestTerms.random(random, 4, false);
      String text = TermPrinter.text(term, "t");
      switch (examine(term, closed(-2, 3))) {
        case Definedness.Defined d -> {
          defined++;
          TermEvaluator evaluator = TermEvaluator.of(term);
          for (double t = -2; t <= 3; t += 1 / 512.0) {
            assertTrue(Double.isFinite(evaluator.at(t)), text + " at " + t);
          }
        }
        case Definedness.Undefined u -> {
          undefined++;
          if (!u.always() && u.to() > u.from()) {
            TermEvaluator evaluator = TermEvaluator.of(term);
            double from = Math.max(u.from(), -2);
            for (int k = 1; k < 200; k++) {
              double t = from + (u.to() - from) * k / 200;
              assertTrue(Double.isFinite(evaluator.at(t)), text + " at " + t + ": " + u);
            }
          }
        }
        case Definedness.Undecided open -> {}
      }
    }
    assertTrue(undefined > 300, "undefined: " + undefined);
    assertTrue(defined > 700, "defined: " + defined);
    assertTrue(2000 - undefined - defined < 40, "open: " + (2000 - undefined - defined));
  }
}
