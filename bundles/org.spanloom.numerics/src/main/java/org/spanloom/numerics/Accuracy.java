/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics;

import java.util.Arrays;

/**
 * The error asked for. A value {@code x_i} with error {@code e_i} is good enough when {@code |e_i|
 * <= relative * max(|x_i|, scale_i)}.
 *
 * @param relative relative error asked for, positive; values below about 1e-14 cannot be met and
 *     are worked to what double precision gives, the error estimate then says what was reached
 * @param scale per state, positive: below this size only the absolute error counts
 */
public record Accuracy(double relative, double[] scale) {

  /** Checks and copies. */
  public Accuracy {
    if (!(relative > 0)) {
      throw new IllegalArgumentException("relative error " + relative + " is not positive");
    }
    scale = scale.clone();
  }

  @Override
  public double[] scale() {
    return scale.clone();
  }

  /** Returns the same scales with another relative error. */
  public Accuracy withRelative(double r) {
    return new Accuracy(r, scale);
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof Accuracy that
        && relative == that.relative
        && Arrays.equals(scale, that.scale);
  }

  @Override
  public int hashCode() {
    return 31 * Double.hashCode(relative) + Arrays.hashCode(scale);
  }

  @Override
  public String toString() {
    return "Accuracy[" + relative + "]";
  }
}
