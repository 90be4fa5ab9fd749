/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.solution;

import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.SequencedSet;

/**
 * Which units the two value axes show.
 *
 * @param left unit of the axis at the left
 * @param right unit of the axis at the right, if there is one
 */
record PlotAxes(String left, Optional<String> right) {

  /** Returns the units of curves, in their order. */
  static List<String> units(List<Curve> curves) {
    SequencedSet<String> units = new LinkedHashSet<>();
    curves.forEach(c -> units.add(c.unit()));
    return List.copyOf(units);
  }

  /**
   * Returns axes for the units at hand, keeping those that are still among them.
   *
   * @param units units of the curves to show, in their order
   */
  PlotAxes keptFor(List<String> units) {
    String newLeft = units.contains(left) ? left : units.isEmpty() ? "" : units.getFirst();
    Optional<String> newRight =
        right
            .filter(u -> units.contains(u) && !u.equals(newLeft))
            .or(() -> units.stream().filter(u -> !u.equals(newLeft)).findFirst());
    return new PlotAxes(newLeft, newRight);
  }

  /** Tells whether curves of a unit are drawn. */
  boolean show(String unit) {
    return unit.equals(left) || isRight(unit);
  }

  /** Tells whether curves of a unit belong to the axis at the right. */
  boolean isRight(String unit) {
    return right.isPresent() && right.get().equals(unit);
  }
}
