/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.boundary;

import java.util.Arrays;
import java.util.List;
import java.util.stream.DoubleStream;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.solution.Solution;

/**
 * A solution between the times of the conditions, carried on to both ends of the range as an
 * initial value problem.
 */
final class ExtendedSolution implements Solution {

  /**
   * A continuation.
   *
   * @param solution the trajectory from one end of the middle
   * @param growth the homogeneous columns from there, n by n
   * @param error the error at that end, n numbers
   */
  record Wing(Solution solution, Solution growth, double[] error) {

    /** Writes the error of the trajectory and what has become of that at its start. */
    void errorEstimate(double t, Side side, double[] target) {
      solution.errorEstimate(t, side, target);
      int n = error.length;
      double[] columns = new double[n * n];
      growth.value(t, side, columns);
      for (int i = 0; i < n; i++) {
        for (int j = 0; j < n; j++) {
          target[i] += Math.abs(columns[i * n + j]) * error[j];
        }
        target[i] = Math.min(target[i], Double.MAX_VALUE);
      }
    }
  }

  private final Solution middle;
  private final List<Wing> wings;
  private final double[] jumpTimes;

  /**
   * Puts the parts together.
   *
   * @param middle the solution between the conditions
   * @param wings continuations, at most one to each side
   * @param jumpTimes when the states jump, increasing
   */
  ExtendedSolution(Solution middle, List<Wing> wings, double[] jumpTimes) {
    this.middle = middle;
    this.wings = List.copyOf(wings);
    this.jumpTimes = jumpTimes.clone();
  }

  /**
   * Returns the largest factor by which a change at an end of the middle grows, states divided by
   * their scales; 1 where nothing grows.
   */
  double growth(double[] scale) {
    int n = scale.length;
    double largest = 1;
    double[] columns = new double[n * n];
    for (Wing wing : wings) {
      for (double t : wing.growth().nodes()) {
        wing.growth().value(t, Side.AFTER, columns);
        for (int i = 0; i < n; i++) {
          double sum = 0;
          for (int j = 0; j < n; j++) {
            sum += Math.abs(columns[i * n + j]) * scale[j] / scale[i];
          }
          largest = Math.max(largest, sum);
        }
      }
    }
    return largest;
  }

  @Override
  public int dimension() {
    return middle.dimension();
  }

  @Override
  public int columns() {
    return 1;
  }

  @Override
  public double startTime() {
    return middle.startTime();
  }

  @Override
  public TimeRange range() {
    double start = middle.range().start();
    double end = middle.range().end();
    for (Wing wing : wings) {
      start = Math.min(start, wing.solution().range().start());
      end = Math.max(end, wing.solution().range().end());
    }
    return new TimeRange(start, end);
  }

  @Override
  public void value(double t, Side side, double[] x) {
    if (isInMiddle(t, side)) {
      middle.value(t, side, x);
    } else {
      wing(t).solution().value(t, side, x);
    }
  }

  @Override
  public void errorEstimate(double t, double[] error) {
    errorEstimate(t, Side.AFTER, error);
  }

  @Override
  public void errorEstimate(double t, Side side, double[] error) {
    if (isInMiddle(t, side)) {
      middle.errorEstimate(t, side, error);
    } else {
      wing(t).errorEstimate(t, side, error);
    }
  }

  /** The value before a jump at the start of the middle is that of the wing. */
  private boolean isInMiddle(double t, Side side) {
    boolean leftOf =
        side == Side.BEFORE
            && t == middle.range().start()
            && wings.stream().anyMatch(w -> w.solution().range().end() == t);
    return middle.range().contains(t) && !leftOf;
  }

  private Wing wing(double t) {
    return wings.stream()
        .filter(w -> w.solution().range().contains(t))
        .findFirst()
        .orElseThrow(() -> new IllegalArgumentException("time " + t + " is outside " + range()));
  }

  @Override
  public double[] jumpTimes() {
    return jumpTimes.clone();
  }

  @Override
  public double[] nodes() {
    DoubleStream outside =
        wings.stream()
            .flatMapToDouble(w -> Arrays.stream(w.solution().nodes()))
            .filter(t -> !middle.range().contains(t));
    return DoubleStream.concat(Arrays.stream(middle.nodes()), outside)
        .sorted()
        .distinct()
        .toArray();
  }

  @Override
  public String method() {
    return middle.method();
  }
}
