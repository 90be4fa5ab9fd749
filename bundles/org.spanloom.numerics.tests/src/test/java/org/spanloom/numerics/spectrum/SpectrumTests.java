/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.spectrum;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.spanloom.numerics.spectrum.Spectrum.Eigenvalue;

/** Eigenvalues with known values, and whether the doubtful ones are known to be so. */
class SpectrumTests {

  /** LeVeque, Finite Difference Methods, 2007, eq. 2.23; from memory, recomputed. */
  @Test
  void heatEquationOnNinePoints() {
    int n = 9;
    double[] a = new double[n * n];
    for (int i = 0; i < n; i++) {
      a[i * n + i] = -200;
      if (i > 0) {
        a[i * n + i - 1] = 100;
        a[(i - 1) * n + i] = 100;
      }
    }
    Spectrum spectrum = Spectrum.of(a, n);
    assertEquals(-9.78869674096928557671213332412, spectrum.abscissa(), 1e-11);
    assertEquals(-390.211303259030714423287866676, spectrum.eigenvalues().getLast().real(), 1e-11);
    assertEquals(390.211303259030714423287866676, spectrum.radius(), 1e-11);
    assertTrue(spectrum.abscissaError() < 1e-11, "error " + spectrum.abscissaError());
  }

  /** Gibaldi and Perrier, Pharmacokinetics, 2nd ed. 1982: alpha of two compartments. */
  @Test
  void twoCompartments() {
    Spectrum spectrum = Spectrum.of(new double[] {-0.7, 0.3, 0.5, -0.3}, 2);
    assertEquals(-0.935889894354067355223698198386, spectrum.eigenvalues().getLast().real(), 1e-15);
    assertEquals(-0.06 / 0.935889894354067355223698198386, spectrum.abscissa(), 1e-15);
  }

  /**
   * Ward's first test (SIAM J. Numer. Anal. 14 (1977) 600), eigenvalues 3, 3, 6: 3 is defective.
   */
  @Test
  void aDefectiveEigenvalueIsFlaggedByItsError() {
    double[] negative = {-4, -2, 0, -1, -4, -1, -1, -1, -4};
    Spectrum spectrum = Spectrum.of(negative, 3);
    double error = Math.abs(spectrum.abscissa() + 3);
    assertTrue(error <= spectrum.abscissaError(), error + " > " + spectrum.abscissaError());
    assertTrue(spectrum.abscissaError() > 1e-9, "an error of " + spectrum.abscissaError());
    assertEquals(6, spectrum.radius(), 1e-13);
    Spectrum simple = Spectrum.of(new double[] {4, 2, 0, 1, 4, 1, 1, 1, 4}, 3);
    assertEquals(6, simple.abscissa(), 1e-13);
    assertTrue(simple.abscissaError() < 1e-13, "6 is simple: " + simple.abscissaError());
  }

  @Test
  void complexPairsComeInOrder() {
    Spectrum spectrum = Spectrum.of(new double[] {-1, 5, 0, -5, -1, 0, 0, 0, -3}, 3);
    Eigenvalue first = spectrum.eigenvalues().getFirst();
    assertEquals(-1, first.real(), 1e-14);
    assertEquals(-5, first.imaginary(), 1e-14);
    assertEquals(Math.sqrt(26), spectrum.radius(), 1e-14);
    assertEquals(5, spectrum.eigenvalues().get(1).imaginary(), 1e-14);
  }

  @Test
  void errorsOfEntriesMoveTheRadius() {
    double[] a = {2, 0, 0, 1};
    double admitted = Spectrum.of(a, 2).radiusError(new double[] {1e-6, 0, 0, 0});
    double moved = Spectrum.of(new double[] {2 + 1e-6, 0, 0, 1}, 2).radius() - 2;
    assertTrue(admitted >= moved && admitted < 1.1e-6, moved + " against " + admitted);
  }

  @Test
  void noStatesHaveNoEigenvalues() {
    Spectrum spectrum = Spectrum.of(new double[0], 0);
    assertEquals(Double.NEGATIVE_INFINITY, spectrum.abscissa());
    assertEquals(0, spectrum.radius());
  }
}
