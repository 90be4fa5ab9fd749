/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.solution;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.List;
import org.hipparchus.ode.ODEState;
import org.hipparchus.ode.OrdinaryDifferentialEquation;
import org.hipparchus.ode.nonstiff.DormandPrince853Integrator;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.spanloom.numerics.FormulaSystem;
import org.spanloom.numerics.Lcg31;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Outcome;
import org.spanloom.numerics.Outcome.Reason;
import org.spanloom.numerics.Progress;
import org.spanloom.numerics.ReferenceProblem;
import org.spanloom.numerics.ReferenceProblems;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.Solved;
import org.spanloom.numerics.TimeRange;

/** Edges of what can be solved, and what every solution owes its reader. */
class SolutionSolverTests {

  private static final double[] TURNING = {0, 1, -1, -0.1};

  private static Outcome<Solution> outcome(
      LinearSystem system, double t0, double[] x0, double from, double to) {
    return SolutionSolver.trajectory(
        system,
        t0,
        x0,
        new TimeRange(from, to),
        ReferenceProblem.accuracy(system.dimension(), 1e-9),
        Progress.NONE);
  }

  private static double[] at(Solution solution, double t, Side side) {
    double[] x = new double[solution.dimension() * solution.columns()];
    solution.value(t, side, x);
    return x;
  }

  /** x' = (cos t - 0.3) x + 1 / (1 + t^2) in one state, growing and falling. */
  private static FormulaSystem single() {
    return new FormulaSystem(
        1,
        FormulaSystem.ALWAYS,
        (t, side, a) -> a[0] = Math.cos(t) - 0.3,
        (t, side, b) -> b[0] = 0,
        false,
        true);
  }

  @Test
  void oneVaryingStateHasItsElementarySolution() {
    Solution solution = Solved.of(outcome(single(), 0, new double[] {2}, -5, 5));
    for (double t = -5; t <= 5; t += 0.37) {
      double exact = 2 * Math.exp(Math.sin(t) - 0.3 * t);
      double[] error = new double[1];
      solution.errorEstimate(t, error);
      assertEquals(exact, at(solution, t, Side.AFTER)[0], error[0] + 1e-15 * exact, "at " + t);
      assertTrue(error[0] <= 1e-8 * exact, "estimate " + error[0] + " at " + t);
    }
  }

  @Test
  void noStatesGiveNoValues() {
    Solution solution = Solved.of(outcome(FormulaSystem.constant(0), 0, new double[0], 0, 3));
    assertEquals(0, solution.dimension());
    assertArrayEquals(new double[] {0, 3}, solution.nodes());
    solution.value(1.5, Side.AFTER, new double[0]);
  }

  @Test
  void aRangeOfLengthZeroKeepsItsStartValues() {
    double[] start = {3, -4};
    Solution solution = Solved.of(outcome(FormulaSystem.constant(2, TURNING), 7, start, 7, 7));
    assertArrayEquals(start, at(solution, 7, Side.AFTER));
    assertArrayEquals(new double[] {7}, solution.nodes());
  }

  @Test
  void withoutCoefficientsNothingMoves() {
    double[] start = {3, -4};
    Solution solution = Solved.of(outcome(FormulaSystem.constant(2, 0, 0, 0, 0), 0, start, 0, 1e6));
    assertArrayEquals(start, at(solution, 1e6, Side.BEFORE));
    Solution varying =
        Solved.of(
            outcome(
                FormulaSystem.varying(2, FormulaSystem.ALWAYS, (t, side, a) -> Arrays.fill(a, 0)),
                0,
                start,
                -10,
                10));
    assertArrayEquals(start, at(varying, -10, Side.AFTER), 1e-14);
    assertArrayEquals(start, at(varying, 10, Side.BEFORE), 1e-14);
  }

  @ParameterizedTest
  @ValueSource(booleans = {true, false})
  void thereAndBackIsTheStart(boolean constant) {
    LinearSystem system =
        constant
            ? FormulaSystem.constant(2, TURNING)
            : FormulaSystem.varying(
                2,
                FormulaSystem.ALWAYS,
                (t, side, a) -> {
                  System.arraycopy(TURNING, 0, a, 0, 4);
                  a[2] -= 0.5 * Math.sin(t);
                });
    double[] start = {1, 0.5};
    double[] end = at(Solved.of(outcome(system, 0, start, 0, 12)), 12, Side.BEFORE);
    Solution back = Solved.of(outcome(system, 12, end, 0, 12));
    assertArrayEquals(start, at(back, 0, Side.AFTER), 1e-7);
    assertEquals(12, back.startTime());
  }

  @Test
  void breakpointsAreSteppedOnAndHaveTwoSides() {
    double[] jumps = {0.3, 1 / 3.0, 2};
    FormulaSystem system =
        new FormulaSystem(
            1,
            FormulaSystem.ALWAYS,
            (t, side, a) -> a[0] = 0,
            (t, side, b) -> {
              int past = 0;
              for (double jump : jumps) {
                past += t > jump || t == jump && side == Side.AFTER ? 1 : 0;
              }
              b[0] = past * Math.exp(-t);
            },
            true,
            false,
            jumps);
    Solution solution = Solved.of(outcome(system, 0, new double[] {1}, 0, 3));
    List<Double> nodes = Arrays.stream(solution.nodes()).boxed().toList();
    for (double jump : jumps) {
      assertTrue(nodes.contains(jump), jump + " in " + nodes);
      assertEquals(
          at(solution, jump, Side.BEFORE)[0], at(solution, jump, Side.AFTER)[0], 1e-9, "no jump");
    }
    double exact = 1;
    for (double jump : jumps) {
      exact += Math.exp(-jump) - Math.exp(-3);
    }
    assertEquals(exact, at(solution, 3, Side.BEFORE)[0], 1e-9);
    double before = at(solution, 0.15, Side.AFTER)[0];
    assertEquals(1, before, 1e-13, "nothing happens before the first breakpoint");
  }

  @ParameterizedTest
  @ValueSource(booleans = {true, false})
  void aCoefficientThatIsNoNumberIsNamedAsSuch(boolean constant) {
    LinearSystem system =
        constant
            ? FormulaSystem.constant(1, Double.NaN)
            : FormulaSystem.varying(
                1, FormulaSystem.ALWAYS, (t, side, a) -> a[0] = Math.sqrt(2 - t));
    Outcome.Unsolved<Solution> unsolved = Solved.not(outcome(system, 0, new double[] {1}, 0, 5));
    assertEquals(Reason.COEFFICIENT_NOT_FINITE, unsolved.reason());
    assertTrue(constant || unsolved.time() >= 1.9, "time " + unsolved.time());
  }

  @Test
  void aStartValueThatIsNoNumberIsNamedAsSuch() {
    Outcome.Unsolved<Solution> unsolved =
        Solved.not(outcome(single(), 0, new double[] {Double.NaN}, 0, 5));
    assertEquals(Reason.COEFFICIENT_NOT_FINITE, unsolved.reason());
  }

  @ParameterizedTest
  @ValueSource(doubles = {1e300, -1e300, 40})
  void whatOutgrowsNumbersHasNoSolution(double rate) {
    LinearSystem varying =
        FormulaSystem.varying(
            1, FormulaSystem.ALWAYS, (t, side, a) -> a[0] = rate * (2 + Math.sin(t)));
    Outcome<Solution> outcome = outcome(varying, 0, new double[] {1}, 0, 100);
    if (rate > 0) {
      assertFalse(Solved.not(outcome).detail().isBlank());
    } else if (outcome instanceof Outcome.Solved<Solution> solved) {
      assertEquals(0, at(solved.value(), 100, Side.BEFORE)[0], 1e-9);
    }
    LinearSystem constant = FormulaSystem.constant(1, rate);
    Outcome<Solution> other = outcome(constant, 0, new double[] {1}, 0, 100);
    if (rate > 0) {
      assertEquals(Reason.OVERFLOW, Solved.not(other).reason());
    } else if (other instanceof Outcome.Solved<Solution> solved) {
      assertEquals(0, at(solved.value(), 100, Side.BEFORE)[0], 1e-9);
    }
  }

  @Test
  void rangesMustBeBoundedAndInsideTheSystem() {
    TimeRange whole = new TimeRange(0, 1);
    LinearSystem system = FormulaSystem.varying(1, whole, (t, side, a) -> a[0] = t);
    double[] one = {1};
    assertEquals(Reason.RANGE, Solved.not(outcome(system, 0, one, 0, 2)).reason());
    assertEquals(
        Reason.RANGE, Solved.not(outcome(single(), 0, one, 0, Double.POSITIVE_INFINITY)).reason());
    assertEquals(Reason.RANGE, Solved.not(outcome(single(), 5, one, 0, 1)).reason());
  }

  @Test
  void cancellingStopsSoon() {
    int n = 40;
    Lcg31 random = new Lcg31(11);
    double[] a = random.symmetric(n * n);
    LinearSystem system =
        FormulaSystem.varying(
            n,
            FormulaSystem.ALWAYS,
            (t, side, to) -> {
              for (int k = 0; k < n * n; k++) {
                to[k] = 100 * a[k] * Math.sin(t + k);
              }
            });
    double[] identity = new double[n * n];
    for (int i = 0; i < n; i++) {
      identity[i * n + i] = 1;
    }
    long[] firstAsked = {0};
    Progress impatient =
        new Progress() {
          @Override
          public void worked(double fraction) {}

          @Override
          public boolean isCancelled() {
            if (firstAsked[0] == 0) {
              firstAsked[0] = System.nanoTime();
              return false;
            }
            return true;
          }
        };
    Outcome<Solution> outcome =
        SolutionSolver.homogeneous(
            system,
            0,
            identity,
            new TimeRange(0, 1000),
            ReferenceProblem.accuracy(n, 1e-10),
            impatient);
    long milliseconds = (System.nanoTime() - firstAsked[0]) / 1_000_000;
    assertInstanceOf(Outcome.Cancelled.class, outcome);
    System.out.println("cancelled after " + milliseconds + " ms");
    assertTrue(milliseconds < 1000, milliseconds + " ms");
  }

  @Test
  void theSameProblemGivesTheSameBits() {
    for (ReferenceProblem problem : ReferenceProblems.all()) {
      Solution one = problem.solved(1e-7);
      Solution two = problem.solved(1e-7);
      assertArrayEquals(one.nodes(), two.nodes(), problem.name());
      for (double share : new double[] {0.1, 0.77, 1}) {
        double t = problem.t0() + share * (problem.end() - problem.t0());
        assertArrayEquals(at(one, t, Side.BEFORE), at(two, t, Side.BEFORE), problem.name());
        double[] e1 = new double[problem.x0().length];
        double[] e2 = new double[problem.x0().length];
        one.errorEstimate(t, e1);
        two.errorEstimate(t, e2);
        assertArrayEquals(e1, e2, problem.name());
      }
    }
  }

  /** Every time a solution is asked for, it is as good as a solution that ends there. */
  @ParameterizedTest
  @ValueSource(doubles = {1e-5, 1e-8, 1e-11})
  void betweenStepsValuesAreAsGoodAsAtSteps(double relative) {
    LinearSystem system =
        FormulaSystem.varying(
            2,
            FormulaSystem.ALWAYS,
            (t, side, a) -> {
              a[0] = 0;
              a[1] = t;
              a[2] = -t;
              a[3] = 0;
            });
    Solution solution =
        Solved.of(
            SolutionSolver.homogeneous(
                system,
                0,
                new double[] {1, 0},
                new TimeRange(0, 6),
                ReferenceProblem.accuracy(2, relative),
                Progress.NONE));
    double[] nodes = solution.nodes();
    for (int k = 1; k < nodes.length; k++) {
      for (double share : new double[] {0.05, 0.21, 0.5, 0.68, 0.93, 1}) {
        double t = nodes[k - 1] + share * (nodes[k] - nodes[k - 1]);
        double[] x = at(solution, t, Side.BEFORE);
        double[] e = new double[2];
        solution.errorEstimate(t, e);
        double error = Math.abs(x[0] - Math.cos(t * t / 2));
        assertTrue(error <= e[0] + 1e-14, "error " + error + " > " + e[0] + " at " + t);
        assertTrue(error <= relative, "error " + error + " at " + t);
      }
    }
  }

  /** An independent code, Hipparchus' order 8(5,3) pair, on random coefficients. */
  @ParameterizedTest
  @ValueSource(ints = {3, 17, 2024})
  void agreesWithAnotherCode(int start) {
    int n = 6;
    Lcg31 random = new Lcg31(start);
    double[] mean = random.symmetric(n * n);
    double[] swing = random.symmetric(n * n);
    double[] force = random.symmetric(n);
    double[] x0 = random.symmetric(n);
    FormulaSystem system =
        new FormulaSystem(
            n,
            FormulaSystem.ALWAYS,
            (t, side, a) -> {
              for (int k = 0; k < n * n; k++) {
                a[k] = mean[k] + swing[k] * Math.sin(2 * t) - (k % (n + 1) == 0 ? 0.8 : 0);
              }
            },
            (t, side, b) -> {
              for (int i = 0; i < n; i++) {
                b[i] = force[i] * Math.cos(3 * t);
              }
            },
            false,
            false);
    OrdinaryDifferentialEquation equation =
        new OrdinaryDifferentialEquation() {
          @Override
          public int getDimension() {
            return n;
          }

          @Override
          public double[] computeDerivatives(double t, double[] x) {
            double[] a = new double[n * n];
            double[] dx = new double[n];
            system.matrix(t, Side.AFTER, a);
            system.forcing(t, Side.AFTER, dx);
            for (int i = 0; i < n; i++) {
              for (int j = 0; j < n; j++) {
                dx[i] += a[i * n + j] * x[j];
              }
            }
            return dx;
          }
        };
    double[] other =
        new DormandPrince853Integrator(1e-12, 1, 1e-13, 1e-13)
            .integrate(equation, new ODEState(0, x0), 8)
            .getPrimaryState();
    double size = Arrays.stream(other).map(Math::abs).max().orElseThrow();
    Solution solution = Solved.of(outcome(system, 0, x0, 0, 8));
    assertArrayEquals(other, at(solution, 8, Side.BEFORE), 3e-9 * Math.max(1, size));
  }
}
