/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.syntax;

/** How values between the rows of a table are found. */
public enum TableMethod {
  /** The value of a row holds until the next one. */
  HOLD("hold"),
  /** Straight lines from row to row. */
  LINEAR("linear"),
  /** Cubics that rise and fall where the rows do. */
  MONOTONE_CUBIC("monotone cubic");

  private final String words;

  TableMethod(String words) {
    this.words = words;
  }

  /** Returns the words as written. */
  public String words() {
    return words;
  }
}
