/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics;

/** How long work tells how far it is and learns that nobody waits for it any more. */
public interface Progress {

  /** Nobody watches and nobody cancels. */
  Progress NONE =
      new Progress() {
        @Override
        public void worked(double fraction) {}

        @Override
        public boolean isCancelled() {
          return false;
        }
      };

  /**
   * Tells how much is done.
   *
   * @param fraction from 0 to 1
   */
  void worked(double fraction);

  /**
   * Tells whether the work should stop; solvers ask at least every 50 ms and stop within 100 ms.
   */
  boolean isCancelled();
}
