/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.spectrum;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.spanloom.numerics.Jump;
import org.spanloom.numerics.JumpSelection;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Outcome;
import org.spanloom.numerics.Progress;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.SparsityPattern;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.problem.FormulaSystem;
import org.spanloom.numerics.problem.SecondOrder;
import org.spanloom.numerics.problem.Solved;
import org.spanloom.numerics.spectrum.FloquetMultipliers.Multiplier;

/** Multipliers of periodic systems with published values. */
final class FloquetMultipliersTests {

  /**
   * Mathieu's equation with a = 1, q = 1/5: exponent kappa of DLMF 28.2.16, 27 digits recomputed.
   */
  @Test
  void unstableTongue() {
    FloquetMultipliers found =
        multipliers(
            SecondOrder.of(0, Math.PI, t -> -(1 - 0.4 * Math.cos(2 * t)), t -> 0), Math.PI, 1e-10);
    double kappa = 0.0995364372755134474;
    Multiplier first = found.multipliers().getFirst();
    assertEquals(Math.PI * kappa, first.logModulus(), first.error());
    assertEquals(Math.PI * kappa, first.logModulus(), 1e-9);
    assertEquals(Math.PI, Math.abs(first.phase()), 1e-9);
    assertEquals(kappa, found.rate(first), 1e-9);
    assertEquals(-Math.PI * kappa, found.multipliers().getLast().logModulus(), 1e-9);
  }

  /**
   * Mathieu's equation at characteristic values, Abramowitz &amp; Stegun Table 20.1: the multiplier
   * is 1 or -1, twice, and defective, so that an error u moves it by sqrt(u).
   */
  @ParameterizedTest
  @CsvSource({
    "-5.80004602085150841910, 5, 1",
    "-5.79008059863777104382, 5, -1",
    "1.85818754154775088515, 5, -1",
    "7.44910973952917781248, 5, 1"
  })
  void characteristicValues(double a, double q, double multiplier) {
    FloquetMultipliers found =
        multipliers(
            SecondOrder.of(0, Math.PI, t -> -(a - 2 * q * Math.cos(2 * t)), t -> 0),
            Math.PI,
            1e-12);
    for (Multiplier m : found.multipliers()) {
      assertEquals(0, m.logModulus(), 1e-4);
      assertEquals(multiplier > 0 ? 0 : Math.PI, Math.abs(m.phase()), 1e-4);
    }
  }

  /**
   * Frozen eigenvalues are stable and the system is not: multipliers e^pi and e^(-2 pi) (Markus
   * &amp; Yamabe, Osaka Math. J. 12, 1960, 305).
   */
  @Test
  void frozenEigenvaluesProveNothing() {
    LinearSystem system =
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
    FloquetMultipliers found = multipliers(system, 2 * Math.PI, 1e-10);
    assertEquals(23.1406926327792690, found.multipliers().getFirst().modulus(), 1e-7);
    assertEquals(0.00186744273170798881, found.multipliers().getLast().modulus(), 1e-11);
  }

  /**
   * Meissner's equation, breakpoint at pi: trace of the monodromy 1.7606200487423968 (Meissner,
   * Schweizerische Bauzeitung 72, 1918; closed form).
   */
  @Test
  void breakpointInsideThePeriod() {
    LinearSystem system =
        new FormulaSystem(
            2,
            new TimeRange(0, 2 * Math.PI),
            (t, side, a) -> {
              boolean first = t < Math.PI || t == Math.PI && side == Side.BEFORE;
              a[0] = 0;
              a[1] = 1;
              a[2] = -(1.5 + (first ? 1 : -1));
              a[3] = 0;
            },
            (t, side, b) -> Arrays.fill(b, 0),
            false,
            true,
            SparsityPattern.dense(2),
            new double[] {Math.PI});
    FloquetMultipliers found = multipliers(system, 2 * Math.PI, 1e-11);
    // Both lie on the unit circle: the trace is twice the cosine of the phase.
    for (Multiplier m : found.multipliers()) {
      assertEquals(0, m.logModulus(), 1e-9);
      assertEquals(1.76062004874239947, 2 * Math.cos(m.phase()), 1e-9);
    }
  }

  /** Multipliers e^(1000), e^(-1000) and 1 in turned coordinates: none overflows, none drowns. */
  @Test
  void neitherOverflowsNorDrowns() {
    double c = Math.cos(0.7);
    double s = Math.sin(0.7);
    LinearSystem system =
        FormulaSystem.constant(
            new double[] {
              1000 * (c * c - s * s),
              2000 * c * s,
              0,
              2000 * c * s,
              -1000 * (c * c - s * s),
              0,
              3,
              -2,
              0
            },
            0,
            1);
    List<Multiplier> found = multipliers(system, 1, 1e-11).multipliers();
    assertEquals(1000, found.get(0).logModulus(), 1e-8);
    assertEquals(0, found.get(1).logModulus(), 1e-8);
    assertEquals(-1000, found.get(2).logModulus(), 1e-8);
    for (Multiplier m : found) {
      assertTrue(m.error() < 1e-7, "error " + m.error());
    }
  }

  /** Twenty oscillators of one frequency and damping: equal moduli are no obstacle. */
  @Test
  void equalModuli() {
    int n = 40;
    double[] a = new double[n * n];
    for (int i = 0; i < n; i += 2) {
      a[i * n + i] = -0.1;
      a[i * n + i + 1] = 1 + i;
      a[(i + 1) * n + i] = -(1 + i);
      a[(i + 1) * n + i + 1] = -0.1;
    }
    for (Multiplier m : multipliers(FormulaSystem.constant(a, 0, 2), 2, 1e-10).multipliers()) {
      assertEquals(-0.2, m.logModulus(), 1e-9);
    }
  }

  /** Decay and a repeated jump that trebles: one multiplier, 3 exp(-P). */
  @Test
  void jumpsBelongToThePeriod() {
    Jump trebled = Jump.of(0, List.of(new Jump.Row(0, new int[] {0}, new double[] {3}, 0)));
    for (double end : new double[] {2, 2.5}) {
      LinearSystem system =
          new JumpSelection(
              FormulaSystem.constant(new double[] {-1}, 0, end), List.of(trebled, trebled.at(2)));
      double found = multipliers(system, 2, 1e-11).multipliers().getFirst().logModulus();
      assertEquals(Math.log(3) - 2, found, 1e-9);
    }
  }

  @Test
  void refusesAPeriodThatIsNone() {
    Outcome<FloquetMultipliers> outcome =
        FloquetMultipliers.of(
            FormulaSystem.constant(new double[] {1}, 0, 1),
            0,
            0,
            Solved.accuracy(1, 1e-6),
            Progress.NONE);
    assertEquals(Outcome.Reason.RANGE, Solved.not(outcome).reason());
  }

  private static FloquetMultipliers multipliers(
      LinearSystem system, double period, double relative) {
    return Solved.of(
        FloquetMultipliers.of(
            system, 0, period, Solved.accuracy(system.dimension(), relative), Progress.NONE));
  }
}
