/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.editing;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;
import org.junit.jupiter.api.Test;
import org.spanloom.language.files.FileKey;
import org.spanloom.language.problem.TextEdit;
import org.spanloom.language.syntax.Parser;
import org.spanloom.language.syntax.SyntaxFile;
import org.spanloom.language.text.SourceText;

/** Names that lead from one file into another. */
class ProjectRenameTests {

  private static final FileKey ZONE = new FileKey("parts/zone.span");
  private static final FileKey STORE = new FileKey("store.span");
  private static final FileKey OTHER = new FileKey("other.span");

  private static final Map<FileKey, String> TEXTS = texts();

  private static Map<FileKey, String> texts() {
    Map<FileKey, String> texts = new LinkedHashMap<>();
    texts.put(
        ZONE,
        """
        parameter density = 1.2
        system Zone over t from 0 to 1 {
          input side(t) = 1
          state T = 1
          T' = side(t) - density*T
        }
        """);
    texts.put(
        STORE,
        """
        import "parts/zone.span"
        system Store over t from 0 to 1 {
          parameter k = density
          part lower = Zone { side = upper.T; T = 3 }
          part upper = Zone
          output mean = (lower.T + upper.T)/2*k
        }
        """);
    texts.put(
        OTHER,
        """
        parameter density = 2
        system Zone over t from 0 to 1 { state T = density; T' = -T }
        """);
    return texts;
  }

  private static ProjectNames project() {
    Map<FileKey, SyntaxFile> files = new LinkedHashMap<>();
    TEXTS.forEach((key, text) -> files.put(key, Parser.parse(new SourceText(key.path(), text))));
    return ProjectNames.of(files);
  }

  /** Returns the lines that a renaming changes, with their files. */
  private static String changed(FileKey file, String before, String newName) {
    int offset = TEXTS.get(file).indexOf(before) + before.length();
    return switch (Rename.at(project(), file, offset, newName)) {
      case Renaming.Changes changes ->
          TEXTS.keySet().stream()
              .flatMap(key -> {
                List<TextEdit> edits = changes.edits().getOrDefault(key, List.of());
                List<String> old = TEXTS.get(key).lines().toList();
                List<String> now = TextEdit.apply(TEXTS.get(key), edits).lines().toList();
                return java.util.stream.IntStream.range(0, old.size())
                    .filter(i -> !old.get(i).equals(now.get(i)))
                    .mapToObj(i -> key.path() + ": " + now.get(i).strip() + "\n");
              })
              .collect(Collectors.joining());
      case Renaming.Refused refused ->
          refused.conflicts().getFirst().file().path()
              + ": "
              + refused.conflicts().getFirst().message();
      case Renaming.NothingToRename nothing -> "nothing";
    };
  }

  @Test
  void aStateOfAPartIsRenamedWhereItIsDeclaredAndUsed() {
    assertEquals(
        """
        parts/zone.span: state warmth = 1
        parts/zone.span: warmth' = side(t) - density*warmth
        store.span: part lower = Zone { side = upper.warmth; warmth = 3 }
        store.span: output mean = (lower.warmth + upper.warmth)/2*k
        """,
        changed(STORE, "(lower.", "warmth"));
  }

  @Test
  void whatAnImportBringsIsRenamedInBothFilesAndNoOther() {
    assertEquals(
        """
        parts/zone.span: parameter weight = 1.2
        parts/zone.span: T' = side(t) - weight*T
        store.span: parameter k = weight
        """,
        changed(ZONE, "parameter ", "weight"));
    assertEquals(
        """
        parts/zone.span: system Room over t from 0 to 1 {
        store.span: part lower = Room { side = upper.T; T = 3 }
        store.span: part upper = Room
        """,
        changed(STORE, "lower = ", "Room"));
    assertEquals(
        """
        other.span: parameter weight = 2
        other.span: system Zone over t from 0 to 1 { state T = weight; T' = -T }
        """,
        changed(OTHER, "parameter ", "weight"));
  }

  @Test
  void aPartIsRenamedInItsSystem() {
    assertEquals(
        """
        store.span: part lower = Zone { side = top.T; T = 3 }
        store.span: part top = Zone
        store.span: output mean = (lower.T + top.T)/2*k
        """,
        changed(STORE, "side = ", "top"));
  }

  @Test
  void aNameOfAnImportingFileStandsInTheWay() {
    assertEquals(
        "store.span: \"k\" is declared in line 3 of store.span: choose another name.",
        changed(ZONE, "parameter ", "k"));
    assertEquals(
        "parts/zone.span: \"density\" is declared in line 1 of parts/zone.span: choose another"
            + " name.",
        changed(STORE, "part ", "density"));
  }
}
