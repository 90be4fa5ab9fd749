/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.List;
import org.spanloom.analysis.basis.BasisReport;
import org.spanloom.analysis.requirement.RequirementResult;
import org.spanloom.analysis.settings.Settings;
import org.spanloom.language.model.ModelReader;
import org.spanloom.language.problem.Severity;
import org.spanloom.language.text.SourceText;
import org.spanloom.numerics.Progress;

/** A model text and what the check says of it. */
record Checked(CheckReport report) {

  static Checked of(String text) {
    return of(text, Settings.DEFAULTS);
  }

  static Checked of(String text, Settings settings) {
    SourceText source = new SourceText("model.span", text);
    return new Checked(ModelCheck.check(ModelReader.read(source), settings, Progress.NONE));
  }

  /** Returns the findings as "line id", without notes. */
  List<String> alarms() {
    return report.findings().stream()
        .filter(f -> f.severity() != Severity.NOTE)
        .map(this::describe)
        .toList();
  }

  List<String> notes() {
    return report.findings().stream()
        .filter(f -> f.severity() == Severity.NOTE)
        .map(this::describe)
        .toList();
  }

  private String describe(Finding finding) {
    return report.model().source().line(finding.span().start()) + " " + finding.id();
  }

  Finding finding(String id) {
    return report.findings().stream()
        .filter(f -> f.id().equals(id))
        .findFirst()
        .orElseThrow(() -> new AssertionError(id + " is not among " + report.findings()));
  }

  RequirementResult requirement(int index) {
    return report.systems().getFirst().requirements().get(index);
  }

  BasisReport basis() {
    List<BasisReport> bases = report.systems().getFirst().bases();
    assertEquals(1, bases.size());
    return bases.getFirst();
  }
}
