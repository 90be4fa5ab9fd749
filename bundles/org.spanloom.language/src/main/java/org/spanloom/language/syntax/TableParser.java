/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.syntax;

import java.util.List;
import java.util.Optional;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.syntax.Statement.TableStatement;
import org.spanloom.language.syntax.TableSource.TableFile;
import org.spanloom.language.syntax.TableSource.TableRow;
import org.spanloom.language.syntax.TableSource.TableRows;
import org.spanloom.language.text.Span;

/** Reads the first line of a table, and its rows. */
final class TableParser {

  private final StatementParser statement;
  private final Cursor cursor;

  /**
   * Reads from a line.
   *
   * @param statement the line, of which nothing is taken yet
   */
  TableParser(StatementParser statement) {
    this.statement = statement;
    this.cursor = statement.cursor();
  }

  /**
   * {@code table = "table", name, "(", name, ")", [ unit ], "=", [ file ], method, [ "extended" ] ;
   * file = "file", text, "time", text, [ unit ], "column", text ;} Rows stand on the lines below
   * where there is no file, and are not read here.
   */
  TableStatement head() {
    cursor.take();
    Name name = statement.name("table");
    Optional<Name> argument = statement.argument();
    if (argument.isEmpty() && !cursor.failed()) {
      cursor.failHere(
          ProblemKind.WORD_UNEXPECTED,
          "A table is a function of the independent variable: \"(t)\" or the like belongs here");
    }
    Optional<UnitText> unit = statement.unit();
    statement.equalsSign();
    TableSource source = cursor.acceptWord("file") ? file() : new TableRows(List.of(), true);
    TableMethod method = method();
    boolean extended = cursor.acceptWord("extended");
    statement.expectEnd();
    statement.expectNoBlock();
    return new TableStatement(
        name,
        argument.orElse(name),
        unit,
        source,
        method,
        extended,
        statement.line().documentation(),
        statement.line().span());
  }

  private TableFile file() {
    QuotedText path = text("The name of the file belongs here in quotation marks");
    word("time", "The word time and the head of the column of times belong here");
    QuotedText time = text("The head of the column of times belongs here in quotation marks");
    Optional<UnitText> timeUnit = statement.unit();
    word("column", "The word column and the head of the column of values belong here");
    QuotedText column = text("The head of the column of values belongs here in quotation marks");
    return new TableFile(path, time, timeUnit, column);
  }

  private void word(String word, String expected) {
    if (!cursor.failed() && !cursor.acceptWord(word)) {
      cursor.failHere(
          ProblemKind.WORD_UNEXPECTED,
          expected + ", as in file \"outside.csv\" time \"hour\" [h] column \"air\" linear");
    }
  }

  private QuotedText text(String expected) {
    Span span = cursor.peek().span();
    if (!cursor.is(TokenKind.STRING)) {
      if (!cursor.failed()) {
        cursor.failHere(ProblemKind.WORD_UNEXPECTED, expected);
      }
      return new QuotedText("", span);
    }
    cursor.take();
    return new QuotedText(cursor.text(new Span(span.start() + 1, span.end() - 1)), span);
  }

  private TableMethod method() {
    if (cursor.acceptWord("hold")) {
      return TableMethod.HOLD;
    }
    if (cursor.acceptWord("monotone")) {
      if (!cursor.acceptWord("cubic")) {
        cursor.failHere(
            ProblemKind.WORD_UNEXPECTED, "The word cubic belongs here, as in monotone cubic");
      }
      return TableMethod.MONOTONE_CUBIC;
    }
    if (!cursor.failed() && !cursor.acceptWord("linear")) {
      cursor.failHere(
          ProblemKind.WORD_UNEXPECTED,
          "A table says how to find values between its rows: hold, linear or monotone cubic belongs"
              + " here");
    }
    return TableMethod.LINEAR;
  }

  /** Reports a table without a row. */
  void failWithoutRows() {
    if (!cursor.failed()) {
      cursor.fail(
          ProblemKind.WORD_UNEXPECTED,
          cursor.peek().span(),
          "The rows of the table are missing: write a line such as \"row 0, 1.2\", a time and a"
              + " value, for each below.");
    }
  }

  /** {@code table row = "row", expression, ",", expression ;} */
  static Optional<TableRow> row(StatementParser line) {
    Cursor cursor = line.cursor();
    cursor.take();
    Expression time = line.expressions().expression();
    if (!cursor.failed() && !cursor.accept(TokenKind.COMMA)) {
      cursor.failHere(
          ProblemKind.WORD_UNEXPECTED,
          "A row of a table is a time and a value, with a comma between them: the comma belongs"
              + " here");
    }
    Expression value = line.expressions().expression();
    line.expectEnd();
    return cursor.failed()
        ? Optional.empty()
        : Optional.of(new TableRow(time, value, line.line().span()));
  }
}
