/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

/** What the process tells its caller. */
final class ExitCode {

  /** The work is done and nothing of severity error was found. */
  static final int CLEAN = 0;

  /** The work is done, but the model has errors or a requirement does not hold. */
  static final int FOUND = 1;

  /** The work could not be done: wrong arguments, or a file that cannot be read or written. */
  static final int REFUSED = 2;

  private ExitCode() {}
}
