/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.fixes;

import org.eclipse.core.resources.IMarker;
import org.eclipse.ui.IMarkerResolution;
import org.eclipse.ui.IMarkerResolutionGenerator2;
import org.spanloom.workspace.FixText;
import org.spanloom.workspace.MarkerAttributes;

/** Offers the fixes kept with our markers. */
public final class MarkerFixes implements IMarkerResolutionGenerator2 {

  @Override
  public boolean hasResolutions(IMarker marker) {
    return !marker.getAttribute(MarkerAttributes.FIXES, "").isEmpty();
  }

  @Override
  public IMarkerResolution[] getResolutions(IMarker marker) {
    return FixText.read(marker.getAttribute(MarkerAttributes.FIXES, "")).stream()
        .map(MarkerFix::new)
        .toArray(IMarkerResolution[]::new);
  }
}
