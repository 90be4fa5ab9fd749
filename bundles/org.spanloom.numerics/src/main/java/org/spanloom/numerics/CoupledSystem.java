/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics;

import java.util.Arrays;
import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.factory.LinearSolverFactory_DDRM;
import org.ejml.interfaces.linsol.LinearSolverDense;

/**
 * A system whose derivatives are coupled, {@code M(t) x' = K(t) x + f(t)}, as a {@link
 * LinearSystem} with {@code A = M^-1 K} and {@code b = M^-1 f}.
 *
 * <p>Only the rows that the coupling touches are solved, by LU with partial pivoting (EJML); the
 * others pass unchanged. Where M is singular, A and b are not finite, which the solvers report with
 * the time.
 */
public final class CoupledSystem implements LinearSystem {

  /** The mass matrix on the coupled rows. */
  @FunctionalInterface
  public interface Mass {
    /**
     * Writes M on the coupled rows and columns.
     *
     * @param t time
     * @param side side at a breakpoint
     * @param m receives k*k values, row by row, k being the number of coupled rows
     */
    void write(double t, Side side, double[] m);
  }

  private final LinearSystem rightSide;
  private final int[] coupled;
  private final Mass mass;
  private final boolean constantMass;
  private final SparsityPattern pattern;

  /**
   * Wraps a system.
   *
   * @param rightSide the system x' = K x + f; rows that are not coupled have mass 1
   * @param coupled the coupled rows, increasing; their columns in M are the same
   * @param mass M on them
   * @param constantMass whether M is the same at all times
   */
  public CoupledSystem(LinearSystem rightSide, int[] coupled, Mass mass, boolean constantMass) {
    this.rightSide = rightSide;
    this.coupled = coupled.clone();
    this.mass = mass;
    this.constantMass = constantMass;
    this.pattern = spread(rightSide.pattern(), coupled);
  }

  /** Every coupled row may hold what any coupled row holds. */
  private static SparsityPattern spread(SparsityPattern own, int[] coupled) {
    int n = own.dimension();
    boolean[] union = new boolean[n];
    for (int row : coupled) {
      for (int j = 0; j < n; j++) {
        union[j] |= own.contains(row, j);
      }
    }
    int[] start = new int[n + 1];
    int[] columns = new int[n * n];
    int count = 0;
    for (int i = 0; i < n; i++) {
      boolean full = Arrays.binarySearch(coupled, i) >= 0;
      for (int j = 0; j < n; j++) {
        if (full ? union[j] : own.contains(i, j)) {
          columns[count++] = j;
        }
      }
      start[i + 1] = count;
    }
    return new SparsityPattern(start, Arrays.copyOf(columns, count));
  }

  @Override
  public int dimension() {
    return rightSide.dimension();
  }

  @Override
  public TimeRange range() {
    return rightSide.range();
  }

  @Override
  public void matrix(double t, Side side, double[] a) {
    rightSide.matrix(t, side, a);
    solve(t, side, a, dimension());
  }

  @Override
  public void forcing(double t, Side side, double[] b) {
    rightSide.forcing(t, side, b);
    solve(t, side, b, 1);
  }

  @Override
  public boolean hasConstantMatrix() {
    return constantMass && rightSide.hasConstantMatrix();
  }

  @Override
  public boolean hasConstantForcing() {
    return constantMass && rightSide.hasConstantForcing();
  }

  @Override
  public SparsityPattern pattern() {
    return pattern;
  }

  @Override
  public double[] breakpoints() {
    return rightSide.breakpoints();
  }

  @Override
  public List<Jump> jumps() {
    return rightSide.jumps();
  }

  @Override
  public double[] breakpoints(double from, double to) {
    return rightSide.breakpoints(from, to);
  }

  /**
   * Returns the reciprocal condition of M at a time, as LU estimates it: 0 where M is singular.
   *
   * @param t time inside the range
   */
  public double massQuality(double t) {
    int k = coupled.length;
    LinearSolverDense<DMatrixRMaj> lu = LinearSolverFactory_DDRM.lu(k);
    return lu.setA(massAt(t, Side.AFTER)) ? lu.quality() : 0;
  }

  private DMatrixRMaj massAt(double t, Side side) {
    int k = coupled.length;
    DMatrixRMaj m = new DMatrixRMaj(k, k);
    mass.write(t, side, m.data);
    return m;
  }

  private void solve(double t, Side side, double[] rows, int width) {
    int k = coupled.length;
    DMatrixRMaj right = new DMatrixRMaj(k, width);
    for (int i = 0; i < k; i++) {
      System.arraycopy(rows, coupled[i] * width, right.data, i * width, width);
    }
    LinearSolverDense<DMatrixRMaj> lu = LinearSolverFactory_DDRM.lu(k);
    if (lu.setA(massAt(t, side)) && lu.quality() > 0) {
      lu.solve(right, right);
    } else {
      Arrays.fill(right.data, Double.NaN);
    }
    for (int i = 0; i < k; i++) {
      System.arraycopy(right.data, i * width, rows, coupled[i] * width, width);
    }
  }
}
