/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.basis;

import org.eclipse.ui.views.markers.MarkerItem;
import org.spanloom.ui.Labels;
import org.spanloom.workspace.MarkerAttributes;

/** A time with its unit. */
public final class TimeField extends NumberField {

  private static final int DIGITS = 5;

  @Override
  String show(double value, MarkerItem item) {
    return Labels.amount(value, item.getAttributeValue(MarkerAttributes.TIME_UNIT, ""), DIGITS);
  }
}
