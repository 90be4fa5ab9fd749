/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

/** Ends a command with one message for the person who gave it. */
final class CommandFailure extends Exception {

  private static final long serialVersionUID = 1;

  private final int exitCode;

  private CommandFailure(int exitCode, String message) {
    super(message);
    this.exitCode = exitCode;
  }

  /** The arguments ask for something that is not there, or a file cannot be read or written. */
  static CommandFailure refused(String message) {
    return new CommandFailure(ExitCode.REFUSED, message);
  }

  /** The model itself is at fault. */
  static CommandFailure found(String message) {
    return new CommandFailure(ExitCode.FOUND, message);
  }

  /**
   * What the analysis refuses.
   *
   * @param usage whether the arguments are at fault rather than the model
   * @param message what it says
   */
  static CommandFailure of(boolean usage, String message) {
    return usage ? refused(message) : found(message);
  }

  /** Returns the exit code. */
  int exitCode() {
    return exitCode;
  }
}
