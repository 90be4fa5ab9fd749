/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import org.spanloom.language.syntax.Statement.SystemStatement;

/** How much parts may add to the systems of one model file, so that reading it stays bounded. */
final class PartBudget {

  /** How deep parts may stand in parts. */
  static final int DEPTH_LIMIT = 50;

  /** Most statements that all parts of the systems of a file may hold together. */
  static final int STATEMENT_LIMIT = 100_000;

  private int statements;
  private boolean refused;

  /**
   * Takes the statements of one more part and tells whether there is room for them.
   *
   * @param depth the number of systems around it
   */
  boolean allows(SystemStatement type, int depth) {
    int more = type.body().size() + 1;
    if (depth > DEPTH_LIMIT || statements > STATEMENT_LIMIT - more) {
      return false;
    }
    statements += more;
    return true;
  }

  /** Tells whether this is the first time that somebody asks, so that one refusal is reported. */
  boolean isFirstRefusal() {
    boolean first = !refused;
    refused = true;
    return first;
  }
}
