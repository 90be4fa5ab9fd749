/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.solution;

import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.List;
import java.util.Locale;
import org.junit.jupiter.api.Test;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.problem.Benchmarks;
import org.spanloom.numerics.problem.FormulaSystem;
import org.spanloom.numerics.problem.SecondOrder;
import org.spanloom.numerics.problem.Solved;

/**
 * Is the estimated error one? Over the whole range, at nodes and between them, true errors stay
 * below their estimates, and the estimates stay within reason. True errors come from closed forms,
 * or from a solution of the same system to much more accuracy.
 */
final class ErrorEstimateTests {

  private static final double[] ASKED = {1e-3, 1e-5, 1e-7, 1e-9, 1e-11};

  /** What is right at a time, and to what error that is known itself. */
  private interface Truth {
    void write(double t, double[] x, double[] error);
  }

  @SuppressWarnings("ArrayRecordComponent") // nobody compares cases
  private record Case(String name, LinearSystem system, double[] x0, boolean forced, Truth truth) {}

  private static Truth exact(FormulaSystem.Smooth formula) {
    return (t, x, error) -> {
      formula.write(t, x);
      for (int e = 0; e < x.length; e++) {
        error[e] = 4 * Math.ulp(x[e]);
      }
    };
  }

  private static Truth finer(LinearSystem system, boolean forced, double... x0) {
    Solution fine =
        forced ? Solved.trajectory(system, 1e-13, x0) : Solved.columns(system, 1e-13, x0);
    return (t, x, error) -> {
      fine.value(t, org.spanloom.numerics.Side.AFTER, x);
      fine.errorEstimate(t, error);
    };
  }

  private static Case closed(
      String name, FormulaSystem system, FormulaSystem.Smooth formula, double... x0) {
    return new Case(name, system, x0, true, exact(formula));
  }

  private static Case columns(String name, LinearSystem system) {
    double[] x0 = Solved.identity(system.dimension());
    return new Case(name, system, x0, false, finer(system, false, x0));
  }

  private static List<Case> cases() {
    List<Case> cases = new ArrayList<>();
    FormulaSystem resonance = SecondOrder.of(0, 10, t -> -1, t -> 0, Math::cos);
    cases.add(
        closed(
            "resonance",
            resonance,
            (t, x) -> {
              x[0] = t / 2 * Math.sin(t);
              x[1] = (Math.sin(t) + t * Math.cos(t)) / 2;
            },
            0,
            0));
    FormulaSystem growth = FormulaSystem.homogeneous(1, 0, 3, (t, a) -> a[0] = 20 * t);
    cases.add(closed("growth e^90", growth, (t, x) -> x[0] = Math.exp(10 * t * t), 1));
    FormulaSystem decay = FormulaSystem.homogeneous(1, 0, 3, (t, a) -> a[0] = -20 * t);
    cases.add(closed("decay e^-90", decay, (t, x) -> x[0] = Math.exp(-10 * t * t), 1));
    FormulaSystem euler = SecondOrder.of(1, 30, t -> -1 / (t * t), t -> -1 / t);
    cases.add(
        closed(
            "Euler equation",
            euler,
            (t, x) -> {
              x[0] = Math.cos(Math.log(t));
              x[1] = -Math.sin(Math.log(t)) / t;
            },
            1,
            0));
    // Prothero & Robinson 1974: the solution follows sin t however fast it is pulled there.
    FormulaSystem pulled =
        FormulaSystem.forced(
            1, 0, 10, (t, a) -> a[0] = -1e5, (t, b) -> b[0] = 1e5 * Math.sin(t) + Math.cos(t));
    cases.add(closed("Prothero-Robinson", pulled, (t, x) -> x[0] = Math.sin(t), 0));
    cases.add(columns("Airy", SecondOrder.of(-20, 2, t -> t, t -> 0)));
    cases.add(columns("Bessel", SecondOrder.of(1, 40, t -> -1, t -> -1 / t)));
    cases.add(
        columns(
            "Legendre",
            SecondOrder.of(0, 0.99, t -> -110 / (1 - t * t), t -> 2 * t / (1 - t * t))));
    cases.add(columns("Mathieu", SecondOrder.of(0, 40, t -> -(1 - 0.4 * Math.cos(2 * t)), t -> 0)));
    cases.add(columns("P1", Benchmarks.smooth()));
    FormulaSystem stiff =
        FormulaSystem.forced(
            2,
            0,
            20,
            (t, a) -> {
              double k = 1e4 * (1 + 0.5 * Math.sin(t));
              a[0] = -k;
              a[1] = k;
              a[2] = k / 2e4;
              a[3] = -k / 2e4 - 0.1;
            },
            (t, b) -> {
              b[0] = 1;
              b[1] = Math.cos(t);
            });
    cases.add(
        new Case("two stiff rooms", stiff, new double[] {1, 0}, true, finer(stiff, true, 1, 0)));
    FormulaSystem kinked =
        SecondOrder.of(0, 6, t -> -1 - 0.5 * Math.abs(Math.sin(t)), t -> -0.1)
            .withBreakpoints(Math.PI);
    cases.add(columns("declared kink", kinked));
    return cases;
  }

  @Test
  void trueErrorsStayBelowTheirEstimates() {
    List<String> failures = new ArrayList<>();
    List<Double> ratios = new ArrayList<>();
    StringBuilder table = new StringBuilder();
    table.append(
        String.format(
            Locale.ROOT,
            "%-18s %7s %6s %11s %12s %12s %s%n",
            "problem",
            "asked",
            "nodes",
            "true/est.",
            "est./true",
            "est./asked",
            "method"));
    for (Case problem : cases()) {
      for (double asked : ASKED) {
        measure(problem, asked, table, failures, ratios);
      }
    }
    Collections.sort(ratios);
    double within = ratios.stream().filter(r -> r <= 100).count() / (double) ratios.size();
    table.append(
        String.format(
            Locale.ROOT,
            "estimate within 100 times the true error in %.0f %% of the columns at the end%n",
            100 * within));
    System.out.print(table);
    assertTrue(failures.isEmpty(), () -> String.join("\n", failures));
    assertTrue(within > 0.6, "estimates are too large too often: " + within);
  }

  private static void measure(
      Case problem, double asked, StringBuilder table, List<String> failures, List<Double> ratios) {
    Solution solution =
        problem.forced()
            ? Solved.trajectory(problem.system(), asked, problem.x0())
            : Solved.columns(problem.system(), asked, problem.x0());
    int size = solution.dimension() * solution.columns();
    double[] x = new double[size];
    double[] right = new double[size];
    double[] known = new double[size];
    double[] error = new double[size];
    double worst = 0;
    double worstAsked = 0;
    double end = solution.range().end();
    for (double t : times(solution)) {
      solution.value(t, org.spanloom.numerics.Side.AFTER, x);
      solution.errorEstimate(t, error);
      problem.truth().write(t, right, known);
      for (int e = 0; e < size; e++) {
        double off = Math.max(0, Math.abs(x[e] - right[e]) - known[e]);
        if (off > error[e]) {
          failures.add(
              String.format(
                  Locale.ROOT,
                  "%s at %.0e: entry %d at t = %.6g is off by %.2e, estimated %.2e",
                  problem.name(),
                  asked,
                  e,
                  t,
                  off,
                  error[e]));
        }
        worst = Math.max(worst, off == 0 ? 0 : off / error[e]);
        double size1 = problem.forced() ? Math.max(1, Math.abs(x[e])) : columnSize(solution, x, e);
        worstAsked = Math.max(worstAsked, error[e] / (asked * size1));
      }
    }
    double ratio = ratioAtEnd(problem, solution, end, ratios);
    table.append(
        String.format(
            Locale.ROOT,
            "%-18s %7.0e %6d %11.3f %12.1f %12.2g %s%n",
            problem.name(),
            asked,
            solution.nodes().length,
            worst,
            ratio,
            worstAsked,
            solution.method()));
  }

  private static double columnSize(Solution solution, double[] x, int entry) {
    int m = solution.columns();
    double largest = 0;
    for (int i = 0; i < solution.dimension(); i++) {
      largest = Math.max(largest, Math.abs(x[i * m + entry % m]));
    }
    return largest;
  }

  private static double ratioAtEnd(
      Case problem, Solution solution, double end, List<Double> ratios) {
    int m = solution.columns();
    int n = solution.dimension();
    double[] x = Solved.at(solution, end);
    double[] error = Solved.errorsAt(solution, end);
    double[] right = new double[n * m];
    problem.truth().write(end, right, new double[n * m]);
    double largest = 0;
    for (int j = 0; j < m; j++) {
      double off = 0;
      double estimated = 0;
      double size = 0;
      for (int i = 0; i < n; i++) {
        off = Math.max(off, Math.abs(x[i * m + j] - right[i * m + j]));
        estimated = Math.max(estimated, error[i * m + j]);
        size = Math.max(size, Math.abs(right[i * m + j]));
      }
      // Below that the true error is a matter of luck in rounding.
      double floor = 4 * Math.ulp(problem.forced() ? Math.max(1, size) : size);
      double ratio = estimated / Math.max(off, floor);
      ratios.add(ratio);
      largest = Math.max(largest, ratio);
    }
    return largest;
  }

  private static double[] times(Solution solution) {
    double[] nodes = solution.nodes();
    double start = solution.range().start();
    double length = solution.range().length();
    double[] between = new double[40];
    Arrays.setAll(between, k -> start + length * ((k + 0.37) / 40));
    double[] all = Arrays.copyOf(nodes, nodes.length + between.length);
    System.arraycopy(between, 0, all, nodes.length, between.length);
    return all;
  }
}
