/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.spanloom.language.model.ModelListing.equations;
import static org.spanloom.language.model.ModelListing.system;

import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.spanloom.language.text.Span;

class LinearFormTests {

  @Test
  void coldStore() {
    SystemModel system =
        system(
            """
            system ColdStore over t [h] from 0 to 48 {
              parameter C_air  [kJ/K] = 85
              parameter C_wall [MJ/K] = 2.1
              parameter g_wall [kW/K] = 0.12 ± 5 %
              parameter g_out  [kW/K] = 0.04
              parameter cooling [kW] = 1.2
              let door(t) = exp(-(t/6 [h])^2)
              let T_out(t) [K] = 288 [K] + 4 [K]*sin(2*pi*t/24 [h])
              state T_air  [K] = 277
              state T_wall [K] = 279 scale 10
              output q_wall [kW] = g_wall*(T_wall - T_air)
              C_air*T_air'   = q_wall + 0.6 [kW/K]*door(t)*(T_out(t) - T_air) - cooling
              C_wall*T_wall' = -q_wall + g_out*(T_out(t) - T_wall)
            }
            """);
    assertEquals(
        """
        M[T_air, T_air] = C_air
        M[T_wall, T_wall] = C_wall
        K[T_air, T_air] = -g_wall - 600*door(t)
        K[T_air, T_wall] = g_wall
        K[T_wall, T_air] = g_wall
        K[T_wall, T_wall] = -g_wall - g_out
        f[T_air] = 600*door(t)*T_out(t) - cooling
        f[T_wall] = g_out*T_out(t)
        """,
        equations(system));
    assertTrue(system.equations().orElseThrow().hasDiagonalMass());
    assertEquals(10, system.states().get(1).scale());
  }

  @Test
  void secondOrderWithCoupledDerivatives() {
    SystemModel system =
        system(
            """
            system Mast over t [s] from 0 to 10 {
              parameter m [kg] = 2
              parameter k [N/mm] = 3
              state x [mm] = 1
              state x' [mm/s] = 0
              state y [m] = 0
              state y' [m/s] = 0
              m*x'' + 0.5 [kg]*y'' + 3 [N.s/m]*x' + k*x = 1 [N]*sin(t*1 [/s])
              0.5 [kg]*x'' + m*y'' = -k*(y - x)
            }
            """);
    assertEquals(
        """
        M[x, x] = 1
        M[x', x'] = m
        M[x', y'] = 0.5
        M[y, y] = 1
        M[y', x'] = 0.5
        M[y', y'] = m
        K[x, x'] = 1
        K[x', x] = -k
        K[x', x'] = -3
        K[y, y'] = 1
        K[y', x] = k
        K[y', y] = -k
        f[x'] = sin(t)
        """,
        equations(system));
    assertFalse(system.equations().orElseThrow().hasDiagonalMass());
  }

  @Test
  void equationsFindTheirStatesWhateverTheirOrder() {
    SystemModel system =
        system(
            """
            system S over t from 0 to 1 {
              state a = 1; state b = 2; state c = 3
              a' + b' = c
              b' + c' = a
              a' = b
            }
            """);
    assertEquals(
        """
        M[a, a] = 1
        M[b, a] = 1
        M[b, b] = 1
        M[c, b] = 1
        M[c, c] = 1
        K[a, b] = 1
        K[b, c] = 1
        K[c, a] = 1
        """,
        equations(system));
  }

  @Test
  void derivativesMayStandOnTheRight() {
    SystemModel system =
        system("system S over t from 0 to 1 { state x = 1\n 3 = 2*x' + x - x'*t }");
    assertEquals(
        """
        M[x, x] = t - 2
        K[x, x] = 1
        f[x] = -3
        """,
        equations(system));
  }

  @Test
  void mixedOrders() {
    SystemModel system =
        system(
            """
            system S over t [s] from 0 to 1 {
              state u [m] = 1; state u' [m/s] = 0; state u'' [m/s2] = 0
              state v [m] = 2
              u''' = -v/1 [s3]
              v' = u' + u''*1 [s]
            }
            """);
    assertEquals(
        List.of("u", "u'", "u''", "v"),
        system.states().stream().map(StateComponent::label).toList());
    assertEquals(
        """
        M[u, u] = 1
        M[u', u'] = 1
        M[u'', u''] = 1
        M[v, v] = 1
        K[u, u'] = 1
        K[u', u''] = 1
        K[u'', v] = -1
        K[v, u'] = 1
        K[v, u''] = 1
        """,
        equations(system));
  }

  @Test
  void outputsStandForTheirExpressions() {
    SystemModel system =
        system(
            """
            system S over t from 0 to 1 {
              state x = 1; state y = 2
              output total = x + y
              output twice = 2*total - 3
              x' = twice
              y' = total - x
            }
            """);
    assertEquals(
        """
        M[x, x] = 1
        M[y, y] = 1
        K[x, x] = 2
        K[x, y] = 2
        K[y, y] = 1
        f[x] = -3
        """,
        equations(system));
  }

  @Test
  void anInputIsAFunctionOfTimeInItsDeclaredUnit() {
    SystemModel system =
        system(
            """
            system Store over t [h] from 0 to 48 {
              input cooling(t) [kW] = 1.2
              input gain(t) = 1 + t/24 [h]
              state heat [kJ] = 0
              heat' = -gain(t)*cooling(t)
            }
            """);
    assertEquals("M[heat, heat] = 1\nf[heat] = (-gain(t))*cooling(t)\n", equations(system));
    Let cooling = system.lets().getFirst();
    assertTrue(cooling.isInput() && cooling.dependsOnTime());
    assertEquals(new Term.Constant(1200), cooling.value());
    assertEquals("kW", cooling.unit().code());
  }

  @Test
  void structuralZerosAreLeftOut() {
    SystemModel system =
        system(
            "system S over t from 0 to 1 { state x = 1; state y = 1\n x' = 0*y + x - x + 2*(y - y)\n y' = 0 }");
    assertEquals("M[x, x] = 1\nM[y, y] = 1\n", equations(system));
  }

  @Test
  void everyEntryKnowsItsPlace() {
    String text =
        "system S over t from 0 to 1 {\n state x = 1; state y = 1\n output q = x - y\n 2*x' = -3*x + q\n y' = 1 + t\n}";
    SystemModel system = system(text);
    LinearForm form = system.equations().orElseThrow();
    assertEquals(
        List.of("2*x'", "y'"),
        form.mass().stream().map(e -> slice(text, e.sources().getFirst())).toList());
    assertEquals(
        List.of("-3*x", "q"),
        form.matrix().stream().map(e -> slice(text, e.sources().getFirst())).toList());
    assertEquals(
        List.of("1"),
        form.forcing().stream().map(e -> slice(text, e.sources().getFirst())).toList());
  }

  private static String slice(String text, Span span) {
    return text.substring(span.start(), span.end());
  }

  /**
   * What an equation says must survive its way into the linear form: for random values of the
   * components and of time, M x' - K x - f is left minus right, computed here from the text by
   * plain arithmetic.
   */
  @Test
  void agreesWithTheTextAtRandomValues() {
    Random random = new Random(20260101);
    for (int round = 0; round < 200; round++) {
      double[] a = random.doubles(8, -3, 3).map(v -> Math.rint(v * 8) / 8).toArray();
      String text =
          String.format(
              Locale.ROOT,
              """
              system S over t from 0 to 1 {
                parameter p = (%s)
                state x = 1; state y = 1
                x' + (%s)*y' - (%s)*t*(x - (y + p*x)/4)/2 = (%s) - (%s)*x'
                y' = -((%s)*(x - 2*(y - (%s)*t))) + p*(%s)
              }
              """,
              a[0],
              4 + a[1],
              a[2],
              a[3],
              a[4] / 8,
              a[5],
              a[6],
              a[7]);
      LinearForm form = system(text).equations().orElseThrow();
      double t = random.nextDouble();
      double[] x = {random.nextGaussian(), random.nextGaussian()};
      double[] rate = {random.nextGaussian(), random.nextGaussian()};
      double p = a[0];
      double[] expected = {
        rate[0]
            + (4 + a[1]) * rate[1]
            - a[2] * t * (x[0] - (x[1] + p * x[0]) / 4) / 2
            - a[3]
            + a[4] / 8 * rate[0],
        rate[1] + a[5] * (x[0] - 2 * (x[1] - a[6] * t)) - p * a[7]
      };
      double[] found = residual(form, t, x, rate);
      for (int row = 0; row < 2; row++) {
        assertEquals(Math.abs(expected[row]), Math.abs(found[row]), 1e-12, text);
      }
    }
  }

  private static double[] residual(LinearForm form, double t, double[] x, double[] rate) {
    double[] sum = new double[form.dimension()];
    form.mass().forEach(e -> sum[e.row()] += at(e.term(), t) * rate[e.column()]);
    form.matrix().forEach(e -> sum[e.row()] -= at(e.term(), t) * x[e.column()]);
    form.forcing().forEach(e -> sum[e.row()] -= at(e.term(), t));
    return sum;
  }

  private static double at(Term term, double t) {
    return TermEvaluator.of(term, Map.of()).at(t);
  }
}
