/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.internal.step;

/**
 * Signs as rounding errors have them, without pattern, yet the same in every run (xorshift
 * generator; Marsaglia 2003, J. Stat. Softw. 8).
 */
public final class RoundingSigns {

  private long state = 0x9E3779B97F4A7C15L;

  /** Returns -1 or 1. */
  public double next() {
    state ^= state << 13;
    state ^= state >>> 7;
    state ^= state << 17;
    return (state & 1) == 0 ? 1 : -1;
  }
}
