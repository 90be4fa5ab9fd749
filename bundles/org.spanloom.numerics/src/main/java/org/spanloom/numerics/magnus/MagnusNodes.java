/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.magnus;

import java.util.Arrays;

/**
 * Values and signed error estimates at the ends of steps, in the order in which they were found.
 */
final class MagnusNodes {

  private double[] times = new double[64];
  private double[][] values = new double[64][];
  private double[][] errors = new double[64][];
  private int count;

  /** Adds a node; copies its arrays. */
  void add(double t, double[] x, double[] error) {
    if (count == times.length) {
      times = Arrays.copyOf(times, 2 * count);
      values = Arrays.copyOf(values, 2 * count);
      errors = Arrays.copyOf(errors, 2 * count);
    }
    times[count] = t;
    values[count] = x.clone();
    errors[count++] = error.clone();
  }

  int count() {
    return count;
  }

  double time(int k) {
    return times[k];
  }

  /** Returns the values at node k; not to be changed. */
  double[] values(int k) {
    return values[k];
  }

  /** Returns the errors at node k; may be changed by who takes them. */
  double[] errors(int k) {
    return errors[k];
  }
}
