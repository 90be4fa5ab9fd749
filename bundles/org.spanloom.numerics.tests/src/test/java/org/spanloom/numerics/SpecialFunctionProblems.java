/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics;

import static org.spanloom.numerics.ReferenceProblems.component;
import static org.spanloom.numerics.ReferenceProblems.driven;
import static org.spanloom.numerics.ReferenceProblems.secondOrder;

import java.util.List;

/** Special functions as solutions of their equations. */
final class SpecialFunctionProblems {

  private static final TimeRange POSITIVE = new TimeRange(1e-3, Double.POSITIVE_INFINITY);
  private static final TimeRange INSIDE_ONE = new TimeRange(-0.99, 0.99);

  private static final double[] AI = {
    0.355028053887817239260063186004, -0.258819403792806798405183560189
  };
  private static final double[] BI = {
    0.614926627446000735150922369094, 0.448288357353826357914823710399
  };

  private SpecialFunctionProblems() {}

  static LinearSystem airy() {
    return secondOrder(FormulaSystem.ALWAYS, t -> t, t -> 0);
  }

  static LinearSystem bessel() {
    return secondOrder(POSITIVE, t -> -1, t -> -1 / t);
  }

  static LinearSystem legendre() {
    return secondOrder(INSIDE_ONE, t -> -110 / (1 - t * t), t -> 2 * t / (1 - t * t));
  }

  static List<ReferenceProblem> all() {
    String airyTable =
        "Abramowitz and Stegun, Table 10.11; start values DLMF 9.2.3 to 9.2.6; from memory";
    String besselTable = "Abramowitz and Stegun, Table 9.1; from memory";
    LinearSystem scorer =
        new FormulaSystem(
            2,
            FormulaSystem.ALWAYS,
            airy()::matrix,
            (t, side, b) -> {
              b[0] = 0;
              b[1] = 1 / Math.PI;
            },
            false,
            true);
    double[] onlyMinusOne = {-1, 0};
    return List.of(
        component("Ai(1)", airyTable, airy(), 0, AI, 1, 0, 0.135292416312881415524147423515),
        component("Ai'(1)", airyTable, airy(), 0, AI, 1, 1, -0.159147441296793212787500252497),
        component("Bi(1)", airyTable, airy(), 0, BI, 1, 0, 1.20742359495287125943637881703),
        component(
            "Ai(-10), backward",
            "DLMF 9.2; recomputed",
            airy(),
            0,
            AI,
            -10,
            0,
            0.04024123848644319),
        component(
            "Bi(0) from -10",
            "DLMF 9.2.5; start values recomputed",
            airy(),
            -10,
            new double[] {-0.3146798296438386331618, 0.1194141133999092382775},
            0,
            0,
            BI[0]),
        driven(
            component(
                "Hi(1)",
                "DLMF 9.12.1 and 9.12.6; recomputed",
                scorer,
                0,
                new double[] {2 * BI[0] / 3, 2 * BI[1] / 3},
                1,
                0,
                0.97220515514243332183768857101)),
        component(
            "J0(10)",
            besselTable,
            bessel(),
            1,
            new double[] {0.7651976865579665514497, -0.4400505857449335159597},
            10,
            0,
            -0.245935764451348335197760862485),
        component(
            "Y0(10)",
            besselTable,
            bessel(),
            1,
            new double[] {0.08825696421567695798293, 0.7812128213002887165471},
            10,
            0,
            0.0556711672835993914244598774102),
        component(
            "K0(5)",
            "DLMF 10.25; recomputed; decays while its companion I0 grows",
            secondOrder(POSITIVE, t -> 1, t -> -1 / t),
            1,
            new double[] {0.4210244382407083333356, -0.6019072301972345747375},
            5,
            0,
            0.00369109833404259427473526100746),
        component(
            "P10(0.9)",
            "DLMF 14.2.1 and 18.5, P10(0) = -63/256",
            legendre(),
            0,
            new double[] {-63 / 256.0, 0},
            0.9,
            0,
            -0.263145617855859375),
        component(
            "L5(4)",
            "DLMF 18.5.12, L5(1) = -7/15, L5'(1) = 19/24",
            secondOrder(POSITIVE, t -> -5 / t, t -> (t - 1) / t),
            1,
            new double[] {-7 / 15.0, 19 / 24.0},
            4,
            0,
            -0.866666666666666666666666666667),
        component(
            "T10(1/2)",
            "DLMF 18.5.1, cos(10 pi / 3)",
            secondOrder(INSIDE_ONE, t -> -100 / (1 - t * t), t -> t / (1 - t * t)),
            0,
            onlyMinusOne,
            0.5,
            0,
            -0.5),
        component(
            "U(3/4, 4)",
            "DLMF 12.2.2, 12.2.6, 12.2.7; decays while its companion grows",
            secondOrder(FormulaSystem.ALWAYS, t -> t * t / 4 + 0.75, t -> 0),
            0,
            new double[] {1.220390804736061311731, -1.133026136141394586477},
            4,
            0,
            0.00299995972685446364135798848984),
        component(
            "Coulomb F0(1, 10)",
            "DLMF 33.2.1; Abramowitz and Stegun, chapter 14; recomputed",
            secondOrder(POSITIVE, t -> 2 / t - 1, t -> 0),
            1,
            new double[] {0.2275262105105600292393, 0.3487344228583570006502},
            10,
            0,
            0.477560815862574043064572234314));
  }
}
