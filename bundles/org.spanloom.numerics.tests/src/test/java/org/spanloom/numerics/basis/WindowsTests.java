/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.basis;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.spanloom.numerics.FormulaSystem;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Outcome;
import org.spanloom.numerics.Progress;
import org.spanloom.numerics.ReferenceProblem;
import org.spanloom.numerics.Solved;
import org.spanloom.numerics.TimeRange;

/** How often a basis must start anew. */
class WindowsTests {

  private static Outcome<Integer> count(LinearSystem system, double to, double limit) {
    return Windows.count(
        system,
        new TimeRange(0, to),
        ReferenceProblem.accuracy(system.dimension(), 1e-10),
        limit,
        Progress.NONE);
  }

  /** The principal basis of x'' = x has columns (cosh, sinh), (sinh, cosh): scaled e^t/e^-t. */
  @Test
  void countsByTheKnownGrowth() {
    LinearSystem system = FormulaSystem.constant(2, 0, 1, 1, 0);
    // Its scaled condition is (cosh + sinh) / (cosh - sinh) = e^(2t): 1e4 lasts ln(1e4)/2 = 4.605.
    assertEquals(1, Solved.of(count(system, 4.5, 1e4)));
    assertEquals(2, Solved.of(count(system, 4.7, 1e4)));
    assertEquals(22, Solved.of(count(system, 100, 1e4)));
  }

  @Test
  void varyingCoefficientsAreCountedWindowByWindow() {
    // A = (1 + t/10) [[0,1],[1,0]]: condition exp(2 s) with s the integral of 1 + t/10.
    LinearSystem system =
        FormulaSystem.varying(
            2,
            FormulaSystem.ALWAYS,
            (t, side, a) -> {
              a[0] = 0;
              a[1] = 1 + t / 10;
              a[2] = 1 + t / 10;
              a[3] = 0;
            });
    // Over [0, 20] s grows by 40, and each window takes ln(1e4)/2 = 4.605: 8.7 of them.
    assertEquals(9, Solved.of(count(system, 20, 1e4)));
  }

  @Test
  void whatNeverDegradesNeedsOne() {
    assertEquals(1, Solved.of(count(FormulaSystem.constant(2, 0, 2, -0.5, -0.0), 300, 1e3)));
    assertEquals(1, Solved.of(count(FormulaSystem.constant(1, 5), 50, 1e3)));
  }

  @Test
  void tooManyAreNotCounted() {
    Outcome.Unsolved<Integer> unsolved =
        Solved.not(count(FormulaSystem.constant(2, 0, 1, 1, 0), 1e5, 1e4));
    assertEquals(Outcome.Reason.TOO_MUCH_WORK, unsolved.reason());
    assertTrue(unsolved.detail().contains("2000"), unsolved.detail());
  }
}
