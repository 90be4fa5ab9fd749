/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.solution;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;

import java.util.Arrays;
import java.util.Random;
import org.hipparchus.ode.ODEState;
import org.hipparchus.ode.OrdinaryDifferentialEquation;
import org.hipparchus.ode.nonstiff.DormandPrince853Integrator;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.problem.FormulaSystem;
import org.spanloom.numerics.problem.Solved;

/**
 * Random smooth systems against an explicit general integrator (Hipparchus, Dormand-Prince 8(5,3)).
 */
final class GeneralIntegratorCrossCheckTests {

  private record Equations(LinearSystem system) implements OrdinaryDifferentialEquation {
    @Override
    public int getDimension() {
      return system.dimension();
    }

    @Override
    public double[] computeDerivatives(double t, double[] y) {
      int n = system.dimension();
      double[] a = new double[n * n];
      double[] result = new double[n];
      system.matrix(t, Side.AFTER, a);
      system.forcing(t, Side.AFTER, result);
      for (int i = 0; i < n; i++) {
        for (int j = 0; j < n; j++) {
          result[i] += a[i * n + j] * y[j];
        }
      }
      return result;
    }
  }

  @ParameterizedTest
  @ValueSource(ints = {1, 2, 3, 5, 8, 13})
  void agree(int n) {
    Random random = new Random(n);
    double[] base = random.doubles((long) n * n, -1, 1).toArray();
    double[] swing = random.doubles((long) n * n, -1, 1).toArray();
    double[] push = random.doubles(n, -1, 1).toArray();
    double[] start = random.doubles(n, -1, 1).toArray();
    FormulaSystem system =
        FormulaSystem.forced(
            n,
            -1,
            4,
            (t, a) -> {
              for (int e = 0; e < a.length; e++) {
                a[e] = base[e] + swing[e] * Math.sin(2 * t + e);
              }
            },
            (t, b) -> {
              for (int i = 0; i < n; i++) {
                b[i] = push[i] * Math.exp(-t * t);
              }
            });
    double[] theirs =
        new DormandPrince853Integrator(1e-10, 1, 1e-13, 1e-13)
            .integrate(new Equations(system), new ODEState(-1, start), 4)
            .getPrimaryState();
    assertNear(theirs, Solved.at(Solved.trajectory(system, 1e-12, start), 4));
    FormulaSystem frozen = FormulaSystem.constant(base, push, -1, 4);
    double[] constant =
        new DormandPrince853Integrator(1e-10, 1, 1e-13, 1e-13)
            .integrate(new Equations(frozen), new ODEState(-1, start), 4)
            .getPrimaryState();
    assertNear(constant, Solved.at(Solved.trajectory(frozen, 1e-12, start), 4));
    assertNear(constant, Solved.at(Solved.trajectory(frozen.asVarying(), 1e-12, start), 4));
  }

  private static void assertNear(double[] theirs, double[] ours) {
    double largest = Arrays.stream(theirs).map(Math::abs).max().orElse(0);
    assertArrayEquals(theirs, ours, 1e-10 * Math.max(1, largest));
  }
}
