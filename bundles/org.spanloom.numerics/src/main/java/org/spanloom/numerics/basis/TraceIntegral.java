/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.basis;

import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.internal.work.Watch;

/**
 * The integral of trace A, by adaptive Gauss-Kronrod quadrature with 7 and 15 points (Piessens et
 * al., QUADPACK, 1983; weights from memory, checked in the tests).
 */
final class TraceIntegral {

  private static final double[] POINTS = {
    0.991455371120812639206854697526329,
    0.949107912342758524526189684047851,
    0.864864423359769072789712788640926,
    0.741531185599394439863864773280788,
    0.586087235467691130294144245693013,
    0.405845151377397166906606412076961,
    0.207784955007898467600689403773245,
    0
  };
  private static final double[] KRONROD = {
    0.022935322010529224963732008058970,
    0.063092092629978553290700663189204,
    0.104790010322250183839876322541518,
    0.140653259715525918745189590510238,
    0.169004726639267902826583426598550,
    0.190350578064785409913256402421014,
    0.204432940075298892414161999234649,
    0.209482141084727828012999174891714
  };
  private static final double[] GAUSS = {
    0.129484966168869693270611432679082,
    0.279705391489276667901467771423780,
    0.381830050505118944950369775488975,
    0.417959183673469387755102040816327
  };

  private static final int DEEPEST = 20;

  private final LinearSystem system;
  private final Watch watch;
  private final double[] a;
  private final double[] breakpoints;

  TraceIntegral(LinearSystem system, Watch watch) {
    this.system = system;
    this.watch = watch;
    int n = system.dimension();
    a = new double[n * n];
    breakpoints = system.breakpoints();
  }

  /** Returns the integral from one time to another, which may stand in either order. */
  double between(double from, double to) {
    if (from == to) {
      return 0;
    }
    if (from > to) {
      return -between(to, from);
    }
    if (system.hasConstantMatrix()) {
      return trace(from) * (to - from);
    }
    double sum = 0;
    double left = from;
    for (double breakpoint : breakpoints) {
      if (breakpoint > left && breakpoint < to) {
        sum += adaptive(left, breakpoint, 0);
        left = breakpoint;
      }
    }
    return sum + adaptive(left, to, 0);
  }

  private double adaptive(double from, double to, int depth) {
    watch.spend(20.0 * a.length);
    double half = (to - from) / 2;
    double middle = from + half;
    double kronrod = 0;
    double gauss = 0;
    double size = 0;
    for (int k = 0; k < POINTS.length; k++) {
      double right = trace(middle + half * POINTS[k]);
      double left = POINTS[k] == 0 ? 0 : trace(middle - half * POINTS[k]);
      kronrod += KRONROD[k] * (left + right);
      size += KRONROD[k] * (Math.abs(left) + Math.abs(right));
      if (k % 2 == 1) {
        gauss += GAUSS[k / 2] * (left + right);
      }
    }
    boolean good = !(Math.abs(kronrod - gauss) > 1e-12 * size);
    if (good || depth >= DEEPEST || middle == from || middle == to) {
      return kronrod * half;
    }
    return adaptive(from, middle, depth + 1) + adaptive(middle, to, depth + 1);
  }

  private double trace(double t) {
    system.matrix(t, Side.AFTER, a);
    int n = system.dimension();
    double sum = 0;
    for (int i = 0; i < n; i++) {
      sum += a[i * n + i];
    }
    return sum;
  }
}
