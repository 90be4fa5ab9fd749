/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.boundary;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.function.DoubleUnaryOperator;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.spanloom.numerics.Accuracy;
import org.spanloom.numerics.Jump;
import org.spanloom.numerics.JumpSelection;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Outcome;
import org.spanloom.numerics.Progress;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.SparsityPattern;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.boundary.BoundaryAnswer.Family;
import org.spanloom.numerics.boundary.BoundaryAnswer.None;
import org.spanloom.numerics.boundary.BoundaryAnswer.Unique;
import org.spanloom.numerics.problem.FormulaSystem;
import org.spanloom.numerics.problem.SecondOrder;
import org.spanloom.numerics.problem.Solved;
import org.spanloom.numerics.solution.Solution;

/** Boundary-value problems with published values or closed forms. */
final class BoundarySolverTests {

  private static final double PI = Math.PI;

  /**
   * A two-point problem of second order with x given at both ends.
   *
   * @param exact the solution
   */
  private record Case(
      String source,
      double start,
      double end,
      DoubleUnaryOperator p,
      DoubleUnaryOperator q,
      DoubleUnaryOperator f,
      DoubleUnaryOperator exact) {
    @Override
    public String toString() {
      return source;
    }

    LinearSystem system() {
      return SecondOrder.of(start, end, p, q, f);
    }
  }

  /**
   * Test set for boundary-value problems of Cash and Mazzia (Mazzia &amp; Cash, AIP Conference
   * Proceedings 1648, 2015, 020009); numbers of its problems, formulas from memory and checked
   * against the equations.
   */
  static Stream<Case> publishedProblems() {
    double e1 = 0.01;
    double e2 = 0.05;
    double e3 = 0.1;
    double root = Math.sqrt(e1);
    double e16 = 1.0 / 7;
    double e17 = 0.001;
    return Stream.of(
        new Case(
            "problem 1",
            0,
            1,
            t -> 1 / e1,
            t -> 0,
            t -> 0,
            t -> (Math.exp(-t / root) - Math.exp((t - 2) / root)) / (1 - Math.exp(-2 / root))),
        new Case(
            "problem 2",
            0,
            1,
            t -> 0,
            t -> 1 / e2,
            t -> 0,
            t -> (1 - Math.exp((t - 1) / e2)) / (1 - Math.exp(-1 / e2))),
        new Case(
            "problem 3",
            -1,
            1,
            t -> 1 / e3,
            t -> -(2 + Math.cos(PI * t)) / e3,
            t ->
                (-(1 + e3 * PI * PI) * Math.cos(PI * t)
                        - (2 + Math.cos(PI * t)) * PI * Math.sin(PI * t))
                    / e3,
            t -> Math.cos(PI * t)),
        new Case(
            "problem 5",
            -1,
            1,
            t -> 1 / e3,
            t -> t / e3,
            t -> (-(1 + e3 * PI * PI) * Math.cos(PI * t) + PI * t * Math.sin(PI * t)) / e3,
            t -> Math.cos(PI * t)),
        new Case(
            "problem 9",
            -1,
            1,
            t -> -2 / (e3 + t * t),
            t -> -4 * t / (e3 + t * t),
            t -> 0,
            t -> 1 / (e3 + t * t)),
        new Case(
            "problem 14",
            -1,
            1,
            t -> 1 / e1,
            t -> 0,
            t -> -(1 + e1 * PI * PI) * Math.cos(PI * t) / e1,
            t -> Math.cos(PI * t) + Math.cosh(t / root) / Math.cosh(1 / root)),
        new Case(
            "problem 16",
            0,
            1,
            t -> -PI * PI / 4 / (e16 * e16),
            t -> 0,
            t -> 0,
            t -> Math.sin(PI * t / (2 * e16))),
        new Case(
            "problem 17",
            -0.1,
            0.1,
            t -> -3 * e17 / ((e17 + t * t) * (e17 + t * t)),
            t -> 0,
            t -> 0,
            t -> t / Math.sqrt(e17 + t * t)));
  }

  @ParameterizedTest
  @MethodSource("publishedProblems")
  void estimatesCoverTheErrorsAndTheAccuracyIsMet(Case problem) {
    for (double relative : new double[] {1e-5, 1e-8, 1e-11}) {
      Solution solution =
          unique(
              problem.system(),
              List.of(
                  at(problem.start(), 0, problem.exact().applyAsDouble(problem.start())),
                  at(problem.end(), 0, problem.exact().applyAsDouble(problem.end()))),
              relative);
      double worst = 0;
      for (int k = 0; k <= 400; k++) {
        double t = problem.start() + (problem.end() - problem.start()) * k / 400;
        double exact = problem.exact().applyAsDouble(t);
        double[] x = value(solution, t);
        double[] error = new double[2];
        solution.errorEstimate(t, error);
        double off = Math.abs(x[0] - exact);
        assertTrue(
            off <= error[0] + 2e-15 * Math.abs(exact),
            () -> problem + " at " + t + ": off by " + off + ", estimate " + error[0]);
        worst = Math.max(worst, off / Math.max(1, Math.abs(exact)));
      }
      assertTrue(worst <= relative, problem + ": " + worst + " for " + relative);
    }
  }

  /** Interior layer at a turning point; same test set, problem 6, value of erf from tables. */
  @Test
  void interiorLayer() {
    double eps = 0.05;
    LinearSystem system =
        SecondOrder.of(
            -1,
            1,
            t -> 0,
            t -> -t / eps,
            t -> (-eps * PI * PI * Math.cos(PI * t) - PI * t * Math.sin(PI * t)) / eps);
    Solution solution = unique(system, List.of(at(-1, 0, -2), at(1, 0, 0)), 1e-10);
    assertEquals(1.29633834421378165, value(solution, 0.1)[0], 1e-10);
  }

  /**
   * Modes e^(20t), e^(19t) and e^(-18t), conditions that couple both ends: Mattheij &amp; Staarink,
   * SIAM J. Sci. Stat. Comput. 5 (1984) 751; exact solution e^t (1, 1, 1).
   */
  @Test
  void couplesBothEnds() {
    LinearSystem system =
        FormulaSystem.forced(
            3,
            0,
            PI,
            (t, a) -> {
              double c = Math.cos(2 * t);
              double s = Math.sin(2 * t);
              double[] rows = {1 - 19 * c, 0, 1 + 19 * s, 0, 19, 0, -1 + 19 * s, 0, 1 + 19 * c};
              System.arraycopy(rows, 0, a, 0, 9);
            },
            (t, b) -> {
              double e = Math.exp(t);
              double c = Math.cos(2 * t);
              double s = Math.sin(2 * t);
              b[0] = e * (-1 + 19 * (c - s));
              b[1] = -18 * e;
              b[2] = e * (1 - 19 * (c + s));
            });
    List<BoundaryCondition> conditions = new ArrayList<>();
    for (int i = 0; i < 3; i++) {
      conditions.add(
          new BoundaryCondition(
              List.of(
                  new BoundaryCondition.Sample(0, Side.AFTER, i, 1),
                  new BoundaryCondition.Sample(PI, Side.AFTER, i, 1)),
              1 + Math.exp(PI)));
    }
    Solution solution = unique(system, conditions, 1e-10);
    for (double t : new double[] {0, 1, 2, PI}) {
      for (double x : value(solution, t)) {
        assertEquals(Math.exp(t), x, 1e-9 * Math.exp(t), "at " + t);
      }
    }
  }

  /** Rates of +-r over unit length: x'' = r^2 x, whose solution is a ratio of hyperbolic sines. */
  @ParameterizedTest
  @ValueSource(doubles = {1e3, 1e5})
  void strongDichotomy(double rate) {
    LinearSystem system = FormulaSystem.constant(new double[] {0, rate, rate, 0}, 0, 1);
    Solution solution = unique(system, List.of(at(0, 0, 1), at(1, 0, 2)), 1e-9);
    for (double t : new double[] {0, 0.3 / rate, 5 / rate, 0.5, 1 - 5 / rate, 1 - 0.2 / rate, 1}) {
      double exact = Math.exp(-rate * t) + 2 * Math.exp(-rate * (1 - t));
      assertEquals(exact, value(solution, t)[0], 1e-9, "at " + t);
      assertEquals(
          -Math.exp(-rate * t) + 2 * Math.exp(-rate * (1 - t)),
          value(solution, t)[1],
          1e-9,
          "at " + t);
    }
  }

  /** w'''' = 1, supported at both ends: w(1/2) = 5/384 (Roark's Formulas for Stress and Strain). */
  @Test
  void supportedBeam() {
    Solution solution =
        unique(beam(), List.of(at(0, 0, 0), at(0, 2, 0), at(1, 0, 0), at(1, 2, 0)), 1e-12);
    assertEquals(5.0 / 384, value(solution, 0.5)[0], 1e-15);
  }

  /** The same, clamped at one end: w(1/2) = 17/384, w(1) = 1/8 (same source). */
  @Test
  void clampedBeam() {
    Solution solution =
        unique(beam(), List.of(at(0, 0, 0), at(0, 1, 0), at(1, 2, 0), at(1, 3, 0)), 1e-12);
    assertEquals(17.0 / 384, value(solution, 0.5)[0], 1e-14);
    assertEquals(1.0 / 8, value(solution, 1)[0], 1e-14);
  }

  /** Four conditions at four times: the cubic through four points. */
  @Test
  void conditionsAtManyTimes() {
    double[] a = {0, 1, 0, 0, 0, 0, 1, 0, 0, 0, 0, 1, 0, 0, 0, 0};
    LinearSystem cubic = FormulaSystem.constant(a, 0, 3);
    Solution solution =
        unique(cubic, List.of(at(0, 0, 1), at(1, 0, 0), at(2, 0, 3), at(3, 0, -2)), 1e-12);
    // Lagrange's polynomial through the points, at 1.5.
    assertEquals(-0.0625 + 0 + 1.6875 + 0.125, value(solution, 1.5)[0], 1e-12);
  }

  /** x' = -x + sin t with x(0) = x(2 pi) has x = (sin t - cos t)/2. */
  @Test
  void periodicSolution() {
    LinearSystem system =
        FormulaSystem.forced(1, 0, 2 * PI, (t, a) -> a[0] = -1, (t, b) -> b[0] = Math.sin(t));
    BoundaryCondition periodic =
        new BoundaryCondition(
            List.of(
                new BoundaryCondition.Sample(0, Side.AFTER, 0, 1),
                new BoundaryCondition.Sample(2 * PI, Side.AFTER, 0, -1)),
            0);
    Solution solution = unique(system, List.of(periodic), 1e-11);
    assertEquals(-0.5, value(solution, 0)[0], 1e-11);
    assertEquals(0.5, value(solution, PI)[0], 1e-11);
  }

  /** x'' + pi^2 x = 0 between zeros of the sine: the alternative of Fredholm. */
  @Test
  void decidesSolvability() {
    LinearSystem system = SecondOrder.of(0, 1, t -> -PI * PI, t -> 0);
    None none =
        assertInstanceOf(None.class, solve(system, List.of(at(0, 0, 0), at(1, 0, 1)), 1e-9));
    assertEquals(1, none.directions().size());
    // The direction that the conditions leave open is the sine, with its slope pi at both ends.
    double[] direction = none.directions().getFirst().values();
    double t = none.directions().getFirst().time();
    double sine = Math.sin(PI * t) / (PI * Math.cos(PI * t));
    assertEquals(sine, direction[0] / direction[1], 1e-9);
    Family family =
        assertInstanceOf(Family.class, solve(system, List.of(at(0, 0, 0), at(1, 0, 0)), 1e-9));
    assertEquals(1, family.directions().size());
    Family shifted =
        assertInstanceOf(Family.class, solve(system, List.of(at(0, 0, 1), at(1, 0, -1)), 1e-9));
    assertEquals(1, value(shifted.particular(), 0)[0], 1e-9);
    assertEquals(-1, value(shifted.particular(), 1)[0], 1e-9);
  }

  /** As close as 1e-5 to the singular length there is one solution, and it is large. */
  @Test
  void tellsNearlySingularFromSingular() {
    double rate = PI * (1 + 1e-5);
    LinearSystem system = SecondOrder.of(0, 1, t -> -rate * rate, t -> 0);
    Unique unique =
        assertInstanceOf(Unique.class, solve(system, List.of(at(0, 0, 0), at(1, 0, 1)), 1e-7));
    double exact = Math.sin(rate * 0.5) / Math.sin(rate);
    assertEquals(exact, value(unique.solution(), 0.5)[0], 1e-7 * Math.abs(exact));
    assertTrue(unique.conditioning().toConditions() > 1e4);
  }

  /** Conditions at one time are initial values: one solution, however fast it grows. */
  @Test
  void conditionsAtOneTime() {
    LinearSystem system = FormulaSystem.constant(new double[] {0, 1, 900, 0}, 0, 1);
    Unique unique =
        assertInstanceOf(
            Unique.class, solve(system, List.of(at(0.25, 0, 1), at(0.25, 1, 15)), 1e-9));
    double exact = Math.cosh(22.5) + 0.5 * Math.sinh(22.5);
    assertEquals(exact, value(unique.solution(), 1)[0], 1e-9 * exact);
    assertEquals(Math.cosh(7.5) - 0.5 * Math.sinh(7.5), value(unique.solution(), 0)[0], 1e-6);
    assertTrue(unique.conditioning().toConditions() > 1e9);
  }

  /** Beyond the last condition the solution is carried on, with the error it takes along. */
  @Test
  void carriesOnBeyondTheConditions() {
    LinearSystem system = FormulaSystem.constant(new double[] {0, 1, 100, 0}, 0, 3);
    Unique unique =
        assertInstanceOf(Unique.class, solve(system, List.of(at(0, 0, 1), at(1, 0, 1)), 1e-9));
    double b = (1 - Math.cosh(10)) / Math.sinh(10);
    for (double t : new double[] {0.5, 1.5, 3}) {
      double exact = Math.cosh(10 * t) + b * Math.sinh(10 * t);
      double[] error = new double[2];
      unique.solution().errorEstimate(t, error);
      double rounding = 1e-14 * Math.exp(10 * t);
      assertEquals(exact, value(unique.solution(), t)[0], error[0] + rounding, "at " + t);
    }
    assertEquals(3, unique.solution().range().end());
  }

  /** Two conditions that say the same leave a direction open. */
  @Test
  void repeatedConditions() {
    LinearSystem system = FormulaSystem.constant(new double[] {0, 1, 4, 0}, 0, 1);
    Family family =
        assertInstanceOf(Family.class, solve(system, List.of(at(0, 0, 1), at(0, 0, 1)), 1e-9));
    assertEquals(1, value(family.particular(), 0)[0], 1e-9);
    assertInstanceOf(None.class, solve(system, List.of(at(0, 0, 1), at(0, 0, 2)), 1e-9));
  }

  /** A forced system with a jump of its forcing: x' = 0 before 1, x' = 1 after it. */
  @Test
  void stepsEndAtBreakpoints() {
    LinearSystem system =
        new FormulaSystem(
            1,
            new TimeRange(0, 3),
            (t, side, a) -> a[0] = 0,
            (t, side, b) -> b[0] = t > 1 || t == 1 && side == Side.AFTER ? 1 : 0,
            true,
            false,
            SparsityPattern.dense(1),
            new double[] {1});
    Solution solution = unique(system, List.of(at(3, 0, 5)), 1e-12);
    assertEquals(3, value(solution, 0.5)[0], 1e-12);
    assertEquals(4, value(solution, 2)[0], 1e-12);
  }

  /**
   * x' = -x with x(s) = 2 x(s-) + 1 at s = 1 and s = 2, and conditions on both sides of a jump.
   * Solved by hand: x(1-) = c/e, and so on.
   */
  @Test
  void jumpsOfTheStates() {
    List<Jump.Row> rows = List.of(new Jump.Row(0, new int[] {0}, new double[] {2}, 1));
    LinearSystem system =
        new JumpSelection(
            FormulaSystem.constant(new double[] {-1}, 0, 3),
            List.of(Jump.of(1, rows), Jump.of(2, rows)));
    double e = Math.exp(-1);
    double atOne = 2 * 4 * e + 1;
    double atTwo = 2 * atOne * e + 1;
    for (BoundaryCondition condition :
        List.of(
            at(0, 0, 4),
            at(1, 0, atOne),
            new BoundaryCondition(
                List.of(new BoundaryCondition.Sample(2, Side.BEFORE, 0, 1)), atOne * e),
            at(3, 0, atTwo * e))) {
      Solution solution = unique(system, List.of(condition), 1e-11);
      assertEquals(4, value(solution, 0)[0], 1e-10);
      assertEquals(atOne, value(solution, 1)[0], 1e-10);
      double[] left = new double[1];
      solution.value(1, Side.BEFORE, left);
      assertEquals(4 * e, left[0], 1e-10);
      assertEquals(atTwo * Math.exp(-0.5), value(solution, 2.5)[0], 1e-10);
      assertArrayEquals(new double[] {1, 2}, solution.jumpTimes());
    }
  }

  /** A jump that forgets the state leaves its value before it open. */
  @Test
  void aJumpThatCannotBeUndone() {
    LinearSystem system =
        new JumpSelection(
            FormulaSystem.constant(new double[] {-1}, 0, 2),
            List.of(Jump.of(1, List.of(new Jump.Row(0, new int[0], new double[0], 5)))));
    assertInstanceOf(Family.class, solve(system, List.of(at(2, 0, 5 * Math.exp(-1))), 1e-9));
    assertInstanceOf(None.class, solve(system, List.of(at(2, 0, 4)), 1e-9));
  }

  /** Scales only change how errors are measured, not what is found. */
  @Test
  void conditioningDoesNotDependOnUnits() {
    LinearSystem metres = FormulaSystem.constant(new double[] {0, 1, 9, 0}, 0, 1);
    LinearSystem millimetres = FormulaSystem.constant(new double[] {0, 1e-3, 9e3, 0}, 0, 1);
    Unique first =
        assertInstanceOf(Unique.class, solve(metres, List.of(at(0, 0, 1), at(1, 1, 2)), 1e-9));
    Outcome<BoundaryAnswer> outcome =
        BoundarySolver.solve(
            millimetres,
            new TimeRange(0, 1),
            List.of(at(0, 0, 1), at(1, 1, 2e3)),
            new Accuracy(1e-9, new double[] {1, 1e3}),
            Progress.NONE);
    Unique second = assertInstanceOf(Unique.class, Solved.of(outcome));
    assertEquals(first.conditioning().toConditions(), second.conditioning().toConditions(), 1e-6);
    assertEquals(value(first.solution(), 0.5)[0], value(second.solution(), 0.5)[0], 1e-9);
  }

  @Test
  void refusesWhatIsNoProblem() {
    LinearSystem system = FormulaSystem.constant(new double[] {1}, 0, 1);
    assertThrows(IllegalArgumentException.class, () -> solve(system, List.of(), 1e-6));
    assertThrows(IllegalArgumentException.class, () -> solve(system, List.of(at(2, 0, 1)), 1e-6));
    Outcome.Unsolved<BoundaryAnswer> unsolved =
        Solved.not(
            BoundarySolver.solve(
                system,
                new TimeRange(0, 1),
                List.of(at(0, 0, Double.NaN)),
                Solved.accuracy(1, 1e-6),
                Progress.NONE));
    assertEquals(Outcome.Reason.COEFFICIENT_NOT_FINITE, unsolved.reason());
  }

  @Test
  void stopsWhenCancelled() {
    Outcome<BoundaryAnswer> outcome =
        BoundarySolver.solve(
            beam(),
            new TimeRange(0, 1),
            List.of(at(0, 0, 0), at(0, 2, 0), at(1, 0, 0), at(1, 2, 0)),
            Solved.accuracy(4, 1e-9),
            new Progress() {
              @Override
              public void worked(double fraction) {}

              @Override
              public boolean isCancelled() {
                return true;
              }
            });
    assertInstanceOf(Outcome.Cancelled.class, outcome);
  }

  private static LinearSystem beam() {
    double[] a = {0, 1, 0, 0, 0, 0, 1, 0, 0, 0, 0, 1, 0, 0, 0, 0};
    return FormulaSystem.constant(a, new double[] {0, 0, 0, 1}, 0, 1);
  }

  private static BoundaryCondition at(double time, int component, double value) {
    return new BoundaryCondition(
        List.of(new BoundaryCondition.Sample(time, Side.AFTER, component, 1)), value);
  }

  private static BoundaryAnswer solve(
      LinearSystem system, List<BoundaryCondition> conditions, double relative) {
    return Solved.of(
        BoundarySolver.solve(
            system,
            system.range(),
            conditions,
            Solved.accuracy(system.dimension(), relative),
            Progress.NONE));
  }

  private static Solution unique(
      LinearSystem system, List<BoundaryCondition> conditions, double relative) {
    return assertInstanceOf(Unique.class, solve(system, conditions, relative)).solution();
  }

  private static double[] value(Solution solution, double t) {
    double[] x = new double[solution.dimension()];
    solution.value(t, Side.AFTER, x);
    return x;
  }
}
