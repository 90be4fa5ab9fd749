/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.magnus;

import org.spanloom.numerics.Side;
import org.spanloom.numerics.internal.algebra.Flat;
import org.spanloom.numerics.internal.work.Watch;

/** The propagators of single steps, {@code x(to) = e^Omega x(from)}. For one thread. */
final class StepPropagator {

  /** Exponents above this are not worth looking at: the step is far too long. */
  private static final double MOST = 500;

  private final BalancedSystem system;
  private final MagnusOrder order;
  private final MagnusExponent exponent;
  private final ExponentialKernel kernel;
  private final double[][] a;
  private final double[] omega;
  private final double[] raw;
  private final double[] push;
  private final double[] matrix;
  private double norm;

  StepPropagator(BalancedSystem system, MagnusOrder order) {
    this.system = system;
    this.order = order;
    int size = system.size();
    exponent = new MagnusExponent(order, size);
    kernel = new ExponentialKernel(size);
    a = new double[order.count()][size * size];
    omega = new double[size * size];
    raw = system.storage();
    push = new double[system.states()];
    matrix = new double[size * size];
  }

  /** Returns the propagator of a step, row by row; overwritten by the next. */
  double[] over(double from, double to, Watch watch) {
    double h = to - from;
    for (int i = 0; i < a.length; i++) {
      double t = from + order.point(i) * h;
      // In steps of a few units in the last place a point may fall on an end.
      Side side = t == Math.max(from, to) ? Side.BEFORE : Side.AFTER;
      system.write(t, side, raw, push, a[i]);
    }
    exponent.write(h, a, omega);
    norm = Flat.oneNorm(omega, system.size());
    watch.spend(kernel.operations() + exponent.operations());
    if (norm < MOST) {
      kernel.exponential(omega, norm, matrix);
    } else {
      java.util.Arrays.fill(matrix, Double.NaN);
    }
    return matrix;
  }

  /** Returns the 1-norm of the exponent of the last step. */
  double norm() {
    return norm;
  }

  /** Returns the size of the last coefficient of the polynomial that stands for A. */
  double roughness() {
    return Flat.oneNorm(exponent.alpha(order.count() - 1), system.size());
  }

  /** Returns the size of the second coefficient of the polynomial that stands for A. */
  double slope() {
    return Flat.oneNorm(exponent.alpha(1), system.size());
  }

  /** Returns the size of the first coefficient of the polynomial that stands for A. */
  double mean() {
    return Flat.oneNorm(exponent.alpha(0), system.size());
  }

  /**
   * Returns how far h A at an end of the last step is from the polynomial through its points.
   *
   * @param there A at that end
   * @param h signed length of the step
   * @param share -1/2 for its start, 1/2 for its end
   */
  double seam(double[] there, double h, double share) {
    double largest = 0;
    double noise = 0;
    for (int e = 0; e < there.length; e++) {
      double value = 0;
      for (int k = order.count() - 1; k >= 0; k--) {
        value = value * share + exponent.alpha(k)[e];
      }
      largest = Math.max(largest, Math.abs(value - h * there[e]));
      noise = Math.max(noise, Math.abs(h * there[e]));
    }
    return Math.max(0, largest - 256 * 0x1p-53 * noise);
  }

  /** Writes A at a time. */
  void coefficients(double t, Side side, double[] there) {
    system.write(t, side, raw, push, there);
  }
}
