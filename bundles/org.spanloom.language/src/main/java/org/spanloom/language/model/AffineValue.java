/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.List;
import java.util.Optional;
import org.spanloom.language.text.Span;
import org.spanloom.language.units.Dimension;
import org.spanloom.language.units.UnitOfMeasure;

/**
 * A value that is affine in the states: {@code sum of coefficient * component(at) + constant}, in
 * coherent SI units.
 *
 * @param samples the states in it
 * @param constant the part without states; may depend on time where no time is named
 * @param dimension its dimension
 * @param unit the unit to show it in
 * @param span its text
 */
public record AffineValue(
    List<Sample> samples, Term constant, Dimension dimension, UnitOfMeasure unit, Span span) {

  /** Copies the list. */
  public AffineValue {
    samples = List.copyOf(samples);
  }

  /**
   * One state in it.
   *
   * @param component index of the component
   * @param at the time named, in coherent SI units, or empty for the running time
   * @param before whether the left limit is asked for
   * @param coefficient factor, in coherent SI units
   */
  public record Sample(int component, Optional<Term> at, boolean before, Term coefficient) {}
}
