/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class BoundaryCommandTests {

  /** A beam on two supports under its own load; Roark's Formulas for Stress and Strain: 5/384. */
  private static final String BEAM =
      """
      system Beam over x from 0 to 1 {
        state w
        output moment = -w''
        w'''' = 1
        accuracy 1e-12
        boundary supported { w(0) = 0; w''(0) = 0; w(1) = 0; w''(1) = 0 }
        boundary clamped { w(0) = 0; w'(0) = 0; w''(1) = 0; w'''(1) = 0 }
        require w < 0.0131 throughout under supported
      }
      """;

  /** A string between two points, at a load where it buckles: what is open is the sine. */
  private static final String STRING =
      """
      system Strut over x from 0 to 1 {
        state y
        y'' + pi^2*y = 0
        boundary held { y(0) = 0; y(1) = 0 }
        boundary pushed { y(0) = 0; y(1) = 1 }
      }
      """;

  @TempDir Path folder;

  @Test
  void listsTheSolutionWithOutputs() {
    CommandRun run =
        CommandRun.of(
            "boundary",
            CommandRun.model(folder, "beam.span", BEAM),
            "--boundary",
            "supported",
            "--at",
            "0.5");
    assertEquals(0, run.code(), run.err());
    double[] row = new PrintedResult(run).rows().getFirst();
    assertEquals(5.0 / 384, row[1], 1e-15);
    assertEquals(1.0 / 8, row[5], 1e-13);
    assertTrue(run.err().startsWith("boundary supported: one solution"), run.err());
  }

  @Test
  void listsEvenTimesOfTheInterval() {
    CommandRun run =
        CommandRun.of(
            "boundary",
            CommandRun.model(folder, "beam.span", BEAM),
            "--boundary",
            "clamped",
            "--points",
            "3");
    List<double[]> rows = new PrintedResult(run).rows();
    assertEquals(3, rows.size());
    assertEquals(17.0 / 384, rows.get(1)[1], 1e-14);
    assertEquals(1.0 / 8, rows.get(2)[1], 1e-14);
  }

  @Test
  void aNameIsNeededWhereThereAreSeveral() {
    CommandRun run = CommandRun.of("boundary", CommandRun.model(folder, "beam.span", BEAM));
    assertEquals(2, run.code());
    assertTrue(run.err().contains("supported, clamped"), run.err());
  }

  @Test
  void withoutConditionsItSaysHowToDeclareThem() {
    CommandRun run = CommandRun.of("boundary", Models.drain(folder));
    assertEquals(2, run.code());
    assertTrue(run.err().contains("boundary NAME { x(0) = 1 }"), run.err());
  }

  @Test
  void saysWhatTheConditionsLeaveOpen() {
    Path model = CommandRun.model(folder, "strut.span", STRING);
    CommandRun none = CommandRun.of("boundary", model, "--boundary", "pushed");
    assertEquals(1, none.code());
    assertEquals("", none.out());
    assertTrue(none.err().contains("no solution meets all conditions"), none.err());
    CommandRun many = CommandRun.of("boundary", model, "--boundary", "held", "--points", "2");
    assertEquals(1, many.code());
    assertTrue(many.err().contains("infinitely many solutions"), many.err());
    assertFalse(many.out().isEmpty());
  }

  @Test
  void checkDecidesSolvabilityAndRequirements() {
    CommandRun strut = CommandRun.of("check", CommandRun.model(folder, "strut.span", STRING));
    assertEquals(1, strut.code());
    assertTrue(strut.out().contains("[boundary-not-unique]"), strut.out());
    assertTrue(strut.out().contains("[boundary-without-solution]"), strut.out());
    CommandRun beam = CommandRun.of("check", CommandRun.model(folder, "beam.span", BEAM));
    assertEquals(0, beam.code(), beam.out());
    assertTrue(beam.out().contains("held      w < 0.0131 throughout under supported"), beam.out());
    CommandRun tight =
        CommandRun.of(
            "check",
            CommandRun.model(folder, "tight.span", BEAM.replace("w < 0.0131", "w < 0.0130")));
    assertEquals(1, tight.code());
    assertTrue(tight.out().contains("[requirement-failed]"), tight.out());
  }

  @Test
  void warnsOfConditionsThatDecideTooLittle() {
    // Both conditions at the start leave the growing direction to rounding: e^(30) of it.
    String model =
        """
        system Layer over x from 0 to 1 {
          state y
          y'' = 900*y
          accuracy 1e-9
          boundary start { y(0) = 1; y'(0) = -30 }
        }
        """;
    CommandRun run = CommandRun.of("check", CommandRun.model(folder, "layer.span", model));
    assertTrue(run.out().contains("[boundary-ill-conditioned]"), run.out());
  }
}
