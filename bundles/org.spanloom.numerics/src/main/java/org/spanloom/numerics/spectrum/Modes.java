/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.spectrum;

import java.util.ArrayList;
import java.util.List;
import org.spanloom.numerics.Outcome;
import org.spanloom.numerics.Progress;
import org.spanloom.numerics.internal.algebra.ComplexLuFactors;
import org.spanloom.numerics.internal.work.Cancelled;
import org.spanloom.numerics.internal.work.Watch;
import org.spanloom.numerics.spectrum.Spectrum.Eigenvalue;

/**
 * The modes of a constant matrix: eigenvalues with right and left eigenvectors, found by inverse
 * iteration (Wilkinson, The Algebraic Eigenvalue Problem, 1965, chapter 9; from memory).
 *
 * @param modes one for each eigenvalue, by falling real part; of a conjugate pair both
 */
public record Modes(List<Mode> modes) {

  private static final double ROUNDING = 0x1p-52;

  /** Copies the list. */
  public Modes {
    modes = List.copyOf(modes);
  }

  /**
   * A mode.
   *
   * @param eigenvalue the eigenvalue
   * @param condition how many times a small change of the matrix, relative to its size, moves the
   *     eigenvalue: {@code 1/|y* v|} with unit left and right eigenvectors y and v, at least 1
   * @param error estimated error of the eigenvalue by rounding
   * @param shares share of each state in the mode, {@code |y_i v_i| / sum_k |y_k v_k|}
   *     (participation factor; common practice); does not depend on the units of the states
   */
  public record Mode(Eigenvalue eigenvalue, double condition, double error, double[] shares) {
    /** Copies the array. */
    public Mode {
      shares = shares.clone();
    }

    @Override
    public double[] shares() {
      return shares.clone();
    }

    /**
     * Tells whether the eigenvalue is so close to a multiple one without enough eigenvectors that
     * half of its digits are gone.
     */
    public boolean isNearlyDefective() {
      return condition > 1e7;
    }
  }

  /**
   * Computes them.
   *
   * @param a matrix, n by n, row by row, finite
   * @param scale n positive sizes of the states; conditions are those of the scaled matrix
   * @param progress watched and asked while working
   */
  public static Outcome<Modes> of(double[] a, double[] scale, Progress progress) {
    int n = scale.length;
    double[] scaled = new double[n * n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        scaled[i * n + j] = a[i * n + j] * scale[j] / scale[i];
      }
    }
    try {
      Watch watch = new Watch(progress);
      Spectrum spectrum = Spectrum.of(scaled, n);
      double norm = 0;
      for (double entry : scaled) {
        norm = Math.hypot(norm, entry);
      }
      List<Mode> modes = new ArrayList<>();
      for (Eigenvalue eigenvalue : spectrum.eigenvalues()) {
        modes.add(mode(scaled, n, norm, eigenvalue, watch));
        watch.worked(modes.size() / (double) n);
      }
      return new Outcome.Solved<>(new Modes(modes));
    } catch (Cancelled cancelled) {
      return new Outcome.Cancelled<>();
    }
  }

  private static Mode mode(double[] a, int n, double norm, Eigenvalue eigenvalue, Watch watch) {
    // A shift a few units in the last place off keeps the factors finite.
    double shift = 4 * n * ROUNDING * Math.max(norm, Double.MIN_NORMAL);
    Vector right = iterate(a, n, eigenvalue, shift, false, watch);
    Vector left = iterate(a, n, eigenvalue, shift, true, watch);
    double real = 0;
    double imaginary = 0;
    double[] shares = new double[n];
    double sum = 0;
    for (int i = 0; i < n; i++) {
      // y* v, the left vector conjugated.
      real += left.re[i][0] * right.re[i][0] + left.im[i][0] * right.im[i][0];
      imaginary += left.re[i][0] * right.im[i][0] - left.im[i][0] * right.re[i][0];
      shares[i] =
          Math.hypot(left.re[i][0], left.im[i][0]) * Math.hypot(right.re[i][0], right.im[i][0]);
      sum += shares[i];
    }
    for (int i = 0; i < n; i++) {
      shares[i] = sum > 0 ? shares[i] / sum : 0;
    }
    double angle = Math.max(Math.hypot(real, imaginary), 1e-17);
    double moved = n * ROUNDING * norm;
    double error = Math.min(moved / angle, Math.sqrt(moved * Math.max(norm, moved)));
    return new Mode(eigenvalue, Math.max(1, 1 / angle), error, shares);
  }

  /** A complex vector, real and imaginary parts as n rows of one entry. */
  private record Vector(double[][] re, double[][] im) {}

  private static Vector iterate(
      double[] a, int n, Eigenvalue eigenvalue, double shift, boolean transposed, Watch watch) {
    double[][] re = new double[n][n];
    double[][] im = new double[n][n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        re[i][j] = transposed ? a[j * n + i] : a[i * n + j];
      }
      re[i][i] -= eigenvalue.real() + shift;
      // The left vector belongs to the conjugate of the eigenvalue of the transposed matrix.
      im[i][i] = transposed ? eigenvalue.imaginary() : -eigenvalue.imaginary();
    }
    ComplexLuFactors factors = ComplexLuFactors.of(re, im, watch);
    double[][] x = new double[n][1];
    double[][] y = new double[n][1];
    for (int i = 0; i < n; i++) {
      // A start that is orthogonal to no eigenvector of a matrix that people write.
      x[i][0] = 1 + 0.37 * Math.cos(1 + 2.3 * i);
      y[i][0] = 0.21 * Math.sin(0.4 + 1.7 * i);
    }
    for (int step = 0; step < 3; step++) {
      double[][] before = {column(x), column(y)};
      factors.solve(x, y, 1, watch);
      if (!normalise(x, y)) {
        restore(before, x, y);
        break;
      }
    }
    normalise(x, y);
    return new Vector(x, y);
  }

  private static double[] column(double[][] rows) {
    double[] column = new double[rows.length];
    for (int i = 0; i < rows.length; i++) {
      column[i] = rows[i][0];
    }
    return column;
  }

  private static void restore(double[][] before, double[][] x, double[][] y) {
    for (int i = 0; i < x.length; i++) {
      x[i][0] = before[0][i];
      y[i][0] = before[1][i];
    }
  }

  /** Scales to length 1; false when an entry is not finite. */
  private static boolean normalise(double[][] x, double[][] y) {
    double largest = 0;
    for (int i = 0; i < x.length; i++) {
      largest = Math.max(largest, Math.max(Math.abs(x[i][0]), Math.abs(y[i][0])));
    }
    if (!(largest > 0) || Double.isInfinite(largest)) {
      return false;
    }
    double length = 0;
    for (int i = 0; i < x.length; i++) {
      x[i][0] /= largest;
      y[i][0] /= largest;
      length = Math.hypot(length, Math.hypot(x[i][0], y[i][0]));
    }
    for (int i = 0; i < x.length; i++) {
      x[i][0] /= length;
      y[i][0] /= length;
    }
    return Double.isFinite(length);
  }
}
