/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.OutputStream;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;

/**
 * One run of the command line.
 *
 * @param code exit code
 * @param out what came on standard output
 * @param err what came on standard error
 */
record CommandRun(int code, String out, String err) {

  /** Runs the command line. */
  static CommandRun of(String... arguments) {
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    CommandRun run = into(out, arguments);
    return new CommandRun(run.code(), out.toString(StandardCharsets.UTF_8), run.err());
  }

  /** Runs the command line with a standard output of the test's own. */
  static CommandRun into(OutputStream out, String... arguments) {
    ByteArrayOutputStream err = new ByteArrayOutputStream();
    int code =
        Main.run(
            arguments, new Streams(out, new PrintStream(err, true, StandardCharsets.UTF_8), false));
    return new CommandRun(code, "", err.toString(StandardCharsets.UTF_8));
  }

  /** Runs the command line with paths among the arguments. */
  static CommandRun of(Object... arguments) {
    return of(Arrays.stream(arguments).map(Object::toString).toArray(String[]::new));
  }

  /** Writes a model file. */
  static Path model(Path folder, String name, String text) {
    try {
      return Files.writeString(folder.resolve(name), text);
    } catch (IOException e) {
      throw new AssertionError(e);
    }
  }

  /**
   * Expects the refusal that bad input gets: exit code 2, nothing on standard output, one line that
   * says why.
   */
  void assertRefused(String... parts) {
    assertEquals(2, code, this::toString);
    assertEquals("", out);
    assertOneMessage(parts);
  }

  /**
   * Expects one line on standard error that holds some texts, and no trace of the program's inside.
   */
  void assertOneMessage(String... parts) {
    assertEquals(1, err.lines().count(), err);
    assertTrue(err.startsWith("spanloom: ") && err.endsWith("\n"), err);
    for (String part : parts) {
      assertTrue(err.contains(part), () -> "'" + part + "' is not in: " + err);
    }
    assertFalse(err.contains("internal error") || err.contains("Exception"), err);
  }
}
