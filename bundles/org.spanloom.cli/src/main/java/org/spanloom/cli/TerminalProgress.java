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
  private double done;
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
    // The parts of a check count from the start again; a line that runs backwards would be no help.
    done = Math.max(done, Math.min(1, fraction));
    draw();
  }

  @Override
  public boolean isCancelled() {
    // Asked often, also by work that cannot tell how far it is.
    draw();
    return false;
  }

  private void draw() {
    if (!streams.terminal()) {
      return;
    }
    long now = System.nanoTime();
    if (now - next < 0) {
      return;
    }
    next = now + STEP_NANOS;
    String line = label + "  " + Math.round(100 * done) + " %";
    line = line.length() > WIDTH ? "..." + line.substring(line.length() - WIDTH + 3) : line;
    streams.err().print("\r" + line + " ".repeat(WIDTH - line.length()) + "\r" + line);
    streams.err().flush();
    drawn = true;
  }

  @Override
  public void close() {
    if (drawn) {
      streams.err().print("\r" + " ".repeat(WIDTH) + "\r");
      streams.err().flush();
    }
  }
}
