/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis;

import java.util.LinkedHashMap;
import java.util.SequencedMap;
import org.spanloom.analysis.coefficients.CompiledSystem;
import org.spanloom.numerics.Side;
import org.spanloom.numerics.solution.Solution;

/**
 * The largest estimated error of a trajectory, relative to the larger of the value and the scale of
 * its state.
 *
 * @param relative the error
 * @param component in which component
 * @param time when
 */
public record Reached(double relative, int component, double time) {

  /** Returns the worst one at the steps of the method. */
  public static Reached worst(CompiledSystem system, Solution solution) {
    int n = system.dimension();
    double[] x = new double[n];
    double[] e = new double[n];
    Reached worst = new Reached(0, 0, solution.startTime());
    for (double t : solution.nodes()) {
      solution.value(t, Side.AFTER, x);
      solution.errorEstimate(t, e);
      for (int i = 0; i < n; i++) {
        double scale = system.model().states().get(i).scale();
        double relative = e[i] / Math.max(Math.abs(x[i]), scale);
        if (relative > worst.relative()) {
          worst = new Reached(relative, i, t);
        }
      }
    }
    return worst;
  }

  /**
   * Returns the finding that the accuracy asked for was not reached.
   *
   * @param whose which solution, as " of NAME"; empty for the only one
   */
  public Finding finding(CompiledSystem system, double asked, String whose) {
    SequencedMap<String, Double> numbers = new LinkedHashMap<>();
    numbers.put("asked", asked);
    numbers.put("reached", relative);
    numbers.put("time", time);
    String label = system.model().states().get(component).label();
    return FindingKind.ACCURACY_NOT_REACHED.at(
        system.model().accuracySpan(),
        "the solution%s is known to a relative %s only, at %s in %s, not to the %s asked for; ask for less, give %s a larger scale, or shorten the interval"
            .formatted(
                whose,
                Figures.text(relative, 2),
                Figures.at(system.model(), time),
                label,
                Figures.text(asked, 2),
                label),
        numbers);
  }
}
