/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.basis;

import java.util.List;
import java.util.function.DoubleUnaryOperator;
import org.spanloom.numerics.FormulaSystem;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Progress;
import org.spanloom.numerics.ReferenceProblem;
import org.spanloom.numerics.Solved;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.solution.Solution;
import org.spanloom.numerics.solution.SolutionSolver;

/** Bases and systems that several tests look at. */
final class TestBases {

  private TestBases() {}

  static LinearSystem airy() {
    return secondOrder(FormulaSystem.ALWAYS, t -> t, t -> 0);
  }

  static LinearSystem secondOrder(TimeRange range, DoubleUnaryOperator p, DoubleUnaryOperator q) {
    return FormulaSystem.varying(
        2,
        range,
        (t, side, a) -> {
          a[0] = 0;
          a[1] = 1;
          a[2] = p.applyAsDouble(t);
          a[3] = q.applyAsDouble(t);
        });
  }

  static double[] identity(int n) {
    double[] identity = new double[n * n];
    for (int i = 0; i < n; i++) {
      identity[i * n + i] = 1;
    }
    return identity;
  }

  static Solution basis(
      LinearSystem system, double t0, double[] x0, double from, double to, double relative) {
    return Solved.of(
        SolutionSolver.homogeneous(
            system,
            t0,
            x0,
            new TimeRange(from, to),
            ReferenceProblem.accuracy(system.dimension(), relative),
            Progress.NONE));
  }

  static Solution principal(LinearSystem system, double from, double to, double relative) {
    return basis(system, from, identity(system.dimension()), from, to, relative);
  }

  static ConditionSample sample(LinearSystem system, Solution basis, double t) {
    return Solved.of(ConditionProfile.at(system, basis, List.of(t), Progress.NONE)).getFirst();
  }

  static ConditionProfile profile(LinearSystem system, Solution basis) {
    return Solved.of(ConditionProfile.of(system, basis, basis.range(), Progress.NONE));
  }

  /** Hilbert's matrix, the Gram matrix of the monomials on [0, 1]. */
  static double[] hilbert(int n) {
    double[] h = new double[n * n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        h[i * n + j] = 1.0 / (i + j + 1);
      }
    }
    return h;
  }

  /** Pascal's symmetric matrix. */
  static double[] pascal(int n) {
    double[] p = new double[n * n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        p[i * n + j] = i == 0 || j == 0 ? 1 : p[(i - 1) * n + j] + p[i * n + j - 1];
      }
    }
    return p;
  }
}
