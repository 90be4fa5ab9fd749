/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.basis;

import java.util.OptionalDouble;
import java.util.OptionalInt;
import org.spanloom.language.text.Span;
import org.spanloom.numerics.TimeRange;

/**
 * How far a basis can be trusted over a range; times in the declared unit.
 *
 * @param system name of the system
 * @param name name of the basis; "principal" for the one that is always computed
 * @param declared whether the model declares it
 * @param range the times looked at
 * @param worstRaw largest 2-norm condition number; infinite if beyond what double precision tells
 * @param worstRawTime when
 * @param worstScaled largest condition number after scaling each column to length 1
 * @param worstScaledTime when
 * @param digitsLeft fewest decimal digits left for a result built on this basis, from 0 to about 16
 * @param digitsWanted digits that the system asks of its results
 * @param fewerFrom the time nearest to the start of the basis from which on it leaves fewer; empty
 *     if it never does
 * @param windows least number of consecutive windows, each with a basis of its own, that keep the
 *     scaled condition below the limit of the settings; empty if that could not be counted
 * @param windowLimit that limit
 * @param span the declaration; the name of the system where there is none
 */
public record BasisReport(
    String system,
    String name,
    boolean declared,
    TimeRange range,
    double worstRaw,
    double worstRawTime,
    double worstScaled,
    double worstScaledTime,
    double digitsLeft,
    double digitsWanted,
    OptionalDouble fewerFrom,
    OptionalInt windows,
    double windowLimit,
    Span span) {}
