/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.syntax;

import java.util.Optional;
import org.spanloom.language.problem.Fix;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.syntax.RequireClause.Compares;
import org.spanloom.language.syntax.RequireClause.HasPeriod;
import org.spanloom.language.syntax.RequireClause.IsInvariant;
import org.spanloom.language.syntax.RequireClause.IsNonnegative;
import org.spanloom.language.syntax.RequireClause.IsStable;
import org.spanloom.language.syntax.RequireClause.LimitsCondition;

/** Reads what stands behind {@code require}. */
final class RequireParser {

  private final Cursor cursor;
  private final ExpressionParser expressions;

  RequireParser(Cursor cursor, ExpressionParser expressions) {
    this.cursor = cursor;
    this.expressions = expressions;
  }

  /**
   * {@code clause = "stable" | "nonnegative", [ under ] | "period", expression | "invariant",
   * expression | condition | comparison ;} Where a sign of comparison follows, the first four words
   * are names.
   */
  RequireClause clause() {
    int start = cursor.peek().start();
    if (!cursor.holdsComparison()) {
      if (cursor.acceptWord("stable")) {
        return new IsStable(cursor.from(start));
      }
      if (cursor.acceptWord("nonnegative")) {
        return new IsNonnegative(under(), cursor.from(start));
      }
      if (cursor.acceptWord("period")) {
        return new HasPeriod(expressions.expression(), cursor.from(start));
      }
      if (cursor.acceptWord("invariant")) {
        return new IsInvariant(expressions.expression(), cursor.from(start));
      }
    }
    TokenKind following = cursor.kindAfter();
    boolean condition =
        cursor.isWord("condition") && following == TokenKind.OPEN_PARENTHESIS
            || cursor.isWord("scaled") && following == TokenKind.CONTEXT_WORD;
    return condition ? condition(start) : comparison(start);
  }

  /**
   * {@code condition = [ "scaled" ], "condition", "(", name, ")", sign, expression, [ until ] ;}
   */
  private RequireClause condition(int start) {
    boolean scaled = cursor.acceptWord("scaled");
    cursor.acceptWord("condition");
    if (!cursor.accept(TokenKind.OPEN_PARENTHESIS)) {
      cursor.failHere(
          ProblemKind.WORD_UNEXPECTED, "The basis belongs here, as in \"condition(p)\"");
    }
    Name basis = name("basis");
    if (!cursor.accept(TokenKind.CLOSE_PARENTHESIS)) {
      cursor.failHere(ProblemKind.PARENTHESIS_NOT_CLOSED, "\")\" belongs here");
    }
    TokenKind sign = sign();
    Expression limit = expressions.expression();
    Optional<Expression> until = until();
    return new LimitsCondition(scaled, basis, sign, limit, until, cursor.from(start));
  }

  /** {@code comparison = expression, sign, expression, [ "throughout" ], [ until ], [ under ] ;} */
  private RequireClause comparison(int start) {
    Expression left = expressions.expression();
    TokenKind sign = sign();
    Expression right = expressions.expression();
    Comparison comparison = new Comparison(left, sign, right, cursor.from(start));
    boolean throughout = cursor.acceptWord("throughout");
    if (!throughout && cursor.isWord("until")) {
      cursor.fail(
          ProblemKind.WORD_UNEXPECTED,
          cursor.peek().span(),
          "\"until\" goes with \"throughout\": write throughout until ...",
          Fix.insert("Insert throughout", cursor.lastEnd(), " throughout"));
    }
    Optional<Expression> until = until();
    Optional<Name> under = under();
    return new Compares(comparison, throughout, until, under, cursor.from(start));
  }

  /** {@code sign = "<" | "<=" | ">" | ">=" ;} */
  private TokenKind sign() {
    TokenKind kind = cursor.kind();
    switch (kind) {
      case LESS, AT_MOST, GREATER, AT_LEAST -> cursor.take();
      case EQUALS ->
          cursor.fail(
              ProblemKind.WORD_UNEXPECTED,
              cursor.peek().span(),
              "Results are never exactly equal: require the value to lie between two limits, with two"
                  + " statements.");
      default ->
          cursor.failHere(ProblemKind.WORD_UNEXPECTED, "One of <, <=, > and >= belongs here");
    }
    return kind;
  }

  /** {@code until = "until", expression ;} */
  private Optional<Expression> until() {
    return cursor.acceptWord("until") ? Optional.of(expressions.expression()) : Optional.empty();
  }

  /** {@code under = "under", name ;} the name of initial values. */
  private Optional<Name> under() {
    return cursor.acceptWord("under") ? Optional.of(name("initial values")) : Optional.empty();
  }

  private Name name(String what) {
    Token token = cursor.peek();
    if (!token.kind().isName()) {
      cursor.failHere(ProblemKind.NAME_MISSING, "The name of the " + what + " belongs here");
      return new Name("", token.span());
    }
    cursor.take();
    return new Name(cursor.text(token), token.span());
  }
}
