/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.syntax;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.spanloom.language.problem.Fix;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.syntax.Expression.Addend;
import org.spanloom.language.syntax.Expression.Argument;
import org.spanloom.language.syntax.Expression.CallExpression;
import org.spanloom.language.syntax.Expression.ChoiceExpression;
import org.spanloom.language.syntax.Expression.Factor;
import org.spanloom.language.syntax.Expression.MissingExpression;
import org.spanloom.language.syntax.Expression.NameExpression;
import org.spanloom.language.syntax.Expression.NumberExpression;
import org.spanloom.language.syntax.Expression.ParenthesisedExpression;
import org.spanloom.language.syntax.Expression.PowerExpression;
import org.spanloom.language.syntax.Expression.ProductExpression;
import org.spanloom.language.syntax.Expression.SignedExpression;
import org.spanloom.language.syntax.Expression.SumExpression;
import org.spanloom.language.text.Span;

/** Reads expressions by recursive descent; each method carries its rule in EBNF (ISO/IEC 14977). */
final class ExpressionParser {

  /** How deep parentheses, signs and powers may be nested. */
  static final int DEPTH_LIMIT = 200;

  private final Cursor cursor;
  private int depth;

  ExpressionParser(Cursor cursor) {
    this.cursor = cursor;
  }

  /** {@code expression = choice | sum ;} */
  Expression expression() {
    return cursor.isWord("if") ? choice() : sum();
  }

  /** {@code choice = "if", sum, sign, sum, "then", expression, "else", expression ;} */
  private Expression choice() {
    int start = cursor.take().start();
    if (!enter()) {
      return missing();
    }
    int from = cursor.peek().start();
    Expression left = sum();
    TokenKind sign = conditionSign();
    Expression right = sum();
    Comparison condition = new Comparison(left, sign, right, cursor.from(from));
    word("then", "The word \"then\" and the value while the condition holds belong here");
    Expression then = expression();
    word("else", "The word \"else\" and the value while the condition does not hold belong here");
    Expression otherwise = expression();
    depth--;
    return new ChoiceExpression(condition, then, otherwise, cursor.from(start));
  }

  private TokenKind conditionSign() {
    TokenKind kind = cursor.kind();
    switch (kind) {
      case LESS, AT_MOST, GREATER, AT_LEAST -> cursor.take();
      case EQUALS ->
          cursor.fail(
              ProblemKind.WORD_UNEXPECTED,
              cursor.peek().span(),
              "A condition compares by size: write one of <, <=, > and >=.");
      default ->
          cursor.failHere(
              ProblemKind.WORD_UNEXPECTED,
              "One of <, <=, > and >= belongs here, as in \"if t < 6 then 1 else 0\"");
    }
    return kind;
  }

  private void word(String word, String expected) {
    if (!cursor.failed() && !cursor.acceptWord(word)) {
      cursor.failHere(ProblemKind.WORD_UNEXPECTED, expected);
    }
  }

  /** {@code sum = term, { ( "+" | "-" ), term } ;} */
  private Expression sum() {
    int start = cursor.peek().start();
    Expression first = term();
    if (!cursor.is(TokenKind.PLUS) && !cursor.is(TokenKind.MINUS)) {
      return first;
    }
    List<Addend> addends = new ArrayList<>();
    addends.add(new Addend(false, first));
    while (cursor.is(TokenKind.PLUS) || cursor.is(TokenKind.MINUS)) {
      boolean subtracted = cursor.take().kind() == TokenKind.MINUS;
      addends.add(new Addend(subtracted, term()));
    }
    return new SumExpression(addends, cursor.from(start));
  }

  /** {@code term = factor, { ( "*" | "/" ), factor } ;} */
  private Expression term() {
    int start = cursor.peek().start();
    Expression first = factor();
    if (!cursor.is(TokenKind.TIMES) && !cursor.is(TokenKind.DIVIDE)) {
      return first;
    }
    List<Factor> factors = new ArrayList<>();
    factors.add(new Factor(false, first));
    while (cursor.is(TokenKind.TIMES) || cursor.is(TokenKind.DIVIDE)) {
      boolean divides = cursor.take().kind() == TokenKind.DIVIDE;
      factors.add(new Factor(divides, factor()));
    }
    return new ProductExpression(factors, cursor.from(start));
  }

  /**
   * {@code factor = [ "+" | "-" ], ( power | factor ) ;} so that {@code -x^2} is {@code -(x^2)}.
   */
  private Expression factor() {
    int start = cursor.peek().start();
    boolean negative = cursor.is(TokenKind.MINUS);
    if (!negative && !cursor.is(TokenKind.PLUS)) {
      return power();
    }
    cursor.take();
    if (!enter()) {
      return missing();
    }
    Expression operand = factor();
    depth--;
    return new SignedExpression(negative, operand, cursor.from(start));
  }

  /** {@code power = primary, [ "^", factor ] ;} so that {@code a^b^c} is {@code a^(b^c)}. */
  private Expression power() {
    int start = cursor.peek().start();
    Expression base = primary();
    if (!cursor.accept(TokenKind.POWER)) {
      return base;
    }
    if (!enter()) {
      return missing();
    }
    Expression exponent = factor();
    depth--;
    return new PowerExpression(base, exponent, cursor.from(start));
  }

  /** {@code primary = number, [ unit ] | reference, [ arguments ] | "(", expression, ")" ;} */
  private Expression primary() {
    Token token = cursor.peek();
    return switch (token.kind()) {
      case NUMBER -> number();
      case NAME, CONTEXT_WORD -> referenceOrCall();
      case OPEN_PARENTHESIS -> parenthesised();
      case STATEMENT_WORD, CLAUSE_WORD -> reserved(token);
      case CLOSE_PARENTHESIS, CLOSE_BRACKET -> {
        if (depth > 0) {
          cursor.failHere(
              ProblemKind.EXPRESSION_MISSING, "A number, a name or a parenthesis belongs here");
        } else {
          closesNothing(token);
        }
        yield missing();
      }
      default -> {
        cursor.failHere(
            ProblemKind.EXPRESSION_MISSING, "A number, a name or a parenthesis belongs here");
        yield missing();
      }
    };
  }

  private NumberExpression number() {
    Token digits = cursor.take();
    Optional<UnitText> unit = Optional.empty();
    if (cursor.is(TokenKind.UNIT)) {
      unit = Optional.of(unit());
    } else if (cursor.is(TokenKind.OPEN_UNIT)) {
      cursor.failBadToken();
    } else if (cursor.kind().isName() && cursor.peek().start() == digits.end()) {
      Token name = cursor.peek();
      String shown = cursor.text(digits) + cursor.text(name);
      cursor.fail(
          ProblemKind.OPERATOR_MISSING,
          new Span(digits.start(), name.end()),
          "\""
              + shown
              + "\" is not a number: write * for a product, or begin the name with a letter.",
          Fix.insert("Insert *", digits.end(), "*"));
    }
    return new NumberExpression(cursor.text(digits), unit, cursor.from(digits.start()));
  }

  /** {@code unit = "[", UCUM code, "]" ;} read as one token. */
  UnitText unit() {
    Token token = cursor.take();
    String code = cursor.text(new Span(token.start() + 1, token.end() - 1));
    return new UnitText(code.strip(), token.span());
  }

  /** {@code reference = name, { "." , name }, [ primes ] ;} */
  NameExpression reference() {
    Name name = dottedName();
    if (!cursor.is(TokenKind.PRIMES)) {
      return new NameExpression(name, 0, name.span());
    }
    int primes = cursor.take().span().length();
    return new NameExpression(name, primes, cursor.from(name.span().start()));
  }

  private Name dottedName() {
    Token first = cursor.take();
    int stop = first.end();
    while (cursor.is(TokenKind.DOT)
        && cursor.peek().start() == stop
        && cursor.kindAfter().isName()) {
      cursor.take();
      stop = cursor.take().end();
    }
    if (stop == first.end()) {
      return new Name(first.word(), first.span());
    }
    Span span = new Span(first.start(), stop);
    return new Name(cursor.text(span), span);
  }

  /** {@code arguments = "(", [ argument, { ",", argument } ], ")" ;} behind a reference. */
  private Expression call(NameExpression callee) {
    cursor.take();
    if (!enter()) {
      return missing();
    }
    List<Argument> arguments = new ArrayList<>();
    if (!cursor.is(TokenKind.CLOSE_PARENTHESIS)) {
      do {
        arguments.add(argument());
      } while (cursor.accept(TokenKind.COMMA));
    }
    close(TokenKind.CLOSE_PARENTHESIS, ")");
    depth--;
    return new CallExpression(callee, arguments, cursor.from(callee.span().start()));
  }

  /** {@code argument = [ name, "=" | "before" ], expression ;} */
  private Argument argument() {
    int start = cursor.peek().start();
    Optional<Name> label = Optional.empty();
    if (cursor.kind().isName() && cursor.kindAfter() == TokenKind.EQUALS) {
      Token name = cursor.take();
      label = Optional.of(new Name(cursor.text(name), name.span()));
      cursor.take();
    }
    boolean before = label.isEmpty() && cursor.acceptWord("before");
    Expression value = expression();
    return new Argument(label, before, value, cursor.from(start));
  }

  private Expression parenthesised() {
    int start = cursor.take().start();
    if (!enter()) {
      return missing();
    }
    Expression inner = expression();
    close(TokenKind.CLOSE_PARENTHESIS, ")");
    depth--;
    return new ParenthesisedExpression(inner, cursor.from(start));
  }

  private Expression referenceOrCall() {
    NameExpression reference = reference();
    if (cursor.is(TokenKind.OPEN_BRACKET)) {
      cursor.fail(
          ProblemKind.STATEMENT_NOT_SUPPORTED,
          cursor.peek().span(),
          "Indices are not read by this version yet: declare each state by a name of its own.");
    }
    return cursor.is(TokenKind.OPEN_PARENTHESIS) ? call(reference) : reference;
  }

  private Expression reserved(Token token) {
    String word = cursor.text(token);
    if (word.equals("if")) {
      cursor.fail(
          ProblemKind.WORD_UNEXPECTED,
          token.span(),
          "A choice inside of a sum or product stands in parentheses: write (if ... then ... else"
              + " ...).");
    } else {
      cursor.fail(
          ProblemKind.NAME_RESERVED,
          token.span(),
          "\""
              + word
              + "\" is a word of the language and cannot stand in an expression: use another"
              + " name.");
    }
    return missing();
  }

  /** Takes a closing bracket or reports what stands in its place. */
  private void close(TokenKind kind, String sign) {
    if (cursor.accept(kind) || cursor.failed()) {
      return;
    }
    if (cursor.atEnd()) {
      cursor.fail(
          ProblemKind.PARENTHESIS_NOT_CLOSED,
          cursor.peek().span(),
          "A parenthesis is not closed: write \"" + sign + "\" here or remove the opening one.",
          Fix.insert("Insert " + sign, cursor.lastEnd(), sign));
    } else {
      failOperator("An operator, a comma or \"" + sign + "\" belongs here");
    }
  }

  /**
   * Reports a token that cannot follow a complete expression; two values side by side get a message
   * of their own.
   */
  void failOperator(String expected) {
    Token token = cursor.peek();
    switch (token.kind()) {
      case NUMBER, NAME, CONTEXT_WORD, OPEN_PARENTHESIS ->
          cursor.fail(
              ProblemKind.OPERATOR_MISSING,
              token.span(),
              "A sign is missing before \""
                  + cursor.text(token)
                  + "\", or the statement should end there: write * for a product.",
              Fix.insert("Insert *", cursor.lastEnd(), "*"));
      case UNIT, OPEN_BRACKET ->
          cursor.fail(
              ProblemKind.WORD_UNEXPECTED,
              token.span(),
              "A unit stands directly behind a number: write 1 [unit] times the expression.");
      case CLOSE_PARENTHESIS, CLOSE_BRACKET -> closesNothing(token);
      case PERCENT ->
          cursor.fail(
              ProblemKind.WORD_UNEXPECTED,
              token.span(),
              "% stands behind ± only: as a unit, write it as [%].");
      case EQUALS ->
          cursor.fail(
              ProblemKind.WORD_UNEXPECTED,
              token.span(),
              "A second \"=\" has no meaning here: write one equation or declaration a line.");
      default -> cursor.failHere(ProblemKind.WORD_UNEXPECTED, expected);
    }
  }

  private void closesNothing(Token token) {
    cursor.fail(
        ProblemKind.PARENTHESIS_NOT_OPEN,
        token.span(),
        "\"" + cursor.text(token) + "\" closes nothing: remove it or write the opening one.",
        Fix.replace("Remove it", token.span(), ""));
  }

  private boolean enter() {
    if (++depth <= DEPTH_LIMIT) {
      return true;
    }
    cursor.fail(
        ProblemKind.NESTING_TOO_DEEP,
        cursor.peek().span(),
        "The expression is nested more than "
            + DEPTH_LIMIT
            + " levels deep: name a part of it with let.");
    return false;
  }

  private MissingExpression missing() {
    return new MissingExpression(cursor.peek().span());
  }
}
