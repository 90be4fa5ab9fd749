/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.solution;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import org.spanloom.numerics.Accuracy;
import org.spanloom.numerics.Jump;
import org.spanloom.numerics.Outcome.Reason;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.internal.work.Hopeless;
import org.spanloom.numerics.internal.work.Watch;
import org.spanloom.numerics.solution.JumpedSolution.Piece;

/**
 * Solves a system with jumps piece by piece, with any method, forwards and backwards from the
 * start.
 *
 * <p>The values given at the start stand just before a jump at that time. What the errors at the
 * start of a piece become is solved for beside the values, as columns of the homogeneous system, to
 * a few digits; errors of different pieces are never allowed to cancel.
 */
final class JumpSolver {

  /** Digits of an error that matter. */
  private static final double ERROR_ACCURACY = 1e-3;

  private static final int MOST_RUNS = 4;

  private static final double SMALLEST_RELATIVE = 1e-14;

  private static final double MOST_NUMBERS = 5e7;

  private final InitialValues values;
  private final PieceMethod method;
  private final Watch watch;
  private final int n;
  private final int m;
  private final double[] scale;
  private final TreeMap<Double, List<Jump>> jumps = new TreeMap<>();

  /** Solves a system on a range without jumps. */
  interface PieceMethod {
    /**
     * Solves.
     *
     * @param t0 an end of the range
     * @param x0 columns there, n by m
     * @param span the range, longer than 0
     * @param forced whether the forcing counts
     * @param accuracy error asked for
     */
    Solution solve(double t0, double[] x0, TimeRange span, boolean forced, Accuracy accuracy);
  }

  /** Columns at a time and their signed errors. */
  private record Front(double time, double[] x, double[] e) {}

  private JumpSolver(InitialValues values, PieceMethod method, Watch watch) {
    this.values = values;
    this.method = method;
    this.watch = watch;
    this.n = values.system().dimension();
    this.m = values.columns();
    this.scale = values.accuracy().scale();
    for (Jump jump : inside(values, values.span())) {
      jumps.computeIfAbsent(jump.time(), t -> new ArrayList<>()).add(jump);
    }
  }

  /** Tells whether a jump lies in the range to be solved on. */
  static boolean isNeededFor(InitialValues values) {
    return !inside(values, values.span()).isEmpty();
  }

  private static List<Jump> inside(InitialValues values, TimeRange part) {
    return Jump.within(values.system().jumps(), part.start(), part.end());
  }

  /**
   * Solves.
   *
   * @param values where the system starts
   * @param method solves between jumps
   * @param watch asked while working
   */
  static Solution solve(InitialValues values, PieceMethod method, Watch watch) {
    return new JumpSolver(values, method, watch).solve();
  }

  /** Returns the longest time between two jumps or a jump and an end, from a time to an end. */
  static double longestPiece(InitialValues values, double end) {
    double t0 = values.t0();
    TimeRange part = new TimeRange(Math.min(t0, end), Math.max(t0, end));
    double longest = 0;
    double before = part.start();
    for (Jump jump : inside(values, part)) {
      longest = Math.max(longest, jump.time() - before);
      before = jump.time();
    }
    return Math.max(longest, part.end() - before);
  }

  /** Errors of pieces add up, so that each may have to be solved to less than what is asked. */
  private Solution solve() {
    double asked = values.accuracy().relative();
    double relative = asked;
    for (int run = 1; ; run++) {
      JumpedSolution solution = attempt(values.accuracy().withRelative(relative));
      double reached = solution.worstRelativeError();
      if (!values.forced()
          || reached <= asked
          || run == MOST_RUNS
          || relative == SMALLEST_RELATIVE) {
        return solution;
      }
      double factor = Math.clamp(0.3 * asked / reached, 1e-4, 0.3);
      relative = Math.max(relative * factor, SMALLEST_RELATIVE);
    }
  }

  private JumpedSolution attempt(Accuracy accuracy) {
    List<Piece> pieces = new ArrayList<>();
    List<Double> times = new ArrayList<>(jumps.keySet());
    Front start = new Front(values.t0(), values.x0(), new double[n * m]);
    if (!backwards(start, accuracy, pieces)) {
      times.removeFirst();
    }
    forwards(start, accuracy, pieces);
    return new JumpedSolution(
        values.t0(), scale, pieces, times.stream().mapToDouble(Double::doubleValue).toArray());
  }

  private void forwards(Front start, Accuracy accuracy, List<Piece> pieces) {
    Front front = start;
    if (jumps.containsKey(start.time())) {
      if (pieces.isEmpty()) {
        pieces.add(still(front));
      }
      front = across(front, jumps.get(start.time()));
    }
    for (Map.Entry<Double, List<Jump>> stop : jumps.tailMap(start.time(), false).entrySet()) {
      Piece piece = piece(front, stop.getKey(), accuracy);
      pieces.add(piece);
      front = across(end(piece, stop.getKey()), stop.getValue());
      requireRoom(pieces.size(), front.time());
    }
    double end = values.span().end();
    if (front.time() < end) {
      pieces.add(piece(front, end, accuracy));
    } else if (pieces.isEmpty() || jumps.containsKey(end)) {
      pieces.add(still(front));
    }
  }

  /** Adds the pieces before the start; returns whether both sides of every jump there are known. */
  private boolean backwards(Front start, Accuracy accuracy, List<Piece> pieces) {
    List<Piece> found = new ArrayList<>();
    Front front = start;
    boolean complete = true;
    double first = values.span().start();
    for (Map.Entry<Double, List<Jump>> stop :
        jumps.headMap(start.time(), false).descendingMap().entrySet()) {
      double time = stop.getKey();
      Piece piece = piece(front, time, accuracy);
      found.add(piece);
      boolean singular = stop.getValue().stream().anyMatch(Jump::isSingular);
      if (singular && time > first) {
        throw new Hopeless(
            Reason.JUMP_SINGULAR, time, "what the states were before it does not follow");
      }
      complete = !singular;
      if (complete) {
        front = undone(end(piece, time), stop.getValue());
        requireRoom(found.size(), time);
      }
    }
    if (front.time() > first) {
      found.add(piece(front, first, accuracy));
    } else if (complete && jumps.containsKey(first) && front.time() < start.time()) {
      found.add(still(front));
    }
    pieces.addAll(found.reversed());
    return complete;
  }

  private void requireRoom(int pieces, double time) {
    if (2.0 * pieces * n * m > MOST_NUMBERS) {
      throw new Hopeless(
          Reason.TOO_MUCH_WORK,
          time,
          "the solution needs more than " + (long) MOST_NUMBERS + " numbers to be kept");
    }
  }

  private Piece piece(Front front, double to, Accuracy accuracy) {
    watch.ask();
    watch.worked(Math.abs(front.time() - values.t0()) / values.span().length());
    TimeRange span = new TimeRange(Math.min(front.time(), to), Math.max(front.time(), to));
    Solution solution = method.solve(front.time(), front.x(), span, values.forced(), accuracy);
    double[] sizes = sizes(front.e());
    if (Arrays.stream(sizes).allMatch(s -> s == 0)) {
      return new Piece(solution, new ConstantSolution(n, m, front.time(), span, front.e()), sizes);
    }
    double[] unit = front.e().clone();
    for (int k = 0; k < unit.length; k++) {
      unit[k] = sizes[k % m] == 0 ? 0 : unit[k] / sizes[k % m];
    }
    Accuracy few = accuracy.withRelative(ERROR_ACCURACY);
    return new Piece(solution, method.solve(front.time(), unit, span, false, few), sizes);
  }

  /** Returns the size of each column of errors, measured by the scales of the states. */
  private double[] sizes(double[] e) {
    double[] sizes = new double[m];
    for (int k = 0; k < e.length; k++) {
      sizes[k % m] = Math.max(sizes[k % m], Math.abs(e[k]) / scale[k / m]);
    }
    return sizes;
  }

  /** Returns a piece of length 0. */
  private Piece still(Front front) {
    TimeRange here = new TimeRange(front.time(), front.time());
    double[] ones = new double[m];
    Arrays.fill(ones, 1);
    return new Piece(
        new ConstantSolution(n, m, front.time(), here, front.x()),
        new ConstantSolution(n, m, front.time(), here, front.e()),
        ones);
  }

  /** Returns what a piece has become at its far end. */
  private Front end(Piece piece, double t) {
    double[] x = new double[n * m];
    double[] own = new double[n * m];
    piece.values().value(t, Side.AFTER, x);
    piece.values().errorEstimate(t, own);
    double[] e = piece.passedOnAt(t);
    for (int k = 0; k < e.length; k++) {
      e[k] += Math.copySign(own[k], e[k]);
    }
    return new Front(t, x, e);
  }

  private Front across(Front front, List<Jump> at) {
    double[] x = front.x();
    double[] e = front.e();
    for (Jump jump : at) {
      double[] signed = jump.after(e, m, false);
      double[] sizes = jump.errorsAfter(x, absolute(e), m, values.forced());
      e = withSigns(sizes, signed);
      x = jump.after(x, m, values.forced());
    }
    return finite(new Front(front.time(), x, e));
  }

  private Front undone(Front front, List<Jump> at) {
    double[] x = front.x();
    double[] e = front.e();
    for (Jump jump : at.reversed()) {
      double[] sizes = absolute(jump.before(e, m, false));
      double[] rounding = absolute(jump.before(x, m, values.forced()));
      for (int k = 0; k < sizes.length; k++) {
        sizes[k] += 0x1p-50 * rounding[k];
      }
      e = withSigns(sizes, jump.before(e, m, false));
      x = jump.before(x, m, values.forced());
    }
    return finite(new Front(front.time(), x, e));
  }

  private static Front finite(Front front) {
    for (int k = 0; k < front.x().length; k++) {
      if (!Double.isFinite(front.x()[k]) || !Double.isFinite(front.e()[k])) {
        throw new Hopeless(
            Reason.OVERFLOW,
            front.time(),
            "the solution grows beyond the largest floating point number");
      }
    }
    return front;
  }

  private static double[] absolute(double[] values) {
    double[] result = new double[values.length];
    Arrays.setAll(result, k -> Math.abs(values[k]));
    return result;
  }

  private static double[] withSigns(double[] sizes, double[] signs) {
    double[] result = new double[sizes.length];
    Arrays.setAll(result, k -> Math.copySign(sizes[k], signs[k]));
    return result;
  }
}
