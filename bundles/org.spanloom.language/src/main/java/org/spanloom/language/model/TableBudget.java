/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

/** How much all tables of a model may read from files, a file counted for each of them. */
final class TableBudget {

  /** Most rows. */
  static final int ROW_LIMIT = 3_000_000;

  /** Characters that count as a row at least, however few rows they hold. */
  private static final int ROW_LENGTH = 32;

  private long rows;

  /** Tells whether a text may be read. */
  boolean allows(String text) {
    return rows + text.length() / ROW_LENGTH <= ROW_LIMIT;
  }

  /** Notes that rows were read from a text. */
  void spend(String text, int read) {
    rows += Math.max(read, text.length() / ROW_LENGTH);
  }
}
