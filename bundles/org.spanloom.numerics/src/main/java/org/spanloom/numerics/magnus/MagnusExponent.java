/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.magnus;

import org.spanloom.numerics.internal.algebra.Flat;

/**
 * The exponent of a Magnus integrator, from the matrices at its points.
 *
 * <p>A on the step is the polynomial through its values, {@code h A = alpha_1 + alpha_2 tau +
 * alpha_3 tau^2 + alpha_4 tau^3} with tau from -1/2 to 1/2. The solution over the step is {@code
 * e^Omega}, and Omega is the sum of the integral of A and of nested commutators of the alphas
 * (Magnus 1954, Commun. Pure Appl. Math. 7, 649). Orders 4 and 6: Iserles &amp; N&oslash;rsett
 * 1999; orders 6 and 8 with three and six commutators: Blanes, Casas &amp; Ros, BIT 40 (2000) 434;
 * all in the review by Blanes, Casas, Oteo &amp; Ros, Physics Reports 470 (2009) 151 (from memory;
 * the tests compare them with the series itself, word by word, up to grade 7).
 */
final class MagnusExponent {

  private final MagnusOrder order;
  private final int n;
  private final double[][] alpha;
  private final double[][] work;
  private final double[] left;
  private final double[] right;
  private final double[] product;

  /** Makes storage for matrices n by n. */
  MagnusExponent(MagnusOrder order, int n) {
    this.order = order;
    this.n = n;
    alpha = new double[order.count()][n * n];
    work = new double[6][n * n];
    left = new double[n * n];
    right = new double[n * n];
    product = new double[n * n];
  }

  /**
   * Returns alpha_k of the last step, k counted from 0; not to be changed.
   *
   * @param k from 0 to s - 1
   */
  double[] alpha(int k) {
    return alpha[k];
  }

  /** Returns about how many floating point operations an exponent takes. */
  double operations() {
    int commutators =
        switch (order) {
          case FOUR -> 1;
          case SIX -> 3;
          case EIGHT -> 6;
        };
    return 4.0 * commutators * n * n * n;
  }

  /**
   * Writes Omega.
   *
   * @param h signed length of the step
   * @param a A at the points
   * @param omega receives the exponent
   */
  void write(double h, double[][] a, double[] omega) {
    switch (order) {
      case FOUR -> four(h, a, omega);
      case SIX -> six(h, a, omega);
      case EIGHT -> eight(h, a, omega);
    }
  }

  private void four(double h, double[][] a, double[] omega) {
    double apart = Math.sqrt(3);
    for (int e = 0; e < omega.length; e++) {
      alpha[0][e] = h * 0.5 * (a[0][e] + a[1][e]);
      alpha[1][e] = h * apart * (a[1][e] - a[0][e]);
    }
    commutator(alpha[0], alpha[1], omega);
    for (int e = 0; e < omega.length; e++) {
      omega[e] = alpha[0][e] - omega[e] / 12;
    }
  }

  private void six(double h, double[][] a, double[] omega) {
    double first = h * Math.sqrt(15) / 3;
    double second = h * 10 / 3;
    double[] a1 = alpha[0];
    double[] a2 = alpha[1];
    double[] a3 = alpha[2];
    for (int e = 0; e < omega.length; e++) {
      a1[e] = h * a[1][e];
      a2[e] = first * (a[2][e] - a[0][e]);
      a3[e] = second * (a[2][e] - 2 * a[1][e] + a[0][e]);
    }
    double[] c1 = work[0];
    double[] c2 = work[1];
    commutator(a1, a2, c1);
    for (int e = 0; e < omega.length; e++) {
      right[e] = (2 * a3[e] + c1[e]) / -60;
    }
    commutator(a1, right, c2);
    for (int e = 0; e < omega.length; e++) {
      left[e] = -20 * a1[e] - a3[e] + c1[e];
      right[e] = a2[e] + c2[e];
    }
    commutator(left, right, omega);
    for (int e = 0; e < omega.length; e++) {
      omega[e] = a1[e] + a3[e] / 12 + omega[e] / 240;
    }
  }

  private void eight(double h, double[][] a, double[] omega) {
    double inner = order.point(2) - 0.5;
    double outer = order.point(3) - 0.5;
    double apart = outer * outer - inner * inner;
    double[] a1 = alpha[0];
    double[] a2 = alpha[1];
    double[] a3 = alpha[2];
    double[] a4 = alpha[3];
    for (int e = 0; e < omega.length; e++) {
      double evenInner = h * 0.5 * (a[1][e] + a[2][e]);
      double evenOuter = h * 0.5 * (a[0][e] + a[3][e]);
      double oddInner = h * 0.5 * (a[2][e] - a[1][e]) / inner;
      double oddOuter = h * 0.5 * (a[3][e] - a[0][e]) / outer;
      a3[e] = (evenOuter - evenInner) / apart;
      a1[e] = evenInner - a3[e] * inner * inner;
      a4[e] = (oddOuter - oddInner) / apart;
      a2[e] = oddInner - a4[e] * inner * inner;
    }
    double[] s1 = work[0];
    double[] r1 = work[1];
    double[] s2 = work[2];
    double[] q = work[3];
    double[] r2 = work[4];
    for (int e = 0; e < omega.length; e++) {
      left[e] = (a1[e] + a3[e] / 28) / -28;
      right[e] = a2[e] + a4[e] * (3 / 28.0);
    }
    commutator(left, right, s1);
    for (int e = 0; e < omega.length; e++) {
      right[e] = (s1[e] - a3[e] / 14) / 3;
    }
    commutator(a1, right, r1);
    for (int e = 0; e < omega.length; e++) {
      left[e] = a1[e] + a3[e] / 28 + s1[e];
      right[e] = a2[e] + a4[e] * (3 / 28.0) + r1[e];
    }
    commutator(left, right, s2);
    commutator(a2, s1, q);
    for (int e = 0; e < omega.length; e++) {
      left[e] = a1[e] + 1.25 * s1[e];
      right[e] = 2 * a3[e] + s2[e] + 0.5 * q[e];
    }
    commutator(left, right, r2);
    for (int e = 0; e < omega.length; e++) {
      left[e] = a1[e] + a3[e] / 12 - s1[e] * (7 / 3.0) - s2[e] / 6;
      right[e] = -9 * a2[e] - 2.25 * a4[e] + 63 * r1[e] + r2[e];
    }
    commutator(left, right, omega);
    for (int e = 0; e < omega.length; e++) {
      omega[e] = a1[e] + a3[e] / 12 - s2[e] * (7 / 120.0) + omega[e] / 360;
    }
  }

  private void commutator(double[] x, double[] y, double[] result) {
    Flat.product(x, y, result, n);
    Flat.product(y, x, product, n);
    for (int e = 0; e < result.length; e++) {
      result[e] -= product[e];
    }
  }
}
