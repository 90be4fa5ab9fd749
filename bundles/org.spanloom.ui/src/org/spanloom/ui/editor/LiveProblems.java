/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.editor;

import java.util.HashMap;
import java.util.Map;
import java.util.function.Consumer;
import java.util.function.Supplier;
import org.eclipse.jface.text.IDocument;
import org.eclipse.jface.text.Position;
import org.eclipse.jface.text.source.Annotation;
import org.eclipse.jface.text.source.IAnnotationModel;
import org.eclipse.jface.text.source.IAnnotationModelExtension;
import org.eclipse.jface.text.source.ISourceViewer;
import org.spanloom.language.problem.Problem;
import org.spanloom.language.text.Span;

/**
 * Shows the problems of each snapshot as annotations of the viewer, in place of those of the one
 * before.
 */
final class LiveProblems implements Consumer<ModelSnapshot> {

  private final Supplier<ISourceViewer> viewer;
  private Annotation[] shown = new Annotation[0];

  LiveProblems(Supplier<ISourceViewer> viewer) {
    this.viewer = viewer;
  }

  @Override
  public synchronized void accept(ModelSnapshot snapshot) {
    ISourceViewer target = viewer.get();
    if (target == null
        || !(target.getAnnotationModel() instanceof IAnnotationModelExtension annotations)) {
      return;
    }
    IDocument document = target.getDocument();
    Map<Annotation, Position> fresh = new HashMap<>();
    for (Problem problem : snapshot.model().problems()) {
      fresh.put(new ProblemAnnotation(problem), position(problem.span(), document));
    }
    annotations.replaceAnnotations(shown, fresh);
    shown = fresh.keySet().toArray(Annotation[]::new);
  }

  /** A squiggle needs at least one character; where the text ends, the one before must do. */
  private static Position position(Span span, IDocument document) {
    int length = document == null ? span.end() : document.getLength();
    int start = Math.min(span.start(), Math.max(0, length - 1));
    int end = Math.min(Math.max(span.end(), start + 1), length);
    return new Position(start, Math.max(0, end - start));
  }

  /** Removes the annotations from a model that the viewer is about to leave. */
  synchronized void clear(IAnnotationModel model) {
    if (model instanceof IAnnotationModelExtension annotations) {
      annotations.replaceAnnotations(shown, Map.of());
    }
    shown = new Annotation[0];
  }
}
