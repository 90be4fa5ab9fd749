/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics;

/**
 * Random numbers that are the same in every language: {@code s <- (1103515245 s + 12345) mod 2^31},
 * the constants of the C standard's example.
 */
public final class Lcg31 {

  private long state;

  /** Starts the sequence. */
  public Lcg31(long start) {
    this.state = start;
  }

  /** Returns the next number in [0, 1). */
  public double unit() {
    state = (1103515245L * state + 12345) % (1L << 31);
    return state / (double) (1L << 31);
  }

  /** Returns the next numbers in [-1, 1). */
  public double[] symmetric(int count) {
    double[] values = new double[count];
    for (int k = 0; k < count; k++) {
      values[k] = 2 * unit() - 1;
    }
    return values;
  }
}
