/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.Optional;
import org.spanloom.language.text.Span;
import org.spanloom.language.units.UnitOfMeasure;

/**
 * A constant of a system that a run may replace.
 *
 * @param name its name
 * @param unit declared unit
 * @param value its value; depends on other parameters at most
 * @param uncertainty half-width in coherent SI units (absolute), if one is stated
 * @param documentation documentation comments, empty if none
 * @param span the statement
 * @param nameSpan the name in it
 */
public record Parameter(
    String name,
    UnitOfMeasure unit,
    Term value,
    Optional<Term> uncertainty,
    String documentation,
    Span span,
    Span nameSpan) {}
