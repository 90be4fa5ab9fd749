/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.spanloom.language.files.MarketMatrix;
import org.spanloom.language.files.MatrixMarketReader;
import org.spanloom.language.files.MatrixMarketReader.Result;
import org.spanloom.language.model.Meaning.MatrixMeaning;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.syntax.Expression;
import org.spanloom.language.syntax.MatrixSource.MatrixExpression;
import org.spanloom.language.syntax.MatrixSource.MatrixFile;
import org.spanloom.language.syntax.MatrixSource.MatrixRow;
import org.spanloom.language.syntax.MatrixSource.MatrixRows;
import org.spanloom.language.syntax.Statement.MatrixStatement;
import org.spanloom.language.text.Span;
import org.spanloom.language.units.UnitOfMeasure;

/** Gives the declaration of a matrix its meaning. */
final class MatrixReader {

  private final Frame frame;
  private final Problems problems;
  private final Resolver resolver;

  MatrixReader(Frame frame) {
    this.frame = frame;
    this.problems = frame.problems();
    this.resolver = frame.resolver();
  }

  /**
   * Returns the matrix, or empty after a problem was reported.
   *
   * @param unit the unit declared, the number 1 where none is
   */
  Optional<MatrixMeaning> read(MatrixStatement statement, UnitOfMeasure unit) {
    Place place = statement.argument().isPresent() ? Place.MATRIX_OF_TIME : Place.MATRIX;
    return switch (statement.source()) {
      case MatrixRows rows -> rows(statement, rows, unit, place);
      case MatrixFile file -> file(statement, file, unit);
      case MatrixExpression expression -> expression(statement, expression, unit, place);
    };
  }

  private Optional<MatrixMeaning> rows(
      MatrixStatement statement, MatrixRows rows, UnitOfMeasure unit, Place place) {
    boolean sound = rows.allRead();
    int columns = rows.rows().isEmpty() ? 0 : rows.rows().getFirst().values().size();
    String what = "the matrix " + statement.name().text();
    List<MatrixValue.Entry> entries = new ArrayList<>();
    for (int i = 0; i < rows.rows().size(); i++) {
      MatrixRow row = rows.rows().get(i);
      if (rows.allRead() && row.values().size() != columns) {
        reportLength(statement, row, i, columns);
        sound = false;
      }
      for (int j = 0; j < row.values().size(); j++) {
        Expression text = row.values().get(j);
        Optional<Quantity> value = resolver.given(text, unit, what, place);
        sound &= value.isPresent();
        if (sound && !MatrixValue.isZero(value.get())) {
          Quantity placed = value.get().from(frame.placed(text.span()));
          entries.add(new MatrixValue.Entry(i, j, placed));
        }
      }
    }
    return sound
        ? Optional.of(
            meaning(
                statement,
                unit,
                new MatrixValue(rows.rows().size(), columns, entries, unit.dimension())))
        : Optional.empty();
  }

  private void reportLength(MatrixStatement statement, MatrixRow row, int index, int columns) {
    int found = row.values().size();
    problems.report(
        ProblemKind.MATRIX_ROW_LENGTH,
        row.span(),
        "Row "
            + (index + 1)
            + " of \""
            + statement.name().text()
            + "\" has "
            + found
            + (found == 1 ? " entry" : " entries")
            + ", but the first row has "
            + columns
            + ": all rows of a matrix are of one length; write 0 for what is empty.");
  }

  private Optional<MatrixMeaning> expression(
      MatrixStatement statement, MatrixExpression source, UnitOfMeasure unit, Place place) {
    Expression text = source.value();
    Optional<? extends Value> value = resolver.value(text, place);
    String what = "the matrix " + statement.name().text();
    if (value.isEmpty()
        || statement.unit().isPresent()
            && !resolver.fits(value.get(), unit.dimension(), unit.code(), text.span(), what)) {
      return Optional.empty();
    }
    UnitOfMeasure shown =
        statement.unit().isPresent() ? unit : Declarations.coherent(value.get().dimension());
    return switch (value.get()) {
      case Quantity single -> {
        problems.report(
            ProblemKind.SHAPE_MISMATCH,
            text.span(),
            "\""
                + resolver.shown(text.span())
                + "\" is a single value: declare it with let, or write the entries of the matrix in"
                + " rows below.");
        yield Optional.empty();
      }
      case MatrixValue matrix ->
          Optional.of(
              meaning(
                  statement,
                  shown,
                  matrix.map(q -> q.from(frame.placed(text.span())), shown.dimension())));
    };
  }

  private Optional<MatrixMeaning> file(
      MatrixStatement statement, MatrixFile file, UnitOfMeasure unit) {
    return frame
        .text(file.path())
        .flatMap(found ->
            switch (MatrixMarketReader.read(found.text())) {
              case Result.Read(MarketMatrix matrix) ->
                  Optional.of(meaning(statement, unit, value(matrix, unit, file.path().span())));
              case Result.Malformed(int line, String message) ->
                  refuse(ProblemKind.FILE_MALFORMED, file, line, message);
              case Result.TooLarge(int line, String message) ->
                  refuse(ProblemKind.MATRIX_TOO_LARGE, file, line, message);
            });
  }

  private Optional<MatrixMeaning> refuse(
      ProblemKind kind, MatrixFile file, int line, String message) {
    problems.report(
        kind,
        file.path().span(),
        "Line "
            + line
            + " of \""
            + Quotes.shortened(file.path().text())
            + "\": "
            + message
            + ". Mend the file.");
    return Optional.empty();
  }

  private MatrixValue value(MarketMatrix matrix, UnitOfMeasure unit, Span place) {
    List<Span> sources = List.of(frame.placed(place));
    List<MatrixValue.Entry> entries = new ArrayList<>(matrix.count());
    for (int i = 0; i < matrix.count(); i++) {
      Term value = new Term.Constant(unit.toBase(matrix.value(i)));
      Quantity.Part part = new Quantity.Part(value, sources, false);
      entries.add(
          new MatrixValue.Entry(
              matrix.row(i),
              matrix.column(i),
              new Quantity(Map.of(), part, unit.dimension(), false, 1)));
    }
    return new MatrixValue(matrix.rows(), matrix.columns(), entries, unit.dimension());
  }

  private MatrixMeaning meaning(MatrixStatement statement, UnitOfMeasure unit, MatrixValue value) {
    NamedMatrix matrix =
        new NamedMatrix(
            statement.name().text(),
            unit,
            value.rows(),
            value.columns(),
            value.entries().size(),
            statement.argument().isPresent(),
            statement.documentation(),
            frame.placed(statement.span()),
            frame.placed(statement.name().span()));
    return new MatrixMeaning(matrix, value);
  }
}
