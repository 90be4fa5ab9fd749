/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.solve;

import org.spanloom.analysis.Figures;
import org.spanloom.analysis.coefficients.CompiledSystem;
import org.spanloom.language.model.Corners;
import org.spanloom.language.model.Term;
import org.spanloom.language.model.TermPrinter;
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

  /** Returns why corners and jumps of coefficients may be missing, and what to do. */
  public static String text(CompiledSystem system, Corners.Gap gap) {
    String name = system.model().name();
    return switch (gap) {
      case Corners.Untraced(Term term, double time) ->
          "%s: from %s on, the times at which \"%s\" changes its sign could not all be found, so steps may cross them; write the condition more simply"
              .formatted(
                  name,
                  Figures.at(system.model(), time),
                  TermPrinter.text(term, system.model().timeName()));
      case Corners.TooMany m ->
          "%s: the coefficients have more than %s corners and jumps inside the interval, and each ends a step; shorten the interval, or take the mean of what changes so fast"
              .formatted(name, Figures.text(Corners.LIMIT, 3));
    };
  }
}
