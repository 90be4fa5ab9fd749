/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.collocation;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;

import java.util.Arrays;
import org.junit.jupiter.api.Test;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.collocation.CollocationTableau.Family;
import org.spanloom.numerics.internal.algebra.Rows;
import org.spanloom.numerics.internal.work.Watch;
import org.spanloom.numerics.problem.FormulaSystem;

/** The three ways to solve the conditions of a step give the same stages. */
final class StageFactorsTests {

  private static final StageFactors.Precision FULL =
      new StageFactors.Precision(new double[0][], 1e-15);

  private static StageCoefficients coefficients(int n, int reach, CollocationTableau tableau) {
    FormulaSystem.Smooth matrix =
        (t, a) -> {
          Arrays.fill(a, 0);
          for (int i = 0; i < n; i++) {
            for (int j = Math.max(0, i - reach); j <= Math.min(n - 1, i + reach); j++) {
              a[i * n + j] = (i == j ? -30 : 3) * (1 + 0.1 * Math.sin(t + i + 2 * j));
            }
          }
        };
    FormulaSystem system = FormulaSystem.homogeneous(n, 0, 10, matrix);
    double[] a = new double[n * n];
    system.matrix(0.1, Side.AFTER, a);
    FormulaSystem sparse = system.withPattern(FormulaSystem.patternOf(a, n));
    return new StageCoefficients(
        sparse, StageCoefficients.Shape.of(sparse), tableau, 1, 1.5, false);
  }

  private static double[][] right(int rows, int m) {
    double[][] right = new double[rows][m];
    for (int i = 0; i < rows; i++) {
      for (int j = 0; j < m; j++) {
        right[i][j] = Math.sin(i + 10.0 * j);
      }
    }
    return right;
  }

  private static double[][] solve(StageFactors factors, int rows, int m) {
    return factors.solve(right(rows, m), m, FULL, Watch.NONE).orElseThrow();
  }

  @Test
  void agree() {
    int n = 12;
    int m = 3;
    for (Family family : Family.values()) {
      CollocationTableau tableau = CollocationTableau.of(family, 5);
      StageCoefficients coefficients = coefficients(n, 2, tableau);
      double h = 0.5;
      double[][] dense =
          solve(StageFactors.Dense.of(tableau, coefficients, h, Watch.NONE), 5 * n, m);
      double[][] band = solve(StageFactors.Band.of(tableau, coefficients, h, Watch.NONE), 5 * n, m);
      StageFactors iterated =
          new StageFactors.Iterated(
              coefficients, IteratedStages.of(tableau, coefficients, h, Watch.NONE), tableau, h);
      double[][] corrected = solve(iterated, 5 * n, m);
      assertArrayEquals(Rows.flat(dense, m), Rows.flat(band, m), 1e-13);
      assertArrayEquals(Rows.flat(dense, m), Rows.flat(corrected, m), 1e-12);
    }
  }

  @Test
  void theCheapestIsChosen() {
    CollocationTableau tableau = CollocationTableau.of(Family.RADAU_IIA, 5);
    assertInstanceOf(
        StageFactors.Band.class,
        StageFactors.of(tableau, coefficients(80, 1, tableau), 0.1, 2, Watch.NONE));
    assertInstanceOf(
        StageFactors.Iterated.class,
        StageFactors.of(tableau, coefficients(80, 79, tableau), 0.1, 2, Watch.NONE));
    assertInstanceOf(
        StageFactors.Dense.class,
        StageFactors.of(tableau, coefficients(3, 2, tableau), 0.1, 6, Watch.NONE));
  }
}
