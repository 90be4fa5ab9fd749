/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.workspace;

import java.util.function.BooleanSupplier;
import org.eclipse.core.runtime.IProgressMonitor;
import org.eclipse.core.runtime.SubMonitor;
import org.spanloom.numerics.Progress;

/**
 * Shows the progress of our plain bundles on a monitor of the workbench and passes its cancelling
 * on.
 */
public final class MonitorProgress implements Progress {

  private static final int TICKS = 1000;

  private final SubMonitor monitor;
  private final BooleanSupplier interrupted;
  private int done;

  /**
   * Adapts a monitor.
   *
   * @param monitor shown and asked
   * @param interrupted a second reason to stop
   */
  public MonitorProgress(IProgressMonitor monitor, BooleanSupplier interrupted) {
    this.monitor = SubMonitor.convert(monitor, TICKS);
    this.interrupted = interrupted;
  }

  @Override
  public void worked(double fraction) {
    int now = (int) (TICKS * Math.clamp(fraction, 0.0, 1.0));
    if (now > done) {
      monitor.worked(now - done);
      done = now;
    }
  }

  @Override
  public boolean isCancelled() {
    return monitor.isCanceled() || interrupted.getAsBoolean();
  }
}
