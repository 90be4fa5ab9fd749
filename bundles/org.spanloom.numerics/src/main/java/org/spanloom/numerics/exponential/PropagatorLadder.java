/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.exponential;

import java.util.ArrayList;
import java.util.List;
import org.spanloom.numerics.internal.algebra.Rows;
import org.spanloom.numerics.internal.work.Watch;

/**
 * The exponentials {@code e^(A h 2^k)} for k = 0, 1, 2 ..., each the square of the one before.
 *
 * <p>{@code e^(At) X} is then the product of the rungs named by the binary digits of t/h, times a
 * short Taylor sum for the rest; it costs products with X only. Where a state forms a block of its
 * own in the order of {@link org.spanloom.numerics.structure.TriangularOrder}, its diagonal entry
 * and the entry beside it are set to their closed form after each squaring (Al-Mohy &amp; Higham
 * 2009, code fragment 2.1), so that errors of the slow states do not double with each rung and
 * decay chains come out right in every component.
 */
final class PropagatorLadder {

  /** Powers of the matrix at the lowest rung shrink faster than powers of this. */
  private static final double LOWEST = 0.5;

  private static final int TAYLOR_TERMS = 200;

  private final double[][] a;
  private final double[][] shiftedRate;
  private final double shiftRate;
  private final boolean[] alone;
  private final double lowest;
  private final List<double[][]> rungs;

  private PropagatorLadder(
      double[][] a, boolean[] alone, double shiftRate, double lowest, List<double[][]> rungs) {
    this.shiftRate = shiftRate;
    this.shiftedRate = shifted(a, shiftRate);
    this.a = a;
    this.alone = alone;
    this.lowest = lowest;
    this.rungs = rungs;
  }

  /**
   * Builds the ladder.
   *
   * @param a rows of A in block upper triangular order, n by n, finite
   * @param alone which positions form a block of their own
   * @param length the longest time that will be asked, positive; the product with ||A|| is finite
   */
  static PropagatorLadder of(double[][] a, boolean[] alone, double length, Watch watch) {
    int n = a.length;
    double[][] whole = Rows.scaled(a, length);
    double shift = usefulShift(whole);
    PadeApproximant.Choice choice = PadeApproximant.choose(shifted(whole, shift), watch);
    double base = Math.scalb(length, -choice.halvings());
    int below = 0;
    while (below < 4 && Math.scalb(choice.size(), -below) > LOWEST) {
      below++;
    }
    PropagatorLadder ladder =
        new PropagatorLadder(a, alone, shift / length, Math.scalb(base, -below), new ArrayList<>());
    for (int k = below; k >= 0; k--) {
      double h = Math.scalb(base, -k);
      double perLength = Math.scalb(1.0, -choice.halvings() - k);
      double[][] halved = Rows.scaled(shifted(whole, shift), perLength);
      double[][] rung = PadeApproximant.evaluate(halved, choice.degree(), watch);
      ladder.add(shift == 0 ? rung : Rows.scaled(rung, Math.exp(shift * perLength)), h);
    }
    for (int k = 1; k <= choice.halvings(); k++) {
      double[][] top = ladder.rungs.getLast();
      double[][] square = Rows.product(top, top, n, watch);
      if (!ladder.add(square, Math.scalb(base, k))) {
        break;
      }
    }
    return ladder;
  }

  /** Returns the ladder for a length of zero. */
  static PropagatorLadder flat(double[][] a, boolean[] alone) {
    return new PropagatorLadder(a, alone, 0, 0, List.of());
  }

  /** Returns trace/n when the matrix gets clearly smaller without it, else 0. */
  private static double usefulShift(double[][] a) {
    double trace = 0;
    for (int i = 0; i < a.length; i++) {
      trace += a[i][i];
    }
    double shift = trace / a.length;
    return Rows.oneNorm(shifted(a, shift)) < 0.7 * Rows.oneNorm(a) ? shift : 0;
  }

  private static double[][] shifted(double[][] a, double shift) {
    if (shift == 0) {
      return a;
    }
    double[][] result = Rows.copy(a);
    for (int i = 0; i < a.length; i++) {
      result[i][i] -= shift;
    }
    return result;
  }

  /** Corrects what is known in closed form; keeps the rung unless it has overflowed. */
  private boolean add(double[][] rung, double h) {
    int n = a.length;
    for (int i = 0; i < n; i++) {
      if (alone[i]) {
        rung[i][i] = Math.exp(a[i][i] * h);
      }
      if (i + 1 < n && alone[i] && alone[i + 1]) {
        rung[i][i + 1] =
            a[i][i + 1] == 0
                ? 0
                : a[i][i + 1] * dividedDifference(a[i][i] * h, a[i + 1][i + 1] * h) * h;
      }
    }
    if (!Rows.areFinite(rung)) {
      return false;
    }
    rungs.add(rung);
    return true;
  }

  /** Returns (e^x - e^y)/(x - y), or its limit e^x. */
  static double dividedDifference(double x, double y) {
    double half = (x - y) / 2;
    if (Math.abs(half) > 1) {
      return (Math.exp(x) - Math.exp(y)) / (x - y);
    }
    double middle = Math.exp(x / 2 + y / 2);
    return half == 0 ? middle : middle * Math.sinh(half) / half;
  }

  /** Returns the number of matrices kept. */
  int rungs() {
    return rungs.size();
  }

  /** Returns the length of the lowest rung. */
  double lowest() {
    return lowest;
  }

  /**
   * Returns {@code e^(A tau) X}; not finite when it, or a rung on the way, overflows.
   *
   * @param x columns in the ladder's order, n by m; left as they are
   * @param tau not negative
   */
  double[][] advance(double[][] x, int m, double tau, Watch watch) {
    double rest = tau;
    double[][] result = Rows.copy(x);
    int top = rungs.size() - 1;
    double[] used = new double[rungs.size()];
    for (int k = top; k >= 0; k--) {
      double h = Math.scalb(lowest, k);
      if (k == top) {
        // More than once only where the next rung would have overflowed.
        used[k] = Math.floor(rest / h);
        if (used[k] > 1e6) {
          return notFinite(x.length, m);
        }
        rest -= used[k] * h;
        if (rest < 0) {
          used[k]--;
          rest += h;
        }
      } else if (rest >= h) {
        used[k] = 1;
        rest -= h;
      }
    }
    if (rest > 0) {
      result = taylor(result, m, rest, watch);
    }
    for (int k = 0; k <= top; k++) {
      for (double count = used[k]; count > 0; count--) {
        result = Rows.product(rungs.get(k), result, m, watch);
      }
    }
    return result;
  }

  private static double[][] notFinite(int n, int m) {
    double[][] result = new double[n][m];
    for (double[] row : result) {
      java.util.Arrays.fill(row, Double.NaN);
    }
    return result;
  }

  /** Sums the series of e^(A tau) X until two terms in a row no longer count in any column. */
  private double[][] taylor(double[][] x, int m, double tau, Watch watch) {
    int n = a.length;
    double[][] sum = Rows.copy(x);
    double[][] term = x;
    boolean lastWasSmall = false;
    for (int k = 1; k <= TAYLOR_TERMS; k++) {
      term = Rows.product(shiftedRate, term, m, watch);
      boolean small = true;
      for (int i = 0; i < n; i++) {
        for (int j = 0; j < m; j++) {
          term[i][j] *= tau / k;
          sum[i][j] += term[i][j];
          small &= !(Math.abs(term[i][j]) > 0x1p-56 * Math.abs(sum[i][j]));
        }
      }
      if (small && lastWasSmall) {
        break;
      }
      lastWasSmall = small;
    }
    return shiftRate == 0 ? sum : Rows.scaled(sum, Math.exp(shiftRate * tau));
  }
}
