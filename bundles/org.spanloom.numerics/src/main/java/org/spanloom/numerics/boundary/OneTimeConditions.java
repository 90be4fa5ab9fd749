/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.boundary;

import java.util.ArrayList;
import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.SingularOps_DDRM;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.SingularValueDecomposition_F64;
import org.spanloom.numerics.boundary.BoundaryAnswer.NullSolution;

/**
 * Conditions that all name one time: n equations for the value there, whatever the system is. Their
 * singular values decide them, states divided by their scales and each condition by its size.
 *
 * @param rank how many of them are independent
 * @param value the value that meets them, n numbers; the smallest one if there are many
 * @param mismatch the part of the right sides that no value meets, relative to their size
 * @param smallest the smallest singular value that does not count, or the smallest of all, over the
 *     largest
 * @param directions what they leave open
 */
record OneTimeConditions(
    int rank, double[] value, double mismatch, double smallest, List<NullSolution> directions) {

  private static final double ZERO = 1e-13;

  static OneTimeConditions of(double time, List<BoundaryCondition> conditions, double[] scale) {
    int n = scale.length;
    DMatrixRMaj m = new DMatrixRMaj(n, n);
    double[] right = new double[n];
    for (int i = 0; i < n; i++) {
      double size = 0;
      for (BoundaryCondition.Sample s : conditions.get(i).samples()) {
        m.add(i, s.component(), s.coefficient() * scale[s.component()]);
      }
      for (int j = 0; j < n; j++) {
        size = Math.hypot(size, m.get(i, j));
      }
      right[i] = conditions.get(i).value() / (size > 0 ? size : 1);
      for (int j = 0; j < n && size > 0; j++) {
        m.set(i, j, m.get(i, j) / size);
      }
    }
    SingularValueDecomposition_F64<DMatrixRMaj> svd =
        DecompositionFactory_DDRM.svd(n, n, true, true, false);
    svd.decompose(m);
    DMatrixRMaj u = svd.getU(null, false);
    DMatrixRMaj v = svd.getV(null, false);
    DMatrixRMaj w = svd.getW(null);
    SingularOps_DDRM.descendingOrder(u, false, w, v, false);
    int rank = 0;
    while (rank < n && w.get(rank, rank) > ZERO * n * w.get(0, 0)) {
      rank++;
    }
    double[] value = new double[n];
    double whole = 0;
    double left = 0;
    List<NullSolution> directions = new ArrayList<>();
    for (int k = 0; k < n; k++) {
      double c = 0;
      for (int i = 0; i < n; i++) {
        c += u.get(i, k) * right[i];
      }
      whole = Math.hypot(whole, c);
      if (k < rank) {
        for (int i = 0; i < n; i++) {
          value[i] += scale[i] * v.get(i, k) * c / w.get(k, k);
        }
      } else {
        left = Math.hypot(left, c);
        directions.add(direction(time, v, k, scale));
      }
    }
    double smallest = w.get(Math.min(rank, n - 1), Math.min(rank, n - 1)) / w.get(0, 0);
    return new OneTimeConditions(rank, value, whole > 0 ? left / whole : 0, smallest, directions);
  }

  private static NullSolution direction(double time, DMatrixRMaj v, int k, double[] scale) {
    double largest = 0;
    for (int i = 0; i < scale.length; i++) {
      if (Math.abs(v.get(i, k)) > Math.abs(largest) * (1 + 1e-9)) {
        largest = v.get(i, k);
      }
    }
    double[] values = new double[scale.length];
    for (int i = 0; i < values.length; i++) {
      values[i] = scale[i] * v.get(i, k) / largest;
    }
    return new NullSolution(time, values);
  }
}
