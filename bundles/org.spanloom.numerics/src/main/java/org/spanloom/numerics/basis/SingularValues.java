/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.basis;

import java.util.Arrays;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.SingularValueDecomposition_F64;
import org.spanloom.numerics.internal.work.Watch;

/**
 * Singular values, largest first.
 *
 * <p>EJML's decomposition is quick and right to about n u times the largest of them. Where that
 * does not tell the smallest well, Jacobi rotations do.
 */
final class SingularValues {

  private static final double ENOUGH_FOR_GENERAL = 1e9;
  private static final int FEW_COLUMNS = 6;
  private static final int MOST_COLUMNS_FOR_ROTATIONS = 160;

  private SingularValues() {}

  /**
   * Computes them.
   *
   * @param x n by m matrix, row by row, finite, n at least m, m at least 1
   * @param watch asked while working
   */
  static double[] of(double[] x, int n, int m, Watch watch) {
    if (m <= FEW_COLUMNS) {
      return JacobiSingularValues.of(x, n, m, watch);
    }
    double[] values = general(x, n, m, watch);
    boolean doubtful = !(values[0] < ENOUGH_FOR_GENERAL * values[m - 1]);
    return doubtful && m <= MOST_COLUMNS_FOR_ROTATIONS
        ? JacobiSingularValues.of(x, n, m, watch)
        : values;
  }

  /**
   * Computes them to about n u times the largest, without looking closer at the smallest.
   *
   * @param x n by m matrix, row by row, finite, n at least m, m at least 1
   * @param watch asked while working
   */
  static double[] general(double[] x, int n, int m, Watch watch) {
    watch.spend(4.0 * n * m * m);
    DMatrixRMaj matrix = new DMatrixRMaj(n, m);
    System.arraycopy(x, 0, matrix.data, 0, n * m);
    SingularValueDecomposition_F64<DMatrixRMaj> svd =
        DecompositionFactory_DDRM.svd(n, m, false, false, true);
    double[] largestFirst = new double[m];
    if (!svd.decompose(matrix)) {
      return largestFirst;
    }
    double[] sorted = svd.getSingularValues().clone();
    Arrays.sort(sorted);
    for (int k = 0; k < m; k++) {
      largestFirst[k] = sorted[sorted.length - 1 - k];
    }
    return largestFirst;
  }
}
