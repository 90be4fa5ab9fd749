/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.editor;

import java.util.List;

/**
 * Turns lines into comments and back. A documentation comment is text like any other: it gets a
 * sign in front and loses it again, so that nothing is lost either way.
 */
final class LineComments {

  private static final String SIGN = "# ";

  private LineComments() {}

  /**
   * Returns the lines toggled: bare if all that are not blank were comments, else all as comments.
   */
  static List<String> toggle(List<String> lines) {
    boolean allComments =
        lines.stream().filter(l -> !l.isBlank()).allMatch(LineComments::isComment)
            && lines.stream().anyMatch(l -> !l.isBlank());
    if (allComments) {
      return lines.stream().map(LineComments::bare).toList();
    }
    int indent =
        lines.stream().filter(l -> !l.isBlank()).mapToInt(LineComments::indent).min().orElse(0);
    return lines.stream()
        .map(l -> l.isBlank() ? l : l.substring(0, indent) + SIGN + l.substring(indent))
        .toList();
  }

  private static boolean isComment(String line) {
    int indent = indent(line);
    return indent < line.length() && line.charAt(indent) == '#' && !line.startsWith("##", indent);
  }

  private static String bare(String line) {
    if (line.isBlank()) {
      return line;
    }
    int indent = indent(line);
    int rest = line.startsWith(SIGN, indent) ? indent + SIGN.length() : indent + 1;
    return line.substring(0, indent) + line.substring(rest);
  }

  private static int indent(String line) {
    int i = 0;
    while (i < line.length() && (line.charAt(i) == ' ' || line.charAt(i) == '\t')) {
      i++;
    }
    return i;
  }
}
