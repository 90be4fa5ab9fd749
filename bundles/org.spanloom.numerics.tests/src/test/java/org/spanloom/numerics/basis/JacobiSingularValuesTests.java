/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.basis;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.hipparchus.linear.Array2DRowRealMatrix;
import org.hipparchus.linear.SingularValueDecomposition;
import org.junit.jupiter.api.Test;
import org.spanloom.numerics.Lcg31;
import org.spanloom.numerics.Progress;
import org.spanloom.numerics.internal.work.Watch;

/** Singular values by rotations, against exact ones and another library. */
class JacobiSingularValuesTests {

  private static double[] values(double[] x, int n, int m) {
    return JacobiSingularValues.of(x, n, m, new Watch(Progress.NONE));
  }

  /** The Golub-Kahan example [[3,0],[4,5]]: squares 45 and 5. */
  @Test
  void twoByTwo() {
    assertArrayEquals(
        new double[] {Math.sqrt(45), Math.sqrt(5)}, values(new double[] {3, 0, 4, 5}, 2, 2), 1e-14);
  }

  @Test
  void agreesWithAnotherLibrary() {
    int n = 12;
    int m = 7;
    double[] x = new Lcg31(5).symmetric(n * m);
    double[][] rows = new double[n][m];
    for (int k = 0; k < n * m; k++) {
      rows[k / m][k % m] = x[k];
    }
    double[] other =
        new SingularValueDecomposition(new Array2DRowRealMatrix(rows)).getSingularValues();
    assertArrayEquals(other, values(x, n, m), 1e-13);
  }

  /** Scaled columns leave the small values as accurate as the large ones (Demmel, Veselic 1992). */
  @Test
  void smallValuesOfScaledColumnsAreRelativelyAccurate() {
    double[] x = {1, 1e-150, 0.5, -2e-150};
    double[] values = values(x, 2, 2);
    // Column norms sqrt(1.25), sqrt(5) 1e-150, orthogonal to each other.
    assertEquals(Math.sqrt(1.25), values[0], 1e-15 * values[0]);
    x[3] = -1e-150;
    values = values(x, 2, 2);
    // The determinant, -1.5e-150, is the product of the two.
    assertEquals(1.5e-150, values[0] * values[1], 1e-164);
  }

  @Test
  void dependentColumnsGiveAZero() {
    double[] values = values(new double[] {1, 2, 2, 4, 3, 6}, 3, 2);
    assertEquals(Math.sqrt(70), values[0], 1e-14);
    assertTrue(values[1] < 1e-15, "smallest " + values[1]);
  }

  @Test
  void normsNeitherOverflowNorUnderflow() {
    assertEquals(5e300, JacobiSingularValues.norm(new double[] {3e300, 4e300}), 1e286);
    assertEquals(5e-300, JacobiSingularValues.norm(new double[] {3e-300, 4e-300}), 1e-314);
    assertEquals(0, JacobiSingularValues.norm(new double[3]));
  }
}
