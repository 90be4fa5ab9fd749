/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.files;

/** A matrix of numbers as a file holds it: the entries that are not 0, by row, then column. */
public final class MarketMatrix {

  private final int rows;
  private final int columns;
  private final int[] entryRows;
  private final int[] entryColumns;
  private final double[] values;

  /** Takes arrays that nobody else holds. */
  MarketMatrix(int rows, int columns, int[] entryRows, int[] entryColumns, double[] values) {
    this.rows = rows;
    this.columns = columns;
    this.entryRows = entryRows;
    this.entryColumns = entryColumns;
    this.values = values;
  }

  /** Returns the number of rows. */
  public int rows() {
    return rows;
  }

  /** Returns the number of columns. */
  public int columns() {
    return columns;
  }

  /** Returns the number of entries that are not 0. */
  public int count() {
    return values.length;
  }

  /** Returns the row of an entry, from 0. */
  public int row(int entry) {
    return entryRows[entry];
  }

  /** Returns the column of an entry, from 0. */
  public int column(int entry) {
    return entryColumns[entry];
  }

  /** Returns the value of an entry. */
  public double value(int entry) {
    return values[entry];
  }
}
