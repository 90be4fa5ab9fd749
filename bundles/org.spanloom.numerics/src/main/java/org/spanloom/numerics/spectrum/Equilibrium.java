/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.spectrum;

import java.util.ArrayList;
import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.SingularOps_DDRM;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.SingularValueDecomposition_F64;

/**
 * Where a system with constant coefficients stands still: {@code A x + b = 0}. Decided by the
 * singular values of A in scaled states, rows of A brought to one size.
 */
public sealed interface Equilibrium {

  /**
   * There is exactly one.
   *
   * @param x n values
   * @param errors estimated error of each, by rounding
   */
  record One(double[] x, double[] errors) implements Equilibrium {
    /** Copies the arrays. */
    public One {
      x = x.clone();
      errors = errors.clone();
    }

    @Override
    public double[] x() {
      return x.clone();
    }

    @Override
    public double[] errors() {
      return errors.clone();
    }
  }

  /**
   * There is none: a combination of the states has a constant rate that is not zero.
   *
   * @param combination n factors w with w A = 0
   * @param rate w b
   */
  record None(double[] combination, double rate) implements Equilibrium {
    /** Copies the array. */
    public None {
      combination = combination.clone();
    }

    @Override
    public double[] combination() {
      return combination.clone();
    }
  }

  /**
   * There are infinitely many.
   *
   * @param x the smallest one, relative to the scales
   * @param directions n values each: what can be added any number of times
   */
  record Line(double[] x, List<double[]> directions) implements Equilibrium {
    /** Copies the arrays. */
    public Line {
      x = x.clone();
      directions = directions.stream().map(double[]::clone).toList();
    }

    @Override
    public double[] x() {
      return x.clone();
    }

    @Override
    public List<double[]> directions() {
      return directions.stream().map(double[]::clone).toList();
    }
  }

  /**
   * Finds them.
   *
   * @param a matrix, n by n, row by row, finite
   * @param b n values
   * @param scale n positive sizes of the states
   */
  static Equilibrium of(double[] a, double[] b, double[] scale) {
    int n = scale.length;
    if (n == 0) {
      return new One(new double[0], new double[0]);
    }
    DMatrixRMaj m = new DMatrixRMaj(n, n);
    double[] rowSizes = new double[n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        m.set(i, j, a[i * n + j] * scale[j]);
        rowSizes[i] = Math.hypot(rowSizes[i], m.get(i, j));
      }
      rowSizes[i] = rowSizes[i] > 0 ? rowSizes[i] : 1;
      for (int j = 0; j < n; j++) {
        m.set(i, j, m.get(i, j) / rowSizes[i]);
      }
    }
    SingularValueDecomposition_F64<DMatrixRMaj> svd =
        DecompositionFactory_DDRM.svd(n, n, true, true, false);
    svd.decompose(m);
    DMatrixRMaj u = svd.getU(null, false);
    DMatrixRMaj v = svd.getV(null, false);
    DMatrixRMaj w = svd.getW(null);
    SingularOps_DDRM.descendingOrder(u, false, w, v, false);
    double floor = 16 * n * Math.ulp(1.0) * w.get(0, 0);
    int rank = 0;
    while (rank < n && w.get(rank, rank) > floor) {
      rank++;
    }
    double[] c = new double[n];
    double size = 0;
    for (int k = 0; k < n; k++) {
      for (int i = 0; i < n; i++) {
        c[k] -= u.get(i, k) * b[i] / rowSizes[i];
      }
      size = Math.hypot(size, c[k]);
    }
    for (int k = rank; k < n; k++) {
      if (Math.abs(c[k]) > 1e3 * n * Math.ulp(1.0) * size) {
        return none(u, k, rowSizes, b, n);
      }
    }
    double[] x = new double[n];
    double[] errors = new double[n];
    for (int k = 0; k < rank; k++) {
      double factor = c[k] / w.get(k, k);
      double off = (n * Math.ulp(1.0) * size + floor * Math.abs(factor)) / w.get(k, k);
      for (int i = 0; i < n; i++) {
        x[i] += scale[i] * v.get(i, k) * factor;
        errors[i] += scale[i] * Math.abs(v.get(i, k)) * off;
      }
    }
    if (rank == n) {
      return new One(x, errors);
    }
    List<double[]> directions = new ArrayList<>();
    for (int k = rank; k < n; k++) {
      double[] direction = new double[n];
      for (int i = 0; i < n; i++) {
        direction[i] = scale[i] * v.get(i, k);
      }
      directions.add(normalised(direction));
    }
    return new Line(x, directions);
  }

  private static None none(DMatrixRMaj u, int k, double[] rowSizes, double[] b, int n) {
    double[] combination = new double[n];
    for (int i = 0; i < n; i++) {
      combination[i] = u.get(i, k) / rowSizes[i];
    }
    double[] clean = normalised(combination);
    double rate = 0;
    for (int i = 0; i < n; i++) {
      rate += clean[i] * b[i];
    }
    return new None(clean, rate);
  }

  /** Makes the largest entry 1 and entries at the rounding level 0. */
  private static double[] normalised(double[] x) {
    double largest = 0;
    for (double value : x) {
      if (Math.abs(value) > Math.abs(largest) * (1 + 1e-9)) {
        largest = value;
      }
    }
    double[] result = new double[x.length];
    for (int i = 0; i < x.length; i++) {
      double value = x[i] / largest;
      result[i] = Math.abs(value) < 1e-14 ? 0 : value;
    }
    return result;
  }
}
