/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.syntax;

import java.util.Optional;
import org.spanloom.language.text.Span;

/** What a {@code require} statement asks for. */
public sealed interface RequireClause {

  /** Returns its place, without the word {@code require}. */
  Span span();

  /** {@code T(12 [h]) < 278 [K] under warm}, {@code T < 300 [K] throughout until 10 [h]}. */
  record Compares(
      Comparison comparison,
      boolean throughout,
      Optional<Expression> until,
      Optional<Name> under,
      Span span)
      implements RequireClause {}

  /** {@code scaled condition(p) < 1e6 until 1 [h]}. */
  record LimitsCondition(
      boolean scaled,
      Name basis,
      TokenKind sign,
      Expression limit,
      Optional<Expression> until,
      Span span)
      implements RequireClause {}

  /** {@code stable}. */
  record IsStable(Span span) implements RequireClause {}

  /** {@code nonnegative under warm}. */
  record IsNonnegative(Optional<Name> under, Span span) implements RequireClause {}

  /** {@code invariant x + y}. */
  record IsInvariant(Expression value, Span span) implements RequireClause {}

  /** {@code period 24 [h]}. */
  record HasPeriod(Expression period, Span span) implements RequireClause {}
}
