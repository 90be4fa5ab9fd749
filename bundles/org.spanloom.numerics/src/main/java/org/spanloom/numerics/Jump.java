/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics;

import java.util.Arrays;
import java.util.List;
import org.spanloom.numerics.internal.algebra.LuFactors;
import org.spanloom.numerics.internal.work.Watch;

/**
 * A change of the states at one time: {@code x(s) = J x(s-) + d}. The rows of J that are not those
 * of the identity are kept; what they do is found once for all times they are used at.
 */
public final class Jump {

  /** Pivots of the scaled matrix below this, relative to the largest, are rounding. */
  private static final double SINGULAR = 1e-13;

  private final double time;
  private final Change change;

  /**
   * One row of J and of d.
   *
   * @param row the component that changes
   * @param columns the components it is made of, increasing
   * @param factors their factors
   * @param shift the entry of d
   */
  public record Row(int row, int[] columns, double[] factors, double shift) {
    /** Copies the arrays. */
    public Row {
      if (columns.length != factors.length) {
        throw new IllegalArgumentException(
            columns.length + " columns, " + factors.length + " factors");
      }
      columns = columns.clone();
      factors = factors.clone();
    }

    @Override
    public int[] columns() {
      return columns.clone();
    }

    @Override
    public double[] factors() {
      return factors.clone();
    }

    @Override
    public boolean equals(Object other) {
      return other instanceof Row that
          && row == that.row
          && shift == that.shift
          && Arrays.equals(columns, that.columns)
          && Arrays.equals(factors, that.factors);
    }

    @Override
    public int hashCode() {
      return 31 * row + Arrays.hashCode(factors);
    }

    @Override
    public String toString() {
      return "Row[" + row + ", " + Arrays.toString(columns) + ", " + Arrays.toString(factors) + "]";
    }
  }

  /** What a jump does, whenever it takes place. */
  private static final class Change {
    private final List<Row> rows;
    private final int[] changed;
    private final boolean singular;
    private final double logDeterminant;
    private final double[] rowScale;
    private final double[] columnScale;

    Change(List<Row> rows) {
      this.rows = List.copyOf(rows);
      this.changed = this.rows.stream().mapToInt(Row::row).toArray();
      for (int k = 1; k < changed.length; k++) {
        if (changed[k] <= changed[k - 1]) {
          throw new IllegalArgumentException("rows of a jump are increasing");
        }
      }
      double[][] scaled = block();
      rowScale = new double[changed.length];
      columnScale = new double[changed.length];
      boolean empty = scale(scaled);
      double log = empty ? Double.NEGATIVE_INFINITY : 0;
      boolean flat = empty;
      if (!empty && changed.length > 0) {
        LuFactors factors = LuFactors.of(scaled, Watch.NONE);
        flat = factors.isSingular() || factors.pivotRatio() < SINGULAR;
        log = flat ? Double.NEGATIVE_INFINITY : factors.logDeterminant();
        for (int k = 0; k < changed.length && !flat; k++) {
          log -= Math.log(rowScale[k]) + Math.log(columnScale[k]);
        }
      }
      singular = flat;
      logDeterminant = log;
    }

    /** Returns J on the changed components: its other rows are those of the identity. */
    double[][] block() {
      double[][] block = new double[changed.length][changed.length];
      for (int i = 0; i < changed.length; i++) {
        Row row = rows.get(i);
        for (int k = 0; k < row.columns.length; k++) {
          int j = Arrays.binarySearch(changed, row.columns[k]);
          if (j >= 0) {
            block[i][j] += row.factors[k];
          }
        }
      }
      return block;
    }

    /** Scales rows, then columns, to a largest entry near 1; tells whether one is zero. */
    private boolean scale(double[][] block) {
      for (int i = 0; i < block.length; i++) {
        double largest = 0;
        for (double entry : block[i]) {
          largest = Math.max(largest, Math.abs(entry));
        }
        if (!(largest > 0)) {
          return true;
        }
        rowScale[i] = Math.scalb(1.0, -Math.getExponent(largest));
        for (int j = 0; j < block.length; j++) {
          block[i][j] *= rowScale[i];
        }
      }
      for (int j = 0; j < block.length; j++) {
        double largest = 0;
        for (double[] row : block) {
          largest = Math.max(largest, Math.abs(row[j]));
        }
        if (!(largest > 0)) {
          return true;
        }
        columnScale[j] = Math.scalb(1.0, -Math.getExponent(largest));
        for (double[] row : block) {
          row[j] *= columnScale[j];
        }
      }
      return false;
    }
  }

  private Jump(double time, Change change) {
    this.time = time;
    this.change = change;
  }

  /**
   * Makes a jump.
   *
   * @param time when
   * @param rows the rows that change something, by increasing component
   */
  public static Jump of(double time, List<Row> rows) {
    return new Jump(time, new Change(rows));
  }

  /** Returns the same change at another time. */
  public Jump at(double other) {
    return new Jump(other, change);
  }

  /**
   * Returns the jumps of a list from one time to another, both included.
   *
   * @param byTime jumps by time
   */
  public static List<Jump> within(List<Jump> byTime, double from, double to) {
    int first = firstFrom(byTime, from);
    int end = firstFrom(byTime, Math.nextUp(to));
    return byTime.subList(first, Math.max(first, end));
  }

  private static int firstFrom(List<Jump> byTime, double time) {
    int low = 0;
    int high = byTime.size();
    while (low < high) {
      int middle = (low + high) >>> 1;
      if (byTime.get(middle).time < time) {
        low = middle + 1;
      } else {
        high = middle;
      }
    }
    return low;
  }

  /** Returns when it takes place. */
  public double time() {
    return time;
  }

  /** Returns the rows that change something, by increasing component. */
  public List<Row> rows() {
    return change.rows;
  }

  /** Tells whether J is singular to rounding, so that nobody can tell x(s-) from x(s). */
  public boolean isSingular() {
    return change.singular;
  }

  /** Returns ln |det J|; negative infinity where J is singular. */
  public double logDeterminant() {
    return change.logDeterminant;
  }

  /** Returns the entries of J on the components that change, row by row. */
  public double[] block() {
    int k = change.changed.length;
    double[] flat = new double[k * k];
    double[][] rows = change.block();
    for (int i = 0; i < k; i++) {
      System.arraycopy(rows[i], 0, flat, i * k, k);
    }
    return flat;
  }

  /**
   * Returns J X + d, or J X.
   *
   * @param x columns just before, n by m, row by row; left as they are
   * @param m number of columns
   * @param shifted whether d counts
   */
  public double[] after(double[] x, int m, boolean shifted) {
    double[] result = x.clone();
    for (Row row : change.rows) {
      for (int j = 0; j < m; j++) {
        double sum = shifted ? row.shift : 0;
        for (int k = 0; k < row.columns.length; k++) {
          sum += row.factors[k] * x[row.columns[k] * m + j];
        }
        result[row.row * m + j] = sum;
      }
    }
    return result;
  }

  /**
   * Returns |J| E plus the rounding of the products: what errors of the columns become.
   *
   * @param x columns just before, n by m
   * @param e errors that are not negative, n by m
   * @param shifted whether d counts
   */
  public double[] errorsAfter(double[] x, double[] e, int m, boolean shifted) {
    double[] result = e.clone();
    for (Row row : change.rows) {
      for (int j = 0; j < m; j++) {
        double error = 0;
        double size = shifted ? Math.abs(row.shift) : 0;
        for (int k = 0; k < row.columns.length; k++) {
          int entry = row.columns[k] * m + j;
          error += Math.abs(row.factors[k]) * e[entry];
          size += Math.abs(row.factors[k] * x[entry]);
        }
        // A copied value is exact.
        boolean exact =
            row.columns.length == 1 && row.factors[0] == 1 && !(shifted && row.shift != 0);
        result[row.row * m + j] = error + (exact ? 0 : 0x1p-52 * size);
      }
    }
    return result;
  }

  /**
   * Returns the columns just before, from those after it.
   *
   * @param x columns after it, n by m, row by row; left as they are
   * @param m number of columns
   * @param shifted whether d counts
   * @throws IllegalStateException if J is singular
   */
  public double[] before(double[] x, int m, boolean shifted) {
    if (change.singular) {
      throw new IllegalStateException("the jump at " + time + " cannot be undone");
    }
    int[] changed = change.changed;
    double[][] right = new double[changed.length][m];
    for (int i = 0; i < changed.length; i++) {
      Row row = change.rows.get(i);
      for (int j = 0; j < m; j++) {
        double sum = x[row.row * m + j] - (shifted ? row.shift : 0);
        for (int k = 0; k < row.columns.length; k++) {
          if (Arrays.binarySearch(changed, row.columns[k]) < 0) {
            sum -= row.factors[k] * x[row.columns[k] * m + j];
          }
        }
        right[i][j] = sum;
      }
    }
    double[][] solved = LuFactors.of(change.block(), Watch.NONE).solve(right, m, Watch.NONE);
    double[] result = x.clone();
    for (int i = 0; i < changed.length; i++) {
      System.arraycopy(solved[i], 0, result, changed[i] * m, m);
    }
    return result;
  }

  @Override
  public String toString() {
    return "Jump[" + time + ", " + change.rows + "]";
  }
}
