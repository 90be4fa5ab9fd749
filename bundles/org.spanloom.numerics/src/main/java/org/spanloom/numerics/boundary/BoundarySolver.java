/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.boundary;

import java.util.List;
import org.spanloom.numerics.Accuracy;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Outcome;
import org.spanloom.numerics.Outcome.Reason;
import org.spanloom.numerics.Progress;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.internal.work.Cancelled;
import org.spanloom.numerics.internal.work.Hopeless;
import org.spanloom.numerics.internal.work.Watch;

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
      BoundaryAnswer answer =
          new MeshRefinement(system, range, conditions, accuracy, new Watch(progress)).run();
      progress.worked(1);
      return new Outcome.Solved<>(answer);
    } catch (Cancelled cancelled) {
      return new Outcome.Cancelled<>();
    } catch (Hopeless hopeless) {
      return hopeless.outcome();
    }
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
