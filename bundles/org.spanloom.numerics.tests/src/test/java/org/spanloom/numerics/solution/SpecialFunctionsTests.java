/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.solution;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.spanloom.numerics.problem.Solved.assertEnd;
import static org.spanloom.numerics.problem.Solved.at;
import static org.spanloom.numerics.problem.Solved.columns;
import static org.spanloom.numerics.problem.Solved.principal;
import static org.spanloom.numerics.problem.Solved.trajectory;

import org.junit.jupiter.api.Test;
import org.spanloom.numerics.problem.FormulaSystem;
import org.spanloom.numerics.problem.SecondOrder;

/**
 * Special functions as solutions of their differential equations. Values to 30 digits were
 * recomputed in 50-digit arithmetic; "from memory" marks published digits that were confirmed by
 * recomputation only.
 */
final class SpecialFunctionsTests {

  private static final double ASK = 1e-11;

  /** NIST DLMF 9.2.3 to 9.2.6. */
  private static final double[] AIRY_AT_0 = {
    0.355028053887817239260063186004,
    0.614926627446000735150922369094,
    -0.258819403792806798405183560189,
    0.448288357353826357914823710399
  };

  /** Abramowitz &amp; Stegun, table 10.11 (from memory). */
  @Test
  void airy() {
    FormulaSystem system = SecondOrder.of(0, 1, t -> t, t -> 0);
    Solution x = columns(system, ASK, AIRY_AT_0);
    assertEnd(x, 0, 0.135292416312881415524147423515, 1e-11);
    assertEnd(x, 2, -0.159147441296793212787500252497, 1e-11);
    assertEnd(x, 1, 1.20742359495287125943637881703, 1e-11);
  }

  /** DLMF 9.2.7: the Wronskian of Ai and Bi is 1/pi everywhere. */
  @Test
  void airyWronskian() {
    FormulaSystem system = SecondOrder.of(-10, 0, t -> t, t -> 0);
    Solution x =
        org.spanloom.numerics.problem.Solved.of(
            SolutionSolver.homogeneous(
                system,
                0,
                AIRY_AT_0,
                system.range(),
                org.spanloom.numerics.problem.Solved.accuracy(2, ASK),
                org.spanloom.numerics.Progress.NONE));
    double[] v = at(x, -10);
    assertEquals(0.318309886183790671537767526745, v[0] * v[3] - v[1] * v[2], 1e-11);
  }

  /** Scorer's function: DLMF 9.12.1 and 9.12.6 (from memory). */
  @Test
  void scorer() {
    FormulaSystem system = SecondOrder.of(0, 1, t -> t, t -> 0, t -> 1 / Math.PI);
    Solution x = trajectory(system, ASK, 2 * AIRY_AT_0[1] / 3, 2 * AIRY_AT_0[3] / 3);
    assertEnd(x, 0, 0.97220515514243332183768857101, 1e-11);
  }

  private static FormulaSystem bessel() {
    return SecondOrder.of(1, 10, t -> -1, t -> -1 / t);
  }

  /** Abramowitz &amp; Stegun, table 9.1 (from memory). */
  @Test
  void bessel0() {
    Solution x = trajectory(bessel(), ASK, 0.7651976865579666, -0.4400505857449335);
    assertEnd(x, 0, -0.245935764451348335197760862485, 1e-11);
  }

  /** Liouville: det Phi(10, 1) = exp(-integral of 1/t) = 1/10. */
  @Test
  void besselDeterminant() {
    double[] phi = at(principal(bessel(), ASK), 10);
    assertEquals(0.1, phi[0] * phi[3] - phi[1] * phi[2], 1e-12);
  }

  /**
   * DLMF 10.25: forward from rounded data the decaying solution loses what the growing one gains.
   */
  @Test
  void modifiedBesselDecaying() {
    FormulaSystem system = SecondOrder.of(1, 5, t -> 1, t -> -1 / t);
    Solution x = trajectory(system, ASK, 0.42102443824070833334, -0.60190723019723457474);
    assertEnd(x, 0, 0.00369109833404259427473526100746, 1e-9);
  }

  /** DLMF 10.28.2 (from memory): the Wronskian of K0 and I0 at t is 1/t. */
  @Test
  void modifiedBesselWronskian() {
    FormulaSystem system = SecondOrder.of(1, 5, t -> 1, t -> -1 / t);
    double[] v =
        at(
            columns(
                system,
                ASK,
                0.42102443824070833334,
                1.2660658777520083356,
                -0.60190723019723457474,
                0.56515910399248502721),
            5);
    assertEquals(0.2, v[0] * v[3] - v[1] * v[2], 1e-11);
  }

  /** DLMF 14.2.1, 18.5: P_10(0) = -63/256. */
  @Test
  void legendre10() {
    FormulaSystem system =
        SecondOrder.of(0, 0.9, t -> -110 / (1 - t * t), t -> 2 * t / (1 - t * t));
    assertEnd(trajectory(system, ASK, -63.0 / 256, 0), 0, -0.263145617855859375, 1e-10);
    double[] phi = at(principal(system, ASK), 0.9);
    assertEquals(5.26315789473684210526315789474, phi[0] * phi[3] - phi[1] * phi[2], 1e-10);
  }

  /** DLMF 14.7; Abramowitz &amp; Stegun, table 8.3 (from memory): Q_1(1/2) = ln(3)/4 - 1. */
  @Test
  void legendreSecondKind() {
    FormulaSystem system = SecondOrder.of(0, 0.5, t -> -2 / (1 - t * t), t -> 2 * t / (1 - t * t));
    assertEnd(trajectory(system, ASK, -1, 0), 0, -0.725346927832972577151188690769, 1e-11);
  }

  /** DLMF 18.5.12: L_5(4) from L_5(1) = -7/15, L_5'(1) = 19/24. */
  @Test
  void laguerre() {
    FormulaSystem system = SecondOrder.of(1, 4, t -> -5 / t, t -> (t - 1) / t);
    assertEnd(
        trajectory(system, ASK, -7.0 / 15, 19.0 / 24), 0, -0.866666666666666666666666666667, 1e-11);
  }

  /** DLMF 18.5.1 (from memory): T_10(1/2) = cos(10 pi/3). */
  @Test
  void chebyshev() {
    FormulaSystem system = SecondOrder.of(0, 0.5, t -> -100 / (1 - t * t), t -> t / (1 - t * t));
    assertEnd(trajectory(system, ASK, -1, 0), 0, -0.5, 1e-11);
  }

  /**
   * Euler equations (Boyce &amp; DiPrima; from memory): cos(ln t), and t from (1, 1) where t, t^2
   * is a basis.
   */
  @Test
  void euler() {
    FormulaSystem oscillating = SecondOrder.of(1, Math.E, t -> -1 / (t * t), t -> -1 / t);
    assertEnd(trajectory(oscillating, ASK, 1, 0), 0, 0.540302305868139717400936607443, 1e-11);
    FormulaSystem powers = SecondOrder.of(1, 3, t -> -2 / (t * t), t -> 2 / t);
    assertEnd(trajectory(powers, ASK, 1, 1), 0, 3, 1e-12);
    double[] phi = at(principal(powers, ASK), 3);
    assertEquals(9, phi[0] * phi[3] - phi[1] * phi[2], 1e-10);
  }

  /** A(t) that commutes with its integral (Lappo-Danilevskii): Phi_11 = cos(t^2/2). */
  @Test
  void commuting() {
    FormulaSystem system =
        FormulaSystem.homogeneous(
            2,
            0,
            3,
            (t, a) -> {
              a[0] = 0;
              a[1] = t;
              a[2] = -t;
              a[3] = 0;
            });
    assertEnd(principal(system, ASK), 0, -0.210795799430779705980481824794, 1e-11);
  }

  /** Resonance: x'' + x = cos t from rest is t/2 sin t. */
  @Test
  void resonance() {
    FormulaSystem system = SecondOrder.of(0, 10, t -> -1, t -> 0, Math::cos);
    assertEnd(trajectory(system, ASK, 0, 0), 0, -2.72010555444684906702373830926, 1e-11);
  }
}
