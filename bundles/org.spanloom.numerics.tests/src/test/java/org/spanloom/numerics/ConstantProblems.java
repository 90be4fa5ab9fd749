/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics;

import static org.spanloom.numerics.ReferenceProblems.component;
import static org.spanloom.numerics.ReferenceProblems.driven;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/** Constant coefficients: exponentials, decay chains, compartments, circuits, methods of lines. */
final class ConstantProblems {

  /** Moler and Van Loan's example of cancellation, eigenvalues -1 and -17. */
  static final double[] MOLER_VAN_LOAN = {-49, 24, -64, 31};

  /** Ward's first test, eigenvalues 3, 3, 6, defective. */
  static final double[] WARD_1 = {4, 2, 0, 1, 4, 1, 1, 1, 4};

  /** Ward's third test, eigenvalues -1, -2, -20. */
  static final double[] WARD_3 = {-131, 19, 18, -390, 56, 54, -387, 57, 52};

  /** Two compartments, k10 = 0.2, k12 = 0.5, k21 = 0.3 per hour. */
  static final double[] COMPARTMENTS = {-0.7, 0.3, 0.5, -0.3};

  private ConstantProblems() {}

  static List<ReferenceProblem> all() {
    List<ReferenceProblem> all = new ArrayList<>();
    addExponentials(all);
    addDecay(all);
    addCompartments(all);
    addCircuits(all);
    addTestSets(all);
    return all;
  }

  /** One entry of exp(A), rows and columns counted from 1. */
  private static ReferenceProblem entry(
      String name, String source, double[] a, int row, int column, double exact) {
    int n = (int) Math.sqrt(a.length);
    double[] unit = new double[n];
    unit[column - 1] = 1;
    return component(
        name + " entry " + row + "," + column,
        source,
        FormulaSystem.constant(n, a),
        0,
        unit,
        1,
        row - 1,
        exact);
  }

  private static void addExponentials(List<ReferenceProblem> all) {
    String moler = "Moler and Van Loan, SIAM Rev. 20 (1978) 801, method 1; recomputed";
    String ward = "Ward, SIAM J. Numer. Anal. 14 (1977) 600; from memory, recomputed";
    double[] a = MOLER_VAN_LOAN;
    all.add(entry("Moler-Van Loan", moler, a, 1, 1, -0.735758758144753079636047750792));
    all.add(entry("Moler-Van Loan", moler, a, 1, 2, 0.551819099658097700615785760477));
    all.add(entry("Moler-Van Loan", moler, a, 2, 1, -1.4715175990882605349754286946));
    all.add(entry("Moler-Van Loan", moler, a, 2, 2, 1.10363824071557258908323811746));
    all.add(entry("Ward 1", ward, WARD_1, 1, 1, 147.866622446370152696748079951));
    all.add(entry("Ward 1", ward, WARD_1, 2, 2, 183.765138646368425101711753498));
    all.add(entry("Ward 1", ward, WARD_1, 3, 1, 127.781085523182484955819550296));
    all.add(entry("Ward 3", ward, WARD_3, 1, 1, -1.50964415879608968339866499964));
    all.add(entry("Ward 3", ward, WARD_3, 3, 3, 0.541341126762989900260324495992));
  }

  private static void addDecay(List<ReferenceProblem> all) {
    double day = 86400;
    double year = 365.25 * day;
    double[] halfLives = {
      1600 * year,
      3.82 * day,
      3.05 * 60,
      26.8 * 60,
      19.9 * 60,
      1.64e-4,
      22.3 * year,
      5.01 * day,
      138.4 * day
    };
    String bateman =
        "Bateman, Proc. Camb. Phil. Soc. 15 (1910) 423; half-lives OpenStax Chemistry,"
            + " appendix M (Bi-214, Po-214 from memory); recomputed";
    LinearSystem radium = chain(halfLives);
    double[] start = new double[9];
    start[0] = 1;
    double t = 30 * day;
    double[] exact = {0, 0.00000650816408461453447267609764423, 0, 0, 0, 0, 0, 0, 0};
    exact[5] = 3.23376227861396373086436635448e-15;
    exact[6] = 0.0000289832094947314470917468361777;
    exact[8] = 0.0000000181098567148968478348693935751;
    String[] names = {"", "Rn-222", "", "", "", "Po-214", "Pb-210", "", "Po-210"};
    for (int i = 0; i < 9; i++) {
      if (exact[i] != 0) {
        all.add(
            component(
                names[i] + " from Ra-226 after 30 d", bateman, radium, 0, start, t, i, exact[i]));
      }
    }
    double strontium = 28.79 * 365.25;
    double yttrium = 64.0 / 24;
    double[] weights = {0, strontium / yttrium * Math.pow(2, 30 / strontium)};
    all.add(
        new ReferenceProblem(
            "Y-90 per Sr-90 activity after 30 d",
            "Bateman 1910; half-lives as in NUBASE, from memory; recomputed",
            chain(new double[] {strontium, yttrium}),
            false,
            0,
            new double[] {1, 0},
            30,
            weights,
            0.999842146022401130210099638204));
  }

  /** A decay chain with these half-lives. */
  static LinearSystem chain(double[] halfLives) {
    int n = halfLives.length;
    double[] a = new double[n * n];
    for (int i = 0; i < n; i++) {
      double rate = Math.log(2) / halfLives[i];
      a[i * n + i] = -rate;
      if (i + 1 < n) {
        a[(i + 1) * n + i] = rate;
      }
    }
    return FormulaSystem.constant(n, a);
  }

  private static void addCompartments(List<ReferenceProblem> all) {
    String gibaldi = "Gibaldi and Perrier, Pharmacokinetics, 2nd ed. 1982, chapter 2; recomputed";
    all.add(
        component(
            "two compartments, bolus",
            gibaldi,
            FormulaSystem.constant(2, COMPARTMENTS),
            0,
            new double[] {1, 0},
            4,
            0,
            0.226643451993479200238249545956));
    all.add(
        driven(
            component(
                "two compartments, infusion",
                gibaldi,
                FormulaSystem.forced(2, COMPARTMENTS, new double[] {1, 0}),
                0,
                new double[] {0, 0},
                6,
                0,
                2.12426481852679193577636021265)));
  }

  private static void addCircuits(List<ReferenceProblem> all) {
    double[] rest = {0, 0};
    all.add(
        driven(
            component(
                "peak of a step response, damping 0.5",
                "Ogata, Modern Control Engineering; from memory",
                FormulaSystem.forced(2, new double[] {0, 1, -1, -1}, new double[] {0, 1}),
                0,
                rest,
                Math.PI / Math.sqrt(0.75),
                0,
                1.16303353482158046486164035611)));
    String nilsson = "Nilsson and Riedel, Electric Circuits; recomputed";
    all.add(
        driven(
            component(
                "RLC step, underdamped",
                nilsson,
                FormulaSystem.forced(2, new double[] {0, 4, -1, -2}, new double[] {0, 1}),
                0,
                rest,
                1,
                0,
                0.849425634854112386226590343662)));
    all.add(
        driven(
            component(
                "RLC step, critically damped",
                nilsson,
                FormulaSystem.forced(2, new double[] {0, 4, -1, -4}, new double[] {0, 1}),
                0,
                rest,
                1,
                0,
                0.593994150290161924318001515083)));
  }

  /** A matrix with equal entries on each of the three middle diagonals. */
  static double[] tridiagonal(int n, double below, double middle, double above) {
    double[] a = new double[n * n];
    for (int i = 0; i < n; i++) {
      a[i * n + i] = middle;
      if (i > 0) {
        a[i * n + i - 1] = below;
        a[(i - 1) * n + i] = above;
      }
    }
    return a;
  }

  private static double[] unit(int n) {
    double[] x = new double[n];
    x[0] = 1;
    return x;
  }

  private static void addTestSets(List<ReferenceProblem> all) {
    double[] sine = new double[9];
    for (int i = 0; i < 9; i++) {
      sine[i] = Math.sin(Math.PI * (i + 1) / 10);
    }
    all.add(
        component(
            "heat equation on 9 points",
            "LeVeque, Finite Difference Methods, 2007, eq. 2.23; from memory",
            FormulaSystem.constant(9, tridiagonal(9, 100, -200, 100)),
            0,
            sine,
            0.1,
            4,
            0.375735562554107993882738404837));
    double[] chain = tridiagonal(10, 1, -1, 0);
    chain[99] = 0;
    String detest =
        "Hull, Enright, Fellen and Sedgwick, SIAM J. Numer. Anal. 9 (1972) 603; from memory";
    all.add(
        component(
            "nonstiff test C1",
            detest,
            FormulaSystem.constant(10, chain),
            0,
            unit(10),
            20,
            8,
            0.00130866896662765576378789865407));
    all.add(
        component(
            "nonstiff test C3",
            detest,
            FormulaSystem.constant(10, tridiagonal(10, 1, -2, 1)),
            0,
            unit(10),
            20,
            0,
            0.00294811921102269941257072771244));
    all.add(
        component(
            "nonstiff test B2",
            detest,
            FormulaSystem.constant(3, -1, 1, 0, 1, -2, 1, 0, 1, -1),
            0,
            new double[] {2, 0, 1},
            20,
            0,
            1.00000000103057681121927891836));
    String stiff = "Enright, Hull and Lindberg, BIT 15 (1975) 10; from memory";
    all.add(
        component(
            "stiff test B1",
            stiff,
            FormulaSystem.constant(
                4, -1, 1, 0, 0, -100, -1, 0, 0, 0, 0, -100, 1, 0, 0, -10000, -100),
            0,
            new double[] {1, 0, 1, 0},
            20,
            0,
            0.00000000100416864114810907606594491156));
    double[] b5 = new double[36];
    double[] diagonal = {-10, -10, -4, -1, -0.5, -0.1};
    for (int i = 0; i < 6; i++) {
      b5[i * 7] = diagonal[i];
    }
    b5[1] = 100;
    b5[6] = -100;
    double[] ones = new double[6];
    Arrays.fill(ones, 1);
    all.add(
        component(
            "stiff test B5",
            stiff,
            FormulaSystem.constant(6, b5),
            0,
            ones,
            20,
            5,
            0.135335283236612691893999494972));
  }
}
