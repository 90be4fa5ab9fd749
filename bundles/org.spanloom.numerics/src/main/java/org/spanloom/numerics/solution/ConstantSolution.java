/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.solution;

import java.util.Arrays;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.TimeRange;

/** A solution that does not change: over a range of length zero, or of a system without states. */
final class ConstantSolution implements Solution {

  private final int n;
  private final int m;
  private final double startTime;
  private final TimeRange range;
  private final double[] values;

  ConstantSolution(int n, int m, double startTime, TimeRange range, double[] values) {
    this.n = n;
    this.m = m;
    this.startTime = startTime;
    this.range = range;
    this.values = values.clone();
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
    return startTime;
  }

  @Override
  public TimeRange range() {
    return range;
  }

  @Override
  public void value(double t, Side side, double[] x) {
    System.arraycopy(values, 0, x, 0, n * m);
  }

  @Override
  public void errorEstimate(double t, double[] error) {
    Arrays.fill(error, 0, n * m, 0);
  }

  @Override
  public double[] nodes() {
    return range.length() == 0
        ? new double[] {range.start()}
        : new double[] {range.start(), range.end()};
  }

  @Override
  public String method() {
    return "nothing to solve";
  }
}
