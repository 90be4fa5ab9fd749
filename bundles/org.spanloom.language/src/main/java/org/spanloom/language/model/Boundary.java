/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.List;
import org.spanloom.language.text.Span;
import org.spanloom.language.units.Dimension;
import org.spanloom.language.units.UnitOfMeasure;

/**
 * Conditions that pick one solution: as many as the state vector has components, each linear in
 * values of it at named times.
 *
 * @param name its name
 * @param conditions the conditions, in the order of the text
 * @param span the statement
 * @param nameSpan the name in it
 */
public record Boundary(String name, List<Condition> conditions, Span span, Span nameSpan) {

  /** Copies the list. */
  public Boundary {
    conditions = List.copyOf(conditions);
  }

  /**
   * One condition: the sum of {@code coefficient * component(at)} over the samples is the right
   * side, in coherent SI units.
   *
   * @param samples at least one; each has a time inside the interval
   * @param rightSide a term without time
   * @param dimension dimension of both sides
   * @param unit the unit to show them in
   * @param span its line
   */
  public record Condition(
      List<AffineValue.Sample> samples,
      Term rightSide,
      Dimension dimension,
      UnitOfMeasure unit,
      Span span) {
    /** Copies the list. */
    public Condition {
      samples = List.copyOf(samples);
    }
  }
}
