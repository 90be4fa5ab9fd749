/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.google.gson.JsonArray;
import com.google.gson.JsonElement;
import com.google.gson.JsonObject;
import com.google.gson.JsonParser;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

/** The example projects say in their README what {@code check} prints; this holds them to it. */
class ExampleProjectsTests {

  private static final Path EXAMPLES = Path.of("..", "..", "examples");
  private static final Path CLEAN = EXAMPLES.resolve("marrow-skerry");
  private static final Path FAULTS = EXAMPLES.resolve("marrow-skerry-faults");

  /** A row like {@code | `pole.span` | 11 | error | `coefficient-undefined` | ... |}. */
  private static final Pattern ROW =
      Pattern.compile("^\\| `([^`]+\\.span)` \\| (\\d+) \\| (\\w+) \\| `([a-z-]+)` \\|.*");

  private static List<String> promised(Path project) throws IOException {
    List<String> promised = new ArrayList<>();
    for (String line : Files.readAllLines(project.resolve("README.md"))) {
      Matcher row = ROW.matcher(line);
      if (row.matches()) {
        promised.add(String.join(" ", row.group(1), row.group(2), row.group(3), row.group(4)));
      }
    }
    return promised.stream().sorted().toList();
  }

  private static List<String> found(JsonObject report) {
    List<String> found = new ArrayList<>();
    for (JsonElement file : report.getAsJsonArray("files")) {
      String name =
          Path.of(file.getAsJsonObject().get("file").getAsString()).getFileName().toString();
      for (JsonElement element : file.getAsJsonObject().getAsJsonArray("findings")) {
        JsonObject finding = element.getAsJsonObject();
        if (!finding.get("severity").getAsString().equals("note")) {
          found.add(
              String.join(
                  " ",
                  name,
                  finding.get("line").getAsString(),
                  finding.get("severity").getAsString(),
                  finding.get("id").getAsString()));
        }
      }
    }
    return found.stream().sorted().toList();
  }

  private static JsonObject report(Path project, int code) {
    CommandRun run = CommandRun.of("check", project, "--format", "json");
    assertEquals("", run.err());
    assertEquals(code, run.code(), run.out());
    return JsonParser.parseString(run.out()).getAsJsonObject();
  }

  @Test
  void theLargeModelIsClean() {
    JsonObject report = report(EXAMPLES.resolve("marrow-skerry-large"), 0);
    assertEquals(List.of(), found(report));
  }

  @Test
  void theCleanProjectIsCleanAndItsRequirementsHold() throws IOException {
    JsonObject report = report(CLEAN, 0);
    assertEquals(promised(CLEAN), found(report));
    int requirements = 0;
    int bases = 0;
    for (JsonElement file : report.getAsJsonArray("files")) {
      for (JsonElement system : file.getAsJsonObject().getAsJsonArray("systems")) {
        JsonArray results = system.getAsJsonObject().getAsJsonArray("requirements");
        for (JsonElement result : results) {
          assertEquals(
              "held", result.getAsJsonObject().get("status").getAsString(), result::toString);
        }
        requirements += results.size();
        bases += system.getAsJsonObject().getAsJsonArray("bases").size();
      }
    }
    assertTrue(requirements >= 20, "only " + requirements);
    assertTrue(bases >= 8, "only " + bases);
  }

  @Test
  void eachDeliberateFaultIsFoundAtItsLineAndNothingElse() throws IOException {
    List<String> promised = promised(FAULTS);
    assertTrue(promised.size() >= 7, promised::toString);
    assertEquals(promised, found(report(FAULTS, 1)));
  }

  @Test
  void everyFileOfTheFaultsHasOneAndEveryFileSaysThatItIsInvented() throws IOException {
    List<String> files = new ArrayList<>();
    for (Path project : List.of(CLEAN, FAULTS)) {
      try (Stream<Path> list = Files.list(project)) {
        for (Path file : list.filter(f -> f.toString().endsWith(".span")).sorted().toList()) {
          assertTrue(Files.readString(file).contains("invented"), file.toString());
          if (project.equals(FAULTS)) {
            files.add(file.getFileName().toString());
          }
        }
      }
      for (String part : List.of(".project", "spanloom.settings", "README.md")) {
        assertTrue(Files.exists(project.resolve(part)), project + " lacks " + part);
      }
    }
    List<String> promised =
        promised(FAULTS).stream().map(p -> p.substring(0, p.indexOf(' '))).distinct().toList();
    assertEquals(files, promised);
  }

  @Test
  void theExamplesOfTheReadmeRun() throws IOException {
    CommandRun solve =
        CommandRun.of(
            "solve", CLEAN.resolve("cold-store.span"), "--initial", "warm", "--points", "5");
    assertEquals(0, solve.code(), solve.err());
    assertEquals(5, new PrintedResult(solve).rows().size());
    CommandRun basis =
        CommandRun.of(
            "basis", CLEAN.resolve("hut-supply.span"), "--system", "SupplyOff", "--at", "0,1,5");
    assertEquals(0, basis.code(), basis.err());
    assertEquals(6, new PrintedResult(basis).rows().size());
  }
}
