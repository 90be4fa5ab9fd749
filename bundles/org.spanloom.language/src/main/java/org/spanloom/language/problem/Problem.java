/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.problem;

import java.util.List;
import org.spanloom.language.text.Span;

/**
 * Something found while reading a model.
 *
 * @param kind what sort of thing, with its stable id and its severity
 * @param span where
 * @param message what was found, what was expected and what to do
 * @param fixes ways to mend it, best first
 */
public record Problem(ProblemKind kind, Span span, String message, List<Fix> fixes) {

  /** Copies the list. */
  public Problem {
    fixes = List.copyOf(fixes);
  }

  /** Returns the severity, which belongs to the kind. */
  public Severity severity() {
    return kind.severity();
  }
}
