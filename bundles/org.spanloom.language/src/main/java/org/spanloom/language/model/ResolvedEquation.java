/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.function.Predicate;
import org.spanloom.language.syntax.Statement.EquationStatement;
import org.spanloom.language.text.Span;

/**
 * An equation whose sides have a meaning.
 *
 * @param statement the text
 * @param left the left side
 * @param right the right side
 */
record ResolvedEquation(EquationStatement statement, Quantity left, Quantity right) {

  Span span() {
    return statement.span();
  }

  /**
   * Returns left minus right as far as it holds highest derivatives: one row of the mass matrix.
   */
  Quantity massSide(StateVector vector) {
    QuantitySum sum = new QuantitySum();
    add(sum, false, left, statement.left().span(), vector::isHighestDerivative);
    add(sum, true, right, statement.right().span(), vector::isHighestDerivative);
    return sum.total(left.dimension());
  }

  /** Returns right minus left without the highest derivatives. */
  Quantity forceSide(StateVector vector) {
    QuantitySum sum = new QuantitySum();
    add(sum, false, right, statement.right().span(), vector::isComponent);
    add(sum, true, left, statement.left().span(), vector::isComponent);
    sum.addConstant(false, right.constant().placedAt(statement.right().span()));
    sum.addConstant(true, left.constant().placedAt(statement.left().span()));
    return sum.total(right.dimension());
  }

  private static void add(
      QuantitySum sum, boolean minus, Quantity side, Span place, Predicate<StateKey> wanted) {
    side.coefficients()
        .forEach((key, part) -> {
          if (wanted.test(key)) {
            sum.addState(minus, key, part.placedAt(place));
          }
        });
  }
}
