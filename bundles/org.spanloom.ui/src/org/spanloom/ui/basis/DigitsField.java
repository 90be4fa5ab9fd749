/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.basis;

import java.util.Locale;
import org.eclipse.ui.views.markers.MarkerItem;

/** A number of decimal digits. */
public final class DigitsField extends NumberField {

  @Override
  String show(double value, MarkerItem item) {
    return String.format(Locale.ROOT, "%.1f", value);
  }
}
