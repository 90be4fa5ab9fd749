/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.regex.Pattern;

/** Numbers as text, the same in every locale. */
final class NumberText {

  /** Most numbers in one list. */
  static final int LIST_LIMIT = 1_000_000;

  private static final int DIGITS = 17;
  private static final MathContext ROUNDED = new MathContext(DIGITS, RoundingMode.HALF_EVEN);
  private static final Pattern NUMBER =
      Pattern.compile("[+-]?(?:[0-9]+(?:\\.[0-9]*)?|\\.[0-9]+)(?:[eE][+-]?[0-9]+)?");

  private NumberText() {}

  /**
   * Writes a number with 17 significant digits, which name one double and no other. The digits are
   * those of the double's exact value, correctly rounded; zeros at the end are left out, and the
   * exponent form is taken below 1e-4 and from 1e17 on.
   *
   * @param value any double
   * @return for example {@code 277}, {@code 0.10000000000000001}, {@code 1.5e-07}
   */
  static String exact(double value) {
    if (Double.isNaN(value)) {
      return "NaN";
    }
    if (Double.isInfinite(value)) {
      return value > 0 ? "Infinity" : "-Infinity";
    }
    if (value == 0) {
      return 1 / value < 0 ? "-0" : "0";
    }
    if (value == Math.rint(value) && Math.abs(value) < 1e15) {
      return Long.toString((long) value);
    }
    BigDecimal rounded = new BigDecimal(value).round(ROUNDED).stripTrailingZeros();
    int exponent = rounded.precision() - rounded.scale() - 1;
    if (exponent >= -4 && exponent < DIGITS) {
      return rounded.toPlainString();
    }
    String digits = rounded.unscaledValue().abs().toString();
    StringBuilder text = new StringBuilder();
    text.append(value < 0 ? "-" : "").append(digits.charAt(0));
    if (digits.length() > 1) {
      text.append('.').append(digits, 1, digits.length());
    }
    text.append('e').append(exponent < 0 ? '-' : '+');
    text.append(Math.abs(exponent) < 10 ? "0" : "").append(Math.abs(exponent));
    return text.toString();
  }

  /** Writes a number with three significant digits, for people. */
  static String brief(double value) {
    if (Double.isNaN(value)) {
      return "unknown";
    }
    if (Double.isInfinite(value)) {
      return value > 0 ? "infinite" : "-infinite";
    }
    double size = Math.abs(value);
    if (size == 0) {
      return "0";
    }
    if (size >= 1e-3 && size < 1e5) {
      return new BigDecimal(value)
          .round(new MathContext(3, RoundingMode.HALF_EVEN))
          .stripTrailingZeros()
          .toPlainString();
    }
    return String.format(Locale.ROOT, "%.2e", value);
  }

  /** Writes a condition number with seven significant digits. */
  static String condition(double value) {
    return Double.isFinite(value) ? String.format(Locale.ROOT, "%.7g", value) : brief(value);
  }

  /**
   * Reads a number.
   *
   * @param text decimal digits with sign, point and exponent as wanted
   * @param where what the number is for, at the start of a message
   * @return a finite number
   * @throws CommandFailure if the text is no such number, or too large
   */
  static double read(String text, String where) throws CommandFailure {
    String trimmed = text.strip();
    if (!NUMBER.matcher(trimmed).matches()) {
      throw CommandFailure.refused(
          where + ": '" + shown(text) + "' is not a number; write one like 12.5 or 1e-3");
    }
    double value = Double.parseDouble(trimmed);
    if (Double.isInfinite(value)) {
      throw CommandFailure.refused(
          where + ": " + shown(trimmed) + " is too large; numbers go up to about 1.8e308");
    }
    return value;
  }

  /**
   * Reads numbers with commas between them.
   *
   * @param text the list
   * @param where what it is for, at the start of a message
   * @return at least one number, in the order written
   * @throws CommandFailure if one of them is no number, or there are more than {@link #LIST_LIMIT}
   */
  static List<Double> readList(String text, String where) throws CommandFailure {
    List<Double> values = new ArrayList<>();
    for (String part : text.split(",", -1)) {
      if (values.size() == LIST_LIMIT) {
        throw CommandFailure.refused(where + ": more than " + LIST_LIMIT + " numbers");
      }
      values.add(read(part, where));
    }
    return values;
  }

  /**
   * Reads a whole number.
   *
   * @param text decimal digits
   * @param least smallest allowed
   * @param most largest allowed
   * @param where what it is for, at the start of a message
   * @throws CommandFailure if the text is no whole number from least to most
   */
  static int readCount(String text, int least, int most, String where) throws CommandFailure {
    try {
      int value = Integer.parseInt(text.strip());
      if (value >= least && value <= most) {
        return value;
      }
    } catch (NumberFormatException e) {
      // The message below serves for this as well.
    }
    throw CommandFailure.refused(
        where
            + ": '"
            + shown(text)
            + "' will not do; give a whole number from "
            + least
            + " to "
            + most);
  }

  /** Shortens a text for a message and replaces what would disturb a terminal. */
  static String shown(String text) {
    StringBuilder shown = new StringBuilder();
    for (int i = 0; i < Math.min(60, text.length()); i++) {
      char c = text.charAt(i);
      shown.append(Character.isISOControl(c) ? '?' : c);
    }
    return text.length() > 60 ? shown + "..." : shown.toString();
  }
}
