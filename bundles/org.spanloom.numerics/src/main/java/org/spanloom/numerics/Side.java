/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics;

/** Which of the two one-sided limits of a coefficient or a solution is meant at a breakpoint. */
public enum Side {
  /** The limit from earlier times. */
  BEFORE,
  /** The limit from later times, which is also the value at the time itself. */
  AFTER
}
