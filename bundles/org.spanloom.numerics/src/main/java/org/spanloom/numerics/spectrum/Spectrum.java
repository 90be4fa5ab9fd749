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
import org.ejml.dense.row.SingularOps_DDRM;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.EigenDecomposition_F64;
import org.ejml.interfaces.decomposition.SingularValueDecomposition_F64;

/**
 * Eigenvalues of a real matrix with estimates of their errors.
 *
 * <p>A simple eigenvalue moves by about {@code |E| / |y* v|} under a perturbation E, y and v being
 * its left and right unit eigenvectors (Wilkinson 1965, chapter 2; from memory). Near a double
 * eigenvalue {@code |y* v|} goes to zero, and the square root of |E| bounds what rounding can do
 * there.
 */
public final class Spectrum {

  private static final double ROUNDING = 0x1p-52;

  private final double[] a;
  private final int n;
  private final List<Eigenvalue> eigenvalues;
  private final double norm;

  /**
   * An eigenvalue.
   *
   * @param real real part
   * @param imaginary imaginary part
   */
  public record Eigenvalue(double real, double imaginary) {
    /** Returns the distance from 0. */
    public double modulus() {
      return Math.hypot(real, imaginary);
    }
  }

  private Spectrum(double[] a, int n, List<Eigenvalue> eigenvalues) {
    this.a = a.clone();
    this.n = n;
    this.eigenvalues = List.copyOf(eigenvalues);
    double sum = 0;
    for (double entry : a) {
      sum = Math.hypot(sum, entry);
    }
    this.norm = sum;
  }

  /**
   * Computes eigenvalues.
   *
   * @param a matrix, n by n, row by row, finite
   * @param n its size
   */
  public static Spectrum of(double[] a, int n) {
    List<Eigenvalue> eigenvalues = new ArrayList<>();
    if (n > 0) {
      DMatrixRMaj matrix = new DMatrixRMaj(n, n);
      System.arraycopy(a, 0, matrix.data, 0, n * n);
      EigenDecomposition_F64<DMatrixRMaj> eigen = DecompositionFactory_DDRM.eig(n, false);
      eigen.decompose(matrix);
      for (int k = 0; k < n; k++) {
        Complex_F64 value = eigen.getEigenvalue(k);
        eigenvalues.add(new Eigenvalue(value.getReal(), value.getImaginary()));
      }
    }
    eigenvalues.sort(
        Comparator.comparingDouble((Eigenvalue e) -> -e.real())
            .thenComparingDouble(Eigenvalue::imaginary));
    return new Spectrum(a, n, eigenvalues);
  }

  /** Returns the eigenvalues by falling real part. */
  public List<Eigenvalue> eigenvalues() {
    return eigenvalues;
  }

  /** Returns the largest real part; minus infinity when n = 0. */
  public double abscissa() {
    return eigenvalues.isEmpty() ? Double.NEGATIVE_INFINITY : eigenvalues.getFirst().real();
  }

  /** Returns the largest modulus; 0 when n = 0. */
  public double radius() {
    return eigenvalues.stream().mapToDouble(Eigenvalue::modulus).max().orElse(0);
  }

  /** Returns an estimate of the error of {@link #abscissa()} by rounding. */
  public double abscissaError() {
    return eigenvalues.isEmpty() ? 0 : error(eigenvalues.getFirst(), 0);
  }

  /**
   * Returns an estimate of the error of {@link #radius()} when the entries of the matrix have
   * errors.
   *
   * @param errors absolute errors of the entries, n by n
   */
  public double radiusError(double[] errors) {
    double size = 0;
    for (double error : errors) {
      size = Math.hypot(size, error);
    }
    double perturbation = size;
    return eigenvalues.stream()
        .max(Comparator.comparingDouble(Eigenvalue::modulus))
        .map(e -> error(e, perturbation))
        .orElse(0.0);
  }

  private double error(Eigenvalue eigenvalue, double perturbation) {
    double moved = perturbation + n * ROUNDING * norm;
    double first = moved / Math.max(angle(eigenvalue), Double.MIN_NORMAL);
    return Math.min(first, Math.sqrt(moved * Math.max(norm, moved)));
  }

  /**
   * Returns |y* v|: v and y are the right and left singular vectors of {@code A - lambda I} for its
   * least singular value. A complex eigenvalue is handled by the real matrix {@code [[A - re, im],
   * [-im, A - re]]}.
   */
  private double angle(Eigenvalue eigenvalue) {
    int size = 2 * n;
    DMatrixRMaj shifted = new DMatrixRMaj(size, size);
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        double entry = a[i * n + j] - (i == j ? eigenvalue.real() : 0);
        shifted.set(i, j, entry);
        shifted.set(n + i, n + j, entry);
      }
      shifted.set(i, n + i, eigenvalue.imaginary());
      shifted.set(n + i, i, -eigenvalue.imaginary());
    }
    SingularValueDecomposition_F64<DMatrixRMaj> svd =
        DecompositionFactory_DDRM.svd(size, size, true, true, false);
    svd.decompose(shifted);
    DMatrixRMaj u = svd.getU(null, false);
    DMatrixRMaj v = svd.getV(null, false);
    DMatrixRMaj w = svd.getW(null);
    SingularOps_DDRM.descendingOrder(u, false, w, v, false);
    double real = 0;
    double imaginary = 0;
    for (int i = 0; i < n; i++) {
      double yr = u.get(i, size - 1);
      double yi = u.get(n + i, size - 1);
      double vr = v.get(i, size - 1);
      double vi = v.get(n + i, size - 1);
      real += yr * vr + yi * vi;
      imaginary += yr * vi - yi * vr;
    }
    return Math.hypot(real, imaginary);
  }
}
