/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.editor;

import org.eclipse.jface.viewers.DelegatingStyledCellLabelProvider;
import org.eclipse.jface.viewers.DelegatingStyledCellLabelProvider.IStyledLabelProvider;
import org.eclipse.jface.viewers.LabelProvider;
import org.eclipse.jface.viewers.StyledString;
import org.eclipse.swt.graphics.Image;
import org.spanloom.ui.Icon;

/** Shows the name of an outline entry, with the rest of its line in a quiet colour. */
final class OutlineLabels extends DelegatingStyledCellLabelProvider {

  OutlineLabels() {
    super(new Labels());
  }

  private static final class Labels extends LabelProvider implements IStyledLabelProvider {

    @Override
    public StyledString getStyledText(Object element) {
      StyledString text = new StyledString(element.toString());
      if (element instanceof OutlineEntry entry && !entry.detail().isEmpty()) {
        text.append("  " + entry.detail(), StyledString.QUALIFIER_STYLER);
      }
      return text;
    }

    @Override
    public Image getImage(Object element) {
      return element instanceof OutlineEntry entry ? Icon.of(entry.node().kind()).image() : null;
    }
  }
}
