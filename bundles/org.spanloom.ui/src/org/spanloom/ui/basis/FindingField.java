/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.basis;

import org.eclipse.core.resources.IMarker;
import org.eclipse.jface.viewers.ViewerCell;
import org.eclipse.swt.graphics.GC;
import org.eclipse.swt.graphics.Image;
import org.eclipse.swt.widgets.Control;
import org.eclipse.ui.ISharedImages;
import org.eclipse.ui.PlatformUI;
import org.eclipse.ui.views.markers.MarkerField;
import org.eclipse.ui.views.markers.MarkerItem;

/** The message with a sign of its severity; a sound basis has none. The worst come first. */
public final class FindingField extends MarkerField {

  private static final int CHARACTERS = 55;

  @Override
  public String getValue(MarkerItem item) {
    return item.getAttributeValue(IMarker.MESSAGE, "");
  }

  @Override
  public int compare(MarkerItem one, MarkerItem other) {
    int byPlace = AttributeField.byPlace(one, other);
    return byPlace != 0 ? byPlace : getValue(one).compareTo(getValue(other));
  }

  @Override
  public void update(ViewerCell cell) {
    super.update(cell);
    if (cell.getElement() instanceof MarkerItem item) {
      cell.setImage(item.getMarker() == null ? null : annotateImage(item, image(item)));
    }
  }

  private static Image image(MarkerItem item) {
    ISharedImages images = PlatformUI.getWorkbench().getSharedImages();
    return switch (item.getAttributeValue(IMarker.SEVERITY, IMarker.SEVERITY_INFO)) {
      case IMarker.SEVERITY_ERROR -> images.getImage(ISharedImages.IMG_OBJS_ERROR_TSK);
      case IMarker.SEVERITY_WARNING -> images.getImage(ISharedImages.IMG_OBJS_WARN_TSK);
      default -> images.getImage(ISharedImages.IMG_OBJS_INFO_TSK);
    };
  }

  @Override
  public int getDefaultColumnWidth(Control control) {
    GC gc = new GC(control);
    try {
      return CHARACTERS * gc.textExtent("0").x;
    } finally {
      gc.dispose();
    }
  }
}
