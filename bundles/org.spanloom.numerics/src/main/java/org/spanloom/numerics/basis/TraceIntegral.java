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
 * predicts, by Gauss-Legendre quadrature of seven points between given nodes; exact for constant A.
 */
final class TraceIntegral {

  private static final double[] NODES = {
    0, 0.4058451513773972, 0.7415311855993945, 0.9491079123427585
  };
  private static final double[] WEIGHTS = {
    0.4179591836734694, 0.3818300505051189, 0.2797053914892767, 0.1294849661688697
  };

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
    double middle = from + (to - from) / 2;
    double half = (to - from) / 2;
    double sum = WEIGHTS[0] * trace(middle);
    for (int k = 1; k < NODES.length; k++) {
      sum += WEIGHTS[k] * (trace(middle - half * NODES[k]) + trace(middle + half * NODES[k]));
    }
    return half * sum;
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
