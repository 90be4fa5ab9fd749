/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.internal.work;

/** Leaves the loops when the caller has cancelled; never crosses a public door. */
public final class Cancelled extends RuntimeException {
  private static final long serialVersionUID = 1;

  /** Makes the signal, without a stack trace. */
  public Cancelled() {
    super("cancelled", null, false, false);
  }
}
