/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.magnus;

/**
 * The orders of Magnus integrators that are known here, with the Gauss points at which each looks
 * at A. An order of 2s takes s points.
 */
public enum MagnusOrder {
  /** Two points and one commutator. */
  FOUR(new double[] {0.5 - Math.sqrt(3) / 6, 0.5 + Math.sqrt(3) / 6}),
  /** Three points and three commutators. */
  SIX(new double[] {0.5 - Math.sqrt(15) / 10, 0.5, 0.5 + Math.sqrt(15) / 10}),
  /** Four points and six commutators. */
  EIGHT(
      new double[] {
        0.5 - Math.sqrt(3 / 7.0 + 2 / 7.0 * Math.sqrt(1.2)) / 2,
        0.5 - Math.sqrt(3 / 7.0 - 2 / 7.0 * Math.sqrt(1.2)) / 2,
        0.5 + Math.sqrt(3 / 7.0 - 2 / 7.0 * Math.sqrt(1.2)) / 2,
        0.5 + Math.sqrt(3 / 7.0 + 2 / 7.0 * Math.sqrt(1.2)) / 2
      });

  private final double[] points;

  MagnusOrder(double[] points) {
    this.points = points;
  }

  /** Returns the order: local errors shrink with the power of one more. */
  public int order() {
    return 2 * points.length;
  }

  /** Returns the number of points s. */
  int count() {
    return points.length;
  }

  /** Returns point i, as a share of the step. */
  double point(int i) {
    return points[i];
  }

  /** Returns the order of that number. */
  public static MagnusOrder of(int order) {
    for (MagnusOrder known : values()) {
      if (known.order() == order) {
        return known;
      }
    }
    throw new IllegalArgumentException("no Magnus integrator of order " + order);
  }
}
