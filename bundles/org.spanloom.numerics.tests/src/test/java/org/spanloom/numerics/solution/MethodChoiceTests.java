/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.solution;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Outcome;
import org.spanloom.numerics.Outcome.Reason;
import org.spanloom.numerics.Progress;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.problem.Benchmarks;
import org.spanloom.numerics.problem.FormulaSystem;
import org.spanloom.numerics.problem.SecondOrder;
import org.spanloom.numerics.problem.Solved;

/** Methods asked for by name, and those that are chosen. */
final class MethodChoiceTests {

  /** A damped swing with a driven pivot. */
  private static final FormulaSystem SWING =
      SecondOrder.of(0, 12, t -> -(1 + 0.3 * Math.sin(t)), t -> -0.1, t -> Math.cos(0.7 * t));

  private static final double[] START = {0.5, -1};

  private static Outcome<Solution> solve(LinearSystem system, double relative, String method) {
    return SolutionSolver.trajectory(
        system,
        system.range().start(),
        START,
        system.range(),
        Solved.accuracy(2, relative),
        MethodChoice.named(method),
        Progress.NONE);
  }

  static List<String> steppingMethods() {
    return MethodChoice.names().stream().filter(name -> !name.equals("exponential")).toList();
  }

  @ParameterizedTest
  @MethodSource("steppingMethods")
  void everyMethodReachesTheSameValues(String name) {
    Solution fine = Solved.trajectory(SWING, 1e-13, START);
    double relative = name.equals("magnus4") || name.equals("radau5") ? 1e-6 : 1e-9;
    Solution solution = Solved.of(solve(SWING, relative, name));
    String order = name.replaceAll("[a-z]+", "");
    assertTrue(solution.method().endsWith("order " + order), solution.method());
    double[] right = new double[2];
    double[] x = new double[2];
    double[] error = new double[2];
    for (double t = 0.05; t <= 12; t += 0.37) {
      fine.value(t, Side.AFTER, right);
      solution.value(t, Side.AFTER, x);
      solution.errorEstimate(t, error);
      for (int i = 0; i < 2; i++) {
        double off = Math.abs(x[i] - right[i]);
        assertTrue(off <= error[i] + 1e-13, name + " at " + t + ": " + off + " > " + error[i]);
        assertTrue(error[i] <= relative * Math.max(1, Math.abs(x[i])), name + " at " + t);
      }
    }
  }

  @Test
  void exponentialIsRefusedForVaryingCoefficients() {
    Outcome.Unsolved<Solution> unsolved = Solved.not(solve(SWING, 1e-8, "exponential"));
    assertEquals(Reason.METHOD, unsolved.reason());
    assertTrue(unsolved.detail().contains("do not change with time"), unsolved.detail());
  }

  @Test
  void steppingMethodsSolveConstantSystemsToo() {
    FormulaSystem constant = FormulaSystem.constant(new double[] {0, 1, -4, -0.2}, 0, 5);
    double[] right = Solved.at(Solved.of(solve(constant, 1e-9, "exponential")), 5);
    for (String name : steppingMethods()) {
      double relative = name.equals("magnus4") || name.equals("radau5") ? 1e-6 : 1e-9;
      double[] x = Solved.at(Solved.of(solve(constant, relative, name)), 5);
      assertEquals(right[0], x[0], 2 * relative, name);
      assertEquals(right[1], x[1], 2 * relative, name);
    }
  }

  @Test
  void namesAreRead() {
    assertEquals(
        List.of(
            "exponential",
            "magnus4",
            "magnus6",
            "magnus8",
            "radau5",
            "radau9",
            "radau13",
            "gauss6",
            "gauss10",
            "gauss14"),
        MethodChoice.names());
    assertEquals(
        Optional.of(new MethodChoice(Method.RADAU_COLLOCATION, 13)), MethodChoice.named("radau13"));
    assertEquals(Optional.empty(), MethodChoice.named("radau7"));
  }

  @Test
  void choicesFollowTheSystem() {
    assertEquals("Magnus integrator, order 8", Solved.trajectory(SWING, 1e-8, START).method());
    assertEquals(
        "Magnus integrator, order 6",
        Solved.trajectory(Benchmarks.fast(), 1e-2, 1, 0, 1, 0).method());
    assertEquals(
        "Radau IIA collocation, order 9",
        Solved.trajectory(Benchmarks.network().system(), 1e-4, Benchmarks.network().start())
            .method());
    assertEquals(
        "Gauss collocation, order 10", Solved.principal(Benchmarks.oscillators(1), 1e-8).method());
  }

  /** Phase errors of 3200 periods, and what their estimate says, at three accuracies. */
  @ParameterizedTest
  @org.junit.jupiter.params.provider.ValueSource(doubles = {1e-5, 1e-8, 1e-10})
  void estimatesOfPhaseErrorsAreSharp(double relative) {
    double[] expected = Benchmarks.reference("p6.txt");
    Solution solution = Solved.trajectory(Benchmarks.fast(), relative, 1, 0, 1, 0);
    double[] x = Solved.at(solution, 20);
    double[] error = Solved.errorsAt(solution, 20);
    double off = 0;
    double estimate = 0;
    for (int i = 0; i < 4; i++) {
      assertTrue(Math.abs(x[i] - expected[i]) <= error[i]);
      off = Math.max(off, Math.abs(x[i] - expected[i]));
      estimate = Math.max(estimate, error[i]);
    }
    assertTrue(estimate <= relative, () -> "asked " + relative);
    assertTrue(estimate <= 100 * off, estimate + " for an error of " + off);
  }
}
