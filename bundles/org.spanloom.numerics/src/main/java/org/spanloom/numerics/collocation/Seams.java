/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.collocation;

import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Side;

/**
 * Looks for what hides between the ends of a step and its nearest collocation points.
 *
 * <p>The coefficients may have kinks that nobody declared. One inside the step is noticed because
 * the polynomials turn rough, but one in the gap beside an end is not seen by any point. There the
 * coefficients themselves are compared with the polynomials through their values at the points. For
 * smooth coefficients that difference falls by 2^-s when the step is halved; where it does not,
 * what it does over the gap counts as error.
 */
final class Seams {

  private final LinearSystem system;
  private final StageCoefficients.Shape shape;
  private final CollocationTableau tableau;
  private final boolean forced;

  Seams(
      LinearSystem system,
      StageCoefficients.Shape shape,
      CollocationTableau tableau,
      boolean forced) {
    this.system = system;
    this.shape = shape;
    this.tableau = tableau;
    this.forced = forced;
  }

  /** The times and values at the ends and the middle of a step. */
  record Step(
      double from,
      double middle,
      double to,
      double[][] start,
      double[][] halfway,
      double[][] end) {}

  /**
   * Returns the error that the gaps may hide, n by m.
   *
   * @param step the step
   * @param whole coefficients of the whole step
   * @param first coefficients of its first half
   * @param second coefficients of its second half
   * @param weight sizes against which the columns are measured
   */
  double[][] hidden(
      Step step,
      StageCoefficients whole,
      StageCoefficients first,
      StageCoefficients second,
      double[][] weight,
      int m) {
    boolean forward = step.to() > step.from();
    StageCoefficients start = at(step.from(), forward ? Side.AFTER : Side.BEFORE);
    StageCoefficients halfway = at(step.middle(), Side.AFTER);
    StageCoefficients end = at(step.to(), forward ? Side.BEFORE : Side.AFTER);
    double[] before = new double[tableau.stages()];
    double[] after = new double[tableau.stages()];
    for (int i = 0; i < before.length; i++) {
      before[i] = tableau.beforeFirst(i);
      after[i] = tableau.afterLast(i);
    }
    double[][] coarse = whole.seam(start, before, step.start(), m);
    raise(coarse, whole.seam(end, after, step.end(), m));
    double[][] fine = first.seam(start, before, step.start(), m);
    raise(fine, first.seam(halfway, after, step.halfway(), m));
    raise(fine, second.seam(halfway, before, step.halfway(), m));
    raise(fine, second.seam(end, after, step.end(), m));
    double gap = tableau.point(0) * Math.abs(step.to() - step.from()) / 2;
    for (int j = 0; j < m; j++) {
      double fineSize = size(fine, weight, j);
      double shrinking = fineSize == 0 ? 0 : Math.min(1, fineSize / size(coarse, weight, j));
      // A high power, so that smooth coefficients cost nothing here.
      double share = 2 * Math.min(1, Math.pow(shrinking / 0.3, 4));
      for (int i = 0; i < fine.length; i++) {
        double memory = 1 / Math.max(Math.abs(start.entry(0, i, i)), Math.abs(end.entry(0, i, i)));
        fine[i][j] *= share * Math.min(gap / 2, memory);
      }
    }
    return fine;
  }

  private StageCoefficients at(double t, Side side) {
    return new StageCoefficients(system, shape, t, side, forced);
  }

  private static void raise(double[][] target, double[][] other) {
    for (int i = 0; i < target.length; i++) {
      for (int j = 0; j < target[i].length; j++) {
        target[i][j] = Math.max(target[i][j], other[i][j]);
      }
    }
  }

  private static double size(double[][] residual, double[][] weight, int j) {
    double largest = 0;
    for (int i = 0; i < residual.length; i++) {
      largest = Math.max(largest, residual[i][j] / weight[i][j]);
    }
    return largest;
  }
}
