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
 */
public record Token(TokenKind kind, int start, int end) {

  /** Returns its place. */
  public Span span() {
    return new Span(start, end);
  }
}
