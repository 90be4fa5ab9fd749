/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.solution;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;

import org.junit.jupiter.api.Test;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.problem.Benchmarks;
import org.spanloom.numerics.problem.FormulaSystem;
import org.spanloom.numerics.problem.Solved;

/**
 * The same input gives the same bits, in whatever order times are asked for and from however many
 * threads.
 */
final class SameBitsTests {

  private static void assertSame(LinearSystem system) {
    Solution one = Solved.principal(system, 1e-8);
    Solution two = Solved.principal(system, 1e-8);
    assertArrayEquals(one.nodes(), two.nodes());
    double start = one.range().start();
    double length = one.range().length();
    double[][] forwards = new double[50][];
    for (int k = 0; k < 50; k++) {
      forwards[k] = Solved.at(one, start + length * (k / 49.0));
    }
    java.util.stream.IntStream.range(0, 50)
        .parallel()
        .map(k -> 49 - k)
        .forEach(
            k -> assertArrayEquals(forwards[k], Solved.at(two, start + length * (k / 49.0)), 0.0));
    double end = one.range().end();
    assertArrayEquals(Solved.errorsAt(one, end), Solved.errorsAt(two, end));
  }

  @Test
  void collocation() {
    assertSame(Benchmarks.smooth());
  }

  @Test
  void exponential() {
    assertSame(FormulaSystem.constant(new double[] {-1, 2, 0.5, -3}, 0, 7));
  }
}
