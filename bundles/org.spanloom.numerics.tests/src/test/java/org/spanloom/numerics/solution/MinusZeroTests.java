/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.solution;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.spanloom.numerics.Jump;
import org.spanloom.numerics.JumpSelection;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Progress;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.problem.SecondOrder;
import org.spanloom.numerics.problem.Solved;

/** The times 0 and -0 are one time, at either end of a range and inside of it. */
final class MinusZeroTests {

  private static final double[] START = {0.5, -1};

  private static Solution solve(LinearSystem system, String method) {
    return Solved.of(
        SolutionSolver.trajectory(
            system,
            system.range().start(),
            START,
            system.range(),
            Solved.accuracy(2, 1e-8),
            MethodChoice.named(method),
            Progress.NONE));
  }

  private static LinearSystem swing(double from, double to) {
    return SecondOrder.of(from, to, t -> -(1 + 0.3 * Math.sin(t)), t -> -0.1);
  }

  private static void assertOneTime(Solution solution) {
    for (Side side : Side.values()) {
      double[] plus = new double[2];
      double[] minus = new double[2];
      solution.value(0.0, side, plus);
      solution.value(-0.0, side, minus);
      assertArrayEquals(plus, minus);
      solution.errorEstimate(0.0, side, plus);
      solution.errorEstimate(-0.0, side, minus);
      assertArrayEquals(plus, minus);
    }
  }

  @ParameterizedTest
  @ValueSource(strings = {"magnus6", "gauss10", "radau9"})
  void aSolutionHasOneValueThere(String method) {
    assertOneTime(solve(swing(0.0, 3), method));
    assertOneTime(solve(swing(-0.0, 3), method));
    assertOneTime(solve(swing(-1, 3), method));
    assertOneTime(solve(swing(-1, 0.0), method));
    assertOneTime(solve(swing(-1, -0.0), method));
  }

  @Test
  void aSolutionWithAJumpToo() {
    Jump kick = Jump.of(0.0, List.of(new Jump.Row(1, new int[] {1}, new double[] {1}, 2)));
    for (double from : new double[] {-1, 0.0}) {
      assertOneTime(solve(new JumpSelection(swing(from, 3), List.of(kick)), "gauss10"));
    }
  }

  @Test
  void aRangeKnowsNoMinusZero() {
    assertEquals(new TimeRange(0.0, 0.0), new TimeRange(-0.0, -0.0));
  }
}
