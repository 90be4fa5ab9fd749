/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.basis;

import java.util.Locale;
import org.eclipse.ui.views.markers.MarkerItem;

/** A condition number. */
public final class ConditionField extends NumberField {

  private static final double WRITTEN_OUT = 1e4;

  @Override
  String show(double value, MarkerItem item) {
    if (Double.isInfinite(value)) {
      // What double precision cannot tell from singular.
      return "> 1e16";
    }
    return String.format(Locale.ROOT, value < WRITTEN_OUT ? "%.4g" : "%.2e", value);
  }
}
