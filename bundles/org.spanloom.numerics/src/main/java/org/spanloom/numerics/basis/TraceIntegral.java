/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.basis;

import java.util.Arrays;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.internal.work.Watch;

/**
 * The integral of the trace of A, the logarithm of the determinant that Liouville's formula
 * predicts: exact for constant A, else by adaptive Gauss-Kronrod quadrature with 7 and 15 points
 * between given nodes (Piessens et al., QUADPACK, 1983; from memory).
 */
@SuppressWarnings("FloatingPointLiteralPrecision") // tabulated digits stay as tabulated
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

  private static final int DEEPEST = 16;

  private final LinearSystem system;
  private final double[] a;
  private final double[] nodes;
  private final double[] sums;
  private final Watch watch;

  /**
   * Integrates up to every node.
   *
   * @param system the system
   * @param nodes times at which the method stepped, increasing; between them A is smooth
   * @param start time where the integral is 0
   * @param watch asked while working
   */
  TraceIntegral(LinearSystem system, double[] nodes, double start, Watch watch) {
    this.system = system;
    this.watch = watch;
    this.a = new double[system.dimension() * system.dimension()];
    this.nodes = nodes.clone();
    this.sums = new double[nodes.length];
    if (!system.hasConstantMatrix()) {
      for (int k = 1; k < nodes.length; k++) {
        sums[k] = sums[k - 1] + piece(nodes[k - 1], nodes[k]);
      }
      double offset = at(start);
      for (int k = 0; k < sums.length; k++) {
        sums[k] -= offset;
      }
    } else {
      double trace = trace(start);
      for (int k = 0; k < sums.length; k++) {
        sums[k] = trace * (nodes[k] - start);
      }
    }
  }

  /** Returns the integral from the start to a time between the first and the last node. */
  double at(double t) {
    int found = Arrays.binarySearch(nodes, t);
    if (found >= 0) {
      return sums[found];
    }
    int below = Math.clamp(-found - 2, 0, nodes.length - 1);
    return sums[below] + piece(nodes[below], t);
  }

  private double piece(double from, double to) {
    return piece(from, to, 0);
  }

  private double piece(double from, double to, int depth) {
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
    boolean good = !(Math.abs(kronrod - gauss) > 1e-11 * size);
    if (good || depth >= DEEPEST || middle == from || middle == to) {
      return kronrod * half;
    }
    return piece(from, middle, depth + 1) + piece(middle, to, depth + 1);
  }

  private double trace(double t) {
    int n = system.dimension();
    watch.spend((double) n * n);
    system.matrix(t, Side.AFTER, a);
    double sum = 0;
    for (int i = 0; i < n; i++) {
      sum += a[i * n + i];
    }
    return sum;
  }
}
