/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.Optional;
import org.spanloom.language.files.CsvColumns;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.syntax.Expression;
import org.spanloom.language.syntax.Statement.TableStatement;
import org.spanloom.language.syntax.TableMethod;
import org.spanloom.language.syntax.TableSource.TableFile;
import org.spanloom.language.syntax.TableSource.TableRow;
import org.spanloom.language.syntax.TableSource.TableRows;
import org.spanloom.language.text.Span;
import org.spanloom.language.units.UnitOfMeasure;

/** Reads the rows of tables and interpolates them. */
final class TableReader {

  private final Frame frame;
  private final Problems problems;

  TableReader(Frame frame) {
    this.frame = frame;
    this.problems = frame.problems();
  }

  /** Rows in coherent SI units, with what says where each stands. */
  private record Rows(double[] times, double[] values, Places places) {}

  /** Where the rows of a table stand. */
  private interface Places {
    /** Returns the place in the model. */
    Span span(int row);

    /** Returns which row it is, in words that begin a sentence. */
    String name(int row);
  }

  /**
   * Returns the curve, or empty after a problem was reported.
   *
   * @param unit the unit declared, the number 1 where none is
   */
  Optional<PiecewiseCurve> read(TableStatement statement, UnitOfMeasure unit) {
    Optional<Rows> rows =
        switch (statement.source()) {
          case TableRows below -> rows(statement, below, unit);
          case TableFile file -> file(file, unit);
        };
    return rows.filter(r -> isSound(statement, r))
        .map(r ->
            switch (statement.method()) {
              case HOLD -> PiecewiseCurve.hold(r.times(), r.values());
              case LINEAR -> PiecewiseCurve.linear(r.times(), r.values());
              case MONOTONE_CUBIC -> PiecewiseCurve.monotoneCubic(r.times(), r.values());
            });
  }

  private Optional<Rows> rows(TableStatement statement, TableRows below, UnitOfMeasure unit) {
    int count = below.rows().size();
    double[] times = new double[count];
    double[] values = new double[count];
    boolean sound = below.allRead();
    String what = "the table " + statement.name().text();
    for (int k = 0; k < count; k++) {
      TableRow row = below.rows().get(k);
      Optional<Double> time = number(row.time(), frame.timeUnit(), "the independent variable");
      Optional<Double> value = number(row.value(), unit, what);
      sound &= time.isPresent() && value.isPresent();
      times[k] = time.orElse(0.0);
      values[k] = value.orElse(0.0);
    }
    Places places =
        new Places() {
          @Override
          public Span span(int row) {
            return below.rows().get(row).span();
          }

          @Override
          public String name(int row) {
            return "Row " + (row + 1);
          }
        };
    return sound ? Optional.of(new Rows(times, values, places)) : Optional.empty();
  }

  private Optional<Double> number(Expression text, UnitOfMeasure unit, String what) {
    Optional<Quantity> value = frame.resolver().given(text, unit, what, Place.TABLE);
    if (value.isEmpty()) {
      return Optional.empty();
    }
    if (value.get().constant().term() instanceof Term.Constant(double number)) {
      return Optional.of(number);
    }
    return refused(
        text.span(),
        "The rows of a table are fixed when the model is read: write a number instead of \""
            + frame.resolver().shown(text.span())
            + "\".");
  }

  private Optional<Rows> file(TableFile file, UnitOfMeasure unit) {
    Optional<UnitOfMeasure> timeUnit =
        file.timeUnit().isEmpty()
            ? Optional.of(frame.timeUnit())
            : frame.units().declared(file.timeUnit());
    Optional<FileAccess.Found> found = frame.text(file.path());
    if (timeUnit.isEmpty() || found.isEmpty()) {
      return Optional.empty();
    }
    UnitOfMeasure own = timeUnit.get();
    if (own.offset() != 0 || !own.dimension().equals(frame.timeUnit().dimension())) {
      problems.report(
          ProblemKind.UNIT_MISMATCH,
          file.timeUnit().orElseThrow().span(),
          "The column of times is "
              + Resolver.in(own.dimension())
              + ", but the independent variable is in "
              + frame.timeUnit().code()
              + ": give the unit of the times in the file.");
      return Optional.empty();
    }
    String text = found.get().text();
    TableBudget budget = frame.file().tables();
    if (!budget.allows(text)) {
      return tooManyRows(file);
    }
    return switch (CsvColumns.read(text, file.time().text(), file.column().text())) {
      case CsvColumns.Fault(int line, String reason) -> {
        budget.spend(text, 0);
        yield refused(
            file.path().span(),
            "The file \""
                + Quotes.shortened(file.path().text())
                + "\" cannot be used, line "
                + line
                + ": "
                + reason
                + ". Correct the file or the statement.");
      }
      case CsvColumns.Columns(double[] times, double[] values, int[] lines) -> {
        budget.spend(text, times.length);
        for (int k = 0; k < times.length; k++) {
          times[k] = own.toBase(times[k]);
          values[k] = unit.toBase(values[k]);
        }
        yield Optional.of(new Rows(times, values, inFile(file, lines)));
      }
    };
  }

  private Optional<Rows> tooManyRows(TableFile file) {
    return refused(
        file.path().span(),
        "All tables of a model read at most "
            + TableBudget.ROW_LIMIT
            + " rows from files together, and this one would exceed it: leave out rows or tables"
            + " that the model does not need.");
  }

  private static Places inFile(TableFile file, int[] lines) {
    return new Places() {
      @Override
      public Span span(int row) {
        return file.path().span();
      }

      @Override
      public String name(int row) {
        return "Line " + lines[row] + " of \"" + Quotes.shortened(file.path().text()) + "\"";
      }
    };
  }

  private boolean isSound(TableStatement statement, Rows rows) {
    int least = statement.method() == TableMethod.HOLD ? 1 : 2;
    if (rows.times().length < least) {
      refused(
          statement.name().span(),
          "The table "
              + statement.name().text()
              + " has "
              + (rows.times().length == 0 ? "no row" : "one row")
              + ": it needs at least "
              + (least == 1 ? "one." : "two; a single value holds with hold."));
      return false;
    }
    for (int k = 0; k < rows.times().length; k++) {
      if (!Double.isFinite(rows.times()[k]) || !Double.isFinite(rows.values()[k])) {
        refused(
            rows.places().span(k), rows.places().name(k) + " holds a number that is too large.");
        return false;
      }
      if (k > 0 && !(rows.times()[k] > rows.times()[k - 1])) {
        refused(
            rows.places().span(k),
            rows.places().name(k)
                + " is not later than the row before it: the times of a table increase from row to"
                + " row.");
        return false;
      }
    }
    return true;
  }

  /** Reports a table that ends before the interval does, unless its end values hold. */
  void checkRange(TableStatement statement, PiecewiseCurve curve, Times times) {
    if (statement.extended() || !times.isKnown()) {
      return;
    }
    TimeInterval interval = times.interval();
    UnitOfMeasure unit = times.unit();
    boolean late = isBeyond(curve.first(), unit.toBase(interval.start()));
    boolean early = isBeyond(unit.toBase(interval.end()), curve.lastTime());
    if (late || early) {
      problems.report(
          ProblemKind.TABLE_RANGE,
          statement.name().span(),
          "The table "
              + statement.name().text()
              + " has rows from "
              + Times.number(unit.fromBase(curve.first()))
              + " to "
              + Times.number(unit.fromBase(curve.lastTime()))
              + ", but the interval is "
              + times.shown()
              + ": add rows, or write extended behind its method to let the end "
              + (late && early ? "values hold." : "value hold."));
    }
  }

  /** Tells whether a time lies behind another, beyond rounding. */
  private static boolean isBeyond(double time, double other) {
    return time > other
        && !(time - other <= 4 * Math.ulp(Math.max(Math.abs(time), Math.abs(other))));
  }

  private <T> Optional<T> refused(Span span, String message) {
    problems.report(ProblemKind.TABLE_INVALID, span, message);
    return Optional.empty();
  }
}
