/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.solution;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.spanloom.numerics.problem.Solved.accuracy;
import static org.spanloom.numerics.problem.Solved.at;
import static org.spanloom.numerics.problem.Solved.errorsAt;
import static org.spanloom.numerics.problem.Solved.identity;
import static org.spanloom.numerics.problem.Solved.not;
import static org.spanloom.numerics.problem.Solved.principal;
import static org.spanloom.numerics.problem.Solved.trajectory;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.spanloom.numerics.Outcome;
import org.spanloom.numerics.Outcome.Reason;
import org.spanloom.numerics.Progress;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.problem.FormulaSystem;
import org.spanloom.numerics.problem.SecondOrder;
import org.spanloom.numerics.problem.Solved;

/** Systems at the edge: each ends in a right number or in a reason. */
final class ExtremeSystemsTests {

  private static Outcome.Unsolved<Solution> refused(FormulaSystem system, double... x0) {
    return not(
        SolutionSolver.trajectory(
            system,
            system.range().start(),
            x0,
            system.range(),
            accuracy(x0.length, 1e-9),
            Progress.NONE));
  }

  @Test
  void noStates() {
    Solution x = principal(FormulaSystem.constant(new double[0], 0, 1), 1e-9);
    assertEquals(0, x.dimension());
    assertEquals(0, at(x, 0.5).length);
    assertArrayEquals(new double[] {0, 1}, x.nodes());
  }

  @Test
  void rangeOfLengthZero() {
    FormulaSystem system = SecondOrder.of(2, 2, t -> -t, t -> 0);
    Solution x = trajectory(system, 1e-9, 3, 4);
    assertArrayEquals(new double[] {3, 4}, at(x, 2));
    assertArrayEquals(new double[] {0, 0}, errorsAt(x, 2));
    assertArrayEquals(new double[] {2}, x.nodes());
  }

  @Test
  void nothingMoves() {
    double[] phi = at(principal(FormulaSystem.constant(new double[9], 0, 1e6), 1e-9), 1e6);
    assertArrayEquals(identity(3), phi);
    FormulaSystem varying =
        FormulaSystem.homogeneous(
            2,
            0,
            1e6,
            (t, a) -> {
              java.util.Arrays.fill(a, 0);
            });
    assertArrayEquals(identity(2), at(principal(varying, 1e-9), 1e6), 1e-15);
  }

  @Test
  void pureIntegration() {
    FormulaSystem system =
        FormulaSystem.forced(1, 0, 2, (t, a) -> a[0] = 0, (t, b) -> b[0] = 3 * t * t);
    assertEquals(8, at(trajectory(system, 1e-12, 0), 2)[0], 1e-12);
  }

  @Test
  void entriesNearTheLargestNumber() {
    Solution x = principal(FormulaSystem.constant(new double[] {-1e290}, 0, 1), 1e-9);
    assertEquals(0, at(x, 1)[0]);
    assertEquals(1, at(x, 0)[0]);
    Outcome.Unsolved<Solution> grown =
        refused(FormulaSystem.constant(new double[] {1e290}, 0, 1), 1);
    assertEquals(Reason.OVERFLOW, grown.reason());
    FormulaSystem fastest =
        FormulaSystem.constant(new double[] {-1e300, 1e300, 1, -1e300}, 0, 1e10);
    assertArrayEquals(new double[2], at(trajectory(fastest, 1e-9, 1, 1), 1e10), 1e-12);
  }

  /** e^(1000 t) passes 1.8e308 at t = 0.70978. */
  @Test
  void overflowIsLocated() {
    Outcome.Unsolved<Solution> constant =
        refused(FormulaSystem.constant(new double[] {1000}, 0, 5), 1);
    assertEquals(Reason.OVERFLOW, constant.reason());
    assertEquals(0.70978, constant.time(), 1e-4);
    FormulaSystem varying = FormulaSystem.homogeneous(1, 0, 5, (t, a) -> a[0] = 1000 + t);
    Outcome.Unsolved<Solution> found = refused(varying, 1);
    assertEquals(Reason.OVERFLOW, found.reason());
    assertEquals(0.7095, found.time(), 1e-2);
  }

  /** The part that decays can be followed although the other would overflow. */
  @Test
  void decayingPartOfAnOverflowingSystem() {
    FormulaSystem system = FormulaSystem.constant(new double[] {1000, 0, 0, -1}, 0, 5);
    assertEquals(Math.exp(-5), at(trajectory(system, 1e-9, 0, 1), 5)[1], 1e-16);
  }

  @ParameterizedTest
  @ValueSource(doubles = {Double.NaN, Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY})
  void coefficientsThatAreNoNumbers(double bad) {
    FormulaSystem constant = FormulaSystem.constant(new double[] {bad}, 0, 1);
    assertEquals(Reason.COEFFICIENT_NOT_FINITE, refused(constant, 1).reason());
    FormulaSystem varying =
        FormulaSystem.homogeneous(
            2,
            0,
            1,
            (t, a) -> {
              java.util.Arrays.fill(a, 0);
              a[3] = t > 0.5 ? bad : 1;
            });
    Outcome.Unsolved<Solution> found = refused(varying, 1, 1);
    assertEquals(Reason.COEFFICIENT_NOT_FINITE, found.reason());
    assertTrue(found.time() > 0.5);
    FormulaSystem forced = FormulaSystem.forced(1, 0, 1, (t, a) -> a[0] = -1, (t, b) -> b[0] = bad);
    assertEquals(Reason.COEFFICIENT_NOT_FINITE, refused(forced, 1).reason());
    assertEquals(
        Reason.COEFFICIENT_NOT_FINITE,
        refused(FormulaSystem.constant(new double[] {-1}, 0, 1), bad).reason());
  }

  /** A pole inside the range ends in a refusal near it, not in a hang: x' = x/(1 - t). */
  @Test
  void pole() {
    FormulaSystem system = FormulaSystem.homogeneous(1, 0, 2.2, (t, a) -> a[0] = 1 / (1 - t));
    Outcome.Unsolved<Solution> found = refused(system, 1);
    assertEquals(1, found.time(), 1e-6);
    assertFalse(found.detail().isBlank());
  }

  @Test
  void accuracyBeyondDoublePrecision() {
    Solution x = trajectory(SecondOrder.of(0, 10, t -> -1, t -> 0, Math::cos), 1e-30, 0, 0);
    double error = errorsAt(x, 10)[0];
    double off = Math.abs(at(x, 10)[0] - 5 * Math.sin(10));
    assertTrue(off <= error, "off by " + off + ", estimated " + error);
    assertTrue(error < 1e-11, "estimated " + error);
  }

  @Test
  void rangesThatDoNotFit() {
    FormulaSystem system = FormulaSystem.constant(new double[] {-1}, 0, 1);
    double[] one = {1};
    assertEquals(Reason.RANGE, range(system, 0, one, new TimeRange(0, 2)).reason());
    assertEquals(Reason.RANGE, range(system, 2, one, new TimeRange(0, 1)).reason());
    FormulaSystem forever = FormulaSystem.constant(one, 0, Double.POSITIVE_INFINITY);
    assertEquals(Reason.RANGE, range(forever, 0, one, forever.range()).reason());
  }

  private static Outcome.Unsolved<Solution> range(
      FormulaSystem system, double t0, double[] x0, TimeRange range) {
    return not(SolutionSolver.trajectory(system, t0, x0, range, accuracy(1, 1e-9), Progress.NONE));
  }

  @Test
  void hugeTimes() {
    FormulaSystem system =
        FormulaSystem.homogeneous(1, 1e12, 1e12 + 1, (t, a) -> a[0] = -1 + 1e-13 * (t - 1e12));
    Solution x =
        Solved.of(
            SolutionSolver.homogeneous(
                system, 1e12, new double[] {1}, system.range(), accuracy(1, 1e-3), Progress.NONE));
    assertEquals(Math.exp(-1), at(x, 1e12 + 1)[0], 1e-3);
  }

  @Test
  void fastDecayInAnUnforcedBasis() {
    FormulaSystem system =
        FormulaSystem.homogeneous(1, 0, 10, (t, a) -> a[0] = -1e6 * (1 + 0.5 * Math.sin(t)));
    assertEquals(0, at(principal(system, 1e-9), 10)[0], 1e-270);
  }
}
