/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.OptionalInt;
import java.util.function.Predicate;
import org.spanloom.language.text.Span;

/**
 * An equation whose sides have a meaning: one as written, or the balance of a state that transfers
 * govern.
 *
 * @param left the left side
 * @param leftSpan its place
 * @param right the right side
 * @param rightSpan its place
 * @param balanced the state that a balance governs; empty for an equation as written
 * @param span the statement, of a balance the first of its transfers
 */
record ResolvedEquation(
    Quantity left, Span leftSpan, Quantity right, Span rightSpan, OptionalInt balanced, Span span) {

  /**
   * Returns left minus right as far as it holds highest derivatives: one row of the mass matrix.
   */
  Quantity massSide(StateVector vector) {
    QuantitySum sum = new QuantitySum();
    add(sum, false, left, leftSpan, vector::isHighestDerivative);
    add(sum, true, right, rightSpan, vector::isHighestDerivative);
    return sum.total(left.dimension());
  }

  /** Returns right minus left without the highest derivatives. */
  Quantity forceSide(StateVector vector) {
    QuantitySum sum = new QuantitySum();
    add(sum, false, right, rightSpan, vector::isComponent);
    add(sum, true, left, leftSpan, vector::isComponent);
    sum.addConstant(false, right.constant().placedAt(rightSpan));
    sum.addConstant(true, left.constant().placedAt(leftSpan));
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
