/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.formatting;

import org.spanloom.language.syntax.TokenKind;

/**
 * Sets the blanks between the tokens of a line: none inside of products, powers, calls, indices and
 * parentheses, one around sums, comparisons and words.
 */
final class Spacing {

  private final Layout layout;
  private int openIndices;

  private Spacing(Layout layout) {
    this.layout = layout;
  }

  /**
   * Sets the blanks of all tokens that are not first on their line.
   *
   * @param unread for each statement whether it keeps its blanks, because it cannot be read
   */
  static void apply(Layout layout, boolean[] unread) {
    Spacing spacing = new Spacing(layout);
    for (int line = 0; line < layout.lineCount(); line++) {
      for (int i = layout.first(line); i < layout.end(line); i++) {
        spacing.note(i);
        int statement = layout.statement(i);
        if (i > layout.first(line)) {
          boolean keep = statement >= 0 && unread[statement];
          layout.setBlanks(i, keep ? Layout.KEPT : spacing.between(i - 1, i));
        }
      }
    }
  }

  /** Keeps count of open indices; a statement begins with none. */
  private void note(int i) {
    int statement = layout.statement(i);
    if (statement >= 0 && layout.firstOfStatement(statement) == i) {
      openIndices = 0;
    }
    if (layout.kind(i) == TokenKind.OPEN_BRACKET) {
      openIndices++;
    } else if (layout.kind(i) == TokenKind.CLOSE_BRACKET) {
      openIndices = Math.max(0, openIndices - 1);
    }
  }

  private int between(int before, int after) {
    TokenKind left = layout.kind(before);
    TokenKind right = layout.kind(after);
    if (dependsOnBlanks(left) || dependsOnBlanks(right)) {
      return Math.min(1, layout.present(after));
    }
    if (left == TokenKind.PRIMES && right == TokenKind.PRIMES) {
      return 1;
    }
    if (left == TokenKind.OPEN_BRACE && right == TokenKind.CLOSE_BRACE) {
      return 0;
    }
    boolean tight =
        closes(right)
            || opens(left)
            || isProduct(left)
            || isProduct(right)
            || isSign(left) && !isBinary(before)
            || openIndices > 0 && (isSign(left) || isSign(right) && isBinary(after))
            || right == TokenKind.OPEN_PARENTHESIS && isCalled(before)
            || right == TokenKind.OPEN_BRACKET && isOperand(before) && left != TokenKind.NUMBER;
    return tight ? 0 : 1;
  }

  /** Tells whether blanks beside a token can make it another one. */
  private static boolean dependsOnBlanks(TokenKind kind) {
    return switch (kind) {
      case DOT, BAD, BAD_NUMBER, OPEN_UNIT, OPEN_STRING -> true;
      default -> false;
    };
  }

  private static boolean closes(TokenKind kind) {
    return switch (kind) {
      case COMMA, SEMICOLON, CLOSE_PARENTHESIS, CLOSE_BRACKET, PRIMES, RANGE, INDEX_RANGE -> true;
      default -> false;
    };
  }

  private static boolean opens(TokenKind kind) {
    return kind == TokenKind.OPEN_PARENTHESIS
        || kind == TokenKind.OPEN_BRACKET
        || kind == TokenKind.RANGE;
  }

  private static boolean isProduct(TokenKind kind) {
    return kind == TokenKind.TIMES || kind == TokenKind.DIVIDE || kind == TokenKind.POWER;
  }

  private static boolean isSign(TokenKind kind) {
    return kind == TokenKind.PLUS || kind == TokenKind.MINUS;
  }

  /** Tells whether a sign stands between operands. */
  private boolean isBinary(int sign) {
    int before = sign - 1;
    while (before >= 0 && (layout.kind(before) == TokenKind.NEWLINE || layout.isComment(before))) {
      before--;
    }
    return before >= 0 && layout.statement(before) == layout.statement(sign) && isOperand(before);
  }

  private boolean isOperand(int i) {
    return switch (layout.kind(i)) {
      case NAME, NUMBER, BAD_NUMBER, UNIT, STRING, PRIMES, PERCENT -> true;
      case CLOSE_PARENTHESIS, CLOSE_BRACKET, INDEX_RANGE -> true;
      default -> false;
    };
  }

  /** Tells whether a parenthesis behind a token holds its arguments. */
  private boolean isCalled(int i) {
    return switch (layout.kind(i)) {
      case NAME, PRIMES, CLOSE_BRACKET -> true;
      case CONTEXT_WORD -> layout.text(i).equals("condition") || isCompared(i);
      default -> false;
    };
  }

  /** Tells whether a sign of comparison stands behind a token in its statement. */
  private boolean isCompared(int token) {
    int statement = layout.statement(token);
    boolean compared = false;
    for (int i = token; i < layout.size() && layout.statement(i) == statement; i++) {
      compared |=
          switch (layout.kind(i)) {
            case LESS, AT_MOST, GREATER, AT_LEAST -> true;
            default -> false;
          };
    }
    return compared;
  }
}
