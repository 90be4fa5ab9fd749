/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import org.spanloom.numerics.Progress;

/**
 * Draws one line on a terminal while work goes on, and takes it away when the work is done. Nobody
 * can cancel through it: a key press ends the whole process.
 */
final class TerminalProgress implements Progress, AutoCloseable {

  private static final long QUIET_NANOS = 300_000_000;
  private static final long STEP_NANOS = 100_000_000;
  private static final int WIDTH = 78;

  private final Streams streams;
  private final String label;
  private long next = System.nanoTime() + QUIET_NANOS;
  private boolean drawn;

  /**
   * Starts.
   *
   * @param streams where to draw; nothing is drawn where nobody watches
   * @param label what is being done
   */
  TerminalProgress(Streams streams, String label) {
    this.streams = streams;
    this.label = label;
  }

  @Override
  public void worked(double fraction) {
    if (!streams.terminal()) {
      return;
    }
    long now = System.nanoTime();
    if (now - next < 0) {
      return;
    }
    next = now + STEP_NANOS;
    int percent = (int) Math.round(100 * Math.min(1, Math.max(0, fraction)));
    String line = label + "  " + percent + " %";
    line = line.length() > WIDTH ? "..." + line.substring(line.length() - WIDTH + 3) : line;
    streams.err().print("\r" + line + " ".repeat(WIDTH - line.length()) + "\r" + line);
    streams.err().flush();
    drawn = true;
  }

  @Override
  public boolean isCancelled() {
    return false;
  }

  @Override
  public void close() {
    if (drawn) {
      streams.err().print("\r" + " ".repeat(WIDTH) + "\r");
      streams.err().flush();
    }
  }
}
