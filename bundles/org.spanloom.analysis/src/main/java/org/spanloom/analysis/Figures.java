/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis;

import java.math.BigDecimal;
import java.math.MathContext;
import org.spanloom.language.model.SystemModel;

/**
 * Numbers for people: a few significant digits, no padding zeros, an exponent only where it helps.
 */
public final class Figures {

  private Figures() {}

  /**
   * Returns a number in decimal figures.
   *
   * @param value any number
   * @param digits most significant digits to show, at least 1
   */
  public static String text(double value, int digits) {
    if (Double.isNaN(value)) {
      return "undefined";
    }
    if (Double.isInfinite(value)) {
      return value > 0 ? "infinite" : "minus infinite";
    }
    if (value == 0) {
      return "0";
    }
    BigDecimal rounded = new BigDecimal(value).round(new MathContext(digits)).stripTrailingZeros();
    int exponent = rounded.precision() - rounded.scale() - 1;
    return exponent < -4 || exponent >= Math.max(6, digits)
        ? scientific(rounded, exponent)
        : rounded.toPlainString();
  }

  /** Returns a number with its unit; a pure number has none. */
  public static String text(double value, int digits, String unit) {
    return text(value, digits) + (unit.equals("1") ? "" : " " + unit);
  }

  /** Returns a time of a system in words, for example "t = 2.6 h". */
  public static String at(SystemModel system, double time) {
    return system.timeName() + " = " + text(time, 6, system.timeUnit().code());
  }

  /**
   * Returns a condition number; one that is infinite is larger than its own error lets anyone tell.
   */
  public static String condition(double value) {
    return Double.isInfinite(value) ? "too large to tell" : text(value, 3);
  }

  private static String scientific(BigDecimal value, int exponent) {
    return value.movePointLeft(exponent).toPlainString() + "e" + exponent;
  }
}
