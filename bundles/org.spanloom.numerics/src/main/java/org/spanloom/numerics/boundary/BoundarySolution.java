/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.boundary;

import java.util.Arrays;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.collocation.StepPropagator.Polynomial;
import org.spanloom.numerics.solution.Solution;

/** The solution of a boundary-value problem: values at the nodes of a mesh, polynomials between. */
final class BoundarySolution implements Solution {

  private final double[] times;
  private final double[][] values;
  private final double[][] errors;
  private final Polynomial[] polynomials;
  private final double[][] between;
  private final String method;

  /**
   * Takes a solution.
   *
   * @param times nodes
   * @param values n values at each
   * @param errors estimates of their errors
   * @param polynomials one for each step
   * @param between estimates of the errors inside each step, n for each
   * @param method the name of the method
   */
  BoundarySolution(
      double[] times,
      double[][] values,
      double[][] errors,
      Polynomial[] polynomials,
      double[][] between,
      String method) {
    this.times = times;
    this.values = values;
    this.errors = errors;
    this.polynomials = polynomials;
    this.between = between;
    this.method = method;
  }

  @Override
  public int dimension() {
    return values[0].length;
  }

  @Override
  public int columns() {
    return 1;
  }

  @Override
  public double startTime() {
    return times[0];
  }

  @Override
  public TimeRange range() {
    return new TimeRange(times[0], times[times.length - 1]);
  }

  @Override
  public void value(double t, Side side, double[] x) {
    int k = find(t);
    if (k >= 0) {
      System.arraycopy(values[k], 0, x, 0, values[k].length);
    } else {
      int step = -k - 2;
      polynomials[step].value((t - times[step]) / (times[step + 1] - times[step]), x);
    }
  }

  @Override
  public void errorEstimate(double t, double[] error) {
    int k = find(t);
    double[] known = k >= 0 ? errors[k] : between[-k - 2];
    System.arraycopy(known, 0, error, 0, known.length);
  }

  private int find(double t) {
    if (!(t >= times[0] && t <= times[times.length - 1])) {
      throw new IllegalArgumentException("time " + t + " is outside " + range());
    }
    return Arrays.binarySearch(times, t);
  }

  @Override
  public double[] nodes() {
    return times.clone();
  }

  @Override
  public String method() {
    return method;
  }
}
