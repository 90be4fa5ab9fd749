/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.formatting;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.spanloom.language.problem.TextEdit;
import org.spanloom.language.syntax.Parser;
import org.spanloom.language.text.SourceText;

class FormatterTests {

  private static String resource(String name) {
    try (InputStream stream =
        FormatterTests.class.getResourceAsStream("/org/spanloom/language/layouts/" + name)) {
      return new String(stream.readAllBytes(), StandardCharsets.UTF_8);
    } catch (IOException e) {
      throw new IllegalStateException(e);
    }
  }

  private static List<TextEdit> edits(String text) {
    return Formatter.edits(Parser.parse(new SourceText("test.span", text)));
  }

  @ParameterizedTest
  @ValueSource(strings = {"declarations", "rows", "matrices", "lines", "blocks", "mistakes"})
  void aTextGetsItsLayoutAndKeepsIt(String name) {
    String expected = resource(name + ".output");
    assertEquals(expected, Formatter.format(resource(name + ".input")));
    assertEquals(List.of(), edits(expected));
  }

  static List<Path> examples() throws IOException {
    try (Stream<Path> files = Files.walk(Path.of("..", "..", "examples"))) {
      return files.filter(f -> f.toString().endsWith(".span")).sorted().toList();
    }
  }

  /** With all blanks doubled, tabs for indentation and blank lines added, a text finds back. */
  @ParameterizedTest
  @MethodSource("examples")
  void anExampleFindsBackToItsLayout(Path file) throws IOException {
    String text = Files.readString(file);
    assertEquals(List.of(), edits(text));
    StringBuilder untidy = new StringBuilder("\n");
    for (String line : text.lines().toList()) {
      String code = line.strip();
      boolean comment = code.contains("#");
      untidy.append("\t".repeat((line.length() - line.stripLeading().length()) / 2));
      untidy.append(comment ? code : code.replace(" ", "  ")).append(" \n");
      untidy.append(code.isEmpty() ? "\n" : "");
    }
    assertEquals(text, Formatter.format(untidy.toString()));
  }

  @ParameterizedTest
  @MethodSource("examples")
  void onlyWhiteSpaceChanges(Path file) throws IOException {
    String untidy = Files.readString(file).replace("  ", " ").replace(" = ", "=");
    List<TextEdit> edits = edits(untidy);
    assertFalse(edits.isEmpty());
    int last = 0;
    for (TextEdit edit : edits) {
      String replaced = untidy.substring(edit.span().start(), edit.span().end());
      assertTrue(edit.replacement().isBlank() && replaced.isBlank(), edit.toString());
      assertTrue(edit.span().start() >= last, "the edits are not in the order of the text");
      last = edit.span().end();
    }
  }

  @Test
  void anEditTouchesNoMoreThanWhatDiffers() {
    List<TextEdit> edits = edits("system S over t {\n  state x =  1\n  x' = -x\n}\n");
    assertEquals(1, edits.size());
    assertEquals(1, edits.getFirst().span().length());
    assertEquals("", edits.getFirst().replacement());
  }

  @Test
  void aLongerNameMovesOnlyTheLinesBesideIt() {
    String text =
        """
        system S over t {
          parameter a = 1                              ## one
          parameter b = 2

          parameter c = 3                              ## three
          state x = 1
          x' = -x
        }
        """;
    String laid = Formatter.format(text.replace("b = 2", "longer = 2"));
    assertEquals(text.replace("a = 1     ", "a      = 1").replace("b = 2", "longer = 2"), laid);
  }

  @ParameterizedTest
  @ValueSource(strings = {"", "\n\n", " \t\r\n "})
  void whatHoldsNothingBecomesEmpty(String text) {
    assertEquals("", Formatter.format(text));
  }

  /** Bounded work and growth, however wrong a text is. */
  @Test
  void hostileTextsEndSoon() {
    List<String> texts =
        List.of(
            "{".repeat(200_000),
            "{\n".repeat(100_000),
            "}".repeat(200_000),
            "let a = " + "(".repeat(500_000),
            "row x = " + "1,".repeat(200_000),
            ("row a = " + "1, ".repeat(1000) + "1\n").repeat(200),
            "x' = (\n  ".repeat(50_000),
            "\n".repeat(500_000));
    for (String text : texts) {
      long start = System.nanoTime();
      String laid = Formatter.format(text);
      double seconds = (System.nanoTime() - start) / 1e9;
      String shown = text.substring(0, 10);
      assertTrue(seconds < 20, seconds + " s for " + shown);
      assertTrue(laid.length() < 50L * text.length(), shown);
    }
  }
}
