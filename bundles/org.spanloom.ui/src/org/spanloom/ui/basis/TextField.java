/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.basis;

import org.eclipse.ui.views.markers.MarkerItem;

/** A column of words. */
public final class TextField extends AttributeField {

  @Override
  public String getValue(MarkerItem item) {
    return item.getMarker() == null ? "" : attribute(item);
  }

  @Override
  public int compare(MarkerItem one, MarkerItem other) {
    int byText = getValue(one).compareTo(getValue(other));
    return byText != 0 ? byText : byPlace(one, other);
  }
}
