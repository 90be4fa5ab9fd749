/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis;

import java.util.List;
import java.util.SequencedMap;
import org.spanloom.language.problem.Severity;
import org.spanloom.language.text.Span;

/** What the analysis can find beyond the text; the ids are stable. */
public enum FindingKind {
  /** A coupling of derivatives that cannot be solved for them. */
  MASS_MATRIX_SINGULAR("mass-matrix-singular", Severity.ERROR),
  /** The numerics have no result that could be trusted. */
  SOLUTION_MISSING("solution-missing", Severity.ERROR),
  /** The estimated error of a result is larger than the accuracy asked for. */
  ACCURACY_NOT_REACHED("accuracy-not-reached", Severity.WARNING),
  /** Boundary conditions that no solution meets. */
  BOUNDARY_WITHOUT_SOLUTION("boundary-without-solution", Severity.ERROR),
  /** Boundary conditions that infinitely many solutions meet. */
  BOUNDARY_NOT_UNIQUE("boundary-not-unique", Severity.ERROR),
  /** Boundary conditions that leave fewer digits than the system asks for. */
  BOUNDARY_ILL_CONDITIONED("boundary-ill-conditioned", Severity.WARNING),
  /** A property of the system: a jump behind which no basis is one any more. */
  JUMP_SINGULAR("jump-singular", Severity.NOTE),
  /** A candidate basis whose columns are linearly dependent. */
  BASIS_DEPENDENT("basis-dependent", Severity.ERROR),
  /** A closed form that does not solve the system. */
  BASIS_NOT_A_SOLUTION("basis-not-a-solution", Severity.ERROR),
  /** A declared basis with no digits left; what is built on it fails on its own. */
  BASIS_WITHOUT_DIGITS("basis-without-digits", Severity.WARNING),
  /** A declared basis that leaves fewer digits than the system asks for. */
  BASIS_ILL_CONDITIONED("basis-ill-conditioned", Severity.WARNING),
  /** Changes of the sign of a term that could not be followed. */
  SWITCHING_UNTRACED("switching-untraced", Severity.WARNING),
  /** More corners and jumps of coefficients than can be stepped on. */
  TOO_MANY_BREAKPOINTS("too-many-breakpoints", Severity.ERROR),
  /** A property of the system: its principal basis loses its fast directions. */
  BASIS_DEGENERATES("basis-degenerates", Severity.NOTE),
  /** The determinant of a basis does not follow Liouville's formula. */
  LIOUVILLE_MISMATCH("liouville-mismatch", Severity.WARNING),
  /** Nothing bounds the times at which to judge a basis. */
  RANGE_UNBOUNDED("range-unbounded", Severity.NOTE),
  /** A system so large that no basis is computed unless one is declared. */
  BASIS_NOT_FOLLOWED("basis-not-followed", Severity.NOTE),
  /** A stated requirement does not hold. */
  REQUIREMENT_FAILED("requirement-failed", Severity.ERROR),
  /** A stated requirement could not be decided. */
  REQUIREMENT_UNDECIDED("requirement-undecided", Severity.ERROR);

  private final String id;
  private final Severity severity;

  FindingKind(String id, Severity severity) {
    this.id = id;
    this.severity = severity;
  }

  /** Returns the stable id. */
  public String id() {
    return id;
  }

  /** Returns the severity. */
  public Severity severity() {
    return severity;
  }

  /** Returns a finding of this kind. */
  public Finding at(Span span, String message, SequencedMap<String, Double> numbers) {
    return new Finding(id, severity, span, message, numbers, List.of());
  }
}
