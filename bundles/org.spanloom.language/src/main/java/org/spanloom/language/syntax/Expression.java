/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.syntax;

import java.util.List;
import java.util.Optional;
import org.spanloom.language.text.Span;

/**
 * An expression as written. Long sums and products are flat lists, so that the depth of a tree is
 * bounded by the depth of nested parentheses.
 */
public sealed interface Expression {

  /** Returns its place. */
  Span span();

  /** {@code 85}, {@code 0.6 [kW/K]}. */
  record NumberExpression(String digits, Optional<UnitText> unit, Span span)
      implements Expression {}

  /** {@code T_air}, {@code x''}, {@code c[i-1]'}. */
  record NameExpression(Name name, List<Expression> indices, int primes, Span span)
      implements Expression {
    /** Copies the list. */
    public NameExpression {
      indices = List.copyOf(indices);
    }

    /** Makes one without indices. */
    public NameExpression(Name name, int primes, Span span) {
      this(name, List.of(), primes, span);
    }

    /** Tells whether a member of a family is meant. */
    public boolean isIndexed() {
      return !indices.isEmpty();
    }

    /** Returns the name with its primes, without indices. */
    public String label() {
      return name.text() + "'".repeat(primes);
    }
  }

  /** {@code door(t)}, {@code x(before 6)}, {@code pulse(t, width = 1 [h])}. */
  record CallExpression(NameExpression callee, List<Argument> arguments, Span span)
      implements Expression {
    /** Copies the list. */
    public CallExpression {
      arguments = List.copyOf(arguments);
    }
  }

  /** {@code -x}. */
  record SignedExpression(boolean negative, Expression operand, Span span) implements Expression {}

  /** {@code a + b - c}. */
  record SumExpression(List<Addend> addends, Span span) implements Expression {
    /** Copies the list. */
    public SumExpression {
      addends = List.copyOf(addends);
    }
  }

  /** {@code a*b/c}. */
  record ProductExpression(List<Factor> factors, Span span) implements Expression {
    /** Copies the list. */
    public ProductExpression {
      factors = List.copyOf(factors);
    }
  }

  /** {@code sum over i from 1 to 400 of c[i]}. */
  record IndexedSumExpression(Turns turns, Expression body, Span span) implements Expression {}

  /** {@code a^b}. */
  record PowerExpression(Expression base, Expression exponent, Span span) implements Expression {}

  /** {@code if t < 6 [h] then a else b}. */
  record ChoiceExpression(Comparison condition, Expression then, Expression otherwise, Span span)
      implements Expression {}

  /** {@code (a)}. */
  record ParenthesisedExpression(Expression inner, Span span) implements Expression {}

  /** A place where an expression belongs and none was found. */
  record MissingExpression(Span span) implements Expression {}

  /**
   * One summand.
   *
   * @param subtracted whether a minus stands before it
   * @param value the summand
   */
  record Addend(boolean subtracted, Expression value) {}

  /**
   * One factor.
   *
   * @param divides whether a slash stands before it
   * @param value the factor or divisor
   */
  record Factor(boolean divides, Expression value) {}

  /**
   * One argument of a call.
   *
   * @param label the name it is given by, if there is one
   * @param before whether the word {@code before} stands in front: the limit from the left
   * @param value the argument
   * @param span its place
   */
  record Argument(Optional<Name> label, boolean before, Expression value, Span span) {}
}
