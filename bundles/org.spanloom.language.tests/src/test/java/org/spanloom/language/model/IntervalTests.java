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

import java.math.BigDecimal;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class IntervalTests {

  private static final double INF = Double.POSITIVE_INFINITY;

  @Test
  void exactEndsStayExact() {
    assertEquals(new Interval(-1, 3), new Interval(0, 1).plus(new Interval(-1, 2)));
    assertEquals(new Interval(-2, 1), new Interval(0, 1).minus(new Interval(0, 2)));
    assertEquals(new Interval(-6, 4), new Interval(-2, 1).times(new Interval(-2, 3)));
    assertEquals(new Interval(0.25, 2), new Interval(1, 4).over(new Interval(2, 4)));
    assertEquals(new Interval(0, 4), new Interval(-1, 2).squared());
    assertEquals(new Interval(2, 3), new Interval(4, 9).squareRoot());
  }

  @Test
  void roundedEndsEnclose() {
    Interval third = Interval.at(1).over(Interval.at(3));
    assertEquals(Math.nextUp(third.low()), third.high());
    assertTrue(
        new BigDecimal(third.low()).multiply(BigDecimal.valueOf(3)).compareTo(BigDecimal.ONE) < 0);
    assertTrue(
        new BigDecimal(third.high()).multiply(BigDecimal.valueOf(3)).compareTo(BigDecimal.ONE) > 0);
  }

  @Test
  void dividingByZeroLeavesTheRest() {
    assertEquals(Interval.EMPTY, Interval.at(1).over(Interval.at(0)));
    assertEquals(new Interval(0.5, INF), Interval.at(1).over(new Interval(0, 2)));
    assertEquals(new Interval(-INF, -0.5), Interval.at(1).over(new Interval(-2, 0)));
    assertEquals(Interval.ALL, Interval.at(1).over(new Interval(-1, 2)));
    assertEquals(new Interval(0, 1), Interval.at(1).over(new Interval(1, INF)));
  }

  @Test
  void overflowIsNoBound() {
    Interval large = Interval.at(1e200).times(Interval.at(1e200));
    assertEquals(new Interval(Double.MAX_VALUE, INF), large);
    assertEquals(
        new Interval(Double.MAX_VALUE, INF),
        TermIntervals.range(f(Function.EXP, c(1000)), Interval.at(0)));
  }

  @Test
  void randomOperationsEncloseExactResults() {
    Random random = new Random(3);
    for (int i = 0; i < 5_000; i++) {
      double a = random.nextGaussian() * Math.pow(2, random.nextInt(40) - 20);
      double b = random.nextGaussian() * Math.pow(2, random.nextInt(40) - 20);
      BigDecimal x = new BigDecimal(a);
      BigDecimal y = new BigDecimal(b);
      assertEncloses(Interval.at(a).plus(Interval.at(b)), x.add(y));
      assertEncloses(Interval.at(a).minus(Interval.at(b)), x.subtract(y));
      assertEncloses(Interval.at(a).times(Interval.at(b)), x.multiply(y));
      Interval q = Interval.at(a).over(Interval.at(b));
      assertTrue(q.high() - q.low() <= 2 * Math.ulp(q.high()));
      BigDecimal low = new BigDecimal(q.low()).multiply(y);
      BigDecimal high = new BigDecimal(q.high()).multiply(y);
      assertTrue(low.min(high).compareTo(x) <= 0 && low.max(high).compareTo(x) >= 0);
      Interval r = Interval.at(Math.abs(a)).squareRoot();
      assertTrue(new BigDecimal(r.low()).pow(2).compareTo(x.abs()) <= 0);
      assertTrue(new BigDecimal(r.high()).pow(2).compareTo(x.abs()) >= 0);
    }
  }

  private static void assertEncloses(Interval interval, BigDecimal exact) {
    assertTrue(new BigDecimal(interval.low()).compareTo(exact) <= 0);
    assertTrue(new BigDecimal(interval.high()).compareTo(exact) >= 0);
    assertTrue(interval.high() - interval.low() <= Math.ulp(interval.high()) * 2);
  }

  @ParameterizedTest
  @CsvSource({
    // function, argument from, to, least value, greatest value; by the shape of the graphs
    "SIN, 0, 1.5707963267948966, 0, 1",
    "SIN, 0, 4, -0.7568024953079282, 1",
    "SIN, 0, 100, -1, 1",
    "COS, 0, 1, 0.5403023058681398, 1",
    "COS, 3, 4, -1, -0.6536436208636119",
    "TAN, 0, 1, 0, 1.5574077246549022",
    "ASIN, -1, 1, -1.5707963267948966, 1.5707963267948966",
    "ACOS, -1, 1, 0, 3.141592653589793",
    "COSH, -1, 2, 1, 3.7621956910836314",
    "EXP, 0, 1, 1, 2.718281828459045",
    "LOG, 1, 10, 0, 2.302585092994046",
    "SQRT, -4, 9, 0, 3",
    "ABS, -4, 3, 0, 4",
    "SIGN, -4, 3, -1, 1"
  })
  void imagesOfFunctions(Function function, double from, double to, double low, double high) {
    Interval image = TermIntervals.range(f(function, T), new Interval(from, to));
    assertEquals(low, image.low(), 1e-14);
    assertEquals(high, image.high(), 1e-14);
    assertTrue(image.low() <= low && image.high() >= high, image::toString);
  }

  @Test
  void polesHaveNoBounds() {
    assertEquals(Interval.ALL, TermIntervals.range(f(Function.TAN, T), new Interval(1, 2)));
    assertEquals(Interval.EMPTY, TermIntervals.range(f(Function.LOG, T), new Interval(-2, -1)));
    assertEquals(new Interval(-8, 27), TermIntervals.range(pow(T, 3), new Interval(-2, 3)));
  }

  @Test
  void enclosuresContainSampledValues() {
    Random random = new Random(17);
    int seen = 0;
    for (int i = 0; i < 1500; i++) {
      Term term = TestTerms.random(random, 4, i % 2 == 0);
      double from = random.nextDouble() * 4 - 2;
      double to = from + random.nextDouble() * random.nextInt(4);
      Interval range = TermIntervals.range(term, new Interval(from, to));
      TermEvaluator evaluator = TermEvaluator.of(term);
      for (int k = 0; k <= 16; k++) {
        double t = from + (to - from) * k / 16;
        double value = evaluator.at(t);
        if (Double.isFinite(value) && !range.isEmpty()) {
          // Values themselves carry rounding errors of their own.
          double slack = 1e-9 * (1 + Math.abs(value));
          boolean inside = range.low() - slack <= value && value <= range.high() + slack;
          assertTrue(
              inside, TermPrinter.text(term, "t") + " at " + t + ": " + value + " in " + range);
          seen++;
        }
      }
    }
    assertTrue(seen > 10_000, "seen: " + seen);
  }
}
