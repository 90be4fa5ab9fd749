/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.internal.work;

import org.spanloom.numerics.Progress;

/**
 * Asks the caller often enough whether to go on, and not so often that asking costs.
 *
 * <p>Inner loops announce their work in floating point operations; about every two million of them,
 * some milliseconds even on a slow machine, the caller is asked.
 */
public final class Watch {

  /** Never stops anything. */
  public static final Watch NONE = new Watch(Progress.NONE);

  private static final double BETWEEN_QUESTIONS = 2e6;

  private final Progress progress;
  private double sinceAsked;

  /** Watches for one caller. */
  public Watch(Progress progress) {
    this.progress = progress;
  }

  /**
   * Announces work that was done or is next.
   *
   * @param operations about how many floating point operations
   * @throws Cancelled when the caller has cancelled
   */
  public void spend(double operations) {
    if (this == NONE) {
      return;
    }
    sinceAsked += operations;
    if (sinceAsked >= BETWEEN_QUESTIONS) {
      ask();
    }
  }

  /**
   * Asks at once.
   *
   * @throws Cancelled when the caller has cancelled
   */
  public void ask() {
    sinceAsked = 0;
    if (progress.isCancelled()) {
      throw new Cancelled();
    }
  }

  /** Passes on how far the work is, from 0 to 1. */
  public void worked(double fraction) {
    progress.worked(fraction);
  }
}
