/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.spectrum;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import org.ejml.data.Complex_F64;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.EigenDecomposition_F64;
import org.ejml.interfaces.decomposition.QRDecomposition;
import org.spanloom.numerics.internal.work.Watch;

/**
 * Eigenvalues of a product {@code F_N ... F_1} that is never formed, so that neither the large ones
 * overflow nor the small ones drown in the rounding of the large ones.
 *
 * <p>Orthogonal iteration: {@code F_k Q_(k-1) = Q_k R_k} for k = 1..N, then again with {@code Q_0 =
 * Q_N}, until {@code Q_0' Q_N} is block triangular. What is left then are the diagonal blocks,
 * products of small triangular factors, one block for each set of moduli too close to tell apart by
 * iteration (Bojanczyk, Golub &amp; Van Dooren 1992 for products; Stewart, Numerische Mathematik
 * 25, 1976 for the iteration; from memory).
 */
final class ProductSpectrum {

  private static final double UNCOUPLED = 1e-13;
  private static final double MOST_WORK = 3e9;
  private static final int MOST_SWEEPS = 600;

  /**
   * An eigenvalue {@code exp(logModulus + i phase)}.
   *
   * @param logModulus natural logarithm of its modulus; minus infinity for 0
   * @param phase its argument, in (-pi, pi]
   */
  record Value(double logModulus, double phase) {}

  private final int n;
  private final List<DMatrixRMaj> factors;
  private final Watch watch;
  private final List<DMatrixRMaj> triangles = new ArrayList<>();
  private DMatrixRMaj turn;

  private ProductSpectrum(List<DMatrixRMaj> factors, Watch watch) {
    this.n = factors.getFirst().numRows;
    this.factors = factors;
    this.watch = watch;
    this.turn = CommonOps_DDRM.identity(n);
  }

  /**
   * Computes them.
   *
   * @param factors F_1 to F_N, each n by n, finite, n at least 1
   * @return the eigenvalues by falling modulus, then rising phase
   */
  static List<Value> of(List<DMatrixRMaj> factors, Watch watch) {
    return new ProductSpectrum(factors, watch).values();
  }

  private List<Value> values() {
    int[] ends = iterate();
    List<Value> values = new ArrayList<>();
    int start = 0;
    for (int end : ends) {
      addBlock(start, end, values);
      start = end;
    }
    values.sort(
        Comparator.comparingDouble((Value v) -> -v.logModulus()).thenComparingDouble(Value::phase));
    return values;
  }

  /** Iterates and returns the ends of the blocks. */
  private int[] iterate() {
    double work = 6.0 * n * n * n * factors.size();
    int sweeps = (int) Math.max(12, Math.min(MOST_SWEEPS, MOST_WORK / work));
    DMatrixRMaj q = CommonOps_DDRM.identity(n);
    for (int sweep = 0; ; sweep++) {
      DMatrixRMaj next = sweep(q);
      watch.spend(work);
      CommonOps_DDRM.multTransA(q, next, turn);
      int[] ends = ends();
      if (isResolved(ends) || sweep + 1 >= sweeps) {
        return ends;
      }
      q = next;
    }
  }

  private DMatrixRMaj sweep(DMatrixRMaj start) {
    triangles.clear();
    DMatrixRMaj q = start;
    for (DMatrixRMaj factor : factors) {
      DMatrixRMaj image = new DMatrixRMaj(n, n);
      CommonOps_DDRM.mult(factor, q, image);
      QRDecomposition<DMatrixRMaj> qr = DecompositionFactory_DDRM.qr(n, n);
      qr.decompose(image);
      q = qr.getQ(null, false);
      triangles.add(qr.getR(null, false));
    }
    return q;
  }

  /** Returns the ends of the diagonal blocks of Q_0' Q_N. */
  private int[] ends() {
    List<Integer> ends = new ArrayList<>();
    for (int split = 1; split <= n; split++) {
      double coupling = 0;
      for (int i = split; i < n; i++) {
        for (int j = 0; j < split; j++) {
          coupling = Math.max(coupling, Math.abs(turn.get(i, j)));
        }
      }
      if (coupling <= UNCOUPLED * n) {
        ends.add(split);
      }
    }
    return ends.stream().mapToInt(Integer::intValue).toArray();
  }

  private static boolean isResolved(int[] ends) {
    int start = 0;
    for (int end : ends) {
      if (end - start > 2) {
        return false;
      }
      start = end;
    }
    return true;
  }

  private void addBlock(int start, int end, List<Value> values) {
    int size = end - start;
    DMatrixRMaj product = CommonOps_DDRM.identity(size);
    double log = 0;
    for (DMatrixRMaj triangle : triangles) {
      DMatrixRMaj block = CommonOps_DDRM.extract(triangle, start, end, start, end);
      DMatrixRMaj longer = new DMatrixRMaj(size, size);
      CommonOps_DDRM.mult(block, product, longer);
      double largest = CommonOps_DDRM.elementMaxAbs(longer);
      if (largest > 0) {
        CommonOps_DDRM.divide(longer, largest);
        log += Math.log(largest);
      }
      product = longer;
    }
    DMatrixRMaj block = CommonOps_DDRM.extract(turn, start, end, start, end);
    DMatrixRMaj whole = new DMatrixRMaj(size, size);
    CommonOps_DDRM.mult(block, product, whole);
    EigenDecomposition_F64<DMatrixRMaj> eigen = DecompositionFactory_DDRM.eig(size, false);
    eigen.decompose(whole);
    for (int k = 0; k < size; k++) {
      Complex_F64 value = eigen.getEigenvalue(k);
      double modulus = Math.hypot(value.real, value.imaginary);
      double phase = Math.atan2(value.imaginary, value.real);
      values.add(new Value(log + Math.log(modulus), phase == -Math.PI ? Math.PI : phase));
    }
  }
}
