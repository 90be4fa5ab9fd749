/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.syntax;

import java.util.ArrayList;
import java.util.List;

/** The statements of a text as the parser cuts them, before any of them is read. */
public final class StatementLines {

  private StatementLines() {}

  /**
   * Returns the statements in the order of the text. What stands before a brace is one of its own,
   * and a brace by itself ends one without tokens.
   */
  public static List<StatementLine> of(String text) {
    StatementSplitter splitter = new StatementSplitter(text);
    List<StatementLine> lines = new ArrayList<>();
    while (splitter.peek().start() < text.length()) {
      lines.add(splitter.next());
    }
    return lines;
  }
}
