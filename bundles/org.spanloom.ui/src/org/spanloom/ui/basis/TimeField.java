/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.basis;

import java.util.Locale;
import org.eclipse.ui.views.markers.MarkerItem;
import org.spanloom.workspace.MarkerAttributes;

/** A time with its unit. */
public final class TimeField extends NumberField {

  @Override
  String show(double value, MarkerItem item) {
    String unit = item.getAttributeValue(MarkerAttributes.TIME_UNIT, "");
    return String.format(Locale.ROOT, "%.5g", value)
        + (unit.isEmpty() || unit.equals("1") ? "" : " " + unit);
  }
}
