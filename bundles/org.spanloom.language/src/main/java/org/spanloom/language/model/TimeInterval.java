/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

/**
 * The interval I of a system, in the declared unit of the independent variable.
 *
 * @param start left end; negative infinity when missing
 * @param startOpen whether the left end itself is left out
 * @param end right end; positive infinity when missing
 * @param endOpen whether the right end itself is left out
 */
public record TimeInterval(double start, boolean startOpen, double end, boolean endOpen) {

  /** Tells whether both ends are finite. */
  public boolean isBounded() {
    return Double.isFinite(start) && Double.isFinite(end);
  }
}
