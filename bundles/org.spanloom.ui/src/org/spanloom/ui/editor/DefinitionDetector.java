/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.editor;

import java.util.Optional;
import org.eclipse.core.resources.IFile;
import org.eclipse.jface.dialogs.ErrorDialog;
import org.eclipse.jface.text.BadLocationException;
import org.eclipse.jface.text.IDocument;
import org.eclipse.jface.text.IRegion;
import org.eclipse.jface.text.ITextViewer;
import org.eclipse.jface.text.Region;
import org.eclipse.jface.text.hyperlink.AbstractHyperlinkDetector;
import org.eclipse.jface.text.hyperlink.IHyperlink;
import org.eclipse.ui.IWorkbenchPage;
import org.eclipse.ui.PartInitException;
import org.eclipse.ui.ide.IDE;
import org.eclipse.ui.ide.ResourceUtil;
import org.spanloom.language.editing.Definition;
import org.spanloom.language.text.Span;
import org.spanloom.workspace.WorkspaceFiles;

/** Makes names links to their declarations. */
public final class DefinitionDetector extends AbstractHyperlinkDetector {

  @Override
  public IHyperlink[] detectHyperlinks(ITextViewer viewer, IRegion region, boolean several) {
    ModelEditor editor = getAdapter(ModelEditor.class);
    IDocument document = viewer.getDocument();
    if (editor == null || document == null) {
      return null;
    }
    Optional<Span> target =
        editor
            .snapshots()
            .latest()
            .filter(s -> s.stamp() == ModelReconcilingStrategy.stamp(document))
            .flatMap(s -> Definition.at(s.model(), region.getOffset()));
    IRegion word = word(document, region.getOffset());
    return target
        .<IHyperlink>map(span -> new Link(editor, word, span))
        .or(() -> elsewhere(editor, document, region, word))
        .map(link -> new IHyperlink[] {link})
        .orElse(null);
  }

  private static Optional<IHyperlink> elsewhere(
      ModelEditor editor, IDocument document, IRegion region, IRegion word) {
    IFile file = ResourceUtil.getFile(editor.getEditorInput());
    return file == null
        ? Optional.empty()
        : editor
            .snapshots()
            .latest()
            .filter(s -> s.stamp() == ModelReconcilingStrategy.stamp(document))
            .flatMap(s -> Definition.elsewhere(s.model(), region.getOffset()))
            .map(e -> new FileLink(editor, word, WorkspaceFiles.of(file).file(e.file()), e.span()));
  }

  private static IRegion word(IDocument document, int offset) {
    try {
      int start = offset;
      while (start > 0 && Character.isUnicodeIdentifierPart(document.getChar(start - 1))) {
        start--;
      }
      int end = offset;
      while (end < document.getLength()
          && Character.isUnicodeIdentifierPart(document.getChar(end))) {
        end++;
      }
      return new Region(start, end - start);
    } catch (BadLocationException e) {
      return new Region(offset, 0);
    }
  }

  private record Link(ModelEditor editor, IRegion word, Span target) implements IHyperlink {

    @Override
    public IRegion getHyperlinkRegion() {
      return word;
    }

    @Override
    public String getTypeLabel() {
      return null;
    }

    @Override
    public String getHyperlinkText() {
      return "Open declaration";
    }

    @Override
    public void open() {
      editor.getSite().getPage().getNavigationHistory().markLocation(editor);
      editor.reveal(target);
    }
  }

  private record FileLink(ModelEditor editor, IRegion word, IFile file, Span target)
      implements IHyperlink {

    @Override
    public IRegion getHyperlinkRegion() {
      return word;
    }

    @Override
    public String getTypeLabel() {
      return null;
    }

    @Override
    public String getHyperlinkText() {
      return "Open declaration in " + file.getName();
    }

    @Override
    public void open() {
      IWorkbenchPage page = editor.getSite().getPage();
      page.getNavigationHistory().markLocation(editor);
      try {
        if (IDE.openEditor(page, file) instanceof ModelEditor other) {
          other.reveal(target);
        }
      } catch (PartInitException e) {
        ErrorDialog.openError(editor.getSite().getShell(), "Open declaration", null, e.getStatus());
      }
    }
  }
}
