/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.basis;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Progress;
import org.spanloom.numerics.Solved;
import org.spanloom.numerics.TimeRange;

/** Candidates held against the equations of Euler's system, t^2 x'' - 2 t x' + 2 x = 0. */
class ClosedFormResidualTests {

  private static final LinearSystem EULER =
      TestBases.secondOrder(new TimeRange(0.1, 100), t -> -2 / (t * t), t -> 2 / t);

  /** Columns t and c t^power, each with its derivative as second component. */
  private record Powers(double power) implements CandidateBasis {
    @Override
    public int columns() {
      return 2;
    }

    @Override
    public void value(double t, double[] x) {
      x[0] = t;
      x[1] = Math.pow(t, power);
      x[2] = 1;
      x[3] = power * Math.pow(t, power - 1);
    }

    @Override
    public void derivative(double t, double[] dx) {
      dx[0] = 1;
      dx[1] = power * Math.pow(t, power - 1);
      dx[2] = 0;
      dx[3] = power * (power - 1) * Math.pow(t, power - 2);
    }
  }

  private static ClosedFormResidual[] residuals(CandidateBasis candidate) {
    return Solved.of(
        ClosedFormResidual.of(EULER, candidate, new TimeRange(0.5, 50), Progress.NONE));
  }

  @Test
  void trueSolutionsMissByRoundingOnly() {
    for (ClosedFormResidual residual : residuals(new Powers(2))) {
      assertTrue(residual.relative() < 1e-14, residual.toString());
    }
  }

  @Test
  void aWrongColumnIsNamedWithItsEquation() {
    ClosedFormResidual[] residuals = residuals(new Powers(3));
    assertTrue(residuals[0].relative() < 1e-14, residuals[0].toString());
    // x = t^3: x'' - 2 x'/t + 2 x / t^2 = 2 t beside terms of size 6 t, 6 t and 2 t.
    assertEquals(2 / 14.0, residuals[1].relative(), 1e-3);
    assertEquals(1, residuals[1].column());
    assertEquals(1, residuals[1].component());
  }

  @Test
  void aSlightlyWrongExponentShows() {
    double relative = residuals(new Powers(2 + 1e-7))[1].relative();
    assertTrue(relative > 1e-9 && relative < 1e-6, "residual " + relative);
  }

  @Test
  void aValueThatIsNoNumberIsInfinitelyWrong() {
    CandidateBasis broken =
        new CandidateBasis() {
          @Override
          public int columns() {
            return 1;
          }

          @Override
          public void value(double t, double[] x) {
            x[0] = Math.sqrt(t - 1);
            x[1] = 0;
          }

          @Override
          public void derivative(double t, double[] dx) {
            dx[0] = 0;
            dx[1] = 0;
          }
        };
    assertEquals(Double.POSITIVE_INFINITY, residuals(broken)[0].relative());
  }
}
