/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import org.spanloom.language.text.Span;
import org.spanloom.language.units.UnitOfMeasure;

/**
 * One component of the state vector: a state or, of a state with an equation of higher order, one
 * of its derivatives.
 *
 * @param index place in the state vector, from 0
 * @param label the name with its primes, for example {@code x'}
 * @param name the name of the state
 * @param order number of primes
 * @param unit declared unit; for a derivative that is not declared: the state's unit over the time
 *     unit
 * @param scale size below which only the absolute error counts, in the declared unit; 1 unless
 *     stated
 * @param documentation documentation comments, empty if none
 * @param declaration the statement that declares it
 * @param equation the statement that governs its derivative; the declaration where there is none
 */
public record StateComponent(
    int index,
    String label,
    String name,
    int order,
    UnitOfMeasure unit,
    double scale,
    String documentation,
    Span declaration,
    Span equation) {}
