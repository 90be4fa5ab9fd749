/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.google.gson.JsonObject;
import com.google.gson.JsonParser;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class CheckCommandTests {

  @TempDir Path folder;

  @Test
  void aCleanModelGivesZeroAndShowsItsBasis() {
    CommandRun run = CommandRun.of("check", Models.drain(folder));
    assertEquals(0, run.code(), run.err());
    assertEquals("", run.err());
    assertTrue(run.out().contains("system Pools"), run.out());
    assertTrue(run.out().contains("condition"), run.out());
    assertTrue(run.out().contains("approximations with an estimated error"), run.out());
  }

  @Test
  void aFailedRequirementGivesOneAndNamesLineAndMargin() {
    Path file =
        CommandRun.model(
            folder,
            "pools.span",
            Models.DRAIN.replace("  accuracy", "  require upper(2) < 2 [L]\n  accuracy"));
    CommandRun run = CommandRun.of("check", file);
    assertEquals(1, run.code(), run.out());
    assertTrue(run.out().contains("pools.span:9:"), run.out());
    assertTrue(run.out().contains("[requirement-failed]"), run.out());
    assertTrue(run.out().contains("2.94"), run.out());
  }

  @Test
  void jsonIsOneDocumentOfTheStatedShape() {
    Path good = Models.drain(folder);
    Path bad =
        CommandRun.model(
            folder, "zz.span", "system S over t from 0 to 1 {\n  state x = 1\n  x' = y\n}\n");
    CommandRun run = CommandRun.of("check", folder, "--format", "json");
    assertEquals(1, run.code(), run.err());
    JsonObject document = JsonParser.parseString(run.out()).getAsJsonObject();
    assertEquals(1, document.get("format").getAsInt());
    assertFalse(document.get("clean").getAsBoolean());
    assertTrue(document.get("caution").getAsString().contains("approximations"));
    assertEquals(2, document.getAsJsonArray("files").size());
    JsonObject first = document.getAsJsonArray("files").get(0).getAsJsonObject();
    assertEquals(good.toString(), first.get("file").getAsString());
    JsonObject system = first.getAsJsonArray("systems").get(0).getAsJsonObject();
    assertEquals("Pools", system.get("system").getAsString());
    assertTrue(
        system.getAsJsonArray("bases").get(0).getAsJsonObject().get("condition").getAsDouble() > 1);
    JsonObject second = document.getAsJsonArray("files").get(1).getAsJsonObject();
    assertEquals(bad.toString(), second.get("file").getAsString());
    JsonObject finding = second.getAsJsonArray("findings").get(0).getAsJsonObject();
    assertEquals("name-unknown", finding.get("id").getAsString());
    assertEquals("error", finding.get("severity").getAsString());
    assertEquals(3, finding.get("line").getAsInt());
  }

  @Test
  void theReportGoesToAFileAndIsTheSameEachTime() throws IOException {
    Path file = Models.twoSystems(folder);
    Path report = folder.resolve("report.json");
    CommandRun run = CommandRun.of("check", file, "--format", "json", "--output", report);
    assertEquals("", run.out());
    assertEquals(CommandRun.of("check", file, "--format", "json").out(), Files.readString(report));
  }

  @Test
  void theSettingsOfTheProjectHold() throws IOException {
    Path file =
        CommandRun.model(
            folder,
            "close.span",
            """
            system Close over t from 0 to 1 {
              state x = 1
              state y = 1
              x' = -x
              y' = -2*y
              basis b at 0 =
                row x = 1, 1
                row y = 1, 1.0001
            }
            """);
    CommandRun loose = CommandRun.of("check", file);
    assertFalse(loose.out().contains("[basis-ill-conditioned]"), loose.out());
    Files.writeString(folder.resolve("spanloom.settings"), "digits.wanted = 13\n");
    CommandRun strict = CommandRun.of("check", file);
    assertTrue(strict.out().contains("close.span:6:"), strict.out());
    assertTrue(strict.out().contains("[basis-ill-conditioned]"), strict.out());
    Path other = Files.writeString(folder.resolve("other"), "digits.wanted = 2\n");
    CommandRun named = CommandRun.of("check", file, "--settings", other);
    assertFalse(named.out().contains("[basis-ill-conditioned]"), named.out());
  }

  @Test
  void aSettingsFileWithAMistakeIsToldOnceForAllFiles() throws IOException {
    Models.drain(folder);
    Models.twoSystems(folder);
    Files.writeString(folder.resolve("spanloom.settings"), "digit.wanted = 5\n");
    CommandRun run = CommandRun.of("check", folder);
    assertEquals(2, run.code());
    run.assertOneMessage("spanloom.settings:1:", "digit.wanted");
  }

  @Test
  void progressIsDrawnOnATerminalOnlyAndTakenAway() {
    ByteArrayOutputStream err = new ByteArrayOutputStream();
    Streams terminal =
        new Streams(
            new ByteArrayOutputStream(), new PrintStream(err, true, StandardCharsets.UTF_8), true);
    long start = System.nanoTime();
    try (TerminalProgress progress = new TerminalProgress(terminal, "checking 1 of 2  a.span")) {
      while (err.size() == 0 && System.nanoTime() - start < 5_000_000_000L) {
        progress.worked(0.5);
        progress.worked(0.1);
        assertFalse(progress.isCancelled());
        Thread.onSpinWait();
      }
    }
    String drawn = err.toString(StandardCharsets.UTF_8);
    assertTrue(drawn.contains("checking 1 of 2  a.span  50 %"), drawn);
    assertTrue(drawn.endsWith(" \r"), drawn);
    assertFalse(drawn.contains("\n"), drawn);
  }

  @Test
  void anEmptyFileIsNoFailure() {
    CommandRun run = CommandRun.of("check", CommandRun.model(folder, "empty.span", ""));
    assertEquals(0, run.code(), run.out());
  }
}
