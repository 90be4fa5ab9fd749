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
 * @param frame where its statement was read
 * @param left the left side
 * @param leftSpan its place in the frame's text
 * @param right the right side
 * @param rightSpan its place in the frame's text
 * @param balanced the state that a balance governs; empty for an equation as written
 * @param span the statement, of a balance the first of its transfers, in the frame's text
 */
record ResolvedEquation(
    Frame frame,
    Quantity left,
    Span leftSpan,
    Quantity right,
    Span rightSpan,
    OptionalInt balanced,
    Span span) {

  /** Returns the place of the statement in the text of the file being read. */
  Span placed() {
    return frame.placed(span);
  }

  /**
   * Returns left minus right as far as it holds highest derivatives: one row of the mass matrix.
   */
  Quantity massSide(StateVector vector) {
    QuantitySum sum = new QuantitySum();
    add(sum, false, left, frame.placed(leftSpan), vector::isHighestDerivative);
    add(sum, true, right, frame.placed(rightSpan), vector::isHighestDerivative);
    return sum.total(left.dimension());
  }

  /** Returns right minus left without the highest derivatives. */
  Quantity forceSide(StateVector vector) {
    QuantitySum sum = new QuantitySum();
    add(sum, false, right, frame.placed(rightSpan), vector::isComponent);
    add(sum, true, left, frame.placed(leftSpan), vector::isComponent);
    sum.addConstant(false, right.constant().placedAt(frame.placed(rightSpan)));
    sum.addConstant(true, left.constant().placedAt(frame.placed(leftSpan)));
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
