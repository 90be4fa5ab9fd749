/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

/** Which branch of a choice is taken over a range of times. */
enum Branch {
  /** The first one, everywhere. */
  THEN,
  /** The second one, everywhere. */
  OTHERWISE,
  /** Perhaps both. */
  OPEN;

  /** Judges by what encloses the gap. */
  static Branch of(Term.Switch choice, Interval gap) {
    if (gap.isEmpty()) {
      return OPEN;
    }
    if (choice.holds(gap.high())) {
      return THEN;
    }
    return choice.holds(gap.low()) ? OPEN : OTHERWISE;
  }
}
