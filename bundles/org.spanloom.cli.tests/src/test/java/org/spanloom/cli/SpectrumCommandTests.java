/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class SpectrumCommandTests {

  private static final String POOLS =
      """
      ## Two pools that exchange water, closed. Invented data.
      system Pools over t [h] from 0 to 10 {
        parameter k [/h] = 0.5
        state upper [L] = 8
        state lower [L] = 0
        transfer upper -> lower = k*upper
        transfer lower -> upper = 0.3 [/h]*lower
      }
      """;

  /** Markus and Yamabe, Osaka Mathematical Journal 12 (1960) 305: multipliers e^pi, e^(-2 pi). */
  private static final String TURNING =
      """
      system Turning over t from 0 {
        state x = 1
        state y = 0
        x' = (1.5*cos(t)^2 - 1)*x + (1 - 1.5*sin(t)*cos(t))*y
        y' = (-1 - 1.5*sin(t)*cos(t))*x + (1.5*sin(t)^2 - 1)*y
        require period 2*pi
      }
      """;

  @TempDir Path folder;

  @Test
  void listsEigenvaluesWithTheStatesInThem() {
    CommandRun run = CommandRun.of("spectrum", CommandRun.model(folder, "pools.span", POOLS));
    assertEquals(0, run.code(), run.err());
    assertTrue(
        run.out().startsWith("number,real,imaginary,error,condition,upper,lower\n"), run.out());
    List<double[]> rows = new PrintedResult(run).rows();
    assertEquals(0, rows.get(0)[1], 1e-15);
    assertEquals(-0.8, rows.get(1)[1], 1e-15);
    assertEquals(1, rows.get(0)[5] + rows.get(0)[6], 1e-15);
    assertTrue(run.err().contains("conserved: upper + lower\n"), run.err());
    assertTrue(run.err().contains("  upper 0.6, lower 1\n"), run.err());
  }

  @Test
  void listsMultipliersOfAStatedPeriod() {
    CommandRun run = CommandRun.of("spectrum", CommandRun.model(folder, "turning.span", TURNING));
    assertEquals(0, run.code(), run.err());
    List<double[]> rows = new PrintedResult(run).rows();
    assertEquals(Math.PI, rows.get(0)[2], 1e-7);
    assertEquals(-2 * Math.PI, rows.get(1)[2], 1e-7);
    assertEquals(0.5, rows.get(0)[5], 1e-7);
    assertTrue(run.err().contains("unstable: the fastest growth"), run.err());
  }

  @Test
  void frozenEigenvaluesComeWithAWarning() {
    CommandRun run =
        CommandRun.of("spectrum", CommandRun.model(folder, "turning.span", TURNING), "--at", "0");
    assertEquals(0, run.code(), run.err());
    // Both have the real part -1/4, and the system is unstable all the same.
    assertEquals(-0.25, new PrintedResult(run).rows().get(0)[1], 1e-14);
    assertTrue(run.err().contains("do not decide stability"), run.err());
  }

  @Test
  void aVaryingMatrixNeedsATimeOrAPeriod() {
    CommandRun run =
        CommandRun.of(
            "spectrum",
            CommandRun.model(folder, "turning.span", TURNING.replace("require period 2*pi", "")));
    assertEquals(2, run.code());
    assertEquals("", run.out());
    assertTrue(run.err().contains("A varies with t in system Turning"), run.err());
  }

  @Test
  void aTimeOutsideIsRefused() {
    CommandRun run =
        CommandRun.of("spectrum", CommandRun.model(folder, "pools.span", POOLS), "--at", "11");
    assertEquals(2, run.code());
    assertTrue(run.err().contains("lies outside the interval"), run.err());
  }
}
