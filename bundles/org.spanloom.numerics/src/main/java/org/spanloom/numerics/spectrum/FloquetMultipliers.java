/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.spectrum;

import java.util.ArrayList;
import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.spanloom.numerics.Accuracy;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Outcome;
import org.spanloom.numerics.Outcome.Reason;
import org.spanloom.numerics.Progress;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.internal.work.Cancelled;
import org.spanloom.numerics.internal.work.Hopeless;
import org.spanloom.numerics.internal.work.Watch;
import org.spanloom.numerics.solution.Solution;
import org.spanloom.numerics.solution.SolutionSolver;

/**
 * The multipliers of a system with periodic coefficients: the eigenvalues of the matrix that leads
 * over one period (Floquet 1883).
 *
 * <p>The period is cut into pieces over which solutions grow or decay by a moderate factor, and the
 * multipliers are those of the product of the pieces, which is not formed. Everything is done
 * twice, the second time to a thirtieth of the error and with other pieces; what changed is the
 * error estimate.
 *
 * @param multipliers all n of them, by falling modulus
 * @param period the period
 * @param pieces into how many pieces it was cut
 */
public record FloquetMultipliers(List<Multiplier> multipliers, double period, int pieces) {

  private static final double GROWTH_OF_A_PIECE = 9;
  private static final int MOST_PIECES = 400;
  private static final double SAFETY = 3;
  private static final double TIGHTER = 30;

  /** Copies the list. */
  public FloquetMultipliers {
    multipliers = List.copyOf(multipliers);
  }

  /**
   * A multiplier {@code exp(logModulus + i phase)}.
   *
   * @param logModulus natural logarithm of its modulus; minus infinity for 0
   * @param phase its argument, in (-pi, pi]
   * @param error estimated error of both, absolute, that is relative of the multiplier itself
   */
  public record Multiplier(double logModulus, double phase, double error) {
    /** Returns its modulus; infinity or 0 where that is beyond a floating point number. */
    public double modulus() {
      return Math.exp(logModulus);
    }
  }

  /** Returns the rate of growth of a multiplier, the real part of its exponent, in 1/time. */
  public double rate(Multiplier multiplier) {
    return multiplier.logModulus() / period;
  }

  /** Returns the imaginary part of the exponent of a multiplier, up to whole turns, in 1/time. */
  public double frequency(Multiplier multiplier) {
    return multiplier.phase() / period;
  }

  /**
   * Computes them.
   *
   * @param system a system with A(t + period) = A(t); b does not matter
   * @param start any time from which one period lies in the system's range
   * @param period the period, positive
   * @param accuracy error allowed for the solutions over one piece, with n scales
   * @param progress watched and asked while working
   */
  public static Outcome<FloquetMultipliers> of(
      LinearSystem system, double start, double period, Accuracy accuracy, Progress progress) {
    try {
      Watch watch = new Watch(progress);
      if (!(period > 0) || !Double.isFinite(start + period)) {
        throw new Hopeless(Reason.RANGE, start, "a period of " + period + " is not positive");
      }
      if (system.dimension() == 0) {
        return new Outcome.Solved<>(new FloquetMultipliers(List.of(), period, 1));
      }
      double from = seam(system, start, period);
      int pieces = pieces(system, from, period);
      List<ProductSpectrum.Value> rough =
          values(system, from, period, pieces, accuracy, progress, watch);
      Accuracy tighter = accuracy.withRelative(accuracy.relative() / TIGHTER);
      int more = pieces + Math.max(1, pieces / 2);
      List<ProductSpectrum.Value> fine =
          values(system, from, period, more, tighter, progress, watch);
      return new Outcome.Solved<>(new FloquetMultipliers(compared(rough, fine), period, more));
    } catch (Cancelled cancelled) {
      return new Outcome.Cancelled<>();
    } catch (Hopeless hopeless) {
      return hopeless.outcome();
    }
  }

  /**
   * Returns the time from which to follow one period. A jump that repeats with the period stands at
   * both ends of it or, by a rounding error, at neither; so the seam lies apart from jumps where
   * the range allows.
   */
  private static double seam(LinearSystem system, double start, double period) {
    double moved = start + 0.0137 * period;
    return system.jumps().isEmpty() || moved + period > system.range().end() ? start : moved;
  }

  private static int pieces(LinearSystem system, double start, double period) {
    int n = system.dimension();
    double[] a = new double[n * n];
    double largest = 0;
    for (int k = 0; k < 16; k++) {
      system.matrix(start + period * k / 16, Side.AFTER, a);
      for (int i = 0; i < n; i++) {
        double sum = 0;
        for (int j = 0; j < n; j++) {
          sum += Math.abs(a[i * n + j]);
        }
        largest = Math.max(largest, sum);
      }
    }
    if (!Double.isFinite(largest)) {
      throw new Hopeless(
          Reason.COEFFICIENT_NOT_FINITE, start, "an entry of A is not a finite number");
    }
    double wanted = Math.ceil(largest * period / GROWTH_OF_A_PIECE);
    return (int) Math.max(1, Math.min(MOST_PIECES, wanted));
  }

  private static List<ProductSpectrum.Value> values(
      LinearSystem system,
      double start,
      double period,
      int pieces,
      Accuracy accuracy,
      Progress progress,
      Watch watch) {
    int n = system.dimension();
    double[] identity = new double[n * n];
    for (int i = 0; i < n; i++) {
      identity[i * n + i] = 1;
    }
    List<DMatrixRMaj> factors = new ArrayList<>();
    for (int k = 0; k < pieces; k++) {
      double from = start + period * k / pieces;
      double to = k + 1 == pieces ? start + period : start + period * (k + 1) / pieces;
      Outcome<Solution> outcome =
          SolutionSolver.homogeneous(
              system, from, identity, new TimeRange(from, to), accuracy, progress);
      Solution solution =
          switch (outcome) {
            case Outcome.Solved<Solution> s -> s.value();
            case Outcome.Cancelled<Solution> c -> throw new Cancelled();
            case Outcome.Unsolved<Solution> u ->
                throw new Hopeless(u.reason(), u.time(), u.detail());
          };
      DMatrixRMaj factor = new DMatrixRMaj(n, n);
      // A jump between two pieces belongs to the later one, which starts with it.
      solution.value(to, Side.BEFORE, factor.data);
      factors.add(factor);
      watch.ask();
    }
    return ProductSpectrum.of(factors, watch);
  }

  /** Gives each multiplier the distance to the nearest of the rougher ones as its error. */
  private static List<Multiplier> compared(
      List<ProductSpectrum.Value> rough, List<ProductSpectrum.Value> fine) {
    List<Multiplier> multipliers = new ArrayList<>();
    double rounding = 16 * Math.ulp(1.0) * fine.size();
    for (ProductSpectrum.Value value : fine) {
      double nearest = Double.POSITIVE_INFINITY;
      for (ProductSpectrum.Value other : rough) {
        nearest = Math.min(nearest, distance(value, other));
      }
      double error = SAFETY * nearest + rounding * (1 + Math.abs(value.logModulus()));
      multipliers.add(new Multiplier(value.logModulus(), value.phase(), error));
    }
    return multipliers;
  }

  private static double distance(ProductSpectrum.Value a, ProductSpectrum.Value b) {
    if (Double.isInfinite(a.logModulus())) {
      return a.logModulus() == b.logModulus() ? 0 : Double.POSITIVE_INFINITY;
    }
    double turn = Math.abs(a.phase() - b.phase());
    double phase = Math.min(turn, 2 * Math.PI - turn);
    return Math.hypot(a.logModulus() - b.logModulus(), phase);
  }
}
