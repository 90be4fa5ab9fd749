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

import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.spanloom.numerics.Jump;
import org.spanloom.numerics.JumpSelection;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Outcome;
import org.spanloom.numerics.Progress;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.basis.ConditionProfile;
import org.spanloom.numerics.basis.ConditionSample;
import org.spanloom.numerics.basis.Windows;
import org.spanloom.numerics.problem.FormulaSystem;
import org.spanloom.numerics.problem.Solved;

class JumpsTests {

  private static final double RATE = 0.2;
  private static final double PAUSE = 8;
  private static final double DOSE = 250;

  /** {@code x_row becomes sum factors_j x_j + shift}. */
  private static Jump.Row row(int row, double shift, double... factors) {
    int[] columns = new int[factors.length];
    for (int j = 0; j < columns.length; j++) {
      columns[j] = j;
    }
    return new Jump.Row(row, columns, factors, shift);
  }

  private static LinearSystem with(LinearSystem smooth, Jump... jumps) {
    return new JumpSelection(smooth, List.of(jumps));
  }

  private static LinearSystem doses(LinearSystem smooth, int count) {
    List<Jump> jumps = new ArrayList<>();
    Jump first = Jump.of(0, List.of(row(0, DOSE, 1)));
    for (int k = 0; k < count; k++) {
      jumps.add(first.at(k * PAUSE));
    }
    return new JumpSelection(smooth, jumps);
  }

  private static FormulaSystem decay(int count) {
    return FormulaSystem.constant(new double[] {-RATE}, 0, count * PAUSE);
  }

  private static double[] before(Solution solution, double t) {
    double[] x = new double[solution.dimension() * solution.columns()];
    solution.value(t, Side.BEFORE, x);
    return x;
  }

  /**
   * Just after dose N: {@code D (1 - q^N)/(1 - q)} with {@code q = e^(-k tau)} (Gibaldi and
   * Perrier, Pharmacokinetics, 2nd ed. 1982, chapter 3; from memory).
   */
  private static double peak(int doses) {
    double q = Math.exp(-RATE * PAUSE);
    return DOSE * (1 - Math.pow(q, doses)) / (1 - q);
  }

  private static void assertPeaks(Solution solution, int count, double relative) {
    for (int k = 0; k < count; k++) {
      double t = k * PAUSE;
      double value = Solved.at(solution, t)[0];
      double error = Solved.errorsAt(solution, t)[0];
      assertEquals(peak(k + 1), value, relative * value, "peak " + k);
      assertTrue(Math.abs(value - peak(k + 1)) <= error + Math.ulp(value), "estimate at peak " + k);
      assertTrue(error <= relative * value, "accuracy at peak " + k + ": " + error / value);
      assertEquals(peak(k + 1) - DOSE, before(solution, t)[0], relative * value, "trough " + k);
    }
  }

  @Test
  void repeatedDosesFollowTheClosedForm() {
    Solution solution = Solved.trajectory(doses(decay(300), 300), 1e-8, 0);
    assertEquals("matrix exponential", solution.method());
    assertEquals(300, solution.jumpTimes().length);
    assertPeaks(solution, 300, 1e-13);
  }

  @Test
  void everyMethodStopsAtJumps() {
    Solution solution = Solved.trajectory(doses(decay(40).asVarying(), 40), 1e-9, 0);
    assertFalse(solution.method().startsWith("matrix"));
    assertPeaks(solution, 40, 1e-9);
  }

  @Test
  void tensOfThousandsOfJumpsAreOneSolution() {
    int count = 40_000;
    Solution solution = Solved.trajectory(doses(decay(count), count), 1e-8, 0);
    assertEquals(peak(count), Solved.at(solution, (count - 1) * PAUSE)[0], 1e-11 * peak(count));
  }

  /** What decays beyond the smallest floating point number is followed down to 0. */
  @Test
  void aBasisMayDieOutAcrossJumps() {
    LinearSystem system = doses(FormulaSystem.constant(new double[] {-1}, 0, 1000 * PAUSE), 1000);
    Solution basis = Solved.principal(system, 1e-8);
    assertEquals(Math.exp(-9 * PAUSE), Solved.at(basis, 9 * PAUSE)[0], 1e-44);
    assertEquals(0, Solved.at(basis, 999 * PAUSE)[0]);
    assertEquals(0, Solved.errorsAt(basis, 999 * PAUSE)[0], 1e-300);
  }

  private static final double[] SPRING = {0, 1, -9, -0.3};
  private static final double[] LOAD = {0, 2};

  private static LinearSystem hammered() {
    FormulaSystem spring = FormulaSystem.constant(SPRING, LOAD, 0, 10);
    return with(
        spring,
        Jump.of(2, List.of(row(0, 0.1, 0.5, 0.25), row(1, 0, 0, -0.8))),
        Jump.of(2, List.of(row(1, 1, 1, 1))),
        Jump.of(7, List.of(row(0, 0, 0, 1))));
  }

  private static double[] piece(double from, double to, double... x0) {
    LinearSystem spring = FormulaSystem.constant(SPRING, LOAD, 0, 10);
    return Solved.at(
        Solved.of(
            SolutionSolver.trajectory(
                spring,
                from,
                x0,
                new TimeRange(from, to),
                Solved.accuracy(2, 1e-12),
                Progress.NONE)),
        to);
  }

  @Test
  void piecesChainedByHandGiveTheSame() {
    Solution solution = Solved.trajectory(hammered(), 1e-10, 1, 0);
    double[] x = piece(0, 2, 1, 0);
    assertArrayEquals(x, before(solution, 2), 1e-13);
    double first = 0.1 + 0.5 * x[0] + 0.25 * x[1];
    double second = -0.8 * x[1];
    x = new double[] {first, 1 + first + second};
    assertArrayEquals(x, Solved.at(solution, 2), 1e-13);
    x = piece(2, 7, x);
    assertArrayEquals(x, before(solution, 7), 1e-13);
    x = new double[] {x[1], x[1]};
    assertArrayEquals(x, Solved.at(solution, 7), 1e-13);
    assertArrayEquals(piece(7, 10, x), Solved.at(solution, 10), 1e-13);
    assertArrayEquals(new double[] {2, 7}, solution.jumpTimes());
  }

  @Test
  void theStartStandsJustBeforeAJumpThere() {
    LinearSystem system =
        with(decay(1), Jump.of(0, List.of(row(0, 5, 2))), Jump.of(8, List.of(row(0, 1, 1))));
    Solution solution = Solved.trajectory(system, 1e-8, 3);
    assertEquals(3, before(solution, 0)[0]);
    assertEquals(11, Solved.at(solution, 0)[0]);
    double end = 11 * Math.exp(-1.6);
    assertEquals(end, before(solution, 8)[0], 1e-14);
    assertEquals(end + 1, Solved.at(solution, 8)[0], 1e-14);
  }

  @Test
  void aRangeOfLengthZeroCanHoldAJump() {
    LinearSystem system = with(decay(1), Jump.of(0, List.of(row(0, 5, 2))));
    Solution solution =
        Solved.of(
            SolutionSolver.trajectory(
                system,
                0,
                new double[] {3},
                new TimeRange(0, 0),
                Solved.accuracy(1, 1e-8),
                Progress.NONE));
    assertEquals(3, before(solution, 0)[0]);
    assertEquals(11, Solved.at(solution, 0)[0]);
  }

  private static Outcome<Solution> from(double t0, LinearSystem system, double... x0) {
    return SolutionSolver.trajectory(
        system, t0, x0, new TimeRange(0, 10), Solved.accuracy(2, 1e-10), Progress.NONE);
  }

  @Test
  void jumpsAreUndoneBackwards() {
    FormulaSystem spring = FormulaSystem.constant(SPRING, LOAD, 0, 10);
    LinearSystem system =
        with(
            spring,
            Jump.of(0, List.of(row(0, 0.5, 1))),
            Jump.of(4, List.of(row(0, 0.1, 0.5, 0.25), row(1, 0, 0, -0.8))),
            Jump.of(8, List.of(row(1, 3, 0.5, 1))));
    Solution forwards = Solved.of(from(0, system, 1, 0));
    Solution backwards = Solved.of(from(10, system, Solved.at(forwards, 10)));
    Solution middle = Solved.of(from(5, system, Solved.at(forwards, 5)));
    for (double t : new double[] {0, 1, 4, 6, 8, 9, 10}) {
      for (Solution other : List.of(backwards, middle)) {
        double[] error = new double[2];
        for (Side side : Side.values()) {
          double[] expected = new double[2];
          double[] found = new double[2];
          forwards.value(t, side, expected);
          other.value(t, side, found);
          other.errorEstimate(t, side, error);
          assertArrayEquals(expected, found, 1e-11, "at " + t + " " + side);
          assertTrue(Math.abs(expected[0] - found[0]) <= error[0] + 1e-15, "estimate at " + t);
        }
      }
    }
  }

  @Test
  void aJumpThatCannotBeUndoneIsNamed() {
    LinearSystem system =
        with(
            FormulaSystem.constant(SPRING, LOAD, 0, 10),
            Jump.of(4, List.of(row(0, 1, 0.5, 1), row(1, 0, 1, 2))));
    Outcome.Unsolved<Solution> unsolved = Solved.not(from(10, system, 1, 0));
    assertEquals(Outcome.Reason.JUMP_SINGULAR, unsolved.reason());
    assertEquals(4, unsolved.time());
    Solved.of(from(0, system, 1, 0));
  }

  @Test
  void determinantsFollowLiouvilleAcrossJumps() {
    LinearSystem system =
        with(
            FormulaSystem.constant(SPRING, 0, 10),
            Jump.of(3, List.of(row(0, 7, 0.5, 0.25), row(1, 0, 0, -0.8))));
    Solution basis = Solved.principal(system, 1e-10);
    ConditionProfile profile =
        Solved.of(ConditionProfile.of(system, basis, system.range(), Progress.NONE));
    for (ConditionSample sample : profile.samples()) {
      assertEquals(0, sample.liouvilleMismatch(), 1e-11, "at " + sample.time());
    }
    ConditionSample last = profile.samples().getLast();
    assertEquals(Math.log(0.4) - 3, last.logDeterminant(), 1e-11);
    long twice = profile.samples().stream().filter(s -> s.time() == 3).count();
    assertEquals(2, twice);
  }

  @Test
  void aBasisIsSingularBehindASingularJump() {
    LinearSystem system =
        with(FormulaSystem.constant(SPRING, 0, 10), Jump.of(4, List.of(row(0, 0))));
    Solution basis = Solved.principal(system, 1e-10);
    ConditionProfile profile =
        Solved.of(ConditionProfile.of(system, basis, system.range(), Progress.NONE));
    for (ConditionSample sample : profile.samples()) {
      boolean first = sample.time() == 4 && !sample.beyondResolution();
      assertEquals(sample.time() >= 4 && !first, sample.beyondResolution(), "at " + sample.time());
    }
  }

  @Test
  void windowsEndBeforeAJumpThatShrinksADirection() {
    LinearSystem smooth = FormulaSystem.constant(new double[] {-1, 0, 0, -1}, 0, 10);
    LinearSystem system = with(smooth, Jump.of(5, List.of(row(0, 0, 1e-3))));
    assertEquals(1, windows(smooth, 100));
    assertEquals(1, windows(system, 2e3));
  }

  private static int windows(LinearSystem system, double limit) {
    return Solved.of(
        Windows.count(system, system.range(), Solved.accuracy(2, 1e-10), limit, Progress.NONE));
  }

  @Test
  void jumpsKnowWhetherTheyCanBeUndone() {
    assertFalse(Jump.of(0, List.of(row(0, 250, 1))).isSingular());
    assertFalse(Jump.of(0, List.of(row(0, 0, 1e-200))).isSingular());
    assertEquals(Math.log(1e-200), Jump.of(0, List.of(row(0, 0, 1e-200))).logDeterminant(), 1e-9);
    assertTrue(Jump.of(0, List.of(row(0, 5))).isSingular());
    // A component that becomes another one, which stays.
    assertTrue(Jump.of(0, List.of(row(0, 0, 0, 1))).isSingular());
    // Two that change places.
    Jump swap = Jump.of(0, List.of(row(0, 0, 0, 1), row(1, 0, 1)));
    assertFalse(swap.isSingular());
    assertEquals(0, swap.logDeterminant());
    assertArrayEquals(new double[] {4, 3}, swap.after(new double[] {3, 4}, 1, true));
    assertArrayEquals(new double[] {4, 3}, swap.before(new double[] {3, 4}, 1, true));
    double third = 1.0 / 3;
    assertTrue(
        Jump.of(
                0,
                List.of(
                    row(0, 0, third, third, third),
                    row(1, 0, third, third, third),
                    row(2, 0, third, third, third)))
            .isSingular());
  }
}
