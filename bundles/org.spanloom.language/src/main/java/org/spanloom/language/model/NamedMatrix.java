/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import org.spanloom.language.text.Span;
import org.spanloom.language.units.UnitOfMeasure;

/**
 * A matrix as declared.
 *
 * @param name its name
 * @param unit declared or inferred unit of its entries
 * @param rows number of rows
 * @param columns number of columns
 * @param entries number of entries that are not 0 by structure
 * @param dependsOnTime whether it was declared as a function of time
 * @param documentation documentation comments, empty if none
 * @param span the statement
 * @param nameSpan the name in it
 */
public record NamedMatrix(
    String name,
    UnitOfMeasure unit,
    int rows,
    int columns,
    int entries,
    boolean dependsOnTime,
    String documentation,
    Span span,
    Span nameSpan) {}
