/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.basis;

import org.eclipse.ui.views.markers.MarkerItem;

/** A column of numbers, sorted as numbers; what has none comes last. */
abstract class NumberField extends AttributeField {

  /** Returns a number for people. */
  abstract String show(double value, MarkerItem item);

  @Override
  public final String getValue(MarkerItem item) {
    if (item.getMarker() == null) {
      return "";
    }
    double value = number(item);
    return Double.isNaN(value) ? "" : show(value, item);
  }

  @Override
  public final int compare(MarkerItem one, MarkerItem other) {
    // NaN, the absence of a number, is the largest value in this order.
    int byNumber = Double.compare(number(one), number(other));
    return byNumber != 0 ? byNumber : byPlace(one, other);
  }

  private double number(MarkerItem item) {
    String text = attribute(item);
    try {
      return text.isEmpty() ? Double.NaN : Double.parseDouble(text);
    } catch (NumberFormatException e) {
      return Double.NaN;
    }
  }
}
