/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.exponential;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.spanloom.numerics.problem.Solved.assertEnd;
import static org.spanloom.numerics.problem.Solved.at;
import static org.spanloom.numerics.problem.Solved.errorsAt;
import static org.spanloom.numerics.problem.Solved.trajectory;

import org.junit.jupiter.api.Test;
import org.spanloom.numerics.problem.FormulaSystem;
import org.spanloom.numerics.solution.Solution;

/** Decay chains: every component must come out, the smallest included. */
final class DecayChainTests {

  private static final double DAY = 86400;
  private static final double YEAR = 365.25 * DAY;

  /** Half-lives in seconds: OpenStax Chemistry, appendix M; Bi-214 and Po-214 from memory. */
  private static final double[] RADIUM_CHAIN = {
    1600 * YEAR,
    3.82 * DAY,
    3.05 * 60,
    26.8 * 60,
    19.9 * 60,
    1.64e-4,
    22.3 * YEAR,
    5.01 * DAY,
    138.4 * DAY
  };

  private static FormulaSystem chain(double end, double... halfLives) {
    int n = halfLives.length;
    double[] a = new double[n * n];
    for (int i = 0; i < n; i++) {
      double rate = Math.log(2) / halfLives[i];
      a[i * n + i] = -rate;
      if (i + 1 < n) {
        a[(i + 1) * n + i] = rate;
      }
    }
    return FormulaSystem.constant(a, 0, end);
  }

  /**
   * Bateman 1910: amounts after 30 days, the rates spanning 1.4e-11 to 4.2e3 per second; 121 digits
   * agree.
   */
  @Test
  void radiumChainInEveryComponent() {
    Solution x = trajectory(chain(30 * DAY, RADIUM_CHAIN), 1e-9, 1, 0, 0, 0, 0, 0, 0, 0, 0);
    assertEnd(x, 1, 0.00000650816408461453447267609764423, 1e-13);
    assertEnd(x, 5, 3.23376227861396373086436635448e-15, 1e-13);
    assertEnd(x, 6, 0.0000289832094947314470917468361777, 1e-13);
    assertEnd(x, 8, 0.0000000181098567148968478348693935751, 1e-13);
    double[] values = at(x, 30 * DAY);
    double[] errors = errorsAt(x, 30 * DAY);
    for (int i = 0; i < 9; i++) {
      assertTrue(errors[i] < 1e-12 * values[i], "estimate of component " + i + " is " + errors[i]);
    }
  }

  /** The order in which the states are written must not matter. */
  @Test
  void radiumChainWrittenBackwards() {
    FormulaSystem forward = chain(30 * DAY, RADIUM_CHAIN);
    double[] a = new double[81];
    forward.matrix(0, org.spanloom.numerics.Side.AFTER, a);
    double[] reversed = new double[81];
    for (int e = 0; e < 81; e++) {
      reversed[80 - e] = a[e];
    }
    Solution x =
        trajectory(FormulaSystem.constant(reversed, 0, 30 * DAY), 1e-9, 0, 0, 0, 0, 0, 0, 0, 0, 1);
    assertEnd(x, 3, 3.23376227861396373086436635448e-15, 1e-13);
  }

  /**
   * Mo-99 (65.976 h) to Tc-99m (6.0072 h; ENSDF evaluation 2017): the daughter peaks at
   * ln(l2/l1)/(l2 - l1).
   */
  @Test
  void generatorElution() {
    double peak = 22.8483210764330409525070883475;
    double hour = 3600;
    FormulaSystem system = chain(48 * hour, 65.976 * hour, 6.0072 * hour);
    Solution x = trajectory(system, 1e-9, 1, 0);
    double before = at(x, (peak - 0.01) * hour)[1];
    double at = at(x, peak * hour)[1];
    double after = at(x, (peak + 0.01) * hour)[1];
    assertTrue(before < at && after < at);
    assertEquals(before, after, 1e-8 * at);
  }

  /**
   * Sr-90 (28.79 y) to Y-90 (64.00 h), 30 days (Bateman 1910; half-lives from memory): ratio of
   * activities.
   */
  @Test
  void secularEquilibrium() {
    FormulaSystem system = chain(30 * DAY, 28.79 * YEAR, 64 * 3600);
    double[] x = at(trajectory(system, 1e-9, 1, 0), 30 * DAY);
    double ratio = x[1] / (64 * 3600) / (x[0] / (28.79 * YEAR));
    assertEquals(0.999842146022401130210099638204, ratio, 1e-13);
  }
}
