/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.syntax;

/** The kinds of tokens. */
public enum TokenKind {
  /** A reserved word that begins a statement, for example {@code state}. */
  STATEMENT_WORD(Category.KEYWORD),
  /** A reserved word inside a statement, for example {@code until}. */
  CLAUSE_WORD(Category.KEYWORD),
  /** A word that has a meaning where it stands but is not reserved, for example {@code scale}. */
  CONTEXT_WORD(Category.KEYWORD),
  /** A name. */
  NAME(Category.NAME),
  /** A number without its sign. */
  NUMBER(Category.NUMBER),
  /** A number that breaks the rules, for example {@code .5} or {@code 1e}. */
  BAD_NUMBER(Category.BAD),
  /** A unit with its brackets. */
  UNIT(Category.UNIT),
  /** A unit whose closing bracket is missing. */
  OPEN_UNIT(Category.BAD),
  /** An index range with its brackets, for example {@code [1..400]} in a declaration. */
  INDEX_RANGE(Category.BRACKET),
  /** Text with its quotation marks. */
  STRING(Category.STRING),
  /** Text whose closing quotation mark is missing. */
  OPEN_STRING(Category.BAD),
  /** A comment, {@code #} to the end of the line. */
  COMMENT(Category.COMMENT),
  /** A documentation comment, {@code ##} to the end of the line. */
  DOCUMENTATION(Category.DOCUMENTATION),
  /** The end of a line: "\n", "\r\n" or "\r". */
  NEWLINE(Category.LINE_END),
  /** {@code +}. */
  PLUS(Category.OPERATOR),
  /** {@code -}. */
  MINUS(Category.OPERATOR),
  /** {@code *}. */
  TIMES(Category.OPERATOR),
  /** {@code /}. */
  DIVIDE(Category.OPERATOR),
  /** {@code ^}. */
  POWER(Category.OPERATOR),
  /** {@code =}. */
  EQUALS(Category.OPERATOR),
  /** {@code <}. */
  LESS(Category.OPERATOR),
  /** {@code <=}. */
  AT_MOST(Category.OPERATOR),
  /** {@code >}. */
  GREATER(Category.OPERATOR),
  /** {@code >=}. */
  AT_LEAST(Category.OPERATOR),
  /** {@code ±} or {@code +/-}. */
  PLUS_MINUS(Category.OPERATOR),
  /** {@code %}. */
  PERCENT(Category.OPERATOR),
  /** One or more {@code '}. */
  PRIMES(Category.OPERATOR),
  /** {@code ,}. */
  COMMA(Category.OPERATOR),
  /** {@code ;}. */
  SEMICOLON(Category.OPERATOR),
  /** {@code .} between the parts of a name. */
  DOT(Category.OPERATOR),
  /** {@code ..}. */
  RANGE(Category.OPERATOR),
  /** {@code ->}. */
  ARROW(Category.OPERATOR),
  /** {@code (}. */
  OPEN_PARENTHESIS(Category.BRACKET),
  /** {@code )}. */
  CLOSE_PARENTHESIS(Category.BRACKET),
  /** {@code [} of an index. */
  OPEN_BRACKET(Category.BRACKET),
  /** {@code ]} of an index. */
  CLOSE_BRACKET(Category.BRACKET),
  /** An opening brace. */
  OPEN_BRACE(Category.BRACKET),
  /** A closing brace. */
  CLOSE_BRACE(Category.BRACKET),
  /** Characters that belong to no token. */
  BAD(Category.BAD);

  private final Category category;

  TokenKind(Category category) {
    this.category = category;
  }

  /** Returns what the token is to the eye. */
  public Category category() {
    return category;
  }

  /** Tells whether the token is a word, reserved or not. */
  public boolean isWord() {
    return this == NAME || this == CONTEXT_WORD || this == STATEMENT_WORD || this == CLAUSE_WORD;
  }

  /** Tells whether the token can be a name chosen by the author. */
  public boolean isName() {
    return this == NAME || this == CONTEXT_WORD;
  }

  /** Tells whether a line that ends in this token goes on in the next one. */
  boolean continuesLine() {
    return switch (this) {
      case PLUS, MINUS, TIMES, DIVIDE, POWER, EQUALS, LESS, AT_MOST, GREATER, AT_LEAST -> true;
      case PLUS_MINUS, COMMA, RANGE, ARROW -> true;
      case STATEMENT_WORD, CLAUSE_WORD, CONTEXT_WORD, NAME, NUMBER, BAD_NUMBER, UNIT, OPEN_UNIT ->
          false;
      case INDEX_RANGE, STRING, OPEN_STRING, COMMENT, DOCUMENTATION, NEWLINE -> false;
      case PERCENT, PRIMES, SEMICOLON, DOT, OPEN_PARENTHESIS, CLOSE_PARENTHESIS -> false;
      case OPEN_BRACKET, CLOSE_BRACKET, OPEN_BRACE, CLOSE_BRACE, BAD -> false;
    };
  }

  /** Returns 1 for a bracket that keeps a line open, -1 for one that closes it, else 0. */
  int nesting() {
    if (this == OPEN_PARENTHESIS || this == OPEN_BRACKET) {
      return 1;
    }
    return this == CLOSE_PARENTHESIS || this == CLOSE_BRACKET ? -1 : 0;
  }
}
