/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.boundary;

import java.util.ArrayList;
import java.util.List;
import org.spanloom.numerics.Accuracy;
import org.spanloom.numerics.Jump;
import org.spanloom.numerics.JumpSelection;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Outcome;
import org.spanloom.numerics.Outcome.Reason;
import org.spanloom.numerics.Progress;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.internal.algebra.Rows;
import org.spanloom.numerics.internal.work.Cancelled;
import org.spanloom.numerics.internal.work.Hopeless;
import org.spanloom.numerics.internal.work.Watch;
import org.spanloom.numerics.solution.Solution;
import org.spanloom.numerics.solution.SolutionSolver;

/**
 * Solves linear boundary-value problems, two-point and multi-point, by Gauss collocation on an
 * adapted mesh.
 *
 * <p>The collocation conditions of each step are condensed to {@code x_(k+1) = R_k x_k + r_k}; the
 * nodes between the times of conditions are eliminated by orthogonal transformations; the few
 * equations left are solved through their singular values, which also decide whether there is one
 * solution, none or a family. Growing and decaying directions stand side by side: Gauss collocation
 * is symmetric and damps neither, and products of the R_k are never formed, so rates of 1e5 over
 * unit length need a fine mesh in their layers only.
 *
 * <p>Each mesh is solved together with its halving. Their difference is the estimate of the error
 * of the coarser one; the finer one, which is handed out, is given {@code 3 * 2^-s} of it, although
 * its error falls by 2^(s+1) between nodes and 2^(2s) at nodes once layers are resolved. Sources:
 * Ascher, Mattheij &amp; Russell, Numerical Solution of Boundary Value Problems for Ordinary
 * Differential Equations (1988), chapters 3 to 7 and 9; Wright 1992, SIAM J. Sci. Stat. Comput. 13,
 * 742 (from memory).
 */
public final class BoundarySolver {

  private BoundarySolver() {}

  /**
   * Solves.
   *
   * @param system the system, n states
   * @param range bounded, of positive length, inside the system's range; holds all times of the
   *     conditions
   * @param conditions n conditions
   * @param accuracy error asked for, with n scales
   * @param progress watched and asked while working
   * @throws IllegalArgumentException if there are not n conditions or a time lies outside the range
   */
  public static Outcome<BoundaryAnswer> solve(
      LinearSystem system,
      TimeRange range,
      List<BoundaryCondition> conditions,
      Accuracy accuracy,
      Progress progress) {
    if (conditions.size() != system.dimension() || conditions.isEmpty()) {
      throw new IllegalArgumentException(
          conditions.size() + " conditions for " + system.dimension() + " states");
    }
    for (BoundaryCondition condition : conditions) {
      for (BoundaryCondition.Sample sample : condition.samples()) {
        if (!range.contains(sample.time())) {
          throw new IllegalArgumentException("time " + sample.time() + " is outside " + range);
        }
      }
    }
    try {
      requireSolvable(system, range, conditions);
      BoundaryAnswer answer = answer(system, range, conditions, accuracy, progress);
      progress.worked(1);
      return new Outcome.Solved<>(answer);
    } catch (Cancelled cancelled) {
      return new Outcome.Cancelled<>();
    } catch (Hopeless hopeless) {
      return hopeless.outcome();
    }
  }

  /**
   * Decides on the times between the first and the last condition, and carries a solution on from
   * there: growth beyond them decides nothing.
   */
  private static BoundaryAnswer answer(
      LinearSystem system,
      TimeRange range,
      List<BoundaryCondition> conditions,
      Accuracy accuracy,
      Progress progress) {
    TimeRange hull = hull(conditions);
    if (reachesBack(system, range, hull, conditions)) {
      return new MeshRefinement(system, range, conditions, accuracy, new Watch(progress)).run();
    }
    boolean oneTime =
        hull.length() == 0
            && conditions.stream()
                .flatMap(c -> c.samples().stream())
                .allMatch(s -> s.side() == Side.AFTER);
    if (oneTime) {
      return atOneTime(system, range, hull.start(), conditions, accuracy, progress);
    }
    TimeRange decided = hull.length() == 0 ? range : hull;
    BoundaryAnswer found =
        new MeshRefinement(system, decided, conditions, accuracy, new Watch(progress)).run();
    return switch (found) {
      case BoundaryAnswer.Unique unique ->
          new BoundaryAnswer.Unique(
              extended(system, range, unique.solution(), accuracy, progress),
              unique.conditioning());
      case BoundaryAnswer.Family family ->
          new BoundaryAnswer.Family(
              extended(system, range, family.particular(), accuracy, progress),
              family.directions(),
              family.smallest());
      case BoundaryAnswer.None none -> none;
    };
  }

  /**
   * Tells whether what lies before the first condition takes part in the decision: behind a jump
   * that cannot be undone, or where a condition names the value before a jump.
   */
  private static boolean reachesBack(
      LinearSystem system, TimeRange range, TimeRange hull, List<BoundaryCondition> conditions) {
    boolean namesLeft =
        conditions.stream()
            .flatMap(c -> c.samples().stream())
            .anyMatch(s -> s.side() == Side.BEFORE && s.time() == hull.start());
    return system.jumps().stream()
        .anyMatch(j ->
            range.start() < j.time()
                && (j.time() < hull.start() && j.isSingular()
                    || j.time() == hull.start() && (j.isSingular() || namesLeft)));
  }

  private static TimeRange hull(List<BoundaryCondition> conditions) {
    double first = Double.POSITIVE_INFINITY;
    double last = Double.NEGATIVE_INFINITY;
    for (BoundaryCondition condition : conditions) {
      for (BoundaryCondition.Sample sample : condition.samples()) {
        first = Math.min(first, sample.time());
        last = Math.max(last, sample.time());
      }
    }
    return new TimeRange(first, last);
  }

  private static BoundaryAnswer atOneTime(
      LinearSystem system,
      TimeRange range,
      double time,
      List<BoundaryCondition> conditions,
      Accuracy accuracy,
      Progress progress) {
    OneTimeConditions found = OneTimeConditions.of(time, conditions, accuracy.scale());
    int n = system.dimension();
    if (found.rank() < n && found.mismatch() > 1e-10) {
      return new BoundaryAnswer.None(found.directions(), found.mismatch(), found.smallest());
    }
    Solution start =
        solved(
            SolutionSolver.trajectory(
                JumpSelection.without(system),
                time,
                found.value(),
                new TimeRange(time, time),
                accuracy,
                progress));
    Solution solution = extended(system, range, start, accuracy, progress);
    if (found.rank() < n) {
      return new BoundaryAnswer.Family(solution, found.directions(), found.smallest());
    }
    double growth = growth(solution, accuracy.scale()) / found.smallest();
    return new BoundaryAnswer.Unique(
        solution, new BoundaryAnswer.Conditioning(growth, Double.NaN, found.smallest()));
  }

  /** Returns the largest factor by which a value at the conditions grows on the range. */
  private static double growth(Solution solution, double[] scale) {
    return solution instanceof ExtendedSolution extended ? extended.growth(scale) : 1;
  }

  private static Solution extended(
      LinearSystem system, TimeRange range, Solution middle, Accuracy accuracy, Progress progress) {
    List<ExtendedSolution.Wing> wings = new ArrayList<>();
    if (range.start() < middle.range().start()) {
      wings.add(
          wing(
              system,
              new TimeRange(range.start(), middle.range().start()),
              middle,
              middle.range().start(),
              accuracy,
              progress));
    }
    if (middle.range().end() < range.end()) {
      wings.add(
          wing(
              system,
              new TimeRange(middle.range().end(), range.end()),
              middle,
              middle.range().end(),
              accuracy,
              progress));
    }
    double[] jumpTimes =
        system.jumps().stream()
            .mapToDouble(Jump::time)
            .filter(t -> range.start() < t && t <= range.end())
            .distinct()
            .toArray();
    return wings.isEmpty() ? middle : new ExtendedSolution(middle, wings, jumpTimes);
  }

  private static ExtendedSolution.Wing wing(
      LinearSystem system,
      TimeRange span,
      Solution middle,
      double from,
      Accuracy accuracy,
      Progress progress) {
    int n = system.dimension();
    double[] x = new double[n];
    double[] error = new double[n];
    middle.value(from, Side.AFTER, x);
    middle.errorEstimate(from, error);
    if (from == span.end()) {
      List<Jump> jumps = system.jumps().stream().filter(j -> j.time() == from).toList();
      for (Jump jump : jumps.reversed()) {
        x = jump.before(x, 1, true);
        error = errorBefore(jump, error);
      }
    }
    LinearSystem rest = JumpSelection.between(system, span.start(), span.end());
    double[] identity = Rows.flat(Rows.identity(n), n);
    Accuracy rough = accuracy.withRelative(Math.max(1e-6, accuracy.relative()));
    return new ExtendedSolution.Wing(
        solved(SolutionSolver.trajectory(rest, from, x, span, accuracy, progress)),
        solved(SolutionSolver.homogeneous(rest, from, identity, span, rough, progress)),
        error);
  }

  /** Returns what errors after a jump say of the values before it: |J^-1| times them. */
  private static double[] errorBefore(Jump jump, double[] error) {
    int n = error.length;
    double[] inverse = jump.before(Rows.flat(Rows.identity(n), n), n, false);
    double[] before = new double[n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        before[i] += Math.abs(inverse[i * n + j]) * error[j];
      }
    }
    return before;
  }

  private static Solution solved(Outcome<Solution> outcome) {
    return switch (outcome) {
      case Outcome.Solved<Solution> s -> s.value();
      case Outcome.Cancelled<Solution> c -> throw new Cancelled();
      case Outcome.Unsolved<Solution> u -> throw new Hopeless(u.reason(), u.time(), u.detail());
    };
  }

  private static void requireSolvable(
      LinearSystem system, TimeRange range, List<BoundaryCondition> conditions) {
    if (!range.isBounded() || !(range.length() > 0) || Double.isInfinite(range.length())) {
      throw new Hopeless(
          Reason.RANGE,
          range.start(),
          "the range from " + range.start() + " to " + range.end() + " has no finite length");
    }
    if (!system.range().contains(range.start()) || !system.range().contains(range.end())) {
      throw new Hopeless(
          Reason.RANGE,
          range.start(),
          "the system is defined from " + system.range().start() + " to " + system.range().end());
    }
    for (BoundaryCondition condition : conditions) {
      double sum = condition.value();
      for (BoundaryCondition.Sample sample : condition.samples()) {
        sum += sample.coefficient() * 0;
      }
      if (!Double.isFinite(sum)) {
        throw new Hopeless(
            Reason.COEFFICIENT_NOT_FINITE,
            condition.samples().getFirst().time(),
            "a boundary condition is not a finite number");
      }
    }
  }
}
