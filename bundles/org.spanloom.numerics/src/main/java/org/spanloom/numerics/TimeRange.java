/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics;

/**
 * A closed range of times; either end may be infinite.
 *
 * @param start first time, not NaN
 * @param end last time, not NaN, not before {@code start}
 */
public record TimeRange(double start, double end) {

  /** Checks the order of the ends; -0 becomes 0, so that sorting and comparing agree. */
  public TimeRange {
    if (!(start <= end)) {
      throw new IllegalArgumentException("a range from " + start + " to " + end + " is empty");
    }
    start += 0.0;
    end += 0.0;
  }

  /** Tells whether both ends are finite. */
  public boolean isBounded() {
    return Double.isFinite(start) && Double.isFinite(end);
  }

  /** Tells whether the time lies in the range, ends included. */
  public boolean contains(double t) {
    return start <= t && t <= end;
  }

  /** Returns the length, possibly infinite. */
  public double length() {
    return end - start;
  }
}
