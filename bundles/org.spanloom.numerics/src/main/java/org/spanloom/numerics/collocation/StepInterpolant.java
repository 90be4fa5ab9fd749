/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.collocation;

import java.util.ArrayList;
import java.util.List;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.internal.algebra.Rows;
import org.spanloom.numerics.internal.step.ErrorWeights;
import org.spanloom.numerics.internal.work.Watch;

/**
 * The solution inside one step: polynomials found by collocation at more points than the step
 * itself had, on the step as a whole or on parts of it, so that the value in between is as good as
 * asked for.
 *
 * <p>The values at the ends of steps have order 2s - 1 or 2s, the polynomial between them only s +
 * 1 (Hairer, N&oslash;rsett &amp; Wanner 1993, theorem II.7.10; from memory). The error of a
 * polynomial is taken from its last two Legendre coefficients.
 */
final class StepInterpolant {

  private static final int DEEPEST = 10;

  /** One polynomial, on the times between {@code from} and {@code to}. */
  private record Piece(
      double from, double to, double[][] start, double[][] stages, double[][] error) {}

  private final LinearSystem system;
  private final StageCoefficients.Shape shape;
  private final CollocationTableau tableau;
  private final int m;
  private final boolean forced;
  private final ErrorWeights weights;
  private final List<Piece> pieces = new ArrayList<>();

  /**
   * Finds the polynomials.
   *
   * @param from time at which the step starts, seen from the start of the solution
   * @param to time at which it ends
   * @param x values at its start, n by m
   */
  StepInterpolant(
      LinearSystem system,
      StageCoefficients.Shape shape,
      CollocationTableau tableau,
      int m,
      boolean forced,
      ErrorWeights weights,
      double from,
      double to,
      double[][] x) {
    this.system = system;
    this.shape = shape;
    this.tableau = tableau;
    this.m = m;
    this.forced = forced;
    this.weights = weights;
    cover(from, to, x, 0);
  }

  /** Covers a part of the step and returns the values at its end. */
  private double[][] cover(double from, double to, double[][] x, int depth) {
    StageCoefficients coefficients =
        new StageCoefficients(system, shape, tableau, from, to, forced);
    StageSystem system = StageSystem.of(tableau, coefficients, to - from, m, Watch.NONE);
    double[][] size = new double[x.length][m];
    weights.write(x, x, size, m);
    double[][] z =
        system.solve(
            x, m, new StageFactors.Precision(size, Math.max(1e-3 * weights.relative(), 0x1p-52)));
    double[][] end = system.end(x, z, m);
    double[][] error = tail(z);
    double middle = from + (to - from) / 2;
    boolean divisible = middle != from && middle != to;
    if (depth < DEEPEST && divisible && !isSmall(error, x, end)) {
      double[][] halfway = cover(from, middle, x, depth + 1);
      return cover(middle, to, halfway, depth + 1);
    }
    pieces.add(new Piece(from, to, x, z, error));
    return end;
  }

  private double[][] tail(double[][] z) {
    int n = z.length / tableau.stages();
    double[][] error = new double[n][m];
    for (int row = 0; row < n; row++) {
      for (int j = 0; j < m; j++) {
        double last = 0;
        double before = 0;
        for (int i = 0; i < tableau.stages(); i++) {
          last += tableau.leading(i) * z[i * n + row][j];
          before += tableau.nextToLeading(i) * z[i * n + row][j];
        }
        error[row][j] = 2 * Math.abs(last) + 0.5 * Math.abs(before);
      }
    }
    return error;
  }

  private boolean isSmall(double[][] error, double[][] x, double[][] end) {
    double[][] size = new double[x.length][m];
    double[][] atEnd = new double[x.length][m];
    weights.write(x, x, size, m);
    weights.write(end, end, atEnd, m);
    for (int i = 0; i < x.length; i++) {
      for (int j = 0; j < m; j++) {
        double allowed = Math.max(0.2 * weights.relative(), 0x1p-49);
        if (!(error[i][j] <= allowed * Math.min(size[i][j], atEnd[i][j]))) {
          return false;
        }
      }
    }
    return true;
  }

  private Piece pieceAt(double t) {
    for (Piece piece : pieces) {
      if ((t - piece.from()) * (t - piece.to()) <= 0) {
        return piece;
      }
    }
    return pieces.getLast();
  }

  /** Writes the values at a time inside the step. */
  void value(double t, double[] x) {
    Piece piece = pieceAt(t);
    int n = piece.start().length;
    double[] w = new double[tableau.stages()];
    tableau.weightsAt((t - piece.from()) / (piece.to() - piece.from()), w);
    for (int row = 0; row < n; row++) {
      for (int j = 0; j < m; j++) {
        double value = 0;
        for (int i = 0; i < w.length; i++) {
          value += w[i] * piece.stages()[i * n + row][j];
        }
        x[row * m + j] = piece.start()[row][j] + value;
      }
    }
  }

  /** Returns the error of the polynomial at a time inside the step, row by row. */
  double[] error(double t) {
    return Rows.flat(pieceAt(t).error(), m);
  }

  /** Returns about how many numbers are kept. */
  long size() {
    return pieces.size() * (tableau.stages() + 2L) * system.dimension() * m;
  }
}
