/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.basis;

import org.spanloom.numerics.Side;

/** Functions of time offered as solutions of a homogeneous system, with their derivatives. */
public interface CandidateBasis {

  /** Returns m, the number of functions. */
  int columns();

  /**
   * Writes the values.
   *
   * @param t time
   * @param x receives n*m values, row by row
   */
  void value(double t, double[] x);

  /**
   * Writes the values on one side of a time, which functions that jump there tell apart.
   *
   * @param t time
   * @param side the side
   * @param x receives n*m values, row by row
   */
  default void value(double t, Side side, double[] x) {
    value(side == Side.AFTER ? t : t - 4 * Math.ulp(t), x);
  }

  /**
   * Writes the derivatives with respect to time.
   *
   * @param t time
   * @param dx receives n*m values, row by row
   */
  void derivative(double t, double[] dx);
}
