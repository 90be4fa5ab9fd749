/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.exponential;

import java.util.Arrays;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import org.spanloom.numerics.Outcome.Reason;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.SparsityPattern;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.internal.algebra.Rows;
import org.spanloom.numerics.internal.work.Hopeless;
import org.spanloom.numerics.internal.work.Watch;
import org.spanloom.numerics.solution.InitialValues;
import org.spanloom.numerics.solution.Solution;
import org.spanloom.numerics.structure.TriangularOrder;

/**
 * {@code X(t) = e^(A(t - t0)) X0} for a constant matrix, known at every time to about the unit
 * roundoff times the condition of the exponential, whatever accuracy was asked for.
 *
 * <p>A constant forcing b is one more state that stays at a constant s: {@code [[A, b/s], [0, 0]]}
 * (Van Loan 1978, IEEE Trans. Autom. Control 23, 395; from memory).
 *
 * <p>Error: two ladders of propagators whose step sizes have no common multiple are climbed. Their
 * rounding errors are unrelated, so that their disagreement measures the error of either; it is
 * taken several times, and never as smaller than a few units in the last place.
 */
public final class ExponentialSolution implements Solution {

  /** How many times the disagreement of the ladders counts as error. */
  private static final double SAFETY = 8;

  /**
   * Share of the largest error in a column that every entry of it is given, so that no entry is
   * right by chance.
   */
  private static final double SHARE = 0.25;

  /**
   * The second ladder spans this many times the length; no power of two is near a multiple of it.
   */
  private static final double SECOND = 1.3718281;

  private static final double MOST_ENTRIES = 4e7;

  private final int n;
  private final int m;
  private final boolean forced;
  private final double startTime;
  private final TimeRange range;
  private final int[] order;
  private final double constant;
  private final double[][] start;
  private final double[] scale;
  private final Ladders later;
  private final Ladders earlier;
  private final double[] nodes;

  /** Two ladders in one direction of time. */
  private record Ladders(PropagatorLadder first, PropagatorLadder second) {}

  /** What both ladders give at one time. */
  private record Pair(double[][] first, double[][] second) {}

  private ExponentialSolution(double[] a, Optional<double[]> b, InitialValues values, Watch watch) {
    this.n = values.system().dimension();
    this.m = values.columns();
    this.forced = b.isPresent();
    this.startTime = values.t0();
    this.range = values.span();
    this.scale = values.accuracy().scale();
    double[] x0 = values.x0();
    constant = b.map(f -> constantState(a, f, n)).orElse(1.0);
    int size = forced ? n + 1 : n;
    double[][] whole = new double[size][size];
    for (int i = 0; i < n; i++) {
      System.arraycopy(a, i * n, whole[i], 0, n);
      if (forced) {
        whole[i][n] = b.get()[i] / constant;
      }
    }
    TriangularOrder structure = TriangularOrder.of(patternOf(whole));
    order = structure.order();
    double[][] ordered = new double[size][size];
    for (int i = 0; i < size; i++) {
      for (int j = 0; j < size; j++) {
        ordered[i][j] = whole[order[i]][order[j]];
      }
    }
    start = start(x0, constant);
    boolean[] alone = structure.alone();
    later = ladders(ordered, alone, range.end() - startTime, watch);
    earlier = ladders(Rows.scaled(ordered, -1), alone, startTime - range.start(), watch);
    nodes = chooseNodes();
  }

  private ExponentialSolution(
      ExponentialSolution shared, double t0, double[] x0, TimeRange span, boolean forced) {
    this.n = shared.n;
    this.m = x0.length / n;
    this.forced = shared.forced;
    this.startTime = t0;
    this.range = span;
    this.scale = shared.scale;
    this.constant = shared.constant;
    this.order = shared.order;
    this.later = shared.later;
    this.earlier = shared.earlier;
    this.start = start(x0, forced ? constant : 0);
    this.nodes = chooseNodes();
  }

  private double[][] start(double[] x0, double lastState) {
    double[][] rows = new double[order.length][m];
    for (int i = 0; i < rows.length; i++) {
      for (int j = 0; j < m; j++) {
        rows[i][j] = order[i] < n ? x0[order[i] * m + j] : lastState;
      }
    }
    return rows;
  }

  /**
   * Returns a solution of the same system from other values, with the same propagators.
   *
   * @param t0 time of the values, an end of the range
   * @param x0 columns there, n by any number of them, row by row
   * @param span range to be covered; best not longer to either side than that of this solution
   * @param forcingCounts whether the forcing of this solution counts
   * @param watch asked while working
   * @throws Hopeless when the solution overflows in the range
   */
  public ExponentialSolution restarted(
      double t0, double[] x0, TimeRange span, boolean forcingCounts, Watch watch) {
    ExponentialSolution other = new ExponentialSolution(this, t0, x0, span, forcingCounts);
    double far = t0 == span.start() ? span.end() : span.start();
    if (!other.isFiniteAt(far, watch)) {
      other.requireFinite(watch);
    }
    return other;
  }

  /**
   * Solves a system with constant coefficients.
   *
   * @param a A, row by row, finite
   * @param b forcing, finite, or empty for none; one column only when there is one
   * @param values where the system starts; at least one state, a bounded range longer than 0
   * @param watch asked while working
   * @throws Hopeless when the solution overflows in the range
   */
  public static ExponentialSolution of(
      double[] a, Optional<double[]> b, InitialValues values, Watch watch) {
    ExponentialSolution solution = new ExponentialSolution(a, b, values, watch);
    solution.requireFinite(watch);
    return solution;
  }

  /**
   * Tells whether the ladders for a system of this size and speed fit into the memory they may
   * take.
   */
  public static boolean fits(double[] a, int n, double length) {
    double norm = Rows.oneNorm(Rows.of(a, n, n));
    double rungs = 6 + Math.max(0, Math.log(norm * length) / Math.log(2));
    return norm * length < 1e300 && 4 * rungs * n * n <= MOST_ENTRIES;
  }

  private static double constantState(double[] a, double[] b, int n) {
    double norm = Rows.oneNorm(Rows.of(a, n, n));
    double forcing = 0;
    for (double x : b) {
      forcing = Math.max(forcing, Math.abs(x));
    }
    if (!(norm > 0) || !(forcing > 0)) {
      return 1;
    }
    // A power of two, so that dividing and multiplying by it is exact.
    int exponent = Math.getExponent(forcing) - Math.getExponent(norm);
    return Math.scalb(1.0, Math.clamp(exponent, -500, 500));
  }

  private static SparsityPattern patternOf(double[][] a) {
    int size = a.length;
    int[] rowStart = new int[size + 1];
    int[] columns = new int[size * size];
    int count = 0;
    for (int i = 0; i < size; i++) {
      for (int j = 0; j < size; j++) {
        if (a[i][j] != 0) {
          columns[count++] = j;
        }
      }
      rowStart[i + 1] = count;
    }
    return new SparsityPattern(rowStart, Arrays.copyOf(columns, count));
  }

  private static Ladders ladders(double[][] a, boolean[] alone, double length, Watch watch) {
    if (length == 0) {
      return new Ladders(PropagatorLadder.flat(a, alone), PropagatorLadder.flat(a, alone));
    }
    PropagatorLadder first = PropagatorLadder.of(a, alone, length, watch);
    PropagatorLadder second = PropagatorLadder.of(a, alone, length * SECOND, watch);
    return new Ladders(first, second);
  }

  private double[] chooseNodes() {
    TreeSet<Double> times = new TreeSet<>();
    times.add(range.start());
    times.add(startTime);
    times.add(range.end());
    addNodes(times, later.first(), range.end() - startTime, 1);
    addNodes(times, earlier.first(), startTime - range.start(), -1);
    return times.stream().mapToDouble(Double::doubleValue).toArray();
  }

  /**
   * Nodes grow from the start like the rungs, since transients die out from there; an even grid
   * covers the rest.
   */
  private void addNodes(Set<Double> times, PropagatorLadder ladder, double length, int sign) {
    for (int k = 0; k < ladder.rungs(); k++) {
      addNode(times, startTime + sign * Math.scalb(ladder.lowest(), k));
    }
    for (int k = 1; k < 32; k++) {
      addNode(times, startTime + sign * (length * (k / 32.0)));
    }
  }

  private void addNode(Set<Double> times, double t) {
    if (range.contains(t)) {
      times.add(t);
    }
  }

  private void requireFinite(Watch watch) {
    for (int direction = -1; direction <= 1; direction += 2) {
      double good = startTime;
      for (int k = 0; k < nodes.length; k++) {
        double t = direction > 0 ? nodes[k] : nodes[nodes.length - 1 - k];
        if ((t - startTime) * direction <= 0) {
          continue;
        }
        if (!isFiniteAt(t, watch)) {
          throw new Hopeless(
              Reason.OVERFLOW,
              firstOverflow(good, t, watch),
              "the solution grows beyond the largest floating point number");
        }
        good = t;
        watch.worked(Math.abs(t - startTime) / range.length());
      }
    }
  }

  private double firstOverflow(double finite, double infinite, Watch watch) {
    double good = finite;
    double bad = infinite;
    for (int k = 0; k < 40 && Math.abs(bad - good) > 1e-6 * range.length(); k++) {
      double middle = good + (bad - good) / 2;
      if (isFiniteAt(middle, watch)) {
        good = middle;
      } else {
        bad = middle;
      }
    }
    return bad;
  }

  private boolean isFiniteAt(double t, Watch watch) {
    Pair pair = at(t, watch);
    return Rows.areFinite(pair.first()) && Rows.areFinite(pair.second());
  }

  private double[][] first(double t, Watch watch) {
    return t >= startTime
        ? later.first().advance(start, m, t - startTime, watch)
        : earlier.first().advance(start, m, startTime - t, watch);
  }

  private Pair at(double t, Watch watch) {
    double[][] second =
        t >= startTime
            ? later.second().advance(start, m, t - startTime, watch)
            : earlier.second().advance(start, m, startTime - t, watch);
    return new Pair(first(t, watch), second);
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
    return range;
  }

  @Override
  public void value(double t, Side side, double[] x) {
    requireInside(t);
    double[][] values = first(t, Watch.NONE);
    for (int i = 0; i < order.length; i++) {
      if (order[i] < n) {
        System.arraycopy(values[i], 0, x, order[i] * m, m);
      }
    }
  }

  @Override
  public void errorEstimate(double t, double[] error) {
    requireInside(t);
    if (t == startTime) {
      Arrays.fill(error, 0, n * m, 0);
      return;
    }
    Pair pair = at(t, Watch.NONE);
    for (int j = 0; j < m; j++) {
      double largest = 0;
      double largestRelative = 0;
      for (int i = 0; i < order.length; i++) {
        double size = Math.abs(pair.first()[i][j]);
        double difference = difference(pair, i, j);
        if (order[i] < n && difference > 0) {
          largest = Math.max(largest, difference / scale[order[i]]);
          largestRelative = Math.max(largestRelative, difference / size);
        }
      }
      for (int i = 0; i < order.length; i++) {
        if (order[i] < n) {
          double size = Math.abs(pair.first()[i][j]);
          // Where a value has died out in one ladder and not yet in the other, the ratio is
          // infinite.
          double relative = size == 0 ? 0 : largestRelative * size;
          double shared = Math.min(SHARE * largest * scale[order[i]], relative);
          double estimate = SAFETY * Math.max(difference(pair, i, j), shared) + 4 * Math.ulp(size);
          error[order[i] * m + j] = Math.min(estimate, Double.MAX_VALUE);
        }
      }
    }
  }

  private static double difference(Pair pair, int i, int j) {
    return Math.abs(pair.first()[i][j] - pair.second()[i][j]);
  }

  private void requireInside(double t) {
    if (!range.contains(t)) {
      throw new IllegalArgumentException("time " + t + " is outside " + range);
    }
  }

  @Override
  public double[] nodes() {
    return nodes.clone();
  }

  @Override
  public String method() {
    return "matrix exponential";
  }
}
