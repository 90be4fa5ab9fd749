/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

/** A function of time that is computed as a whole, not from terms. Safe for use by threads. */
public interface Curve {

  /**
   * Returns the value at a time; right at a jump the one after it.
   *
   * @param time in coherent SI units
   * @return the value in coherent SI units
   */
  double at(double time);
}
