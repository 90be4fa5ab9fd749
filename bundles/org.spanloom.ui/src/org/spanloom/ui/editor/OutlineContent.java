/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.editor;

import java.util.List;
import org.eclipse.jface.viewers.ITreeContentProvider;

/** The tree of outline entries. */
final class OutlineContent implements ITreeContentProvider {

  @Override
  public Object[] getElements(Object input) {
    return input instanceof List<?> roots ? roots.toArray() : new Object[0];
  }

  @Override
  public Object[] getChildren(Object parent) {
    return parent instanceof OutlineEntry entry ? entry.children().toArray() : new Object[0];
  }

  @Override
  public Object getParent(Object element) {
    return null;
  }

  @Override
  public boolean hasChildren(Object element) {
    return element instanceof OutlineEntry entry && !entry.children().isEmpty();
  }
}
