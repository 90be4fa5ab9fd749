/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.boundary;

import org.spanloom.language.text.Span;

/**
 * What is known of the solutions that meet boundary conditions.
 *
 * @param name name of the conditions
 * @param verdict how many solutions there are
 * @param toConditions how many scales the solution changes, at most, for conditions changed by the
 *     size of their coefficients; not a number unless there is one solution
 * @param toForcing how many scales it changes, at most, for a forcing changed by one scale in a
 *     unit of time; not a number unless there is one solution
 * @param digitsLeft decimal digits that the conditions leave to the solution
 * @param detail the same in words, as the end of a sentence
 * @param span the statement
 */
public record BoundaryReport(
    String name,
    Verdict verdict,
    double toConditions,
    double toForcing,
    double digitsLeft,
    String detail,
    Span span) {

  /** How many solutions there are. */
  public enum Verdict {
    /** Exactly one. */
    UNIQUE,
    /** None. */
    NONE,
    /** Infinitely many. */
    FAMILY,
    /** The numerics gave up. */
    UNKNOWN
  }
}
