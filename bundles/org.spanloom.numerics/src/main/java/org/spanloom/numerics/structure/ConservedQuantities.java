/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.structure;

import java.util.ArrayList;
import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.SingularOps_DDRM;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.SingularValueDecomposition_F64;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.TimeRange;

/**
 * Linear combinations of the states that keep their value on every solution: constant w with {@code
 * w A(t) = 0} and {@code w b(t) = 0} at all times, looked for at a sample of times.
 *
 * @param combinations independent, n factors each, in the reduced form of Gauss and Jordan, so that
 *     each has a state of its own with factor 1
 */
public record ConservedQuantities(List<double[]> combinations) {

  private static final int TIMES = 12;
  private static final double ZERO = 1e-11;

  /** Copies the arrays. */
  public ConservedQuantities {
    combinations = combinations.stream().map(double[]::clone).toList();
  }

  @Override
  public List<double[]> combinations() {
    return combinations.stream().map(double[]::clone).toList();
  }

  /**
   * Finds them.
   *
   * @param system the system
   * @param range a bounded range of times to look at
   * @param scale n positive sizes of the states
   */
  public static ConservedQuantities of(LinearSystem system, TimeRange range, double[] scale) {
    int n = system.dimension();
    if (n == 0) {
      return new ConservedQuantities(List.of());
    }
    boolean constant = system.hasConstantMatrix() && system.hasConstantForcing();
    int times = constant ? 1 : TIMES;
    DMatrixRMaj all = new DMatrixRMaj(n, times * (n + 1));
    double[] a = new double[n * n];
    double[] b = new double[n];
    for (int k = 0; k < times; k++) {
      // Odd fractions, so that no sample meets another after a period.
      double share = (k + 0.37) / times;
      double t = range.start() + range.length() * share;
      system.matrix(t, Side.AFTER, a);
      system.forcing(t, Side.AFTER, b);
      for (int i = 0; i < n; i++) {
        for (int j = 0; j < n; j++) {
          all.set(i, k * (n + 1) + j, a[i * n + j] * scale[j] / scale[i]);
        }
        all.set(i, k * (n + 1) + n, b[i] / scale[i]);
      }
    }
    equilibrateColumns(all);
    SingularValueDecomposition_F64<DMatrixRMaj> svd =
        DecompositionFactory_DDRM.svd(n, all.numCols, true, false, false);
    if (!svd.decompose(all)) {
      return new ConservedQuantities(List.of());
    }
    DMatrixRMaj u = svd.getU(null, false);
    DMatrixRMaj w = svd.getW(null);
    SingularOps_DDRM.descendingOrder(u, false, w, null, false);
    List<double[]> basis = new ArrayList<>();
    int known = Math.min(w.numRows, w.numCols);
    for (int k = 0; k < n; k++) {
      double sigma = k < known ? w.get(k, k) : 0;
      if (sigma <= ZERO * Math.max(w.get(0, 0), Double.MIN_NORMAL)) {
        double[] row = new double[n];
        for (int i = 0; i < n; i++) {
          row[i] = u.get(i, k) / scale[i];
        }
        basis.add(row);
      }
    }
    return new ConservedQuantities(reduced(basis, scale));
  }

  /** Columns count by their shape, not their size: a fast rate must not hide a slow one. */
  private static void equilibrateColumns(DMatrixRMaj all) {
    for (int j = 0; j < all.numCols; j++) {
      double size = 0;
      for (int i = 0; i < all.numRows; i++) {
        size = Math.max(size, Math.abs(all.get(i, j)));
      }
      for (int i = 0; i < all.numRows && size > 0; i++) {
        all.set(i, j, all.get(i, j) / size);
      }
    }
  }

  private static List<double[]> reduced(List<double[]> rows, double[] scale) {
    int n = scale.length;
    boolean[] taken = new boolean[n];
    for (int r = 0; r < rows.size(); r++) {
      double[] row = rows.get(r);
      int pivot = -1;
      for (int j = 0; j < n; j++) {
        boolean larger =
            pivot < 0
                || Math.abs(row[j]) * scale[j] > Math.abs(row[pivot]) * scale[pivot] * (1 + 1e-6);
        if (!taken[j] && larger) {
          pivot = j;
        }
      }
      taken[pivot] = true;
      double head = row[pivot];
      for (int j = 0; j < n; j++) {
        row[j] /= head;
      }
      for (double[] other : rows) {
        if (other != row) {
          double factor = other[pivot];
          for (int j = 0; j < n; j++) {
            other[j] -= factor * row[j];
          }
        }
      }
    }
    for (double[] row : rows) {
      double largest = 0;
      for (int j = 0; j < n; j++) {
        largest = Math.max(largest, Math.abs(row[j]) * scale[j]);
      }
      for (int j = 0; j < n; j++) {
        row[j] = Math.abs(row[j]) * scale[j] < 1e-10 * largest ? 0 : row[j];
      }
    }
    return rows;
  }
}
