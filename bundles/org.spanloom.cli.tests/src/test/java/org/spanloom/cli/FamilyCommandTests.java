/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.google.gson.JsonArray;
import com.google.gson.JsonObject;
import com.google.gson.JsonParser;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Members of families in what the commands print. */
class FamilyCommandTests {

  /** Stones that cool on their own, {@code T = 20 K exp(-i j t)}, and two floats at even speed. */
  private static final String OVEN =
      """
      ## Stones of the oven, and two floats in its cistern. Invented data.
      system Oven over t [h] from 0 to 2 {
        state T[1..2, 1..2] [K] = 20
        state q[1..2] [km] = 1
        state q' [km/h] = 3
        for i from 1 to 2 {
          for j from 1 to 2 { T[i, j]' = -i*j*1 [/h]*T[i, j] }
          q[i]'' = 0
          require T[i, 2](1) < 3 [K]
        }
      }
      """;

  private static final String HEADS =
      "\"T[1,1]\",\"T[1,2]\",\"T[2,1]\",\"T[2,2]\",q[1],\"q[1]'\",q[2],\"q[2]'\"";

  @TempDir Path folder;

  private Path oven() {
    return CommandRun.model(folder, "oven.span", OVEN);
  }

  private static double[] numbers(String line) {
    return Arrays.stream(line.split(",", -1)).mapToDouble(Double::parseDouble).toArray();
  }

  @Test
  void solveQuotesTheHeadsWithACommaAndKeepsTheOrderOfTheMembers() {
    CommandRun run = CommandRun.of("solve", oven(), "--at", "0,1");
    assertEquals(0, run.code(), run.err());
    List<String> lines = run.out().lines().toList();
    assertEquals("t," + HEADS, lines.get(0));
    assertEquals("0,20,20,20,20,1,3,1,3", lines.get(1));
    double cooled = 20 * Math.exp(-2);
    double[] expected = {1, 20 * Math.exp(-1), cooled, cooled, 20 * Math.exp(-4), 4, 3, 4, 3};
    double[] found = numbers(lines.get(2));
    assertEquals(expected.length, found.length);
    for (int i = 0; i < expected.length; i++) {
      assertEquals(expected[i], found[i], 1e-5 * expected[i], "column " + i);
    }
    assertTrue(run.err().lines().anyMatch(l -> l.startsWith("T[2,1]  K ")), run.err());
  }

  @Test
  void basisHasARowOfEveryMember() {
    CommandRun run = CommandRun.of("basis", oven(), "--at", "0,2");
    assertEquals(0, run.code(), run.err());
    List<String> lines = run.out().lines().toList();
    assertEquals("t,column," + HEADS, lines.get(0));
    assertEquals(1 + 2 * 8, lines.size());
    double[] rates = {1, 2, 2, 4};
    for (int j = 0; j < 8; j++) {
      double[] row = numbers(lines.get(9 + j));
      assertEquals(j + 1, row[1]);
      double own = j < 4 ? Math.exp(-2 * rates[j]) : 1;
      assertEquals(own, row[2 + j], 1e-6 * own, "column " + j);
    }
    // A rate of one kilometre an hour makes two kilometres of its own float only.
    assertEquals(2, numbers(lines.get(14))[6], 1e-6);
    assertEquals(0, numbers(lines.get(14))[8]);
  }

  @Test
  void checkNamesTheTurnOfARequirement() {
    CommandRun run = CommandRun.of("check", oven(), "--format", "json");
    JsonObject system =
        JsonParser.parseString(run.out())
            .getAsJsonObject()
            .getAsJsonArray("files")
            .get(0)
            .getAsJsonObject()
            .getAsJsonArray("systems")
            .get(0)
            .getAsJsonObject();
    assertEquals(8, system.get("states").getAsInt());
    JsonArray results = system.getAsJsonArray("requirements");
    assertEquals(
        List.of(
            "T[i, 2](1) < 3 [K] (i = 1) held 2.70671 9",
            "T[i, 2](1) < 3 [K] (i = 2) held 0.366313 9"),
        IntStream.range(0, results.size())
            .mapToObj(k -> results.get(k).getAsJsonObject())
            .map(r ->
                "%s %s %.6g %d"
                    .formatted(
                        r.get("requirement").getAsString(),
                        r.get("status").getAsString(),
                        r.get("value").getAsDouble(),
                        r.get("line").getAsInt()))
            .toList());
    assertEquals(0, run.code(), run.out());
  }

  @Test
  void structureNamesTheLineInTheLoop() {
    CommandRun run = CommandRun.of("structure", oven());
    assertEquals(0, run.code(), run.err());
    assertTrue(run.out().contains("3,\"T[2,1]\",\"T[2,1]\",7\n"), run.out());
  }
}
