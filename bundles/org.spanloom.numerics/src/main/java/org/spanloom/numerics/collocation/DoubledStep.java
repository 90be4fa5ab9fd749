/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.collocation;

import org.spanloom.numerics.internal.algebra.Rows;
import org.spanloom.numerics.internal.step.ErrorWeights;
import org.spanloom.numerics.internal.step.RoundingSigns;

/**
 * One step done as a whole and again in two halves, with the error of the halves.
 *
 * <p>Step doubling: Hairer, N&oslash;rsett &amp; Wanner, Solving Ordinary Differential Equations I
 * (1993), section II.4 (from memory). For smooth, well resolved solutions the halves are 2^2s times
 * better than the whole. That share is not taken for granted: where fast directions are not
 * resolved the order drops to about s (Prothero &amp; Robinson 1974, Math. Comp. 28, 145), and a
 * kink inside the step drops it further. What halving does to the last Legendre coefficients of the
 * polynomials, 2^-s for a smooth solution, is measured in each column, and the share follows from
 * it.
 */
final class DoubledStep {

  private static final double ROUNDOFF = 0x1p-53;

  /** By how much a kink lets the last coefficients shrink. */
  private static final double KINK = 0.25;

  private static final double MOST_SHARE = 3;

  /** Last coefficients below this are rounding, and do not shrink when the step is halved. */
  private static final double ROUNDING_ONLY = 1e-12;

  private final CollocationTableau tableau;
  private final StageSystem first;
  private final StageSystem second;
  private final double[][] start;
  private final double[][] middle;
  private final double[][] end;
  private final double[][] localError;
  private final double[][] hidden;
  private final double[][] weight;
  private final int m;

  /**
   * Takes the step.
   *
   * @param whole conditions of the whole step
   * @param first conditions of its first half
   * @param second conditions of its second half
   * @param x values at its start, n by m
   * @param speed length of a half times the norm of A
   * @param weights how errors are measured
   * @param localRelative error allowed for one step
   * @param seams looks into the gaps beside the ends
   * @param from time at which it starts
   * @param to time at which it ends
   */
  DoubledStep(
      CollocationTableau tableau,
      StageSystem whole,
      StageSystem first,
      StageSystem second,
      double[][] x,
      int m,
      double speed,
      ErrorWeights weights,
      double localRelative,
      Seams seams,
      double from,
      double to) {
    this.tableau = tableau;
    this.first = first;
    this.second = second;
    this.start = x;
    this.m = m;
    weight = new double[x.length][m];
    weights.write(x, x, weight, m);
    // Well below what the difference of whole and halves is divided by.
    double exact = Math.max(1e-3 * localRelative, ROUNDOFF);
    StageFactors.Precision precision = new StageFactors.Precision(Rows.copy(weight), exact);
    double[][] wholeStages = whole.solve(x, m, precision);
    double[][] firstStages = first.solve(x, m, precision);
    middle = first.end(x, firstStages, m);
    double[][] secondStages = second.solve(middle, m, precision);
    end = second.end(middle, secondStages, m);
    double[][] far = whole.end(x, wholeStages, m);
    weights.write(x, end, weight, m);
    localError = far;
    double power = speed <= 1.5 * tableau.stages() ? 1.5 : 0.5;
    for (int j = 0; j < m; j++) {
      double coarse = roughness(wholeStages, j);
      double fine = Math.max(roughness(firstStages, j), roughness(secondStages, j));
      double share = share(fine < ROUNDING_ONLY ? 0 : fine / coarse, power);
      for (int i = 0; i < x.length; i++) {
        localError[i][j] = share * (far[i][j] - end[i][j]);
      }
    }
    hidden =
        seams.hidden(
            new Seams.Step(from, from + (to - from) / 2, to, x, middle, end),
            whole.coefficients(),
            first.coefficients(),
            second.coefficients(),
            weight,
            m);
  }

  /** Size of the last two Legendre coefficients of a column's polynomial. */
  private double roughness(double[][] z, int j) {
    int n = start.length;
    double largest = 0;
    for (int row = 0; row < n; row++) {
      double last = 0;
      double before = 0;
      for (int i = 0; i < tableau.stages(); i++) {
        double value = z[i * n + row][j];
        last += tableau.leading(i) * value;
        before += tableau.nextToLeading(i) * value;
      }
      largest = Math.max(largest, (Math.abs(last) + Math.abs(before)) / weight[row][j]);
    }
    return largest;
  }

  /**
   * Returns which share of the difference counts: {@code 2^(-power s)} where the coefficients
   * shrink as they do for smooth solutions, the same power of what is measured somewhat above that,
   * and quickly more towards three times the difference where they shrink as for a kink.
   */
  private double share(double shrinking, double power) {
    int s = tableau.stages();
    double best = Math.pow(2, -power * s);
    // The coefficient of degree s - 1 rules the measure.
    double smooth = Math.pow(2, 1.0 - s);
    if (!(shrinking > smooth)) {
      return best;
    }
    double slow = power * s / (s - 1.0);
    double bend = Math.sqrt(smooth * KINK);
    if (shrinking <= bend || smooth >= KINK) {
      return Math.min(best * Math.pow(shrinking / smooth, slow), MOST_SHARE);
    }
    double atBend = best * Math.pow(bend / smooth, slow);
    double steep = Math.log(MOST_SHARE / atBend) / Math.log(KINK / bend);
    return Math.min(atBend * Math.pow(shrinking / bend, steep), MOST_SHARE);
  }

  /** Returns the values at the end, n by m. */
  double[][] end() {
    return end;
  }

  /** Returns the error of the step over the error allowed; infinite when a value is not finite. */
  double error(double localRelative) {
    double largest = 0;
    for (int i = 0; i < end.length; i++) {
      for (int j = 0; j < m; j++) {
        double allowed = (localRelative + 8 * ROUNDOFF) * weight[i][j];
        largest = Math.max(largest, (Math.abs(localError[i][j]) + hidden[i][j]) / allowed);
      }
    }
    boolean finite = !Double.isNaN(largest) && Rows.areFinite(end);
    return finite ? largest : Double.POSITIVE_INFINITY;
  }

  /**
   * Passes the errors at the start on to the end and adds those of this step.
   *
   * @param error signed error estimates at the start, n by m
   * @param signs signs of rounding errors
   */
  double[][] passOn(double[][] error, RoundingSigns signs) {
    double[][] halfway = passOn(first, start, error, middle, signs);
    double[][] result = passOn(second, middle, halfway, end, signs);
    for (int j = 0; j < m; j++) {
      double alignment = 0;
      for (int i = 0; i < end.length; i++) {
        alignment += result[i][j] / weight[i][j] * (localError[i][j] / weight[i][j]);
      }
      // Local errors are known to a factor only, so they are never allowed to cancel what came
      // before.
      double sign = alignment < 0 ? -1 : 1;
      for (int i = 0; i < end.length; i++) {
        result[i][j] += sign * localError[i][j] + Math.copySign(hidden[i][j], result[i][j]);
      }
    }
    return result;
  }

  private double[][] passOn(
      StageSystem stages, double[][] x, double[][] error, double[][] values, RoundingSigns signs) {
    int n = x.length;
    double[] shares = new double[n];
    for (int i = 0; i < n; i++) {
      shares[i] = 2 * signs.next() * ROUNDOFF;
    }
    double[][] off = new double[n][m];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < m; j++) {
        off[i][j] = error[i][j] + 2 * tableau.rounding() * x[i][j];
      }
    }
    double[][] result = stages.end(error, stages.solveErrors(off, x, shares, m), m);
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < m; j++) {
        result[i][j] += 2 * signs.next() * ROUNDOFF * Math.abs(values[i][j]);
      }
    }
    return result;
  }
}
