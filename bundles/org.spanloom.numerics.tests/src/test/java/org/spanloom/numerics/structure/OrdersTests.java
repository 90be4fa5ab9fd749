/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.structure;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.Random;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.spanloom.numerics.SparsityPattern;
import org.spanloom.numerics.problem.FormulaSystem;

/** Orders of the states in which a matrix is block triangular, or narrow. */
final class OrdersTests {

  @Test
  void chainIsTriangularWhateverItsOrder() {
    int n = 50;
    int[] shuffled = IntStream.range(0, n).map(i -> (i * 17 + 3) % n).toArray();
    double[] a = new double[n * n];
    for (int k = 0; k < n; k++) {
      a[shuffled[k] * n + shuffled[k]] = -1;
      if (k > 0) {
        a[shuffled[k] * n + shuffled[k - 1]] = 1;
      }
    }
    TriangularOrder order = TriangularOrder.of(FormulaSystem.patternOf(a, n));
    assertTrue(order.isTriangular());
    int[] states = order.order();
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < i; j++) {
        assertEquals(0, a[states[i] * n + states[j]]);
      }
    }
  }

  @Test
  void feedbackMakesABlock() {
    // 0 -> 1 <-> 2 -> 3
    double[] a = {-1, 0, 0, 0, 1, -1, 1, 0, 0, 1, -1, 0, 0, 0, 1, -1};
    TriangularOrder order = TriangularOrder.of(FormulaSystem.patternOf(a, 4));
    assertEquals(3, order.blocks());
    assertFalse(order.isTriangular());
    assertArrayEquals(new int[] {3, 1, 2, 0}, order.order());
    assertArrayEquals(new int[] {0, 1, 3, 4}, order.blockStart());
    assertArrayEquals(new boolean[] {true, false, false, true}, order.alone());
  }

  @Test
  void randomPatternsComeOutBlockTriangular() {
    Random random = new Random(4);
    for (int trial = 0; trial < 50; trial++) {
      int n = 1 + random.nextInt(12);
      double[] a = new double[n * n];
      for (int e = 0; e < a.length; e++) {
        a[e] = random.nextInt(5) == 0 ? 1 : 0;
      }
      TriangularOrder order = TriangularOrder.of(FormulaSystem.patternOf(a, n));
      int[] states = order.order();
      assertArrayEquals(IntStream.range(0, n).toArray(), Arrays.stream(states).sorted().toArray());
      int[] start = order.blockStart();
      for (int b = 0; b < order.blocks(); b++) {
        for (int i = start[b]; i < start[b + 1]; i++) {
          for (int j = 0; j < start[b]; j++) {
            assertEquals(0, a[states[i] * n + states[j]]);
          }
        }
      }
    }
  }

  @Test
  void aLongChainDoesNotOverflowTheStack() {
    int n = 20_000;
    int[] rowStart = IntStream.rangeClosed(0, n).map(i -> Math.min(i, n - 1)).toArray();
    int[] columns = IntStream.range(1, n).toArray();
    TriangularOrder order = TriangularOrder.of(new SparsityPattern(rowStart, columns));
    assertTrue(order.isTriangular());
    assertEquals(0, order.order()[0]);
  }

  @Test
  void shuffledLineIsNarrowAgain() {
    int n = 60;
    double[] a = new double[n * n];
    for (int k = 0; k < n; k++) {
      int i = (k * 23) % n;
      int j = ((k + 1) * 23) % n;
      a[i * n + i] = -2;
      if (k + 1 < n) {
        a[i * n + j] = 1;
        a[j * n + i] = 1;
      }
    }
    assertEquals(1, BandOrder.of(FormulaSystem.patternOf(a, n)).bandwidth());
    assertEquals(59, BandOrder.of(SparsityPattern.dense(60)).bandwidth());
    assertEquals(0, BandOrder.of(SparsityPattern.dense(0)).bandwidth());
  }
}
