/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.coefficients;

import java.util.List;
import org.spanloom.numerics.Jump;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.SparsityPattern;
import org.spanloom.numerics.TimeRange;

/**
 * A linear system whose coefficients are compiled terms; states and time in declared units.
 *
 * @param dimension n
 * @param range the interval in the time unit
 * @param matrix the entries of A that the pattern lists, in its order
 * @param forcing b, n values
 * @param pattern entries of A that are not zero by structure
 * @param corners times inside the range where a coefficient has a corner or a jump, increasing
 * @param jumps changes of the states, by time
 */
record CoefficientSystem(
    int dimension,
    TimeRange range,
    CompiledTerms matrix,
    CompiledTerms forcing,
    SparsityPattern pattern,
    Breakpoints corners,
    List<Jump> jumps)
    implements LinearSystem {

  /** Copies the list. */
  CoefficientSystem {
    jumps = List.copyOf(jumps);
  }

  @Override
  public void matrix(double t, Side side, double[] a) {
    double time = corners.beside(t, side);
    if (pattern.count() == dimension * dimension) {
      matrix.evaluate(time, a);
    } else {
      pattern.scatter(matrix.at(time), a);
    }
  }

  @Override
  public void forcing(double t, Side side, double[] b) {
    forcing.evaluate(corners.beside(t, side), b);
  }

  @Override
  public boolean hasConstantMatrix() {
    return matrix.isConstant();
  }

  @Override
  public boolean hasConstantForcing() {
    return forcing.isConstant();
  }

  @Override
  public double[] breakpoints() {
    return corners.times();
  }

  @Override
  public double[] breakpoints(double from, double to) {
    return corners.between(from, to);
  }
}
