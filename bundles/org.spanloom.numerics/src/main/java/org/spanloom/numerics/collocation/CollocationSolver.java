/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.collocation;

import java.util.Optional;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Outcome.Reason;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.collocation.CollocationIntegrator.TooLoose;
import org.spanloom.numerics.internal.algebra.Rows;
import org.spanloom.numerics.internal.step.ErrorWeights;
import org.spanloom.numerics.internal.step.Stops;
import org.spanloom.numerics.internal.work.Hopeless;
import org.spanloom.numerics.internal.work.Watch;
import org.spanloom.numerics.solution.InitialValues;
import org.spanloom.numerics.solution.Solution;

/**
 * Solves by collocation to the global error asked for: where the estimate exceeds it, the run
 * starts again with a smaller error allowed for one step, as long as that helps.
 */
public final class CollocationSolver {

  private static final int MOST_RUNS = 5;

  /** Below this a smaller error per step is not seen any more. */
  private static final double SMALLEST_LOCAL = 0x1p-45;

  private final LinearSystem system;
  private final StageCoefficients.Shape shape;
  private final CollocationTableau tableau;
  private final int m;
  private final boolean forced;
  private final TimeRange span;
  private final ErrorWeights weights;
  private final double[] balance;
  private final Watch watch;

  private CollocationSolver(InitialValues values, CollocationTableau tableau, Watch watch) {
    this.system = values.system();
    this.tableau = tableau;
    this.m = values.columns();
    this.forced = values.forced();
    this.span = values.span();
    this.weights = new ErrorWeights(values.accuracy(), !forced);
    this.watch = watch;
    shape = StageCoefficients.Shape.of(system);
    CollocationTableau places = CollocationTableau.of(CollocationTableau.Family.GAUSS, 5);
    balance =
        Balance.of(
            system,
            shape,
            new StageCoefficients(system, shape, places, span.start(), span.end(), false));
  }

  /**
   * Solves.
   *
   * @param values the system and where it starts; a bounded range longer than 0
   * @param tableau the method
   * @param watch asked while working
   */
  public static Solution solve(InitialValues values, CollocationTableau tableau, Watch watch) {
    double[][] x0 = Rows.of(values.x0(), values.system().dimension(), values.columns());
    return new CollocationSolver(values, tableau, watch).solve(values.t0(), x0);
  }

  private Solution solve(double t0, double[][] x0) {
    CollocationNodes earlier = direction(t0, x0, span.start());
    CollocationNodes later = direction(t0, x0, span.end());
    return new CollocationSolution(system, shape, tableau, m, forced, weights, earlier, later);
  }

  private CollocationNodes direction(double t0, double[][] x0, double end) {
    if (t0 == end) {
      CollocationNodes nodes = new CollocationNodes(m);
      nodes.add(t0, x0, new double[system.dimension()][m]);
      return nodes;
    }
    double[] stops = Stops.between(system, t0, end);
    // Damped errors do not add up from step to step, others do.
    double first = tableau.endsAtPoint() ? 0.25 : 0.1;
    double local = Math.max(first * weights.relative(), SMALLEST_LOCAL);
    TooLoose before = new TooLoose(0, Double.POSITIVE_INFINITY, Double.POSITIVE_INFINITY);
    double affordable = local;
    boolean last = false;
    for (int run = 1; ; run++) {
      last |= run >= MOST_RUNS || local <= SMALLEST_LOCAL;
      CollocationNodes nodes = new CollocationNodes(m);
      CollocationIntegrator integrator =
          new CollocationIntegrator(
              system, shape, tableau, m, forced, weights, local, span, balance, watch);
      Optional<TooLoose> gaveUp;
      try {
        gaveUp = integrator.run(t0, x0, stops, nodes, !last, before.fraction());
      } catch (Hopeless tooMuch) {
        if (local == affordable || tooMuch.reason() != Reason.TOO_MUCH_WORK) {
          throw tooMuch;
        }
        // Less accuracy, with its honest estimate, is better than nothing.
        local = affordable;
        last = true;
        continue;
      }
      if (gaveUp.isEmpty()) {
        return nodes;
      }
      affordable = local;
      TooLoose where = gaveUp.get();
      if (run > 1 && where.ratioBefore() > 0.5 * before.ratio()) {
        // Ten times less per step did not halve the error: what is left is rounding, which smaller
        // steps do not cure.
        last = true;
      } else {
        double factor = Math.clamp(0.5 * where.fraction() / where.ratio(), 1e-5, 0.1);
        local = Math.max(local * factor, SMALLEST_LOCAL);
      }
      before = where;
    }
  }
}
