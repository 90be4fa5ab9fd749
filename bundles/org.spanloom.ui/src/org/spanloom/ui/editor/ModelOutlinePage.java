/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.editor;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.function.Consumer;
import org.eclipse.jface.viewers.IStructuredSelection;
import org.eclipse.jface.viewers.SelectionChangedEvent;
import org.eclipse.jface.viewers.StructuredSelection;
import org.eclipse.jface.viewers.TreeViewer;
import org.eclipse.swt.widgets.Composite;
import org.eclipse.swt.widgets.Display;
import org.eclipse.ui.views.contentoutline.ContentOutlinePage;
import org.spanloom.language.editing.Outline;
import org.spanloom.language.editing.OutlineNode;

/** The outline of a model file; selecting a node shows its line. */
final class ModelOutlinePage extends ContentOutlinePage {

  private static final int LEVELS_OPEN = 2;

  private final ModelEditor editor;
  private final Consumer<ModelSnapshot> listener = this::snapshotPublished;
  private List<OutlineEntry> shown = List.of();
  private boolean showing;

  ModelOutlinePage(ModelEditor editor) {
    this.editor = editor;
  }

  @Override
  public void createControl(Composite parent) {
    super.createControl(parent);
    TreeViewer tree = getTreeViewer();
    tree.setContentProvider(new OutlineContent());
    tree.setLabelProvider(new OutlineLabels());
    tree.setUseHashlookup(true);
    editor.snapshots().listen(listener);
    editor.snapshots().latest().ifPresent(s -> show(roots(s), true));
  }

  private void snapshotPublished(ModelSnapshot snapshot) {
    List<OutlineEntry> roots = roots(snapshot);
    Display display = editor.getSite().getShell().getDisplay();
    display.asyncExec(() -> {
      boolean current = editor.snapshots().latest().filter(s -> s == snapshot).isPresent();
      if (current && getControl() != null && !getControl().isDisposed()) {
        show(roots, getTreeViewer().getInput() == null);
      }
    });
  }

  private static List<OutlineEntry> roots(ModelSnapshot snapshot) {
    return OutlineEntry.all(Outline.of(snapshot.model().syntax()));
  }

  /** Entries are equal by their path of names, so what is open and selected stays so. */
  private void show(List<OutlineEntry> roots, boolean first) {
    boolean looksSame = !first && OutlineEntry.lookSame(shown, roots);
    shown = roots;
    if (looksSame) {
      return;
    }
    TreeViewer tree = getTreeViewer();
    showing = true;
    try {
      tree.getTree().setRedraw(false);
      Set<Object> open = new HashSet<>(List.of(tree.getExpandedElements()));
      IStructuredSelection selected = tree.getStructuredSelection();
      tree.setInput(roots);
      if (first) {
        tree.expandToLevel(LEVELS_OPEN);
      } else {
        tree.setExpandedElements(stillThere(roots, open));
      }
      tree.setSelection(
          new StructuredSelection(stillThere(roots, new HashSet<>(List.of(selected.toArray())))));
    } finally {
      tree.getTree().setRedraw(true);
      showing = false;
    }
  }

  private static Object[] stillThere(List<OutlineEntry> roots, Set<Object> wanted) {
    List<Object> found = new ArrayList<>();
    collect(roots, wanted, found);
    return found.toArray();
  }

  private static void collect(List<OutlineEntry> entries, Set<Object> wanted, List<Object> found) {
    for (OutlineEntry entry : entries) {
      if (wanted.contains(entry)) {
        found.add(entry);
      }
      collect(entry.children(), wanted, found);
    }
  }

  @Override
  public void selectionChanged(SelectionChangedEvent event) {
    super.selectionChanged(event);
    Optional<OutlineNode> node =
        event.getStructuredSelection().getFirstElement() instanceof OutlineEntry entry
            ? current(entry)
            : Optional.empty();
    if (!showing) {
      node.ifPresent(n -> editor.reveal(n.nameSpan()));
    }
  }

  /** The tree may hold an entry of an older text that looks the same; its place may have moved. */
  private Optional<OutlineNode> current(OutlineEntry entry) {
    List<Object> found = new ArrayList<>();
    collect(shown, Set.of(entry), found);
    return found.stream()
        .filter(OutlineEntry.class::isInstance)
        .map(e -> ((OutlineEntry) e).node())
        .findFirst();
  }

  @Override
  public void dispose() {
    editor.snapshots().unlisten(listener);
    editor.outlineDisposed();
    super.dispose();
  }
}
