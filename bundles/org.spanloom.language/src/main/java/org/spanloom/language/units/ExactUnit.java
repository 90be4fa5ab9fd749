/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.units;

/**
 * The size of a unit before rounding.
 *
 * @param factor its size in coherent SI units
 * @param dimension its dimension
 */
record ExactUnit(ExactFactor factor, Dimension dimension) {

  /** The unit of a pure number. */
  static final ExactUnit ONE = new ExactUnit(ExactFactor.ONE, Dimension.NONE);

  static ExactUnit number(ExactFactor factor) {
    return new ExactUnit(factor, Dimension.NONE);
  }

  ExactUnit times(ExactUnit other) {
    return new ExactUnit(factor.times(other.factor), dimension.times(other.dimension));
  }

  ExactUnit over(ExactUnit other) {
    return new ExactUnit(factor.over(other.factor), dimension.over(other.dimension));
  }

  ExactUnit power(int n) {
    return new ExactUnit(factor.power(n), dimension.power(n));
  }
}
