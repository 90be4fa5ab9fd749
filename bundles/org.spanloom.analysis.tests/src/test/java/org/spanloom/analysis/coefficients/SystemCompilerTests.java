/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.coefficients;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.spanloom.language.model.Model;
import org.spanloom.language.model.ModelReader;
import org.spanloom.language.problem.Severity;
import org.spanloom.language.text.SourceText;
import org.spanloom.numerics.Side;

class SystemCompilerTests {

  private static CompiledSystem compiled(String text, Map<String, Double> parameters) {
    Model model = ModelReader.read(new SourceText("model.span", text));
    assertEquals(
        List.of(), model.problems().stream().filter(p -> p.severity() == Severity.ERROR).toList());
    return SystemCompiler.compile(model.systems().getFirst(), parameters);
  }

  private static double[] matrix(CompiledSystem system, double t) {
    double[] a = new double[system.dimension() * system.dimension()];
    system.linear().matrix(t, Side.AFTER, a);
    return a;
  }

  private static double[] forcing(CompiledSystem system, double t) {
    double[] b = new double[system.dimension()];
    system.linear().forcing(t, Side.AFTER, b);
    return b;
  }

  @Test
  void coefficientsAreInDeclaredUnits() {
    CompiledSystem system =
        compiled(
            """
            system Store over t [h] from 0 to 10 {
              parameter C [kJ/K] = 90
              parameter g [W/K] = 50
              state T [K] = 280
              state Q [kW.h] = 0
              C*T' = g*(290 [K] - T)
              Q' = g*(290 [K] - T)
            }
            """,
            Map.of());
    assertArrayEquals(new double[] {-2, 0, -0.05, 0}, matrix(system, 0), 1e-15);
    assertArrayEquals(new double[] {580, 14.5}, forcing(system, 0), 1e-12);
    assertTrue(system.linear().hasConstantMatrix());
    assertFalse(system.linear().pattern().contains(0, 1));
    assertTrue(system.linear().pattern().contains(1, 0));
  }

  @Test
  void timeIsInItsDeclaredUnitAndParametersCanBeReplaced() {
    String text =
        """
        system Pump over t [min] from 0 to 10 {
          parameter k [/h] = 6
          state v [L] = 1
          v' = -k*(1 + 0.5*sin(2*pi*t/(4 [min])))*v
        }
        """;
    assertEquals(-0.1 * 1.5, matrix(compiled(text, Map.of()), 1)[0], 1e-15);
    double perSecond = 12.0 / 3600;
    assertEquals(-0.2 * 0.5, matrix(compiled(text, Map.of("k", perSecond)), 3)[0], 1e-15);
  }

  /** (m1 u'' + m w'' = -k1 u, m u'' + m2 w'' = -k2 w), inverted by hand. */
  @Test
  void coupledAccelerationsAreSolvedFor() {
    CompiledSystem system =
        compiled(
            """
            system Mast over t [s] from 0 to 10 {
              parameter m [kg] = 1
              state u [mm] = 1
              state u' [mm/s] = 0
              state w [mm] = 0
              state w' [mm/s] = 0
              3 [kg]*u'' + m*w'' = -10 [N/m]*u
              m*u'' + 2 [kg]*w'' = -15 [N/m]*w
            }
            """,
            Map.of());
    double[] expected = {
      0, 1, 0, 0,
      -4, 0, 3, 0,
      0, 0, 0, 1,
      2, 0, -9, 0
    };
    assertArrayEquals(expected, matrix(system, 0), 1e-14);
    assertTrue(system.coupling().isPresent());
    assertTrue(system.linear().hasConstantMatrix());
  }

  @Test
  void temperaturesInDegreesShiftTheForcing() {
    CompiledSystem system =
        compiled(
            """
            system Hut over t [h] from 0 to 10 {
              state T [Cel] = 20
              T' = -0.5 [/h]*(T - 10 [Cel])
            }
            """,
            Map.of());
    assertArrayEquals(new double[] {-0.5}, matrix(system, 0), 1e-15);
    assertArrayEquals(new double[] {5}, forcing(system, 0), 1e-12);
    assertArrayEquals(
        new double[] {20}, system.values(system.model().initialValues().getFirst()), 1e-12);
  }

  @Test
  void cornersAndJumpsOfCoefficientsAreBreakpointsWithTwoSides() {
    CompiledSystem system =
        compiled(
            """
            system Valve over t [h] from 0 to 10 {
              state v [m3] = 1
              v' = -abs(t/(3 [h]) - 1)*0.1 [/h]*v + sign(t - 7 [h])*1 [m3/h] + max(t - 5 [h], 0 [h])*0 [m3/h2]
            }
            """,
            Map.of());
    double[] breakpoints = system.linear().breakpoints();
    assertArrayEquals(new double[] {3, 7}, breakpoints, 1e-14);
    double[] b = new double[1];
    system.linear().forcing(breakpoints[1], Side.BEFORE, b);
    assertEquals(-1, b[0]);
    system.linear().forcing(breakpoints[1], Side.AFTER, b);
    assertEquals(1, b[0]);
  }

  @Test
  void switchesAndPulsesHaveTheirBranchesOnEachSide() {
    CompiledSystem system =
        compiled(
            """
            system Shed over t [h] from 0 to 12 {
              parameter late [h] = 7.3
              let heat(t) [K/h] = if t <= 6.1 then 2 else if t < late then 3 else 5
              let door(t) = pulse(t, period = 4 [h], width = 30 [min])
              state T [K] = 280
              T' = heat(t) + 10 [K/h]*door(t)
            }
            """,
            Map.of("late", 7.2 * 3600));
    assertArrayEquals(new double[] {0.5, 4, 4.5, 6.1, 7.2, 8, 8.5}, system.linear().breakpoints());
    double[][] sides = {
      {0, 12, 12},
      {0.5, 12, 2},
      {4, 2, 12},
      {4.5, 12, 2},
      {6.1, 2, 3},
      {7.2, 3, 5},
      {8, 5, 15},
      {8.5, 15, 5},
      {12, 5, 15}
    };
    for (double[] row : sides) {
      double[] b = new double[1];
      if (row[0] > 0) {
        system.linear().forcing(row[0], Side.BEFORE, b);
        assertEquals(row[1], b[0], 1e-14, "before " + row[0]);
      }
      system.linear().forcing(row[0], Side.AFTER, b);
      assertEquals(row[2], b[0], 1e-14, "after " + row[0]);
    }
  }

  @Test
  void breakpointsOfAnEndlessRangeAreFoundWhereTheyAreAskedFor() {
    CompiledSystem system =
        compiled(
            """
            system Lamp over t [h] from 0 {
              state x = 1
              x' = -pulse(t, period = 24, width = 8)*x/1 [h]
            }
            """,
            Map.of());
    assertArrayEquals(
        new double[] {1_000_000 * 24.0}, system.linear().breakpoints(23_999_999, 24_000_001));
    assertArrayEquals(new double[] {8, 24}, system.linear().breakpoints(0, 30));
    double[] a = new double[1];
    system.linear().matrix(24, Side.BEFORE, a);
    assertEquals(0, a[0], 1e-300);
    system.linear().matrix(24, Side.AFTER, a);
    assertEquals(-1, a[0]);
  }

  @Test
  void jumpsOfCoupledMassesAreBreakpointsToo() {
    CompiledSystem system =
        compiled(
            """
            system Barge over t [s] from 0 to 10 {
              let load(t) = (3 + sign(t - 4 [s]))*1 [kg]
              state u [m/s] = 1
              state w [m/s] = 0
              load(t)*u' + 1 [kg]*w' = -1 [N.s/m]*u
              1 [kg]*w' = 0 [N]
            }
            """,
            Map.of());
    assertArrayEquals(new double[] {4}, system.linear().breakpoints(), 1e-14);
    double[] a = new double[4];
    system.linear().matrix(system.linear().breakpoints()[0], Side.BEFORE, a);
    assertEquals(-1.0 / 2, a[0], 1e-15);
    system.linear().matrix(system.linear().breakpoints()[0], Side.AFTER, a);
    assertEquals(-1.0 / 4, a[0], 1e-15);
  }

  @Test
  void aVaryingMassDividesItsRow() {
    CompiledSystem system =
        compiled(
            """
            system Buoy over t [s] from 0 to 10 {
              let m(t) = 2 [kg] + 0.1 [kg/s]*t
              state v [m/s] = 1
              m(t)*v' = -3 [N.s/m]*v
            }
            """,
            Map.of());
    assertEquals(-3 / 2.5, matrix(system, 5)[0], 1e-15);
    assertFalse(system.linear().hasConstantMatrix());
    assertTrue(system.coupling().isEmpty());
  }
}
