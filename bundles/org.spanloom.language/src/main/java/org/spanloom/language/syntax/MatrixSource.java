/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.syntax;

import java.util.List;
import org.spanloom.language.text.Span;

/** Where the entries of a matrix stand. */
public sealed interface MatrixSource {

  /**
   * In rows below the first line.
   *
   * @param allRead whether every row could be read
   */
  record MatrixRows(List<MatrixRow> rows, boolean allRead) implements MatrixSource {
    /** Copies the list. */
    public MatrixRows {
      rows = List.copyOf(rows);
    }
  }

  /** In a file: {@code file "mass.mtx"}. */
  record MatrixFile(QuotedText path) implements MatrixSource {}

  /** In other matrices: {@code a*M + b*K}. */
  record MatrixExpression(Expression value) implements MatrixSource {}

  /** One of them: {@code row k1 + k2, -k2}. */
  record MatrixRow(List<Expression> values, Span span) {
    /** Copies the list. */
    public MatrixRow {
      values = List.copyOf(values);
    }
  }
}
