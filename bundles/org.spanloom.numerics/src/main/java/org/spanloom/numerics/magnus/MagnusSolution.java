/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.magnus;

import java.util.Arrays;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.internal.algebra.Flat;
import org.spanloom.numerics.internal.step.ErrorWeights;
import org.spanloom.numerics.internal.work.Watch;
import org.spanloom.numerics.solution.InitialValues;
import org.spanloom.numerics.solution.Solution;

/**
 * A solution found by a Magnus integrator: values and error estimates at the nodes; in between,
 * steps from the node before, no longer than those whose results were kept.
 */
final class MagnusSolution implements Solution {

  /** How many times the estimated error counts. */
  static final double SAFETY = 3;

  /**
   * Share of the largest error of a column that every entry of it is given, so that no entry is
   * right by chance.
   */
  private static final double SHARE = 0.4;

  private final BalancedSystem balanced;
  private final MagnusOrder order;
  private final ErrorWeights weights;
  private final int n;
  private final int m;
  private final int start;
  private final double[] times;
  private final double[][] values;

  /**
   * Share of the largest error of a column on the way from the start that counts from there on: an
   * estimate that changes its sign is not an error that vanishes.
   */
  private static final double MEMORY = 0.3;

  /** Estimates relative to the sizes of the weights. */
  private final double[][] errors;

  /**
   * Puts both directions together.
   *
   * @param earlier what was found towards the start of the range
   * @param later what was found towards its end
   */
  MagnusSolution(
      InitialValues problem,
      BalancedSystem balanced,
      MagnusOrder order,
      ErrorWeights weights,
      MagnusNodes earlier,
      MagnusNodes later) {
    this.balanced = balanced;
    this.order = order;
    this.weights = weights;
    n = problem.system().dimension();
    m = problem.columns();
    start = earlier.count() - 1;
    int count = start + later.count();
    times = new double[count];
    values = new double[count][];
    errors = new double[count][];
    for (int k = 0; k < count; k++) {
      MagnusNodes side = k < start ? earlier : later;
      int index = k < start ? start - k : k - start;
      times[k] = side.time(index);
      values[k] = side.values(index);
      errors[k] = side.errors(index);
    }
    shareErrors();
  }

  /**
   * Turns signed estimates at single nodes into bounds that do not rely on where one happens to
   * pass through zero.
   */
  private void shareErrors() {
    double[] before = new double[n * m];
    double[] here = new double[n * m];
    double[] after = new double[n * m];
    relative(0, here);
    for (int k = 0; k < times.length; k++) {
      if (k + 1 < times.length) {
        relative(k + 1, after);
      }
      for (int e = 0; e < n * m; e++) {
        errors[k][e] = SAFETY * Math.max(here[e], Math.max(before[e], after[e]));
      }
      double[] spare = before;
      before = here;
      here = after;
      after = spare;
      Arrays.fill(after, 0);
    }
    remember(1, times.length - 1);
    remember(-1, 0);
  }

  private void remember(int direction, int last) {
    double[] most = new double[m];
    for (int k = start; k != last + direction; k += direction) {
      for (int e = 0; e < n * m; e++) {
        int j = e % m;
        most[j] = Math.max(most[j], errors[k][e]);
      }
      for (int e = 0; e < n * m; e++) {
        errors[k][e] = Math.max(errors[k][e], MEMORY * most[e % m]);
      }
    }
  }

  private void relative(int k, double[] result) {
    double[] x = new double[n * m];
    double[] size = new double[n * m];
    balanced.unscaled(values[k], m, x);
    weights.write(x, x, size, m);
    balanced.unscaled(errors[k], m, result);
    for (int j = 0; j < m; j++) {
      double largest = 0;
      for (int e = j; e < n * m; e += m) {
        result[e] = Math.abs(result[e]) / size[e];
        largest = Math.max(largest, result[e]);
      }
      for (int e = j; e < n * m; e += m) {
        result[e] = Math.max(result[e], SHARE * largest);
      }
    }
  }

  @Override
  public int dimension() {
    return n;
  }

  @Override
  public int columns() {
    return m;
  }

  @Override
  public double startTime() {
    return times[start];
  }

  @Override
  public TimeRange range() {
    return new TimeRange(times[0], times[times.length - 1]);
  }

  @Override
  public void value(double t, Side side, double[] x) {
    int k = find(t);
    if (k >= 0) {
      balanced.unscaled(values[k], m, x);
      return;
    }
    int left = -k - 2;
    int from = left >= start ? left : left + 1;
    int to = left >= start ? left + 1 : left;
    StepPropagator propagator = new StepPropagator(balanced, order);
    double middle = times[from] + (times[to] - times[from]) / 2;
    double[] y = values[from];
    double reached = times[from];
    if (Math.abs(t - reached) > Math.abs(middle - reached)) {
      y = advance(propagator, reached, middle, y);
      reached = middle;
    }
    balanced.unscaled(advance(propagator, reached, t, y), m, x);
  }

  private double[] advance(StepPropagator propagator, double from, double to, double[] y) {
    if (from == to) {
      return y;
    }
    double[] result = new double[y.length];
    Flat.product(propagator.over(from, to, Watch.NONE), y, result, balanced.size(), m);
    return result;
  }

  @Override
  public void errorEstimate(double t, double[] error) {
    int k = find(t);
    if (k == start) {
      Arrays.fill(error, 0, n * m, 0);
      return;
    }
    int left = k >= 0 ? k : -k - 2;
    int right = k >= 0 ? k : left + 1;
    double[] x = new double[n * m];
    double[] size = new double[n * m];
    value(t, Side.AFTER, x);
    weights.write(x, x, size, m);
    for (int e = 0; e < n * m; e++) {
      double relative = Math.max(errors[left][e], errors[right][e]);
      double estimate = relative * size[e] + 4 * Math.ulp(x[e]);
      error[e] = Math.min(estimate, Double.MAX_VALUE);
    }
  }

  /** Returns the number of the node at a time, or -(the number of the node after it) - 1. */
  private int find(double t) {
    if (!(t >= times[0] && t <= times[times.length - 1])) {
      throw new IllegalArgumentException("time " + t + " is outside " + range());
    }
    // The sum makes 0 of -0, which would be looked for before it.
    return Arrays.binarySearch(times, t + 0.0);
  }

  @Override
  public double[] nodes() {
    return times.clone();
  }

  @Override
  public String method() {
    return "Magnus integrator, order " + order.order();
  }
}
