/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis;

import java.util.List;
import org.spanloom.analysis.basis.BasisReport;
import org.spanloom.analysis.boundary.BoundaryReport;
import org.spanloom.analysis.requirement.RequirementResult;
import org.spanloom.language.model.SystemModel;

/**
 * What the analysis of one system found.
 *
 * @param system the system
 * @param boundaries its boundary-value problems, in the order of the text
 * @param bases its bases: the declared ones, else the principal one at the start
 * @param requirements its requirements, in the order of the text
 */
public record SystemReport(
    SystemModel system,
    List<BoundaryReport> boundaries,
    List<BasisReport> bases,
    List<RequirementResult> requirements) {

  /** Copies the lists. */
  public SystemReport {
    boundaries = List.copyOf(boundaries);
    bases = List.copyOf(bases);
    requirements = List.copyOf(requirements);
  }
}
