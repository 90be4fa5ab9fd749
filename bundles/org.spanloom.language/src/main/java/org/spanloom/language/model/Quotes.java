/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

/** Shortens texts that messages quote. */
final class Quotes {

  private static final int LONGEST = 48;

  private Quotes() {}

  /** Returns a text on one line with single blanks, its end left out where it is long. */
  static String shortened(String text) {
    String head = text.length() > 4 * LONGEST ? text.substring(0, 4 * LONGEST) + "..." : text;
    String line = head.replaceAll("#[^\r\n]*", " ").replaceAll("\\s+", " ").strip();
    return line.length() <= LONGEST ? line : line.substring(0, LONGEST - 3).stripTrailing() + "...";
  }
}
