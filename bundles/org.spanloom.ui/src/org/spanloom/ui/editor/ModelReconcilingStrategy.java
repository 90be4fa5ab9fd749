/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.editor;

import org.eclipse.core.runtime.IProgressMonitor;
import org.eclipse.core.runtime.NullProgressMonitor;
import org.eclipse.jface.text.IDocument;
import org.eclipse.jface.text.IDocumentExtension4;
import org.eclipse.jface.text.IRegion;
import org.eclipse.jface.text.reconciler.DirtyRegion;
import org.eclipse.jface.text.reconciler.IReconcilingStrategy;
import org.eclipse.jface.text.reconciler.IReconcilingStrategyExtension;
import org.spanloom.language.model.Model;
import org.spanloom.language.model.ModelReader;
import org.spanloom.language.text.SourceText;

/**
 * Reads the model when typing pauses, in the reconciler's thread, and publishes it unless the text
 * has changed meanwhile.
 */
final class ModelReconcilingStrategy
    implements IReconcilingStrategy, IReconcilingStrategyExtension {

  private final ModelEditor editor;
  private final ModelSnapshots snapshots;
  private volatile IDocument document;
  private volatile IProgressMonitor monitor = new NullProgressMonitor();

  ModelReconcilingStrategy(ModelEditor editor, ModelSnapshots snapshots) {
    this.editor = editor;
    this.snapshots = snapshots;
  }

  @Override
  public void setDocument(IDocument document) {
    this.document = document;
  }

  @Override
  public void setProgressMonitor(IProgressMonitor monitor) {
    this.monitor = monitor == null ? new NullProgressMonitor() : monitor;
  }

  @Override
  public void initialReconcile() {
    readModel();
  }

  @Override
  public void reconcile(DirtyRegion dirty, IRegion subRegion) {
    readModel();
  }

  @Override
  public void reconcile(IRegion partition) {
    readModel();
  }

  private void readModel() {
    IDocument read = document;
    if (read == null) {
      return;
    }
    long stamp = stamp(read);
    String text = read.get();
    if (stamp(read) != stamp) {
      return;
    }
    Model model =
        ModelReader.read(
            new SourceText(editor.getTitle(), text),
            EditorFiles.of(editor),
            () -> monitor.isCanceled() || stamp(read) != stamp);
    if (!monitor.isCanceled() && stamp(read) == stamp) {
      snapshots.publish(new ModelSnapshot(model, stamp));
    }
  }

  /** Returns a number that changes with each change of the document. */
  static long stamp(IDocument document) {
    return document instanceof IDocumentExtension4 stamped
        ? stamped.getModificationStamp()
        : IDocumentExtension4.UNKNOWN_MODIFICATION_STAMP;
  }
}
