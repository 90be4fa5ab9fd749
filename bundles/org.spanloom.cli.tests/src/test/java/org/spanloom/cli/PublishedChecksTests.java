/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Set;
import java.util.TreeSet;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Published values, from model text to printed numbers, each by the command line's own road. */
class PublishedChecksTests {

  @TempDir static Path folder;

  private static final Set<String> REACHED = new TreeSet<>();

  static List<PublishedCheck> checks() {
    return PublishedCheck.all();
  }

  @BeforeAll
  static void layOutModels() throws IOException {
    Set<String> models = new HashSet<>();
    for (PublishedCheck check : checks()) {
      String name = check.model() + ".span";
      if (models.add(name)) {
        Files.writeString(folder.resolve(name), PublishedCheck.resource(name));
      }
    }
  }

  @ParameterizedTest
  @MethodSource("checks")
  void theCommandLineReproduces(PublishedCheck check) {
    List<String> arguments = new ArrayList<>(check.command());
    arguments.add(1, folder.resolve(check.model() + ".span").toString());
    CommandRun run = CommandRun.of(arguments.toArray(String[]::new));
    assertEquals(0, run.code(), run::err);
    double value = new PrintedResult(run).quantity(check.quantity());
    double error = Math.abs(value - check.value()) / Math.abs(check.value());
    double digits = error == 0 ? 16 : Math.min(16, -Math.log10(error));
    REACHED.add(
        String.format(
            Locale.ROOT,
            "%-4s %-34s %24.17g  %4.1f of %2d digits  %-4s  %s",
            check.id(),
            check.quantity(),
            value,
            digits,
            check.digits(),
            check.provenance(),
            check.source()));
    assertTrue(
        digits >= check.digits(),
        () ->
            String.format(
                Locale.ROOT,
                "%s: %s = %s, published %s: %.1f digits of %d (%s)",
                check.id(),
                check.quantity(),
                value,
                check.value(),
                digits,
                check.digits(),
                check.source()));
  }

  @Test
  void theTableIsLongEnoughAndNamesEachValueOnce() {
    List<PublishedCheck> checks = checks();
    assertTrue(checks.size() >= 60, () -> "only " + checks.size());
    assertEquals(checks.size(), checks.stream().map(PublishedCheck::id).distinct().count());
    assertTrue(checks.stream().noneMatch(c -> c.source().isBlank() || c.provenance().isBlank()));
  }

  @AfterAll
  static void printWhatWasReached() {
    System.out.println("Published values through the command line:");
    REACHED.forEach(System.out::println);
  }
}
