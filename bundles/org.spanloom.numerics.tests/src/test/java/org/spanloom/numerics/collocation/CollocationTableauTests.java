/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.collocation;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.spanloom.numerics.collocation.CollocationTableau.Family;

/** Points and weights have the properties that make the orders. */
final class CollocationTableauTests {

  static Stream<CollocationTableau> tableaus() {
    return Stream.of(Family.values())
        .flatMap(f -> IntStream.rangeClosed(2, 11).mapToObj(s -> CollocationTableau.of(f, s)));
  }

  /**
   * Radau IIA with three points: (4 -+ sqrt 6)/10 and 1 (Hairer &amp; Wanner 1996, table IV.5.6;
   * from memory).
   */
  @Test
  void radauPoints() {
    CollocationTableau radau = CollocationTableau.of(Family.RADAU_IIA, 3);
    assertEquals((4 - Math.sqrt(6)) / 10, radau.point(0), 1e-16);
    assertEquals((4 + Math.sqrt(6)) / 10, radau.point(1), 2e-16);
    assertEquals(1, radau.point(2));
    assertEquals(5, radau.order());
  }

  /** Gauss with three points: 1/2 -+ sqrt 15/10 and 1/2. */
  @Test
  void gaussPoints() {
    CollocationTableau gauss = CollocationTableau.of(Family.GAUSS, 3);
    assertEquals(0.5 - Math.sqrt(15) / 10, gauss.point(0), 1e-16);
    assertEquals(0.5, gauss.point(1), 1e-16);
    assertEquals(6, gauss.order());
  }

  /** D differentiates t^k for k up to s, and e continues it to the end. */
  @ParameterizedTest
  @MethodSource("tableaus")
  void powersAreDifferentiated(CollocationTableau tableau) {
    int s = tableau.stages();
    for (int k = 1; k <= s; k++) {
      double end = 0;
      for (int i = 0; i < s; i++) {
        double slope = 0;
        for (int j = 0; j < s; j++) {
          slope += tableau.derivative(i, j) * Math.pow(tableau.point(j), k);
        }
        assertEquals(k * Math.pow(tableau.point(i), k - 1), slope, 1e-11);
        end += tableau.end(i) * Math.pow(tableau.point(i), k);
      }
      assertEquals(1, end, 1e-11);
    }
  }

  /**
   * Taking stage values apart into the eigenvectors of D and putting them together again changes
   * nothing.
   */
  @ParameterizedTest
  @MethodSource("tableaus")
  void eigenvectorsBelongToTheirValues(CollocationTableau tableau) {
    int s = tableau.stages();
    double[][] unit = new double[s][1];
    for (int seed = 0; seed < s; seed++) {
      for (int i = 0; i < s; i++) {
        unit[i][0] = i == seed ? 1 : 0;
      }
      double[][] back = new double[s][1];
      StageEigenvectors vectors = tableau.eigenvectors();
      for (int k = 0; k < vectors.values().size(); k++) {
        double[][] re = new double[1][1];
        double[][] im = new double[1][1];
        vectors.intoVector(k, unit, re, im);
        vectors.addBack(k, re, im, back);
      }
      for (int i = 0; i < s; i++) {
        assertEquals(unit[i][0], back[i][0], 1e-8);
      }
    }
  }

  /**
   * The coefficient of the last Legendre polynomial: 1/binomial(2s, s) for t^s on the unit step.
   */
  @ParameterizedTest
  @MethodSource("tableaus")
  void leadingCoefficient(CollocationTableau tableau) {
    int s = tableau.stages();
    double binomial = 1;
    for (int k = 1; k <= s; k++) {
      binomial *= (s + k) / (double) k;
    }
    double coefficient = 0;
    for (int i = 0; i < s; i++) {
      coefficient += tableau.leading(i) * Math.pow(tableau.point(i), s);
    }
    assertEquals(1 / binomial, coefficient, 1e-9 / binomial + 1e-14);
    assertTrue(tableau.rounding() < 1e-14);
  }

  /** Extrapolation to the ends is exact for polynomials through the points. */
  @ParameterizedTest
  @MethodSource("tableaus")
  void extrapolation(CollocationTableau tableau) {
    int s = tableau.stages();
    double before = 0;
    double after = 0;
    for (int i = 0; i < s; i++) {
      double value = Math.pow(tableau.point(i) + 1, s - 1.0);
      before += tableau.beforeFirst(i) * value;
      after += tableau.afterLast(i) * value;
    }
    assertEquals(1, before, 1e-8);
    assertEquals(Math.pow(2, s - 1.0), after, 1e-8);
  }
}
