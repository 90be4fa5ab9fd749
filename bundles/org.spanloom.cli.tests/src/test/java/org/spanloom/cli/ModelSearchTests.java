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
import java.util.List;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class ModelSearchTests {

  @TempDir Path folder;
  private Path project;

  @BeforeEach
  void makeProject() throws IOException {
    project = Files.createDirectories(folder.resolve("project"));
    for (String name :
        List.of("b.span", "a.span", "deep/er/c.span", ".hidden/d.span", "notes.txt")) {
      Path file = project.resolve(name);
      Files.createDirectories(file.getParent());
      Files.createFile(file);
    }
  }

  private List<String> names(ModelSearch search) {
    return search.found().stream().map(f -> project.relativize(f).toString()).toList();
  }

  @Test
  void findsModelsBelowADirectoryInSortedOrderWithoutHiddenFolders() {
    ModelSearch search = ModelSearch.of(List.of(project.toString()));
    assertEquals(List.of("a.span", "b.span", "deep/er/c.span"), names(search));
    assertEquals(List.of(), search.problems());
  }

  @Test
  void listsAFileOnceHoweverOftenItIsNamed() {
    Path b = project.resolve("b.span");
    ModelSearch search =
        ModelSearch.of(List.of(b.toString(), project.toString(), project + "/deep/../b.span"));
    assertEquals(List.of("b.span", "a.span", "deep/er/c.span"), names(search));
  }

  @Test
  void looksIntoAHiddenFolderThatIsNamedItself() {
    assertEquals(
        List.of(".hidden/d.span"),
        names(ModelSearch.of(List.of(project.resolve(".hidden").toString()))));
  }

  @Test
  void takesAFileOfAnyNameThatIsNamedItself() {
    assertEquals(
        List.of("notes.txt"),
        names(ModelSearch.of(List.of(project.resolve("notes.txt").toString()))));
  }

  @Test
  void leavesOutLinksThatLeadOutOfTheDirectory() throws IOException {
    Path outside = Files.createFile(folder.resolve("outside.span"));
    Path outsideFolder = Files.createDirectories(folder.resolve("other"));
    Files.createFile(outsideFolder.resolve("e.span"));
    Files.createSymbolicLink(project.resolve("link.span"), outside);
    Files.createSymbolicLink(project.resolve("linked"), outsideFolder);
    Files.createSymbolicLink(project.resolve("circle"), project);
    assertEquals(
        List.of("a.span", "b.span", "deep/er/c.span"),
        names(ModelSearch.of(List.of(project.toString()))));
  }

  @Test
  void tellsOfALinkThatLeadsNowhere() throws IOException {
    Files.createSymbolicLink(project.resolve("broken.span"), folder.resolve("nothing"));
    ModelSearch search = ModelSearch.of(List.of(project.toString()));
    assertEquals(1, search.problems().size());
    assertTrue(search.problems().getFirst().contains("leads nowhere"));
    assertEquals(3, search.found().size());
  }

  @Test
  void tellsOfADirectoryWithoutModelsAndOfAMissingFile() throws IOException {
    Path empty = Files.createDirectories(folder.resolve("empty"));
    ModelSearch search = ModelSearch.of(List.of(empty.toString(), folder + "/missing"));
    assertEquals(
        List.of(
            empty + ": no model file (*.span) in this directory or below it",
            folder + "/missing: there is no such file or directory"),
        search.problems());
  }
}
