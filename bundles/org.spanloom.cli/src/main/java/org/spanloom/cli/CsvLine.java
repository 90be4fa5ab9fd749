/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import java.util.List;

/** Lines of comma-separated values as in RFC 4180 (2005), section 2, with line feeds. */
final class CsvLine {

  private CsvLine() {}

  /**
   * Returns a line of names; a name that is more than letters, digits, "_", "." and "[]" stands in
   * quotes.
   */
  static String ofNames(List<String> names) {
    StringBuilder line = new StringBuilder();
    for (String name : names) {
      line.append(line.isEmpty() ? "" : ",").append(field(name));
    }
    return line.append('\n').toString();
  }

  private static String field(String name) {
    boolean plain =
        !name.isEmpty()
            && name.codePoints()
                .allMatch(c -> Character.isLetterOrDigit(c) || "_.[]".indexOf(c) >= 0);
    return plain ? name : '"' + name.replace("\"", "\"\"") + '"';
  }
}
