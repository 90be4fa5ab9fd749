/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.boundary;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.SequencedMap;
import org.spanloom.analysis.Finding;
import org.spanloom.analysis.FindingKind;
import org.spanloom.analysis.Reached;
import org.spanloom.analysis.SystemSolutions;
import org.spanloom.analysis.coefficients.CompiledSystem;
import org.spanloom.analysis.solve.Refusals;
import org.spanloom.language.model.Boundary;
import org.spanloom.numerics.Outcome;
import org.spanloom.numerics.boundary.BoundaryAnswer;

/**
 * Decides the boundary-value problems of a system: one solution, none or many, how well it holds.
 */
public final class BoundaryCheck {

  private final SystemSolutions solutions;
  private final CompiledSystem system;
  private final List<BoundaryReport> reports = new ArrayList<>();
  private final List<Finding> findings = new ArrayList<>();

  /** Decides all of them. */
  public BoundaryCheck(SystemSolutions solutions) {
    this.solutions = solutions;
    this.system = solutions.system();
    for (Boundary boundary : system.model().boundaries()) {
      check(boundary);
    }
  }

  /** Returns one report for each, in the order of the text. */
  public List<BoundaryReport> reports() {
    return List.copyOf(reports);
  }

  /** Returns what was found. */
  public List<Finding> findings() {
    return List.copyOf(findings);
  }

  private void check(Boundary boundary) {
    double asked = system.model().accuracy();
    switch (solutions.boundary(boundary)) {
      case Outcome.Solved<BoundaryAnswer> s -> answered(boundary, s.value(), asked);
      case Outcome.Cancelled<BoundaryAnswer> c -> {}
      case Outcome.Unsolved<BoundaryAnswer> u -> {
        BoundaryReport report = BoundaryMessages.unknown(boundary, Refusals.text(system, u));
        reports.add(report);
        findings.add(
            FindingKind.SOLUTION_MISSING.at(
                boundary.nameSpan(), report.detail(), new LinkedHashMap<>()));
      }
    }
  }

  private void answered(Boundary boundary, BoundaryAnswer answer, double asked) {
    BoundaryReport report = BoundaryMessages.report(system, boundary, answer);
    reports.add(report);
    String what = "the conditions " + boundary.name() + ": " + report.detail();
    SequencedMap<String, Double> numbers = new LinkedHashMap<>();
    switch (answer) {
      case BoundaryAnswer.None none -> {
        numbers.put("mismatch", none.mismatch());
        numbers.put("smallestSingularValue", none.smallest());
        findings.add(
            FindingKind.BOUNDARY_WITHOUT_SOLUTION.at(
                boundary.nameSpan(), what + "; state a condition on that direction", numbers));
      }
      case BoundaryAnswer.Family family -> {
        numbers.put("smallestSingularValue", family.smallest());
        findings.add(
            FindingKind.BOUNDARY_NOT_UNIQUE.at(
                boundary.nameSpan(), what + "; state a condition on that direction", numbers));
      }
      case BoundaryAnswer.Unique unique -> {
        double wanted = -Math.log10(asked);
        if (report.digitsLeft() < wanted) {
          numbers.put("condition", report.toConditions());
          numbers.put("digitsLeft", report.digitsLeft());
          numbers.put("digitsWanted", wanted);
          findings.add(
              FindingKind.BOUNDARY_ILL_CONDITIONED.at(
                  boundary.nameSpan(),
                  what
                      + ", fewer than the accuracy asks for; place the conditions where the fast"
                      + " directions are decided, growing ones at the end and decaying ones at the"
                      + " start",
                  numbers));
        }
        accuracy(boundary, unique, asked);
      }
    }
  }

  private void accuracy(Boundary boundary, BoundaryAnswer.Unique unique, double asked) {
    Reached worst = Reached.worst(system, unique.solution());
    if (worst.relative() > asked) {
      findings.add(worst.finding(system, asked, " of " + boundary.name()));
    }
  }
}
