/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.benchmarks;

import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStreamReader;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.Optional;
import org.hipparchus.exception.MathRuntimeException;
import org.hipparchus.ode.ODEState;
import org.hipparchus.ode.OrdinaryDifferentialEquation;
import org.hipparchus.ode.nonstiff.DormandPrince853Integrator;
import org.spanloom.numerics.Accuracy;
import org.spanloom.numerics.Outcome;
import org.spanloom.numerics.Progress;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.solution.MethodChoice;
import org.spanloom.numerics.solution.Solution;
import org.spanloom.numerics.solution.SolutionSolver;

/**
 * What is computed in a numerical benchmark, and what is right.
 *
 * <p>The reference values were computed independently, in more than double precision, by
 * collocation of orders 13 and 16 on two meshes each; the heads of the files give their accuracy.
 * The error of a result is its largest difference from them over their largest value.
 */
enum PeerProblem {
  /** The fundamental matrix of P1. */
  P1_PHI(PeerSystem.smooth(), true, true, "p1.txt"),
  /** The fundamental matrix of P2. */
  P2_PHI(PeerSystem.network(), true, false, "p2.txt"),
  /** The trajectory of P2. */
  P2_X(PeerSystem.network(), false, false, "p2.txt"),
  /** The trajectory of P3. */
  P3_X(PeerSystem.parabolic(400), false, false, "p3.txt"),
  /** The fundamental matrix of P4 over one period. */
  P4_PHI(PeerSystem.oscillators(1), true, true, "p4.txt"),
  /** The trajectory of P4 over 200 periods. */
  P4_X(PeerSystem.oscillators(200), false, true, "p4.txt"),
  /** The fundamental matrix of P6. */
  P6_PHI(PeerSystem.fast(), true, true, ""),
  /** The trajectory of P6. */
  P6_X(PeerSystem.fast(), false, true, "p6.txt");

  private final PeerSystem system;
  private final boolean basis;
  private final boolean suitsExplicit;
  private final String file;

  PeerProblem(PeerSystem system, boolean basis, boolean suitsExplicit, String file) {
    this.system = system;
    this.basis = basis;
    this.suitsExplicit = suitsExplicit;
    this.file = file;
  }

  /** Tells whether an explicit method ends within a minute. */
  boolean suitsExplicit() {
    return suitsExplicit;
  }

  /** Returns the name by which the driver in C knows it, for example "P1phi". */
  String driverName() {
    return system.name() + (basis ? "phi" : "x");
  }

  private int columns() {
    return basis ? system.dimension() : 1;
  }

  private double[] start() {
    int n = system.dimension();
    if (!basis) {
      return system.start();
    }
    double[] identity = new double[n * n];
    for (int i = 0; i < n; i++) {
      identity[i * n + i] = 1;
    }
    return identity;
  }

  /** Solves to a relative error and returns the values at the end. */
  double[] spanloom(double relative) {
    return spanloom(relative, Optional.empty());
  }

  private double[] spanloom(double relative, Optional<MethodChoice> method) {
    int n = system.dimension();
    double[] scale = new double[n];
    Arrays.fill(scale, 1);
    Accuracy accuracy = new Accuracy(relative, scale);
    Outcome<Solution> outcome =
        basis
            ? SolutionSolver.homogeneous(
                system, 0, start(), system.range(), accuracy, method, Progress.NONE)
            : SolutionSolver.trajectory(
                system, 0, start(), system.range(), accuracy, method, Progress.NONE);
    if (!(outcome instanceof Outcome.Solved<Solution> solved)) {
      throw new IllegalStateException(outcome.toString());
    }
    double[] x = new double[n * columns()];
    solved.value().value(system.range().end(), Side.BEFORE, x);
    return x;
  }

  /** Solves by Hipparchus with a tolerance; the columns are stacked into one system. */
  double[] dormandPrince(double tolerance) {
    return new DormandPrince853Integrator(1e-14, 100, tolerance, tolerance)
        .integrate(
            new Stacked(system, columns(), !basis), new ODEState(0, start()), system.range().end())
        .getPrimaryState();
  }

  /** Columns stacked row by row; A is evaluated once for all of them. */
  private static final class Stacked implements OrdinaryDifferentialEquation {
    private final PeerSystem system;
    private final int m;
    private final boolean forced;
    private final int[] rowStart;
    private final int[] columns;
    private final double[] a;
    private final double[] b;

    Stacked(PeerSystem system, int m, boolean forced) {
      this.system = system;
      this.m = m;
      this.forced = forced;
      rowStart = system.pattern().rowStart();
      columns = system.pattern().columns();
      a = new double[system.dimension() * system.dimension()];
      b = new double[system.dimension()];
    }

    @Override
    public int getDimension() {
      return system.dimension() * m;
    }

    @Override
    public double[] computeDerivatives(double t, double[] y) throws MathRuntimeException {
      int n = system.dimension();
      double[] result = new double[n * m];
      system.a().write(t, a);
      if (forced) {
        system.b().write(t, b);
        System.arraycopy(b, 0, result, 0, n);
      }
      for (int i = 0; i < n; i++) {
        for (int p = rowStart[i]; p < rowStart[i + 1]; p++) {
          double factor = a[i * n + columns[p]];
          int source = columns[p] * m;
          for (int j = 0; j < m; j++) {
            result[i * m + j] += factor * y[source + j];
          }
        }
      }
      return result;
    }
  }

  /** Returns the values that are right. */
  double[] reference() {
    int n = system.dimension();
    return switch (this) {
      case P1_PHI, P3_X, P6_X -> read();
      case P2_PHI -> {
        double[] all = read();
        double[] phi = new double[n * n];
        Arrays.setAll(phi, e -> all[e / n * (n + 1) + e % n]);
        yield phi;
      }
      case P2_X -> {
        double[] all = read();
        double[] x = new double[n];
        Arrays.setAll(x, i -> all[i * (n + 1) + n]);
        yield x;
      }
      case P4_PHI -> Arrays.copyOf(read(), n * n);
      case P4_X -> {
        double[] all = read();
        yield Arrays.copyOfRange(all, n * n, n * n + n);
      }
      // Collocation, of which P6_X shows that it is right to 1e-12.
      case P6_PHI -> spanloom(1e-13, MethodChoice.named("gauss14"));
    };
  }

  private double[] read() {
    try (BufferedReader reader =
        new BufferedReader(
            new InputStreamReader(
                PeerProblem.class.getResourceAsStream("/org/spanloom/numerics/benchmark/" + file),
                StandardCharsets.US_ASCII))) {
      return reader
          .lines()
          .filter(line -> !line.startsWith("#"))
          .mapToDouble(Double::parseDouble)
          .toArray();
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  /** Returns the error of values. */
  static double error(double[] x, double[] reference) {
    double largest = 0;
    double off = 0;
    for (int e = 0; e < reference.length; e++) {
      largest = Math.max(largest, Math.abs(reference[e]));
      off = Math.max(off, Math.abs(x[e] - reference[e]));
    }
    return off / largest;
  }
}
