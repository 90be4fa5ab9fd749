/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.solution;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.spanloom.numerics.problem.Solved.at;

import java.util.Arrays;
import java.util.stream.DoubleStream;
import org.junit.jupiter.api.Test;
import org.spanloom.numerics.Progress;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.SparsityPattern;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.problem.FormulaSystem;
import org.spanloom.numerics.problem.SecondOrder;
import org.spanloom.numerics.problem.Solved;

/** Coefficients that jump, start values inside the range, and time running backwards. */
final class BreakpointsAndDirectionsTests {

  /** x' = -x until t = 1/3, then x' = 2 x until 2/3, then x' = 1. */
  private static FormulaSystem pieces() {
    double first = 1.0 / 3;
    double second = 2.0 / 3;
    FormulaSystem.Coefficients a =
        (t, side, entries) -> {
          boolean inFirst = t < first || (t == first && side == Side.BEFORE);
          boolean inSecond = t < second || (t == second && side == Side.BEFORE);
          entries[0] = inFirst ? -1 : inSecond ? 2 : 0;
        };
    FormulaSystem.Coefficients b =
        (t, side, entries) ->
            entries[0] = t > second || (t == second && side == Side.AFTER) ? 1 : 0;
    return new FormulaSystem(
        1,
        new TimeRange(0, 1),
        a,
        b,
        false,
        false,
        SparsityPattern.dense(1),
        new double[] {first, second});
  }

  private static double exact(double t) {
    double first = Math.min(t, 1.0 / 3);
    double second = Math.clamp(t, 1.0 / 3, 2.0 / 3) - 1.0 / 3;
    double third = Math.max(t, 2.0 / 3) - 2.0 / 3;
    return Math.exp(-first + 2 * second) + third;
  }

  @Test
  void stepsEndExactlyAtJumps() {
    Solution x = Solved.trajectory(pieces(), 1e-12, 1);
    double[] nodes = x.nodes();
    assertTrue(Arrays.binarySearch(nodes, 1.0 / 3) >= 0);
    assertTrue(Arrays.binarySearch(nodes, 2.0 / 3) >= 0);
    for (double t : new double[] {0, 0.1, 1.0 / 3, 0.5, 2.0 / 3, 0.9, 1}) {
      assertEquals(exact(t), at(x, t)[0], 1e-12);
    }
  }

  @Test
  void bothDirectionsFromTheMiddle() {
    Solution x =
        Solved.of(
            SolutionSolver.trajectory(
                pieces(),
                0.5,
                new double[] {exact(0.5)},
                new TimeRange(0, 1),
                Solved.accuracy(1, 1e-12),
                Progress.NONE));
    assertEquals(0.5, x.startTime());
    assertEquals(exact(0.5), at(x, 0.5)[0]);
    for (double t : new double[] {0, 0.2, 1.0 / 3, 2.0 / 3, 0.8, 1}) {
      assertEquals(exact(t), at(x, t)[0], 1e-12);
    }
  }

  @Test
  void forwardAndBackAgain() {
    FormulaSystem system = SecondOrder.of(0, 5, t -> -1 - 0.3 * Math.sin(3 * t), t -> -0.1);
    double[] end = at(Solved.trajectory(system, 1e-12, 1, 2), 5);
    Solution back =
        Solved.of(
            SolutionSolver.trajectory(
                system, 5, end, system.range(), Solved.accuracy(2, 1e-12), Progress.NONE));
    assertArrayEquals(new double[] {1, 2}, at(back, 0), 1e-11);
    assertEquals(5, back.startTime());
  }

  @Test
  void constantCoefficientsBackwards() {
    FormulaSystem system = FormulaSystem.constant(new double[] {0, 1, -4, -1}, 0, 3);
    double[] end = at(Solved.trajectory(system, 1e-12, 1, 0), 3);
    Solution back =
        Solved.of(
            SolutionSolver.trajectory(
                system, 3, end, system.range(), Solved.accuracy(2, 1e-12), Progress.NONE));
    assertEquals("matrix exponential", back.method());
    assertArrayEquals(new double[] {1, 0}, at(back, 0), 1e-13);
  }

  @Test
  void nodesAreIncreasingAndHoldBothEnds() {
    for (Solution x :
        new Solution[] {
          Solved.trajectory(pieces(), 1e-9, 1),
          Solved.principal(FormulaSystem.constant(new double[] {-3}, -1, 4), 1e-9)
        }) {
      double[] nodes = x.nodes();
      assertEquals(x.range().start(), nodes[0]);
      assertEquals(x.range().end(), nodes[nodes.length - 1]);
      assertArrayEquals(DoubleStream.of(nodes).sorted().distinct().toArray(), nodes);
    }
  }

  @Test
  void manyBreakpoints() {
    double[] times = new double[2000];
    Arrays.setAll(times, k -> (k + 1) / 2001.0);
    FormulaSystem system =
        FormulaSystem.homogeneous(1, 0, 1, (t, a) -> a[0] = Math.cos(t)).withBreakpoints(times);
    double[] end = at(Solved.principal(system, 1e-10), 1);
    assertEquals(Math.exp(Math.sin(1)), end[0], 1e-10);
  }
}
