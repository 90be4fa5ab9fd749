/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.basis;

import java.util.List;
import org.spanloom.analysis.coefficients.CompiledSystem;
import org.spanloom.analysis.coefficients.CompiledTerms;
import org.spanloom.language.model.Basis;
import org.spanloom.language.model.Term;
import org.spanloom.language.model.TimeDerivative;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.basis.CandidateBasis;
import org.spanloom.numerics.solution.Solution;

/**
 * Closed forms offered as solutions, with their exact derivatives, in declared units. As a {@link
 * Solution} it knows its values at every time, to rounding.
 */
final class ClosedFormCandidate implements CandidateBasis, Solution {

  private static final int EVEN_NODES = 100;
  private static final double ROUNDING = 0x1p-50;

  private final int n;
  private final int m;
  private final TimeRange range;
  private final CompiledTerms values;
  private final CompiledTerms derivatives;
  private final double[] sizes;
  private final double timeFactor;

  ClosedFormCandidate(CompiledSystem system, Basis.ClosedForm basis, TimeRange range) {
    this.n = system.dimension();
    this.m = basis.columns();
    this.range = range;
    List<Term> terms = basis.rows().stream().flatMap(List::stream).toList();
    this.values = system.terms().compile(terms);
    this.derivatives = system.terms().compile(terms.stream().map(TimeDerivative::of).toList());
    this.sizes = system.model().states().stream().mapToDouble(s -> s.unit().factor()).toArray();
    this.timeFactor = system.model().timeUnit().factor();
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
  public void value(double t, double[] x) {
    values.evaluate(t, x);
    divide(x, 1);
  }

  @Override
  public void derivative(double t, double[] dx) {
    derivatives.evaluate(t, dx);
    divide(dx, timeFactor);
  }

  private void divide(double[] x, double factor) {
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < m; j++) {
        x[i * m + j] *= factor / sizes[i];
      }
    }
  }

  @Override
  public double startTime() {
    return range.start();
  }

  @Override
  public TimeRange range() {
    return range;
  }

  @Override
  public void value(double t, Side side, double[] x) {
    CandidateBasis.super.value(t, side, x);
  }

  @Override
  public void errorEstimate(double t, double[] error) {
    value(t, error);
    for (int k = 0; k < error.length; k++) {
      error[k] = ROUNDING * Math.abs(error[k]);
    }
  }

  @Override
  public double[] nodes() {
    double[] nodes = new double[EVEN_NODES + 1];
    for (int k = 0; k <= EVEN_NODES; k++) {
      nodes[k] = k == EVEN_NODES ? range.end() : range.start() + range.length() * k / EVEN_NODES;
    }
    return nodes;
  }

  @Override
  public String method() {
    return "closed form";
  }
}
