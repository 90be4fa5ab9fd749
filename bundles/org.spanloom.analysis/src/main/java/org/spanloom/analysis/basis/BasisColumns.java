/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.basis;

import java.util.Optional;
import org.spanloom.analysis.coefficients.CompiledSystem;
import org.spanloom.language.model.Basis;
import org.spanloom.language.model.SystemModel;
import org.spanloom.language.text.Span;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Outcome;
import org.spanloom.numerics.Progress;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.solution.MethodChoice;
import org.spanloom.numerics.solution.Solution;
import org.spanloom.numerics.solution.SolutionSolver;

/**
 * The initial vectors of a basis, in declared units.
 *
 * @param name name of the basis
 * @param declared whether the model declares it
 * @param startTime when the vectors hold, in the time unit
 * @param columns number of vectors
 * @param start the vectors side by side, n by {@code columns}, row by row
 * @param span the declaration; the name of the system where there is none
 */
record BasisColumns(
    String name, boolean declared, double startTime, int columns, double[] start, Span span) {

  /** Name of the basis that is computed where none is declared. */
  static final String PRINCIPAL = "principal";

  /** Copies its array. */
  BasisColumns {
    start = start.clone();
  }

  @Override
  public double[] start() {
    return start.clone();
  }

  static BasisColumns principal(CompiledSystem system, double startTime) {
    SystemModel model = system.model();
    int n = system.dimension();
    return new BasisColumns(PRINCIPAL, false, startTime, n, identity(n), model.nameSpan());
  }

  static BasisColumns of(CompiledSystem system, Basis.Principal basis) {
    int n = system.dimension();
    return new BasisColumns(
        basis.name(), true, system.time(basis.time()), n, identity(n), basis.span());
  }

  static BasisColumns of(CompiledSystem system, Basis.Given basis) {
    int n = system.dimension();
    int m = basis.columns();
    double[] start = new double[n * m];
    for (int i = 0; i < n; i++) {
      double size = system.model().states().get(i).unit().factor();
      for (int j = 0; j < m; j++) {
        start[i * m + j] = system.terms().constant(basis.rows().get(i).get(j)) / size;
      }
    }
    return new BasisColumns(basis.name(), true, system.time(basis.time()), m, start, basis.span());
  }

  private static double[] identity(int n) {
    double[] identity = new double[n * n];
    for (int i = 0; i < n; i++) {
      identity[i * n + i] = 1;
    }
    return identity;
  }

  /**
   * Solves the homogeneous system for all columns over a range that holds the start time.
   *
   * @param linear the coefficients and the jumps that count
   */
  Outcome<Solution> solve(
      CompiledSystem system,
      LinearSystem linear,
      TimeRange range,
      double accuracy,
      Optional<MethodChoice> method,
      Progress progress) {
    return SolutionSolver.homogeneous(
        linear, startTime, start, range, system.accuracy(accuracy), method, progress);
  }
}
