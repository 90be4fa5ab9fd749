/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

/**
 * How much text the loops and sums of a model may repeat, those of its parts included. The work of
 * reading a loop is in proportion to its text times its turns.
 */
final class RepetitionBudget {

  /** Most characters, a character in each turn counted once. */
  static final long TEXT_LIMIT = 20_000_000;

  private long text;

  /** Takes the turns of a loop and tells whether there is room for them. */
  boolean allows(long turns, int characters) {
    if (turns > 0 && characters > (TEXT_LIMIT - text) / turns) {
      return false;
    }
    text += turns * characters;
    return true;
  }
}
