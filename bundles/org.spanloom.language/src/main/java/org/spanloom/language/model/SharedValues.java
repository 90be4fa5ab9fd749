/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.IdentityHashMap;
import java.util.Map;
import java.util.Optional;
import java.util.function.Supplier;
import org.spanloom.language.syntax.Expression;

/**
 * Values of expressions that all members of a family share: each is read once in each frame.
 *
 * @param <T> what an expression gives
 */
final class SharedValues<T> {

  private final Map<Frame, Map<Expression, Optional<T>>> values = new IdentityHashMap<>();

  /** Returns the value of an expression, which is read if it was not read before. */
  Optional<T> of(Frame frame, Expression expression, Supplier<Optional<T>> reader) {
    Map<Expression, Optional<T>> own = values.computeIfAbsent(frame, f -> new IdentityHashMap<>());
    Optional<T> known = own.get(expression);
    if (known == null) {
      known = reader.get();
      own.put(expression, known);
    }
    return known;
  }
}
