/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.units;

import java.util.Arrays;

/**
 * The dimension of a quantity as exponents of the seven base dimensions of the SI; plane angle has
 * none.
 *
 * @param exponents exponents of length, mass, time, electric current, temperature, amount of
 *     substance, luminous intensity, in this order
 */
public record Dimension(int[] exponents) {

  /** The dimension of a pure number. */
  public static final Dimension NONE = new Dimension(new int[7]);

  /** The dimension of time. */
  public static final Dimension TIME = new Dimension(new int[] {0, 0, 1, 0, 0, 0, 0});

  /** Checks the length and copies. */
  public Dimension {
    if (exponents.length != 7) {
      throw new IllegalArgumentException("seven exponents are needed, not " + exponents.length);
    }
    exponents = exponents.clone();
  }

  @Override
  public int[] exponents() {
    return exponents.clone();
  }

  /** Tells whether this is the dimension of a pure number. */
  public boolean isNone() {
    return equals(NONE);
  }

  /** Returns the dimension of a product. */
  public Dimension times(Dimension other) {
    return plus(other, 1);
  }

  /** Returns the dimension of a quotient. */
  public Dimension over(Dimension other) {
    return plus(other, -1);
  }

  /** Returns the dimension of a whole power. */
  public Dimension power(int n) {
    return NONE.plus(this, n);
  }

  private Dimension plus(Dimension other, int factor) {
    int[] sum = exponents.clone();
    for (int i = 0; i < 7; i++) {
      sum[i] = Math.addExact(sum[i], Math.multiplyExact(factor, other.exponents[i]));
    }
    return new Dimension(sum);
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof Dimension that && Arrays.equals(exponents, that.exponents);
  }

  @Override
  public int hashCode() {
    return Arrays.hashCode(exponents);
  }

  /**
   * Returns the dimension in coherent SI base units, in UCUM code, for example {@code kg.m2.s-3};
   * "1" for none.
   */
  @Override
  public String toString() {
    String[] codes = {"m", "kg", "s", "A", "K", "mol", "cd"};
    StringBuilder text = new StringBuilder();
    for (int i : new int[] {1, 0, 2, 3, 4, 5, 6}) {
      if (exponents[i] != 0) {
        text.append(text.isEmpty() ? "" : ".").append(codes[i]);
        text.append(exponents[i] == 1 ? "" : String.valueOf(exponents[i]));
      }
    }
    return text.isEmpty() ? "1" : text.toString();
  }
}
