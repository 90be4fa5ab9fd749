/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.Arrays;

/**
 * A curve of cubics from knot to knot, in coherent SI units. Before the first and behind the last
 * knot the end values hold. Between knots k and k + 1 the value is {@code c0 + s (c1 + s (c2 + s
 * c3))} with s the time since knot k; right at a knot the later piece counts.
 */
public final class PiecewiseCurve implements Curve {

  private final double[] knots;
  private final double[] c0;
  private final double[] c1;
  private final double[] c2;
  private final double[] c3;
  private final double last;
  private final double before;
  private final boolean jumps;
  private final Interval[] tree;

  /**
   * Takes the pieces; the arrays are not copied.
   *
   * @param knots increasing times, at least one
   * @param c0 coefficients of the pieces, one less than knots
   * @param before the value up to the first knot
   * @param last the value from the last knot on
   * @param jumps whether values may jump at knots
   */
  PiecewiseCurve(
      double[] knots,
      double[] c0,
      double[] c1,
      double[] c2,
      double[] c3,
      double before,
      double last,
      boolean jumps) {
    this.knots = knots;
    this.c0 = c0;
    this.c1 = c1;
    this.c2 = c2;
    this.c3 = c3;
    this.before = before;
    this.last = last;
    this.jumps = jumps;
    this.tree = tree();
  }

  /**
   * Interpolates.
   *
   * @param times increasing, at least two, or one for values that hold
   */
  static PiecewiseCurve hold(double[] times, double[] values) {
    int n = times.length - 1;
    double[] none = new double[n];
    return new PiecewiseCurve(
        times, Arrays.copyOf(values, n), none, none, none, values[0], values[n], true);
  }

  /** Interpolates by straight lines. */
  static PiecewiseCurve linear(double[] times, double[] values) {
    int n = times.length - 1;
    double[] none = new double[n];
    double[] slopes = new double[n];
    for (int k = 0; k < n; k++) {
      slopes[k] = (values[k + 1] - values[k]) / (times[k + 1] - times[k]);
    }
    return new PiecewiseCurve(
        times, Arrays.copyOf(values, n), slopes, none, none, values[0], values[n], false);
  }

  /**
   * Interpolates by cubics that are monotone where the values are: with steps h and slopes d of the
   * chords, the derivative at a knot between is 0 where d changes its sign, else {@code (w1 + w2) /
   * (w1/d1 + w2/d2)} with {@code w1 = 2 h2 + h1} and {@code w2 = h2 + 2 h1}. At the ends it is the
   * three-point formula, cut to keep the first piece monotone.
   *
   * <p>Source: Fritsch and Carlson, SIAM J. Numer. Anal. 17 (1980) 238; Fritsch and Butland, SIAM
   * J. Sci. Stat. Comput. 5 (1984) 300 (from memory).
   */
  static PiecewiseCurve monotoneCubic(double[] times, double[] values) {
    int n = times.length - 1;
    double[] h = new double[n];
    double[] d = new double[n];
    for (int k = 0; k < n; k++) {
      h[k] = times[k + 1] - times[k];
      d[k] = (values[k + 1] - values[k]) / h[k];
    }
    double[] slope = new double[n + 1];
    if (n == 1) {
      Arrays.fill(slope, d[0]);
    } else {
      slope[0] = end(h[0], h[1], d[0], d[1]);
      slope[n] = end(h[n - 1], h[n - 2], d[n - 1], d[n - 2]);
    }
    for (int k = 1; k < n; k++) {
      double w1 = 2 * h[k] + h[k - 1];
      double w2 = h[k] + 2 * h[k - 1];
      boolean turns = !(Math.signum(d[k - 1]) * Math.signum(d[k]) > 0);
      slope[k] = turns ? 0 : (w1 + w2) / (w1 / d[k - 1] + w2 / d[k]);
    }
    double[] c2 = new double[n];
    double[] c3 = new double[n];
    for (int k = 0; k < n; k++) {
      c2[k] = (3 * d[k] - 2 * slope[k] - slope[k + 1]) / h[k];
      c3[k] = (slope[k] + slope[k + 1] - 2 * d[k]) / (h[k] * h[k]);
    }
    return new PiecewiseCurve(
        times,
        Arrays.copyOf(values, n),
        Arrays.copyOf(slope, n),
        c2,
        c3,
        values[0],
        values[n],
        false);
  }

  private static double end(double h0, double h1, double d0, double d1) {
    double slope = ((2 * h0 + h1) * d0 - h0 * d1) / (h0 + h1);
    if (!(Math.signum(slope) * Math.signum(d0) > 0)) {
      return 0;
    }
    boolean turns = !(Math.signum(d0) * Math.signum(d1) > 0);
    return turns && Math.abs(slope) > 3 * Math.abs(d0) ? 3 * d0 : slope;
  }

  /** Returns the number of knots. */
  public int size() {
    return knots.length;
  }

  /** Returns the first time. */
  public double first() {
    return knots[0];
  }

  /** Returns the last time. */
  public double lastTime() {
    return knots[knots.length - 1];
  }

  /** Returns a knot. */
  double knot(int index) {
    return knots[index];
  }

  /** Returns the first knot at or behind a time. */
  int knotFrom(double time) {
    int at = Arrays.binarySearch(knots, time);
    return at < 0 ? -1 - at : at;
  }

  /** Tells whether values may jump at knots. */
  boolean jumps() {
    return jumps;
  }

  @Override
  public double at(double time) {
    if (time >= lastTime()) {
      return last;
    }
    if (!(time >= knots[0])) {
      return Double.isNaN(time) ? time : before;
    }
    int k = piece(time);
    double s = time - knots[k];
    return c0[k] + s * (c1[k] + s * (c2[k] + s * c3[k]));
  }

  /** Returns the derivative by time, 0 outside of the knots; at a knot that of the later piece. */
  PiecewiseCurve derivative() {
    int n = c0.length;
    double[] linear = new double[n];
    double[] square = new double[n];
    for (int k = 0; k < n; k++) {
      linear[k] = 2 * c2[k];
      square[k] = 3 * c3[k];
    }
    return new PiecewiseCurve(knots, c1, linear, square, new double[n], 0, 0, true);
  }

  /** Encloses the values over a range of times. */
  Interval over(Interval times) {
    if (times.isEmpty()) {
      return Interval.EMPTY;
    }
    Interval range = times.high() >= lastTime() ? Interval.at(last) : Interval.EMPTY;
    if (times.low() < knots[0]) {
      range = range.hull(Interval.at(before));
    }
    int n = c0.length;
    int from = Math.max(0, piece(times.low()));
    int to = Math.min(n - 1, piece(times.high()));
    if (from > to) {
      return range;
    }
    range = range.hull(part(from, times)).hull(part(to, times));
    return to - from > 1 ? range.hull(whole(from + 1, to - 1)) : range;
  }

  /**
   * Returns the piece of a time: -1 before the first knot, the number of pieces behind the last.
   */
  private int piece(double time) {
    // The sum makes 0 of -0, which would be looked for before it.
    int found = Arrays.binarySearch(knots, time + 0.0);
    return found < 0 ? -2 - found : found;
  }

  private Interval part(int k, Interval times) {
    Interval inside = times.intersect(new Interval(knots[k], knots[k + 1]));
    return inside.isEmpty() ? inside : values(k, inside).intersect(tree[c0.length + k]);
  }

  private Interval values(int k, Interval times) {
    Interval s = times.minus(Interval.at(knots[k]));
    return Interval.at(c0[k])
        .plus(
            s.times(
                Interval.at(c1[k])
                    .plus(s.times(Interval.at(c2[k]).plus(s.times(Interval.at(c3[k])))))));
  }

  /** The hulls of runs of pieces, as a binary tree: node k holds those of 2 k and 2 k + 1. */
  private Interval[] tree() {
    int n = c0.length;
    Interval[] hulls = new Interval[2 * n];
    for (int k = 0; k < n; k++) {
      hulls[n + k] = values(k, new Interval(knots[k], knots[k + 1]));
    }
    for (int k = n - 1; k > 0; k--) {
      hulls[k] = hulls[2 * k].hull(hulls[2 * k + 1]);
    }
    return hulls;
  }

  private Interval whole(int from, int to) {
    Interval range = Interval.EMPTY;
    int n = c0.length;
    for (int low = from + n, high = to + n + 1; low < high; low /= 2, high /= 2) {
      if (low % 2 == 1) {
        range = range.hull(tree[low++]);
      }
      if (high % 2 == 1) {
        range = range.hull(tree[--high]);
      }
    }
    return range;
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof PiecewiseCurve curve
        && jumps == curve.jumps
        && before == curve.before
        && last == curve.last
        && Arrays.equals(knots, curve.knots)
        && Arrays.equals(c0, curve.c0)
        && Arrays.equals(c1, curve.c1)
        && Arrays.equals(c2, curve.c2)
        && Arrays.equals(c3, curve.c3);
  }

  @Override
  public int hashCode() {
    return Arrays.hashCode(
        new int[] {Arrays.hashCode(knots), Arrays.hashCode(c0), Arrays.hashCode(c1)});
  }

  @Override
  public String toString() {
    return "PiecewiseCurve["
        + knots.length
        + " knots from "
        + first()
        + " to "
        + lastTime()
        + ", "
        + Integer.toHexString(hashCode())
        + "]";
  }
}
