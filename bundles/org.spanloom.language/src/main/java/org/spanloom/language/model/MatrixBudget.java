/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

/** How much the sums and products of matrices may do while one model is read. */
final class MatrixBudget {

  /** Most entries that they may touch together. */
  static final int ENTRY_LIMIT = 1_000_000;

  private long entries;

  /** Takes some more entries and tells whether there was room for all so far. */
  boolean allows(int more) {
    entries += more;
    return entries <= ENTRY_LIMIT;
  }
}
