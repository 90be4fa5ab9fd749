/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.internal.work;

import org.spanloom.numerics.Outcome;
import org.spanloom.numerics.Outcome.Reason;

/** Leaves the loops when no trustworthy result can come any more; never crosses a public door. */
public final class Hopeless extends RuntimeException {
  private static final long serialVersionUID = 1;

  private final Reason reason;
  private final double time;

  /**
   * Makes the signal, without a stack trace.
   *
   * @param reason why
   * @param time where on the time axis
   * @param detail the numbers behind it, as part of a sentence
   */
  public Hopeless(Reason reason, double time, String detail) {
    super(detail, null, false, false);
    this.reason = reason;
    this.time = time;
  }

  /** Returns why. */
  public Reason reason() {
    return reason;
  }

  /** Returns what the caller is told. */
  public <T> Outcome<T> outcome() {
    return new Outcome.Unsolved<>(reason, time, getMessage());
  }
}
