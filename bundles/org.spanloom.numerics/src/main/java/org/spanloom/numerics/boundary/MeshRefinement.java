/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.boundary;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.spanloom.numerics.Accuracy;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.boundary.BoundaryAnswer.Conditioning;
import org.spanloom.numerics.boundary.BoundaryAnswer.NullSolution;
import org.spanloom.numerics.boundary.MeshEquations.Right;
import org.spanloom.numerics.boundary.MeshEquations.Solved;
import org.spanloom.numerics.collocation.CollocationTableau;
import org.spanloom.numerics.collocation.CollocationTableau.Family;
import org.spanloom.numerics.collocation.StepPropagator;
import org.spanloom.numerics.internal.work.Watch;

/** Solves on finer and finer meshes until the error asked for is met, or no mesh does better. */
final class MeshRefinement {

  private static final int MOST_ROUNDS = 24;
  private static final int MOST_STEPS = 40_000;
  private static final int MOST_PARTS = 10;
  private static final int SAMPLED_FORCINGS = 40;

  /** How the singular values of a mesh and of its halving tell a zero one. */
  private static final double FALLING = 0.3;

  private static final double CERTAINLY_ZERO = 1e-11;

  private final LinearSystem system;
  private final TimeRange range;
  private final List<BoundaryCondition> conditions;
  private final double relative;
  private final double[] scale;
  private final int n;
  private final Watch watch;
  private final CollocationTableau tableau;
  private final StepPropagator.Maker maker;

  MeshRefinement(
      LinearSystem system,
      TimeRange range,
      List<BoundaryCondition> conditions,
      Accuracy accuracy,
      Watch watch) {
    this.system = system;
    this.range = range;
    this.conditions = List.copyOf(conditions);
    this.relative = accuracy.relative();
    this.scale = accuracy.scale();
    this.n = system.dimension();
    this.watch = watch;
    int stages = n > 80 ? 4 : relative < 1e-8 ? 7 : 5;
    this.tableau = CollocationTableau.of(Family.GAUSS, stages);
    this.maker = new StepPropagator.Maker(system, tableau);
  }

  /** A solution on the halving of a mesh, with what is known of its error. */
  private record Level(
      MeshEquations equations,
      double[][][] x,
      double[][] errors,
      double[][] between,
      double ratio,
      double rounding) {}

  BoundaryAnswer run() {
    BoundaryMesh mesh = BoundaryMesh.first(system, range, conditions, speed());
    Level best = null;
    int withoutGain = 0;
    for (int round = 0; ; round++) {
      watch.ask();
      MeshEquations coarse = new MeshEquations(system, maker, mesh, conditions, scale, watch);
      MeshEquations fine =
          new MeshEquations(system, maker, mesh.halved(), conditions, scale, watch);
      int rank = rank(coarse.singularValues(), fine.singularValues());
      boolean mayGoOn = round + 1 < MOST_ROUNDS && 4 * mesh.links() < MOST_STEPS;
      boolean open = isOpen(coarse.singularValues(), fine.singularValues(), rank);
      Solved onCoarse = coarse.solve(coarse.right(), rank, watch);
      if (open && mayGoOn) {
        mesh = refined(coarse, onCoarse.x());
        continue;
      }
      double zero = Math.max(1e-10, 100 * ratio(coarse.singularValues(), rank));
      Solved onFine = fine.solve(fine.right(), rank, watch);
      boolean singular = rank < fine.singularValues().length;
      if (singular && onFine.left() > zero * onFine.whole()) {
        return new BoundaryAnswer.None(
            directions(fine, rank),
            onFine.left() / onFine.whole(),
            ratio(fine.singularValues(), rank));
      }
      Level level = level(coarse, onCoarse.x(), fine, onFine.x(), rank);
      if (best == null || level.ratio() < best.ratio()) {
        withoutGain = best != null && level.ratio() > 0.5 * best.ratio() ? withoutGain + 1 : 0;
        best = level;
      } else {
        withoutGain++;
      }
      watch.worked(Math.min(0.95, (round + 1.0) / 12));
      boolean done = best.ratio() <= 1 || withoutGain >= 2;
      if (done || !mayGoOn) {
        return answer(best, rank);
      }
      mesh = refined(coarse, onCoarse.x());
    }
  }

  /** Returns about the rate of the fastest direction, from a sample of times. */
  private double speed() {
    double[] a = new double[n * n];
    double largest = 0;
    for (int k = 0; k <= 8; k++) {
      double t = k == 8 ? range.end() : range.start() + range.length() * k / 8;
      system.matrix(t, k == 8 ? Side.BEFORE : Side.AFTER, a);
      for (int i = 0; i < n; i++) {
        double sum = 0;
        for (int j = 0; j < n; j++) {
          sum += Math.abs(a[i * n + j]) * scale[j] / scale[i];
        }
        largest = Math.max(largest, sum);
      }
    }
    return Double.isFinite(largest) ? Math.max(largest, 1 / range.length()) : 1 / range.length();
  }

  private double floor() {
    return 1e-14 * Math.sqrt(n + 1.0);
  }

  /** Returns how many singular values are not zero. */
  private int rank(double[] coarse, double[] fine) {
    int rank = fine.length;
    while (rank > 0 && isZero(coarse[rank - 1], fine[rank - 1], fine[0])) {
      rank--;
    }
    return rank;
  }

  private boolean isZero(double coarse, double fine, double largest) {
    return fine <= floor() * largest || fine < FALLING * Math.abs(coarse - fine);
  }

  /** Tells whether a singular value may be zero but is not small enough yet to say so. */
  private static boolean isOpen(double[] coarse, double[] fine, int rank) {
    return rank < fine.length && fine[rank] > CERTAINLY_ZERO * fine[0] && coarse[rank] > 0;
  }

  private static double ratio(double[] singularValues, int rank) {
    int last = singularValues.length - 1;
    return singularValues[Math.min(rank, last)] / singularValues[0];
  }

  private Level level(
      MeshEquations coarse, double[][][] onCoarse, MeshEquations fine, double[][][] x, int rank) {
    Right lacking = fine.residual(fine.right(), x);
    double[][][] change = fine.solve(lacking, rank, watch).x();
    int nodes = x.length;
    double[][] differences = new double[nodes][n];
    double[] middle = new double[n];
    int node = 0;
    for (int k = 0; k < onCoarse.length; k++) {
      for (int i = 0; i < n; i++) {
        differences[node][i] = Math.abs(onCoarse[k][i][0] - x[node][i][0]);
      }
      if (k + 1 < onCoarse.length && coarse.step(k).isPresent()) {
        node++;
        polynomial(coarse, k, onCoarse[k]).orElseThrow().value(0.5, middle);
        for (int i = 0; i < n; i++) {
          differences[node][i] = Math.abs(middle[i] / scale[i] - x[node][i][0]);
        }
      }
      node++;
    }
    double gain = 3 * Math.pow(2, -tableau.stages());
    double[][] errors = new double[nodes][n];
    double worst = 0;
    double rounding = 0;
    for (int k = 0; k < nodes; k++) {
      double largest = 0;
      for (int i = 0; i < n; i++) {
        double value = x[k][i][0] + change[k][i][0];
        double round = 2 * Math.abs(change[k][i][0]) + 4 * Math.ulp(value);
        x[k][i][0] = value;
        errors[k][i] = gain * differences[k][i] + round;
        largest = Math.max(largest, errors[k][i]);
        rounding = Math.max(rounding, round / Math.max(1, Math.abs(value)));
      }
      for (int i = 0; i < n; i++) {
        errors[k][i] = Math.max(errors[k][i], 0.1 * largest);
      }
    }
    double[][] between = new double[nodes - 1][n];
    for (int k = 0; k + 1 < nodes; k++) {
      for (int i = 0; i < n; i++) {
        between[k][i] = 2 * Math.max(errors[k][i], errors[k + 1][i]);
        double size = Math.max(1, Math.max(Math.abs(x[k][i][0]), Math.abs(x[k + 1][i][0])));
        worst = Math.max(worst, between[k][i] / (relative * size));
      }
    }
    return new Level(fine, x, errors, between, worst, rounding);
  }

  private Optional<StepPropagator.Polynomial> polynomial(
      MeshEquations equations, int k, double[][] x) {
    double[] start = new double[n];
    for (int i = 0; i < n; i++) {
      start[i] = x[i][0] * scale[i];
    }
    return equations.step(k).map(step -> step.from(start, true));
  }

  /** Splits the steps where the polynomials leave out too much. */
  private BoundaryMesh refined(MeshEquations coarse, double[][][] x) {
    BoundaryMesh mesh = coarse.mesh();
    int steps = mesh.links();
    double target = 0.2 * relative * Math.pow(2, tableau.stages()) / 3;
    double[] wanted = new double[steps];
    for (int k = 0; k < steps; k++) {
      if (mesh.isJump(k)) {
        continue;
      }
      StepPropagator.Polynomial polynomial = polynomial(coarse, k, x[k]).orElseThrow();
      double worst = 0;
      for (int i = 0; i < n; i++) {
        double size =
            scale[i] * Math.max(1, Math.max(Math.abs(x[k][i][0]), Math.abs(x[k + 1][i][0])));
        worst = Math.max(worst, polynomial.truncation(i) / size);
      }
      wanted[k] = Math.pow(worst / target, 1.0 / (tableau.stages() + 1));
    }
    double share = 1;
    int[] parts = parts(wanted, share);
    while (Arrays.stream(parts).sum() > 4 * steps + 40) {
      share *= 0.8;
      parts = parts(wanted, share);
    }
    boolean same = Arrays.stream(parts).allMatch(p -> p == 1);
    return same ? mesh.halved() : mesh.split(parts);
  }

  private static int[] parts(double[] wanted, double share) {
    int[] parts = new int[wanted.length];
    for (int k = 0; k < parts.length; k++) {
      double asked = Math.ceil(share * wanted[k]);
      parts[k] = asked >= MOST_PARTS || Double.isNaN(asked) ? MOST_PARTS : Math.max(1, (int) asked);
    }
    return parts;
  }

  private BoundaryAnswer answer(Level level, int rank) {
    MeshEquations equations = level.equations();
    BoundarySolution solution = solution(level);
    double smallest = ratio(equations.singularValues(), rank);
    if (rank < equations.singularValues().length) {
      return new BoundaryAnswer.Family(solution, directions(equations, rank), smallest);
    }
    return new BoundaryAnswer.Unique(solution, conditioning(equations, rank, smallest));
  }

  private BoundarySolution solution(Level level) {
    int nodes = level.x().length;
    double[][] values = new double[nodes][n];
    double[][] errors = new double[nodes][n];
    double[][] between = new double[nodes - 1][n];
    List<Optional<StepPropagator.Polynomial>> polynomials = new ArrayList<>();
    for (int k = 0; k < nodes; k++) {
      for (int i = 0; i < n; i++) {
        values[k][i] = level.x()[k][i][0] * scale[i];
        errors[k][i] = level.errors()[k][i] * scale[i];
        if (k + 1 < nodes) {
          between[k][i] = level.between()[k][i] * scale[i];
        }
      }
      if (k + 1 < nodes) {
        polynomials.add(polynomial(level.equations(), k, level.x()[k]));
      }
    }
    String method = "Gauss collocation, order " + tableau.order() + ", global";
    return new BoundarySolution(
        level.equations().mesh().times(), values, errors, polynomials, between, method);
  }

  private Conditioning conditioning(MeshEquations equations, int rank, double smallest) {
    double toConditions = 0;
    for (double sum : rowSums(equations.solve(equations.unitConditions(), rank, watch).x())) {
      toConditions = Math.max(toConditions, sum);
    }
    double[] times = equations.mesh().times();
    int steps = times.length - 1;
    int stride = Math.max(1, steps / SAMPLED_FORCINGS);
    double[] toForcing = new double[steps + 1];
    for (int from = 0; from < steps; from += stride) {
      int to = Math.min(steps, from + stride);
      int middle = (from + to) / 2;
      double[] sums = rowSums(equations.solve(equations.unitStep(middle), rank, watch).x());
      for (int k = 0; k <= steps; k++) {
        toForcing[k] += sums[k] * (times[to] - times[from]);
      }
    }
    return new Conditioning(toConditions, Arrays.stream(toForcing).max().orElse(0), smallest);
  }

  /** Returns the largest sum of absolute values of a row, for each node. */
  private static double[] rowSums(double[][][] x) {
    double[] largest = new double[x.length];
    for (int k = 0; k < x.length; k++) {
      for (double[] row : x[k]) {
        largest[k] = Math.max(largest[k], Arrays.stream(row).map(Math::abs).sum());
      }
    }
    return largest;
  }

  private List<NullSolution> directions(MeshEquations equations, int rank) {
    List<NullSolution> directions = new ArrayList<>();
    for (int index = rank; index < equations.singularValues().length; index++) {
      double[][][] x = equations.nullVector(index, watch);
      int place = 0;
      double largest = 0;
      for (int k = 0; k < x.length; k++) {
        for (double[] row : x[k]) {
          // The first of two places that differ by rounding only.
          if (Math.abs(row[0]) > largest * (1 + 1e-6)) {
            largest = Math.abs(row[0]);
            place = k;
          }
        }
      }
      double[] values = new double[n];
      double sign = 0;
      for (int i = 0; i < n; i++) {
        double value = x[place][i][0] / largest;
        if (sign == 0 && Math.abs(value) > 0.5) {
          sign = Math.signum(value);
        }
        values[i] = value;
      }
      for (int i = 0; i < n; i++) {
        values[i] *= sign * scale[i];
      }
      directions.add(new NullSolution(equations.mesh().times()[place], values));
    }
    return directions;
  }
}
