/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.editor;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.Iterator;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.function.Consumer;
import org.eclipse.jface.text.BadLocationException;
import org.eclipse.jface.text.IDocument;
import org.eclipse.jface.text.Position;
import org.eclipse.jface.text.source.Annotation;
import org.eclipse.jface.text.source.projection.ProjectionAnnotation;
import org.eclipse.jface.text.source.projection.ProjectionAnnotationModel;
import org.eclipse.jface.text.source.projection.ProjectionViewer;
import org.spanloom.language.editing.Folding;
import org.spanloom.language.text.Span;

/**
 * Keeps the folds of the viewer in step with the text. Only differences are applied, so that what
 * is folded stays so.
 */
final class ModelFolding implements Consumer<ModelSnapshot> {

  private volatile ProjectionViewer viewer;

  /** Takes the viewer once it can fold. */
  void install(ProjectionViewer foldingViewer) {
    viewer = foldingViewer;
  }

  @Override
  public void accept(ModelSnapshot snapshot) {
    ProjectionViewer target = viewer;
    ProjectionAnnotationModel folds = target == null ? null : target.getProjectionAnnotationModel();
    IDocument document = target == null ? null : target.getDocument();
    if (folds == null
        || document == null
        || ModelReconcilingStrategy.stamp(document) != snapshot.stamp()) {
      return;
    }
    Set<Position> wanted = new HashSet<>();
    for (Span span : Folding.of(snapshot.model().syntax())) {
      wholeLines(span, document, wanted);
    }
    List<Annotation> gone = new ArrayList<>();
    for (Iterator<Annotation> i = folds.getAnnotationIterator(); i.hasNext(); ) {
      Annotation fold = i.next();
      if (!wanted.remove(folds.getPosition(fold))) {
        gone.add(fold);
      }
    }
    Map<Annotation, Position> added = new HashMap<>();
    wanted.forEach(p -> added.put(new ProjectionAnnotation(), p));
    if (!gone.isEmpty() || !added.isEmpty()) {
      folds.modifyAnnotations(gone.toArray(Annotation[]::new), added, new Annotation[0]);
    }
  }

  private static void wholeLines(Span span, IDocument document, Set<Position> into) {
    try {
      int first = document.getLineOfOffset(span.start());
      int last = document.getLineOfOffset(span.end());
      if (last > first) {
        int start = document.getLineOffset(first);
        int end = document.getLineOffset(last) + document.getLineLength(last);
        into.add(new Position(start, end - start));
      }
    } catch (BadLocationException e) {
      // The text became shorter meanwhile; the next snapshot is on its way.
    }
  }
}
