/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

/** A comparison. */
public enum Relation {
  /** Less. */
  LESS("<"),
  /** Less or equal. */
  AT_MOST("<="),
  /** Greater. */
  GREATER(">"),
  /** Greater or equal. */
  AT_LEAST(">=");

  private final String sign;

  Relation(String sign) {
    this.sign = sign;
  }

  /** Returns the sign as written. */
  public String sign() {
    return sign;
  }

  /** Tells whether the left side is the smaller one. */
  public boolean isUpperLimit() {
    return this == LESS || this == AT_MOST;
  }
}
