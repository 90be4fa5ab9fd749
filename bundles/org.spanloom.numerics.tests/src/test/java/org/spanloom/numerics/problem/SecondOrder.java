/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.problem;

import java.util.function.DoubleUnaryOperator;

/** Scalar equations {@code x'' = p(t) x + q(t) x' + f(t)} as systems of (x, x'). */
public final class SecondOrder {

  private SecondOrder() {}

  /** Returns the system without forcing. */
  public static FormulaSystem of(
      double start, double end, DoubleUnaryOperator p, DoubleUnaryOperator q) {
    return of(start, end, p, q, t -> 0);
  }

  /** Returns the system. */
  public static FormulaSystem of(
      double start,
      double end,
      DoubleUnaryOperator p,
      DoubleUnaryOperator q,
      DoubleUnaryOperator f) {
    return FormulaSystem.forced(
        2,
        start,
        end,
        (t, a) -> {
          a[0] = 0;
          a[1] = 1;
          a[2] = p.applyAsDouble(t);
          a[3] = q.applyAsDouble(t);
        },
        (t, b) -> {
          b[0] = 0;
          b[1] = f.applyAsDouble(t);
        });
  }
}
