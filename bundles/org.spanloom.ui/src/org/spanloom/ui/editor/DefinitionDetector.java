/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.editor;

import java.util.Optional;
import org.eclipse.jface.text.BadLocationException;
import org.eclipse.jface.text.IDocument;
import org.eclipse.jface.text.IRegion;
import org.eclipse.jface.text.ITextViewer;
import org.eclipse.jface.text.Region;
import org.eclipse.jface.text.hyperlink.AbstractHyperlinkDetector;
import org.eclipse.jface.text.hyperlink.IHyperlink;
import org.spanloom.language.editing.Definition;
import org.spanloom.language.text.Span;

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
    return target
        .map(span -> new IHyperlink[] {new Link(editor, word(document, region.getOffset()), span)})
        .orElse(null);
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
}
