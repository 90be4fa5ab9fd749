/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.internal.algebra;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Random;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.spanloom.numerics.internal.work.Watch;

/** Our factorisations against EJML's, on random matrices. */
final class FactorisationsTests {

  private static double[][] random(Random random, int n, int m) {
    double[][] rows = new double[n][m];
    for (double[] row : rows) {
      for (int j = 0; j < m; j++) {
        row[j] = random.nextDouble(-1, 1);
      }
    }
    return rows;
  }

  private static double[][] reference(double[][] a, double[][] b) {
    DMatrixRMaj x = new DMatrixRMaj(b.length, b[0].length);
    assertTrue(CommonOps_DDRM.solve(new DMatrixRMaj(a), new DMatrixRMaj(b), x));
    return Rows.of(x.data, b.length, b[0].length);
  }

  private static void assertNear(double[][] expected, double[][] actual) {
    for (int i = 0; i < expected.length; i++) {
      assertArrayEquals(expected[i], actual[i], 1e-9);
    }
  }

  @ParameterizedTest
  @CsvSource({"1, 1", "2, 3", "7, 1", "16, 2", "17, 5", "40, 1", "63, 9"})
  void dense(int n, int m) {
    Random random = new Random(n);
    double[][] a = random(random, n, n);
    double[][] b = random(random, n, m);
    LuFactors factors = LuFactors.of(Rows.copy(a), Watch.NONE);
    assertNear(reference(a, b), factors.solve(b, m, Watch.NONE));
    double determinant = CommonOps_DDRM.det(new DMatrixRMaj(a));
    assertEquals(Math.log(Math.abs(determinant)), factors.logDeterminant(), 1e-9);
    assertEquals(Math.signum(determinant), factors.determinantSign());
  }

  @ParameterizedTest
  @CsvSource({"1, 0, 0, 1", "6, 1, 1, 2", "20, 2, 4, 3", "30, 5, 1, 1", "9, 8, 8, 2"})
  void band(int n, int lower, int upper, int m) {
    Random random = new Random(n + lower);
    double[][] a = new double[n][n];
    double[][] band = new double[n][lower + upper + 1];
    for (int i = 0; i < n; i++) {
      for (int j = Math.max(0, i - lower); j <= Math.min(n - 1, i + upper); j++) {
        a[i][j] = random.nextDouble(-1, 1);
        band[i][j - i + lower] = a[i][j];
      }
    }
    double[][] b = random(random, n, m);
    double[][] x = Rows.copy(b);
    BandLuFactors.of(band, lower, upper, Watch.NONE).solve(x, m, Watch.NONE);
    assertNear(reference(a, b), x);
  }

  /** (R + iI)(x + iy) = b + ic as a real system of twice the size. */
  @ParameterizedTest
  @CsvSource({"1, 1", "3, 2", "12, 1", "25, 4"})
  void complex(int n, int m) {
    Random random = new Random(n);
    double[][] re = random(random, n, n);
    double[][] im = random(random, n, n);
    double[][] b = random(random, 2 * n, m);
    double[][] a = new double[2 * n][2 * n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        a[i][j] = re[i][j];
        a[i][n + j] = -im[i][j];
        a[n + i][j] = im[i][j];
        a[n + i][n + j] = re[i][j];
      }
    }
    double[][] expected = reference(a, b);
    double[][] x = new double[n][];
    double[][] y = new double[n][];
    for (int i = 0; i < n; i++) {
      x[i] = b[i].clone();
      y[i] = b[n + i].clone();
    }
    ComplexLuFactors.of(re, im, Watch.NONE).solve(x, y, m, Watch.NONE);
    for (int i = 0; i < n; i++) {
      assertArrayEquals(expected[i], x[i], 1e-9);
      assertArrayEquals(expected[n + i], y[i], 1e-9);
    }
  }

  @ParameterizedTest
  @ValueSource(ints = {2, 20})
  void singularMatricesAreSeen(int n) {
    LuFactors factors = LuFactors.of(new double[n][n], Watch.NONE);
    assertTrue(factors.isSingular());
    assertEquals(0, factors.determinantSign());
    assertEquals(Double.NEGATIVE_INFINITY, factors.logDeterminant());
  }

  @Test
  void determinantsFarOutsideTheNumbers() {
    double[][] tiny = Rows.scaled(Rows.identity(500), 1e-3);
    LuFactors factors = LuFactors.of(tiny, Watch.NONE);
    assertEquals(500 * Math.log(1e-3), factors.logDeterminant(), 1e-9);
    assertEquals(1, factors.determinantSign());
  }
}
