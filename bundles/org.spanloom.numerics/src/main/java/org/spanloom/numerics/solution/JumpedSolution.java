/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.solution;

import java.util.Arrays;
import java.util.List;
import java.util.TreeSet;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.TimeRange;

/**
 * A solution put together from pieces between jumps; continuous from the right at them.
 *
 * <p>The error is that of the piece, which starts as if its first values were exact, plus what the
 * error at its start has become: that is a solution of the homogeneous system as well.
 */
final class JumpedSolution implements Solution {

  /** Share of the largest passed-on error of a column that every entry of it is given. */
  private static final double SHARE = 0.25;

  private static final int MOST_NODES = 20_000;

  private final int n;
  private final int m;
  private final double startTime;
  private final double[] scale;
  private final List<Piece> pieces;
  private final double[] from;
  private final double[] jumpTimes;

  /**
   * The solution between two jumps.
   *
   * @param values its values, as if those at its start were exact
   * @param passedOn what the errors at its start have become, each column over its size
   * @param sizes the sizes of the columns; 0 for one without error
   */
  record Piece(Solution values, Solution passedOn, double[] sizes) {

    TimeRange range() {
      return values.range();
    }

    /** Writes the values and returns signed estimates of the error passed on, n by m. */
    double[] passedOnAt(double t) {
      double[] e = new double[values.dimension() * sizes.length];
      passedOn.value(t, Side.AFTER, e);
      for (int k = 0; k < e.length; k++) {
        double size = sizes[k % sizes.length];
        e[k] = size == 0 ? 0 : e[k] * size;
      }
      return e;
    }
  }

  /**
   * Puts the pieces together.
   *
   * @param startTime where the values were given
   * @param scale sizes below which only the absolute error of a state counts
   * @param pieces at least one, by time, each beginning where the one before ends; one of length 0
   *     at an end of the range holds the values on the far side of a jump there
   * @param jumpTimes times of the jumps of which both sides are known
   */
  JumpedSolution(double startTime, double[] scale, List<Piece> pieces, double[] jumpTimes) {
    this.startTime = startTime;
    this.scale = scale.clone();
    this.pieces = List.copyOf(pieces);
    this.n = pieces.getFirst().values().dimension();
    this.m = pieces.getFirst().values().columns();
    this.from = pieces.stream().mapToDouble(p -> p.range().start()).toArray();
    this.jumpTimes = jumpTimes.clone();
  }

  @Override
  public int dimension() {
    return n;
  }

  @Override
  public int columns() {
    return m;
  }

  @Override
  public double startTime() {
    return startTime;
  }

  @Override
  public TimeRange range() {
    return new TimeRange(pieces.getFirst().range().start(), pieces.getLast().range().end());
  }

  private Piece piece(double t, Side side) {
    if (!range().contains(t)) {
      throw new IllegalArgumentException("time " + t + " is outside " + range());
    }
    // The sum makes 0 of -0, which would be looked for before it.
    int found = Arrays.binarySearch(from, t + 0.0);
    int k = found >= 0 ? found : -found - 2;
    // Two pieces begin at one time where the first of them has the length 0.
    while (side == Side.AFTER && k + 1 < from.length && from[k + 1] == t) {
      k++;
    }
    while (side == Side.BEFORE && k > 0 && pieces.get(k - 1).range().end() == t) {
      k--;
    }
    return pieces.get(k);
  }

  @Override
  public void value(double t, Side side, double[] x) {
    piece(t, side).values().value(t, side, x);
  }

  @Override
  public void errorEstimate(double t, double[] error) {
    errorEstimate(t, Side.AFTER, error);
  }

  @Override
  public void errorEstimate(double t, Side side, double[] error) {
    Piece piece = piece(t, side);
    double[] passedOn = piece.passedOnAt(t);
    double[] x = new double[n * m];
    piece.values().value(t, side, x);
    piece.values().errorEstimate(t, side, error);
    for (int j = 0; j < m; j++) {
      double largest = 0;
      for (int e = j; e < n * m; e += m) {
        largest = Math.max(largest, Math.abs(passedOn[e]) / size(x[e], e / m));
      }
      for (int e = j; e < n * m; e += m) {
        double shared = Math.max(Math.abs(passedOn[e]), SHARE * largest * size(x[e], e / m));
        error[e] = Math.min(error[e] + shared, Double.MAX_VALUE);
      }
    }
  }

  private double size(double value, int component) {
    return Math.max(Math.abs(value), scale[component]);
  }

  /** Returns the largest error at the ends of the pieces, over the size of the values. */
  double worstRelativeError() {
    double worst = 0;
    double[] x = new double[n * m];
    double[] e = new double[n * m];
    for (Piece piece : pieces) {
      for (double t : new double[] {piece.range().start(), piece.range().end()}) {
        Side side = t == piece.range().start() ? Side.AFTER : Side.BEFORE;
        value(t, side, x);
        errorEstimate(t, side, e);
        for (int k = 0; k < x.length; k++) {
          worst = Math.max(worst, e[k] / size(x[k], k / m));
        }
      }
    }
    return worst;
  }

  @Override
  public double[] jumpTimes() {
    return jumpTimes.clone();
  }

  @Override
  public double[] nodes() {
    double[][] all = pieces.stream().map(p -> p.values().nodes()).toArray(double[][]::new);
    int count = Arrays.stream(all).mapToInt(nodes -> nodes.length).sum();
    int stride = 1 + count / MOST_NODES;
    TreeSet<Double> times = new TreeSet<>();
    for (double[] nodes : all) {
      for (int k = 0; k < nodes.length; k += stride) {
        times.add(nodes[k]);
      }
      times.add(nodes[nodes.length - 1]);
    }
    return times.stream().mapToDouble(Double::doubleValue).toArray();
  }

  @Override
  public String method() {
    return pieces.stream()
        .filter(p -> p.range().length() > 0)
        .findFirst()
        .orElse(pieces.getFirst())
        .values()
        .method();
  }
}
