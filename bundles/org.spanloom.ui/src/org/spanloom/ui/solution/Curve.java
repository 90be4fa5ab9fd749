/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.solution;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.spanloom.analysis.solve.SolutionTable;
import org.spanloom.ui.Labels;

/**
 * A column of a solution as a curve of finite values. A column that is not finite somewhere has
 * gaps there, since a chart would draw a spike; each piece between two gaps is a curve.
 *
 * @param column place of the column in the table, from 0
 * @param piece number of the piece, from 0
 * @param name name of the column
 * @param unit its unit, in UCUM code
 * @param times times, not copied
 * @param values values, not copied
 * @param errors estimated absolute errors, not copied
 */
record Curve(
    int column,
    int piece,
    String name,
    String unit,
    double[] times,
    double[] values,
    double[] errors) {

  /** Returns the pieces of all columns, in the order of the table. */
  static List<Curve> of(SolutionTable table) {
    double[] times = table.time().values();
    List<Curve> curves = new ArrayList<>();
    for (int i = 0; i < table.columns().size(); i++) {
      addPieces(i, table.columns().get(i), times, curves);
    }
    return curves;
  }

  private static void addPieces(
      int index, SolutionTable.Column column, double[] times, List<Curve> into) {
    double[] values = column.values();
    double[] errors = column.errors();
    int piece = 0;
    int start = 0;
    for (int i = 0; i <= values.length; i++) {
      boolean gap = i == values.length || !Double.isFinite(values[i]) || !Double.isFinite(times[i]);
      if (gap) {
        if (i > start) {
          into.add(
              new Curve(
                  index,
                  piece++,
                  column.name(),
                  column.unit(),
                  Arrays.copyOfRange(times, start, i),
                  Arrays.copyOfRange(values, start, i),
                  Arrays.copyOfRange(errors, start, Math.min(i, errors.length))));
        }
        start = i + 1;
      }
    }
  }

  /** Returns an id that no other curve of the plot has, and that the same column has next time. */
  String id() {
    return piece == 0 ? name : name + " (" + (piece + 1) + ")";
  }

  /** Returns the name with its unit. */
  String label() {
    return Labels.withUnit(name, unit);
  }

  /** Returns the number of the sample nearest to a time. */
  int nearest(double time) {
    int found = Arrays.binarySearch(times, time);
    if (found >= 0) {
      return found;
    }
    int after = -found - 1;
    if (after == 0) {
      return 0;
    }
    if (after == times.length) {
      return times.length - 1;
    }
    return time - times[after - 1] <= times[after] - time ? after - 1 : after;
  }

  double least() {
    return Arrays.stream(values).min().orElse(0);
  }

  double most() {
    return Arrays.stream(values).max().orElse(0);
  }
}
