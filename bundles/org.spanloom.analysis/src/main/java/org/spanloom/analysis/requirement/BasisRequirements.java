/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.requirement;

import java.util.OptionalDouble;
import org.spanloom.analysis.Figures;
import org.spanloom.analysis.SystemSolutions;
import org.spanloom.analysis.basis.BasisProfiles;
import org.spanloom.analysis.coefficients.CompiledSystem;
import org.spanloom.analysis.requirement.RequirementResult.Status;
import org.spanloom.language.model.Requirement;
import org.spanloom.numerics.Outcome;
import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.basis.ConditionProfile;
import org.spanloom.numerics.basis.ConditionSample;
import org.spanloom.numerics.solution.Solution;

/** Requirements on the condition of a basis, worst over a range. */
final class BasisRequirements {

  private final SystemSolutions solutions;
  private final BasisProfiles profiles;

  BasisRequirements(SystemSolutions solutions, BasisProfiles profiles) {
    this.solutions = solutions;
    this.profiles = profiles;
  }

  RequirementResult condition(Requirement.Condition requirement) {
    return switch (profiles.of(requirement.basis())) {
      case BasisProfiles.Judged.Unfit unfit -> undecided(requirement, unfit.why());
      case BasisProfiles.Judged.Fit fit -> condition(requirement, fit);
    };
  }

  private RequirementResult undecided(Requirement requirement, String why) {
    return Margins.plain(solutions.system().model(), requirement, Status.UNDECIDED, why);
  }

  private RequirementResult condition(
      Requirement.Condition requirement, BasisProfiles.Judged.Fit fit) {
    if (requirement.until().isEmpty()) {
      return judged(requirement, fit.profile());
    }
    Solution solution = fit.solution();
    TimeRange whole = solution.range();
    double until = solutions.system().time(requirement.until().get());
    TimeRange range = new TimeRange(whole.start(), Math.clamp(until, whole.start(), whole.end()));
    return switch (ConditionProfile.of(
        solutions.system().linear(), solution, range, solutions.progress())) {
      case Outcome.Solved<ConditionProfile> s -> judged(requirement, s.value());
      case Outcome.Cancelled<ConditionProfile> c ->
          undecided(requirement, "the check was cancelled");
      case Outcome.Unsolved<ConditionProfile> u -> undecided(requirement, u.detail());
    };
  }

  private RequirementResult judged(Requirement.Condition requirement, ConditionProfile profile) {
    CompiledSystem system = solutions.system();
    ConditionSample worst = requirement.scaled() ? profile.worstScaled() : profile.worstRaw();
    double value = requirement.scaled() ? worst.scaled() : worst.raw();
    double limit = system.terms().constant(requirement.limit());
    double margin =
        Double.isInfinite(value) && Double.isInfinite(limit)
            ? 0
            : Margins.margin(requirement.relation(), value, limit);
    double share =
        Math.min(1, system.dimension() * worst.scaled() * Math.max(worst.error(), 0x1p-52));
    double error = Double.isInfinite(value) ? 0 : value * share;
    String detail =
        "worst %s at %s"
            .formatted(Figures.condition(value), Figures.at(system.model(), worst.time()));
    return new RequirementResult(
        system.model().name(),
        requirement.text(),
        Margins.status(requirement.relation(), margin, error),
        value,
        limit,
        margin,
        error,
        "1",
        OptionalDouble.of(worst.time()),
        detail,
        requirement.span());
  }
}
