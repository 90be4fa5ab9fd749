/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.spanloom.numerics.solution.Solution;
import org.spanloom.numerics.solution.SolutionSolver;

/** Derivatives coupled by a mass matrix. */
class CoupledSystemTests {

  /** Rows 0 and 2 of three coupled by [[2, 1], [1, 3]]; row 1 has mass 1. */
  private static CoupledSystem constant() {
    FormulaSystem right =
        FormulaSystem.forced(
            3, new double[] {-2, 0, 1, 0, -4, 0, 0, 1, -3}, new double[] {5, 6, 10});
    return new CoupledSystem(
        right,
        new int[] {0, 2},
        (t, side, m) -> System.arraycopy(new double[] {2, 1, 1, 3}, 0, m, 0, 4),
        true);
  }

  @Test
  void rowsAreMultipliedByTheInverseMass() {
    CoupledSystem system = constant();
    double[] a = new double[9];
    double[] b = new double[3];
    system.matrix(0, Side.AFTER, a);
    system.forcing(0, Side.AFTER, b);
    // The inverse is [[3, -1], [-1, 2]] / 5.
    double[] expected = {-6 / 5.0, -1 / 5.0, 6 / 5.0, 0, -4, 0, 2 / 5.0, 2 / 5.0, -7 / 5.0};
    assertArrayEquals(expected, a, 1e-15);
    assertArrayEquals(new double[] {1, 6, 3}, b, 1e-15);
    assertTrue(system.hasConstantMatrix());
    assertTrue(system.massQuality(0) > 0.05);
  }

  @Test
  void thePatternSpreadsOverCoupledRowsOnly() {
    FormulaSystem dense = FormulaSystem.constant(3, 1, 0, 0, 0, 1, 0, 0, 0, 1);
    LinearSystem diagonal =
        new LinearSystem() {
          @Override
          public int dimension() {
            return 3;
          }

          @Override
          public TimeRange range() {
            return dense.range();
          }

          @Override
          public void matrix(double t, Side side, double[] a) {
            dense.matrix(t, side, a);
          }

          @Override
          public void forcing(double t, Side side, double[] b) {
            dense.forcing(t, side, b);
          }

          @Override
          public boolean hasConstantMatrix() {
            return true;
          }

          @Override
          public boolean hasConstantForcing() {
            return true;
          }

          @Override
          public SparsityPattern pattern() {
            return new SparsityPattern(new int[] {0, 1, 2, 3}, new int[] {0, 1, 2});
          }

          @Override
          public double[] breakpoints() {
            return new double[0];
          }
        };
    SparsityPattern pattern =
        new CoupledSystem(diagonal, new int[] {0, 2}, (t, side, m) -> {}, true).pattern();
    assertEquals(5, pattern.count());
    assertTrue(pattern.contains(0, 2) && pattern.contains(2, 0) && pattern.contains(1, 1));
    assertFalse(pattern.contains(0, 1) || pattern.contains(1, 0));
  }

  /** (1 + t) x' = -x, x(0) = 1 has x = 1 / (1 + t). */
  @Test
  void aMassThatVariesIsSolvedWith() {
    CoupledSystem system =
        new CoupledSystem(
            FormulaSystem.constant(1, -1), new int[] {0}, (t, side, m) -> m[0] = 1 + t, false);
    assertFalse(system.hasConstantMatrix());
    Solution solution = Solved.of(solve(system, 9));
    double[] x = new double[1];
    solution.value(9, Side.BEFORE, x);
    assertEquals(0.1, x[0], 1e-10);
  }

  /** (1 - t) x' = -x, whose mass vanishes at 1. */
  @Test
  void aMassThatVanishesIsAnUnsolvedSystemThere() {
    CoupledSystem system =
        new CoupledSystem(
            FormulaSystem.constant(1, -1), new int[] {0}, (t, side, m) -> m[0] = 1 - t, false);
    assertEquals(0, system.massQuality(1));
    double[] a = new double[1];
    system.matrix(1, Side.AFTER, a);
    assertTrue(Double.isNaN(a[0]));
    Outcome.Unsolved<Solution> unsolved = Solved.not(solve(system, 2));
    assertEquals(1, unsolved.time(), 0.01);
  }

  private static Outcome<Solution> solve(LinearSystem system, double to) {
    return SolutionSolver.trajectory(
        system,
        0,
        new double[] {1},
        new TimeRange(0, to),
        ReferenceProblem.accuracy(1, 1e-10),
        Progress.NONE);
  }
}
