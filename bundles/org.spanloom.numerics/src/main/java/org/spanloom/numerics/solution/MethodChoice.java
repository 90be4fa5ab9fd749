/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.solution;

import org.ejml.data.Complex_F64;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.EigenDecomposition_F64;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.exponential.ExponentialSolution;
import org.spanloom.numerics.internal.algebra.Rows;
import org.spanloom.numerics.internal.work.Watch;

/**
 * The method for a system and how many points it takes on a step.
 *
 * @param method the method
 * @param stages collocation points on a step; 0 for the exponential
 */
public record MethodChoice(Method method, int stages) {

  private static final int MOST_STATES_FOR_EIGENVALUES = 100;

  /**
   * Chooses for a system.
   *
   * @param values the system, n at least 1, and a bounded range longer than 0
   * @param watch asked while working
   */
  public static MethodChoice of(InitialValues values, Watch watch) {
    LinearSystem system = values.system();
    TimeRange span = values.span();
    int n = system.dimension();
    if (system.hasConstantMatrix() && (!values.forced() || system.hasConstantForcing())) {
      double[] a = new double[n * n];
      system.matrix(span.start(), Side.AFTER, a);
      if (Rows.isFinite(a) && ExponentialSolution.fits(a, n, span.length())) {
        return new MethodChoice(Method.MATRIX_EXPONENTIAL, 0);
      }
    }
    int stages = stages(n, values.accuracy().relative());
    return new MethodChoice(
        decaysFast(system, span, watch) ? Method.RADAU_COLLOCATION : Method.GAUSS_COLLOCATION,
        stages);
  }

  /**
   * More points pay off when much accuracy is asked for; with many states their factorisation costs
   * more.
   */
  private static int stages(int n, double relative) {
    if (n <= 12) {
      return relative > 1e-5 ? 5 : 7;
    }
    if (relative > 1e-4) {
      return 3;
    }
    return relative >= 1e-10 ? 5 : 7;
  }

  /**
   * Tells whether some direction decays much faster than it turns and than the range lasts, at any
   * of five times.
   */
  private static boolean decaysFast(LinearSystem system, TimeRange span, Watch watch) {
    int n = system.dimension();
    if (n > MOST_STATES_FOR_EIGENVALUES) {
      return true;
    }
    for (int k = 0; k < 5; k++) {
      watch.ask();
      DMatrixRMaj a = new DMatrixRMaj(n, n);
      system.matrix(span.start() + span.length() * (2 * k + 1) / 10, Side.AFTER, a.data);
      if (!Rows.isFinite(a.data)) {
        return true;
      }
      EigenDecomposition_F64<DMatrixRMaj> eigen = DecompositionFactory_DDRM.eig(n, false);
      if (!eigen.decompose(a)) {
        return true;
      }
      double decay = 0;
      double turning = 0;
      for (int i = 0; i < n; i++) {
        Complex_F64 value = eigen.getEigenvalue(i);
        decay = Math.max(decay, -value.getReal());
        turning = Math.max(turning, Math.abs(value.getImaginary()));
      }
      if (decay * span.length() > 50 && decay > 0.5 * turning) {
        return true;
      }
    }
    return false;
  }
}
