/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.solution;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.StringJoiner;
import org.spanloom.analysis.solve.SolutionTable;

/** Writes a solution as the command line does: a header of names, then one line for each time. */
final class SolutionCsv {

  private SolutionCsv() {}

  /** Returns the text: 17 significant digits, lines ended by "\n". */
  static String of(SolutionTable table) {
    List<SolutionTable.Column> columns = new ArrayList<>();
    columns.add(table.time());
    columns.addAll(table.columns());
    StringBuilder text = new StringBuilder();
    StringJoiner header = new StringJoiner(",", "", "\n");
    columns.forEach(c -> header.add(quoted(c.name())));
    text.append(header);
    List<double[]> values = columns.stream().map(SolutionTable.Column::values).toList();
    for (int row = 0; row < values.getFirst().length; row++) {
      StringJoiner line = new StringJoiner(",", "", "\n");
      for (double[] column : values) {
        line.add(String.format(Locale.ROOT, "%.17g", column[row]));
      }
      text.append(line);
    }
    return text.toString();
  }

  private static String quoted(String name) {
    boolean needed = name.contains(",") || name.contains("\"") || name.contains("'");
    return needed ? "\"" + name.replace("\"", "\"\"") + "\"" : name;
  }
}
