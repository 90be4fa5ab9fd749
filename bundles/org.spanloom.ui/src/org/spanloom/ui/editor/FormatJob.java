/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.editor;

import java.util.List;
import org.eclipse.core.runtime.IProgressMonitor;
import org.eclipse.core.runtime.IStatus;
import org.eclipse.core.runtime.Status;
import org.eclipse.core.runtime.jobs.Job;
import org.eclipse.jface.text.IDocument;
import org.eclipse.jface.text.IDocumentExtension4;
import org.eclipse.jface.text.IRewriteTarget;
import org.eclipse.swt.widgets.Display;
import org.spanloom.language.formatting.Formatter;
import org.spanloom.language.problem.TextEdit;
import org.spanloom.language.syntax.Parser;
import org.spanloom.language.text.SourceText;
import org.spanloom.ui.UiIds;
import org.spanloom.ui.fixes.FixApplication;

/**
 * Works out the layout of a text beside the screen and applies it as one step to undo, unless the
 * text was changed meanwhile.
 */
final class FormatJob extends Job {

  private final ModelEditor editor;
  private final IDocument document;
  private final long stamp;
  private final SourceText source;
  private final Display display;

  /** Takes the text as it is now; called on the thread of the screen. */
  FormatJob(ModelEditor editor) {
    super("Format " + editor.getTitle());
    this.editor = editor;
    this.document = editor.document();
    this.stamp = stampOf(document);
    this.source = new SourceText(editor.getTitle(), document.get());
    this.display = editor.getSite().getShell().getDisplay();
    setUser(false);
  }

  private static long stampOf(IDocument document) {
    return document instanceof IDocumentExtension4 stamped
        ? stamped.getModificationStamp()
        : IDocumentExtension4.UNKNOWN_MODIFICATION_STAMP;
  }

  @Override
  public boolean belongsTo(Object family) {
    return UiIds.JOB_FAMILY.equals(family);
  }

  @Override
  protected IStatus run(IProgressMonitor monitor) {
    List<TextEdit> edits = Formatter.edits(Parser.parse(source));
    if (!edits.isEmpty() && !monitor.isCanceled() && !display.isDisposed()) {
      display.asyncExec(() -> apply(edits));
    }
    return Status.OK_STATUS;
  }

  private void apply(List<TextEdit> edits) {
    boolean open = editor.document() == document;
    if (!open || stampOf(document) != stamp) {
      return;
    }
    IRewriteTarget target = editor.getAdapter(IRewriteTarget.class);
    target.beginCompoundChange();
    try {
      FixApplication.apply(document, edits);
    } finally {
      target.endCompoundChange();
    }
  }
}
