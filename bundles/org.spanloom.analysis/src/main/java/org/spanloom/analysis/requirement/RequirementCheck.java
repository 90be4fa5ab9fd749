/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.requirement;

import org.spanloom.analysis.SystemSolutions;
import org.spanloom.analysis.basis.BasisProfiles;
import org.spanloom.language.model.Requirement;

/** Judges the requirements of a system. For one thread. */
public final class RequirementCheck {

  private final TrajectoryRequirements trajectories;
  private final BasisRequirements bases;
  private final StructureRequirements structure;

  /**
   * Prepares.
   *
   * @param solutions the system and what is solved of it
   * @param profiles the conditioning of its bases
   */
  public RequirementCheck(SystemSolutions solutions, BasisProfiles profiles) {
    this.trajectories = new TrajectoryRequirements(solutions);
    this.bases = new BasisRequirements(solutions, profiles);
    this.structure = new StructureRequirements(solutions);
  }

  /** Judges one requirement. */
  public RequirementResult check(Requirement requirement) {
    return switch (requirement) {
      case Requirement.AtTime r -> trajectories.atTime(r);
      case Requirement.Throughout r -> trajectories.throughout(r);
      case Requirement.Nonnegative r -> trajectories.nonnegative(r);
      case Requirement.Condition r -> bases.condition(r);
      case Requirement.Stable r -> structure.stable(r);
      case Requirement.Invariant r -> structure.invariant(r);
      case Requirement.Period r -> structure.period(r);
    };
  }
}
