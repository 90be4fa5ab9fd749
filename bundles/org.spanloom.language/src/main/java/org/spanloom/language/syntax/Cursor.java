/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.syntax;

import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.spanloom.language.problem.Fix;
import org.spanloom.language.problem.Problem;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.text.Span;

/**
 * Walks over the tokens of one statement and keeps the first problem of it; later ones follow from
 * the first.
 */
final class Cursor {

  /** Most words, numbers and signs of one statement. */
  static final int LENGTH_LIMIT = 1_000_000;

  private final String text;
  private final List<Token> tokens;
  private final Token end;

  /** What the tokens are together, for messages. */
  private final String whole;

  private int at;

  /** The coming token. */
  private Token coming;

  private Optional<Problem> problem = Optional.empty();

  Cursor(String text, StatementLine line) {
    this.text = text;
    this.tokens = line.tokens();
    this.whole = "the statement";
    int last = line.span().end();
    this.end = new Token(TokenKind.NEWLINE, last, last);
    moveTo(0);
    if (tokens.size() > LENGTH_LIMIT) {
      fail(
          ProblemKind.STATEMENT_TOO_LONG,
          tokens.getFirst().span(),
          "The statement has "
              + tokens.size()
              + " words, numbers and signs, more than the limit of "
              + LENGTH_LIMIT
              + ": name parts of it with let, or divide it.");
    }
  }

  private void moveTo(int index) {
    at = index;
    coming = index < tokens.size() ? tokens.get(index) : end;
  }

  private Cursor(String text, List<Token> tokens, int end, String whole) {
    this.whole = whole;
    this.text = text;
    this.tokens = tokens;
    this.end = new Token(TokenKind.NEWLINE, end, end);
    moveTo(0);
  }

  /** Returns a cursor over the tokens of a part of the text that is one token for this one. */
  Cursor inside(Span part) {
    return new Cursor(text, Lexer.lexPart(text, part), part.end(), "the range");
  }

  /** Returns the coming token; at the end one of no length whose kind is a line end. */
  Token peek() {
    return coming;
  }

  TokenKind kind() {
    return coming.kind();
  }

  /** Returns the kind of the token behind the coming one. */
  TokenKind kindAfter() {
    return at + 1 < tokens.size() ? tokens.get(at + 1).kind() : TokenKind.NEWLINE;
  }

  /** Tells whether the coming token is a word with this text. */
  boolean isWord(String word) {
    Token token = peek();
    return token.kind().isWord() && text(token).equals(word);
  }

  /** Tells whether the token behind the coming one is a word with this text. */
  boolean isWordAfter(String word) {
    return kindAfter().isWord() && text(tokens.get(at + 1)).equals(word);
  }

  Token take() {
    Token token = coming;
    moveTo(Math.min(at + 1, tokens.size()));
    return token;
  }

  boolean atEnd() {
    return at >= tokens.size();
  }

  boolean is(TokenKind kind) {
    return kind() == kind;
  }

  /** Tells whether more signs of comparison are to come than conditions of choices. */
  boolean holdsComparison() {
    int open = 0;
    for (Token token : tokens.subList(at, tokens.size())) {
      switch (token.kind()) {
        case LESS, AT_MOST, GREATER, AT_LEAST -> open++;
        case CLAUSE_WORD -> open -= text(token).equals("if") ? 1 : 0;
        default -> {}
      }
    }
    return open > 0;
  }

  boolean accept(TokenKind kind) {
    boolean found = is(kind);
    if (found) {
      take();
    }
    return found;
  }

  boolean acceptWord(String word) {
    boolean found = isWord(word);
    if (found) {
      take();
    }
    return found;
  }

  /** Returns the offset behind the last token taken. */
  int lastEnd() {
    return at == 0 ? peek().start() : tokens.get(at - 1).end();
  }

  Span from(int start) {
    return new Span(start, Math.max(start, lastEnd()));
  }

  String text(Token token) {
    return token.word().isEmpty() ? text.substring(token.start(), token.end()) : token.word();
  }

  String text(Span span) {
    return text.substring(span.start(), span.end());
  }

  boolean failed() {
    return problem.isPresent();
  }

  Optional<Problem> problem() {
    return problem;
  }

  /** Takes over a problem found inside of a token. */
  void fail(Problem found) {
    if (problem.isEmpty()) {
      problem = Optional.of(found);
    }
    moveTo(tokens.size());
  }

  void fail(ProblemKind kind, Span span, String message, Fix... fixes) {
    if (problem.isEmpty()) {
      problem = Optional.of(new Problem(kind, span, message, List.of(fixes)));
    }
    moveTo(tokens.size());
  }

  /** Reports that something else belongs here, unless the coming token is bad by itself. */
  void failHere(ProblemKind kind, String expected, Fix... fixes) {
    Token token = peek();
    if (!failBadToken()) {
      boolean quoted = token.kind() == TokenKind.STRING;
      String quote = quoted ? "" : "\"";
      String found = atEnd() ? whole + " ends" : quote + shortened(token) + quote + " stands";
      fail(kind, token.span(), expected + ", but here " + found + ".", fixes);
    }
  }

  /** Reports the coming token if no statement can hold it, and tells whether it did. */
  boolean failBadToken() {
    Token token = peek();
    String shown = shortened(token);
    switch (token.kind()) {
      case BAD_NUMBER ->
          fail(
              ProblemKind.NUMBER_MALFORMED,
              token.span(),
              "\""
                  + shown
                  + "\" is not a number: write digits on both sides of the point, as in 0.5, and"
                  + " digits behind e, as in 1e-3.");
      case OPEN_UNIT ->
          fail(
              ProblemKind.UNIT_NOT_CLOSED,
              token.span(),
              "The unit \"" + shown + "\" is not closed: write \"]\" directly behind it.",
              Fix.insert("Close the unit", token.end(), "]"));
      case OPEN_STRING ->
          fail(
              ProblemKind.TEXT_NOT_CLOSED,
              token.span(),
              "The text " + shown + " is not closed: write \" behind it, on the same line.",
              Fix.insert("Close the text", token.end(), "\""));
      case BAD -> failBadCharacters(token, shown);
      default -> {
        return false;
      }
    }
    return true;
  }

  private void failBadCharacters(Token token, String shown) {
    String meant =
        switch (shown) {
          case "\u2212", "\u2013", "\u2014" -> "-";
          case "\u00B7", "\u00D7", "\u22C5" -> "*";
          case "\u00F7", "\u2215" -> "/";
          case "\u2264" -> "<=";
          case "\u2265" -> ">=";
          case "\u2019", "\u2032", "`" -> "'";
          case "\u201C", "\u201D" -> "\"";
          default -> "";
        };
    if (meant.isEmpty()) {
      fail(
          ProblemKind.CHARACTER_UNKNOWN,
          token.span(),
          "\"" + printable(shown) + "\" means nothing in a model: remove it.",
          Fix.replace("Remove it", token.span(), ""));
    } else {
      fail(
          ProblemKind.CHARACTER_UNKNOWN,
          token.span(),
          "\"" + shown + "\" means nothing in a model: write " + meant + " instead.",
          Fix.replace("Write " + meant, token.span(), meant));
    }
  }

  /** Shows characters that have no face by their code. */
  private static String printable(String shown) {
    StringBuilder out = new StringBuilder();
    shown
        .codePoints()
        .forEach(c -> {
          boolean faceless =
              Character.isISOControl(c)
                  || Character.getType(c) == Character.FORMAT
                  || Character.getType(c) == Character.SURROGATE
                  || Character.getType(c) == Character.UNASSIGNED;
          if (faceless) {
            out.append("U+")
                .append(Integer.toHexString(0x10000 + c).substring(1).toUpperCase(Locale.ROOT));
          } else {
            out.appendCodePoint(c);
          }
        });
    return out.toString();
  }

  private String shortened(Token token) {
    String shown = text(token);
    return shown.length() <= 40 ? shown : shown.substring(0, 37) + "...";
  }
}
