/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.syntax;

import java.util.Optional;
import org.spanloom.language.text.Span;

/**
 * {@code over t [h] from 0 to 48}: the independent variable and its interval.
 *
 * @param name the independent variable
 * @param unit its unit, if one is given
 * @param start the left end, if one is given
 * @param end the right end, if one is given
 * @param span the clause
 */
public record OverClause(
    Name name, Optional<UnitText> unit, Optional<Bound> start, Optional<Bound> end, Span span) {

  /**
   * An end of the interval.
   *
   * @param value where it lies
   * @param open whether the end itself is left out ({@code after}, {@code before})
   * @param span word and value
   */
  public record Bound(Expression value, boolean open, Span span) {}
}
