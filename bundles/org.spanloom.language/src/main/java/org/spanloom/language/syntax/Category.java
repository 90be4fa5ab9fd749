/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.syntax;

/** What a token is to the eye; editors give each category a colour. */
public enum Category {
  /** A word of the language. */
  KEYWORD,
  /** A word chosen by the author, or the name of a function. */
  NAME,
  /** A number. */
  NUMBER,
  /** A unit in brackets. */
  UNIT,
  /** A sign between operands, primes, separators. */
  OPERATOR,
  /** A remark for readers of the text. */
  COMMENT,
  /** A remark that becomes part of the model. */
  DOCUMENTATION,
  /** Text in quotation marks. */
  STRING,
  /** A parenthesis, brace or index bracket. */
  BRACKET,
  /** The end of a line. */
  LINE_END,
  /** Something that cannot be read. */
  BAD
}
