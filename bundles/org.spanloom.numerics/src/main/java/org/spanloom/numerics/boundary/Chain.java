/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.boundary;

import org.spanloom.numerics.internal.algebra.Rows;
import org.spanloom.numerics.internal.work.Watch;

/**
 * The equations {@code x_(k+1) = R_k x_k + r_k}, k = 0..N-1, with the nodes between the first and
 * the last eliminated by orthogonal transformations: what is left is one equation {@code G x_0 + H
 * x_N = f} with orthonormal rows (G, H). Products of the R_k, which would overflow or lose the slow
 * directions, are never formed (Wright, SIAM Journal on Scientific and Statistical Computing 13,
 * 1992, 742: structured orthogonal factorisation; from memory).
 */
final class Chain {

  private final int n;
  private final int links;
  private final HouseholderFactors[] factors;
  private final double[][][] next;
  private final double[][][] first;
  private final double[][] g;
  private final double[][] h;
  private final HouseholderFactors ends;

  /**
   * Eliminates.
   *
   * @param matrices R_0 to R_(N-1), each n by n; left as they are
   */
  Chain(double[][][] matrices, Watch watch) {
    n = matrices[0].length;
    links = matrices.length;
    factors = new HouseholderFactors[links - 1];
    next = new double[links - 1][][];
    first = new double[links - 1][][];
    double[][] head = Rows.scaled(matrices[0], -1);
    double[][] tail = Rows.identity(n);
    for (int k = 1; k < links; k++) {
      double[][] column = new double[2 * n][];
      // Columns of x_(k+1), then of x_0.
      double[][] others = new double[2 * n][2 * n];
      for (int i = 0; i < n; i++) {
        column[i] = tail[i];
        column[n + i] = new double[n];
        for (int j = 0; j < n; j++) {
          column[n + i][j] = -matrices[k][i][j];
        }
        others[n + i][i] = 1;
        System.arraycopy(head[i], 0, others[i], n, n);
      }
      factors[k - 1] = HouseholderFactors.of(column, watch);
      factors[k - 1].applyTransposed(others, watch);
      next[k - 1] = block(others, 0, 0);
      first[k - 1] = block(others, 0, n);
      tail = block(others, n, 0);
      head = block(others, n, n);
    }
    // Rows of (G, H) are made orthonormal: they then depend on the relation between the ends alone,
    // not on the mesh.
    double[][] rows = new double[n][2 * n];
    double[][] transposed = new double[2 * n][n];
    for (int i = 0; i < n; i++) {
      System.arraycopy(head[i], 0, rows[i], 0, n);
      System.arraycopy(tail[i], 0, rows[i], n, n);
      for (int j = 0; j < 2 * n; j++) {
        transposed[j][i] = rows[i][j];
      }
    }
    ends = HouseholderFactors.of(transposed, watch);
    ends.solveUpperTransposed(rows, watch);
    g = block(rows, 0, 0);
    h = block(rows, 0, n);
  }

  private double[][] block(double[][] m, int row, int column) {
    double[][] result = new double[n][n];
    for (int i = 0; i < n; i++) {
      System.arraycopy(m[row + i], column, result[i], 0, n);
    }
    return result;
  }

  /** Returns G. */
  double[][] head() {
    return g;
  }

  /** Returns H. */
  double[][] tail() {
    return h;
  }

  /**
   * Right sides on their way through the elimination.
   *
   * @param eliminated what belongs to each node between, in its order
   * @param end f
   */
  record Reduced(double[][][] eliminated, double[][] end) {}

  /**
   * Takes right sides through the elimination.
   *
   * @param right r_0 to r_(N-1), each n by m
   */
  Reduced reduce(double[][][] right, Watch watch) {
    double[][][] eliminated = new double[links - 1][][];
    double[][] f = Rows.copy(right[0]);
    for (int k = 1; k < links; k++) {
      double[][] both = new double[2 * n][];
      for (int i = 0; i < n; i++) {
        both[i] = f[i];
        both[n + i] = right[k][i].clone();
      }
      factors[k - 1].applyTransposed(both, watch);
      eliminated[k - 1] = new double[n][];
      f = new double[n][];
      for (int i = 0; i < n; i++) {
        eliminated[k - 1][i] = both[i];
        f[i] = both[n + i];
      }
    }
    ends.solveUpperTransposed(f, watch);
    return new Reduced(eliminated, f);
  }

  /**
   * Finds the values at all nodes from those at both ends.
   *
   * @param reduced the right sides
   * @param x receives N + 1 values, each n by m; the first and the last are there already
   */
  void fill(Reduced reduced, double[][][] x, Watch watch) {
    int m = x[0][0].length;
    for (int k = links - 1; k >= 1; k--) {
      double[][] c = Rows.copy(reduced.eliminated()[k - 1]);
      subtractProduct(c, next[k - 1], x[k + 1], m);
      subtractProduct(c, first[k - 1], x[0], m);
      factors[k - 1].solveUpper(c, watch);
      x[k] = c;
      watch.spend(4.0 * n * n * m);
    }
  }

  private static void subtractProduct(double[][] c, double[][] a, double[][] b, int m) {
    for (int i = 0; i < a.length; i++) {
      for (int k = 0; k < b.length; k++) {
        Rows.addScaled(c[i], -a[i][k], b[k], 0, m);
      }
    }
  }
}
