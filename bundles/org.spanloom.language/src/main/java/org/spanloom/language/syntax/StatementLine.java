/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.syntax;

import java.util.List;
import org.spanloom.language.text.Span;

/**
 * The tokens of one statement, or of the part of one before a brace.
 *
 * @param tokens the tokens without line ends and comments; may be empty
 * @param end what ends it: a line end, a semicolon, a brace, or the end of the text
 * @param documentation documentation comments that belong to it
 */
public record StatementLine(List<Token> tokens, Token end, String documentation) {

  /** Copies the list. */
  public StatementLine {
    tokens = List.copyOf(tokens);
  }

  /** Returns the place from the first to the last token. */
  public Span span() {
    return tokens.isEmpty()
        ? end.span()
        : new Span(tokens.getFirst().start(), tokens.getLast().end());
  }

  /** Tells whether a brace opens a block behind it. */
  public boolean opensBlock() {
    return end.kind() == TokenKind.OPEN_BRACE;
  }

  /** Tells whether a brace closes the block around it. */
  public boolean closesBlock() {
    return end.kind() == TokenKind.CLOSE_BRACE;
  }

  /** Tells whether it ends at a line end although a bracket is open or an operand is missing. */
  public boolean isUnfinished() {
    int open = 0;
    for (Token token : tokens) {
      open += token.kind().nesting();
    }
    boolean ends = end.kind() == TokenKind.NEWLINE && !tokens.isEmpty();
    return ends && (open > 0 || tokens.getLast().kind().continuesLine());
  }
}
