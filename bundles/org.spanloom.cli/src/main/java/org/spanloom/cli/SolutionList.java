/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.spanloom.analysis.solve.SolutionTable;

/** Writes a solution as comma-separated values, and its errors as a table for people. */
final class SolutionList {

  private SolutionList() {}

  /**
   * Writes the list.
   *
   * @param output the file to write to; standard output if empty
   * @param model the model file, which is never overwritten
   */
  static void write(SolutionTable table, Optional<String> output, Path model, Streams streams)
      throws CommandFailure {
    try (ResultSink sink = ResultSink.of(output, Optional.of(model), streams)) {
      List<String> names = new ArrayList<>();
      names.add(table.time().name());
      table.columns().forEach(c -> names.add(c.name()));
      sink.write(CsvLine.ofNames(names));
      double[] times = table.time().values();
      List<double[]> columns = table.columns().stream().map(SolutionTable.Column::values).toList();
      StringBuilder line = new StringBuilder();
      for (int i = 0; i < times.length; i++) {
        line.setLength(0);
        line.append(NumberText.exact(times[i]));
        for (double[] column : columns) {
          line.append(',').append(NumberText.exact(column[i]));
        }
        sink.write(line.append('\n').toString());
      }
      sink.commit();
    }
  }

  /** Returns the method and the largest error of each column, in words. */
  static String errors(SolutionTable table) {
    TextTable text = new TextTable(2, "column", "unit", "estimated error", "relative to largest");
    for (SolutionTable.Column column : table.columns()) {
      double largest = 0;
      for (double value : column.values()) {
        largest = Math.max(largest, Math.abs(value));
      }
      double error = column.largestError();
      text.add(
          column.name(),
          column.unit(),
          NumberText.brief(error),
          largest > 0 ? NumberText.brief(error / largest) : "-");
    }
    String heading =
        "method: "
            + table.method()
            + "; relative error asked for: "
            + NumberText.brief(table.accuracy())
            + "\n";
    return table.reached() <= table.accuracy()
        ? heading + text
        : heading
            + "warning: this was not reached; the estimated relative error is "
            + NumberText.brief(table.reached())
            + "\n"
            + text;
  }
}
