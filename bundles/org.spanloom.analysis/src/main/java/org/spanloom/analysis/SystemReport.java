/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis;

import java.util.List;
import org.spanloom.analysis.basis.BasisReport;
import org.spanloom.analysis.requirement.RequirementResult;
import org.spanloom.language.model.SystemModel;

/**
 * What the analysis of one system found.
 *
 * @param system the system
 * @param bases its bases: the declared ones, else the principal one at the start
 * @param requirements its requirements, in the order of the text
 */
public record SystemReport(
    SystemModel system, List<BasisReport> bases, List<RequirementResult> requirements) {

  /** Copies the lists. */
  public SystemReport {
    bases = List.copyOf(bases);
    requirements = List.copyOf(requirements);
  }
}
