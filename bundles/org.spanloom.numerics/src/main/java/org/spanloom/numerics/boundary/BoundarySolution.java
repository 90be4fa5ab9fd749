/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.boundary;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.collocation.StepPropagator.Polynomial;
import org.spanloom.numerics.solution.Solution;

/** The solution of a boundary-value problem: values at the nodes of a mesh, polynomials between. */
final class BoundarySolution implements Solution {

  private final double[] times;
  private final double[][] values;
  private final double[][] errors;
  private final List<Optional<Polynomial>> polynomials;
  private final double[][] between;
  private final String method;

  /**
   * Takes a solution.
   *
   * @param times nodes; two at one time where the states jump
   * @param values n values at each
   * @param errors estimates of their errors
   * @param polynomials one for each step, none for a jump
   * @param between estimates of the errors inside each step, n for each
   * @param method the name of the method
   */
  BoundarySolution(
      double[] times,
      double[][] values,
      double[][] errors,
      List<Optional<Polynomial>> polynomials,
      double[][] between,
      String method) {
    this.times = times;
    this.values = values;
    this.errors = errors;
    this.polynomials = List.copyOf(polynomials);
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
    int k = find(t, side);
    if (k >= 0) {
      System.arraycopy(values[k], 0, x, 0, values[k].length);
    } else {
      int step = -k - 2;
      double theta = (t - times[step]) / (times[step + 1] - times[step]);
      polynomials.get(step).orElseThrow().value(theta, x);
    }
  }

  @Override
  public void errorEstimate(double t, double[] error) {
    errorEstimate(t, Side.AFTER, error);
  }

  @Override
  public void errorEstimate(double t, Side side, double[] error) {
    int k = find(t, side);
    double[] known = k >= 0 ? errors[k] : between[-k - 2];
    System.arraycopy(known, 0, error, 0, known.length);
  }

  /** Returns the node at a time and side, or -(the number of the node after it) - 1. */
  private int find(double t, Side side) {
    if (!(t >= times[0] && t <= times[times.length - 1])) {
      throw new IllegalArgumentException("time " + t + " is outside " + range());
    }
    // The sum makes 0 of -0, which would be looked for before it.
    int k = Arrays.binarySearch(times, t + 0.0);
    if (side == Side.AFTER && k >= 0 && k + 1 < times.length && times[k + 1] == t) {
      return k + 1;
    }
    return side == Side.BEFORE && k > 0 && times[k - 1] == t ? k - 1 : k;
  }

  @Override
  public double[] jumpTimes() {
    return IntStream.range(0, polynomials.size())
        .filter(k -> polynomials.get(k).isEmpty())
        .mapToDouble(k -> times[k])
        .toArray();
  }

  @Override
  public double[] nodes() {
    return Arrays.stream(times).distinct().toArray();
  }

  @Override
  public String method() {
    return method;
  }
}
