/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.units;

/**
 * A unit as written in a model: {@code value in coherent SI units = factor * value + offset}.
 *
 * @param code the UCUM code as written, without brackets; "1" for none
 * @param dimension the dimension
 * @param factor size of the unit in coherent SI base units (m, kg, s, A, K, mol, cd), positive
 * @param offset zero point in coherent SI base units; 0 except for temperatures such as Cel
 */
public record UnitOfMeasure(String code, Dimension dimension, double factor, double offset) {

  /** The unit of a pure number. */
  public static final UnitOfMeasure ONE = new UnitOfMeasure("1", Dimension.NONE, 1, 0);

  /** Returns a value given in this unit in coherent SI units. */
  public double toBase(double value) {
    return factor * value + offset;
  }

  /** Returns a value given in coherent SI units in this unit. */
  public double fromBase(double value) {
    return (value - offset) / factor;
  }

  /**
   * Returns the unit of a quotient, for example {@code K/h}; the zero of a temperature scale drops
   * out.
   */
  public UnitOfMeasure over(UnitOfMeasure divisor) {
    if (divisor.isOne()) {
      return offset == 0 ? this : withoutOffset();
    }
    String below = divisor.withoutOffset().code;
    return new UnitOfMeasure(
        withoutOffset().code + "/" + (isCompound(below) ? "(" + below + ")" : below),
        dimension.over(divisor.dimension),
        factor / divisor.factor,
        0);
  }

  private boolean isOne() {
    return code.equals("1");
  }

  /**
   * Returns the unit of differences: the same, but for a temperature scale the kelvin if its degree
   * is as large.
   */
  public UnitOfMeasure withoutOffset() {
    if (offset == 0) {
      return this;
    }
    if (factor == 1) {
      return new UnitOfMeasure("K", dimension, 1, 0);
    }
    return new UnitOfMeasure(code.equals("[degF]") ? "[degR]" : "(5.K/4)", dimension, factor, 0);
  }

  private static boolean isCompound(String code) {
    return code.indexOf('/') >= 0 || code.indexOf('.') >= 0;
  }
}
