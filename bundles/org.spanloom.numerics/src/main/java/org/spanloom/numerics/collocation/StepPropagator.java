/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.collocation;

import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.internal.algebra.Rows;
import org.spanloom.numerics.internal.work.Watch;

/**
 * What one collocation step does to any value at its start: {@code x(to) = R x(from) + r}, with the
 * collocation polynomial between. For boundary-value problems, where the value at the start is not
 * known yet (Ascher, Mattheij &amp; Russell, Numerical Solution of Boundary Value Problems for
 * Ordinary Differential Equations, 1988, section 5.6: condensation of parameters; from memory).
 */
public final class StepPropagator {

  private static final StageFactors.Precision FULL =
      new StageFactors.Precision(new double[0][], 1e-15);

  private final CollocationTableau tableau;
  private final int n;
  private final double[][] homogeneous;
  private final double[][] particular;
  private final double[][] matrix;
  private final double[] offset;

  private StepPropagator(
      CollocationTableau tableau,
      int n,
      double[][] homogeneous,
      double[][] particular,
      double[][] matrix,
      double[] offset) {
    this.tableau = tableau;
    this.n = n;
    this.homogeneous = homogeneous;
    this.particular = particular;
    this.matrix = matrix;
    this.offset = offset;
  }

  /** Makes the propagators of a system; what all steps share is prepared once. */
  public static final class Maker {
    private final LinearSystem system;
    private final StageCoefficients.Shape shape;
    private final CollocationTableau tableau;

    /**
     * Prepares for a system.
     *
     * @param system the system, n at least 1
     * @param tableau the method
     */
    public Maker(LinearSystem system, CollocationTableau tableau) {
      this.system = system;
      this.shape = StageCoefficients.Shape.of(system);
      this.tableau = tableau;
    }

    /**
     * Returns the propagator of a step without breakpoints inside.
     *
     * @param from its start
     * @param to its end, later
     * @param watch asked while working
     */
    public StepPropagator step(double from, double to, Watch watch) {
      int n = system.dimension();
      double h = to - from;
      StageCoefficients forced = new StageCoefficients(system, shape, tableau, from, to, true);
      StageSystem plain =
          StageSystem.of(
              tableau,
              new StageCoefficients(system, shape, tableau, from, to, false),
              h,
              n + 1,
              watch);
      double[][] identity = Rows.identity(n);
      double[][] homogeneous = plain.solve(identity, n, FULL);
      double[][] matrix = plain.end(identity, homogeneous, n);
      double[][] zero = new double[n][1];
      double[][] particular = plain.with(forced).solve(zero, 1, FULL);
      double[][] offset = plain.end(zero, particular, 1);
      return new StepPropagator(tableau, n, homogeneous, particular, matrix, Rows.flat(offset, 1));
    }
  }

  /** Returns R, n by n; not to be changed. */
  public double[][] matrix() {
    return matrix;
  }

  /** Returns r, n values; not to be changed. */
  public double[] offset() {
    return offset;
  }

  /**
   * Returns the stages of the polynomial that starts at a value.
   *
   * @param x the value at the start, n numbers
   * @param forced whether b counts; without it the step is that of the homogeneous system
   */
  public Polynomial from(double[] x, boolean forced) {
    double[][] z = new double[particular.length][1];
    for (int i = 0; i < z.length; i++) {
      double sum = forced ? particular[i][0] : 0;
      for (int j = 0; j < n; j++) {
        sum += homogeneous[i][j] * x[j];
      }
      z[i][0] = sum;
    }
    return new Polynomial(tableau, x.clone(), Rows.flat(z, 1));
  }

  /** A collocation polynomial on the unit step. */
  public static final class Polynomial {
    private final CollocationTableau tableau;
    private final double[] start;
    private final double[] stages;

    private Polynomial(CollocationTableau tableau, double[] start, double[] stages) {
      this.tableau = tableau;
      this.start = start;
      this.stages = stages;
    }

    /**
     * Writes its value.
     *
     * @param theta place in the step, from 0 to 1
     * @param x receives n values
     */
    public void value(double theta, double[] x) {
      double[] weights = new double[tableau.stages()];
      tableau.weightsAt(theta, weights);
      for (int row = 0; row < start.length; row++) {
        double sum = 0;
        for (int i = 0; i < weights.length; i++) {
          sum += weights[i] * stages[i * start.length + row];
        }
        x[row] = start[row] + sum;
      }
    }

    /**
     * Returns the size of the first coefficient that the polynomial leaves out, judged by how the
     * last two of its Legendre series fall off; the measure for where a mesh is too coarse.
     *
     * @param row the component
     */
    public double truncation(int row) {
      double last = 0;
      double before = 0;
      for (int i = 0; i < tableau.stages(); i++) {
        last += tableau.leading(i) * stages[i * start.length + row];
        before += tableau.nextToLeading(i) * stages[i * start.length + row];
      }
      last = Math.abs(last);
      before = Math.abs(before);
      return last < before ? last * (last / before) : last;
    }
  }
}
