/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.exponential;

import org.spanloom.numerics.internal.algebra.LuFactors;
import org.spanloom.numerics.internal.algebra.Rows;
import org.spanloom.numerics.internal.work.Watch;

/**
 * The diagonal Pad&eacute; approximants {@code r_m(A) = q_m(A)^-1 p_m(A)} of e^A for m = 3, 5, 7, 9
 * and 13.
 *
 * <p>Source: Al-Mohy &amp; Higham, SIAM J. Matrix Anal. Appl. 31 (2009) 970, algorithm 5.1, with
 * the powers' norms computed and not estimated; the bounds theta_m are those of Higham, SIAM J.
 * Matrix Anal. Appl. 26 (2005) 1179, table 2.3, with 4.25 for m = 13 as the paper of 2009 has it
 * (all from memory; recomputed in the tests).
 */
public final class PadeApproximant {

  private static final double THETA_3 = 1.495585217958292e-2;
  private static final double THETA_5 = 2.539398330063230e-1;
  private static final double THETA_7 = 9.504178996162932e-1;
  private static final double THETA_9 = 2.097847961257068;
  private static final double THETA_13 = 4.25;

  private static final double[] B3 = {120, 60, 12, 1};
  private static final double[] B5 = {30240, 15120, 3360, 420, 30, 1};
  private static final double[] B7 = {17297280, 8648640, 1995840, 277200, 25200, 1512, 56, 1};
  private static final double[] B9 = {
    17643225600.0, 8821612800.0, 2075673600, 302702400, 30270240, 2162160, 110880, 3960, 90, 1
  };
  private static final double[] B13 = {
    64764752532480000.0,
    32382376266240000.0,
    7771770303897600.0,
    1187353796428800.0,
    129060195264000.0,
    10559470521600.0,
    670442572800.0,
    33522128640.0,
    1323241920,
    40840800,
    960960,
    16380,
    182,
    1
  };

  private PadeApproximant() {}

  /**
   * What to do with a matrix: halve it {@code halvings} times and take the approximant of this
   * degree.
   *
   * @param degree 3, 5, 7, 9 or 13
   * @param halvings not negative
   * @param size a measure of the halved matrix: its powers shrink like powers of this
   */
  public record Choice(int degree, int halvings, double size) {}

  /**
   * Chooses degree and scaling so that the backward error stays below the unit roundoff.
   *
   * @param a rows of A, n by n, finite, of any size
   */
  public static Choice choose(double[][] a, Watch watch) {
    double norm = Rows.oneNorm(a);
    if (norm == 0) {
      return new Choice(3, 0, 0);
    }
    // Powers of the normalised matrix cannot overflow; sizes are scaled back by 2^shift.
    int shift = norm > 1e10 || norm < 1e-10 ? Math.getExponent(norm) : 0;
    double[][] b = Rows.scaled(a, powerOfTwo(-shift));
    int n = a.length;
    double back = powerOfTwo(shift);
    double[][] b2 = Rows.product(b, b, n, watch);
    double[][] b4 = Rows.product(b2, b2, n, watch);
    double[][] b6 = Rows.product(b2, b4, n, watch);
    double d4 = Math.pow(Rows.oneNorm(b4), 1 / 4.0) * back;
    double d6 = Math.pow(Rows.oneNorm(b6), 1 / 6.0) * back;
    double eta1 = Math.max(d4, d6);
    if (eta1 <= THETA_3 && correction(b, shift, 3) == 0) {
      return new Choice(3, 0, eta1);
    }
    if (eta1 <= THETA_5 && correction(b, shift, 5) == 0) {
      return new Choice(5, 0, eta1);
    }
    double d8 = Math.pow(Rows.oneNorm(Rows.product(b4, b4, n, watch)), 1 / 8.0) * back;
    double eta3 = Math.max(d6, d8);
    if (eta3 <= THETA_7 && correction(b, shift, 7) == 0) {
      return new Choice(7, 0, eta3);
    }
    if (eta3 <= THETA_9 && correction(b, shift, 9) == 0) {
      return new Choice(9, 0, eta3);
    }
    double d10 = Math.pow(Rows.oneNorm(Rows.product(b4, b6, n, watch)), 1 / 10.0) * back;
    double eta5 = Math.min(eta3, Math.max(d8, d10));
    int halvings = eta5 <= THETA_13 ? 0 : (int) Math.ceil(Math.log(eta5 / THETA_13) / Math.log(2));
    halvings += correction(b, shift - halvings, 13);
    return new Choice(13, halvings, Math.max(eta5, eta1) * powerOfTwo(-halvings));
  }

  /**
   * Returns how many more halvings the first term of the backward error series asks for: {@code
   * |c_(2m+1)| || |A|^(2m+1) || / ||A||} against the unit roundoff, for A = 2^shift b.
   */
  private static int correction(double[][] b, int shift, int m) {
    int n = b.length;
    double norm = Rows.oneNorm(b);
    double[] sums = new double[n];
    java.util.Arrays.fill(sums, 1);
    double log = 0;
    for (int p = 0; p < 2 * m + 1; p++) {
      double[] next = new double[n];
      for (int i = 0; i < n; i++) {
        for (int j = 0; j < n; j++) {
          next[j] += sums[i] * Math.abs(b[i][j]);
        }
      }
      double largest = 0;
      for (double x : next) {
        largest = Math.max(largest, x);
      }
      if (largest == 0) {
        return 0;
      }
      for (int j = 0; j < n; j++) {
        next[j] /= largest;
      }
      log += Math.log(largest);
      sums = next;
    }
    double logAlpha =
        log - Math.log(norm) + 2 * m * shift * Math.log(2) - logReciprocalCoefficient(m);
    return Math.max(0, (int) Math.ceil((logAlpha / Math.log(2) + 53) / (2 * m)));
  }

  /** Returns ln of 1/|c_(2m+1)| = binomial(2m, m) (2m+1)!. */
  private static double logReciprocalCoefficient(int m) {
    double log = 0;
    for (int k = 1; k <= m; k++) {
      log += Math.log((m + k) / (double) k);
    }
    for (int k = 2; k <= 2 * m + 1; k++) {
      log += Math.log(k);
    }
    return log;
  }

  private static double powerOfTwo(int exponent) {
    return Math.scalb(1.0, exponent);
  }

  /**
   * Returns r_m(A); NaN entries when the denominator cannot be inverted, which the choice of the
   * degree excludes.
   *
   * @param a rows of A, n by n
   * @param degree 3, 5, 7, 9 or 13
   */
  public static double[][] evaluate(double[][] a, int degree, Watch watch) {
    int n = a.length;
    double[][] a2 = Rows.product(a, a, n, watch);
    double[][] odd;
    double[][] even;
    if (degree == 13) {
      double[][] a4 = Rows.product(a2, a2, n, watch);
      double[][] a6 = Rows.product(a2, a4, n, watch);
      double[][] inner = combination(n, 0, B13[9], a2, B13[11], a4, B13[13], a6);
      odd = Rows.product(a6, inner, n, watch);
      add(odd, combination(n, B13[1], B13[3], a2, B13[5], a4, B13[7], a6));
      inner = combination(n, 0, B13[8], a2, B13[10], a4, B13[12], a6);
      even = Rows.product(a6, inner, n, watch);
      add(even, combination(n, B13[0], B13[2], a2, B13[4], a4, B13[6], a6));
    } else {
      double[] c = coefficients(degree);
      odd = combination(n, c[1], c[3], a2, 0, a2, 0, a2);
      even = combination(n, c[0], c[2], a2, 0, a2, 0, a2);
      double[][] power = a2;
      for (int k = 4; k < degree; k += 2) {
        power = Rows.product(power, a2, n, watch);
        for (int i = 0; i < n; i++) {
          Rows.addScaled(odd[i], c[k + 1], power[i], 0, n);
          Rows.addScaled(even[i], c[k], power[i], 0, n);
        }
      }
    }
    odd = Rows.product(a, odd, n, watch);
    double[][] numerator = Rows.copy(even);
    add(numerator, odd);
    for (int i = 0; i < n; i++) {
      Rows.addScaled(even[i], -1, odd[i], 0, n);
    }
    return LuFactors.of(even, watch).solve(numerator, n, watch);
  }

  private static double[] coefficients(int degree) {
    return switch (degree) {
      case 3 -> B3;
      case 5 -> B5;
      case 7 -> B7;
      case 9 -> B9;
      default -> throw new IllegalArgumentException("no approximant of degree " + degree);
    };
  }

  private static double[][] combination(
      int n,
      double c0,
      double c1,
      double[][] m1,
      double c2,
      double[][] m2,
      double c3,
      double[][] m3) {
    double[][] result = new double[n][n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        result[i][j] = c1 * m1[i][j] + c2 * m2[i][j] + c3 * m3[i][j];
      }
      result[i][i] += c0;
    }
    return result;
  }

  private static void add(double[][] target, double[][] source) {
    for (int i = 0; i < target.length; i++) {
      Rows.addScaled(target[i], 1, source[i], 0, target.length);
    }
  }
}
