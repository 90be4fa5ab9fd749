/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.basis;

import java.util.Locale;
import org.eclipse.ui.views.markers.MarkerItem;
import org.spanloom.analysis.Figures;

/** A condition number. */
public final class ConditionField extends NumberField {

  private static final double WRITTEN_OUT = 1e4;

  @Override
  String show(double value, MarkerItem item) {
    if (Double.isInfinite(value)) {
      // The same words as in the reports: the error of the columns hides how large it is.
      return Figures.condition(value);
    }
    return String.format(Locale.ROOT, value < WRITTEN_OUT ? "%.4g" : "%.2e", value);
  }
}
