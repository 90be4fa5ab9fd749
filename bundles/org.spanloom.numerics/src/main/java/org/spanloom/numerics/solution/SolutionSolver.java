/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.solution;

import java.util.Optional;
import org.spanloom.numerics.Accuracy;
import org.spanloom.numerics.JumpSelection;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Outcome;
import org.spanloom.numerics.Outcome.Reason;
import org.spanloom.numerics.Progress;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.collocation.CollocationSolver;
import org.spanloom.numerics.collocation.CollocationTableau;
import org.spanloom.numerics.collocation.CollocationTableau.Family;
import org.spanloom.numerics.exponential.ExponentialSolution;
import org.spanloom.numerics.internal.algebra.Rows;
import org.spanloom.numerics.internal.work.Cancelled;
import org.spanloom.numerics.internal.work.Hopeless;
import org.spanloom.numerics.internal.work.Watch;

/** Computes solutions; chooses the method by the system. */
public final class SolutionSolver {

  private SolutionSolver() {}

  /**
   * Solves the homogeneous system {@code X' = A(t) X, X(t0) = X0} for all columns at once.
   *
   * @param system the system; its forcing is not used
   * @param t0 time at which the columns are given, inside {@code span}
   * @param x0 columns at t0, n by m, row by row
   * @param span bounded range to cover, inside the system's range; both directions from t0 are
   *     solved
   * @param accuracy error asked for, with n scales
   * @param progress watched and asked while working
   * @return the columns over the range
   */
  public static Outcome<Solution> homogeneous(
      LinearSystem system,
      double t0,
      double[] x0,
      TimeRange span,
      Accuracy accuracy,
      Progress progress) {
    int n = system.dimension();
    int m = n == 0 ? 0 : x0.length / n;
    return solve(new InitialValues(system, false, t0, x0, m, span, accuracy), progress);
  }

  /**
   * Solves {@code x' = A(t) x + b(t), x(t0) = x0}.
   *
   * @param system the system
   * @param t0 time of the initial values, inside {@code span}
   * @param x0 initial values, length n
   * @param span bounded range to cover, inside the system's range; both directions from t0 are
   *     solved
   * @param accuracy error asked for, with n scales
   * @param progress watched and asked while working
   * @return the trajectory over the range, one column
   */
  public static Outcome<Solution> trajectory(
      LinearSystem system,
      double t0,
      double[] x0,
      TimeRange span,
      Accuracy accuracy,
      Progress progress) {
    return solve(new InitialValues(system, true, t0, x0, 1, span, accuracy), progress);
  }

  private static Outcome<Solution> solve(InitialValues values, Progress progress) {
    try {
      requireSolvable(values);
      Watch watch = new Watch(progress);
      Solution solution =
          JumpSolver.isNeededFor(values)
              ? JumpSolver.solve(values, betweenJumps(values, watch), watch)
              : bySystem(values, watch);
      progress.worked(1);
      return new Outcome.Solved<>(solution);
    } catch (Cancelled cancelled) {
      return new Outcome.Cancelled<>();
    } catch (Hopeless hopeless) {
      return hopeless.outcome();
    }
  }

  private static void requireSolvable(InitialValues values) {
    TimeRange whole = values.system().range();
    TimeRange span = values.span();
    double t0 = values.t0();
    if (!span.isBounded() || !(span.length() < Double.POSITIVE_INFINITY)) {
      throw new Hopeless(
          Reason.RANGE,
          t0,
          "the range from " + span.start() + " to " + span.end() + " is not bounded");
    }
    if (!whole.contains(span.start()) || !whole.contains(span.end())) {
      throw new Hopeless(
          Reason.RANGE,
          whole.contains(span.start()) ? span.end() : span.start(),
          "the system is defined from " + whole.start() + " to " + whole.end());
    }
    if (!span.contains(t0)) {
      throw new Hopeless(
          Reason.RANGE,
          t0,
          "the values are given at " + t0 + ", outside the range to be solved on");
    }
    if (!Rows.isFinite(values.x0())) {
      throw new Hopeless(Reason.COEFFICIENT_NOT_FINITE, t0, "a start value is not a finite number");
    }
  }

  /** Returns the method for the pieces; with constant coefficients all share their propagators. */
  private static JumpSolver.PieceMethod betweenJumps(InitialValues values, Watch watch) {
    LinearSystem smooth = JumpSelection.without(values.system());
    int n = smooth.dimension();
    double earlier = JumpSolver.longestPiece(values, values.span().start());
    double later = JumpSolver.longestPiece(values, values.span().end());
    double t0 = values.t0();
    TimeRange longest =
        new TimeRange(
            Math.max(t0 - earlier, values.span().start()),
            Math.min(t0 + later, values.span().end()));
    InitialValues still =
        new InitialValues(
            smooth, values.forced(), t0, new double[n], 1, longest, values.accuracy());
    if (n > 0
        && longest.length() > 0
        && MethodChoice.of(still, watch).method() == Method.MATRIX_EXPONENTIAL) {
      ExponentialSolution shared = exponential(still, watch);
      return (start, x0, span, forced, accuracy) ->
          shared.restarted(start, x0, span, forced, watch);
    }
    return (start, x0, span, forced, accuracy) ->
        bySystem(
            new InitialValues(smooth, forced, start, x0, values.columns(), span, accuracy), watch);
  }

  private static Solution bySystem(InitialValues values, Watch watch) {
    int n = values.system().dimension();
    int m = values.columns();
    if (n == 0 || m == 0 || values.span().length() == 0) {
      return new ConstantSolution(n, m, values.t0(), values.span(), values.x0());
    }
    watch.ask();
    MethodChoice choice = MethodChoice.of(values, watch);
    return switch (choice.method()) {
      case MATRIX_EXPONENTIAL -> exponential(values, watch);
      case RADAU_COLLOCATION ->
          CollocationSolver.solve(
              values, CollocationTableau.of(Family.RADAU_IIA, choice.stages()), watch);
      case GAUSS_COLLOCATION ->
          CollocationSolver.solve(
              values, CollocationTableau.of(Family.GAUSS, choice.stages()), watch);
    };
  }

  private static ExponentialSolution exponential(InitialValues values, Watch watch) {
    LinearSystem system = values.system();
    double t0 = values.t0();
    int n = system.dimension();
    double[] a = new double[n * n];
    system.matrix(t0, Side.AFTER, a);
    requireFinite(a, t0, "A");
    Optional<double[]> forcing = Optional.empty();
    if (values.forced()) {
      double[] b = new double[n];
      system.forcing(t0, Side.AFTER, b);
      requireFinite(b, t0, "b");
      forcing = Rows.isZero(b) ? Optional.empty() : Optional.of(b);
    }
    return ExponentialSolution.of(a, forcing, values, watch);
  }

  private static void requireFinite(double[] values, double t, String name) {
    if (!Rows.isFinite(values)) {
      throw new Hopeless(
          Reason.COEFFICIENT_NOT_FINITE, t, "an entry of " + name + " is not a finite number");
    }
  }
}
