/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.solution;

import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStreamReader;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.Locale;
import org.junit.jupiter.api.Test;
import org.spanloom.numerics.FormulaSystem;
import org.spanloom.numerics.Lcg31;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Progress;
import org.spanloom.numerics.ReferenceProblem;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.Solved;
import org.spanloom.numerics.TimeRange;

/** Two larger systems against our own references of higher precision, at 1e-8. */
class BenchmarkTests {

  private static final double RELATIVE = 1e-8;

  private static double[] reference(String name) {
    try (BufferedReader in =
        new BufferedReader(
            new InputStreamReader(
                BenchmarkTests.class.getResourceAsStream("/org/spanloom/numerics/" + name),
                StandardCharsets.UTF_8))) {
      return in.lines()
          .filter(line -> !line.startsWith("#"))
          .mapToDouble(Double::parseDouble)
          .toArray();
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  private static double[] identity(int n) {
    double[] identity = new double[n * n];
    for (int i = 0; i < n; i++) {
      identity[i * n + i] = 1;
    }
    return identity;
  }

  /** Largest error, largest value, largest excess of error over estimate. */
  private static void compare(String what, double[] exact, Solution solution, double end) {
    double[] x = new double[exact.length];
    double[] e = new double[exact.length];
    long begin = System.nanoTime();
    solution.value(end, Side.BEFORE, x);
    solution.errorEstimate(end, e);
    double size = Arrays.stream(exact).map(Math::abs).max().orElseThrow();
    double worst = 0;
    double estimate = 0;
    for (int k = 0; k < exact.length; k++) {
      double error = Math.abs(x[k] - exact[k]);
      worst = Math.max(worst, error);
      estimate = Math.max(estimate, e[k]);
      assertTrue(
          error <= e[k] + 1e-14 * size,
          what + " entry " + k + ": error " + error + " exceeds its estimate " + e[k]);
    }
    System.out.printf(
        Locale.ROOT,
        "%s: error %.1e, estimate %.1e of the largest, %d steps, %s, end value in %d us%n",
        what,
        worst / size,
        estimate / size,
        solution.nodes().length - 1,
        solution.method(),
        (System.nanoTime() - begin) / 1000);
    assertTrue(worst <= RELATIVE * size, what + ": error " + worst / size);
  }

  @Test
  void fourVaryingStates() {
    int n = 4;
    Lcg31 random = new Lcg31(1);
    double[] a0 = random.symmetric(16);
    double[] a1 = random.symmetric(16);
    double[] a2 = random.symmetric(16);
    for (int i = 0; i < n; i++) {
      a0[i * n + i] -= 0.5;
    }
    LinearSystem system =
        FormulaSystem.varying(
            n,
            FormulaSystem.ALWAYS,
            (t, side, a) -> {
              for (int k = 0; k < 16; k++) {
                a[k] = a0[k] + a1[k] * Math.sin(t) + a2[k] * Math.cos(2 * t);
              }
            });
    Solution basis =
        Solved.of(
            SolutionSolver.homogeneous(
                system,
                0,
                identity(n),
                new TimeRange(0, 20),
                ReferenceProblem.accuracy(n, RELATIVE),
                Progress.NONE));
    compare("P1 basis", reference("p1-reference.txt"), basis, 20);
  }

  @Test
  void stiffThermalNetwork() {
    ThermalNetwork network = new ThermalNetwork();
    int n = ThermalNetwork.NODES;
    double[] reference = reference("p2-reference.txt");
    double[] basisAtEnd = new double[n * n];
    double[] forcedAtEnd = new double[n];
    for (int i = 0; i < n; i++) {
      System.arraycopy(reference, i * (n + 1), basisAtEnd, i * n, n);
      forcedAtEnd[i] = reference[i * (n + 1) + n];
    }
    TimeRange span = new TimeRange(0, 100);
    Solution basis =
        Solved.of(
            SolutionSolver.homogeneous(
                network.system(),
                0,
                identity(n),
                span,
                ReferenceProblem.accuracy(n, RELATIVE),
                Progress.NONE));
    compare("P2 basis", basisAtEnd, basis, 100);
    Solution forced =
        Solved.of(
            SolutionSolver.trajectory(
                network.system(),
                0,
                network.start(),
                span,
                ReferenceProblem.accuracy(n, RELATIVE),
                Progress.NONE));
    compare("P2 trajectory", forcedAtEnd, forced, 100);
  }
}
