/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.coefficients;

/** Compiled terms: writes the values that vary with time; the others are in place already. */
public interface Program {

  /**
   * Writes the values.
   *
   * @param t time, in the declared unit of the system
   * @param out receives each value at its place; places of constant values are left alone
   */
  void run(double t, double[] out);
}
