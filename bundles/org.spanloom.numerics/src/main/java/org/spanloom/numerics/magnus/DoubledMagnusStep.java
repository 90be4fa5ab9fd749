/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.magnus;

import java.util.Arrays;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.internal.algebra.Flat;
import org.spanloom.numerics.internal.algebra.Rows;
import org.spanloom.numerics.internal.step.ErrorWeights;
import org.spanloom.numerics.internal.step.RoundingSigns;
import org.spanloom.numerics.internal.work.Watch;

/**
 * One step done as a whole and again in two halves, with the error of the halves.
 *
 * <p>Step doubling (Hairer, N&oslash;rsett &amp; Wanner, Solving Ordinary Differential Equations I
 * (1993), section II.4; from memory): of two results of order p, that of the halves is 2^p times
 * better. Twice that share of the difference counts. The last coefficient of the polynomial that
 * stands for A shrinks by 2^-s when a step of smooth coefficients is halved. Where it shrinks less,
 * more counts, and up to the whole difference where a kink hides in the step. For one thread; its
 * storage is used again by the next step.
 */
final class DoubledMagnusStep {

  private static final double ROUNDOFF = 0x1p-53;

  /** Change of A over a step, relative to A, below which it varies slowly. */
  private static final double SLOW = 0.02;

  /** By how much a kink lets the last coefficient shrink. */
  private static final double KINK = 0.2;

  /** Up to this excess over the shrinking of a smooth coefficient the order is only delayed. */
  private static final double SMOOTH = 1.3;

  /** Last coefficients below this share of the first are rounding. */
  private static final double ROUNDING_ONLY = 1e-11;

  private final BalancedSystem system;
  private final MagnusOrder order;
  private final ErrorWeights weights;
  private final int n;
  private final int size;
  private final int m;
  private final StepPropagator whole;
  private final StepPropagator first;
  private final StepPropagator second;
  private final double[] atStart;
  private final double[] atMiddle;
  private final double[] atEnd;
  private final double[] far;
  private final double[] middle;
  private final double[] end;
  private final double[] local;
  private final double[] weight;
  private final double[] plainStart;
  private final double[] plainEnd;
  private final double[] passed;
  private final double[] halfway;
  private final double[] sizes;
  private double[] firstMatrix;
  private double[] secondMatrix;
  private double[] start;
  private double hidden;
  private boolean certain;

  DoubledMagnusStep(BalancedSystem system, MagnusOrder order, ErrorWeights weights, int n, int m) {
    this.system = system;
    this.order = order;
    this.weights = weights;
    this.n = n;
    this.m = m;
    size = system.size();
    whole = new StepPropagator(system, order);
    first = new StepPropagator(system, order);
    second = new StepPropagator(system, order);
    atStart = new double[size * size];
    atMiddle = new double[size * size];
    atEnd = new double[size * size];
    far = new double[size * m];
    middle = new double[size * m];
    end = new double[size * m];
    local = new double[size * m];
    weight = new double[n * m];
    plainStart = new double[n * m];
    plainEnd = new double[n * m];
    passed = new double[size * m];
    halfway = new double[size * m];
    sizes = new double[size * m];
    firstMatrix = new double[0];
    secondMatrix = firstMatrix;
    start = firstMatrix;
  }

  /**
   * Takes the step.
   *
   * @param x values at its start, in the scales of the system
   * @return the error of the step over the error allowed; infinite when a value is not finite
   */
  double take(double from, double to, double[] x, double localRelative, Watch watch) {
    start = x;
    double between = from + (to - from) / 2;
    double[] matrix = whole.over(from, to, watch);
    Flat.product(matrix, x, far, size, m);
    firstMatrix = first.over(from, between, watch);
    Flat.product(firstMatrix, x, middle, size, m);
    secondMatrix = second.over(between, to, watch);
    Flat.product(secondMatrix, middle, end, size, m);
    watch.spend(6.0 * size * size * m);
    if (!Rows.isFinite(end) || !Rows.isFinite(far)) {
      return Double.POSITIVE_INFINITY;
    }
    system.unscaled(x, m, plainStart);
    system.unscaled(end, m, plainEnd);
    weights.write(plainStart, plainEnd, weight, m);
    double share = share();
    hidden = hidden(from, between, to);
    certain =
        whole.slope() < SLOW * whole.mean()
            && share <= SMOOTH * SMOOTH * SMOOTH * best()
            && hidden == 0;
    double largest = 0;
    for (int i = 0; i < n; i++) {
      double scale = system.scale(i);
      for (int j = 0; j < m; j++) {
        int e = i * m + j;
        local[e] = share * (far[e] - end[e]);
        double off = Math.abs(local[e]) * scale / weight[e] + hidden;
        largest = Math.max(largest, off);
      }
    }
    // The difference is rounding below this.
    double seen = 2 * best() * ROUNDOFF * (2 + norm());
    return largest / Math.max(localRelative, seen);
  }

  /** Returns the share of the difference that counts where nothing hides. */
  private double best() {
    int p = order.order();
    // For long steps the order is not there yet.
    double length = Math.max(1, norm() / 0.8);
    return Math.scalb(Math.min(length * length, 16), p == 4 ? 2 - p : 1 - p);
  }

  private double share() {
    double best = best();
    double coarse = whole.roughness();
    double fine = Math.max(first.roughness(), second.roughness());
    if (!(fine > ROUNDING_ONLY * whole.mean())) {
      return best;
    }
    double smooth = Math.scalb(1.0, -order.count());
    double shrinking = fine / coarse;
    if (!(shrinking > smooth)) {
      return best;
    }
    double excess = shrinking / smooth;
    double slower = best * excess * excess * excess;
    if (excess < SMOOTH) {
      return Math.min(1, slower);
    }
    if (SMOOTH * smooth >= KINK || shrinking >= KINK) {
      return 1;
    }
    double steep = Math.log(1 / best) / Math.log(KINK / (SMOOTH * smooth));
    return Math.min(1, Math.max(slower, best * Math.pow(excess / SMOOTH, steep)));
  }

  /**
   * Returns what kinks may hide between the ends of the steps and their first points, relative to
   * the values: there the coefficients are compared with the polynomials that stand for them.
   */
  private double hidden(double from, double between, double to) {
    boolean forward = to > from;
    whole.coefficients(from, forward ? Side.AFTER : Side.BEFORE, atStart);
    whole.coefficients(between, Side.AFTER, atMiddle);
    whole.coefficients(to, forward ? Side.BEFORE : Side.AFTER, atEnd);
    // Halves of a step differ by rounding.
    double h = to - from;
    double one = between - from;
    double two = to - between;
    double coarse = Math.max(whole.seam(atStart, h, -0.5), whole.seam(atEnd, h, 0.5));
    double fine =
        2
            * Math.max(
                Math.max(first.seam(atStart, one, -0.5), first.seam(atMiddle, one, 0.5)),
                Math.max(second.seam(atMiddle, two, -0.5), second.seam(atEnd, two, 0.5)));
    if (fine == 0) {
      return 0;
    }
    double smooth = 1.6 * Math.scalb(1.0, -order.count());
    double shrinking = fine / coarse;
    if (shrinking <= smooth) {
      return 0;
    }
    double share = 2 * Math.min(1, (shrinking - smooth) / (0.5 - smooth));
    return share * fine * order.point(0) / 4;
  }

  /** Returns the values at the end; overwritten by the next step. */
  double[] end() {
    return end;
  }

  /** Returns the largest norm of the exponents of the halves. */
  double norm() {
    return Math.max(first.norm(), second.norm());
  }

  /**
   * Passes the errors at the start on to the end and adds those of this step.
   *
   * @param error signed error estimates at the start, overwritten by those at the end
   */
  void passOn(double[] error, RoundingSigns signs) {
    passOn(firstMatrix, first.norm(), start, error, halfway, signs);
    passOn(secondMatrix, second.norm(), middle, halfway, passed, signs);
    for (int j = 0; j < m; j++) {
      double alignment = 0;
      for (int i = 0; i < n; i++) {
        int e = i * m + j;
        double scale = system.scale(i) / weight[e];
        alignment += passed[e] * scale * (local[e] * scale);
      }
      // For slowly varying A most of the local errors of a period cancel, and their estimates with
      // them. Elsewhere they are known to a factor only and never cancel what came before.
      double sign = alignment < 0 && !certain ? -1 : 1;
      for (int i = 0; i < n; i++) {
        int e = i * m + j;
        double unseen = hidden * weight[e] / system.scale(i);
        passed[e] += sign * local[e] + Math.copySign(unseen, passed[e]);
      }
    }
    Arrays.fill(passed, n * m, size * m, 0);
    System.arraycopy(passed, 0, error, 0, error.length);
  }

  private void passOn(
      double[] matrix,
      double norm,
      double[] x,
      double[] error,
      double[] result,
      RoundingSigns signs) {
    Flat.product(matrix, error, result, size, m);
    for (int e = 0; e < x.length; e++) {
      sizes[e] = Math.abs(x[e]);
    }
    double unit = 4 * ROUNDOFF * (1 + norm);
    for (int i = 0; i < n; i++) {
      double rounding = signs.next() * unit;
      for (int k = 0; k < size; k++) {
        double entry = rounding * Math.abs(matrix[i * size + k]);
        for (int j = 0; j < m; j++) {
          result[i * m + j] += entry * sizes[k * m + j];
        }
      }
    }
  }
}
