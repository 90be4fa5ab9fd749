/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.concurrent.TimeUnit;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import org.junit.jupiter.api.io.TempDir;

/** What only a process of its own can show: exit codes, closed pipes, signals. */
@Timeout(60)
class WholeProcessTests {

  @TempDir Path folder;

  private static Process start(ProcessBuilder.Redirect err, Object... arguments)
      throws IOException {
    List<String> command = new ArrayList<>();
    command.add(Path.of(System.getProperty("java.home"), "bin", "java").toString());
    command.addAll(List.of("-XX:+UseSerialGC", "-XX:TieredStopAtLevel=1"));
    command.addAll(List.of("-cp", System.getProperty("java.class.path"), Main.class.getName()));
    Arrays.stream(arguments).map(Object::toString).forEach(command::add);
    return new ProcessBuilder(command).redirectError(err).start();
  }

  private CommandRun run(Object... arguments) throws Exception {
    Path err = Files.createTempFile(folder, "err", "");
    Process process = start(ProcessBuilder.Redirect.to(err.toFile()), arguments);
    process.getOutputStream().close();
    String out;
    try (InputStream in = process.getInputStream()) {
      out = new String(in.readAllBytes(), StandardCharsets.UTF_8);
    }
    return new CommandRun(process.waitFor(), out, Files.readString(err));
  }

  @Test
  void theExitCodesAreThoseOfTheContract() throws Exception {
    Path good = Models.drain(folder);
    assertEquals(0, run("check", good).code());
    Path bad = CommandRun.model(folder, "bad.span", "system S over t {\n  x' = 1\n}\n");
    assertEquals(1, run("check", bad).code());
    run("check", folder.resolve("missing.span")).assertRefused("missing.span");
  }

  @Test
  void aProcessPrintsTheSameBytesAsARunInside() throws Exception {
    Path file = Models.twoSystems(folder);
    Object[] arguments = {"solve", file, "--system", "Swing", "--initial", "pulled"};
    assertEquals(CommandRun.of(arguments), run(arguments));
  }

  @Test
  void aReaderThatStopsReadingGetsNoStackTrace() throws Exception {
    Path err = folder.resolve("err");
    Process process =
        start(
            ProcessBuilder.Redirect.to(err.toFile()),
            "solve",
            Models.drain(folder),
            "--points",
            "100000");
    try (InputStream in = process.getInputStream()) {
      assertEquals(100, in.readNBytes(100).length);
    }
    int code = process.waitFor();
    new CommandRun(code, "", Files.readString(err)).assertRefused("standard output");
  }

  @Test
  void anInterruptedRunLeavesNoFileBehind() throws Exception {
    Path target = folder.resolve("out.csv");
    Process process =
        start(
            ProcessBuilder.Redirect.DISCARD,
            "solve",
            Models.drain(folder),
            "--points",
            "300000",
            "--output",
            target);
    long deadline = System.nanoTime() + TimeUnit.SECONDS.toNanos(30);
    boolean ended = false;
    while (!ended && System.nanoTime() < deadline && parts() == 0) {
      ended = process.waitFor(5, TimeUnit.MILLISECONDS);
    }
    assertTrue(parts() > 0, "the run should have begun to write");
    // On this kind of system destroy sends the signal that asks a process to end.
    process.destroy();
    process.waitFor();
    assertEquals(0, parts());
    assertFalse(Files.exists(target));
  }

  private long parts() throws IOException {
    try (Stream<Path> files = Files.list(folder)) {
      return files.filter(f -> f.toString().endsWith(".part")).count();
    }
  }
}
