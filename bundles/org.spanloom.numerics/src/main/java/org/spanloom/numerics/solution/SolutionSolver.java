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
import org.spanloom.numerics.magnus.MagnusOrder;
import org.spanloom.numerics.magnus.MagnusSolver;

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
    return homogeneous(system, t0, x0, span, accuracy, Optional.empty(), progress);
  }

  /** Solves the homogeneous system as above, by a method if one is given. */
  public static Outcome<Solution> homogeneous(
      LinearSystem system,
      double t0,
      double[] x0,
      TimeRange span,
      Accuracy accuracy,
      Optional<MethodChoice> method,
      Progress progress) {
    int n = system.dimension();
    int m = n == 0 ? 0 : x0.length / n;
    return solve(new InitialValues(system, false, t0, x0, m, span, accuracy), method, progress);
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
    return trajectory(system, t0, x0, span, accuracy, Optional.empty(), progress);
  }

  /** Solves for a trajectory as above, by a method if one is given. */
  public static Outcome<Solution> trajectory(
      LinearSystem system,
      double t0,
      double[] x0,
      TimeRange span,
      Accuracy accuracy,
      Optional<MethodChoice> method,
      Progress progress) {
    return solve(new InitialValues(system, true, t0, x0, 1, span, accuracy), method, progress);
  }

  private static Outcome<Solution> solve(
      InitialValues values, Optional<MethodChoice> method, Progress progress) {
    try {
      requireSolvable(values);
      Watch watch = new Watch(progress);
      Solution solution =
          JumpSolver.isNeededFor(values)
              ? JumpSolver.solve(values, betweenJumps(values, method, watch), watch)
              : bySystem(values, method, watch);
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
  private static JumpSolver.PieceMethod betweenJumps(
      InitialValues values, Optional<MethodChoice> method, Watch watch) {
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
        && method.orElseGet(() -> MethodChoice.of(still, watch)).method()
            == Method.MATRIX_EXPONENTIAL
        && MethodChoice.fitsExponential(still)) {
      ExponentialSolution shared = exponential(still, watch);
      return (start, x0, span, forced, accuracy) ->
          shared.restarted(start, x0, span, forced, watch);
    }
    return (start, x0, span, forced, accuracy) ->
        bySystem(
            new InitialValues(smooth, forced, start, x0, values.columns(), span, accuracy),
            method,
            watch);
  }

  private static Solution bySystem(
      InitialValues values, Optional<MethodChoice> method, Watch watch) {
    int n = values.system().dimension();
    int m = values.columns();
    if (n == 0 || m == 0 || values.span().length() == 0) {
      return new ConstantSolution(n, m, values.t0(), values.span(), values.x0());
    }
    watch.ask();
    if (method.isPresent()) {
      return by(method.get(), values, watch);
    }
    MethodChoice choice = MethodChoice.of(values, watch);
    try {
      return by(choice, values, watch);
    } catch (Hopeless hopeless) {
      if (choice.method() != Method.MAGNUS || hopeless.reason() != Reason.TOO_MUCH_WORK) {
        throw hopeless;
      }
      // What made so many steps necessary may be less to a method that damps.
      return by(new MethodChoice(Method.RADAU_COLLOCATION, 9), values, watch);
    }
  }

  private static Solution by(MethodChoice choice, InitialValues values, Watch watch) {
    return switch (choice.method()) {
      case MATRIX_EXPONENTIAL -> {
        if (!MethodChoice.fitsExponential(values)) {
          throw new Hopeless(
              Reason.METHOD,
              values.t0(),
              "the exponential of a matrix needs coefficients that do not change with time, and"
                  + " memory for their powers");
        }
        yield exponential(values, watch);
      }
      case MAGNUS -> MagnusSolver.solve(values, MagnusOrder.of(choice.order()), watch);
      case RADAU_COLLOCATION ->
          CollocationSolver.solve(
              values, CollocationTableau.of(Family.RADAU_IIA, (choice.order() + 1) / 2), watch);
      case GAUSS_COLLOCATION ->
          CollocationSolver.solve(
              values, CollocationTableau.of(Family.GAUSS, choice.order() / 2), watch);
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
