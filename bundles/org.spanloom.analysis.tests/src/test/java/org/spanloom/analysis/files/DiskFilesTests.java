/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.files;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.io.RandomAccessFile;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.spanloom.language.files.FileKey;
import org.spanloom.language.files.ProjectFile;
import org.spanloom.language.files.ProjectFiles;
import org.spanloom.language.model.Model;
import org.spanloom.language.model.ModelReader;
import org.spanloom.language.text.SourceText;

class DiskFilesTests {

  private static final String SECRET = "parameter secret = 42\n";

  @TempDir private Path folder;
  private Path project;

  @BeforeEach
  void makeProject() throws IOException {
    project = folder.resolve("project");
    write(project.resolve("spanloom.settings"), "");
    write(project.resolve("stores/room.span"), "parameter inside = 1\n");
    write(project.resolve("zone.span"), "parameter zone = 2\n");
    write(folder.resolve("secret.span"), SECRET);
    write(folder.resolve("outside/secret.span"), SECRET);
  }

  private static void write(Path file, String text) throws IOException {
    Files.createDirectories(file.getParent());
    Files.writeString(file, text, StandardCharsets.UTF_8);
  }

  private DiskFiles files() {
    return DiskFiles.of(project.resolve("stores/main.span"));
  }

  private ProjectFile read(String path) {
    return files().read(new FileKey(path));
  }

  private String problem(String path) {
    Model model =
        ModelReader.read(
            new SourceText("main.span", "import \"" + path + "\"\n"), files(), () -> false);
    return model.problems().isEmpty() ? "" : model.problems().getFirst().kind().id();
  }

  @Test
  void theProjectIsTheNearestFolderWithSettingsOrADescription() throws IOException {
    assertEquals(new FileKey("stores/main.span"), files().self());
    write(project.resolve("stores/.project"), "<projectDescription/>");
    assertEquals(new FileKey("main.span"), files().self());
    Path lonely = folder.resolve("lonely/deep/main.span");
    write(lonely, "");
    assertEquals(new FileKey("main.span"), DiskFiles.of(lonely).self());
    assertEquals(new FileKey("main.span"), DiskFiles.of(lonely.resolve("../main.span")).self());
  }

  @Test
  void filesOfTheProjectAreRead() throws IOException {
    assertEquals(new ProjectFile.Content("parameter inside = 1\n"), read("stores/room.span"));
    write(project.resolve("marked.span"), "\uFEFFparameter m = 1\n");
    assertEquals(new ProjectFile.Content("parameter m = 1\n"), read("marked.span"));
    assertEquals("", problem("room.span"));
    assertEquals("", problem("../zone.span"));
    assertEquals("", problem("../stores/./room.span"));
  }

  @Test
  void pathsThatLeaveTheProjectAreRefused() {
    for (String path :
        List.of(
            "../../secret.span",
            "../../outside/secret.span",
            "../../project/zone.span",
            folder.resolve("secret.span").toString(),
            "/etc/hosts")) {
      assertEquals("file-outside-project", problem(path), path);
    }
  }

  @Test
  void linksThatLeaveTheProjectAreRefused() throws IOException {
    Files.createSymbolicLink(project.resolve("stores/link.span"), folder.resolve("secret.span"));
    Files.createSymbolicLink(project.resolve("stores/away"), folder.resolve("outside"));
    Files.createSymbolicLink(
        project.resolve("stores/again.span"), project.resolve("stores/link.span"));
    Files.createSymbolicLink(project.resolve("stores/up"), Path.of("../.."));
    for (String path : List.of("link.span", "away/secret.span", "again.span", "up/secret.span")) {
      assertEquals("file-outside-project", problem(path), path);
    }
    // What is not there is not looked for outside either: the names beside it stay unknown.
    assertEquals(new ProjectFile.Missing(List.of()), read("stores/away/secrets.span"));
    Files.createSymbolicLink(project.resolve("stores/good.span"), Path.of("../zone.span"));
    assertEquals("", problem("good.span"));
    Files.createSymbolicLink(project.resolve("stores/round.span"), Path.of("round.span"));
    assertEquals("file-unreadable", problem("round.span"));
    // The project itself may be reached through a link.
    Path other = Files.createSymbolicLink(folder.resolve("other"), project);
    ProjectFiles linked = DiskFiles.of(other.resolve("stores/main.span"));
    assertInstanceOf(ProjectFile.Content.class, linked.read(new FileKey("zone.span")));
  }

  @Test
  void whatIsNoTextHasAReason() throws IOException {
    Files.createDirectories(project.resolve("folder.span"));
    assertEquals(new ProjectFile.Unreadable("it is a folder"), read("folder.span"));
    Files.write(project.resolve("latin.span"), new byte[] {'#', (byte) 0xE9, '\n'});
    assertEquals(
        new ProjectFile.Unreadable("not UTF-8 text, see line 1 (byte 1); save it as UTF-8"),
        read("latin.span"));
    Files.write(project.resolve("zero.span"), new byte[] {'#', '\n', 0});
    assertEquals(
        new ProjectFile.Unreadable("not a text file, there is a zero byte in line 2 (byte 2)"),
        read("zero.span"));
    assertEquals(new ProjectFile.Unreadable("no file can have this name"), read("a\0b"));
  }

  @Test
  void aHugeFileIsNotRead() throws IOException {
    try (RandomAccessFile huge =
        new RandomAccessFile(project.resolve("huge.span").toFile(), "rw")) {
      huge.setLength(1L << 40);
    }
    assertEquals(new ProjectFile.TooLarge(ProjectFiles.SIZE_LIMIT), read("huge.span"));
  }

  @Test
  void aMissingFileNamesItsNeighbours() {
    assertEquals(
        new ProjectFile.Missing(List.of(new FileKey("stores/room.span"))),
        read("stores/rooms.span"));
    assertTrue(
        ModelReader.read(new SourceText("main.span", "import \"rom.span\"\n"), files(), () -> false)
            .problems()
            .getFirst()
            .message()
            .contains("did you mean \"room.span\"?"));
    assertEquals(new ProjectFile.Missing(List.of()), read("nowhere/room.span"));
    assertEquals(new ProjectFile.Missing(List.of()), read("zone.span/room.span"));
  }
}
