/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.solution;

import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.lang.management.ManagementFactory;
import java.lang.management.ThreadMXBean;
import org.junit.jupiter.api.Test;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Outcome;
import org.spanloom.numerics.Progress;
import org.spanloom.numerics.basis.ConditionProfile;
import org.spanloom.numerics.problem.Benchmarks;
import org.spanloom.numerics.problem.FormulaSystem;
import org.spanloom.numerics.problem.Solved;

/**
 * Solvers ask often enough whether they should stop; measured in processor time, so that a busy
 * machine does not matter.
 */
final class CancellationTests {

  private static final double MOST_MILLISECONDS = 100;

  /** Cancels after some questions; remembers the longest time between two of them. */
  private static final class Counting implements Progress {
    private final ThreadMXBean threads = ManagementFactory.getThreadMXBean();
    private final int cancelAt;
    private int asked;
    private long last = threads.getCurrentThreadCpuTime();
    private double longest;
    private double lastFraction;

    Counting(int cancelAt) {
      this.cancelAt = cancelAt;
    }

    @Override
    public void worked(double fraction) {
      assertTrue(fraction >= 0 && fraction <= 1 + 1e-12, "fraction " + fraction);
      lastFraction = fraction;
    }

    @Override
    public boolean isCancelled() {
      long now = threads.getCurrentThreadCpuTime();
      longest = Math.max(longest, (now - last) / 1e6);
      last = now;
      return ++asked >= cancelAt;
    }
  }

  private static void assertStops(LinearSystem system, int cancelAt) {
    // The first run warms up the code.
    for (int run = 0; run < 2; run++) {
      Counting counting = new Counting(cancelAt);
      Outcome<Solution> outcome =
          SolutionSolver.homogeneous(
              system,
              0,
              Solved.identity(system.dimension()),
              system.range(),
              Solved.accuracy(system.dimension(), 1e-9),
              counting);
      assertInstanceOf(Outcome.Cancelled.class, outcome);
      assertTrue(
          run == 0 || counting.longest < MOST_MILLISECONDS,
          () -> "not asked for " + counting.longest + " ms");
    }
  }

  @Test
  void stiffNetworkStops() {
    assertStops(Benchmarks.network().system(), 300);
  }

  /**
   * 150 states, every one coupled to every other: one factorisation takes longer than a question
   * may.
   */
  @Test
  void largeFactorisationStops() {
    int n = 150;
    FormulaSystem system =
        FormulaSystem.homogeneous(
            n,
            0,
            10,
            (t, a) -> {
              for (int e = 0; e < a.length; e++) {
                a[e] = Math.sin(e + t);
              }
            });
    assertStops(system, 200);
  }

  @Test
  void largeExponentialStops() {
    int n = 400;
    double[] a = new double[n * n];
    for (int e = 0; e < a.length; e++) {
      a[e] = Math.sin(e);
    }
    assertStops(FormulaSystem.constant(a, 0, 10), 200);
  }

  @Test
  void profileStops() {
    FormulaSystem system = Benchmarks.oscillators(1);
    Solution basis = Solved.principal(system, 1e-8);
    Counting counting = new Counting(5);
    assertInstanceOf(
        Outcome.Cancelled.class, ConditionProfile.of(system, basis, system.range(), counting));
  }

  @Test
  void progressReachesTheEnd() {
    Counting counting = new Counting(Integer.MAX_VALUE);
    FormulaSystem system = Benchmarks.smooth();
    SolutionSolver.homogeneous(
        system, 0, Solved.identity(4), system.range(), Solved.accuracy(4, 1e-9), counting);
    assertTrue(counting.lastFraction == 1);
  }
}
