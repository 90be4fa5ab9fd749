/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.requirement;

import java.util.OptionalDouble;
import org.spanloom.analysis.Figures;
import org.spanloom.analysis.coefficients.AffineEvaluator.Estimate;
import org.spanloom.analysis.requirement.RequirementResult.Status;
import org.spanloom.language.model.Relation;
import org.spanloom.language.model.Requirement;
import org.spanloom.language.model.SystemModel;
import org.spanloom.language.units.UnitOfMeasure;

/**
 * Judges a comparison by its margin: how far the value is on the good side of its limit.
 *
 * <p>It holds when the margin exceeds its estimated error, it fails when it is negative by more
 * than that, and between them nobody knows.
 */
final class Margins {

  private Margins() {}

  /** Returns the status for a margin and its error. */
  static Status status(Relation relation, double margin, double error) {
    boolean strict = relation == Relation.LESS || relation == Relation.GREATER;
    if (Double.isNaN(margin)) {
      return Status.UNDECIDED;
    }
    if (margin > error || !strict && margin >= error) {
      return Status.HELD;
    }
    return margin < -error || strict && margin <= -error ? Status.FAILED : Status.UNDECIDED;
  }

  /** Returns the margin of a value. */
  static double margin(Relation relation, double value, double limit) {
    return relation.isUpperLimit() ? limit - value : value - limit;
  }

  /** Returns the result of a comparison of two values, shown in a unit. */
  static RequirementResult compared(
      SystemModel system,
      Requirement requirement,
      Relation relation,
      Estimate left,
      Estimate right,
      UnitOfMeasure unit,
      OptionalDouble time) {
    double margin = margin(relation, left.value(), right.value()) / unit.factor();
    double error = (left.error() + right.error()) / unit.factor();
    Status status = status(relation, margin, error);
    double value = unit.fromBase(left.value());
    double limit = unit.fromBase(right.value());
    String at = time.isPresent() ? " at " + Figures.at(system, time.getAsDouble()) : "";
    String detail =
        "%s%s, margin %s with an estimated error of %s"
            .formatted(
                Figures.text(value, 7, unit.code()),
                at,
                Figures.text(margin, 3, unit.code()),
                Figures.text(error, 1, unit.code()));
    return new RequirementResult(
        system.name(),
        requirement.text(),
        status,
        value,
        limit,
        margin,
        error,
        unit.code(),
        time,
        detail,
        requirement.span());
  }

  /** Returns a result without numbers. */
  static RequirementResult plain(
      SystemModel system, Requirement requirement, Status status, String detail) {
    return new RequirementResult(
        system.name(),
        requirement.text(),
        status,
        Double.NaN,
        Double.NaN,
        Double.NaN,
        Double.NaN,
        "1",
        OptionalDouble.empty(),
        detail,
        requirement.span());
  }
}
