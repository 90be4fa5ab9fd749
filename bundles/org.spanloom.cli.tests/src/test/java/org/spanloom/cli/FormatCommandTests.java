/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class FormatCommandTests {

  private static final String UNTIDY =
      "system Well over t [h] {\nstate level [m]=2\n  level'=-level/3[h]\n}";

  private static final String TIDY =
      """
      system Well over t [h] {
        state level [m] = 2
        level' = -level/3 [h]
      }
      """;

  @TempDir Path folder;

  private static String text(Path file) throws IOException {
    return Files.readString(file);
  }

  @Test
  void filesGetTheLayoutAndAreListed() throws IOException {
    Path untidy = CommandRun.model(folder, "a.span", UNTIDY);
    Path tidy = CommandRun.model(folder, "b.span", TIDY);
    CommandRun run = CommandRun.of("format", folder);
    assertEquals(new CommandRun(0, "formatted: " + untidy + "\n", ""), run);
    assertEquals(TIDY, text(untidy));
    assertEquals(TIDY, text(tidy));
    assertEquals(new CommandRun(0, "", ""), CommandRun.of("format", folder));
    try (Stream<Path> left = Files.list(folder)) {
      assertEquals(2, left.count(), "nothing else is left behind");
    }
  }

  @Test
  void checkChangesNothingAndGivesOne() throws IOException {
    Path untidy = CommandRun.model(folder, "a.span", UNTIDY);
    CommandRun.model(folder, "b.span", TIDY);
    CommandRun run = CommandRun.of("format", "--check", folder);
    assertEquals(new CommandRun(1, "not formatted: " + untidy + "\n", ""), run);
    assertEquals(UNTIDY, text(untidy));
    assertEquals(
        new CommandRun(0, "", ""), CommandRun.of("format", folder.resolve("b.span"), "--check"));
  }

  @Test
  void lineEndsAndTheByteOrderMarkStay() throws IOException {
    Path file = CommandRun.model(folder, "a.span", "\uFEFF" + UNTIDY.replace("\n", "\r\n"));
    assertEquals(0, CommandRun.of("format", file).code());
    assertEquals("\uFEFF" + TIDY.replace("\n", "\r\n"), text(file));
  }

  @Test
  void aFileWithAMistakeIsLaidOutAllTheSame() throws IOException {
    Path file = CommandRun.model(folder, "a.span", "system S over t {\nstate x = = 1\nx'=-x\n}\n");
    CommandRun run = CommandRun.of("format", file);
    assertEquals(0, run.code(), run.err());
    assertEquals("system S over t {\n  state x = = 1\n  x' = -x\n}\n", text(file));
  }

  @Test
  void whatIsNoTextStaysAndTheOthersAreDone() throws IOException {
    byte[] binary = {'s', 0, (byte) 0xFF};
    Path bad = Files.write(folder.resolve("a.span"), binary);
    Path good = CommandRun.model(folder, "b.span", UNTIDY);
    CommandRun run = CommandRun.of("format", folder);
    assertEquals(2, run.code());
    run.assertOneMessage("a.span", "not a text file");
    assertTrue(run.out().contains("b.span"), run.out());
    assertEquals(List.of(binary.length), List.of(Files.readAllBytes(bad).length));
    assertEquals(TIDY, text(good));
  }

  @Test
  void wrongArgumentsAreRefused() {
    CommandRun.of(new String[] {"format"}).assertRefused("PATH");
    CommandRun.of("format", folder.resolve("none.span")).assertRefused("none.span", "no such file");
    CommandRun.of("format", folder, "--chek").assertRefused("--chek");
  }

  @Test
  void aLinkedFileIsChangedWhereItStands() throws IOException {
    Path target = folder.resolve("target.txt");
    Files.write(target, UNTIDY.getBytes(StandardCharsets.UTF_8));
    Path link = Files.createSymbolicLink(folder.resolve("link.span"), target);
    assertEquals(0, CommandRun.of("format", link).code());
    assertTrue(Files.isSymbolicLink(link));
    assertEquals(TIDY, text(target));
  }

  @Test
  void theExamplesHaveTheLayout() {
    Path examples = Path.of("..", "..", "examples");
    assertEquals(new CommandRun(0, "", ""), CommandRun.of("format", "--check", examples));
    Path templates = Path.of("..", "org.spanloom.ui", "templates");
    assertEquals(new CommandRun(0, "", ""), CommandRun.of("format", "--check", templates));
  }
}
