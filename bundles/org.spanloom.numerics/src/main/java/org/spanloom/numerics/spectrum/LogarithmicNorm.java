/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.spectrum;

import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.EigenDecomposition_F64;

/**
 * Logarithmic norms of a matrix: bounds of the rate at which any solution of x' = A x grows at this
 * moment, {@code |x(t+h)| <= exp(mu h) |x(t)|} (Dahlquist 1958; Lozinskii 1958).
 *
 * @param euclidean the largest eigenvalue of (A + A')/2
 * @param largestRow max over i of {@code a_ii + sum over j other than i of |a_ij|}
 */
public record LogarithmicNorm(double euclidean, double largestRow) {

  /**
   * Computes them for states divided by their scales.
   *
   * @param a matrix, n by n, row by row, finite
   * @param scale n positive sizes of the states
   */
  public static LogarithmicNorm of(double[] a, double[] scale) {
    int n = scale.length;
    if (n == 0) {
      return new LogarithmicNorm(Double.NEGATIVE_INFINITY, Double.NEGATIVE_INFINITY);
    }
    DMatrixRMaj symmetric = new DMatrixRMaj(n, n);
    double largest = Double.NEGATIVE_INFINITY;
    for (int i = 0; i < n; i++) {
      double row = a[i * n + i];
      for (int j = 0; j < n; j++) {
        double here = a[i * n + j] * scale[j] / scale[i];
        double there = a[j * n + i] * scale[i] / scale[j];
        symmetric.set(i, j, (here + there) / 2);
        row += i == j ? 0 : Math.abs(here);
      }
      largest = Math.max(largest, row);
    }
    EigenDecomposition_F64<DMatrixRMaj> eigen = DecompositionFactory_DDRM.eig(n, false, true);
    eigen.decompose(symmetric);
    double euclidean = Double.NEGATIVE_INFINITY;
    for (int k = 0; k < n; k++) {
      euclidean = Math.max(euclidean, eigen.getEigenvalue(k).real);
    }
    return new LogarithmicNorm(euclidean, largest);
  }
}
