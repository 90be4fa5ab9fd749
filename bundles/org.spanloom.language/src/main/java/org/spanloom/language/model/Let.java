/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import org.spanloom.language.text.Span;
import org.spanloom.language.units.UnitOfMeasure;

/**
 * A named expression of parameters, or of time as well; or an input.
 *
 * @param name its name
 * @param unit declared or inferred unit
 * @param value the expression
 * @param dependsOnTime whether it was declared as a function of time
 * @param isInput whether it was declared as an input, whose value is a default
 * @param documentation documentation comments, empty if none
 * @param span the statement
 * @param nameSpan the name in it
 */
public record Let(
    String name,
    UnitOfMeasure unit,
    Term value,
    boolean dependsOnTime,
    boolean isInput,
    String documentation,
    Span span,
    Span nameSpan) {

  /** Tells whether it was declared as a table. */
  public boolean isTable() {
    return value instanceof Term.CurveTerm;
  }
}
