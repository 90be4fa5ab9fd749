/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

/** What the value of a term depends on, by its structure. */
public enum TimeDependence {
  /** A number. */
  NUMBER,
  /** Parameters at most. */
  PARAMETERS,
  /** Time, and parameters it may be. */
  TIME;

  /** Returns what a term depends on; a term such as {@code t - t} counts as one with time in it. */
  public static TimeDependence of(Term term) {
    TermTape tape = TermTape.of(term);
    TimeDependence most = NUMBER;
    for (int i = 0; i < tape.size(); i++) {
      if (tape.node(i) instanceof Term.Time) {
        return TIME;
      }
      if (tape.node(i) instanceof Term.ParameterTerm) {
        most = PARAMETERS;
      }
    }
    return most;
  }
}
