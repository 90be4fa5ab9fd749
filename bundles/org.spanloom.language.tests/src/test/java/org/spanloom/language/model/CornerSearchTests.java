/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.spanloom.language.model.TestTerms.T;
import static org.spanloom.language.model.TestTerms.add;
import static org.spanloom.language.model.TestTerms.c;
import static org.spanloom.language.model.TestTerms.f;
import static org.spanloom.language.model.TestTerms.mul;
import static org.spanloom.language.model.TestTerms.p;
import static org.spanloom.language.model.TestTerms.parameter;
import static org.spanloom.language.model.TestTerms.pow;
import static org.spanloom.language.model.TestTerms.sin;
import static org.spanloom.language.model.TestTerms.sub;

import java.util.Map;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.spanloom.language.model.Corners.Corner;

/** Where terms change their formula; the times are found by hand. */
class CornerSearchTests {

  private static Corners corners(Term term, double from, double to, double factor) {
    CornerSearch search = new CornerSearch(from, to, factor, Map.of());
    search.add(term);
    return search.result();
  }

  private static double[] times(Term term, double from, double to) {
    Corners corners = corners(term, from, to, 1);
    assertTrue(corners.gap().isEmpty());
    return corners.list().stream().mapToDouble(Corner::time).toArray();
  }

  private static Term step(Term gap, boolean atZero) {
    return new Term.Switch(gap, atZero, c(1), c(0));
  }

  @Test
  void aStepAtATimeAsWrittenIsFoundExactly() {
    for (double hours : new double[] {6, 0.1, 1.0 / 3, 20.1, 47.9}) {
      for (boolean atZero : new boolean[] {false, true}) {
        Term step = step(sub(T, c(hours * 3600)), atZero);
        Corners corners = corners(step, 0, 48, 3600);
        assertEquals(1, corners.list().size());
        Corner corner = corners.list().getFirst();
        assertEquals(hours, corner.time());
        TermEvaluator value = TermEvaluator.of(step);
        assertEquals(1, value.at(corner.before() * 3600));
        assertEquals(0, value.at(corner.after() * 3600));
        assertEquals(hours, corner.before(), 4 * Math.ulp(hours));
        assertEquals(hours, corner.after(), 4 * Math.ulp(hours));
      }
    }
  }

  @Test
  void twoStepsAtOneTimeAreOneCorner() {
    Term both = add(step(sub(T, c(3)), false), step(sub(T, c(3)), true));
    assertArrayEquals(new double[] {3}, times(both, 0, 10));
  }

  @Test
  void changesThatAreNearToEachOtherAreBothFound() {
    Term close = f(Function.ABS, sub(pow(sub(T, c(3)), 2), c(1e-12)));
    assertArrayEquals(new double[] {3 - 1e-6, 3 + 1e-6}, times(close, 0, 10), 1e-12);
  }

  @Test
  void aTouchIsNoCorner() {
    assertArrayEquals(new double[0], times(f(Function.ABS, pow(sub(T, c(3)), 2)), 0.1, 10));
  }

  @Test
  void everyChangeOfAFastWaveIsFound() {
    double[] found = times(f(Function.SIGN, sin(mul(c(100 * Math.PI), T))), 0.005, 9.995);
    assertEquals(999, found.length);
    for (int k = 0; k < found.length; k++) {
      assertEquals((k + 1) / 100.0, found[k], 1e-14);
    }
  }

  @Test
  void cornersOfWhatAConditionIsBuiltOfAreFoundToo() {
    Term nested = step(sub(f(Function.ABS, sub(T, c(3))), c(1)), false);
    assertArrayEquals(new double[] {2, 3, 4}, times(nested, 0, 10));
    Term flat = f(Function.ABS, f(Function.MAX, sub(T, c(5)), c(0)));
    assertArrayEquals(new double[] {5}, times(flat, 0, 10));
  }

  @Test
  void smallerAndLargerTurnWhereTheirArgumentsMeet() {
    assertArrayEquals(new double[] {2}, times(f(Function.MIN, T, sub(c(4), T)), 0, 10));
    assertArrayEquals(
        new double[] {1, 2},
        times(f(Function.MAX, pow(T, 2), sub(mul(c(3), T), c(2))), 0, 10),
        1e-15);
  }

  @Test
  void edgesOfPulsesAreAsWritten() {
    Term pulse = new Term.Pulse(T, c(6 * 3600), c(600), c(-3600));
    Corners corners = corners(pulse, 0, 12, 3600);
    assertArrayEquals(
        new double[] {5, 5 + 1.0 / 6, 11, 11 + 1.0 / 6},
        corners.list().stream().mapToDouble(Corner::time).toArray(),
        1e-15);
    TermEvaluator value = TermEvaluator.of(pulse);
    for (int k = 0; k < 4; k++) {
      assertEquals(k % 2, value.at(corners.list().get(k).before() * 3600));
      assertEquals(1 - k % 2, value.at(corners.list().get(k).after() * 3600));
    }
  }

  @Test
  void cornersAtTheEndsOfTheRangeAreListed() {
    Term pulse = new Term.Pulse(T, c(6), c(1), c(0));
    assertArrayEquals(new double[] {0, 1, 6}, times(pulse, 0, 6));
  }

  @Test
  void pulsesAreOneBetweenTheirEdgesOnly() {
    PulseTrain train = new PulseTrain(0.1, 0.03, 0.7);
    for (int k = -2000; k < 2000; k++) {
      assertEquals(1, train.at(train.rise(k)));
      assertEquals(0, train.at(Math.nextDown(train.rise(k))));
      assertEquals(0, train.at(train.fall(k)));
      assertEquals(1, train.at(Math.nextDown(train.fall(k))));
    }
  }

  @Test
  void valuesOfARunReplaceThoseOfParameters() {
    Term step = step(sub(T, p(parameter("late", c(3)))), false);
    CornerSearch search = new CornerSearch(0, 10, 1, Map.of("late", 4.0));
    search.add(step);
    assertEquals(4, search.result().list().getFirst().time());
  }

  @Test
  void tooManyCornersAreSaidToBeTooMany() {
    Term pulse = new Term.Pulse(T, c(1), c(0.5), c(0));
    assertEquals(900_000, corners(pulse, 0.25, 450_000.25, 1).list().size());
    assertInstanceOf(Corners.TooMany.class, corners(pulse, 0.25, 1e15, 1).gap().orElseThrow());
  }

  @Test
  void signsThatCannotBeFollowedAreSaidToBeSo() {
    Term wild = f(Function.SIGN, sin(mul(c(1e9), pow(T, 3))));
    assertInstanceOf(Corners.Untraced.class, corners(wild, 0, 100, 1).gap().orElseThrow());
  }

  /** Between two neighbouring corners no choice changes; sampled at random. */
  @Test
  void noChangeIsMissedInRandomTerms() {
    Random random = new Random(20261201);
    for (int round = 0; round < 300; round++) {
      Term gap = TestTerms.random(random, 4, true);
      Term sign = f(Function.SIGN, gap);
      Corners corners = corners(sign, -2, 2, 1);
      TermEvaluator value = TermEvaluator.of(sign);
      double[] times = corners.list().stream().mapToDouble(Corner::time).toArray();
      double last = -2;
      for (int k = 0; k <= times.length; k++) {
        double end = k < times.length ? times[k] : 2;
        double middle = value.at((last + end) / 2);
        for (int sample = 0; sample < 50; sample++) {
          double t = last + (end - last) * random.nextDouble();
          boolean nearEnd = t - last < 1e-9 || end - t < 1e-9;
          assertTrue(
              nearEnd || Math.abs(value.at(t) - middle) < 2,
              () -> TermPrinter.text(gap, "t") + " at " + t);
        }
        last = end;
      }
    }
  }
}
