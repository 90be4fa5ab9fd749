/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.syntax;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.spanloom.language.problem.Fix;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.syntax.MatrixSource.MatrixExpression;
import org.spanloom.language.syntax.MatrixSource.MatrixFile;
import org.spanloom.language.syntax.MatrixSource.MatrixRow;
import org.spanloom.language.syntax.MatrixSource.MatrixRows;
import org.spanloom.language.syntax.Statement.MatrixStatement;
import org.spanloom.language.text.Span;

/** Reads the first line of a matrix, and its rows. */
final class MatrixParser {

  private final StatementParser statement;
  private final Cursor cursor;

  /**
   * Reads from a line.
   *
   * @param statement the line, of which nothing is taken yet
   */
  MatrixParser(StatementParser statement) {
    this.statement = statement;
    this.cursor = statement.cursor();
  }

  /**
   * {@code matrix = "matrix", name, [ "(", name, ")" ], [ unit ], "=", ( rows | file | expression )
   * ; file = "file", text ;} Rows stand on the lines below and are not read here.
   */
  MatrixStatement head() {
    cursor.take();
    Name name = statement.name("matrix");
    Optional<Name> argument = statement.argument();
    Optional<UnitText> unit = statement.unit();
    statement.equalsSign();
    MatrixSource source = source();
    statement.expectEnd();
    statement.expectNoBlock();
    return new MatrixStatement(
        name, argument, unit, source, statement.line().documentation(), statement.line().span());
  }

  private MatrixSource source() {
    if (cursor.atEnd()) {
      return new MatrixRows(List.of(), true);
    }
    TokenKind after = cursor.kindAfter();
    if (cursor.isWord("file") && (after == TokenKind.STRING || after.isName())) {
      cursor.take();
      return new MatrixFile(
          statement.quoted(
              "The name of the file belongs here in quotation marks, as in file \"mass.mtx\""));
    }
    if (cursor.is(TokenKind.STRING)) {
      int start = cursor.peek().start();
      cursor.fail(
          ProblemKind.WORD_UNEXPECTED,
          cursor.peek().span(),
          "A matrix read from a file says so: write file in front of its name.",
          Fix.insert("Insert file", start, "file "));
    }
    return new MatrixExpression(statement.expressions().expression());
  }

  /** Reports a matrix that ends with its equals sign. */
  void failWithoutRows() {
    if (!cursor.failed()) {
      cursor.fail(
          ProblemKind.WORD_UNEXPECTED,
          cursor.peek().span(),
          "The rows of the matrix are missing: write a line such as \"row 1, 0\" for each below.");
    }
  }

  /** {@code matrix row = "row", expression, { ",", expression } ;} */
  static Optional<MatrixRow> row(StatementParser line) {
    Cursor cursor = line.cursor();
    cursor.take();
    int start = cursor.peek().start();
    List<Expression> values = new ArrayList<>();
    do {
      values.add(line.expressions().expression());
    } while (cursor.accept(TokenKind.COMMA));
    if (!cursor.failed() && cursor.is(TokenKind.EQUALS) && values.size() == 1) {
      int end = cursor.take().end();
      int next = cursor.atEnd() ? end : cursor.peek().start();
      cursor.fail(
          ProblemKind.WORD_UNEXPECTED,
          new Span(start, end),
          "A row of a matrix holds its entries and names no state: remove what stands before them.",
          Fix.replace("Remove it", new Span(start, next), ""));
    }
    line.expectEnd();
    return cursor.failed()
        ? Optional.empty()
        : Optional.of(new MatrixRow(values, line.line().span()));
  }
}
