/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import java.util.ArrayList;
import java.util.List;

/** A table in aligned columns, for people. */
final class TextTable {

  private final List<List<String>> rows = new ArrayList<>();
  private final int textColumns;

  /**
   * Starts a table.
   *
   * @param textColumns how many columns from the left hold text; the others hold numbers and are
   *     set flush right
   * @param heads one head for each column
   */
  TextTable(int textColumns, String... heads) {
    this.textColumns = textColumns;
    rows.add(List.of(heads));
  }

  /** Adds a row with a cell for each column. */
  void add(String... cells) {
    rows.add(List.of(cells));
  }

  @Override
  public String toString() {
    int columns = rows.getFirst().size();
    int[] widths = new int[columns];
    for (List<String> row : rows) {
      for (int i = 0; i < columns; i++) {
        widths[i] = Math.max(widths[i], row.get(i).length());
      }
    }
    StringBuilder text = new StringBuilder();
    for (List<String> row : rows) {
      StringBuilder line = new StringBuilder();
      for (int i = 0; i < columns; i++) {
        String gap = " ".repeat(widths[i] - row.get(i).length());
        line.append(i == 0 ? "" : "  ");
        line.append(i < textColumns ? row.get(i) + gap : gap + row.get(i));
      }
      text.append(line.toString().stripTrailing()).append('\n');
    }
    return text.toString();
  }
}
