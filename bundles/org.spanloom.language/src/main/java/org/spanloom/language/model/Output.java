/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import org.spanloom.language.text.Span;
import org.spanloom.language.units.UnitOfMeasure;

/**
 * A named value, linear in the states, that results list beside the states.
 *
 * @param name its name
 * @param unit declared or inferred unit
 * @param value its value at the running time
 * @param documentation documentation comments, empty if none
 * @param span the statement
 * @param nameSpan the name in it
 */
public record Output(
    String name,
    UnitOfMeasure unit,
    AffineValue value,
    String documentation,
    Span span,
    Span nameSpan) {}
