/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.boundary;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import org.spanloom.analysis.Figures;
import org.spanloom.analysis.coefficients.CompiledSystem;
import org.spanloom.language.model.Boundary;
import org.spanloom.language.model.StateComponent;
import org.spanloom.language.text.Span;
import org.spanloom.numerics.boundary.BoundaryAnswer;
import org.spanloom.numerics.boundary.BoundaryAnswer.NullSolution;

/** Says in words what is known of a boundary-value problem. */
final class BoundaryMessages {

  private static final double DIGITS = 15.95;
  private static final int STATES_SHOWN = 4;

  private BoundaryMessages() {}

  static BoundaryReport report(CompiledSystem system, Boundary boundary, BoundaryAnswer answer) {
    return switch (answer) {
      case BoundaryAnswer.Unique unique -> {
        double toConditions = unique.conditioning().toConditions();
        double toForcing = unique.conditioning().toForcing();
        double left = Math.max(0, DIGITS - Math.log10(Math.max(1, toConditions)));
        yield new BoundaryReport(
            boundary.name(),
            BoundaryReport.Verdict.UNIQUE,
            toConditions,
            toForcing,
            left,
            "one solution; it changes by at most %s times a change of the conditions; %s digits left"
                .formatted(Figures.text(toConditions, 3), Figures.text(left, 3)),
            boundary.span());
      }
      case BoundaryAnswer.None none ->
          without(
              boundary,
              BoundaryReport.Verdict.NONE,
              "no solution meets all conditions; without forcing and with right sides 0 they leave %s open, and the right sides do not fit that (by a relative %s)"
                  .formatted(
                      directions(system, none.directions()), Figures.text(none.mismatch(), 2)));
      case BoundaryAnswer.Family family ->
          without(
              boundary,
              BoundaryReport.Verdict.FAMILY,
              "infinitely many solutions meet the conditions, which leave %s open"
                  .formatted(directions(system, family.directions())));
    };
  }

  static BoundaryReport unknown(Boundary boundary, String reason) {
    return without(boundary, BoundaryReport.Verdict.UNKNOWN, reason);
  }

  private static BoundaryReport without(
      Boundary boundary, BoundaryReport.Verdict verdict, String detail) {
    Span span = boundary.span();
    return new BoundaryReport(
        boundary.name(), verdict, Double.NaN, Double.NaN, Double.NaN, detail, span);
  }

  private static String directions(CompiledSystem system, List<NullSolution> directions) {
    List<String> texts = new ArrayList<>();
    for (NullSolution direction : directions.subList(0, Math.min(2, directions.size()))) {
      texts.add(direction(system, direction));
    }
    String more =
        directions.size() > 2 ? " and " + (directions.size() - 2) + " more directions" : "";
    return "the direction " + String.join(", and ", texts) + more;
  }

  private static String direction(CompiledSystem system, NullSolution direction) {
    List<StateComponent> states = system.model().states();
    double[] values = direction.values();
    List<Integer> largest =
        IntStream.range(0, values.length)
            .boxed()
            .filter(i -> Math.abs(values[i]) > 1e-9 * states.get(i).scale())
            .sorted(
                Comparator.comparingDouble(
                    (Integer i) -> -Math.abs(values[i]) / states.get(i).scale()))
            .toList();
    String shown =
        largest.stream()
            .limit(STATES_SHOWN)
            .map(i ->
                states.get(i).label()
                    + " = "
                    + Figures.text(values[i], 4, states.get(i).unit().code()))
            .collect(Collectors.joining(", "));
    return shown
        + (largest.size() > STATES_SHOWN
            ? " and " + (largest.size() - STATES_SHOWN) + " more states"
            : "")
        + " at "
        + Figures.at(system.model(), direction.time());
  }
}
