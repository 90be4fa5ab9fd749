/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.files;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;

import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.spanloom.language.files.FileKey.Resolved;

class FileKeyTests {

  private static final FileKey MODEL = new FileKey("stores/cold/room.span");

  @ParameterizedTest
  @CsvSource({
    "zone.span, stores/cold/zone.span",
    "./zone.span, stores/cold/zone.span",
    "../zone.span, stores/zone.span",
    "../../zone.span, zone.span",
    "../warm/../zone.span, stores/zone.span",
    "data/outside air.csv, stores/cold/data/outside air.csv",
    "..zone.span, stores/cold/..zone.span"
  })
  void aPathIsRelativeToTheFolderOfTheFileThatNamesIt(String text, String path) {
    assertEquals(new Resolved.Inside(new FileKey(path)), MODEL.resolve(text));
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "../../../zone.span",
        "../../../stores/zone.span",
        "a/../../../../zone.span",
        "/etc/hosts",
        "//server/share/zone.span",
        "C:/zone.span",
        "c:zone.span"
      })
  void aPathNeverLeavesTheProject(String text) {
    assertEquals(new Resolved.Outside(), MODEL.resolve(text));
  }

  @Test
  void whatIsNoPathHasAReason() {
    assertEquals(new Resolved.Malformed("is empty"), MODEL.resolve("  "));
    assertEquals(new Resolved.Malformed("names no file"), MODEL.resolve("../.."));
    assertEquals(new Resolved.Malformed("holds an empty name"), MODEL.resolve("a//b"));
    assertEquals(new Resolved.Malformed("holds an empty name"), MODEL.resolve("a/"));
    assertEquals(
        new Resolved.Malformed("holds \"\\\": names of folders end in \"/\""),
        MODEL.resolve("..\\zone.span"));
    assertEquals(
        new Resolved.Malformed("holds a character that cannot be seen"), MODEL.resolve("a\0b"));
    assertInstanceOf(Resolved.Malformed.class, MODEL.resolve("a".repeat(1001)));
    assertInstanceOf(Resolved.Inside.class, MODEL.resolve("a".repeat(1000)));
  }

  @Test
  void aPathIsWrittenSoThatItResolvesToItsFile() {
    for (String path :
        List.of("zone.span", "stores/zone.span", "stores/cold/zone.span", "a/b/c.span")) {
      FileKey other = new FileKey(path);
      assertEquals(new Resolved.Inside(other), MODEL.resolve(MODEL.relative(other)));
    }
    assertEquals("../zone.span", MODEL.relative(new FileKey("stores/zone.span")));
  }

  @Test
  void aProjectInMemoryNamesTheOtherFilesOfAFolder() {
    TextFiles files = new TextFiles("a.span", Map.of("b.span", "B", "c.span", "C", "d/e.span", ""));
    assertEquals(new ProjectFile.Content("B"), files.read(new FileKey("b.span")));
    assertEquals(
        new ProjectFile.Missing(List.of(new FileKey("b.span"), new FileKey("c.span"))),
        files.read(new FileKey("x.span")));
    assertEquals(
        new ProjectFile.Missing(List.of(new FileKey("d/e.span"))),
        files.read(new FileKey("d/x.span")));
  }
}
