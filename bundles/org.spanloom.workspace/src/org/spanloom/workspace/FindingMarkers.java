/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.workspace;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.eclipse.core.resources.IFile;
import org.eclipse.core.resources.IMarker;
import org.eclipse.core.resources.IResource;
import org.eclipse.core.resources.IWorkspace;
import org.eclipse.core.runtime.CoreException;
import org.eclipse.core.runtime.IProgressMonitor;
import org.spanloom.analysis.CheckReport;
import org.spanloom.analysis.Finding;
import org.spanloom.analysis.SystemReport;
import org.spanloom.analysis.basis.BasisReport;
import org.spanloom.analysis.requirement.RequirementResult;
import org.spanloom.language.model.SystemModel;
import org.spanloom.language.problem.Severity;
import org.spanloom.language.text.SourceText;
import org.spanloom.language.text.Span;

/**
 * Writes what a check found as markers of the file.
 *
 * <p>Each basis gets one marker that carries its numbers. If a finding is about that basis, the
 * worst one gives the marker its severity and message; otherwise the marker is a mere note, and not
 * a problem.
 */
public final class FindingMarkers {

  /** The attribute {@link IMarker#SOURCE_ID} of all our markers. */
  public static final String SOURCE = "spanloom";

  private static final String BASIS_ID_START = "basis-";
  private static final int LONGEST_MESSAGE = 10_000;

  private FindingMarkers() {}

  private record Entry(String type, Map<String, Object> attributes) {}

  /**
   * Replaces the markers of a file by those of a report, in one change of the workspace.
   *
   * @throws CoreException if the file is gone
   */
  public static void write(IFile file, CheckReport report, IProgressMonitor monitor)
      throws CoreException {
    replace(file, entries(report), monitor);
  }

  /**
   * Replaces the markers of a file by one that says why it could not be read.
   *
   * @throws CoreException if the file is gone
   */
  public static void write(
      IFile file, ModelFile.Content.Unreadable content, IProgressMonitor monitor)
      throws CoreException {
    Map<String, Object> attributes = new HashMap<>();
    attributes.put(IMarker.SEVERITY, IMarker.SEVERITY_ERROR);
    attributes.put(IMarker.MESSAGE, content.message());
    attributes.put(IMarker.LINE_NUMBER, 1);
    attributes.put(IMarker.LOCATION, location(1));
    attributes.put(IMarker.SOURCE_ID, SOURCE);
    attributes.put(MarkerAttributes.CODE, content.code());
    replace(file, List.of(new Entry(Ids.PROBLEM, attributes)), monitor);
  }

  /**
   * Replaces the markers of a file by problems of its text alone.
   *
   * @throws CoreException if the file is gone
   */
  public static void write(
      IFile file, SourceText source, List<Finding> findings, IProgressMonitor monitor)
      throws CoreException {
    replace(file, findings.stream().map(f -> problem(f, source)).toList(), monitor);
  }

  /**
   * Deletes our markers of a resource.
   *
   * @param depth as for {@link IResource#deleteMarkers}
   * @throws CoreException if the resource is gone
   */
  public static void delete(IResource resource, int depth) throws CoreException {
    resource.deleteMarkers(Ids.PROBLEM, true, depth);
    resource.deleteMarkers(Ids.BASIS, true, depth);
    resource.deleteMarkers(Ids.REQUIREMENT, true, depth);
  }

  private static void replace(IFile file, List<Entry> entries, IProgressMonitor monitor)
      throws CoreException {
    IWorkspace workspace = file.getWorkspace();
    workspace.run(
        m -> {
          if (!file.exists()) {
            return;
          }
          delete(file, IResource.DEPTH_ZERO);
          for (Entry entry : entries) {
            file.createMarker(entry.type(), entry.attributes());
          }
        },
        workspace.getRuleFactory().markerRule(file),
        IWorkspace.AVOID_UPDATE,
        monitor);
  }

  private static List<Entry> entries(CheckReport report) {
    SourceText source = report.model().source();
    List<Entry> entries = new ArrayList<>();
    Set<Finding> told = new HashSet<>();
    for (SystemReport system : report.systems()) {
      for (BasisReport basis : system.bases()) {
        Optional<Finding> finding = about(basis, report.findings(), told);
        finding.ifPresent(told::add);
        entries.add(basis(basis, system, finding, source));
      }
      for (RequirementResult result : system.requirements()) {
        entries.add(requirement(result, source));
      }
    }
    for (Finding finding : report.findings()) {
      if (!told.contains(finding)) {
        entries.add(
            isAboutBasis(finding)
                ? basisWithoutNumbers(finding, report)
                : problem(finding, source));
      }
    }
    return entries;
  }

  /** Returns the worst finding about a basis that no other basis took. */
  private static Optional<Finding> about(
      BasisReport basis, List<Finding> findings, Set<Finding> told) {
    Finding worst = null;
    for (Finding f : findings) {
      if (isAboutBasis(f)
          && basis.span().contains(f.span())
          && !told.contains(f)
          && (worst == null || f.severity().compareTo(worst.severity()) < 0)) {
        worst = f;
      }
    }
    return Optional.ofNullable(worst);
  }

  private static boolean isAboutBasis(Finding finding) {
    return finding.id().startsWith(BASIS_ID_START);
  }

  private static Entry problem(Finding finding, SourceText source) {
    Map<String, Object> attributes = place(finding.span(), source);
    attributes.put(IMarker.SEVERITY, severity(finding.severity()));
    attributes.put(IMarker.MESSAGE, shortened(finding.message()));
    attributes.put(MarkerAttributes.CODE, finding.id());
    String fixes = FixText.write(finding.fixes(), source);
    if (!fixes.isEmpty()) {
      attributes.put(MarkerAttributes.FIXES, fixes);
    }
    return new Entry(Ids.PROBLEM, attributes);
  }

  /** A basis that could not be computed has no numbers, but belongs to the same list. */
  private static Entry basisWithoutNumbers(Finding finding, CheckReport report) {
    Map<String, Object> attributes = problem(finding, report.model().source()).attributes();
    for (SystemModel system : report.model().systems()) {
      if (system.span().contains(finding.span())) {
        attributes.put(MarkerAttributes.SYSTEM, system.name());
        system.bases().stream()
            .filter(b -> b.span().contains(finding.span()))
            .findFirst()
            .ifPresent(b -> attributes.put(MarkerAttributes.BASIS, b.name()));
      }
    }
    return new Entry(Ids.BASIS_FINDING, attributes);
  }

  private static Entry basis(
      BasisReport basis, SystemReport system, Optional<Finding> finding, SourceText source) {
    Map<String, Object> attributes =
        finding
            .map(f -> problem(f, source).attributes())
            .orElseGet(() -> {
              Map<String, Object> sound = place(basis.span(), source);
              sound.put(IMarker.SEVERITY, IMarker.SEVERITY_INFO);
              sound.put(IMarker.MESSAGE, soundMessage(basis));
              sound.put(MarkerAttributes.CODE, "basis-sound");
              return sound;
            });
    attributes.put(MarkerAttributes.SYSTEM, basis.system());
    attributes.put(MarkerAttributes.BASIS, basis.name());
    attributes.put(MarkerAttributes.RAW, Double.toString(basis.worstRaw()));
    attributes.put(MarkerAttributes.RAW_TIME, Double.toString(basis.worstRawTime()));
    attributes.put(MarkerAttributes.SCALED, Double.toString(basis.worstScaled()));
    attributes.put(MarkerAttributes.SCALED_TIME, Double.toString(basis.worstScaledTime()));
    attributes.put(MarkerAttributes.TIME_UNIT, system.system().timeUnit().code());
    attributes.put(MarkerAttributes.DIGITS_LEFT, Double.toString(basis.digitsLeft()));
    basis.windows().ifPresent(n -> attributes.put(MarkerAttributes.WINDOWS, Integer.toString(n)));
    boolean problem = finding.isPresent() && finding.get().severity() != Severity.NOTE;
    return new Entry(problem ? Ids.BASIS_FINDING : Ids.BASIS, attributes);
  }

  private static String soundMessage(BasisReport basis) {
    String name = basis.declared() ? "Basis " + basis.name() : "The principal basis";
    return String.format(
        Locale.ROOT,
        "%s of %s is sound: about %.0f digits are left.",
        name,
        basis.system(),
        basis.digitsLeft());
  }

  private static Entry requirement(RequirementResult result, SourceText source) {
    Map<String, Object> attributes = place(result.span(), source);
    attributes.put(IMarker.MESSAGE, shortened(result.detail()));
    attributes.put(MarkerAttributes.SYSTEM, result.system());
    attributes.put(MarkerAttributes.STATUS, result.status().name());
    attributes.put(MarkerAttributes.VALUE, Double.toString(result.value()));
    attributes.put(MarkerAttributes.LIMIT, Double.toString(result.limit()));
    attributes.put(MarkerAttributes.MARGIN, Double.toString(result.margin()));
    attributes.put(MarkerAttributes.UNIT, result.unit());
    return new Entry(Ids.REQUIREMENT, attributes);
  }

  private static Map<String, Object> place(Span span, SourceText source) {
    Map<String, Object> attributes = new HashMap<>();
    int line = source.line(span.start());
    attributes.put(IMarker.LINE_NUMBER, line);
    attributes.put(IMarker.CHAR_START, span.start());
    attributes.put(IMarker.CHAR_END, span.end());
    attributes.put(IMarker.LOCATION, location(line));
    attributes.put(IMarker.SOURCE_ID, SOURCE);
    return attributes;
  }

  private static String location(int line) {
    return "line " + line;
  }

  private static int severity(Severity severity) {
    return switch (severity) {
      case ERROR -> IMarker.SEVERITY_ERROR;
      case WARNING -> IMarker.SEVERITY_WARNING;
      case NOTE -> IMarker.SEVERITY_INFO;
    };
  }

  private static String shortened(String message) {
    return message.length() <= LONGEST_MESSAGE
        ? message
        : message.substring(0, LONGEST_MESSAGE) + "...";
  }
}
