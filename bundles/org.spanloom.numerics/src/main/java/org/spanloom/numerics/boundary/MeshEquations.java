/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.boundary;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.SingularOps_DDRM;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.SingularValueDecomposition_F64;
import org.spanloom.numerics.Jump;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Outcome.Reason;
import org.spanloom.numerics.collocation.StepPropagator;
import org.spanloom.numerics.internal.algebra.Rows;
import org.spanloom.numerics.internal.work.Hopeless;
import org.spanloom.numerics.internal.work.Watch;

/**
 * All equations of a boundary-value problem on a mesh: the steps, condensed between stations, and
 * the conditions. States are divided by their scales and conditions by their sizes, so that the
 * singular values of what is left compare like with like.
 */
final class MeshEquations {

  private static final double MOST_NUMBERS = 5e7;

  private final BoundaryMesh mesh;
  private final List<Optional<StepPropagator>> steps = new ArrayList<>();
  private final double[][] offsets;
  private final double[] scale;
  private final int n;
  private final double[][][] matrices;
  private final Chain[] chains;
  private final double[][] conditions;
  private final double[] conditionSizes;
  private final double[] values;
  private final double[][] u;
  private final double[][] v;
  private final double[] sigma;

  /**
   * Sets up and factors.
   *
   * @param system the system
   * @param maker makes its steps
   * @param mesh the mesh
   * @param asked n conditions
   * @param scale n scales, positive
   */
  MeshEquations(
      LinearSystem system,
      StepPropagator.Maker maker,
      BoundaryMesh mesh,
      List<BoundaryCondition> asked,
      double[] scale,
      Watch watch) {
    this.mesh = mesh;
    this.scale = scale.clone();
    this.n = scale.length;
    int count = mesh.links();
    if ((double) count * n * n * 8 > MOST_NUMBERS) {
      throw new Hopeless(
          Reason.TOO_MUCH_WORK, mesh.times()[0], "more than " + count + " mesh steps are needed");
    }
    matrices = new double[count][][];
    offsets = new double[count][n];
    for (int k = 0; k < count; k++) {
      double from = mesh.times()[k];
      double[][] matrix;
      double[] offset;
      if (mesh.isJump(k)) {
        steps.add(Optional.empty());
        matrix = Rows.of(jumped(system, from, Rows.flat(Rows.identity(n), n), n, false), n, n);
        offset = jumped(system, from, new double[n], 1, true);
      } else {
        StepPropagator step = maker.step(from, mesh.times()[k + 1], watch);
        steps.add(Optional.of(step));
        matrix = step.matrix();
        offset = step.offset();
      }
      matrices[k] = scaled(matrix);
      for (int i = 0; i < n; i++) {
        offsets[k][i] = offset[i] / scale[i];
      }
      if (!Rows.areFinite(matrices[k]) || !Rows.isFinite(offsets[k])) {
        throw new Hopeless(Reason.OVERFLOW, from, "a step of the mesh has no finite propagator");
      }
    }
    int segments = mesh.stations().length - 1;
    chains = new Chain[segments];
    for (int i = 0; i < segments; i++) {
      int from = mesh.stations()[i];
      double[][][] part = new double[mesh.stations()[i + 1] - from][][];
      System.arraycopy(matrices, from, part, 0, part.length);
      chains[i] = new Chain(part, watch);
    }
    int unknowns = n * (segments + 1);
    conditions = new double[n][unknowns];
    conditionSizes = new double[n];
    values = new double[n];
    for (int i = 0; i < n; i++) {
      for (BoundaryCondition.Sample s : asked.get(i).samples()) {
        conditions[i][mesh.station(s.time(), s.side()) * n + s.component()] +=
            s.coefficient() * scale[s.component()];
      }
      conditionSizes[i] = norm(conditions[i]);
      values[i] = conditionSizes[i] > 0 ? asked.get(i).value() / conditionSizes[i] : 0;
      divide(conditions[i], conditionSizes[i]);
    }
    double[][] condensed = condensed(unknowns);
    watch.spend(20.0 * unknowns * unknowns * unknowns);
    watch.ask();
    SingularValueDecomposition_F64<DMatrixRMaj> svd =
        DecompositionFactory_DDRM.svd(unknowns, unknowns, true, true, false);
    if (!svd.decompose(new DMatrixRMaj(condensed))) {
      throw new Hopeless(
          Reason.TOO_MUCH_WORK, mesh.times()[0], "the singular values did not converge");
    }
    DMatrixRMaj left = svd.getU(null, false);
    DMatrixRMaj right = svd.getV(null, false);
    DMatrixRMaj values = svd.getW(null);
    SingularOps_DDRM.descendingOrder(left, false, values, right, false);
    u = Rows.of(left.data, unknowns, unknowns);
    v = Rows.of(right.data, unknowns, unknowns);
    sigma = new double[unknowns];
    for (int i = 0; i < unknowns; i++) {
      sigma[i] = values.get(i, i);
    }
  }

  private static double[] jumped(
      LinearSystem system, double time, double[] x, int m, boolean shifted) {
    double[] result = x;
    for (Jump jump : system.jumps()) {
      if (jump.time() == time) {
        result = jump.after(result, m, shifted);
      }
    }
    return result;
  }

  private double[][] condensed(int unknowns) {
    double[][] rows = new double[unknowns][];
    for (int i = 0; i < n; i++) {
      rows[i] = conditions[i].clone();
    }
    for (int s = 0; s < chains.length; s++) {
      for (int i = 0; i < n; i++) {
        double[] row = new double[unknowns];
        System.arraycopy(chains[s].head()[i], 0, row, s * n, n);
        System.arraycopy(chains[s].tail()[i], 0, row, (s + 1) * n, n);
        rows[n + s * n + i] = row;
      }
    }
    return rows;
  }

  private static double norm(double[] row) {
    double norm = 0;
    for (double x : row) {
      norm = Math.hypot(norm, x);
    }
    return norm;
  }

  private static void divide(double[] row, double size) {
    if (size > 0) {
      for (int j = 0; j < row.length; j++) {
        row[j] /= size;
      }
    }
  }

  private double[][] scaled(double[][] matrix) {
    double[][] result = new double[n][n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        result[i][j] = matrix[i][j] * scale[j] / scale[i];
      }
    }
    return result;
  }

  /** Returns the mesh. */
  BoundaryMesh mesh() {
    return mesh;
  }

  /** Returns a step of the mesh; empty for a jump. */
  Optional<StepPropagator> step(int k) {
    return steps.get(k);
  }

  /** Returns the singular values of the condensed equations, largest first. */
  double[] singularValues() {
    return sigma.clone();
  }

  /** Returns the size by which a condition was divided. */
  double conditionSize(int i) {
    return conditionSizes[i];
  }

  /** Right sides: those of the steps, each n by m, and those of the conditions, n by m. */
  record Right(double[][][] steps, double[][] conditions) {}

  /** Returns the right sides of the problem itself, one column. */
  Right right() {
    double[][][] given = new double[matrices.length][][];
    double[][] beta = new double[n][1];
    for (int k = 0; k < given.length; k++) {
      given[k] = Rows.of(offsets[k], n, 1);
    }
    for (int i = 0; i < n; i++) {
      beta[i][0] = values[i];
    }
    return new Right(given, beta);
  }

  /** Returns n columns: in each, one condition is 1 and everything else 0. */
  Right unitConditions() {
    return new Right(new double[matrices.length][n][n], Rows.identity(n));
  }

  /** Returns n columns: in each, one component of one step is 1 and everything else 0. */
  Right unitStep(int k) {
    double[][][] unit = new double[matrices.length][n][n];
    unit[k] = Rows.identity(n);
    return new Right(unit, new double[n][n]);
  }

  /** Returns what the right sides lack for given values at the nodes. */
  Right residual(Right right, double[][][] x) {
    int m = right.conditions()[0].length;
    double[][][] lacking = new double[matrices.length][][];
    for (int k = 0; k < matrices.length; k++) {
      lacking[k] = Rows.copy(right.steps()[k]);
      for (int i = 0; i < n; i++) {
        for (int j = 0; j < m; j++) {
          lacking[k][i][j] -= x[k + 1][i][j];
        }
        for (int l = 0; l < n; l++) {
          Rows.addScaled(lacking[k][i], matrices[k][i][l], x[k][l], 0, m);
        }
      }
    }
    double[][] beta = Rows.copy(right.conditions());
    for (int i = 0; i < n; i++) {
      for (int s = 0; s < mesh.stations().length; s++) {
        for (int l = 0; l < n; l++) {
          Rows.addScaled(beta[i], -conditions[i][s * n + l], x[mesh.stations()[s]][l], 0, m);
        }
      }
    }
    return new Right(lacking, beta);
  }

  /** Returns the coefficients of condensed right sides in the left singular vectors. */
  private double[][] project(double[][] f, int m, Watch watch) {
    return Rows.product(transposed(u), f, m, watch);
  }

  private static double[][] transposed(double[][] a) {
    double[][] t = new double[a.length][a.length];
    for (int i = 0; i < a.length; i++) {
      for (int j = 0; j < a.length; j++) {
        t[j][i] = a[i][j];
      }
    }
    return t;
  }

  /**
   * Solves.
   *
   * @param right right sides with m columns
   * @param rank how many singular values count; with fewer than all, the shortest solution
   */
  Solved solve(Right right, int rank, Watch watch) {
    int m = right.conditions()[0].length;
    int unknowns = sigma.length;
    Chain.Reduced[] reduced = new Chain.Reduced[chains.length];
    double[][] f = new double[unknowns][];
    for (int i = 0; i < n; i++) {
      f[i] = right.conditions()[i].clone();
    }
    for (int s = 0; s < chains.length; s++) {
      int from = mesh.stations()[s];
      double[][][] part = new double[mesh.stations()[s + 1] - from][][];
      System.arraycopy(right.steps(), from, part, 0, part.length);
      reduced[s] = chains[s].reduce(part, watch);
      for (int i = 0; i < n; i++) {
        f[n + s * n + i] = reduced[s].end()[i].clone();
      }
    }
    double[][] c = project(f, m, watch);
    double left = 0;
    double whole = 0;
    for (int i = 0; i < unknowns; i++) {
      for (int j = 0; j < m; j++) {
        whole = Math.hypot(whole, c[i][j]);
        if (i >= rank) {
          left = Math.hypot(left, c[i][j]);
        }
        c[i][j] = i < rank ? c[i][j] / sigma[i] : 0;
      }
    }
    return new Solved(fill(Rows.product(v, c, m, watch), reduced, m, watch), left, whole);
  }

  /**
   * A solution of the equations.
   *
   * @param x scaled values at all nodes, each n by m
   * @param left size of the part of the right sides that no values fit
   * @param whole size of the right sides
   */
  record Solved(double[][][] x, double left, double whole) {}

  /**
   * Returns the solution of the homogeneous equations that belongs to a right singular vector,
   * scaled, at all nodes.
   *
   * @param index number of the singular value
   */
  double[][][] nullVector(int index, Watch watch) {
    Chain.Reduced[] reduced = new Chain.Reduced[chains.length];
    for (int s = 0; s < chains.length; s++) {
      int length = mesh.stations()[s + 1] - mesh.stations()[s];
      reduced[s] = chains[s].reduce(new double[length][n][1], watch);
    }
    double[][] y = new double[sigma.length][1];
    for (int i = 0; i < y.length; i++) {
      y[i][0] = v[i][index];
    }
    return fill(y, reduced, 1, watch);
  }

  private double[][][] fill(double[][] y, Chain.Reduced[] reduced, int m, Watch watch) {
    double[][][] x = new double[matrices.length + 1][][];
    for (int s = 0; s <= chains.length; s++) {
      double[][] here = new double[n][];
      System.arraycopy(y, s * n, here, 0, n);
      x[mesh.stations()[s]] = here;
    }
    for (int s = 0; s < chains.length; s++) {
      int from = mesh.stations()[s];
      double[][][] part = new double[mesh.stations()[s + 1] - from + 1][][];
      System.arraycopy(x, from, part, 0, part.length);
      chains[s].fill(reduced[s], part, watch);
      System.arraycopy(part, 0, x, from, part.length);
    }
    return x;
  }
}
