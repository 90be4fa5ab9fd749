/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.basis;

import org.spanloom.numerics.Side;
import org.spanloom.numerics.internal.algebra.LuFactors;
import org.spanloom.numerics.internal.algebra.Rows;
import org.spanloom.numerics.internal.algebra.SingularValues;
import org.spanloom.numerics.internal.work.Watch;
import org.spanloom.numerics.solution.Solution;

/** Looks at a basis at one time. */
final class BasisAt {

  private final double[][] x;
  private final double[][] equilibrated;
  private final double[] lengths;
  private final int m;
  private final double error;
  private final boolean hasZeroColumn;

  BasisAt(Solution basis, double t) {
    int n = basis.dimension();
    m = basis.columns();
    double[] values = new double[n * m];
    basis.value(t, Side.AFTER, values);
    double[] errors = new double[n * m];
    basis.errorEstimate(t, errors);
    x = Rows.of(values, n, m);
    lengths = new double[m];
    equilibrated = new double[n][m];
    double worst = 0;
    boolean zero = false;
    for (int j = 0; j < m; j++) {
      lengths[j] = length(j);
      zero |= !(lengths[j] > 0);
      for (int i = 0; i < n; i++) {
        equilibrated[i][j] = lengths[j] > 0 ? x[i][j] / lengths[j] : 0;
        worst = Math.max(worst, lengths[j] > 0 ? errors[i * m + j] / lengths[j] : 0);
      }
    }
    hasZeroColumn = zero;
    error = worst;
  }

  private double length(int j) {
    double largest = 0;
    for (double[] row : x) {
      largest = Math.max(largest, Math.abs(row[j]));
    }
    if (!(largest > 0)) {
      return 0;
    }
    double sum = 0;
    for (double[] row : x) {
      sum += row[j] / largest * (row[j] / largest);
    }
    return largest * Math.sqrt(sum);
  }

  /** Returns the condition number after column scaling. */
  double scaled() {
    return hasZeroColumn ? Double.POSITIVE_INFINITY : ratio(SingularValues.of(equilibrated, m));
  }

  /** Returns the largest error of an entry relative to the length of its column. */
  double error() {
    return error;
  }

  private static double ratio(double[] singularValues) {
    double smallest = singularValues[singularValues.length - 1];
    return smallest > 0 ? singularValues[0] / smallest : Double.POSITIVE_INFINITY;
  }

  /** Returns ln |det X| with the sign of det X, from LU of the scaled columns. */
  Determinant determinant() {
    if (hasZeroColumn || m != x.length) {
      return new Determinant(Double.NEGATIVE_INFINITY, 0);
    }
    LuFactors factors = LuFactors.of(Rows.copy(equilibrated), Watch.NONE);
    double sum = factors.logDeterminant();
    for (double length : lengths) {
      sum += Math.log(length);
    }
    return new Determinant(sum, factors.determinantSign());
  }

  /** A determinant that may lie far outside the floating point numbers. */
  record Determinant(double log, int sign) {}

  /** Returns all there is to say, given what Liouville's formula expects. */
  ConditionSample sample(double t, double liouville) {
    double[] singularValues = SingularValues.of(x, m);
    Determinant determinant = determinant();
    return new ConditionSample(
        t,
        singularValues,
        hasZeroColumn ? Double.POSITIVE_INFINITY : ratio(singularValues),
        scaled(),
        determinant.log(),
        determinant.sign(),
        liouville,
        error);
  }
}
