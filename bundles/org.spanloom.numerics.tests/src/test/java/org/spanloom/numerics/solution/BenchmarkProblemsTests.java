/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.solution;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.spanloom.numerics.problem.Benchmarks.reference;
import static org.spanloom.numerics.problem.Solved.at;
import static org.spanloom.numerics.problem.Solved.errorsAt;
import static org.spanloom.numerics.problem.Solved.principal;
import static org.spanloom.numerics.problem.Solved.trajectory;

import java.util.Arrays;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.spanloom.numerics.problem.Benchmarks;

/**
 * Larger problems against reference solutions in more than double precision (see the head of each
 * resource).
 */
final class BenchmarkProblemsTests {

  private static void assertReached(Solution solution, double[] expected, double relative) {
    double end = solution.range().end();
    double[] x = at(solution, end);
    double[] errors = errorsAt(solution, end);
    double largest = Arrays.stream(expected).map(Math::abs).max().orElseThrow();
    for (int e = 0; e < expected.length; e++) {
      assertEquals(expected[e], x[e], relative * largest);
      double off = Math.abs(x[e] - expected[e]);
      assertTrue(off <= errors[e], "entry " + e + " is off by " + off + ", not " + errors[e]);
    }
  }

  @ParameterizedTest
  @ValueSource(doubles = {1e-5, 1e-8, 1e-11})
  void smoothSystem(double relative) {
    assertReached(principal(Benchmarks.smooth(), relative), reference("p1.txt"), relative);
  }

  @ParameterizedTest
  @ValueSource(doubles = {1e-4, 1e-7})
  void stiffNetworkTrajectory(double relative) {
    Benchmarks.Network network = Benchmarks.network();
    double[] both = reference("p2.txt");
    double[] expected = new double[60];
    Arrays.setAll(expected, i -> both[i * 61 + 60]);
    assertReached(trajectory(network.system(), relative, network.start()), expected, relative);
  }

  @Test
  void stiffNetworkBasis() {
    double[] both = reference("p2.txt");
    double[] expected = new double[3600];
    Arrays.setAll(expected, e -> both[e / 60 * 61 + e % 60]);
    assertReached(principal(Benchmarks.network().system(), 1e-5), expected, 1e-5);
  }

  @Test
  void parabolicEquation() {
    double[] start = new double[400];
    Arrays.setAll(start, i -> Math.sin(Math.PI * (i + 1) / 401));
    Solution x = trajectory(Benchmarks.parabolic(), 1e-6, start);
    assertTrue(x.method().startsWith("Radau IIA"));
    assertReached(x, reference("p3.txt"), 1e-6);
  }

  @Test
  void periodicOscillators() {
    double[] both = reference("p4.txt");
    Solution phi = principal(Benchmarks.oscillators(1), 1e-9);
    assertTrue(phi.method().startsWith("Gauss"));
    assertReached(phi, Arrays.copyOf(both, 1600), 1e-9);
    double[] start = new double[40];
    Arrays.setAll(start, i -> i < 20 ? 1.0 / (1 + i) : 0);
    assertReached(
        trajectory(Benchmarks.oscillators(200), 1e-5, start),
        Arrays.copyOfRange(both, 1600, 1640),
        1e-5);
  }

  /**
   * Phase errors add up over 3200 periods: an estimate of local errors only would be off by
   * thousands.
   */
  @ParameterizedTest
  @ValueSource(doubles = {1e-4, 1e-8})
  void fastOscillations(double relative) {
    assertReached(
        trajectory(Benchmarks.fast(), relative, 1, 0, 1, 0), reference("p6.txt"), relative);
  }
}
