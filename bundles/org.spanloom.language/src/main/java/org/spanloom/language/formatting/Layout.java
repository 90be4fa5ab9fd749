/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.formatting;

import java.util.Arrays;
import java.util.List;
import org.spanloom.language.syntax.Lexer;
import org.spanloom.language.syntax.StatementLine;
import org.spanloom.language.syntax.StatementLines;
import org.spanloom.language.syntax.Token;
import org.spanloom.language.syntax.TokenKind;

/**
 * A text on its way to its layout: its tokens, and how many blanks shall stand before each. Tokens,
 * statements and lines are named by their numbers, from 0.
 */
final class Layout {

  /** In the place of a number of blanks: what stands before the token stays. */
  static final int KEPT = -1;

  private final String text;
  private final List<Token> tokens;
  private final List<StatementLine> statements;
  private final int[] blanks;
  private final int[] lineOf;
  private final int[] firstOfLine;
  private final int[] statementOf;
  private final int[] firstOfStatement;

  Layout(String text) {
    this.text = text;
    this.tokens = Lexer.lex(text);
    this.statements = StatementLines.of(text);
    this.blanks = new int[tokens.size()];
    this.lineOf = new int[tokens.size()];
    this.firstOfLine = lines();
    this.statementOf = new int[tokens.size()];
    this.firstOfStatement = new int[statements.size()];
    assignStatements();
  }

  private int[] lines() {
    int[] first = new int[tokens.size() + 1];
    int line = 0;
    for (int i = 0; i < tokens.size(); i++) {
      lineOf[i] = line;
      if (tokens.get(i).kind() == TokenKind.NEWLINE) {
        first[++line] = i + 1;
      }
    }
    return Arrays.copyOf(first, line + 1);
  }

  private void assignStatements() {
    Arrays.fill(statementOf, -1);
    int at = 0;
    for (int s = 0; s < statements.size(); s++) {
      StatementLine statement = statements.get(s);
      int start = statement.span().start();
      while (tokens.get(at).start() < start) {
        at++;
      }
      firstOfStatement[s] = at;
      while (at < tokens.size() && tokens.get(at).start() <= statement.end().start()) {
        if (tokens.get(at).kind() != TokenKind.NEWLINE) {
          statementOf[at] = s;
        }
        at++;
      }
    }
  }

  int size() {
    return tokens.size();
  }

  Token token(int i) {
    return tokens.get(i);
  }

  TokenKind kind(int i) {
    return tokens.get(i).kind();
  }

  String text(int i) {
    return text.substring(tokens.get(i).start(), tokens.get(i).end());
  }

  /** Returns the blanks before a token, or {@link #KEPT}. */
  int blanks(int i) {
    return blanks[i];
  }

  void setBlanks(int i, int count) {
    blanks[i] = count;
  }

  /** Returns how many characters of white space stand before a token now. */
  int present(int i) {
    return tokens.get(i).start() - (i == 0 ? 0 : tokens.get(i - 1).end());
  }

  /** Returns how many characters stand before a token on its line now. */
  int column(int i) {
    int first = firstOfLine[lineOf[i]];
    return tokens.get(i).start() - (first == 0 ? 0 : tokens.get(first - 1).end());
  }

  int lineCount() {
    return firstOfLine.length;
  }

  int line(int token) {
    return lineOf[token];
  }

  /** Returns the first token of a line; the number of tokens for an empty last line. */
  int first(int line) {
    return firstOfLine[line];
  }

  /** Returns the number behind the last token of a line, its line end not counted. */
  int end(int line) {
    return line + 1 < firstOfLine.length ? firstOfLine[line + 1] - 1 : tokens.size();
  }

  boolean isBlank(int line) {
    return first(line) == end(line);
  }

  /** Tells whether a line holds a comment and nothing else. */
  boolean isCommentOnly(int line) {
    return !isBlank(line) && isComment(first(line));
  }

  boolean isComment(int i) {
    return kind(i) == TokenKind.COMMENT || kind(i) == TokenKind.DOCUMENTATION;
  }

  List<StatementLine> statements() {
    return statements;
  }

  /** Returns the statement of a token, comments inside of one included; -1 if there is none. */
  int statement(int token) {
    return statementOf[token];
  }

  /** Returns the first token of a statement, which may be the brace that ends it. */
  int firstOfStatement(int statement) {
    return firstOfStatement[statement];
  }

  /** Returns the word that begins a statement, empty if it begins with something else. */
  String word(int statement) {
    int first = firstOfStatement[statement];
    return kind(first) == TokenKind.STATEMENT_WORD ? text(first) : "";
  }

  /** Returns how wide a run of tokens is, the blanks before the first one not counted. */
  int width(int from, int to) {
    int width = 0;
    for (int i = from; i < to; i++) {
      int before = blanks[i] == KEPT ? present(i) : blanks[i];
      width += tokens.get(i).span().length() + (i == from ? 0 : before);
    }
    return width;
  }
}
