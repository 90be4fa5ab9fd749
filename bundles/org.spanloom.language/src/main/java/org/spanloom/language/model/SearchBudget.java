/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

/**
 * The work that is spent on showing that the coefficients of one system have finite values: so many
 * nodes of their terms are looked at, some seconds of work.
 */
final class SearchBudget {

  private static final long NODE_LIMIT = 10_000_000;

  private long nodes;

  /** Notes that nodes were looked at. */
  void spend(long more) {
    nodes += more;
  }

  boolean isSpent() {
    return nodes >= NODE_LIMIT;
  }
}
