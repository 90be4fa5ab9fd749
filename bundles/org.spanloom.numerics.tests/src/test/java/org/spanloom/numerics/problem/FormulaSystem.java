/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.problem;

import java.util.Arrays;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.SparsityPattern;
import org.spanloom.numerics.TimeRange;

/** A system given by formulas. */
public record FormulaSystem(
    int dimension,
    TimeRange range,
    Coefficients a,
    Coefficients b,
    boolean hasConstantMatrix,
    boolean hasConstantForcing,
    SparsityPattern pattern,
    double[] breakpoints)
    implements LinearSystem {

  /** Writes coefficients at a time. */
  @FunctionalInterface
  public interface Coefficients {
    /** Writes every entry. */
    void write(double t, Side side, double[] entries);
  }

  /** Writes coefficients that do not jump. */
  @FunctionalInterface
  public interface Smooth {
    /** Writes every entry. */
    void write(double t, double[] entries);
  }

  /** Returns a system without forcing. */
  public static FormulaSystem homogeneous(int n, double start, double end, Smooth a) {
    return forced(n, start, end, a, (t, b) -> Arrays.fill(b, 0));
  }

  /** Returns a system with forcing. */
  public static FormulaSystem forced(int n, double start, double end, Smooth a, Smooth b) {
    return new FormulaSystem(
        n,
        new TimeRange(start, end),
        (t, side, entries) -> a.write(t, entries),
        (t, side, entries) -> b.write(t, entries),
        false,
        false,
        SparsityPattern.dense(n),
        new double[0]);
  }

  /** Returns a system with constant matrix and without forcing. */
  public static FormulaSystem constant(double[] a, double start, double end) {
    int n = (int) Math.round(Math.sqrt(a.length));
    return constant(a, new double[n], start, end);
  }

  /** Returns a system with constant matrix and forcing. */
  public static FormulaSystem constant(double[] a, double[] b, double start, double end) {
    int n = b.length;
    return new FormulaSystem(
        n,
        new TimeRange(start, end),
        (t, side, entries) -> System.arraycopy(a, 0, entries, 0, n * n),
        (t, side, entries) -> System.arraycopy(b, 0, entries, 0, n),
        true,
        true,
        patternOf(a, n),
        new double[0]);
  }

  /** Returns the same system, with another pattern. */
  public FormulaSystem withPattern(SparsityPattern other) {
    return new FormulaSystem(
        dimension, range, a, b, hasConstantMatrix, hasConstantForcing, other, breakpoints);
  }

  /** Returns the same system as if nobody knew that its coefficients are constant. */
  public FormulaSystem asVarying() {
    return new FormulaSystem(dimension, range, a, b, false, false, pattern, breakpoints);
  }

  /** Returns the same system with breakpoints. */
  public FormulaSystem withBreakpoints(double... times) {
    return new FormulaSystem(
        dimension, range, a, b, hasConstantMatrix, hasConstantForcing, pattern, times);
  }

  /** Returns the pattern of the entries of a matrix that are not zero. */
  public static SparsityPattern patternOf(double[] a, int n) {
    int[] rowStart = new int[n + 1];
    int[] columns = new int[n * n];
    int count = 0;
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        if (a[i * n + j] != 0) {
          columns[count++] = j;
        }
      }
      rowStart[i + 1] = count;
    }
    return new SparsityPattern(rowStart, Arrays.copyOf(columns, count));
  }

  @Override
  public void matrix(double t, Side side, double[] entries) {
    a.write(t, side, entries);
  }

  @Override
  public void forcing(double t, Side side, double[] entries) {
    b.write(t, side, entries);
  }

  @Override
  public double[] breakpoints() {
    return breakpoints.clone();
  }
}
