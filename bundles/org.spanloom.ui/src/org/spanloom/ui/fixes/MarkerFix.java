/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.fixes;

import org.eclipse.core.filebuffers.FileBuffers;
import org.eclipse.core.filebuffers.ITextFileBuffer;
import org.eclipse.core.filebuffers.ITextFileBufferManager;
import org.eclipse.core.filebuffers.LocationKind;
import org.eclipse.core.resources.IMarker;
import org.eclipse.core.runtime.CoreException;
import org.eclipse.core.runtime.ILog;
import org.eclipse.core.runtime.IPath;
import org.eclipse.core.runtime.NullProgressMonitor;
import org.eclipse.swt.graphics.Image;
import org.eclipse.ui.IMarkerResolution2;
import org.spanloom.ui.Icon;
import org.spanloom.workspace.FixText;

/** A fix kept with a marker. Changes the open document where there is one, else the file. */
final class MarkerFix implements IMarkerResolution2 {

  private final FixText.Anchored anchored;

  MarkerFix(FixText.Anchored anchored) {
    this.anchored = anchored;
  }

  @Override
  public String getLabel() {
    return anchored.fix().label();
  }

  @Override
  public void run(IMarker marker) {
    IPath path = marker.getResource().getFullPath();
    ITextFileBufferManager buffers = FileBuffers.getTextFileBufferManager();
    try {
      buffers.connect(path, LocationKind.IFILE, new NullProgressMonitor());
      try {
        ITextFileBuffer buffer = buffers.getTextFileBuffer(path, LocationKind.IFILE);
        boolean openElsewhere = buffer.isShared();
        FixApplication.Result result = FixApplication.apply(buffer.getDocument(), anchored);
        if (result == FixApplication.Result.DONE && !openElsewhere) {
          buffer.commit(new NullProgressMonitor(), true);
        }
      } finally {
        buffers.disconnect(path, LocationKind.IFILE, new NullProgressMonitor());
      }
    } catch (CoreException e) {
      ILog.of(MarkerFix.class).error("The fix could not be applied to " + path + ".", e);
    }
  }

  @Override
  public String getDescription() {
    return getLabel();
  }

  @Override
  public Image getImage() {
    return Icon.OTHER.image();
  }
}
