/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.workspace.tests;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import org.eclipse.core.resources.IProject;
import org.eclipse.core.resources.ResourcesPlugin;
import org.eclipse.core.runtime.CoreException;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.spanloom.workspace.HeadlessCheck;

/** The check of a directory without a screen. */
class HeadlessCheckTests {

  private static final String DESCRIPTION =
      """
      <?xml version="1.0" encoding="UTF-8"?>
      <projectDescription>
        <name>NAME</name>
        <buildSpec>
          <buildCommand><name>org.spanloom.workspace.builder</name></buildCommand>
        </buildSpec>
        <natures><nature>org.spanloom.workspace.nature</nature></natures>
      </projectDescription>
      """;

  private static final String SOUND =
      """
      system Buoy over t [s] from 0 to 2 {
        state x = 1
        x' = -2 [1/s]*x
      }
      """;

  @TempDir Path directory;

  private final ByteArrayOutputStream out = new ByteArrayOutputStream();
  private final ByteArrayOutputStream err = new ByteArrayOutputStream();

  @AfterEach
  void forgetProjects() throws CoreException {
    for (IProject project : ResourcesPlugin.getWorkspace().getRoot().getProjects()) {
      project.delete(false, true, null);
    }
  }

  private int check(Path place) {
    return HeadlessCheck.run(
        place,
        new PrintStream(out, true, StandardCharsets.UTF_8),
        new PrintStream(err, true, StandardCharsets.UTF_8));
  }

  private String printed() {
    return out.toString(StandardCharsets.UTF_8);
  }

  @Test
  void aCleanDirectoryGives0() throws IOException {
    Files.writeString(directory.resolve("buoy.span"), SOUND);
    assertEquals(0, check(directory), this::printed);
    assertTrue(printed().endsWith("1 project(s), 0 error(s)" + System.lineSeparator()), printed());
  }

  @Test
  void anErrorGives1AndItsLine() throws IOException {
    Files.writeString(directory.resolve("buoy.span"), SOUND.replace("*x", "*y"));
    assertEquals(1, check(directory), this::printed);
    assertTrue(printed().contains("buoy.span:3: error name-unknown:"), printed());
  }

  @Test
  void opensEveryProjectBelowWhereItStands() throws IOException {
    for (String name : new String[] {"alpha", "beta"}) {
      Path place = Files.createDirectories(directory.resolve(name));
      Files.writeString(place.resolve(".project"), DESCRIPTION.replace("NAME", name));
      Files.writeString(place.resolve("buoy.span"), SOUND);
    }
    assertEquals(0, check(directory), this::printed);
    assertTrue(printed().contains("2 project(s)"), printed());
    IProject alpha = ResourcesPlugin.getWorkspace().getRoot().getProject("alpha");
    assertEquals(
        directory.resolve("alpha").toRealPath(), alpha.getLocation().toPath().toRealPath());
    assertFalse(Files.exists(directory.resolve(".project")), "the directory itself is no project");
  }

  @Test
  void opensTheSameDirectoryTwice() throws IOException {
    Files.writeString(directory.resolve("buoy.span"), SOUND);
    assertEquals(0, check(directory));
    assertEquals(0, check(directory));
    assertEquals(1, ResourcesPlugin.getWorkspace().getRoot().getProjects().length);
  }

  @Test
  void aDirectoryThatIsNotThereGives2AndAMessage() {
    assertEquals(2, check(directory.resolve("nowhere")));
    assertTrue(
        err.toString(StandardCharsets.UTF_8).contains("is not a directory that can be read"),
        () -> err.toString(StandardCharsets.UTF_8));
  }
}
