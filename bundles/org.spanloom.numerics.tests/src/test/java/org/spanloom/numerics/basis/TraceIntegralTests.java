/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.basis;

import static org.junit.jupiter.api.Assertions.assertEquals;

import org.junit.jupiter.api.Test;
import org.spanloom.numerics.FormulaSystem;
import org.spanloom.numerics.Progress;
import org.spanloom.numerics.internal.work.Watch;

/** The exponent of Liouville's formula. */
class TraceIntegralTests {

  @Test
  void integratesAPeakedTrace() {
    // The Lorentz peak 1e-3 / (t^2 + 1e-6) has the integral atan(1000 t).
    TraceIntegral integral =
        new TraceIntegral(
            FormulaSystem.varying(
                1, FormulaSystem.ALWAYS, (t, side, a) -> a[0] = 1e-3 / (t * t + 1e-6)),
            new double[] {-1, 0.2, 1},
            -1,
            new Watch(Progress.NONE));
    for (double t : new double[] {-1, -0.5, 0, 0.2, 0.7, 1}) {
      assertEquals(Math.atan(1000 * t) - Math.atan(-1000), integral.at(t), 1e-9, "at " + t);
    }
  }

  @Test
  void isZeroAtAStartInTheMiddle() {
    TraceIntegral integral =
        new TraceIntegral(
            FormulaSystem.varying(
                2,
                FormulaSystem.ALWAYS,
                (t, side, a) -> {
                  a[0] = Math.cos(t);
                  a[1] = 7;
                  a[2] = 7;
                  a[3] = 1;
                }),
            new double[] {0, 2, 4},
            1,
            new Watch(Progress.NONE));
    assertEquals(0, integral.at(1), 1e-14);
    assertEquals(Math.sin(4) - Math.sin(1) + 3, integral.at(4), 1e-13);
    assertEquals(-Math.sin(1) - 1, integral.at(0), 1e-13);
  }

  @Test
  void isExactForConstantCoefficients() {
    TraceIntegral integral =
        new TraceIntegral(
            FormulaSystem.constant(2, -3, 1, 1, 1),
            new double[] {0, 100},
            0,
            new Watch(Progress.NONE));
    assertEquals(-200, integral.at(100));
    assertEquals(-90, integral.at(45), 1e-13);
  }
}
