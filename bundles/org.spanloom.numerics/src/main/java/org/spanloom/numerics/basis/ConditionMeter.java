/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.basis;

import java.util.List;
import org.spanloom.numerics.Jump;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.internal.algebra.LuFactors;
import org.spanloom.numerics.internal.algebra.Rows;
import org.spanloom.numerics.internal.work.Watch;
import org.spanloom.numerics.solution.Solution;

/** Takes condition samples of one solution. For one thread. */
final class ConditionMeter {

  private static final double ROUNDING = 0x1p-53;

  private final Solution solution;
  private final TraceIntegral trace;
  private final List<Jump> jumps;
  private final Watch watch;
  private final int n;
  private final int m;
  private final double startLog;

  ConditionMeter(LinearSystem system, Solution solution, Watch watch) {
    this.solution = solution;
    this.watch = watch;
    this.n = solution.dimension();
    this.m = solution.columns();
    this.trace = new TraceIntegral(system, solution.nodes(), solution.startTime(), watch);
    this.jumps = system.jumps();
    Scaled start = new Scaled(solution.startTime(), Side.AFTER);
    this.startLog = start.determinant().log();
  }

  /** A determinant by the logarithm of its size and its sign. */
  private record Determinant(double log, int sign) {}

  /** The columns at a time, as they are and scaled to length 1. */
  private final class Scaled {
    final double[] x = new double[n * m];
    final double[] unit = new double[n * m];
    double logNorms;
    double error;
    boolean vanishes;

    Scaled(double t, Side side) {
      double[] e = new double[n * m];
      solution.value(t, side, x);
      solution.errorEstimate(t, side, e);
      for (int j = 0; j < m; j++) {
        double norm = norm(x, j);
        double size = norm(e, j);
        vanishes |= !(norm > 0);
        logNorms += Math.log(norm);
        error = Math.max(error, norm > 0 ? size / norm : Double.POSITIVE_INFINITY);
        for (int i = 0; i < n; i++) {
          unit[i * m + j] = norm > 0 ? x[i * m + j] / norm : 0;
        }
      }
    }

    private double norm(double[] values, int j) {
      double[] column = new double[n];
      for (int i = 0; i < n; i++) {
        column[i] = values[i * m + j];
      }
      return JacobiSingularValues.norm(column);
    }

    Determinant determinant() {
      if (n != m || vanishes) {
        return new Determinant(Double.NEGATIVE_INFINITY, 0);
      }
      LuFactors lu = LuFactors.of(Rows.of(unit, n, n), watch);
      return lu.isSingular()
          ? new Determinant(Double.NEGATIVE_INFINITY, 0)
          : new Determinant(lu.logDeterminant() + logNorms, lu.determinantSign());
    }
  }

  /**
   * Takes a sample.
   *
   * <p>The scaled columns are known to the relative error e of the worst one, which may move a
   * singular value by sqrt(m) e. Where the smallest is no larger, nobody can tell it from 0, and
   * the condition is reported as infinite; then the slow methods that resolve it are not worth
   * their time.
   */
  ConditionSample at(double t) {
    return at(t, Side.AFTER);
  }

  /** Takes a sample on one side of a time. */
  ConditionSample at(double t, Side side) {
    Scaled columns = new Scaled(t, side);
    double noise = Math.sqrt(m) * Math.max(columns.error, ROUNDING);
    double[] scaled = SingularValues.general(columns.unit, n, m, watch);
    if (scaled[m - 1] > noise / 4) {
      scaled = SingularValues.of(columns.unit, n, m, watch);
    }
    boolean resolved = !columns.vanishes && scaled[m - 1] > noise;
    double[] raw =
        resolved
            ? SingularValues.of(columns.x, n, m, watch)
            : SingularValues.general(columns.x, n, m, watch);
    Determinant determinant = columns.determinant();
    return new ConditionSample(
        t,
        raw,
        resolved ? raw[0] / raw[m - 1] : Double.POSITIVE_INFINITY,
        resolved ? scaled[0] / scaled[m - 1] : Double.POSITIVE_INFINITY,
        determinant.log(),
        determinant.sign(),
        startLog + trace.at(t) + jumped(t, side),
        columns.error);
  }

  /** Returns what the jumps between the start and a time add to ln |det X|. */
  private double jumped(double t, Side side) {
    double start = solution.startTime();
    double last = side == Side.AFTER ? t : Math.nextDown(t);
    double sum = 0;
    for (Jump jump : Jump.within(jumps, Math.nextUp(start), last)) {
      sum += jump.logDeterminant();
    }
    for (Jump jump : Jump.within(jumps, Math.nextUp(last), start)) {
      sum -= jump.logDeterminant();
    }
    return sum;
  }
}
