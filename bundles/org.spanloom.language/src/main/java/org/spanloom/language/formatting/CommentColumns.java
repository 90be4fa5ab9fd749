/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.formatting;

import java.util.List;
import org.spanloom.language.syntax.TokenKind;

/**
 * Places the comments behind code. Those on adjacent lines share the first of a few fixed columns
 * that lies right of their code; so a line that grows a little moves no comment of another line.
 */
final class CommentColumns {

  /** Characters before a comment, at the columns to choose from. */
  private static final List<Integer> COLUMNS = List.of(47, 55, 63);

  /** Least blanks between code and comment. */
  private static final int GAP = 3;

  private final Layout layout;

  private CommentColumns(Layout layout) {
    this.layout = layout;
  }

  /** Sets the blanks before comments behind code; those of the code must be set. */
  static void apply(Layout layout) {
    new CommentColumns(layout).runs();
  }

  private void runs() {
    int line = 0;
    while (line < layout.lineCount()) {
      int end = line;
      while (end < layout.lineCount() && (end == line || goesOn(end)) && holdsCode(end)) {
        end++;
      }
      place(line, end);
      line = Math.max(end, line + 1);
    }
  }

  private boolean holdsCode(int line) {
    return !layout.isBlank(line) && !layout.isCommentOnly(line);
  }

  /** A closing brace begins anew, since blank lines before it go. */
  private boolean goesOn(int line) {
    return layout.isBlank(line) || layout.kind(layout.first(line)) != TokenKind.CLOSE_BRACE;
  }

  private void place(int from, int to) {
    int widest = 0;
    for (int line = from; line < to; line++) {
      int width = code(line);
      if (hasComment(line) && width + GAP <= COLUMNS.getLast()) {
        widest = Math.max(widest, width);
      }
    }
    int needed = widest + GAP;
    int column = COLUMNS.stream().filter(c -> c >= needed).findFirst().orElse(0);
    for (int line = from; line < to; line++) {
      if (hasComment(line)) {
        layout.setBlanks(layout.end(line) - 1, Math.max(GAP, column - code(line)));
      }
    }
  }

  private boolean hasComment(int line) {
    int last = layout.end(line) - 1;
    return layout.isComment(last) && layout.blanks(last) != Layout.KEPT;
  }

  /** Returns the width of the code of a line with its indentation. */
  private int code(int line) {
    int first = layout.first(line);
    return layout.blanks(first) + layout.width(first, layout.end(line) - 1);
  }
}
