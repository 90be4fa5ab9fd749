/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.problem;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.api.Assertions.fail;

import java.util.Arrays;
import org.spanloom.numerics.Accuracy;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Outcome;
import org.spanloom.numerics.Progress;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.solution.Solution;
import org.spanloom.numerics.solution.SolutionSolver;

/** Solves in tests and compares. */
public final class Solved {

  private Solved() {}

  /** Returns the result, or fails with what came instead. */
  public static <T> T of(Outcome<T> outcome) {
    if (outcome instanceof Outcome.Solved<T> solved) {
      return solved.value();
    }
    return fail("expected a result, got " + outcome);
  }

  /** Returns why there is no result, or fails. */
  public static <T> Outcome.Unsolved<T> not(Outcome<T> outcome) {
    if (outcome instanceof Outcome.Unsolved<T> unsolved) {
      return unsolved;
    }
    return fail("expected no result, got " + outcome);
  }

  /** Returns an accuracy with scales 1. */
  public static Accuracy accuracy(int n, double relative) {
    double[] scale = new double[n];
    Arrays.fill(scale, 1);
    return new Accuracy(relative, scale);
  }

  /** Returns the unit vectors. */
  public static double[] identity(int n) {
    double[] columns = new double[n * n];
    for (int i = 0; i < n; i++) {
      columns[i * n + i] = 1;
    }
    return columns;
  }

  /** Solves from the start of the range. */
  public static Solution trajectory(LinearSystem system, double relative, double... x0) {
    return of(
        SolutionSolver.trajectory(
            system,
            system.range().start(),
            x0,
            system.range(),
            accuracy(x0.length, relative),
            Progress.NONE));
  }

  /** Solves for the principal basis at the start of the range. */
  public static Solution principal(LinearSystem system, double relative) {
    return columns(system, relative, identity(system.dimension()));
  }

  /** Solves for columns given at the start of the range. */
  public static Solution columns(LinearSystem system, double relative, double... x0) {
    return of(
        SolutionSolver.homogeneous(
            system,
            system.range().start(),
            x0,
            system.range(),
            accuracy(system.dimension(), relative),
            Progress.NONE));
  }

  /** Returns the values at a time. */
  public static double[] at(Solution solution, double t) {
    double[] x = new double[solution.dimension() * solution.columns()];
    solution.value(t, Side.AFTER, x);
    return x;
  }

  /** Returns the error estimates at a time. */
  public static double[] errorsAt(Solution solution, double t) {
    double[] e = new double[solution.dimension() * solution.columns()];
    solution.errorEstimate(t, e);
    return e;
  }

  /**
   * Checks one entry at the end of the range: near the value that is expected, and no further from
   * it than the estimate says.
   */
  public static void assertEnd(Solution solution, int entry, double expected, double relative) {
    double t = solution.range().end();
    double value = at(solution, t)[entry];
    assertEquals(expected, value, relative * Math.abs(expected));
    double error = errorsAt(solution, t)[entry];
    assertTrue(
        Math.abs(value - expected) <= error,
        () -> "error " + Math.abs(value - expected) + " above its estimate " + error);
  }
}
