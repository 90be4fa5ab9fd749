/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.collocation;

import java.util.ArrayList;
import java.util.List;
import org.spanloom.numerics.internal.algebra.ComplexLuFactors;
import org.spanloom.numerics.internal.algebra.LuFactors;
import org.spanloom.numerics.internal.work.Watch;

/**
 * The conditions of a step as they would be for a matrix that does not change during the step. In
 * the eigenvectors of D they fall apart into s systems of n unknowns, {@code (lambda_k I - h A) W_k
 * = R_k}, real or in conjugate pairs (Butcher 1976, BIT 16, 237; Bickart 1977, SIAM J. Numer. Anal.
 * 14, 1022; from memory).
 */
final class IteratedStages {

  private final StageEigenvectors vectors;
  private final List<LuFactors> real;
  private final List<ComplexLuFactors> pairs;
  private final int n;

  private IteratedStages(
      StageEigenvectors vectors, List<LuFactors> real, List<ComplexLuFactors> pairs, int n) {
    this.vectors = vectors;
    this.real = real;
    this.pairs = pairs;
    this.n = n;
  }

  /** Factors the systems for the mean of the matrices of a step. */
  static IteratedStages of(
      CollocationTableau tableau, StageCoefficients coefficients, double h, Watch watch) {
    int n = coefficients.dimension();
    double[] mean = coefficients.mean();
    StageEigenvectors vectors = tableau.eigenvectors();
    List<LuFactors> real = new ArrayList<>();
    List<ComplexLuFactors> pairs = new ArrayList<>();
    for (StageEigenvectors.Value value : vectors.values()) {
      double[][] re = new double[n][n];
      for (int i = 0; i < n; i++) {
        for (int j = 0; j < n; j++) {
          re[i][j] = -h * mean[i * n + j];
        }
        re[i][i] += value.real();
      }
      if (value.imaginary() == 0) {
        real.add(LuFactors.of(re, watch));
      } else {
        double[][] im = new double[n][n];
        for (int i = 0; i < n; i++) {
          im[i][i] = value.imaginary();
        }
        pairs.add(ComplexLuFactors.of(re, im, watch));
      }
    }
    return new IteratedStages(vectors, real, pairs, n);
  }

  /** Returns Z for right sides, s n by m. */
  double[][] solve(double[][] right, int m, Watch watch) {
    double[][] z = new double[right.length][m];
    int realCount = 0;
    int pairCount = 0;
    for (int k = 0; k < vectors.values().size(); k++) {
      boolean isReal = vectors.values().get(k).imaginary() == 0;
      double[][] re = new double[n][m];
      double[][] im = new double[n][m];
      vectors.intoVector(k, right, re, im);
      if (isReal) {
        re = real.get(realCount++).solve(re, m, watch);
      } else {
        pairs.get(pairCount++).solve(re, im, m, watch);
      }
      vectors.addBack(k, re, im, z);
    }
    return z;
  }
}
