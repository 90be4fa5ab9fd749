/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.editor;

import java.util.Optional;
import org.eclipse.jface.text.DefaultTextHover;
import org.eclipse.jface.text.IRegion;
import org.eclipse.jface.text.ITextViewer;
import org.eclipse.jface.text.Region;
import org.eclipse.jface.text.source.Annotation;
import org.eclipse.jface.text.source.ISourceViewer;
import org.spanloom.language.editing.Hover;
import org.spanloom.language.editing.HoverText;

/** Tells the problem under the pointer, else what the word there means. */
final class ModelHover extends DefaultTextHover {

  private final ModelEditor editor;

  ModelHover(ModelEditor editor, ISourceViewer viewer) {
    super(viewer);
    this.editor = editor;
  }

  @Override
  protected boolean isIncluded(Annotation annotation) {
    return annotation instanceof ProblemAnnotation
        || annotation.getText() != null
            && !annotation.getType().startsWith("org.eclipse.projection")
            && !annotation.getType().contains("quickdiff");
  }

  @Override
  public IRegion getHoverRegion(ITextViewer viewer, int offset) {
    return meaning(offset)
        .map(h -> (IRegion) new Region(h.span().start(), h.span().length()))
        .orElseGet(() -> super.getHoverRegion(viewer, offset));
  }

  @Override
  @SuppressWarnings(
      "deprecation") // The platform still asks by this method when nothing better is there.
  public String getHoverInfo(ITextViewer viewer, IRegion region) {
    String problem = super.getHoverInfo(viewer, region);
    return problem != null
        ? problem
        : meaning(region.getOffset()).map(h -> String.join("\n", h.lines())).orElse(null);
  }

  private Optional<HoverText> meaning(int offset) {
    return editor
        .snapshots()
        .latest()
        .filter(s -> s.stamp() == ModelReconcilingStrategy.stamp(editor.document()))
        .flatMap(s -> Hover.at(s.model(), offset));
  }
}
