/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.editor;

import java.util.Arrays;
import java.util.Set;
import java.util.stream.Collectors;
import org.eclipse.core.filebuffers.IAnnotationModelFactory;
import org.eclipse.core.resources.IFile;
import org.eclipse.core.resources.IMarker;
import org.eclipse.core.resources.ResourcesPlugin;
import org.eclipse.core.runtime.IPath;
import org.eclipse.jface.text.source.AnnotationModel;
import org.eclipse.jface.text.source.IAnnotationModel;
import org.eclipse.ui.texteditor.ResourceMarkerAnnotationModel;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.workspace.FindingMarkers;
import org.spanloom.workspace.MarkerAttributes;

/**
 * Makes the annotation models of model files. They leave out markers of problems that the editor
 * finds itself while the text is typed; otherwise each would be shown twice, and once at the wrong
 * place.
 */
public final class ModelAnnotationModelFactory implements IAnnotationModelFactory {

  private static final Set<String> FOUND_WHILE_TYPING =
      Arrays.stream(ProblemKind.values())
          .map(ProblemKind::id)
          .collect(Collectors.toUnmodifiableSet());

  @Override
  public IAnnotationModel createAnnotationModel(IPath location) {
    IFile file =
        location.segmentCount() < 2
            ? null
            : ResourcesPlugin.getWorkspace().getRoot().getFile(location);
    return file == null || !file.exists() ? new AnnotationModel() : new Annotations(file);
  }

  private static final class Annotations extends ResourceMarkerAnnotationModel {

    Annotations(IFile file) {
      super(file);
    }

    @Override
    protected boolean isAcceptable(IMarker marker) {
      boolean live =
          FindingMarkers.SOURCE.equals(marker.getAttribute(IMarker.SOURCE_ID, ""))
              && FOUND_WHILE_TYPING.contains(marker.getAttribute(MarkerAttributes.CODE, ""));
      return !live && super.isAcceptable(marker);
    }
  }
}
