/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.syntax;

import java.util.ArrayList;
import java.util.List;
import org.spanloom.language.text.Span;

/**
 * Cuts the tokens of a text into statements.
 *
 * <p>A line end, {@code ;} or a brace ends a statement. A line goes on inside of open {@code (} and
 * {@code [} and after a trailing sign or comma, but never past a closing brace, a word that begins
 * a statement, or a line not indented deeper than the statement's first line. So nothing that is
 * missing in one statement can swallow the next.
 */
final class StatementSplitter {

  private final String text;
  private final List<Token> all;
  private final List<Token> comments = new ArrayList<>();
  private final List<Token> tokens = new ArrayList<>();
  private final StringBuilder pending = new StringBuilder();
  private final Token endOfText;
  private int at;
  private int lineStart;
  private int indent;
  private boolean lineHasStatement;

  StatementSplitter(String text) {
    this.text = text;
    this.all = Lexer.lex(text);
    this.endOfText = new Token(TokenKind.NEWLINE, text.length(), text.length());
  }

  /** Returns the comments seen so far. */
  List<Token> comments() {
    return comments;
  }

  boolean atEnd() {
    return at >= all.size();
  }

  /** Returns the first token of the coming statement, or one of no length at the end. */
  Token peek() {
    skipBlankLines();
    return at < all.size() ? all.get(at) : endOfText;
  }

  /** Takes the coming statement with the token that ends it. */
  StatementLine next() {
    skipBlankLines();
    if (!lineHasStatement && at < all.size()) {
      indent = all.get(at).start() - lineStart;
      lineHasStatement = true;
    }
    int open = 0;
    Token end = endOfText;
    tokens.clear();
    while (at < all.size()) {
      Token token = all.get(at++);
      if (token.kind() == TokenKind.NEWLINE) {
        boolean unfinished =
            open > 0 || !tokens.isEmpty() && tokens.getLast().kind().continuesLine();
        if (!unfinished || !nextLineBelongs()) {
          end = token;
          startLine(token);
          break;
        }
        lineStart = token.end();
        skipToNextLine();
      } else if (endsStatement(token.kind())) {
        end = token;
        break;
      } else if (isComment(token)) {
        take(token);
      } else {
        open += token.kind().nesting();
        tokens.add(token);
      }
    }
    if (end.kind() == TokenKind.SEMICOLON || end.kind() == TokenKind.OPEN_BRACE) {
      takeTrailingComment();
    }
    String documentation = tokens.isEmpty() ? "" : takePending();
    if (end.kind() == TokenKind.CLOSE_BRACE) {
      pending.setLength(0);
    }
    return new StatementLine(tokens, end, documentation);
  }

  /**
   * Tells whether the coming statement is a loop whose first line, loops in it aside, begins with a
   * word.
   */
  boolean loopHolds(String word) {
    if (!isWord(peek(), "for")) {
      return false;
    }
    boolean begins = true;
    for (int i = at; i < all.size(); i++) {
      Token token = all.get(i);
      if (token.kind() == TokenKind.OPEN_BRACE) {
        begins = true;
      } else if (token.kind() != TokenKind.NEWLINE && !isComment(token)) {
        if (begins && !isWord(token, "for")) {
          return isWord(token, word);
        }
        if (!begins && (token.kind() == TokenKind.STATEMENT_WORD || endsStatement(token.kind()))) {
          return false;
        }
        begins = false;
      }
    }
    return false;
  }

  private boolean isWord(Token token, String word) {
    return token.kind() == TokenKind.STATEMENT_WORD
        && token.span().length() == word.length()
        && text.startsWith(word, token.start());
  }

  private static boolean endsStatement(TokenKind kind) {
    return kind == TokenKind.SEMICOLON
        || kind == TokenKind.OPEN_BRACE
        || kind == TokenKind.CLOSE_BRACE;
  }

  private void skipBlankLines() {
    while (at < all.size()) {
      Token token = all.get(at);
      if (token.kind() == TokenKind.NEWLINE) {
        startLine(token);
      } else if (isComment(token)) {
        take(token);
      } else {
        return;
      }
      at++;
    }
  }

  private void startLine(Token newline) {
    lineStart = newline.end();
    lineHasStatement = false;
  }

  /**
   * Tells whether the first token behind the line end, comments aside, may continue the statement.
   */
  private boolean nextLineBelongs() {
    int start = all.get(at - 1).end();
    for (int i = at; i < all.size(); i++) {
      Token token = all.get(i);
      if (token.kind() == TokenKind.NEWLINE) {
        start = token.end();
      } else if (!isComment(token)) {
        return token.kind() != TokenKind.CLOSE_BRACE
            && token.kind() != TokenKind.STATEMENT_WORD
            && token.start() - start > indent;
      }
    }
    return false;
  }

  /** Goes on to the line that continues the statement, past blank lines and comments. */
  private void skipToNextLine() {
    while (all.get(at).kind() == TokenKind.NEWLINE || isComment(all.get(at))) {
      Token token = all.get(at++);
      if (token.kind() == TokenKind.NEWLINE) {
        lineStart = token.end();
      } else {
        take(token);
      }
    }
  }

  private void takeTrailingComment() {
    if (at < all.size() && isComment(all.get(at))) {
      take(all.get(at++));
    }
  }

  private static boolean isComment(Token token) {
    return token.kind() == TokenKind.COMMENT || token.kind() == TokenKind.DOCUMENTATION;
  }

  private void take(Token comment) {
    comments.add(comment);
    if (comment.kind() == TokenKind.DOCUMENTATION) {
      pending.append(pending.isEmpty() ? "" : "\n").append(words(comment.span()));
    }
  }

  private String takePending() {
    String documentation = pending.toString();
    pending.setLength(0);
    return documentation;
  }

  private String words(Span comment) {
    return text.substring(comment.start() + 2, comment.end()).strip();
  }
}
