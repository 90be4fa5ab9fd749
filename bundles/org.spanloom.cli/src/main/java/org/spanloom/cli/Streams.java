/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import java.io.FileDescriptor;
import java.io.FileOutputStream;
import java.io.OutputStream;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;

/**
 * Where a command writes.
 *
 * @param out results; failures to write are not swallowed
 * @param err messages
 * @param terminal whether somebody watches the messages on a terminal, so that progress may be
 *     drawn there
 */
record Streams(OutputStream out, PrintStream err, boolean terminal) {

  /**
   * Set by the start script, which can ask the system whether standard error is a terminal; Java
   * cannot.
   */
  private static final String TERMINAL = "spanloom.terminal";

  /** Returns the streams of this process. */
  static Streams ofProcess() {
    // Not System.out: a PrintStream hides that the reader of a pipe has gone.
    OutputStream out = new FileOutputStream(FileDescriptor.out);
    PrintStream err =
        new PrintStream(new FileOutputStream(FileDescriptor.err), true, StandardCharsets.UTF_8);
    return new Streams(out, err, Boolean.getBoolean(TERMINAL));
  }

  /** Writes one message line. */
  void say(String message) {
    err.print("spanloom: " + message + "\n");
    err.flush();
  }
}
