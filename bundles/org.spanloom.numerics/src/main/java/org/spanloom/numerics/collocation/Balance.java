/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.collocation;

import java.util.Arrays;
import org.spanloom.numerics.LinearSystem;

/**
 * Scales of the states in which the norm of A comes near its speed: the units in which a model is
 * written make norms large that mean nothing (Osborne 1960, J. ACM 7, 338; from memory).
 */
final class Balance {

  private Balance() {}

  /**
   * Returns one power of two per state such that the matrix {@code a_ij d_j / d_i} has rows and
   * columns of about the same size.
   *
   * @param shape pattern of the system
   * @param coefficients A at some times
   */
  static double[] of(
      LinearSystem system, StageCoefficients.Shape shape, StageCoefficients coefficients) {
    int n = system.dimension();
    double[] scale = new double[n];
    Arrays.fill(scale, 1);
    int[] rowStart = shape.rowStart();
    int[] columns = shape.columns();
    double[] sizes = new double[columns.length];
    for (int row = 0; row < n; row++) {
      for (int p = rowStart[row]; p < rowStart[row + 1]; p++) {
        for (int i = 0; i < coefficients.stages(); i++) {
          sizes[p] = Math.max(sizes[p], Math.abs(coefficients.entry(i, row, columns[p])));
        }
      }
    }
    for (int sweep = 0; sweep < 10; sweep++) {
      double[] rowSum = new double[n];
      double[] columnSum = new double[n];
      for (int row = 0; row < n; row++) {
        for (int p = rowStart[row]; p < rowStart[row + 1]; p++) {
          if (columns[p] != row) {
            double size = sizes[p] * scale[columns[p]] / scale[row];
            rowSum[row] += size;
            columnSum[columns[p]] += size;
          }
        }
      }
      boolean changed = false;
      for (int i = 0; i < n; i++) {
        double ratio = rowSum[i] / columnSum[i];
        // A state that feeds nothing, or is fed by nothing, can be scaled at will and does not
        // count.
        if (ratio > 0 && ratio < Double.POSITIVE_INFINITY && (ratio > 4 || ratio < 0.25)) {
          int half = Math.getExponent(ratio) / 4;
          int step = half == 0 ? (int) Math.signum(Math.log(ratio)) : half;
          scale[i] = Math.scalb(scale[i], Math.clamp(step, -200, 200));
          changed = true;
        }
      }
      if (!changed) {
        break;
      }
    }
    return scale;
  }
}
