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
record StatementLine(List<Token> tokens, Token end, String documentation) {

  /** Returns the place from the first to the last token. */
  Span span() {
    return tokens.isEmpty()
        ? end.span()
        : new Span(tokens.getFirst().start(), tokens.getLast().end());
  }

  boolean opensBlock() {
    return end.kind() == TokenKind.OPEN_BRACE;
  }

  boolean closesBlock() {
    return end.kind() == TokenKind.CLOSE_BRACE;
  }
}
