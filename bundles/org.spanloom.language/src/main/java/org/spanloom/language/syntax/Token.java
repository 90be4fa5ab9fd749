/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.syntax;

import org.spanloom.language.text.Span;

/**
 * A piece of a text.
 *
 * @param kind its kind
 * @param start offset of its first character
 * @param end offset behind its last character
 * @param word its characters if it is a word or a number, else empty
 */
public record Token(TokenKind kind, int start, int end, String word) {

  /** A token that is neither a word nor a number. */
  public Token(TokenKind kind, int start, int end) {
    this(kind, start, end, "");
  }

  /** Returns its place. */
  public Span span() {
    return new Span(start, end);
  }
}
