/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import org.spanloom.language.text.Span;
import org.spanloom.language.units.UnitOfMeasure;

/**
 * A named expression of parameters, or of time as well.
 *
 * @param name its name
 * @param unit declared or inferred unit
 * @param value the expression
 * @param dependsOnTime whether it was declared as a function of time
 * @param documentation documentation comments, empty if none
 * @param span the statement
 * @param nameSpan the name in it
 */
public record Let(
    String name,
    UnitOfMeasure unit,
    Term value,
    boolean dependsOnTime,
    String documentation,
    Span span,
    Span nameSpan) {}
