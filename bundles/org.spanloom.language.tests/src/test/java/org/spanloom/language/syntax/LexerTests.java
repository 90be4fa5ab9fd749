/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.syntax;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.Collectors;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.spanloom.language.text.SourceText;

class LexerTests {

  private static String kinds(String text) {
    return Lexer.lex(text).stream()
        .map(t -> t.kind() + "(" + text.substring(t.start(), t.end()) + ")")
        .collect(Collectors.joining(" "));
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      quoteCharacter = '`',
      value = {
        "0.6 [kW/K]*x|NUMBER(0.6) UNIT([kW/K]) TIMES(*) NAME(x)",
        "x[2]|NAME(x) OPEN_BRACKET([) NUMBER(2) CLOSE_BRACKET(])",
        "state q[1..2] [m] = 3|STATEMENT_WORD(state) NAME(q) INDEX_RANGE([1..2]) UNIT([m]) EQUALS(=) NUMBER(3)",
        "state x' [m/s] = 0|STATEMENT_WORD(state) NAME(x) PRIMES(') UNIT([m/s]) EQUALS(=) NUMBER(0)",
        "let k [m] = c[1]|STATEMENT_WORD(let) NAME(k) UNIT([m]) EQUALS(=) NAME(c) OPEN_BRACKET([) NUMBER(1) CLOSE_BRACKET(])",
        "3 [m[H2O]] + 1|NUMBER(3) UNIT([m[H2O]]) PLUS(+) NUMBER(1)",
        "3 [m[H2O] + 1|NUMBER(3) OPEN_UNIT([m[H2O]) PLUS(+) NUMBER(1)",
        "1..400|NUMBER(1) RANGE(..) NUMBER(400)",
        "lower.T|NAME(lower) DOT(.) NAME(T)",
        "1e-3 2E+4 1e 1.5e3x|NUMBER(1e-3) NUMBER(2E+4) BAD_NUMBER(1e) NUMBER(1.5e3) NAME(x)",
        ".5 5. 1.2.3|BAD_NUMBER(.5) BAD_NUMBER(5.) BAD_NUMBER(1.2.3)",
        "0.12 ± 5 %|NUMBER(0.12) PLUS_MINUS(±) NUMBER(5) PERCENT(%)",
        "0.12 +/- 5|NUMBER(0.12) PLUS_MINUS(+/-) NUMBER(5)",
        "a <= b < c >= d > e|NAME(a) AT_MOST(<=) NAME(b) LESS(<) NAME(c) AT_LEAST(>=) NAME(d) GREATER(>) NAME(e)",
        "gut -> blood|NAME(gut) ARROW(->) NAME(blood)",
        "x''' = 1|NAME(x) PRIMES(''') EQUALS(=) NUMBER(1)",
        "require scaled condition(p)|STATEMENT_WORD(require) CONTEXT_WORD(scaled) CONTEXT_WORD(condition) OPEN_PARENTHESIS(() NAME(p) CLOSE_PARENTHESIS())",
        "let period = scale|STATEMENT_WORD(let) NAME(period) EQUALS(=) NAME(scale)",
        "state scale = 1 scale 2|STATEMENT_WORD(state) NAME(scale) EQUALS(=) NUMBER(1) CONTEXT_WORD(scale) NUMBER(2)",
        "initial values values { }|STATEMENT_WORD(initial) CONTEXT_WORD(values) NAME(values) OPEN_BRACE({) CLOSE_BRACE(})",
        "ρ_Luft = 1 # remark|NAME(ρ_Luft) EQUALS(=) NUMBER(1) COMMENT(# remark)",
        "x = 1 ## words|NAME(x) EQUALS(=) NUMBER(1) DOCUMENTATION(## words)",
        "\"a b\" \"c|STRING(\"a b\") OPEN_STRING(\"c)",
        "x §§ y|NAME(x) BAD(§§) NAME(y)",
        "parameter a [m] = 1; parameter b [s] = 2|STATEMENT_WORD(parameter) NAME(a) UNIT([m]) EQUALS(=) NUMBER(1) SEMICOLON(;) STATEMENT_WORD(parameter) NAME(b) UNIT([s]) EQUALS(=) NUMBER(2)"
      })
  void cutsTexts(String text, String expected) {
    assertEquals(expected, kinds(text));
  }

  @Test
  void knowsEveryLineEnd() {
    assertEquals(
        List.of(1, 2, 1),
        Lexer.lex("a\nb\r\nc\r").stream()
            .filter(t -> t.kind() == TokenKind.NEWLINE)
            .map(t -> t.span().length())
            .toList());
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "",
        " \t ",
        "state x [m] = 1 # c\r\nx' = -x/2 [s]\n\n## d\nbasis p at 0 =\n row x = 1",
        "\u0000\uD83D\uDE00 \uDC00 [ [[ \" ' § 3 [m",
        "a\rb\nc\r\nd"
      })
  void everyCharacterIsInOneTokenOrBlank(String text) {
    int at = 0;
    for (Token token : Lexer.lex(text)) {
      assertTrue(token.start() >= at && token.end() > token.start(), token.toString());
      assertTrue(isBlank(text.substring(at, token.start())), token.toString());
      at = token.end();
    }
    assertTrue(isBlank(text.substring(at)));
  }

  private static boolean isBlank(String text) {
    return text.chars().allMatch(c -> c == ' ' || c == '\t');
  }

  @Test
  void lineByLineGivesTheSameTokens() {
    String text =
        "state x [m] = 1 # c\r\nx' = -x/2 [s]*\n  c[2] ; state y [K]\r3 [m\n\nbasis p at 0 =\n row x = 1";
    SourceText source = new SourceText("lines", text);
    List<Token> tokens = new ArrayList<>();
    for (int line = 1; line <= source.lineCount(); line++) {
      tokens.addAll(Lexer.lexLine(text, source.lineSpan(line).start()));
    }
    assertEquals(Lexer.lex(text), tokens);
  }

  @ParameterizedTest
  @ValueSource(strings = {"1 [", "\"", "[1..", "'", "a.", "1.", "(", "§", "# ", "1 [a "})
  void longLinesTakeLinearTime(String piece) {
    String text = piece.repeat(300_000);
    long start = System.nanoTime();
    Lexer.lex(text);
    assertTrue(System.nanoTime() - start < 10_000_000_000L, "more than 10 s for " + piece);
  }
}
