/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

class HelpTests {

  private static final Map<Command, List<String>> ARGUMENTS =
      Map.of(
          Command.CHECK, List.of("PATH...", "--format", "--settings", "--output"),
          Command.SOLVE,
              List.of(
                  "FILE",
                  "--system",
                  "--initial",
                  "--from",
                  "--until",
                  "--points",
                  "--at",
                  "--set",
                  "--accuracy",
                  "--output"),
          Command.BOUNDARY,
              List.of(
                  "FILE",
                  "--system",
                  "--boundary",
                  "--points",
                  "--at",
                  "--set",
                  "--accuracy",
                  "--output"),
          Command.SPECTRUM, List.of("FILE", "--system", "--at", "--output"),
          Command.STRUCTURE, List.of("FILE", "--system", "--state", "--output"),
          Command.BASIS, List.of("FILE", "--system", "--basis", "--at", "--output"),
          Command.EXPORT,
              List.of(
                  "FILE", "--what", "--at", "--format", "--system", "--basis", "--set", "--output"),
          Command.FORMAT, List.of("PATH...", "--check"));

  @ParameterizedTest
  @EnumSource(Command.class)
  void helpNamesEveryArgument(Command command) {
    CommandRun run = CommandRun.of(command.word(), "--help");
    assertEquals(0, run.code());
    assertEquals("", run.err());
    for (String argument : ARGUMENTS.get(command)) {
      assertTrue(run.out().contains(argument), () -> argument + " is missing in\n" + run.out());
    }
    assertTrue(run.out().lines().allMatch(l -> l.length() <= 100), run.out());
    assertTrue(run.out().chars().noneMatch(c -> c == '\r' || c == 27), run.out());
  }

  @Test
  void theOverviewNamesCommandsExitCodesAndCautions() {
    CommandRun run = CommandRun.of("--help");
    assertEquals(0, run.code());
    for (String part :
        List.of("check", "solve", "basis", "format", "Exit codes", "approximations")) {
      assertTrue(run.out().contains(part), run.out());
    }
  }

  @Test
  void theVersionIsOneLine() {
    CommandRun run = CommandRun.of(new String[] {"--version"});
    assertEquals(0, run.code());
    assertTrue(run.out().matches("Spanloom [^\n]+, Java \\d+\n"), run.out());
  }
}
