/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.syntax;

import java.util.List;
import java.util.Optional;
import org.spanloom.language.text.Span;

/** Where the rows of a table stand. */
public sealed interface TableSource {

  /**
   * In rows below the first line.
   *
   * @param allRead whether every row could be read
   */
  record TableRows(List<TableRow> rows, boolean allRead) implements TableSource {
    /** Copies the list. */
    public TableRows {
      rows = List.copyOf(rows);
    }
  }

  /**
   * In a file: {@code file "outside.csv" time "hour" [h] column "air"}.
   *
   * @param path the path of the file
   * @param time the head of the column of times
   * @param timeUnit its unit, if it is not that of the independent variable
   * @param column the head of the column of values
   */
  record TableFile(QuotedText path, QuotedText time, Optional<UnitText> timeUnit, QuotedText column)
      implements TableSource {}

  /** One row: {@code row 6, 1.2}. */
  record TableRow(Expression time, Expression value, Span span) {}
}
