/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.magnus;

import java.util.Optional;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Outcome.Reason;
import org.spanloom.numerics.internal.step.ErrorWeights;
import org.spanloom.numerics.internal.step.RoundingSigns;
import org.spanloom.numerics.internal.work.Hopeless;
import org.spanloom.numerics.internal.work.Watch;
import org.spanloom.numerics.solution.InitialValues;

/**
 * Steps through a range in one direction. Local errors and rounding errors are passed on by the
 * same propagators as the solution, so that what stands beside each value is an estimate of its
 * <i>global</i> error: phase errors add up over the periods, and the estimate with them.
 */
final class MagnusIntegrator {

  private static final int MOST_STEPS = 1_000_000;

  /** Values and errors that are kept, half a gigabyte of them. */
  private static final double MOST_NUMBERS = 6e7;

  /** Steps after which the error at the end of the range is foretold. */
  private static final int STEPS_TO_FORETELL = 160;

  private final InitialValues values;
  private final BalancedSystem balanced;
  private final MagnusOrder order;
  private final ErrorWeights weights;
  private final double range;
  private final Watch watch;
  private final DoubledMagnusStep doubled;
  private final double[] plain;
  private final double[] weight;

  MagnusIntegrator(
      InitialValues values,
      BalancedSystem balanced,
      MagnusOrder order,
      ErrorWeights weights,
      Watch watch) {
    this.values = values;
    this.balanced = balanced;
    this.order = order;
    this.weights = weights;
    this.watch = watch;
    range = values.span().length();
    int n = values.system().dimension();
    int m = values.columns();
    doubled = new DoubledMagnusStep(balanced, order, weights, n, m);
    plain = new double[n * m];
    weight = new double[n * m];
  }

  /** What a run is allowed to do. */
  enum Until {
    /** Stop where the error at the end can be foretold and is not as asked. */
    FORETOLD,
    /** Stop where the error exceeds what was asked. */
    TOO_LOOSE,
    /** Go to the end. */
    END
  }

  /**
   * Why and where a run was given up.
   *
   * @param fraction of the range that was done
   * @param ratio error estimate over error asked: foretold for the end, or reached
   */
  record Stopped(double fraction, double ratio) {}

  /**
   * Runs from t0 to the last stop.
   *
   * @param stops times to stop at, in the order in which they are reached
   * @param localRelative error allowed for one step
   * @param nodes receives what is found
   * @return why it gave up, or empty when the end was reached
   */
  Optional<Stopped> run(double[] stops, double localRelative, Until until, MagnusNodes nodes) {
    LinearSystem system = values.system();
    int n = system.dimension();
    int m = values.columns();
    double t0 = values.t0();
    double t = t0;
    double[] x = balanced.scaled(values.x0(), m);
    double[] error = new double[x.length];
    nodes.add(t, x, error);
    RoundingSigns signs = new RoundingSigns();
    Forecast forecast = new Forecast();
    double step = 0;
    boolean failed = false;
    int count = 0;
    for (double stop : stops) {
      double direction = Math.signum(stop - t);
      step = Math.min(step == 0 ? firstStep(t, stop) : step, range / 8);
      while (t != stop) {
        watch.ask();
        requireWork(++count, t, n * m);
        double left = Math.abs(stop - t);
        double wanted = step;
        double h = left <= 1.1 * step ? left : left < 2 * step ? left / 2 : step;
        double to = h == left ? stop : t + direction * h;
        double off = doubled.take(t, to, x, localRelative, watch);
        if (off <= 1) {
          doubled.passOn(error, signs);
          System.arraycopy(doubled.end(), 0, x, 0, x.length);
          t = to;
          nodes.add(t, x, error);
          double fraction = Math.abs(t - t0) / range;
          if (until != Until.END) {
            double ratio = worstRatio(x, error, n, m);
            if (ratio > 1) {
              return Optional.of(new Stopped(fraction, ratio));
            }
            if (until == Until.FORETOLD) {
              forecast.add(fraction, ratio);
              if (forecast.isReady()) {
                double atEnd = forecast.at(Math.abs(stops[stops.length - 1] - t0) / range);
                if (atEnd > 0.8 || atEnd < 0.1) {
                  return Optional.of(new Stopped(1, atEnd));
                }
                until = Until.TOO_LOOSE;
              }
            }
          }
          double factor = Math.pow(0.4 / Math.max(off, 1e-12), 1.0 / (order.order() + 1));
          double next = h * Math.clamp(factor, 0.3, failed ? 1 : 3);
          step = Math.min(h < wanted ? Math.max(next, wanted) : next, range / 8);
          failed = false;
        } else {
          failed = true;
          step =
              off < 1e30
                  ? h * Math.clamp(Math.pow(0.3 / off, 1.0 / (order.order() + 1)), 0.1, 0.8)
                  : h * 0.1;
          if (step < 32 * Math.ulp(Math.max(Math.abs(t), Math.abs(stop)))) {
            throw stuck(t, x, off);
          }
        }
      }
    }
    return Optional.empty();
  }

  private static void requireWork(int count, double t, int numbers) {
    if (count > MOST_STEPS || 2.0 * count * numbers > MOST_NUMBERS) {
      throw new Hopeless(
          Reason.TOO_MUCH_WORK, t, "more than " + (count - 1) + " steps were needed");
    }
  }

  private Hopeless stuck(double t, double[] x, double off) {
    double size = 0;
    for (double value : x) {
      size = Math.max(size, Math.abs(value));
    }
    return size > 1e280 || Double.isInfinite(off)
        ? new Hopeless(
            Reason.OVERFLOW, t, "the solution grows beyond the largest floating point number")
        : new Hopeless(
            Reason.STEP_TOO_SMALL, t, "the step size fell below what the time axis resolves");
  }

  /** Turns by about one radian. */
  private double firstStep(double t, double stop) {
    double left = Math.abs(stop - t);
    StepPropagator probe = new StepPropagator(balanced, MagnusOrder.FOUR);
    double reach = left * 1e-6;
    probe.over(t, t + (stop - t) * 1e-6, watch);
    double speed = probe.norm() / reach;
    double step = speed * left > 1 ? 1 / speed : left;
    return Math.max(step, 64 * Math.ulp(Math.max(Math.abs(t), Math.abs(stop))));
  }

  private double worstRatio(double[] x, double[] error, int n, int m) {
    balanced.unscaled(x, m, plain);
    weights.write(plain, plain, weight, m);
    double worst = 0;
    for (int i = 0; i < n; i++) {
      double scale = balanced.scale(i) * MagnusSolution.SAFETY / weights.relative();
      for (int j = 0; j < m; j++) {
        int e = i * m + j;
        worst = Math.max(worst, scale * Math.abs(error[e]) / weight[e]);
      }
    }
    return worst;
  }

  /**
   * Foretells the error at the end: most of it comes and goes within a period, what stays grows in
   * proportion to time.
   */
  private static final class Forecast {
    private int steps;
    private double early;
    private double earlyFraction;
    private double late;
    private double lateFraction;

    void add(double fraction, double ratio) {
      steps++;
      if (steps <= STEPS_TO_FORETELL / 2) {
        early = Math.max(early, ratio);
        earlyFraction = fraction;
      } else {
        late = Math.max(late, ratio);
        lateFraction = fraction;
      }
    }

    boolean isReady() {
      return steps >= STEPS_TO_FORETELL;
    }

    double at(double fraction) {
      double slope = (late - early) / (lateFraction - earlyFraction);
      return late + Math.max(0, slope) * (fraction - lateFraction);
    }
  }
}
