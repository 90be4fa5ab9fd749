/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.solve;

import org.spanloom.analysis.Figures;
import org.spanloom.analysis.coefficients.CompiledSystem;
import org.spanloom.numerics.Outcome;

/** Says in words why the numerics have no result. */
public final class Refusals {

  private Refusals() {}

  /** Returns one sentence or two: what happened, where, and what to do. */
  public static String text(CompiledSystem system, Outcome.Unsolved<?> unsolved) {
    String place =
        "%s: at %s ".formatted(system.model().name(), Figures.at(system.model(), unsolved.time()));
    String what =
        switch (unsolved.reason()) {
          case COEFFICIENT_NOT_FINITE ->
              "a coefficient is not a finite number; look at divisions, logarithms and powers"
                  + " there";
          case OVERFLOW ->
              "the solution grows beyond the largest floating point number; end the range earlier";
          case STEP_TOO_SMALL ->
              "the steps become too small to go on; a coefficient is probably unbounded there";
          case TOO_MUCH_WORK ->
              "the work limit was reached; ask for a shorter range or a larger relative error";
          case JUMP_SINGULAR ->
              "a jump takes place that cannot be undone, and the values are given behind it; give"
                  + " them before it";
          case RANGE -> "the range asked for is not inside the interval of the system";
          case METHOD ->
              "the method asked for does not apply; leave the method out and it is chosen by the"
                  + " system";
        };
    return place + what + (unsolved.detail().isEmpty() ? "" : " (" + unsolved.detail() + ")") + ".";
  }
}
