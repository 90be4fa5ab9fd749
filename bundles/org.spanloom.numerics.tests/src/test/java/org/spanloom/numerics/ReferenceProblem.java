/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics;

import java.util.Arrays;
import org.spanloom.numerics.solution.Solution;
import org.spanloom.numerics.solution.SolutionSolver;

/**
 * A linear system of which one number is known.
 *
 * @param name what the number is
 * @param source where it is published
 * @param system the system
 * @param forced whether its forcing counts
 * @param t0 time of the start values
 * @param x0 start values, n by m, row by row
 * @param end time of the number
 * @param weights the number is the sum of the values at the end times these, n by m
 * @param exact the number
 */
public record ReferenceProblem(
    String name,
    String source,
    LinearSystem system,
    boolean forced,
    double t0,
    double[] x0,
    double end,
    double[] weights,
    double exact) {

  /** Error asked for with states of size 1, below which an error counts as absolute. */
  public static Accuracy accuracy(int n, double relative) {
    double[] scale = new double[n];
    Arrays.fill(scale, 1e-3);
    return new Accuracy(relative, scale);
  }

  /** Returns the range from the start to the end, whichever comes first. */
  public TimeRange span() {
    return new TimeRange(Math.min(t0, end), Math.max(t0, end));
  }

  /** Solves. */
  public Outcome<Solution> solve(double relative, Progress progress) {
    Accuracy accuracy = accuracy(system.dimension(), relative);
    return forced
        ? SolutionSolver.trajectory(system, t0, x0, span(), accuracy, progress)
        : SolutionSolver.homogeneous(system, t0, x0, span(), accuracy, progress);
  }

  /** Solves, or fails the test. */
  public Solution solved(double relative) {
    return Solved.of(solve(relative, Progress.NONE));
  }

  /** Returns the number as the solution has it. */
  public double computed(Solution solution) {
    double[] x = new double[x0.length];
    solution.value(end, Side.BEFORE, x);
    double sum = 0;
    for (int k = 0; k < x.length; k++) {
      sum += weights[k] == 0 ? 0 : weights[k] * x[k];
    }
    return sum;
  }

  /** Returns the error of the number that the solution admits. */
  public double estimate(Solution solution) {
    double[] e = new double[x0.length];
    solution.errorEstimate(end, e);
    double sum = 0;
    for (int k = 0; k < e.length; k++) {
      sum += Math.abs(weights[k]) * e[k];
    }
    return sum;
  }

  /** Returns the error of the number that was asked for, given its computed size. */
  public double asked(double relative, Solution solution) {
    double[] x = new double[x0.length];
    solution.value(end, Side.BEFORE, x);
    double sum = 0;
    for (int k = 0; k < x.length; k++) {
      sum += Math.abs(weights[k]) * relative * Math.max(Math.abs(x[k]), 1e-3);
    }
    return sum;
  }

  /**
   * Returns what rounding of the start values to double precision does to the number, and rounding
   * of the number itself: no solver can tell the rounded values from the published ones.
   */
  public double roundingOfStart() {
    int n = system.dimension();
    int m = x0.length / n;
    double[] identity = new double[n * n];
    for (int i = 0; i < n; i++) {
      identity[i * n + i] = 1;
    }
    double[] basis = new double[n * n];
    Solved.of(
            SolutionSolver.homogeneous(
                system, t0, identity, span(), accuracy(n, 1e-6), Progress.NONE))
        .value(end, Side.BEFORE, basis);
    double sum = Math.abs(exact);
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < m; j++) {
        for (int k = 0; k < n; k++) {
          sum += Math.abs(weights[i * m + j] * basis[i * n + k] * x0[k * m + j]);
        }
      }
    }
    return 0x1p-52 * sum;
  }

  @Override
  public String toString() {
    return name;
  }
}
