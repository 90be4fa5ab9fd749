/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics;

import static java.lang.Math.PI;
import static java.lang.Math.cos;
import static java.lang.Math.sin;

import java.util.Arrays;
import java.util.List;
import java.util.function.DoubleUnaryOperator;
import java.util.stream.Stream;

/**
 * Problems with published answers.
 *
 * <p>The answers were recomputed in 50-digit arithmetic by two routes each; "from memory" marks a
 * source of which the number, not the printed page, was checked. Start values without another
 * source are the same function at the start, also from 50-digit arithmetic.
 */
public final class ReferenceProblems {

  private ReferenceProblems() {}

  /** Returns all of them. */
  public static List<ReferenceProblem> all() {
    return Stream.of(
            SpecialFunctionProblems.all(),
            PeriodicProblems.all(),
            ConstantProblems.all(),
            EulerProblems.all())
        .flatMap(List::stream)
        .toList();
  }

  /** Returns x'' = p(t) x + q(t) x' as a system for (x, x'). */
  static LinearSystem secondOrder(
      TimeRange range, DoubleUnaryOperator p, DoubleUnaryOperator q, double... jumps) {
    return FormulaSystem.varying(
        2,
        range,
        (t, side, a) -> {
          a[0] = 0;
          a[1] = 1;
          a[2] = p.applyAsDouble(t);
          a[3] = q.applyAsDouble(t);
        },
        jumps);
  }

  /** A homogeneous problem of which one component is known. */
  static ReferenceProblem component(
      String name,
      String source,
      LinearSystem system,
      double t0,
      double[] x0,
      double end,
      int component,
      double exact) {
    double[] weights = new double[x0.length];
    weights[component] = 1;
    return new ReferenceProblem(name, source, system, false, t0, x0, end, weights, exact);
  }

  /** The same with forcing. */
  static ReferenceProblem driven(ReferenceProblem p) {
    return new ReferenceProblem(
        p.name(), p.source(), p.system(), true, p.t0(), p.x0(), p.end(), p.weights(), p.exact());
  }

  /** A problem of which the trace of the monodromy matrix over a period from 0 is known. */
  static ReferenceProblem trace(
      String name, String source, LinearSystem system, double period, double exact) {
    double[] identity = {1, 0, 0, 1};
    return new ReferenceProblem(name, source, system, false, 0, identity, period, identity, exact);
  }

  /** Euler's equations and others that are solved by elementary functions. */
  static final class EulerProblems {

    private static final TimeRange POSITIVE = new TimeRange(1e-3, Double.POSITIVE_INFINITY);

    private EulerProblems() {}

    static List<ReferenceProblem> all() {
      double[] oscillator = {0, 1, -1, 0};
      LinearSystem resonant =
          FormulaSystem.driven(
              2,
              oscillator,
              (t, side, b) -> {
                b[0] = 0;
                b[1] = cos(t);
              });
      LinearSystem commuting =
          FormulaSystem.varying(
              2,
              FormulaSystem.ALWAYS,
              (t, side, a) -> {
                Arrays.fill(a, 0);
                a[1] = t;
                a[2] = -t;
              });
      return List.of(
          component(
              "t^2 x'' + t x' + x = 0, x(e) = cos 1",
              "Boyce and DiPrima, Elementary Differential Equations, Euler equations; from memory",
              secondOrder(POSITIVE, t -> -1 / (t * t), t -> -1 / t),
              1,
              new double[] {1, 0},
              Math.E,
              0,
              0.540302305868139717400936607443),
          component(
              "t^2 x'' - 2 t x' + 2 x = 0, x = t",
              "Coddington and Levinson 1955, chapter 4; from memory",
              secondOrder(POSITIVE, t -> -2 / (t * t), t -> 2 / t),
              1,
              new double[] {1, 1},
              3,
              0,
              3),
          component(
              "sqrt(5) J0(5)",
              "DLMF 10.13, Liouville normal form",
              secondOrder(POSITIVE, t -> -1 - 1 / (4 * t * t), t -> 0),
              1,
              new double[] {0.7651976865579665514497, -0.05745174246595024023482},
              5,
              0,
              -0.397118453243345119714136928286),
          component(
              "commuting coefficients, cos(9/2)",
              "exponential of the integral (Lappo-Danilevskii); recomputed",
              commuting,
              0,
              new double[] {1, 0},
              3,
              0,
              -0.210795799430779705980481824794),
          driven(
              component(
                  "resonance, 5 sin 10",
                  "secular growth (t/2) sin t, textbook result; recomputed",
                  resonant,
                  0,
                  new double[] {0, 0},
                  10,
                  0,
                  -2.72010555444684906702373830926)));
    }
  }

  /** Periodic coefficients. */
  static final class PeriodicProblems {

    private static final String MATHIEU =
        "Abramowitz and Stegun, Table 20.1; DLMF 28.2(v): a multiplier is +1 or -1 there";

    private PeriodicProblems() {}

    private static ReferenceProblem mathieu(String name, double a, double q, double trace) {
      return trace(
          "Mathieu trace at " + name,
          MATHIEU,
          secondOrder(FormulaSystem.ALWAYS, t -> 2 * q * cos(2 * t) - a, t -> 0),
          PI,
          trace);
    }

    static LinearSystem meissner() {
      return FormulaSystem.varying(
          2,
          FormulaSystem.ALWAYS,
          (t, side, a) -> {
            boolean early = t < PI || t == PI && side == Side.BEFORE;
            a[0] = 0;
            a[1] = 1;
            a[2] = early ? -2.5 : -0.5;
            a[3] = 0;
          },
          PI);
    }

    static LinearSystem markusYamabe() {
      return FormulaSystem.varying(
          2,
          FormulaSystem.ALWAYS,
          (t, side, a) -> {
            a[0] = -1 + 1.5 * cos(t) * cos(t);
            a[1] = 1 - 1.5 * sin(t) * cos(t);
            a[2] = -1 - 1.5 * sin(t) * cos(t);
            a[3] = -1 + 1.5 * sin(t) * sin(t);
          });
    }

    static List<ReferenceProblem> all() {
      String markus = "Markus and Yamabe, Osaka Math. J. 12 (1960) 305; from memory";
      return List.of(
          mathieu("a0(5)", -5.80004602085150841910347251431, 5, 2),
          mathieu("b1(5)", -5.79008059863777104381949902133, 5, -2),
          mathieu("a1(5)", 1.85818754154775088515437312729, 5, -2),
          mathieu("a2(5)", 7.44910973952917781248101626596, 5, 2),
          mathieu("a10(10)", 100.506770024681279312859080745, 10, 2),
          trace(
              "Mathieu trace at a=1, q=0.2",
              "DLMF 28.2.16, -2 cosh(pi kappa) with kappa = 0.09953643727...",
              secondOrder(FormulaSystem.ALWAYS, t -> 0.4 * cos(2 * t) - 1, t -> 0),
              PI,
              -2 * Math.cosh(PI * 0.0995364372755134474157851544919)),
          trace(
              "Meissner trace",
              "Meissner, Schweiz. Bauzeitung 72 (1918) 95; Magnus and Winkler 1966; recomputed",
              meissner(),
              2 * PI,
              1.76062004874239947302322333025),
          component(
              "Markus-Yamabe e^pi",
              markus,
              markusYamabe(),
              0,
              new double[] {1, 0},
              2 * PI,
              0,
              23.1406926327792690057290863679),
          component(
              "Markus-Yamabe e^-2pi",
              markus,
              markusYamabe(),
              0,
              new double[] {0, 1},
              2 * PI,
              1,
              0.00186744273170798881443021293483));
    }
  }
}
