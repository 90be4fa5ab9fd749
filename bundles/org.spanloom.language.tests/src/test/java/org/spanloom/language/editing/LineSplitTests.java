/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.editing;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.spanloom.language.formatting.Formatter;
import org.spanloom.language.problem.Fix;
import org.spanloom.language.problem.TextEdit;
import org.spanloom.language.syntax.Lexer;
import org.spanloom.language.syntax.TokenKind;
import org.spanloom.language.text.SourceText;

class LineSplitTests {

  private static Optional<String> split(String text, String at) {
    Optional<Fix> fix = LineSplit.at(new SourceText("test.span", text), text.indexOf(at));
    return fix.map(f -> TextEdit.apply(text, f.edits()));
  }

  private static List<TokenKind> kinds(String text) {
    return Lexer.lex(text).stream().map(t -> t.kind()).filter(k -> k != TokenKind.NEWLINE).toList();
  }

  @Test
  void aLongSumIsBrokenBehindItsSigns() {
    String text =
        "system S over t {\n"
            + "  heat_capacity*T_room' = conductance_wall*(T_outside - T_room) -"
            + " ventilation*density*(T_room - T_outside) + heating # all of it\n"
            + "}\n";
    String expected =
        "system S over t {\n"
            + "  heat_capacity*T_room' =\n"
            + "      conductance_wall*(T_outside - T_room) - ventilation*density*(T_room -"
            + " T_outside) + heating # all of it\n"
            + "}\n";
    assertEquals(Optional.of(expected), split(text, "T_room'"));
    assertEquals(kinds(text), kinds(expected));
    assertEquals(kinds(expected), kinds(Formatter.format(expected)));
    assertEquals(Formatter.format(expected), Formatter.format(Formatter.format(expected)));
  }

  @Test
  void aFactorIsBrokenInsideItsParenthesesOnlyWhereNothingElseFits() {
    String text = "let a = (" + "b".repeat(60) + " + " + "c".repeat(60) + ")\n";
    assertEquals(
        Optional.of("let a =\n    (" + "b".repeat(60) + " +\n    " + "c".repeat(60) + ")\n"),
        split(text, "let"));
  }

  @Test
  void aRowOfAMatrixIsBrokenBehindCommas() {
    String text = "matrix K =\n  row " + "12345.678, ".repeat(20) + "1\n";
    String done = split(text, "row").orElseThrow();
    assertTrue(done.lines().allMatch(l -> l.length() <= LineSplit.LONGEST), done);
    assertEquals(kinds(text), kinds(done));
    assertEquals(4, done.lines().count());
  }

  @Test
  void aSignInFrontOfANumberIsNoPlace() {
    String text = "let a = " + "-1234567*-7654321*".repeat(6) + "1\n";
    String done = split(text, "let").orElseThrow();
    assertTrue(done.lines().noneMatch(l -> l.endsWith("-")), done);
    assertEquals(kinds(text), kinds(done));
  }

  @Test
  void whatFitsOrSharesItsLineStays() {
    assertEquals(Optional.empty(), split("let a = 1 + 2\n", "let"));
    String two = "let a = 1; let b = " + "1234567 + ".repeat(12) + "1\n";
    assertEquals(Optional.empty(), split(two, "let b"));
    assertEquals(Optional.empty(), split("let " + "a".repeat(120) + "\n", "let"));
  }
}
