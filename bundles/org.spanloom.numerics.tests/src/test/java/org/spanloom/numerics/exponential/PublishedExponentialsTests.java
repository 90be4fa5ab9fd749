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
import static org.spanloom.numerics.problem.Solved.columns;
import static org.spanloom.numerics.problem.Solved.principal;
import static org.spanloom.numerics.problem.Solved.trajectory;

import java.math.BigDecimal;
import java.math.BigInteger;
import java.math.MathContext;
import java.math.RoundingMode;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.spanloom.numerics.problem.FormulaSystem;
import org.spanloom.numerics.solution.Solution;

/** Published matrix exponentials; values to 30 digits recomputed in 50-digit arithmetic. */
final class PublishedExponentialsTests {

  /**
   * Moler &amp; Van Loan, SIAM Rev. 20 (1978) 801, example of method 1; digits read there in public
   * reproductions.
   */
  @Test
  void molerAndVanLoan() {
    Solution phi = principal(FormulaSystem.constant(new double[] {-49, 24, -64, 31}, 0, 1), 1e-9);
    assertEquals("matrix exponential", phi.method());
    assertEnd(phi, 0, -0.735758758144753079636047750792, 1e-13);
    assertEnd(phi, 1, 0.551819099658097700615785760477, 1e-13);
    assertEnd(phi, 2, -1.4715175990882605349754286946, 1e-13);
    assertEnd(phi, 3, 1.10363824071557258908323811746, 1e-13);
  }

  /** Ward, SIAM J. Numer. Anal. 14 (1977) 600, test 1 (from memory; his digits differ by 1e-14). */
  @Test
  void wardDefective() {
    double[] a = {4, 2, 0, 1, 4, 1, 1, 1, 4};
    Solution phi = principal(FormulaSystem.constant(a, 0, 1), 1e-9);
    assertEnd(phi, 0, 147.866622446370152696748079951, 1e-13);
    assertEnd(phi, 4, 183.765138646368425101711753498, 1e-13);
    assertEnd(phi, 6, 127.781085523182484955819550296, 1e-13);
  }

  /**
   * Ward 1977, test 3 (from memory): ill-conditioned, the published digits themselves are off by
   * 2e-12.
   */
  @Test
  void wardIllConditioned() {
    double[] a = {-131, 19, 18, -390, 56, 54, -387, 57, 52};
    Solution phi = principal(FormulaSystem.constant(a, 0, 1), 1e-9);
    assertEnd(phi, 0, -1.50964415879608968339866499964, 1e-11);
    assertEnd(phi, 8, 0.541341126762989900260324495992, 1e-11);
  }

  /**
   * Hump of a non-normal matrix (Moler &amp; Van Loan 1978, figure 1): max |e^(tA)_12| = 25 at t =
   * ln 2.
   */
  @Test
  void transientGrowth() {
    FormulaSystem system = FormulaSystem.constant(new double[] {-1, 100, 0, -2}, 0, Math.log(2));
    assertEnd(principal(system, 1e-9), 1, 25, 1e-14);
  }

  /**
   * Daleckii-Krein: the derivative of exp at diag(1, 3) in direction e1 e2' is (e^3 - e)/2 (Higham
   * 2008, theorem 3.11).
   */
  @Test
  void frechetDerivative() {
    double[] a = {1, 0, 0, 1, 0, 3, 0, 0, 0, 0, 1, 0, 0, 0, 0, 3};
    assertEnd(
        principal(FormulaSystem.constant(a, 0, 1), 1e-9),
        3,
        8.68362754736431125278412109161,
        1e-13);
  }

  /**
   * Overscaling: the size of the off-diagonal entry must not cost accuracy (Al-Mohy &amp; Higham
   * 2009).
   */
  @ParameterizedTest
  @CsvSource({"1e2", "1e6", "1e10"})
  void triangularWithLargeCoupling(double coupling) {
    FormulaSystem system = FormulaSystem.constant(new double[] {1, coupling, 0, -1}, 0, 1);
    assertEnd(principal(system, 1e-9), 1, coupling * Math.sinh(1), 2e-15);
  }

  /**
   * The bounds theta_m: the largest theta with {@code sum |c_k| theta^(k-1) <= 2^-53} for the
   * series of the backward error {@code log(e^-x r_m(x)) = sum c_k x^k}; Higham, SIAM J. Matrix
   * Anal. Appl. 26 (2005) 1179, table 2.3 (from memory), recomputed here in exact series.
   */
  @ParameterizedTest
  @CsvSource({
    "3, 1.495585217958292e-2, 1e-14",
    "5, 2.539398330063230e-1, 1e-14",
    "7, 9.504178996162932e-1, 1e-14",
    "9, 2.097847961257068, 1e-14",
    "13, 5.371920351148152, 1e-14"
  })
  void boundsOfThePadeApproximants(int m, double published, double relative) {
    assertEquals(published, BackwardErrorSeries.theta(m), relative * published);
  }

  /**
   * Constant forcing: a series circuit, R = 2, L = 1, C = 1/4, step of 1 V, states (v, i); standard
   * formula.
   */
  @Test
  void seriesCircuit() {
    FormulaSystem system =
        FormulaSystem.constant(new double[] {0, 4, -1, -2}, new double[] {0, 1}, 0, 1);
    assertEnd(trajectory(system, 1e-9, 0, 0), 0, 0.849425634854112386226590343662, 1e-13);
  }

  /** The same with R = 4: a double eigenvalue; standard formula 1 - (1 + 2t) e^-2t. */
  @Test
  void criticallyDampedCircuit() {
    FormulaSystem system =
        FormulaSystem.constant(new double[] {0, 4, -1, -4}, new double[] {0, 1}, 0, 1);
    assertEnd(trajectory(system, 1e-9, 0, 0), 0, 0.593994150290161924318001515083, 1e-13);
  }

  /** IEC 60050, time constant: 1 - 1/e after one. */
  @Test
  void timeConstant() {
    FormulaSystem system = FormulaSystem.constant(new double[] {-1}, new double[] {1}, 0, 1);
    assertEnd(trajectory(system, 1e-9, 0), 0, 0.632120558828557678404476229839, 1e-15);
  }

  /**
   * Peak of the step response at damping 0.5 (Ogata, Modern Control Engineering; from memory:
   * overshoot 16.3 %).
   */
  @Test
  void overshoot() {
    FormulaSystem system =
        FormulaSystem.constant(
            new double[] {0, 1, -1, -1}, new double[] {0, 1}, 0, Math.PI / Math.sqrt(0.75));
    assertEnd(trajectory(system, 1e-9, 0, 0), 0, 1.16303353482158046486164035611, 1e-14);
  }

  /**
   * Heat equation on 9 points (LeVeque 2007, eq. 2.23; from memory): the slowest mode at t = 0.1.
   */
  @Test
  void heatEquation() {
    int n = 9;
    double[] a = new double[n * n];
    double[] x0 = new double[n];
    for (int i = 0; i < n; i++) {
      a[i * n + i] = -200;
      if (i > 0) {
        a[i * n + i - 1] = 100;
        a[(i - 1) * n + i] = 100;
      }
      x0[i] = Math.sin(Math.PI * (i + 1) * 0.1);
    }
    Solution x = trajectory(FormulaSystem.constant(a, 0, 0.1), 1e-9, x0);
    assertEnd(x, 4, 0.375735562554107993882738404837, 1e-12);
  }

  /**
   * DETEST B2, C1 and C3: Hull, Enright, Fellen &amp; Sedgwick, SIAM J. Numer. Anal. 9 (1972) 603
   * (from memory).
   */
  @Test
  void detest() {
    double[] b2 = {-1, 1, 0, 1, -2, 1, 0, 1, -1};
    assertEnd(
        trajectory(FormulaSystem.constant(b2, 0, 20), 1e-9, 2, 0, 1),
        0,
        1.00000000103057681121927891836,
        1e-13);
    double[] c1 = new double[100];
    for (int i = 0; i < 10; i++) {
      c1[11 * i] = i < 9 ? -1 : 0;
      if (i > 0) {
        c1[10 * i + i - 1] = 1;
      }
    }
    double[] first = {1, 0, 0, 0, 0, 0, 0, 0, 0, 0};
    assertEnd(
        trajectory(FormulaSystem.constant(c1, 0, 20), 1e-9, first),
        8,
        0.00130866896662765576378789865407,
        1e-13);
    double[] c3 = new double[100];
    for (int i = 0; i < 10; i++) {
      c3[11 * i] = -2;
      if (i > 0) {
        c3[10 * i + i - 1] = 1;
        c3[10 * (i - 1) + i] = 1;
      }
    }
    assertEnd(
        trajectory(FormulaSystem.constant(c3, 0, 20), 1e-9, first),
        0,
        0.00294811921102269941257072771244,
        1e-13);
  }

  /** STIFF DETEST B1 and B5: Enright, Hull &amp; Lindberg, BIT 15 (1975) 10 (from memory). */
  @Test
  void stiffDetest() {
    double[] b1 = {-1, 1, 0, 0, -100, -1, 0, 0, 0, 0, -100, 1, 0, 0, -10000, -100};
    assertEnd(
        trajectory(FormulaSystem.constant(b1, 0, 20), 1e-9, 1, 0, 1, 0),
        0,
        0.00000000100416864114810907606594491156,
        1e-11);
    double[] b5 = new double[36];
    b5[0] = -10;
    b5[1] = 100;
    b5[6] = -100;
    b5[7] = -10;
    b5[14] = -4;
    b5[21] = -1;
    b5[28] = -0.5;
    b5[35] = -0.1;
    assertEnd(
        trajectory(FormulaSystem.constant(b5, 0, 20), 1e-9, 1, 1, 1, 1, 1, 1),
        5,
        0.135335283236612691893999494972,
        1e-14);
  }

  /**
   * Two compartments, bolus and infusion (Gibaldi &amp; Perrier, Pharmacokinetics, 2nd ed. 1982,
   * chapter 2; formula from memory).
   */
  @Test
  void twoCompartments() {
    double[] a = {-0.7, 0.3, 0.5, -0.3};
    assertEnd(
        trajectory(FormulaSystem.constant(a, 0, 4), 1e-9, 1, 0),
        0,
        0.226643451993479200238249545956,
        1e-14);
    assertEnd(
        trajectory(FormulaSystem.constant(a, new double[] {1, 0}, 0, 6), 1e-9, 0, 0),
        0,
        2.12426481852679193577636021265,
        1e-13);
  }

  /** Dense output: at any time the value is as good as at the end. */
  @Test
  void anyTimeInBetween() {
    FormulaSystem system = FormulaSystem.constant(new double[] {0, 3, -3, 0}, -2, 5);
    Solution x = columns(system, 1e-9, 1, 0);
    for (double t : new double[] {-2, -1.999, -0.1, 1.0 / 3, 2.7182818, 4.999, 5}) {
      assertEquals(Math.cos(3 * (t + 2)), at(x, t)[0], 2e-14);
      assertTrue(at(x, t)[0] != 0);
    }
  }

  /**
   * A matrix near a multiple of the identity is climbed without that multiple, at every time in
   * between too.
   */
  @Test
  void nearlyScalarMatrix() {
    FormulaSystem system = FormulaSystem.constant(new double[] {-800, 2, 0, -802}, 0, 0.5);
    Solution phi = principal(system, 1e-9);
    for (double t : new double[] {1e-5, 0.0123, 0.11, 0.3333, 0.5}) {
      double[] x = at(phi, t);
      assertEquals(Math.exp(-800 * t), x[0], 1e-12 * Math.exp(-800 * t));
      double coupled = Math.exp(-800 * t) - Math.exp(-802 * t);
      assertEquals(coupled, x[1], 1e-12 * Math.exp(-800 * t));
    }
  }

  /** The series of the backward error in rational arithmetic, rounded to 60 digits. */
  private static final class BackwardErrorSeries {
    private static final int TERMS = 150;
    private static final MathContext DIGITS = new MathContext(60, RoundingMode.HALF_EVEN);

    static double theta(int m) {
      BigDecimal[] sizes = coefficients(m);
      double low = 0;
      double high = 10;
      for (int k = 0; k < 60; k++) {
        double middle = (low + high) / 2;
        if (bound(sizes, middle).compareTo(BigDecimal.ONE.divide(BigDecimal.TWO.pow(53), DIGITS))
            <= 0) {
          low = middle;
        } else {
          high = middle;
        }
      }
      return low;
    }

    private static BigDecimal bound(BigDecimal[] sizes, double theta) {
      BigDecimal sum = BigDecimal.ZERO;
      for (int k = sizes.length - 1; k >= 1; k--) {
        sum = sum.multiply(new BigDecimal(theta), DIGITS).add(sizes[k], DIGITS);
      }
      return sum;
    }

    /**
     * |c_k| of log(e^-x p(x)/p(-x)): with log p(x) = sum l_k x^k they are -x and twice the odd l_k.
     */
    private static BigDecimal[] coefficients(int m) {
      BigDecimal[] p = new BigDecimal[TERMS];
      java.util.Arrays.fill(p, BigDecimal.ZERO);
      for (int k = 0; k <= m; k++) {
        BigInteger above = factorial(2 * m - k).multiply(factorial(m));
        BigInteger below = factorial(2 * m).multiply(factorial(k)).multiply(factorial(m - k));
        p[k] = new BigDecimal(above).divide(new BigDecimal(below), DIGITS);
      }
      BigDecimal[] log = new BigDecimal[TERMS];
      log[0] = BigDecimal.ZERO;
      for (int k = 1; k < TERMS; k++) {
        BigDecimal sum = p[k].multiply(BigDecimal.valueOf(k));
        for (int j = 1; j < k; j++) {
          sum = sum.subtract(log[j].multiply(p[k - j], DIGITS).multiply(BigDecimal.valueOf(j)));
        }
        log[k] = sum.divide(BigDecimal.valueOf(k), DIGITS);
      }
      BigDecimal[] sizes = new BigDecimal[TERMS];
      for (int k = 1; k < TERMS; k++) {
        BigDecimal value = k % 2 == 1 ? log[k].multiply(BigDecimal.TWO) : BigDecimal.ZERO;
        BigDecimal c = k == 1 ? value.subtract(BigDecimal.ONE) : value;
        // Below degree 2m + 1 the series vanishes; what is left there is rounding.
        sizes[k] = k < 2 * m + 1 ? BigDecimal.ZERO : c.abs();
      }
      return sizes;
    }

    private static BigInteger factorial(int n) {
      BigInteger result = BigInteger.ONE;
      for (int k = 2; k <= n; k++) {
        result = result.multiply(BigInteger.valueOf(k));
      }
      return result;
    }
  }
}
