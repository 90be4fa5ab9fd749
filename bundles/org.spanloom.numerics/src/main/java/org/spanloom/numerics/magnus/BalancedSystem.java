/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.magnus;

import java.util.Arrays;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Outcome.Reason;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.internal.work.Hopeless;
import org.spanloom.numerics.solution.InitialValues;

/**
 * A system as a matrix alone, in scales of the states in which that matrix has a small norm.
 *
 * <p>A forcing b is one more state that stays at a constant c: {@code [[A, b/c], [0, 0]]} (Van Loan
 * 1978, IEEE Trans. Autom. Control 23, 395; from memory). Each state is divided by a power of two,
 * so that the scaling is exact: the units in which a model is written make norms large that mean
 * nothing (Osborne 1960, J. ACM 7, 338; from memory).
 */
final class BalancedSystem {

  /** Times at which coefficients are looked at, and the share of the range between two of them. */
  private static final int SAMPLES = 24;

  private static final double GOLDEN = (Math.sqrt(5) - 1) / 2;

  private static final int SWEEPS = 10;

  private final LinearSystem system;
  private final int n;
  private final int size;
  private final double[] scale;
  private final double constant;

  private BalancedSystem(LinearSystem system, boolean forced, double[] scale, double constant) {
    this.system = system;
    this.n = system.dimension();
    this.size = forced ? n + 1 : n;
    this.scale = scale;
    this.constant = constant;
  }

  /** Balances by the coefficients at some times of the span. */
  static BalancedSystem of(InitialValues values) {
    LinearSystem system = values.system();
    TimeRange span = values.span();
    int n = system.dimension();
    double[] sizes = new double[n * n];
    double[] a = new double[n * n];
    double[] b = new double[n];
    double[] pushes = new double[n];
    for (int k = 0; k < SAMPLES; k++) {
      // Never in step with a period of the coefficients.
      double share = (k + 1) * GOLDEN;
      double t = span.start() + span.length() * (share - Math.floor(share));
      system.matrix(t, Side.AFTER, a);
      raise(sizes, a);
      if (values.forced()) {
        system.forcing(t, Side.AFTER, b);
        raise(pushes, b);
      }
    }
    double[] scale = balance(sizes, n);
    double norm = 0;
    double push = 0;
    for (int i = 0; i < n; i++) {
      double sum = 0;
      for (int j = 0; j < n; j++) {
        sum += sizes[i * n + j] * scale[j] / scale[i];
      }
      norm = Math.max(norm, sum);
      push = Math.max(push, pushes[i] / scale[i]);
    }
    double size = norm > 0 ? push / norm : 0;
    double[] accurate = values.accuracy().scale();
    double[] x0 = values.x0();
    for (int i = 0; i < n; i++) {
      size = Math.max(size, Math.max(accurate[i], Math.abs(x0[i * values.columns()])) / scale[i]);
    }
    double constant = Math.scalb(1.0, Math.clamp(Math.getExponent(size), -500, 500));
    return new BalancedSystem(system, values.forced(), scale, constant);
  }

  private static void raise(double[] sizes, double[] values) {
    for (int e = 0; e < sizes.length; e++) {
      double size = Math.abs(values[e]);
      sizes[e] = size < Double.POSITIVE_INFINITY ? Math.max(sizes[e], size) : sizes[e];
    }
  }

  private static double[] balance(double[] sizes, int n) {
    double[] scale = new double[n];
    Arrays.fill(scale, 1);
    boolean changed = true;
    for (int sweep = 0; sweep < SWEEPS && changed; sweep++) {
      changed = false;
      for (int i = 0; i < n; i++) {
        double row = 0;
        double column = 0;
        for (int j = 0; j < n; j++) {
          if (j != i) {
            row += sizes[i * n + j] * scale[j] / scale[i];
            column += sizes[j * n + i] * scale[i] / scale[j];
          }
        }
        double ratio = row / column;
        // A state that feeds nothing, or is fed by nothing, can be scaled at will.
        if (ratio > 0 && ratio < Double.POSITIVE_INFINITY && (ratio > 4 || ratio < 0.25)) {
          int half = (int) Math.rint(Math.log(ratio) / Math.log(2) / 2);
          scale[i] = Math.scalb(scale[i], Math.clamp(half, -200, 200));
          changed = true;
        }
      }
    }
    return scale;
  }

  /** Returns the order of the matrix: n, or n + 1 with a forcing. */
  int size() {
    return size;
  }

  /** Returns the number of states n, without the constant one. */
  int states() {
    return n;
  }

  /** Returns storage for A as the caller's system writes it. */
  double[] storage() {
    return new double[n * n];
  }

  /**
   * Writes the matrix.
   *
   * @param raw storage for n*n numbers
   * @param push storage for n numbers
   * @param a receives the matrix, size by size
   * @throws Hopeless when an entry is not finite
   */
  void write(double t, Side side, double[] raw, double[] push, double[] a) {
    system.matrix(t, side, raw);
    double check = 0;
    for (int i = 0; i < n; i++) {
      double own = 1 / scale[i];
      for (int j = 0; j < n; j++) {
        double value = raw[i * n + j];
        check += value * 0;
        a[i * size + j] = value * (scale[j] * own);
      }
    }
    if (size > n) {
      system.forcing(t, side, push);
      for (int i = 0; i < n; i++) {
        check += push[i] * 0;
        a[i * size + n] = push[i] / (scale[i] * constant);
      }
      Arrays.fill(a, n * size, size * size, 0);
    }
    if (check != 0) {
      throw new Hopeless(
          Reason.COEFFICIENT_NOT_FINITE, t, "an entry of A or b is not a finite number");
    }
  }

  /** Returns values in the scales of this system, size by m, row by row. */
  double[] scaled(double[] x, int m) {
    double[] y = new double[size * m];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < m; j++) {
        y[i * m + j] = x[i * m + j] / scale[i];
      }
    }
    Arrays.fill(y, n * m, size * m, constant);
    return y;
  }

  /** Writes values, n by m, in the scales of the caller. */
  void unscaled(double[] y, int m, double[] x) {
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < m; j++) {
        x[i * m + j] = y[i * m + j] * scale[i];
      }
    }
  }

  /** Returns the scale of state i. */
  double scale(int i) {
    return scale[i];
  }
}
