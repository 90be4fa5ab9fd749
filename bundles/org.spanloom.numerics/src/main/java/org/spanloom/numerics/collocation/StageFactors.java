/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.collocation;

import java.util.Optional;
import org.spanloom.numerics.internal.algebra.BandLuFactors;
import org.spanloom.numerics.internal.algebra.LuFactors;
import org.spanloom.numerics.internal.algebra.Rows;
import org.spanloom.numerics.internal.work.Watch;

/**
 * The conditions of a step, {@code (D (x) I - h diag(A_i)) Z = R}, ready to be solved. Unknowns
 * stand stage by stage.
 */
sealed interface StageFactors {

  /**
   * How exactly Z is wanted.
   *
   * @param sizes sizes against which errors are measured, n by m; without rows, the largest value
   *     of the column counts
   * @param share share of the size that is allowed
   */
  record Precision(double[][] sizes, double share) {
    /** Errors need few digits. */
    static Precision ofErrors() {
      return new Precision(new double[0][], 0.02);
    }
  }

  /**
   * Solves.
   *
   * @param right R, s n by m; may be overwritten
   * @return Z, or empty when this way of solving does not work for this step
   */
  Optional<double[][]> solve(double[][] right, int m, Precision precision, Watch watch);

  /** Returns the same factors for other coefficients with the same matrices. */
  StageFactors with(StageCoefficients others);

  /** Chooses the cheapest way. */
  static StageFactors of(
      CollocationTableau tableau,
      StageCoefficients coefficients,
      double h,
      int columns,
      Watch watch) {
    double n = coefficients.dimension();
    double s = tableau.stages();
    double unknowns = n * s;
    double dense = 0.67 * unknowns * unknowns * unknowns + 2 * unknowns * unknowns * columns;
    double width = s * (coefficients.shape().band().bandwidth() + 1) - 1;
    double band = 4 * unknowns * width * width + 6 * unknowns * width * columns;
    double iterated =
        0.67 * n * n * n * (4 * s - 3) / 2 + 12 * columns * (n * n * (4 * s - 2) + 4 * s * s * n);
    if (band < 0.7 * Math.min(dense, iterated)) {
      return Band.of(tableau, coefficients, h, watch);
    }
    if (iterated < 0.5 * dense && coefficients.spread() < 0.35) {
      return new Iterated(
          coefficients, IteratedStages.of(tableau, coefficients, h, watch), tableau, h);
    }
    return Dense.of(tableau, coefficients, h, watch);
  }

  /** One full factorisation. */
  record Dense(LuFactors factors) implements StageFactors {
    static Dense of(
        CollocationTableau tableau, StageCoefficients coefficients, double h, Watch watch) {
      int n = coefficients.dimension();
      int s = tableau.stages();
      double[][] rows = new double[s * n][s * n];
      for (int i = 0; i < s; i++) {
        double[] a = coefficients.matrix(i);
        for (int row = 0; row < n; row++) {
          double[] out = rows[i * n + row];
          for (int column = 0; column < n; column++) {
            out[i * n + column] = -h * a[row * n + column];
          }
          for (int j = 0; j < s; j++) {
            out[j * n + row] += tableau.derivative(i, j);
          }
        }
      }
      return new Dense(LuFactors.of(rows, watch));
    }

    @Override
    public Optional<double[][]> solve(double[][] right, int m, Precision precision, Watch watch) {
      return Optional.of(factors.solve(right, m, watch));
    }

    @Override
    public StageFactors with(StageCoefficients others) {
      return this;
    }
  }

  /**
   * A factorisation within a band: the stages of a state stand together, the states in an order of
   * small bandwidth.
   */
  record Band(BandLuFactors factors, int[] place, int stages) implements StageFactors {
    static Band of(
        CollocationTableau tableau, StageCoefficients coefficients, double h, Watch watch) {
      int n = coefficients.dimension();
      int s = tableau.stages();
      StageCoefficients.Shape shape = coefficients.shape();
      int[] order = shape.band().order();
      int[] place = new int[n];
      for (int k = 0; k < n; k++) {
        place[order[k]] = k;
      }
      int width = s * (shape.band().bandwidth() + 1) - 1;
      double[][] band = new double[s * n][2 * width + 1];
      int[] rowStart = shape.rowStart();
      int[] columns = shape.columns();
      for (int row = 0; row < n; row++) {
        for (int i = 0; i < s; i++) {
          int at = place[row] * s + i;
          double[] out = band[at];
          for (int j = 0; j < s; j++) {
            out[j - i + width] = tableau.derivative(i, j);
          }
          for (int p = rowStart[row]; p < rowStart[row + 1]; p++) {
            int other = place[columns[p]] * s + i;
            out[other - at + width] -= h * coefficients.entry(i, row, columns[p]);
          }
        }
      }
      return new Band(BandLuFactors.of(band, width, width, watch), place, s);
    }

    @Override
    public Optional<double[][]> solve(double[][] right, int m, Precision precision, Watch watch) {
      int n = place.length;
      double[][] ordered = new double[right.length][];
      for (int i = 0; i < stages; i++) {
        for (int row = 0; row < n; row++) {
          ordered[place[row] * stages + i] = right[i * n + row];
        }
      }
      factors.solve(ordered, m, watch);
      double[][] z = new double[right.length][];
      for (int i = 0; i < stages; i++) {
        for (int row = 0; row < n; row++) {
          z[i * n + row] = ordered[place[row] * stages + i];
        }
      }
      return Optional.of(z);
    }

    @Override
    public StageFactors with(StageCoefficients others) {
      return this;
    }
  }

  /** Corrections by the factors for the mean matrix, until they are small. */
  record Iterated(
      StageCoefficients coefficients, IteratedStages mean, CollocationTableau tableau, double h)
      implements StageFactors {

    private static final int MOST = 40;

    @Override
    public Optional<double[][]> solve(double[][] right, int m, Precision precision, Watch watch) {
      double[][] z = new double[right.length][m];
      double[][] residual = Rows.copy(right);
      double before = Double.POSITIVE_INFINITY;
      for (int k = 0; k < MOST; k++) {
        double[][] correction = mean.solve(residual, m, watch);
        for (int i = 0; i < z.length; i++) {
          Rows.addScaled(z[i], 1, correction[i], 0, m);
        }
        double size = relative(correction, z, m, precision);
        if (size <= 1) {
          return Optional.of(z);
        }
        // Slow or no convergence: another way is cheaper.
        if (!(size < before * (k < 2 ? 2 : 0.7)) || !(size < Double.POSITIVE_INFINITY)) {
          return size < 1e3 && before < 1e3 ? Optional.of(z) : Optional.empty();
        }
        before = size;
        residual = residual(right, z, m);
      }
      return Optional.empty();
    }

    private double[][] residual(double[][] right, double[][] z, int m) {
      int n = coefficients.dimension();
      int s = tableau.stages();
      double[][] result = Rows.copy(right);
      for (int i = 0; i < s; i++) {
        double[][] zi = new double[n][];
        System.arraycopy(z, i * n, zi, 0, n);
        coefficients.addProduct(i, h, zi, result, i * n, m);
        for (int j = 0; j < s; j++) {
          double d = -tableau.derivative(i, j);
          for (int row = 0; row < n; row++) {
            Rows.addScaled(result[i * n + row], d, z[j * n + row], 0, m);
          }
        }
      }
      return result;
    }

    private double relative(double[][] correction, double[][] z, int m, Precision precision) {
      int n = coefficients.dimension();
      double worst = 0;
      for (int j = 0; j < m; j++) {
        double largest = 0;
        if (precision.sizes().length == 0) {
          for (double[] row : z) {
            largest = Math.max(largest, Math.abs(row[j]));
          }
        }
        for (int i = 0; i < z.length; i++) {
          double size = largest > 0 ? largest : 0;
          if (precision.sizes().length > 0) {
            size = precision.sizes()[i % n][j];
          }
          double off = Math.abs(correction[i][j]);
          if (off > 0) {
            worst = Math.max(worst, off / (precision.share() * size + 0x1p-52 * Math.abs(z[i][j])));
          } else if (Double.isNaN(off)) {
            return Double.NaN;
          }
        }
      }
      return worst;
    }

    @Override
    public StageFactors with(StageCoefficients others) {
      return new Iterated(others, mean, tableau, h);
    }
  }
}
