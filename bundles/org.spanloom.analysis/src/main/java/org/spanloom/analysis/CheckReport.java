/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis;

import java.util.List;
import org.spanloom.language.model.Model;
import org.spanloom.language.problem.Severity;

/**
 * Everything a check found about one model file.
 *
 * @param model the model
 * @param systems one report for each system that could be solved, in the order of the text
 * @param findings all findings, in the order of the text
 * @param cancelled whether the check was cancelled, so that the report is not whole
 */
public record CheckReport(
    Model model, List<SystemReport> systems, List<Finding> findings, boolean cancelled) {

  /** Copies the lists. */
  public CheckReport {
    systems = List.copyOf(systems);
    findings = List.copyOf(findings);
  }

  /** Returns the number of findings of a severity. */
  public long count(Severity severity) {
    return findings.stream().filter(f -> f.severity() == severity).count();
  }

  /** Tells whether nothing of severity error was found; a failed requirement is such a finding. */
  public boolean isClean() {
    return count(Severity.ERROR) == 0;
  }
}
