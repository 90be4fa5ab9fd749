/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.editor;

import java.util.ArrayList;
import java.util.Iterator;
import java.util.List;
import java.util.Optional;
import java.util.function.Predicate;
import org.eclipse.core.resources.IMarker;
import org.eclipse.core.runtime.CoreException;
import org.eclipse.jface.text.IRegion;
import org.eclipse.jface.text.ITextHover;
import org.eclipse.jface.text.ITextViewer;
import org.eclipse.jface.text.Position;
import org.eclipse.jface.text.Region;
import org.eclipse.jface.text.source.Annotation;
import org.eclipse.jface.text.source.IAnnotationModel;
import org.eclipse.jface.text.source.ISourceViewer;
import org.eclipse.ui.texteditor.MarkerAnnotation;
import org.spanloom.language.editing.Hover;
import org.spanloom.language.editing.HoverText;
import org.spanloom.workspace.Ids;

/**
 * Tells the problems under the pointer; where there are none, what the word there means and what
 * the last check said of the basis or requirement it stands in.
 */
final class ModelHover implements ITextHover {

  private final ModelEditor editor;
  private final ISourceViewer viewer;

  ModelHover(ModelEditor editor, ISourceViewer viewer) {
    this.editor = editor;
    this.viewer = viewer;
  }

  @Override
  public IRegion getHoverRegion(ITextViewer textViewer, int offset) {
    return meaning(offset)
        .map(h -> new Region(h.span().start(), h.span().length()))
        .orElseGet(() -> new Region(offset, 0));
  }

  @Override
  @Deprecated
  public String getHoverInfo(ITextViewer textViewer, IRegion region) {
    int offset = region.getOffset();
    List<String> lines = new ArrayList<>(messages(offset, ModelHover::isProblem));
    if (lines.isEmpty()) {
      meaning(offset).ifPresent(h -> lines.addAll(h.lines()));
      lines.addAll(messages(offset, ModelHover::isResult));
    }
    return lines.isEmpty() ? null : String.join("\n", lines);
  }

  private Optional<HoverText> meaning(int offset) {
    return editor
        .snapshots()
        .latest()
        .filter(s -> s.stamp() == ModelReconcilingStrategy.stamp(editor.document()))
        .flatMap(s -> Hover.at(s.model(), offset));
  }

  private List<String> messages(int offset, Predicate<Annotation> wanted) {
    List<String> messages = new ArrayList<>();
    IAnnotationModel annotations = viewer.getAnnotationModel();
    if (annotations == null) {
      return messages;
    }
    for (Iterator<Annotation> i = annotations.getAnnotationIterator(); i.hasNext(); ) {
      Annotation annotation = i.next();
      Position position = annotations.getPosition(annotation);
      boolean touched =
          position != null
              && position.getOffset() <= offset
              && offset <= position.getOffset() + position.getLength();
      if (touched && !annotation.isMarkedDeleted() && wanted.test(annotation)) {
        messages.add(annotation.getText());
      }
    }
    return messages;
  }

  private static boolean isProblem(Annotation annotation) {
    return annotation instanceof ProblemAnnotation || isMarked(annotation, IMarker.PROBLEM);
  }

  private static boolean isResult(Annotation annotation) {
    return isMarked(annotation, Ids.BASIS) || isMarked(annotation, Ids.REQUIREMENT);
  }

  private static boolean isMarked(Annotation annotation, String type) {
    try {
      return annotation instanceof MarkerAnnotation saved && saved.getMarker().isSubtypeOf(type);
    } catch (CoreException e) {
      // The marker is gone.
      return false;
    }
  }
}
