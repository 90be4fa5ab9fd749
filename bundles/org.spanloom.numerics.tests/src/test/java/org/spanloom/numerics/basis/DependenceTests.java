/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.basis;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;

/** Columns that depend on those before them, with their factors. */
class DependenceTests {

  @Test
  void independentColumnsHaveNone() {
    assertTrue(Dependence.among(TestBases.identity(5), 5, 5).isEmpty());
    assertTrue(Dependence.among(TestBases.hilbert(8), 8, 8).isEmpty(), "ill-conditioned only");
  }

  @Test
  void tellsTheCombination() {
    // Third column = 2 first - 5 second, in numbers of very different size.
    double[] x = {1, 1e6, 2 - 5e6, 0, 3e6, -15e6, 4, 0, 8};
    Dependence found = Dependence.among(x, 3, 3).orElseThrow();
    assertEquals(2, found.column());
    assertArrayEquals(new double[] {2, -5}, found.factors(), 1e-8);
  }

  @Test
  void roundingInAFactorIsNothing() {
    double[] x = {1, 0.1, 0.3, 0, 0.7, 0, 0, 0.2, 0};
    Dependence found = Dependence.among(x, 3, 3).orElseThrow();
    assertEquals(2, found.column());
    assertEquals(0.3, found.factors()[0], 1e-15);
    assertEquals(0, found.factors()[1]);
  }

  @Test
  void aColumnOfZerosDependsOnNothing() {
    Dependence found = Dependence.among(new double[] {0, 1, 0, 2}, 2, 2).orElseThrow();
    assertEquals(0, found.column());
    assertEquals(0, found.factors().length);
  }

  @Test
  void moreColumnsThanRowsDepend() {
    Dependence found = Dependence.among(new double[] {1, 0, 3, 0, 1, 4}, 2, 3).orElseThrow();
    assertEquals(2, found.column());
    assertArrayEquals(new double[] {3, 4}, found.factors(), 1e-14);
  }

  @Test
  void nearlyParallelIsNotDependent() {
    assertTrue(Dependence.among(new double[] {1, 1, 0, 1e-10}, 2, 2).isEmpty());
    assertTrue(Dependence.among(new double[] {1, 1, 0, 1e-15}, 2, 2).isPresent());
  }

  @Test
  void hugeAndTinyColumnsAreScaledFirst() {
    assertTrue(Dependence.among(new double[] {1e300, 0, 0, 1e-300}, 2, 2).isEmpty());
  }
}
