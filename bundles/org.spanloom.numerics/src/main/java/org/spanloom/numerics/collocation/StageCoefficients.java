/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.collocation;

import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Outcome.Reason;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.internal.algebra.Rows;
import org.spanloom.numerics.internal.work.Hopeless;

/** A and b at the points of one step, taken from inside the step where they jump at its ends. */
final class StageCoefficients {

  private final int n;
  private final int[] rowStart;
  private final int[] columns;
  private final double[][] a;
  private final double[][] b;

  /**
   * Evaluates the coefficients.
   *
   * @param system the system
   * @param shape its pattern, the arrays taken out once
   * @param tableau points of the step
   * @param from time at which the step starts
   * @param to time at which it ends, before or after {@code from}
   * @param forced whether b is wanted
   * @throws Hopeless when a coefficient is not finite
   */
  StageCoefficients(
      LinearSystem system,
      Shape shape,
      CollocationTableau tableau,
      double from,
      double to,
      boolean forced) {
    n = system.dimension();
    rowStart = shape.rowStart();
    columns = shape.columns();
    int s = tableau.stages();
    a = new double[s][];
    b = new double[forced ? s : 0][];
    for (int i = 0; i < s; i++) {
      double t = tableau.point(i) == 1 ? to : from + tableau.point(i) * (to - from);
      Side side = t == Math.max(from, to) && t != Math.min(from, to) ? Side.BEFORE : Side.AFTER;
      if (i > 0 && system.hasConstantMatrix()) {
        a[i] = a[0];
      } else {
        a[i] = new double[n * n];
        system.matrix(t, side, a[i]);
        requireFinite(a[i], t, "A");
      }
      if (forced) {
        b[i] = new double[n];
        system.forcing(t, side, b[i]);
        requireFinite(b[i], t, "b");
      }
    }
  }

  /** A sparsity pattern without its copies. */
  record Shape(int[] rowStart, int[] columns) {
    static Shape of(LinearSystem system) {
      return new Shape(system.pattern().rowStart(), system.pattern().columns());
    }
  }

  private static void requireFinite(double[] values, double t, String name) {
    if (!Rows.isFinite(values)) {
      throw new Hopeless(
          Reason.COEFFICIENT_NOT_FINITE, t, "an entry of " + name + " is not a finite number");
    }
  }

  int dimension() {
    return n;
  }

  int stages() {
    return a.length;
  }

  /** Returns entry (row, column) of A at point i. */
  double entry(int i, int row, int column) {
    return a[i][row * n + column];
  }

  /** Returns A at point i, row by row; not to be changed. */
  double[] matrix(int i) {
    return a[i];
  }

  /** Adds {@code h A_i x} to n rows of the target from {@code firstRow} on. */
  void addProduct(int i, double h, double[][] x, double[][] target, int firstRow, int m) {
    double[] ai = a[i];
    for (int row = 0; row < n; row++) {
      double[] out = target[firstRow + row];
      for (int p = rowStart[row]; p < rowStart[row + 1]; p++) {
        Rows.addScaled(out, h * ai[row * n + columns[p]], x[columns[p]], 0, m);
      }
    }
  }

  /**
   * Adds {@code h |A_i| |x|}, each row times its factor, to n rows of the target from {@code
   * firstRow} on.
   */
  void addSizes(
      int i, double h, double[][] x, double[] factor, double[][] target, int firstRow, int m) {
    double[] ai = a[i];
    for (int row = 0; row < n; row++) {
      double[] out = target[firstRow + row];
      for (int p = rowStart[row]; p < rowStart[row + 1]; p++) {
        double size = factor[row] * Math.abs(h * ai[row * n + columns[p]]);
        double[] source = x[columns[p]];
        for (int j = 0; j < m; j++) {
          out[j] += size * Math.abs(source[j]);
        }
      }
    }
  }

  /**
   * Adds {@code h b_i} to every column of n rows of the target from {@code firstRow} on; nothing
   * when unforced.
   */
  void addForcing(int i, double h, double[][] target, int firstRow, int m) {
    if (b.length == 0) {
      return;
    }
    for (int row = 0; row < n; row++) {
      double value = h * b[i][row];
      double[] out = target[firstRow + row];
      for (int j = 0; j < m; j++) {
        out[j] += value;
      }
    }
  }

  /** Returns the largest row sum of {@code |d_row A_ij / d_column|} at the middle point. */
  double norm(double[] balance) {
    double[] middle = a[a.length / 2];
    double norm = 0;
    for (int row = 0; row < n; row++) {
      double sum = 0;
      for (int p = rowStart[row]; p < rowStart[row + 1]; p++) {
        sum += Math.abs(middle[row * n + columns[p]]) * balance[columns[p]];
      }
      norm = Math.max(norm, sum / balance[row]);
    }
    return norm;
  }
}
