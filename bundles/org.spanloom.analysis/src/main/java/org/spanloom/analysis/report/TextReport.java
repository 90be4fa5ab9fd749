/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.report;

import java.util.List;
import java.util.Locale;
import java.util.stream.Collectors;
import org.spanloom.analysis.CheckReport;
import org.spanloom.analysis.Figures;
import org.spanloom.analysis.Finding;
import org.spanloom.analysis.SystemReport;
import org.spanloom.analysis.basis.BasisReport;
import org.spanloom.analysis.boundary.BoundaryReport;
import org.spanloom.analysis.requirement.RequirementResult;
import org.spanloom.analysis.solve.Choice;
import org.spanloom.language.model.SystemModel;
import org.spanloom.language.problem.Severity;
import org.spanloom.language.text.Position;

/** A check as text for people; lines end in a line feed, numbers have a point. */
public final class TextReport {

  /** The cautions that go with every report. */
  public static final String CAUTION =
      "Numerical results are approximations with an estimated error; a model that passes every"
          + " check can still be the\n"
          + "wrong model. Results that bear on health, structures, pressure, electricity or"
          + " radiation need review by a\n"
          + "qualified, where required licensed, practitioner under the local codes. Spanloom is"
          + " not a medical device and\n"
          + "not a certified design tool.\n";

  private TextReport() {}

  /**
   * Returns the report of one file: findings with their places, then systems, bases and
   * requirements.
   */
  public static String of(CheckReport report) {
    StringBuilder text = new StringBuilder();
    String name = report.model().source().name();
    text.append(name).append('\n');
    for (Finding finding : report.findings()) {
      text.append(finding(report, finding));
    }
    for (SystemReport system : report.systems()) {
      text.append(system(system));
    }
    if (report.cancelled()) {
      text.append("  the check was cancelled; this report is not whole\n");
    }
    return text.toString();
  }

  private static String finding(CheckReport report, Finding finding) {
    Position position = report.model().source().position(finding.span().start());
    return String.format(
        "%s:%d:%d: %s: %s [%s]\n",
        report.model().source().name(),
        position.line(),
        position.column(),
        finding.severity().name().toLowerCase(Locale.ROOT),
        finding.message(),
        finding.id());
  }

  private static String system(SystemReport report) {
    SystemModel system = report.system();
    StringBuilder text = new StringBuilder();
    text.append(
        String.format(
            Locale.ROOT,
            "  system %s: %d %s, %s\n",
            system.name(),
            system.states().size(),
            system.states().size() == 1 ? "state" : "states",
            Choice.describe(system)));
    for (BoundaryReport boundary : report.boundaries()) {
      text.append("    boundary  ").append(boundary.name()).append(": ");
      text.append(boundary.detail()).append('\n');
    }
    if (report.bases().isEmpty() && !system.states().isEmpty()) {
      text.append("    basis     none was followed\n");
    }
    for (BasisReport basis : report.bases()) {
      text.append("    ").append(basis(system, basis)).append('\n');
    }
    for (RequirementResult result : report.requirements()) {
      text.append(
          String.format(
              "    %-9s %s: %s\n",
              result.status().name().toLowerCase(Locale.ROOT), result.text(), result.detail()));
    }
    return text.toString();
  }

  private static String basis(SystemModel system, BasisReport basis) {
    String name = basis.name() + (basis.declared() ? "" : " (not declared)");
    if (basis.fewerFrom().isPresent()) {
      return "basis     %s: leaves the %s digits wanted up to %s, %s at its worst (scaled condition %s); %s"
          .formatted(
              name,
              Figures.text(basis.digitsWanted(), 2),
              Figures.at(system, basis.fewerFrom().getAsDouble()),
              digits(basis),
              Figures.condition(basis.worstScaled()),
              windows(basis));
    }
    return "basis     %s: condition %s at %s, scaled %s at %s; %s left; %s"
        .formatted(
            name,
            Figures.condition(basis.worstRaw()),
            Figures.at(system, basis.worstRawTime()),
            Figures.condition(basis.worstScaled()),
            Figures.at(system, basis.worstScaledTime()),
            digits(basis),
            windows(basis));
  }

  private static String digits(BasisReport basis) {
    String digits = String.format(Locale.ROOT, "%.1f", basis.digitsLeft());
    return digits.equals("0.0") ? "none" : digits + " digits";
  }

  private static String windows(BasisReport basis) {
    String limit = Figures.text(basis.windowLimit(), 2);
    if (basis.windows().isEmpty()) {
      return "windows below " + limit + " not counted";
    }
    int count = basis.windows().getAsInt();
    return count == 1 ? "one window below " + limit : count + " windows keep it below " + limit;
  }

  /** Returns the closing line over all files. */
  public static String summary(List<CheckReport> reports) {
    long systems = reports.stream().mapToLong(r -> r.systems().size()).sum();
    List<RequirementResult> requirements =
        reports.stream()
            .flatMap(r -> r.systems().stream())
            .flatMap(s -> s.requirements().stream())
            .toList();
    long held =
        requirements.stream().filter(r -> r.status() == RequirementResult.Status.HELD).count();
    String counts =
        List.of(Severity.values()).stream()
            .map(s -> counted(reports.stream().mapToLong(r -> r.count(s)).sum(), noun(s)))
            .collect(Collectors.joining(", "));
    return String.format(
        "%s, %s checked: %s; %d of %s %s\n",
        counted(reports.size(), "file"),
        counted(systems, "system"),
        counts,
        held,
        counted(requirements.size(), "requirement"),
        requirements.size() == 1 ? "holds" : "hold");
  }

  private static String noun(Severity severity) {
    return severity.name().toLowerCase(Locale.ROOT);
  }

  private static String counted(long count, String noun) {
    return count + " " + noun + (count == 1 ? "" : "s");
  }
}
