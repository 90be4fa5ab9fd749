/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.basis;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.spanloom.numerics.FormulaSystem;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Outcome;
import org.spanloom.numerics.Progress;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.solution.Solution;

/** Condition numbers and determinants along a range, against published ones. */
class ConditionProfileTests {

  private static final TimeRange POSITIVE = new TimeRange(1e-3, Double.POSITIVE_INFINITY);

  private static void assertRelative(double expected, double actual, double relative) {
    assertEquals(expected, actual, relative * Math.abs(expected));
  }

  /** Airy's decaying and growing pair: raw 7.8e6 by size alone (van der Sluis 1969), scaled 2.2. */
  @Test
  void airyPairIsIllConditionedBySizeOnly() {
    double[] pair = {
      0.355028053887817239260063186004,
      0.614926627446000735150922369094,
      -0.258819403792806798405183560189,
      0.448288357353826357914823710399
    };
    Solution basis = TestBases.basis(TestBases.airy(), 0, pair, 0, 5, 1e-13);
    ConditionSample sample = TestBases.sample(TestBases.airy(), basis, 5);
    assertRelative(7835970.26908788950231905938282, sample.raw(), 1e-6);
    assertRelative(2.23223876395082969380311644309, sample.scaled(), 1e-6);
    assertFalse(sample.beyondResolution());
  }

  /**
   * Hilbert's and Pascal's matrices as bases that do not move: condition numbers from Higham,
   * Accuracy and Stability of Numerical Algorithms, 2nd ed. 2002, Table 28.1, and Gregory and
   * Karney 1969; from memory, recomputed in 50 digits or more.
   *
   * <p>Rounding the entries of Hilbert's matrices moves the condition by about its own size times
   * the unit roundoff.
   */
  @ParameterizedTest
  @CsvSource({
    "hilbert, 2, 19.2814700679039714483179233799, 1e-13",
    "hilbert, 3, 524.056777586060817870782845928, 1e-12",
    "hilbert, 4, 15513.7387389325882225765834123, 1e-11",
    "hilbert, 6, 14951058.6401312167750982149165, 1e-8",
    "hilbert, 8, 15257575741.6469428390882740735, 1e-5",
    "hilbert, 10, 16026286870216.8827883941732903, 1e-2",
    "pascal, 5, 8517.52436113874321940863181828, 1e-11",
    "pascal, 10, 4155205697.17714414477222448151, 1e-6",
  })
  void constantBasesHaveTheirKnownCondition(String name, int n, double published, double relative) {
    double[] x = "hilbert".equals(name) ? TestBases.hilbert(n) : TestBases.pascal(n);
    LinearSystem still = FormulaSystem.constant(n, new double[n * n]);
    Solution basis = TestBases.basis(still, 0, x, 0, 1, 1e-12);
    ConditionSample sample = TestBases.sample(still, basis, 1);
    assertRelative(published, sample.raw(), relative);
    assertTrue(sample.scaled() <= sample.raw() * (1 + relative), "scaling helps");
    assertEquals(n, sample.singularValues().length);
  }

  /** DLMF 9.2.7: the Wronskian of Airy's pair is 1/pi everywhere. */
  @Test
  void airysDeterminantStays() {
    double[] pair = {
      0.355028053887817239260063186004,
      0.614926627446000735150922369094,
      -0.258819403792806798405183560189,
      0.448288357353826357914823710399
    };
    Solution basis = TestBases.basis(TestBases.airy(), 0, pair, -10, 0, 1e-11);
    for (ConditionSample s : TestBases.profile(TestBases.airy(), basis).samples()) {
      assertRelative(
          0.318309886183790671537767526745,
          s.determinantSign() * Math.exp(s.logDeterminant()),
          1e-9);
      assertTrue(s.liouvilleMismatch() < 1e-9, "mismatch " + s.liouvilleMismatch());
    }
  }

  /** Determinants by Abel's and Liouville's formulas. */
  @ParameterizedTest
  @CsvSource({
    // Bessel, DLMF 10.5.2: det Phi(10, 1) = 1/10.
    "bessel, 1, 10, 0.1",
    // Legendre, DLMF 14.2(iv): det Phi(0.9, 0) = 1 / (1 - 0.81).
    "legendre, 0, 0.9, 5.26315789473684210526315789474",
    // Euler, Abel's formula: det Phi(3, 1) = 9.
    "euler, 1, 3, 9",
    // Markus and Yamabe, Osaka Math. J. 12 (1960) 305: det Phi(2 pi, 0) = e^-pi.
    "markus-yamabe, 0, 6.283185307179586, 0.0432139182637722497744177371717",
  })
  void determinantsFollowTheTrace(String name, double from, double to, double published) {
    LinearSystem system =
        switch (name) {
          case "bessel" -> TestBases.secondOrder(POSITIVE, t -> -1, t -> -1 / t);
          case "legendre" ->
              TestBases.secondOrder(
                  new TimeRange(-0.95, 0.95), t -> -110 / (1 - t * t), t -> 2 * t / (1 - t * t));
          case "euler" -> TestBases.secondOrder(POSITIVE, t -> -2 / (t * t), t -> 2 / t);
          default ->
              FormulaSystem.varying(
                  2,
                  FormulaSystem.ALWAYS,
                  (t, side, a) -> {
                    double c = Math.cos(t);
                    double s = Math.sin(t);
                    a[0] = -1 + 1.5 * c * c;
                    a[1] = 1 - 1.5 * s * c;
                    a[2] = -1 - 1.5 * s * c;
                    a[3] = -1 + 1.5 * s * s;
                  });
        };
    Solution basis = TestBases.principal(system, from, to, 1e-11);
    ConditionSample sample = TestBases.sample(system, basis, to);
    assertEquals(Math.log(published), sample.liouvilleLogDeterminant(), 1e-11);
    assertEquals(Math.log(published), sample.logDeterminant(), 1e-9);
    assertEquals(1, sample.determinantSign());
  }

  /** The basis t, t^2 has the Wronskian t^2, which vanishes towards the pole at 0. */
  @Test
  void theWronskianVanishesTowardsAPole() {
    LinearSystem euler = TestBases.secondOrder(POSITIVE, t -> -2 / (t * t), t -> 2 / t);
    Solution basis = TestBases.basis(euler, 1, new double[] {1, 1, 1, 2}, 0.01, 3, 1e-11);
    for (double t : new double[] {0.01, 0.5, 3}) {
      ConditionSample sample = TestBases.sample(euler, basis, t);
      assertEquals(2 * Math.log(t), sample.logDeterminant(), 1e-7, "at " + t);
    }
  }

  @Test
  void logarithmsOfDeterminantsDoNotOverflow() {
    int n = 6;
    double[] a = new double[n * n];
    for (int i = 0; i < n; i++) {
      a[i * n + i] = 60 + i;
    }
    LinearSystem growing = FormulaSystem.constant(n, a);
    ConditionSample up = TestBases.sample(growing, TestBases.principal(growing, 0, 10, 1e-9), 10);
    assertEquals(10 * (6 * 60 + 15), up.logDeterminant(), 1e-7);
    assertEquals(10 * (6 * 60 + 15), up.liouvilleLogDeterminant(), 1e-9);
    assertRelative(1, up.scaled(), 1e-10);
    LinearSystem falling = FormulaSystem.constant(n, Arrays.stream(a).map(v -> -v).toArray());
    ConditionSample down = TestBases.sample(falling, TestBases.principal(falling, 0, 10, 1e-9), 10);
    assertEquals(-3750, down.logDeterminant(), 1e-6);
  }

  /** Columns (1, 0) and (cos w, sin w) of exp(t diag(1, 0)) fold together. */
  @Test
  void tellsWhereALimitIsFirstExceeded() {
    LinearSystem system = FormulaSystem.constant(2, 1, 0, 0, 0);
    Solution basis = TestBases.basis(system, 0, new double[] {1, 1, 1, -1}, 0, 20, 1e-12);
    ConditionProfile profile = TestBases.profile(system, basis);
    // The columns are (e^t, 1) and (e^t, -1): condition e^t both raw and scaled.
    assertRelative(Math.log(1e4), profile.firstScaledAbove(1e4).orElseThrow(), 2e-3);
    assertRelative(Math.log(1e6), profile.firstRawAbove(1e6).orElseThrow(), 2e-3);
    assertTrue(profile.firstScaledAbove(1e9).isEmpty(), "e^20 is less than 1e9");
    assertEquals(20, profile.worstScaled().time(), 1e-9);
    assertRelative(Math.exp(20), profile.worstScaled().scaled(), 1e-6);
  }

  @Test
  void whatRoundingHidesIsBeyondResolution() {
    LinearSystem system = FormulaSystem.constant(2, 1, 0, 0, 0);
    Solution basis = TestBases.basis(system, 0, new double[] {1, 1, 1, -1}, 0, 60, 1e-12);
    ConditionSample sample = TestBases.sample(system, basis, 60);
    assertTrue(sample.beyondResolution(), "e^60 = 1e26 " + sample);
    assertEquals(0, sample.digitsLeft());
  }

  @Test
  void aPeakBetweenStepsIsFound() {
    // The hump of Moler and Van Loan 1978, Figure 1, in shape: |exp(tA)_12| is 25 at ln 2.
    LinearSystem hump = FormulaSystem.constant(2, -1, 100, 0, -2);
    Solution basis = TestBases.principal(hump, 0, 10, 1e-12);
    double[] x = new double[4];
    basis.value(Math.log(2), Side.AFTER, x);
    assertEquals(25, x[1], 1e-11);
    ConditionProfile profile = TestBases.profile(hump, basis);
    double found = profile.worstScaled().scaled();
    for (int k = 0; k <= 1000; k++) {
      double at = TestBases.sample(hump, basis, k / 100.0).scaled();
      assertTrue(at <= found * (1 + 1e-5), at + " at " + k / 100.0 + " exceeds " + found);
    }
  }

  @Test
  void aCancelledProfileIsCancelled() {
    LinearSystem system = FormulaSystem.constant(40, new double[1600]);
    Solution basis = TestBases.principal(system, 0, 1, 1e-6);
    Progress stop =
        new Progress() {
          @Override
          public void worked(double fraction) {}

          @Override
          public boolean isCancelled() {
            return true;
          }
        };
    assertInstanceOf(
        Outcome.Cancelled.class, ConditionProfile.of(system, basis, basis.range(), stop));
  }
}
