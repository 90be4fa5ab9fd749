/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.basis;

import org.eclipse.core.resources.IMarker;
import org.eclipse.core.runtime.IConfigurationElement;
import org.eclipse.core.runtime.IExecutableExtension;
import org.eclipse.jface.viewers.ViewerCell;
import org.eclipse.swt.graphics.GC;
import org.eclipse.swt.widgets.Control;
import org.eclipse.ui.views.markers.MarkerField;
import org.eclipse.ui.views.markers.MarkerItem;

/**
 * A column that shows an attribute; plugin.xml names the attribute behind the class, after a colon.
 */
abstract class AttributeField extends MarkerField implements IExecutableExtension {

  private String attribute = "";

  @Override
  public final void setInitializationData(
      IConfigurationElement element, String property, Object data) {
    attribute = data instanceof String name ? name : "";
  }

  /** Returns the attribute as kept, empty where the marker has none. */
  final String attribute(MarkerItem item) {
    return item.getAttributeValue(attribute, "");
  }

  /** Severity, then place: makes every order total. */
  static int byPlace(MarkerItem one, MarkerItem other) {
    int bySeverity =
        Integer.compare(
            other.getAttributeValue(IMarker.SEVERITY, 0),
            one.getAttributeValue(IMarker.SEVERITY, 0));
    return bySeverity != 0
        ? bySeverity
        : Integer.compare(
            one.getAttributeValue(IMarker.LINE_NUMBER, 0),
            other.getAttributeValue(IMarker.LINE_NUMBER, 0));
  }

  @Override
  public int getDefaultColumnWidth(Control control) {
    GC gc = new GC(control);
    try {
      return gc.textExtent(getColumnHeaderText()).x + 5 * gc.textExtent("0").x;
    } finally {
      gc.dispose();
    }
  }

  @Override
  public void update(ViewerCell cell) {
    super.update(cell);
    cell.setImage(null);
  }
}
