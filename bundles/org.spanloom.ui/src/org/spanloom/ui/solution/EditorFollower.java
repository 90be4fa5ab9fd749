/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.solution;

import java.util.Optional;
import java.util.function.Consumer;
import org.eclipse.ui.IPartListener2;
import org.eclipse.ui.IWorkbenchPage;
import org.eclipse.ui.IWorkbenchPart;
import org.eclipse.ui.IWorkbenchPartReference;
import org.spanloom.ui.editor.ModelEditor;
import org.spanloom.ui.editor.ModelSnapshot;

/**
 * Follows the model editor in use and passes on what its text means; on the user interface thread.
 */
final class EditorFollower {

  private final IWorkbenchPage page;
  private final Consumer<Optional<ModelEditor>> editorChanged;
  private final Consumer<ModelSnapshot> modelChanged;
  private final Consumer<ModelSnapshot> snapshotListener = this::published;
  private final IPartListener2 parts = new Parts();
  private Optional<ModelEditor> editor = Optional.empty();

  /**
   * Begins to follow.
   *
   * @param editorChanged told the editor followed, empty when the last one closed
   * @param modelChanged told each snapshot of that editor that is current
   */
  EditorFollower(
      IWorkbenchPage page,
      Consumer<Optional<ModelEditor>> editorChanged,
      Consumer<ModelSnapshot> modelChanged) {
    this.page = page;
    this.editorChanged = editorChanged;
    this.modelChanged = modelChanged;
  }

  /** Begins with the editor in use. */
  void start() {
    page.addPartListener(parts);
    if (page.getActiveEditor() instanceof ModelEditor active) {
      follow(Optional.of(active));
    } else {
      editorChanged.accept(Optional.empty());
    }
  }

  void stop() {
    page.removePartListener(parts);
    editor.ifPresent(e -> e.snapshots().unlisten(snapshotListener));
    editor = Optional.empty();
  }

  private void follow(Optional<ModelEditor> wanted) {
    if (wanted.equals(editor)) {
      return;
    }
    editor.ifPresent(e -> e.snapshots().unlisten(snapshotListener));
    editor = wanted;
    editorChanged.accept(editor);
    editor.ifPresent(e -> {
      e.snapshots().listen(snapshotListener);
      e.snapshots().latest().ifPresent(modelChanged);
    });
  }

  /** Called in the reconciler's thread. */
  private void published(ModelSnapshot snapshot) {
    page.getWorkbenchWindow()
        .getWorkbench()
        .getDisplay()
        .asyncExec(() -> {
          boolean current =
              editor
                  .flatMap(e -> e.snapshots().latest())
                  .filter(latest -> latest == snapshot)
                  .isPresent();
          if (current) {
            modelChanged.accept(snapshot);
          }
        });
  }

  private final class Parts implements IPartListener2 {

    @Override
    public void partActivated(IWorkbenchPartReference reference) {
      takeIfModel(reference);
    }

    @Override
    public void partBroughtToTop(IWorkbenchPartReference reference) {
      takeIfModel(reference);
    }

    private void takeIfModel(IWorkbenchPartReference reference) {
      IWorkbenchPart part = reference.getPart(false);
      if (part instanceof ModelEditor model) {
        follow(Optional.of(model));
      }
    }

    @Override
    public void partClosed(IWorkbenchPartReference reference) {
      IWorkbenchPart part = reference.getPart(false);
      if (editor.filter(e -> e == part).isPresent()) {
        follow(
            page.getActiveEditor() instanceof ModelEditor next && next != part
                ? Optional.of(next)
                : Optional.empty());
      }
    }
  }
}
