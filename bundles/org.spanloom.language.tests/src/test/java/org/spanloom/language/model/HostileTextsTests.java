/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import static org.junit.jupiter.api.Assertions.assertAll;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Set;
import java.util.concurrent.TimeUnit;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * Texts made to cost time or memory are read by a virtual machine of its own with 512 MB: each gets
 * its answer, and none takes long. What is needed on a machine at rest is less than 2 s for each;
 * the bound here leaves room for one that is busy.
 */
class HostileTextsTests {

  private static final double MOST_SECONDS = 10;

  /** Texts with nothing wrong in them but their size. */
  private static final Set<String> SOUND = Set.of("bases", "jumps, many");

  @Test
  void everyHostileTextIsAnsweredSoonInLittleMemory(@TempDir Path folder)
      throws IOException, InterruptedException {
    Path out = folder.resolve("answers.txt");
    Process reading =
        new ProcessBuilder(
                Path.of(System.getProperty("java.home"), "bin", "java").toString(),
                "-Xmx512m",
                "-XX:+UseSerialGC",
                "-XX:TieredStopAtLevel=1",
                "-Dfile.encoding=UTF-8",
                "-Dstdout.encoding=UTF-8",
                "-cp",
                System.getProperty("java.class.path"),
                HostileReading.class.getName())
            .redirectErrorStream(true)
            .redirectOutput(out.toFile())
            .start();
    boolean ended = reading.waitFor(10, TimeUnit.MINUTES);
    reading.destroyForcibly();
    List<String> answers = Files.readAllLines(out);
    assertTrue(ended, () -> "stopped behind: " + (answers.isEmpty() ? "" : answers.getLast()));
    assertEquals(
        List.copyOf(HostileTexts.all().keySet()),
        answers.stream().map(a -> a.substring(0, Math.max(0, a.indexOf('\t')))).toList(),
        () -> String.join("\n", answers));
    Stream<String> lines = answers.stream();
    assertAll(lines.map(answer -> () -> check(answer)));
  }

  /** Checks one line: name, seconds for reading, seconds for editing, problems, first message. */
  private static void check(String answer) {
    String[] parts = answer.split("\t", 5);
    assertFalse(parts[1].equals("failed"), answer);
    assertTrue(Double.parseDouble(parts[1]) < MOST_SECONDS, answer);
    assertTrue(Double.parseDouble(parts[2]) < MOST_SECONDS, answer);
    assertEquals(SOUND.contains(parts[0]), parts[3].equals("0"), answer);
  }
}
