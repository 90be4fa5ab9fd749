/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.Locale;

/**
 * Names with units and numbers for people; the decimal sign is a point in every locale, as in the
 * model.
 */
public final class Labels {

  private static final double PLAIN_FROM = 1e-4;
  private static final double PLAIN_TO = 1e7;

  private Labels() {}

  /** Returns {@code name [unit]}; a pure number has no brackets. */
  public static String withUnit(String name, String unit) {
    return isPure(unit) ? name : name + " [" + unit + "]";
  }

  /** Returns {@code number unit}. */
  public static String amount(double value, String unit, int digits) {
    return number(value, digits) + (isPure(unit) ? "" : " " + unit);
  }

  /** Returns {@code number ± error unit}. */
  public static String amount(double value, double error, String unit, int digits) {
    String text = number(value, digits) + " \u00b1 " + error(error);
    return isPure(unit) ? text : text + " " + unit;
  }

  private static boolean isPure(String unit) {
    return unit.isEmpty() || unit.equals("1");
  }

  /** Returns a number with as many digits as it needs, at most those given. */
  public static String number(double value, int digits) {
    if (!Double.isFinite(value)) {
      return Double.isNaN(value) ? "none" : value > 0 ? "infinite" : "-infinite";
    }
    if (value == 0) {
      return "0";
    }
    BigDecimal rounded = new BigDecimal(value).round(new MathContext(digits)).stripTrailingZeros();
    double size = Math.abs(value);
    if (size >= PLAIN_FROM && size < PLAIN_TO) {
      return rounded.toPlainString();
    }
    int exponent = rounded.precision() - rounded.scale() - 1;
    return rounded.movePointLeft(exponent).stripTrailingZeros().toPlainString() + "e" + exponent;
  }

  /** Returns an estimated error with the two digits that mean something. */
  public static String error(double value) {
    if (Double.isNaN(value)) {
      return "unknown";
    }
    return value == 0 ? "0" : String.format(Locale.ROOT, "%.1e", value);
  }
}
