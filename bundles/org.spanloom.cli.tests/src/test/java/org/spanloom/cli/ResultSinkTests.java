/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.PosixFilePermissions;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class ResultSinkTests {

  @TempDir Path folder;

  private List<String> files() throws IOException {
    try (Stream<Path> files = Files.list(folder)) {
      return files.map(f -> f.getFileName().toString()).sorted().toList();
    }
  }

  @Test
  void aFileAppearsWholeAndOnlyThen() throws Exception {
    Path target = folder.resolve("result.csv");
    try (ResultSink sink = ResultSink.file(target.toString(), Optional.empty())) {
      sink.write("one\n");
      sink.flush();
      assertFalse(Files.exists(target));
      sink.write("two\n");
      sink.commit();
    }
    assertEquals("one\ntwo\n", Files.readString(target));
    assertEquals(List.of("result.csv"), files());
  }

  @Test
  void withoutCommitTheOldFileStaysAndNothingElse() throws Exception {
    Path target = Files.writeString(folder.resolve("result.csv"), "old");
    try (ResultSink sink = ResultSink.file(target.toString(), Optional.empty())) {
      sink.write("new");
    }
    assertEquals("old", Files.readString(target));
    assertEquals(List.of("result.csv"), files());
  }

  @Test
  void aReplacedFileKeepsItsPermissionsAndALinkStaysALink() throws Exception {
    Path target = Files.writeString(folder.resolve("real.csv"), "old");
    Files.setPosixFilePermissions(target, PosixFilePermissions.fromString("rw-rw-r--"));
    Path link = Files.createSymbolicLink(folder.resolve("link.csv"), target);
    try (ResultSink sink = ResultSink.file(link.toString(), Optional.empty())) {
      sink.write("new");
      sink.commit();
    }
    assertEquals("new", Files.readString(target));
    assertTrue(Files.isSymbolicLink(link));
    assertEquals("rw-rw-r--", PosixFilePermissions.toString(Files.getPosixFilePermissions(target)));
  }

  @Test
  void aDeviceStaysADevice() throws Exception {
    Path device = Path.of("/dev/null");
    try (ResultSink sink = ResultSink.file(device.toString(), Optional.empty())) {
      sink.write("gone");
      sink.commit();
    }
    assertTrue(Files.exists(device) && !Files.isRegularFile(device));
  }

  @Test
  void refusesTheModelItselfADirectoryAndAMissingFolder() throws Exception {
    Path model = Files.writeString(folder.resolve("model"), "");
    assertMessage("this is the model", model.toString(), Optional.of(model));
    assertMessage("the name of a model", folder + "/new.span", Optional.of(model));
    assertMessage("name a file", folder.toString(), Optional.empty());
    assertMessage("name a file", "", Optional.empty());
    assertMessage(
        "there is no such file or directory", folder + "/missing/x.csv", Optional.empty());
  }

  private static void assertMessage(String part, String name, Optional<Path> input) {
    CommandFailure failure =
        assertThrows(CommandFailure.class, () -> ResultSink.file(name, input).close());
    assertEquals(2, failure.exitCode());
    assertTrue(failure.getMessage().contains(part), failure.getMessage());
  }
}
