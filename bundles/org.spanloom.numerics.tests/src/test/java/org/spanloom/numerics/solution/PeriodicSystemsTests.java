/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.solution;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.spanloom.numerics.problem.Solved.at;
import static org.spanloom.numerics.problem.Solved.principal;

import java.util.Arrays;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.SparsityPattern;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.problem.FormulaSystem;
import org.spanloom.numerics.problem.SecondOrder;

/** Periodic coefficients: traces and multipliers of the matrix over one period. */
final class PeriodicSystemsTests {

  private static double mathieuTrace(double a, double q) {
    FormulaSystem system = SecondOrder.of(0, Math.PI, t -> -(a - 2 * q * Math.cos(2 * t)), t -> 0);
    double[] phi = at(principal(system, 1e-12), Math.PI);
    double product = phi[0] * phi[3];
    assertEquals(1, product - phi[1] * phi[2], 1e-7);
    return phi[0] + phi[3];
  }

  /**
   * Mathieu's equation at characteristic values: the trace over pi is +2 or -2. Abramowitz &amp;
   * Stegun, table 20.1, and DLMF 28.2; their digits were read in public test data that reproduce
   * them. The tolerance is the condition of the trace.
   */
  @ParameterizedTest
  @CsvSource({
    "-5.80004602085150841910347251431, 5, 2, 1e-8",
    "-5.79008059863777104381949902133, 5, -2, 1e-8",
    "1.85818754154775088515437312729, 5, -2, 1e-9",
    "7.44910973952917781248101626596, 5, 2, 1e-10",
    "100.506770024681279312859080745, 10, 2, 1e-10",
    "-40.2567795465667872758017193249, 25, 2, 1e-4"
  })
  void mathieu(double a, double q, double trace, double tolerance) {
    assertEquals(trace, mathieuTrace(a, q), tolerance);
  }

  /** DLMF 28.2.16: in the unstable tongue a = 1, q = 1/5 the trace is -2 cosh(pi kappa). */
  @Test
  void mathieuUnstable() {
    double kappa = 0.0995364372755134474157851544919;
    assertEquals(-2 * Math.cosh(Math.PI * kappa), mathieuTrace(1, 0.2), 1e-11);
  }

  /**
   * Meissner, Schweiz. Bauzeitung 72 (1918) 95 (from memory): x'' + (3/2 +- 1) x = 0, the sign
   * changing at pi.
   */
  @Test
  void meissner() {
    FormulaSystem system =
        new FormulaSystem(
                2,
                new TimeRange(0, 2 * Math.PI),
                (t, side, a) -> {
                  boolean before = t < Math.PI || (t == Math.PI && side == Side.BEFORE);
                  a[0] = 0;
                  a[1] = 1;
                  a[2] = before ? -2.5 : -0.5;
                  a[3] = 0;
                },
                (t, side, b) -> Arrays.fill(b, 0),
                false,
                false,
                SparsityPattern.dense(2),
                new double[0])
            .withBreakpoints(Math.PI);
    double[] phi = at(principal(system, 1e-12), 2 * Math.PI);
    assertEquals(1.76062004874239947302322333025, phi[0] + phi[3], 1e-12);
  }

  /**
   * Markus &amp; Yamabe, Osaka Math. J. 12 (1960) 305 (from memory): stable at every frozen time,
   * unstable; multipliers e^pi, e^-2pi.
   */
  @Test
  void markusYamabe() {
    FormulaSystem system =
        FormulaSystem.homogeneous(
            2,
            0,
            2 * Math.PI,
            (t, a) -> {
              double c = Math.cos(t);
              double s = Math.sin(t);
              a[0] = -1 + 1.5 * c * c;
              a[1] = 1 - 1.5 * s * c;
              a[2] = -1 - 1.5 * s * c;
              a[3] = -1 + 1.5 * s * s;
            });
    double[] phi = at(principal(system, 1e-12), 2 * Math.PI);
    double half = (phi[0] + phi[3]) / 2;
    double determinant = phi[0] * phi[3] - phi[1] * phi[2];
    assertEquals(0.0432139182637722497744177371717, determinant, 1e-11);
    double larger = half + Math.sqrt(half * half - determinant);
    assertEquals(23.1406926327792690057290863679, larger, 1e-10);
    assertEquals(0.00186744273170798881443021293483, determinant / larger, 1e-12);
  }
}
