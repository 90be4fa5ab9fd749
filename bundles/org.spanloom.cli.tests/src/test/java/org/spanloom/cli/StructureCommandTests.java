/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class StructureCommandTests {

  private static final String CISTERNS =
      """
      ## Three cisterns below the roof of the station; the pump leads back one step.
      system Cisterns over t [h] from 0 to 12 {
        parameter k [1/h] = 0.4
        state low  [m3] = 1
        state mid  [m3] = 2
        state high [m3] = 3
        state tank [m3] = 0
        output pumped [m3/h] = 0.1 [1/h]*mid
        high' = pumped - k*high
        mid'  = k*high - pumped - k*mid
        low'  = k*mid
        tank' = 0 [m3/h]
      }
      """;

  @TempDir Path folder;

  private CommandRun run(String... more) {
    String[] arguments = new String[more.length + 2];
    arguments[0] = "structure";
    arguments[1] = CommandRun.model(folder, "cisterns.span", CISTERNS).toString();
    System.arraycopy(more, 0, arguments, 2, more.length);
    return CommandRun.of(arguments);
  }

  @Test
  void listsDependencesWithTheLinesThatMakeThem() {
    CommandRun run = run();
    assertEquals(0, run.code(), run.err());
    assertEquals(
        """
        block,state,depends_on,lines
        1,mid,mid,8 10
        1,mid,high,10
        1,high,mid,8 9
        1,high,high,9
        2,low,mid,11
        3,tank,,
        """,
        run.out());
    assertEquals(
        """
        system Cisterns: 4 states in 3 blocks
          1: mid, high
          2: low
          3: tank
        """,
        run.err());
  }

  @Test
  void listsWhatAStateDependsOnThroughOthers() {
    assertEquals(
        """
        depends_on,direct,lines
        mid,yes,11
        high,no,
        """,
        run("--state", "low").out());
  }

  @Test
  void refusesStatesAndSystemsThatAreNotThere() {
    CommandRun run = run("--state", "roof");
    assertEquals(2, run.code());
    assertTrue(run.err().contains("there is no state 'roof'"), run.err());
    assertEquals(2, run("--system", "Roof").code());
  }

  @Test
  void equationsWithErrorsHaveNoStructure() {
    CommandRun run =
        CommandRun.of(
            "structure",
            CommandRun.model(folder, "bad.span", "system S over t { state x = 1; x' = x*x }\n"));
    assertEquals(1, run.code());
    assertTrue(run.err().contains("system S has errors"), run.err());
  }
}
