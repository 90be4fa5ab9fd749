/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.collocation;

import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.Map;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.internal.algebra.Rows;
import org.spanloom.numerics.internal.step.ErrorWeights;
import org.spanloom.numerics.solution.Solution;

/**
 * A solution found by collocation: values and error estimates at the nodes, and polynomials between
 * them that are found when a time there is first asked for.
 */
final class CollocationSolution implements Solution {

  /** How many times the estimated error counts. */
  static final double SAFETY = 3;

  /**
   * Share of the largest error of a column that every entry of it is given, so that no entry is
   * right by chance.
   */
  private static final double SHARE = 0.4;

  private static final long MOST_NUMBERS_REMEMBERED = 4_000_000;

  private final LinearSystem system;
  private final StageCoefficients.Shape shape;
  private final CollocationTableau method;
  private final CollocationTableau between;
  private final int n;
  private final int m;
  private final boolean forced;
  private final ErrorWeights weights;
  private final int start;
  private final double[] times;
  private final double[][] values;

  /** Estimates relative to the sizes of the weights. */
  private final double[][] errors;

  private final Map<Integer, StepInterpolant> remembered = new LinkedHashMap<>(16, 0.75f, true);
  private long numbersRemembered;

  /**
   * Puts both directions together.
   *
   * @param earlier what was found towards the start of the range
   * @param later what was found towards its end
   */
  CollocationSolution(
      LinearSystem system,
      StageCoefficients.Shape shape,
      CollocationTableau method,
      int m,
      boolean forced,
      ErrorWeights weights,
      CollocationNodes earlier,
      CollocationNodes later) {
    this.system = system;
    this.shape = shape;
    this.method = method;
    this.between = CollocationTableau.of(CollocationTableau.Family.RADAU_IIA, method.stages() + 4);
    this.n = system.dimension();
    this.m = m;
    this.forced = forced;
    this.weights = weights;
    start = earlier.count() - 1;
    int count = start + later.count();
    times = new double[count];
    values = new double[count][];
    errors = new double[count][];
    for (int k = 0; k < count; k++) {
      CollocationNodes side = k < start ? earlier : later;
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
    double[][] size = new double[n][m];
    double[][] relative = new double[times.length][n * m];
    for (int k = 0; k < times.length; k++) {
      double[][] x = Rows.of(values[k], n, m);
      weights.write(x, x, size, m);
      for (int j = 0; j < m; j++) {
        double largest = 0;
        for (int i = 0; i < n; i++) {
          relative[k][i * m + j] = Math.abs(errors[k][i * m + j]) / size[i][j];
          largest = Math.max(largest, relative[k][i * m + j]);
        }
        for (int i = 0; i < n; i++) {
          relative[k][i * m + j] = Math.max(relative[k][i * m + j], SHARE * largest);
        }
      }
    }
    for (int k = 0; k < times.length; k++) {
      for (int e = 0; e < n * m; e++) {
        double before = relative[Math.max(k - 1, 0)][e];
        double after = relative[Math.min(k + 1, times.length - 1)][e];
        double worst = Math.max(relative[k][e], Math.max(before, after));
        errors[k][e] = SAFETY * worst;
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
      System.arraycopy(values[k], 0, x, 0, n * m);
    } else {
      interpolant(-k - 2).value(t, x);
    }
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
    double[] values = new double[n * m];
    value(t, Side.AFTER, values);
    double[][] x = Rows.of(values, n, m);
    double[][] size = new double[n][m];
    weights.write(x, x, size, m);
    double[] between = k >= 0 ? new double[n * m] : interpolant(left).error(t);
    for (int e = 0; e < n * m; e++) {
      double relative = Math.max(errors[left][e], errors[right][e]);
      double estimate = relative * size[e / m][e % m] + between[e] + 4 * Math.ulp(values[e]);
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

  private StepInterpolant interpolant(int left) {
    synchronized (remembered) {
      StepInterpolant known = remembered.get(left);
      if (known != null) {
        return known;
      }
    }
    int from = left >= start ? left : left + 1;
    int to = left >= start ? left + 1 : left;
    StepInterpolant found =
        new StepInterpolant(
            system,
            shape,
            between,
            m,
            forced,
            weights,
            times[from],
            times[to],
            Rows.of(values[from], n, m));
    synchronized (remembered) {
      if (remembered.putIfAbsent(left, found) == null) {
        numbersRemembered += found.size();
        var oldest = remembered.entrySet().iterator();
        while (numbersRemembered > MOST_NUMBERS_REMEMBERED && remembered.size() > 1) {
          numbersRemembered -= oldest.next().getValue().size();
          oldest.remove();
        }
      }
    }
    return found;
  }

  @Override
  public double[] nodes() {
    return times.clone();
  }

  @Override
  public String method() {
    return method.family().label() + " collocation, order " + method.order();
  }
}
