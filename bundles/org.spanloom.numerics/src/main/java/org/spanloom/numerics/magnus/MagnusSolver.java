/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.magnus;

import java.util.Optional;
import org.spanloom.numerics.Outcome.Reason;
import org.spanloom.numerics.internal.step.ErrorWeights;
import org.spanloom.numerics.internal.step.Stops;
import org.spanloom.numerics.internal.work.Hopeless;
import org.spanloom.numerics.internal.work.Watch;
import org.spanloom.numerics.magnus.MagnusIntegrator.Stopped;
import org.spanloom.numerics.magnus.MagnusIntegrator.Until;
import org.spanloom.numerics.solution.InitialValues;
import org.spanloom.numerics.solution.Solution;

/**
 * Solves by a Magnus integrator to the global error asked for. After a few steps the error at the
 * end is foretold, and the run starts again with local errors that lead to the one asked for; where
 * the estimate exceeds it later on, once more.
 */
public final class MagnusSolver {

  private static final int MOST_RUNS = 6;

  /** Below this a smaller error per step is not seen any more. */
  private static final double SMALLEST_LOCAL = 0x1p-56;

  private final InitialValues values;
  private final MagnusOrder order;
  private final ErrorWeights weights;
  private final BalancedSystem balanced;
  private final MagnusIntegrator integrator;

  private MagnusSolver(InitialValues values, MagnusOrder order, Watch watch) {
    this.values = values;
    this.order = order;
    weights = new ErrorWeights(values.accuracy(), !values.forced());
    balanced = BalancedSystem.of(values);
    integrator = new MagnusIntegrator(values, balanced, order, weights, watch);
  }

  /**
   * Solves.
   *
   * @param values the system and where it starts; a bounded range longer than 0
   * @param order order of the integrator
   * @param watch asked while working
   */
  public static Solution solve(InitialValues values, MagnusOrder order, Watch watch) {
    MagnusSolver solver = new MagnusSolver(values, order, watch);
    MagnusNodes earlier = solver.direction(values.span().start());
    MagnusNodes later = solver.direction(values.span().end());
    return new MagnusSolution(values, solver.balanced, order, solver.weights, earlier, later);
  }

  private MagnusNodes direction(double end) {
    double[] stops =
        values.t0() == end ? new double[0] : Stops.between(values.system(), values.t0(), end);
    double local = Math.max(0.02 * weights.relative(), SMALLEST_LOCAL);
    double affordable = local;
    Until until = Until.FORETOLD;
    double before = Double.POSITIVE_INFINITY;
    for (int run = 1; ; run++) {
      if (run >= MOST_RUNS || local <= SMALLEST_LOCAL) {
        until = Until.END;
      }
      MagnusNodes nodes = new MagnusNodes();
      Optional<Stopped> stopped;
      try {
        stopped = integrator.run(stops, local, until, nodes);
      } catch (Hopeless tooMuch) {
        if (local >= affordable || tooMuch.reason() != Reason.TOO_MUCH_WORK) {
          throw tooMuch;
        }
        // Less accuracy, with its honest estimate, is better than nothing.
        local = affordable;
        until = Until.END;
        continue;
      }
      if (stopped.isEmpty()) {
        return nodes;
      }
      affordable = local;
      double power = (order.order() + 1.0) / order.order();
      double ratio = stopped.get().ratio() / stopped.get().fraction();
      if (until == Until.FORETOLD) {
        local *= Math.clamp(Math.pow(0.35 / ratio, power), 1e-9, 50);
        until = Until.TOO_LOOSE;
      } else {
        if (ratio > 0.5 * before) {
          // A smaller error per step did not help: what is left is rounding.
          until = Until.END;
        }
        before = ratio;
        local *= Math.clamp(Math.pow(0.3 / ratio, power), 1e-6, 0.3);
      }
      local = Math.max(local, SMALLEST_LOCAL);
    }
  }
}
