/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.collocation;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import org.ejml.data.Complex_F64;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.EigenDecomposition_F64;
import org.spanloom.numerics.internal.algebra.ComplexLuFactors;
import org.spanloom.numerics.internal.algebra.Rows;
import org.spanloom.numerics.internal.work.Watch;

/**
 * Eigenvalues and eigenvectors of D; of each conjugate pair the one with positive imaginary part.
 */
final class StageEigenvectors {

  /** An eigenvalue. */
  record Value(double real, double imaginary) {}

  private final List<Value> values;
  private final double[][] rightRe;
  private final double[][] rightIm;
  private final double[][] leftRe;
  private final double[][] leftIm;
  private final int stages;

  StageEigenvectors(double[][] derivative) {
    stages = derivative.length;
    values = eigenvalues(derivative);
    int count = values.size();
    rightRe = new double[count][];
    rightIm = new double[count][];
    for (int k = 0; k < count; k++) {
      double[][] v = eigenvector(derivative, values.get(k));
      rightRe[k] = v[0];
      rightIm[k] = v[1];
    }
    // The rows of the inverse of the matrix of all eigenvectors, conjugate ones included.
    double[][] re = new double[stages][stages];
    double[][] im = new double[stages][stages];
    int[] column = new int[count];
    int next = 0;
    for (int k = 0; k < count; k++) {
      column[k] = next;
      for (int i = 0; i < stages; i++) {
        re[i][next] = rightRe[k][i];
        im[i][next] = rightIm[k][i];
        if (values.get(k).imaginary() != 0) {
          re[i][next + 1] = rightRe[k][i];
          im[i][next + 1] = -rightIm[k][i];
        }
      }
      next += values.get(k).imaginary() != 0 ? 2 : 1;
    }
    double[][] inverseRe = Rows.identity(stages);
    double[][] inverseIm = new double[stages][stages];
    ComplexLuFactors.of(re, im, Watch.NONE).solve(inverseRe, inverseIm, stages, Watch.NONE);
    leftRe = new double[count][];
    leftIm = new double[count][];
    for (int k = 0; k < count; k++) {
      leftRe[k] = inverseRe[column[k]];
      leftIm[k] = inverseIm[column[k]];
    }
  }

  private static List<Value> eigenvalues(double[][] derivative) {
    int s = derivative.length;
    EigenDecomposition_F64<DMatrixRMaj> eigen = DecompositionFactory_DDRM.eig(s, false);
    eigen.decompose(new DMatrixRMaj(derivative));
    List<Value> values = new ArrayList<>();
    for (int i = 0; i < s; i++) {
      Complex_F64 value = eigen.getEigenvalue(i);
      if (value.getImaginary() >= 0) {
        values.add(new Value(value.getReal(), value.getImaginary()));
      }
    }
    values.sort(Comparator.comparingDouble(Value::imaginary));
    return values;
  }

  /** Inverse iteration: two solves with a matrix that is singular but for rounding. */
  private static double[][] eigenvector(double[][] derivative, Value value) {
    int s = derivative.length;
    double[][] re = new double[s][1];
    double[][] im = new double[s][1];
    for (int i = 0; i < s; i++) {
      re[i][0] = 1;
    }
    for (int pass = 0; pass < 3; pass++) {
      double[][] shifted = Rows.copy(derivative);
      double[][] imaginary = new double[s][s];
      for (int i = 0; i < s; i++) {
        shifted[i][i] -= value.real() * (1 + 1e-12);
        imaginary[i][i] = -value.imaginary();
      }
      ComplexLuFactors.of(shifted, imaginary, Watch.NONE).solve(re, im, 1, Watch.NONE);
      double largest = 0;
      for (int i = 0; i < s; i++) {
        largest = Math.max(largest, Math.hypot(re[i][0], im[i][0]));
      }
      for (int i = 0; i < s; i++) {
        re[i][0] /= largest;
        im[i][0] /= largest;
      }
    }
    double[][] vector = new double[2][s];
    for (int i = 0; i < s; i++) {
      vector[0][i] = re[i][0];
      vector[1][i] = value.imaginary() == 0 ? 0 : im[i][0];
    }
    return vector;
  }

  List<Value> values() {
    return values;
  }

  /** Writes the share of eigenvector k in stage values, n by m. */
  void intoVector(int k, double[][] stageValues, double[][] re, double[][] im) {
    int n = re.length;
    for (int i = 0; i < stages; i++) {
      for (int row = 0; row < n; row++) {
        double[] source = stageValues[i * n + row];
        Rows.addScaled(re[row], leftRe[k][i], source, 0, source.length);
        Rows.addScaled(im[row], leftIm[k][i], source, 0, source.length);
      }
    }
  }

  /** Adds what eigenvector k, and its conjugate, contribute to stage values. */
  void addBack(int k, double[][] re, double[][] im, double[][] stageValues) {
    int n = re.length;
    double twice = values.get(k).imaginary() == 0 ? 1 : 2;
    for (int i = 0; i < stages; i++) {
      for (int row = 0; row < n; row++) {
        double[] target = stageValues[i * n + row];
        Rows.addScaled(target, twice * rightRe[k][i], re[row], 0, target.length);
        Rows.addScaled(target, -twice * rightIm[k][i], im[row], 0, target.length);
      }
    }
  }
}
