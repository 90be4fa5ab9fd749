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
import org.spanloom.numerics.internal.algebra.Rows;
import org.spanloom.numerics.internal.step.ErrorWeights;
import org.spanloom.numerics.internal.step.RoundingSigns;
import org.spanloom.numerics.internal.work.Hopeless;
import org.spanloom.numerics.internal.work.Watch;

/**
 * Steps through a range in one direction.
 *
 * <p>Local errors and rounding errors are passed on by the same factored equations as the solution,
 * so that what stands beside each value is an estimate of its <i>global</i> error:
 *
 * <pre>
 * E(t + H) = R(t + H, t) E(t) +- local error +- rounding.
 * </pre>
 */
final class CollocationIntegrator {

  private static final int MOST_STEPS = 1_000_000;

  private final LinearSystem system;
  private final StageCoefficients.Shape shape;
  private final CollocationTableau tableau;
  private final int n;
  private final int m;
  private final boolean forced;
  private final ErrorWeights weights;
  private final double localRelative;
  private final double range;
  private final Watch watch;
  private final double[] balance;
  private final double[][] weight;
  private final Seams seams;
  private final RoundingSigns signs = new RoundingSigns();
  private StageSystem lastWhole;
  private StageSystem lastHalf;

  /**
   * Prepares a run.
   *
   * @param system the system
   * @param shape its pattern
   * @param tableau the method
   * @param m number of columns
   * @param forced whether b counts
   * @param weights how errors are measured
   * @param localRelative error allowed for one step
   * @param span the range as a whole
   * @param balance scaling of the states in which A has a small norm
   * @param watch asked while working
   */
  CollocationIntegrator(
      LinearSystem system,
      StageCoefficients.Shape shape,
      CollocationTableau tableau,
      int m,
      boolean forced,
      ErrorWeights weights,
      double localRelative,
      TimeRange span,
      double[] balance,
      Watch watch) {
    this.system = system;
    this.shape = shape;
    this.tableau = tableau;
    this.n = system.dimension();
    this.m = m;
    this.forced = forced;
    this.weights = weights;
    this.localRelative = localRelative;
    this.range = span.length();
    this.balance = balance.clone();
    this.watch = watch;
    this.weight = new double[n][m];
    this.seams = new Seams(system, shape, tableau, forced);
  }

  /**
   * Where a run was given up because its error exceeded what was asked.
   *
   * @param fraction of the range that was done
   * @param ratio error estimate over error asked
   * @param ratioBefore that ratio where the run before had given up; infinite when this one came
   *     less far
   */
  record TooLoose(double fraction, double ratio, double ratioBefore) {}

  /**
   * Runs from one end to the other.
   *
   * @param t0 start
   * @param x0 values there, n by m
   * @param stops times to stop at, in the order in which they are reached; the last is the end
   * @param nodes receives what is found
   * @param giveUp whether to stop when the error exceeds what was asked
   * @param before fraction of the range where the run before had given up, or 0
   * @return why it gave up, or empty when the end was reached
   */
  Optional<TooLoose> run(
      double t0,
      double[][] x0,
      double[] stops,
      CollocationNodes nodes,
      boolean giveUp,
      double before) {
    double t = t0;
    double[][] x = Rows.copy(x0);
    double[][] error = new double[n][m];
    nodes.add(t, x, error);
    StepControl control = new StepControl(tableau.stages());
    double step = 0;
    int count = 0;
    double ratioBefore = Double.POSITIVE_INFINITY;
    for (double stop : stops) {
      double direction = Math.signum(stop - t);
      step = Math.min(step == 0 ? firstStep(t, stop) : step, range / 4);
      while (t != stop) {
        watch.ask();
        if (++count > MOST_STEPS) {
          throw new Hopeless(
              Reason.TOO_MUCH_WORK, t, "more than " + MOST_STEPS + " steps were needed");
        }
        double left = Math.abs(stop - t);
        double wanted = step;
        double h = left <= 1.1 * step ? left : left < 2 * step ? left / 2 : step;
        double to = h == left ? stop : t + direction * h;
        DoubledStep done = step(t, to, direction * h, x);
        double local = done.error(localRelative);
        if (local <= 1) {
          error = done.passOn(error, signs);
          t = to;
          x = done.end();
          nodes.add(t, x, error);
          double ratio = worstRatio(x, error);
          double fraction = Math.abs(t - t0) / range;
          if (ratioBefore == Double.POSITIVE_INFINITY && fraction >= before) {
            ratioBefore = ratio;
          }
          if (giveUp && ratio > 1) {
            return Optional.of(new TooLoose(fraction, ratio, ratioBefore));
          }
          step = Math.min(nextStep(control, h, wanted, local), range / 4);
        } else {
          step = control.afterFailure(h, local);
          if (step < 32 * Math.ulp(Math.max(Math.abs(t), Math.abs(stop)))) {
            throw stuck(t, x, local);
          }
        }
      }
    }
    return Optional.empty();
  }

  /**
   * A step cut short by a stop does not shorten the next one; a known factorisation is worth a
   * shorter step.
   */
  private double nextStep(StepControl control, double h, double wanted, double error) {
    double next = control.afterSuccess(h, error);
    if (h < wanted) {
      return Math.max(next, wanted);
    }
    return system.hasConstantMatrix() && next > h && next < 2 * h ? h : next;
  }

  private Hopeless stuck(double t, double[][] x, double error) {
    double size = Rows.oneNorm(x);
    // Constant coefficients have no pole: what a constant matrix makes too fast to follow is
    // growth.
    return size > 1e280 || Double.isInfinite(error) || system.hasConstantMatrix()
        ? new Hopeless(
            Reason.OVERFLOW, t, "the solution grows beyond the largest floating point number")
        : new Hopeless(
            Reason.STEP_TOO_SMALL, t, "the step size fell below what the time axis resolves");
  }

  private DoubledStep step(double t, double to, double h, double[][] x) {
    double middle = t + (to - t) / 2;
    StageSystem whole = stages(t, to, h, lastWhole);
    StageSystem first = stages(t, middle, h / 2, lastHalf);
    StageSystem second = stages(middle, to, h / 2, first);
    lastWhole = whole;
    lastHalf = second;
    double speed = Math.abs(h) / 2 * whole.coefficients().norm(balance);
    return new DoubledStep(
        tableau, whole, first, second, x, m, speed, weights, localRelative, seams, t, to);
  }

  private StageSystem stages(double from, double to, double h, StageSystem known) {
    StageCoefficients coefficients =
        new StageCoefficients(system, shape, tableau, from, to, forced);
    if (system.hasConstantMatrix() && known != null && known.length() == h) {
      return known.with(coefficients);
    }
    return StageSystem.of(tableau, coefficients, h, 2 * m, watch);
  }

  private double worstRatio(double[][] x, double[][] error) {
    weights.write(x, x, weight, m);
    double worst = 0;
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < m; j++) {
        worst =
            Math.max(
                worst,
                CollocationSolution.SAFETY
                    * Math.abs(error[i][j])
                    / (weights.relative() * weight[i][j]));
      }
    }
    return worst;
  }

  /**
   * The first step resolves the fastest direction; it grows quickly where that direction does not
   * matter.
   */
  private double firstStep(double t, double stop) {
    double left = Math.abs(stop - t);
    StageCoefficients here =
        new StageCoefficients(
            system,
            shape,
            CollocationTableau.of(CollocationTableau.Family.GAUSS, 2),
            t,
            t + (stop - t) * 1e-3,
            false);
    double speed = here.norm(balance);
    double step = speed * left > 1 ? 1 / speed : left;
    return Math.max(step, 64 * Math.ulp(Math.max(Math.abs(t), Math.abs(stop))));
  }
}
