/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.solution;

import java.util.function.UnaryOperator;

/**
 * What the whole plot shows.
 *
 * @param time the time axis
 * @param left the axis at the left
 * @param right the axis at the right, also where it is not shown
 */
record Zoom(Extent time, Extent left, Extent right) {

  /** Returns the zoom with another time axis. */
  Zoom withTime(UnaryOperator<Extent> change) {
    return new Zoom(change.apply(time), left, right);
  }

  /** Returns the zoom with both value axes changed in the same way. */
  Zoom withValues(UnaryOperator<Extent> change) {
    return new Zoom(time, change.apply(left), change.apply(right));
  }
}
