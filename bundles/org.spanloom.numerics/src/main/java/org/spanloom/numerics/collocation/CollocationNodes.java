/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.collocation;

import java.util.ArrayList;
import java.util.List;
import org.spanloom.numerics.Outcome.Reason;
import org.spanloom.numerics.internal.algebra.Rows;
import org.spanloom.numerics.internal.work.Hopeless;

/**
 * Times, values and signed error estimates at the nodes of a run in one direction, in the order in
 * which they were reached.
 */
final class CollocationNodes {

  /** Numbers kept at most, some 400 MB. */
  private static final double MOST_NUMBERS = 5e7;

  private final int m;
  private final List<Double> times = new ArrayList<>();
  private final List<double[]> values = new ArrayList<>();
  private final List<double[]> errors = new ArrayList<>();
  private double numbers;

  CollocationNodes(int m) {
    this.m = m;
  }

  void add(double t, double[][] x, double[][] error) {
    numbers += 2.0 * x.length * m;
    if (numbers > MOST_NUMBERS) {
      throw new Hopeless(
          Reason.TOO_MUCH_WORK,
          t,
          "the solution needs more than " + (long) MOST_NUMBERS + " numbers to be kept");
    }
    times.add(t);
    values.add(Rows.flat(x, m));
    errors.add(Rows.flat(error, m));
  }

  int count() {
    return times.size();
  }

  double time(int k) {
    return times.get(k);
  }

  double[] values(int k) {
    return values.get(k);
  }

  double[] errors(int k) {
    return errors.get(k);
  }
}
