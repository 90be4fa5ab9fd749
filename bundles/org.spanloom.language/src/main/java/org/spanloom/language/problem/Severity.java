/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.problem;

/** How bad a problem is, worst first. */
public enum Severity {
  /** The model cannot be used as it stands. */
  ERROR,
  /** The model can be used, but something in it deserves a look. */
  WARNING,
  /** A property worth knowing; nothing is wrong. */
  NOTE
}
