/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.basis;

import java.util.Arrays;
import org.spanloom.numerics.Jump;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Outcome;
import org.spanloom.numerics.Progress;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.internal.work.Cancelled;
import org.spanloom.numerics.internal.work.Watch;

/**
 * How far a candidate misses the equations: the largest {@code |x_i' - sum a_ij x_j|} of a column,
 * relative to the size of its terms {@code |x_i'| + sum |a_ij x_j|} there; or by how much it misses
 * what a jump makes of it.
 *
 * <p>Terms that are small beside the largest of their row over the range count as at least a
 * millionth of it, so that rounding of a value that passes zero is no residual. True closed forms
 * give about 1e-15, wrong ones about 1.
 *
 * @param relative the residual; infinite where a value is not finite
 * @param column of which column, from 0
 * @param component in the equation of which component, from 0
 * @param time when
 */
public record ClosedFormResidual(double relative, int column, int component, double time) {

  private static final int SAMPLES = 257;
  private static final double SMALL = 1e-6;

  /**
   * Measures.
   *
   * @param system the system; its forcing is not used
   * @param candidate the functions
   * @param range where to look, bounded
   * @param progress asked while working
   * @return one residual for each column
   */
  public static Outcome<ClosedFormResidual[]> of(
      LinearSystem system, CandidateBasis candidate, TimeRange range, Progress progress) {
    try {
      return new Outcome.Solved<>(new Meter(system, candidate, new Watch(progress)).over(range));
    } catch (Cancelled cancelled) {
      return new Outcome.Cancelled<>();
    }
  }

  /** Residuals and sizes of all entries at one time after the other. */
  private static final class Meter {
    private final LinearSystem system;
    private final CandidateBasis candidate;
    private final Watch watch;
    private final int n;
    private final int m;
    private final double[] a;
    private final double[] x;
    private final double[] dx;
    private final double[] largest;

    Meter(LinearSystem system, CandidateBasis candidate, Watch watch) {
      this.system = system;
      this.candidate = candidate;
      this.watch = watch;
      this.n = system.dimension();
      this.m = candidate.columns();
      this.a = new double[n * n];
      this.x = new double[n * m];
      this.dx = new double[n * m];
      this.largest = new double[n * m];
    }

    ClosedFormResidual[] over(TimeRange range) {
      double[] times = new double[SAMPLES];
      for (int k = 0; k < SAMPLES; k++) {
        times[k] =
            k == SAMPLES - 1 ? range.end() : range.start() + range.length() * k / (SAMPLES - 1);
      }
      for (double t : times) {
        evaluate(t);
        for (int e = 0; e < n * m; e++) {
          largest[e] = Math.max(largest[e], size(e));
        }
      }
      ClosedFormResidual[] worst = new ClosedFormResidual[m];
      for (int j = 0; j < m; j++) {
        worst[j] = new ClosedFormResidual(0, j, 0, range.start());
      }
      for (double t : times) {
        evaluate(t);
        for (int e = 0; e < n * m; e++) {
          double relative = relative(e);
          int j = e % m;
          if (relative > worst[j].relative()) {
            worst[j] = new ClosedFormResidual(relative, j, e / m, t);
          }
        }
      }
      for (Jump jump : system.jumps()) {
        if (jump.time() > range.start() && jump.time() <= range.end()) {
          across(jump, worst);
        }
      }
      return worst;
    }

    /** Compares what a candidate is behind a jump with what the jump makes of it. */
    private void across(Jump jump, ClosedFormResidual[] worst) {
      double[] before = new double[n * m];
      double[] sizes = new double[n * m];
      candidate.value(jump.time(), Side.BEFORE, before);
      candidate.value(jump.time(), Side.AFTER, x);
      watch.spend(4.0 * n * m);
      double[] after = jump.after(before, m, false);
      Arrays.setAll(sizes, e -> Math.abs(before[e]));
      for (Jump.Row row : jump.rows()) {
        int[] columns = row.columns();
        double[] factors = row.factors();
        for (int j = 0; j < m; j++) {
          double size = 0;
          for (int k = 0; k < columns.length; k++) {
            size += Math.abs(factors[k] * before[columns[k] * m + j]);
          }
          sizes[row.row() * m + j] = size;
        }
      }
      double[] columnSizes = new double[m];
      for (int e = 0; e < n * m; e++) {
        columnSizes[e % m] = Math.max(columnSizes[e % m], Math.abs(before[e]));
      }
      for (int e = 0; e < n * m; e++) {
        double difference = Math.abs(x[e] - after[e]);
        double size = Math.abs(x[e]) + sizes[e] + SMALL * columnSizes[e % m];
        double relative =
            Double.isFinite(difference) && Double.isFinite(size)
                ? (size == 0 ? 0 : difference / size)
                : Double.POSITIVE_INFINITY;
        if (relative > worst[e % m].relative()) {
          worst[e % m] = new ClosedFormResidual(relative, e % m, e / m, jump.time());
        }
      }
    }

    private void evaluate(double t) {
      watch.spend(4.0 * n * n * m);
      system.matrix(t, Side.AFTER, a);
      candidate.value(t, x);
      candidate.derivative(t, dx);
    }

    private double size(int entry) {
      int i = entry / m;
      int j = entry % m;
      double sum = Math.abs(dx[entry]);
      for (int k = 0; k < n; k++) {
        sum += Math.abs(a[i * n + k] * x[k * m + j]);
      }
      return sum;
    }

    private double relative(int entry) {
      int i = entry / m;
      int j = entry % m;
      double difference = dx[entry];
      for (int k = 0; k < n; k++) {
        difference -= a[i * n + k] * x[k * m + j];
      }
      double size = size(entry) + SMALL * largest[entry];
      if (!Double.isFinite(difference) || !Double.isFinite(size)) {
        return Double.POSITIVE_INFINITY;
      }
      return size == 0 ? 0 : Math.abs(difference) / size;
    }
  }
}
