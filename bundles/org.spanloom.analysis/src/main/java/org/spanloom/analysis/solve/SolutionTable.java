/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.solve;

import java.util.List;

/**
 * A solution listed at times, in declared units.
 *
 * @param system name of the system
 * @param initial name of the initial values, empty for those of the declarations
 * @param time the time column
 * @param columns states in the order of the state vector, then outputs
 * @param method name of the method, for people
 * @param accuracy relative error asked for
 * @param reached largest estimated relative error of a state at the steps of the method, relative
 *     to the larger of its value and its scale
 */
public record SolutionTable(
    String system,
    String initial,
    Column time,
    List<Column> columns,
    String method,
    double accuracy,
    double reached) {

  /** Copies the list. */
  public SolutionTable {
    columns = List.copyOf(columns);
  }

  /** What a column holds. */
  public enum Kind {
    /** The independent variable. */
    TIME,
    /** A component of the state vector. */
    STATE,
    /** An output. */
    OUTPUT
  }

  /**
   * One column.
   *
   * @param name the name, with primes for a derivative
   * @param unit UCUM code
   * @param kind what it holds
   * @param values one value for each time; copied on the way in and out
   * @param errors estimated absolute error of each value; copied on the way in and out
   */
  public record Column(String name, String unit, Kind kind, double[] values, double[] errors) {
    /** Copies its arrays. */
    public Column {
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

    /** Returns the largest estimated error. */
    public double largestError() {
      double largest = 0;
      for (double e : errors) {
        largest = Math.max(largest, e);
      }
      return largest;
    }
  }
}
