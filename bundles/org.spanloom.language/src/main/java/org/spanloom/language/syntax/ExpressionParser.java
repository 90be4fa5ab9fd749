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
import org.spanloom.language.problem.TextEdit;
import org.spanloom.language.syntax.Expression.Addend;
import org.spanloom.language.syntax.Expression.Argument;
import org.spanloom.language.syntax.Expression.CallExpression;
import org.spanloom.language.syntax.Expression.ChoiceExpression;
import org.spanloom.language.syntax.Expression.Factor;
import org.spanloom.language.syntax.Expression.IndexedSumExpression;
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
   * {@code factor = ( "+" | "-" ), factor | indexed sum | power ;} so that {@code -x^2} is {@code
   * -(x^2)}.
   */
  private Expression factor() {
    int start = cursor.peek().start();
    if (cursor.isWord("sum") && cursor.isWordAfter("over")) {
      return indexedSum();
    }
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

  /**
   * {@code indexed sum = "sum", "over", turns, "of", term ;} so that {@code sum over i from 1 to 3
   * of k*c[i] + b} is {@code (sum over i from 1 to 3 of k*c[i]) + b}.
   */
  private Expression indexedSum() {
    int start = cursor.take().start();
    cursor.take();
    if (!enter()) {
      return missing();
    }
    Turns turns = turns();
    if (!cursor.failed() && !cursor.acceptWord("of")) {
      cursor.failHere(
          ProblemKind.WORD_UNEXPECTED,
          "\"of\" and what is added belong here",
          Fix.insert("Insert of", cursor.lastEnd(), " of"));
    }
    Expression body = term();
    depth--;
    return new IndexedSumExpression(turns, body, cursor.from(start));
  }

  /** {@code turns = name, "from", expression, "to", expression ;} */
  Turns turns() {
    Token name = cursor.peek();
    if (name.kind().isName()) {
      cursor.take();
    } else if (name.kind().isWord()) {
      cursor.fail(
          ProblemKind.NAME_RESERVED,
          name.span(),
          "\""
              + cursor.text(name)
              + "\" is a word of the language and cannot name an index: choose another name.");
    } else {
      cursor.failHere(ProblemKind.NAME_MISSING, "The name of an index belongs here, as in \"i\"");
    }
    word("from", "\"from\" and the first index belong here");
    Expression from = expression();
    word("to", "\"to\" and the last index belong here");
    Expression to = expression();
    Name index = new Name(cursor.text(name), name.span());
    return new Turns(index, from, to, cursor.from(name.start()));
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

  /** {@code reference = name, { "." , name }, [ indices ], [ primes ] ;} */
  NameExpression reference() {
    Name name = dottedName();
    if (!cursor.is(TokenKind.PRIMES) && !cursor.is(TokenKind.OPEN_BRACKET)) {
      return new NameExpression(name, List.of(), 0, name.span());
    }
    List<Expression> indices = cursor.is(TokenKind.OPEN_BRACKET) ? indices() : List.of();
    int primes = 0;
    if (cursor.is(TokenKind.PRIMES)) {
      Token sign = cursor.take();
      primes = sign.span().length();
      if (cursor.is(TokenKind.OPEN_BRACKET) && indices.isEmpty()) {
        failPrimesFirst(sign);
      }
    }
    return new NameExpression(name, indices, primes, cursor.from(name.span().start()));
  }

  /** {@code indices = "[", expression, { ",", expression }, "]" ;} */
  private List<Expression> indices() {
    cursor.take();
    List<Expression> indices = new ArrayList<>();
    if (enter()) {
      do {
        indices.add(expression());
      } while (cursor.accept(TokenKind.COMMA));
      if (cursor.is(TokenKind.EQUALS) || cursor.is(TokenKind.PRIMES)) {
        cursor.fail(
            ProblemKind.PARENTHESIS_NOT_CLOSED,
            cursor.peek().span(),
            "The bracket of the index is not closed: write \"]\" before \""
                + cursor.text(cursor.peek())
                + "\".",
            Fix.insert("Insert ]", cursor.lastEnd(), "]"));
      }
      close(TokenKind.CLOSE_BRACKET, "]");
      depth--;
    }
    return indices;
  }

  private void failPrimesFirst(Token primes) {
    indices();
    if (!cursor.failed()) {
      String sign = cursor.text(primes);
      int end = cursor.lastEnd();
      cursor.fail(
          ProblemKind.WORD_UNEXPECTED,
          primes.span(),
          "Primes stand behind the index, as in c[i]': move them there.",
          new Fix(
              "Move the primes",
              List.of(new TextEdit(primes.span(), ""), new TextEdit(new Span(end, end), sign))));
    }
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
