/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.spectrum;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.spanloom.numerics.Progress;
import org.spanloom.numerics.problem.Solved;
import org.spanloom.numerics.spectrum.Modes.Mode;

/** Modes, equilibria and logarithmic norms of matrices with known ones. */
final class ModesTests {

  /** Moler &amp; Van Loan, SIAM Review 20 (1978) 801, method 1: eigenvalues -1 and -17. */
  @Test
  void conditionOfAnEigenvalue() {
    List<Mode> modes = modes(new double[] {-49, 24, -64, 31}, 1, 1);
    assertEquals(-1, modes.get(0).eigenvalue().real(), modes.get(0).error());
    assertEquals(-17, modes.get(1).eigenvalue().real(), modes.get(1).error());
    // Right vectors (1, 2) and (3, 4), left ones (-4, 3) and (2, -1): |y||v| / |y v|.
    assertEquals(Math.sqrt(25 * 5) / 2, modes.get(0).condition(), 1e-9);
    assertEquals(Math.sqrt(5 * 25) / 2, modes.get(1).condition(), 1e-9);
  }

  /** A nearly defective pair is told from one that is not. */
  @Test
  void nearlyDefective() {
    assertTrue(modes(new double[] {-1, 1, 1e-18, -1}, 1, 1).getFirst().isNearlyDefective());
    assertFalse(modes(new double[] {-1, 1, 1e-2, -1}, 1, 1).getFirst().isNearlyDefective());
  }

  /** Shares tell which states a mode lives in, whatever their units. */
  @Test
  void sharesOfStates() {
    // Two uncoupled oscillators; the second in units a million times smaller.
    double[] a = {0, 1, 0, 0, -4, 0, 0, 0, 0, 0, 0, 1e6, 0, 0, -9e-6, 0};
    List<Mode> modes = modes(a, 1, 1, 1, 1e-6);
    for (Mode mode : modes) {
      double first = mode.shares()[0] + mode.shares()[1];
      boolean slow = Math.abs(Math.abs(mode.eigenvalue().imaginary()) - 2) < 1e-9;
      assertEquals(slow ? 1 : 0, first, 1e-9);
      assertEquals(1, mode.condition(), slow ? 0.3 : 0.7);
    }
  }

  /** Eigenvalues -4/h^2 sin^2(k pi h/2) of the second difference; common practice. */
  @Test
  void secondDifference() {
    int n = 30;
    double[] a = new double[n * n];
    double[] scale = new double[n];
    for (int i = 0; i < n; i++) {
      scale[i] = 1;
      a[i * n + i] = -2;
      if (i > 0) {
        a[i * n + i - 1] = 1;
        a[(i - 1) * n + i] = 1;
      }
    }
    List<Mode> modes = modes(a, scale);
    for (int k = 1; k <= n; k++) {
      double sine = Math.sin(k * Math.PI / (2 * (n + 1)));
      assertEquals(-4 * sine * sine, modes.get(k - 1).eigenvalue().real(), 1e-13);
      assertEquals(1, modes.get(k - 1).condition(), 1e-9);
    }
  }

  @Test
  void oneEquilibrium() {
    Equilibrium.One one =
        assertInstanceOf(
            Equilibrium.One.class,
            Equilibrium.of(new double[] {-2, 1, 1, -3}, new double[] {1, 7}, new double[] {1, 1}));
    assertArrayEquals(new double[] {2, 3}, one.x(), 1e-14);
    assertEquals(0, one.x()[0] - 2, one.errors()[0] + 1e-15);
  }

  /** A closed pair of compartments: any amount may rest in them, in the ratio of the rates. */
  @Test
  void aFamilyOfEquilibria() {
    Equilibrium.Line line =
        assertInstanceOf(
            Equilibrium.Line.class,
            Equilibrium.of(new double[] {-2, 1, 2, -1}, new double[2], new double[] {1, 1}));
    assertArrayEquals(new double[2], line.x(), 0);
    assertArrayEquals(new double[] {0.5, 1}, line.directions().getFirst(), 1e-14);
  }

  /** The same pair with a supply: what flows in stays and grows. */
  @Test
  void noEquilibrium() {
    Equilibrium.None none =
        assertInstanceOf(
            Equilibrium.None.class,
            Equilibrium.of(new double[] {-2, 1, 2, -1}, new double[] {3, 0}, new double[] {1, 1}));
    assertArrayEquals(new double[] {1, 1}, none.combination(), 1e-14);
    assertEquals(3, none.rate(), 1e-13);
  }

  /** Dahlquist 1958: A = [[-1, 10], [0, -1]] has mu_2 = 4 and mu_inf = 9. */
  @Test
  void logarithmicNorms() {
    LogarithmicNorm norm = LogarithmicNorm.of(new double[] {-1, 10, 0, -1}, new double[] {1, 1});
    assertEquals(4, norm.euclidean(), 1e-14);
    assertEquals(9, norm.largestRow(), 0);
  }

  private static List<Mode> modes(double[] a, double... scale) {
    return Solved.of(Modes.of(a, scale, Progress.NONE)).modes();
  }
}
