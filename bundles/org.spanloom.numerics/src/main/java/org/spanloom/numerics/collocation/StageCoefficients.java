/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.collocation;

import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Outcome.Reason;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.SparsityPattern;
import org.spanloom.numerics.internal.algebra.Rows;
import org.spanloom.numerics.internal.work.Hopeless;
import org.spanloom.numerics.structure.BandOrder;

/** A and b at the points of one step, taken from inside the step where they jump at its ends. */
final class StageCoefficients {

  private final int n;
  private final Shape shape;
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
    this.shape = shape;
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

  /**
   * Evaluates the coefficients at one time.
   *
   * @param side which one-sided value to take
   */
  StageCoefficients(LinearSystem system, Shape shape, double t, Side side, boolean forced) {
    n = system.dimension();
    this.shape = shape;
    rowStart = shape.rowStart();
    columns = shape.columns();
    a = new double[1][n * n];
    b = new double[forced ? 1 : 0][n];
    system.matrix(t, side, a[0]);
    requireFinite(a[0], t, "A");
    if (forced) {
      system.forcing(t, side, b[0]);
      requireFinite(b[0], t, "b");
    }
  }

  /** A sparsity pattern without its copies, and the order in which its band is narrow. */
  record Shape(int[] rowStart, int[] columns, BandOrder band) {
    static Shape of(LinearSystem system) {
      SparsityPattern pattern = system.pattern();
      return new Shape(pattern.rowStart(), pattern.columns(), BandOrder.of(pattern));
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

  Shape shape() {
    return shape;
  }

  /** Returns the mean of A over the points, row by row. */
  double[] mean() {
    double[] mean = new double[n * n];
    for (double[] ai : a) {
      for (int e = 0; e < mean.length; e++) {
        mean[e] += ai[e] / a.length;
      }
    }
    return mean;
  }

  /**
   * Returns how much A changes over the points: the sum of the changes of all entries over the sum
   * of their sizes.
   */
  double spread() {
    double sizes = 0;
    double changes = 0;
    for (int row = 0; row < n; row++) {
      for (int p = rowStart[row]; p < rowStart[row + 1]; p++) {
        int e = row * n + columns[p];
        double low = Double.POSITIVE_INFINITY;
        double high = Double.NEGATIVE_INFINITY;
        for (double[] ai : a) {
          low = Math.min(low, ai[e]);
          high = Math.max(high, ai[e]);
        }
        changes += high - low;
        sizes += Math.max(Math.abs(low), Math.abs(high));
      }
    }
    return sizes == 0 ? 0 : changes / sizes;
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

  /**
   * Returns how far the coefficients at an end of the step are from the polynomials through their
   * values at the points, as a residual of the equations: {@code |(A_polynomial - A) x +
   * b_polynomial - b|} above its rounding error, n by m. A kink between the end and the nearest
   * point shows nowhere else.
   *
   * @param there A and b at the end, as the only point
   * @param weights weights of the polynomials at that end
   * @param x values at that end
   */
  double[][] seam(StageCoefficients there, double[] weights, double[][] x, int m) {
    double[][] result = new double[n][m];
    double[] noise = new double[m];
    double spread = 0;
    for (double w : weights) {
      spread += Math.abs(w);
    }
    for (int row = 0; row < n; row++) {
      double[] out = result[row];
      java.util.Arrays.fill(noise, 0);
      for (int p = rowStart[row]; p < rowStart[row + 1]; p++) {
        int entry = row * n + columns[p];
        double off = -there.a[0][entry];
        double size = Math.abs(there.a[0][entry]);
        for (int i = 0; i < weights.length; i++) {
          off += weights[i] * a[i][entry];
          size = Math.max(size, Math.abs(a[i][entry]));
        }
        for (int j = 0; j < m; j++) {
          out[j] += off * x[columns[p]][j];
          noise[j] += size * Math.abs(x[columns[p]][j]);
        }
      }
      if (b.length > 0) {
        double off = -there.b[0][row];
        double size = Math.abs(there.b[0][row]);
        for (int i = 0; i < weights.length; i++) {
          off += weights[i] * b[i][row];
          size = Math.max(size, Math.abs(b[i][row]));
        }
        for (int j = 0; j < m; j++) {
          out[j] += off;
          noise[j] += size;
        }
      }
      for (int j = 0; j < m; j++) {
        out[j] = Math.max(0, Math.abs(out[j]) - 8 * 0x1p-53 * (1 + spread) * noise[j]);
      }
    }
    return result;
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
