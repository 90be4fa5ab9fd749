/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.solution;

import java.util.Arrays;
import org.spanloom.numerics.FormulaSystem;
import org.spanloom.numerics.Lcg31;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Side;

/**
 * Sixty heat capacities joined in a ring with chords by conductances that vary with time over seven
 * orders of magnitude; all parameters are invented.
 */
final class ThermalNetwork {

  static final int NODES = 60;
  private static final int EDGES = 120;

  private final double[] capacity = new double[NODES];
  private final double[] conductance = new double[EDGES];
  private final double[] phase = new double[EDGES];
  private final double[] heat = new double[NODES];
  private final double[] start = new double[NODES];

  ThermalNetwork() {
    Lcg31 random = new Lcg31(2);
    for (int i = 0; i < NODES; i++) {
      capacity[i] = Math.pow(10, -1 + 2 * random.unit());
    }
    for (int e = 0; e < EDGES; e++) {
      double u = random.unit();
      conductance[e] = Math.pow(10, e < NODES ? -1 + 5 * u : -2 + 2 * u);
      phase[e] = 2 * Math.PI * random.unit();
    }
    for (int i = 0; i < NODES; i++) {
      heat[i] = 5 * random.unit();
    }
    for (int i = 0; i < NODES; i++) {
      start[i] = 15 + 10 * random.unit();
    }
  }

  double[] start() {
    return start.clone();
  }

  LinearSystem system() {
    return new FormulaSystem(
        NODES, FormulaSystem.ALWAYS, this::matrix, this::forcing, false, false);
  }

  private static double leak(int i) {
    return i % 10 == 0 ? 0.05 : 0;
  }

  private void matrix(double t, Side side, double[] a) {
    Arrays.fill(a, 0);
    for (int e = 0; e < EDGES; e++) {
      int i = e % NODES;
      int j = (i + (e < NODES ? 1 : 7)) % NODES;
      double g = conductance[e] * (1 + 0.5 * Math.sin(2 * Math.PI * t / 10 + phase[e]));
      a[i * NODES + j] += g / capacity[i];
      a[i * NODES + i] -= g / capacity[i];
      a[j * NODES + i] += g / capacity[j];
      a[j * NODES + j] -= g / capacity[j];
    }
    for (int i = 0; i < NODES; i++) {
      a[i * NODES + i] -= leak(i) / capacity[i];
    }
  }

  private void forcing(double t, Side side, double[] b) {
    double outside = 20 + 10 * Math.sin(2 * Math.PI * t / 24);
    for (int i = 0; i < NODES; i++) {
      b[i] = (leak(i) * outside + heat[i] * (1 + Math.cos(t))) / capacity[i];
    }
  }
}
