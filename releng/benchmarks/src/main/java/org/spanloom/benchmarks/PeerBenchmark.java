/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.benchmarks;

import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;

/**
 * Time to a given error at the end of the range, for fundamental matrices and trajectories, beside
 * a general explicit integrator. Ours pays for its error estimates, the other has none.
 */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MILLISECONDS)
@Warmup(iterations = 3, time = 1)
@Measurement(iterations = 4, time = 1)
@Fork(1)
public class PeerBenchmark {

  /** What is solved. */
  @Param({"P1_PHI", "P2_PHI", "P2_X", "P3_X", "P4_PHI", "P4_X", "P6_PHI", "P6_X"})
  public String problem;

  /** Error to be reached. */
  @Param({"1e-5", "1e-8", "1e-10"})
  public String error;

  private PeerProblem chosen;
  private double[] reference;
  private double tolerance;

  /** Gets what is right. */
  @Setup
  public void prepare() {
    chosen = PeerProblem.valueOf(problem);
    reference = chosen.reference();
    tolerance = -1;
  }

  private void calibrate(java.util.function.DoubleFunction<double[]> solve) {
    if (tolerance < 0) {
      tolerance = Calibration.tolerance(solve, reference, Double.parseDouble(error));
    }
    if (tolerance == 0) {
      throw new IllegalStateException("no tolerance leads to an error of " + error);
    }
  }

  /** Ours, by the method that it chooses. */
  @Benchmark
  public double[] spanloom() {
    calibrate(chosen::spanloom);
    return chosen.spanloom(tolerance);
  }

  /** Dormand-Prince 8(5,3) of Hipparchus; left out where it takes more than a minute. */
  @Benchmark
  public double[] dormandPrince() {
    if (!chosen.suitsExplicit()) {
      throw new IllegalStateException("stiff: takes more than a minute");
    }
    calibrate(chosen::dormandPrince);
    return chosen.dormandPrince(tolerance);
  }
}
