/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.Optional;
import java.util.OptionalDouble;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.syntax.Expression;
import org.spanloom.language.syntax.Expression.NumberExpression;
import org.spanloom.language.syntax.Expression.ParenthesisedExpression;
import org.spanloom.language.syntax.Expression.SignedExpression;
import org.spanloom.language.units.UnitOfMeasure;

/** Reads numbers as written. */
final class Literals {

  private final Problems problems;
  private final UnitResolver units;

  Literals(Problems problems, UnitResolver units) {
    this.problems = problems;
    this.units = units;
  }

  /**
   * Returns the number in an expression that is nothing but a number, with or without sign and
   * unit.
   */
  static Optional<NumberExpression> alone(Expression expression) {
    return switch (expression) {
      case NumberExpression number -> Optional.of(number);
      case SignedExpression(boolean negative, NumberExpression number, var span) ->
          Optional.of(number);
      default -> Optional.empty();
    };
  }

  /**
   * Tells whether an expression is a lone number without a unit, so that it takes a declared one.
   */
  static boolean isBare(Expression expression) {
    return alone(expression).filter(n -> n.unit().isEmpty()).isPresent();
  }

  /**
   * Returns the value of a lone number, its sign included, or empty after a problem was reported.
   */
  OptionalDouble signedValue(Expression expression) {
    NumberExpression number = alone(expression).orElseThrow();
    OptionalDouble value = value(number);
    boolean negative = expression instanceof SignedExpression signed && signed.negative();
    return negative && value.isPresent() ? OptionalDouble.of(0.0 - value.getAsDouble()) : value;
  }

  /** Returns the value of the digits of a number, or empty after a problem was reported. */
  OptionalDouble value(NumberExpression number) {
    double value = Double.parseDouble(number.digits());
    boolean vanishes = value == 0 && hasOtherDigitThanZero(number.digits());
    if (Double.isInfinite(value) || vanishes) {
      outOfRange(number);
      return OptionalDouble.empty();
    }
    return OptionalDouble.of(value);
  }

  /**
   * Returns a number with its unit in coherent SI units, or empty after a problem was reported.
   *
   * @param number the number
   * @param negative whether a minus before it belongs to it, which matters for units with a zero
   *     point of their own
   */
  Optional<Quantity> quantity(NumberExpression number, boolean negative) {
    OptionalDouble read = value(number);
    Optional<UnitOfMeasure> unit = units.declared(number.unit());
    if (read.isEmpty() || unit.isEmpty()) {
      return Optional.empty();
    }
    double value = negative ? 0.0 - read.getAsDouble() : read.getAsDouble();
    double base = unit.get().toBase(value);
    if (Double.isInfinite(base) || base == 0 && value != 0 && unit.get().offset() == 0) {
      outOfRange(number);
      return Optional.empty();
    }
    Quantity plain = Quantity.constant(new Term.Constant(base), unit.get().dimension(), 1);
    boolean zero = value == 0 && number.unit().isEmpty();
    return Optional.of(
        new Quantity(plain.coefficients(), plain.constant(), plain.dimension(), zero, 1));
  }

  /** Returns the unit with a zero point of its own that a lone number carries. */
  static Optional<UnitOfMeasure> offsetUnit(Expression expression) {
    Expression inner = expression;
    while (inner instanceof ParenthesisedExpression parenthesised) {
      inner = parenthesised.inner();
    }
    return alone(inner)
        .flatMap(NumberExpression::unit)
        .flatMap(UnitResolver::known)
        .filter(u -> u.offset() != 0);
  }

  private void outOfRange(NumberExpression number) {
    String shown = number.digits();
    problems.report(
        ProblemKind.NUMBER_OUT_OF_RANGE,
        number.span(),
        "The number "
            + (shown.length() > 40 ? shown.substring(0, 37) + "..." : shown)
            + " is too large or too close to 0: in SI units its size must lie between 4.9e-324 and 1.8e308.");
  }

  private static boolean hasOtherDigitThanZero(String digits) {
    for (int i = 0; i < digits.length(); i++) {
      char c = digits.charAt(i);
      if (c == 'e' || c == 'E') {
        return false;
      }
      if (c >= '1' && c <= '9') {
        return true;
      }
    }
    return false;
  }
}
