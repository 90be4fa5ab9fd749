/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.UnaryOperator;
import org.spanloom.language.units.Dimension;

/** A sparse matrix of quantities of one dimension; entries that are 0 are absent. */
final class MatrixValue implements Value {

  private final int rows;
  private final int columns;
  private final List<Entry> entries;
  private final int[] starts;
  private final Dimension dimension;
  private final boolean holdsStates;
  private final int depth;

  /** An entry with its row and column, both from 0. */
  record Entry(int row, int column, Quantity value) {}

  /**
   * Makes a matrix.
   *
   * @param rows number of rows, at least 1
   * @param columns number of columns, at least 1
   * @param entries the entries by row, then column, each place at most once
   * @param dimension the dimension of all entries
   */
  MatrixValue(int rows, int columns, List<Entry> entries, Dimension dimension) {
    this.rows = rows;
    this.columns = columns;
    this.entries = List.copyOf(entries);
    this.dimension = dimension;
    this.starts = new int[rows + 1];
    boolean states = false;
    int deepest = 1;
    for (Entry entry : this.entries) {
      starts[entry.row() + 1]++;
      states |= entry.value().holdsStates();
      deepest = Math.max(deepest, entry.value().depth());
    }
    for (int i = 0; i < rows; i++) {
      starts[i + 1] += starts[i];
    }
    this.holdsStates = states;
    this.depth = deepest;
  }

  int rows() {
    return rows;
  }

  int columns() {
    return columns;
  }

  @Override
  public Dimension dimension() {
    return dimension;
  }

  @Override
  public boolean holdsStates() {
    return holdsStates;
  }

  @Override
  public int depth() {
    return depth;
  }

  @Override
  public boolean zero() {
    return false;
  }

  List<Entry> entries() {
    return entries;
  }

  /** Returns the entries of a row, from 0, by column. */
  List<Entry> row(int row) {
    return entries.subList(starts[row], starts[row + 1]);
  }

  /** Returns an entry; 0 where none is stored. */
  Quantity at(int row, int column) {
    int low = starts[row];
    int high = starts[row + 1] - 1;
    while (low <= high) {
      int middle = (low + high) >>> 1;
      int found = entries.get(middle).column();
      if (found == column) {
        return entries.get(middle).value();
      }
      low = found < column ? middle + 1 : low;
      high = found < column ? high : middle - 1;
    }
    return Quantity.constant(Term.ZERO, dimension, 1);
  }

  /** Returns the one entry of a matrix of one row and one column, which is the same as that. */
  Optional<Quantity> single() {
    return rows == 1 && columns == 1 ? Optional.of(at(0, 0)) : Optional.empty();
  }

  boolean hasShapeOf(MatrixValue other) {
    return rows == other.rows && columns == other.columns;
  }

  /** Returns the shape in words, for messages. */
  String shape() {
    if (columns == 1) {
      return "a column of " + rows;
    }
    return rows == 1 ? "a row of " + columns : rows + " x " + columns;
  }

  /** Tells whether a quantity is 0 by structure and so no entry. */
  static boolean isZero(Quantity value) {
    return !value.holdsStates() && Simplifier.isZero(value.constant().term());
  }

  /** Returns the matrix with every entry changed; entries that become 0 are left out. */
  MatrixValue map(UnaryOperator<Quantity> change, Dimension newDimension) {
    List<Entry> changed = new ArrayList<>(entries.size());
    for (Entry entry : entries) {
      Quantity value = change.apply(entry.value());
      if (!isZero(value)) {
        changed.add(new Entry(entry.row(), entry.column(), value));
      }
    }
    return new MatrixValue(rows, columns, changed, newDimension);
  }

  /** Returns the matrix with rows and columns exchanged. */
  MatrixValue transposed() {
    int[] next = new int[columns + 1];
    for (Entry entry : entries) {
      next[entry.column() + 1]++;
    }
    for (int i = 0; i < columns; i++) {
      next[i + 1] += next[i];
    }
    Entry[] turned = new Entry[entries.size()];
    for (Entry entry : entries) {
      turned[next[entry.column()]++] = new Entry(entry.column(), entry.row(), entry.value());
    }
    return new MatrixValue(columns, rows, List.of(turned), dimension);
  }
}
