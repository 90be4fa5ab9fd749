/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.basis;

import java.util.List;
import org.spanloom.numerics.basis.ConditionSample;

/**
 * A basis listed at times, in declared units.
 *
 * @param system name of the system
 * @param basis name of the basis
 * @param timeName name of the independent variable
 * @param timeUnit UCUM code of its unit
 * @param states labels of the components
 * @param columns number of columns
 * @param rows one row for each time and column, times in the order asked for
 * @param conditioning one sample for each time, in the same order
 * @param method name of the method, for people
 */
public record BasisTable(
    String system,
    String basis,
    String timeName,
    String timeUnit,
    List<String> states,
    int columns,
    List<Row> rows,
    List<ConditionSample> conditioning,
    String method) {

  /** Copies the lists. */
  public BasisTable {
    states = List.copyOf(states);
    rows = List.copyOf(rows);
    conditioning = List.copyOf(conditioning);
  }

  /**
   * One column at one time.
   *
   * @param time the time
   * @param column number of the column, from 1
   * @param values the components; copied on the way in and out
   * @param errors estimated absolute error of each; copied on the way in and out
   */
  public record Row(double time, int column, double[] values, double[] errors) {
    /** Copies its arrays. */
    public Row {
      values = values.clone();
      errors = errors.clone();
    }

    @Override
    public double[] values() {
      return values.clone();
    }

    @Override
    public double[] errors() {
      return errors.clone();
    }
  }
}
