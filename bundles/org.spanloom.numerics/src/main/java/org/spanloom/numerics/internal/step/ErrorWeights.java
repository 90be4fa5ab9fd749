/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.internal.step;

import org.spanloom.numerics.Accuracy;

/**
 * The size against which the error of each number is measured.
 *
 * <p>A trajectory is measured against {@code max(|x_i|, scale_i)}. The columns of a basis may be
 * multiplied by any number without becoming another basis, so the scale of a column is its own size
 * at that time: {@code max(|x_ij|, scale_i max_k |x_kj| / scale_k)}.
 */
public final class ErrorWeights {

  private static final double SMALLEST = 1e-280;

  private final double relative;
  private final double[] scale;
  private final boolean byColumn;

  /** Weighs for an accuracy; {@code byColumn} for the columns of a basis. */
  public ErrorWeights(Accuracy accuracy, boolean byColumn) {
    this.relative = accuracy.relative();
    this.scale = accuracy.scale();
    this.byColumn = byColumn;
  }

  /** Returns the relative error asked for. */
  public double relative() {
    return relative;
  }

  /**
   * Writes the sizes for values x, n by m; {@code before} holds earlier values that count as well,
   * or is x itself.
   */
  public void write(double[][] before, double[][] x, double[][] weights, int m) {
    for (int j = 0; j < m; j++) {
      double size = byColumn ? SMALLEST : 1;
      if (byColumn) {
        for (int i = 0; i < x.length; i++) {
          size = Math.max(size, Math.abs(x[i][j]) / scale[i]);
        }
      }
      for (int i = 0; i < x.length; i++) {
        double own = Math.max(Math.abs(x[i][j]), Math.abs(before[i][j]));
        weights[i][j] = Math.max(own, scale[i] * size);
      }
    }
  }

  /** Writes the sizes for values x, n by m, row by row, as the other method does. */
  public void write(double[] before, double[] x, double[] weights, int m) {
    int n = scale.length;
    for (int j = 0; j < m; j++) {
      double size = byColumn ? SMALLEST : 1;
      if (byColumn) {
        for (int i = 0; i < n; i++) {
          size = Math.max(size, Math.abs(x[i * m + j]) / scale[i]);
        }
      }
      for (int i = 0; i < n; i++) {
        int e = i * m + j;
        double own = Math.max(Math.abs(x[e]), Math.abs(before[e]));
        weights[e] = Math.max(own, scale[i] * size);
      }
    }
  }
}
