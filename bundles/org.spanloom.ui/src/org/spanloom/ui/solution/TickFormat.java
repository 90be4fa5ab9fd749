/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.solution;

import java.io.Serial;
import java.text.FieldPosition;
import java.text.NumberFormat;
import java.text.ParsePosition;
import org.spanloom.ui.Labels;

/** Writes the numbers at an axis. */
final class TickFormat extends NumberFormat {

  @Serial private static final long serialVersionUID = 1L;

  private static final int DIGITS = 10;

  @Override
  public StringBuffer format(double number, StringBuffer into, FieldPosition position) {
    return into.append(Labels.number(number, DIGITS));
  }

  @Override
  public StringBuffer format(long number, StringBuffer into, FieldPosition position) {
    return into.append(number);
  }

  /** The chart reads its own labels back. */
  @Override
  public Number parse(String source, ParsePosition position) {
    try {
      double value = Double.parseDouble(source.substring(position.getIndex()));
      position.setIndex(source.length());
      return value;
    } catch (NumberFormatException e) {
      position.setErrorIndex(position.getIndex());
      return null;
    }
  }
}
