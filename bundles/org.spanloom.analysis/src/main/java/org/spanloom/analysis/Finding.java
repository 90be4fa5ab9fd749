/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.SequencedMap;
import org.spanloom.language.problem.Fix;
import org.spanloom.language.problem.Problem;
import org.spanloom.language.problem.Severity;
import org.spanloom.language.text.Span;

/**
 * Something to tell about a model: of its text or of its solutions.
 *
 * @param id stable name of the sort of finding, in kebab case
 * @param severity how bad it is
 * @param span where in the text
 * @param message what was found, what was expected and what to do
 * @param numbers the numbers behind it by name, in the order to show; finite or infinite, never NaN
 * @param fixes ways to mend it, best first
 */
public record Finding(
    String id,
    Severity severity,
    Span span,
    String message,
    SequencedMap<String, Double> numbers,
    List<Fix> fixes) {

  /** Copies the collections. */
  public Finding {
    numbers = Collections.unmodifiableSequencedMap(new LinkedHashMap<>(numbers));
    fixes = List.copyOf(fixes);
  }

  /** Returns a problem of the text as a finding. */
  public static Finding of(Problem problem) {
    return new Finding(
        problem.kind().id(),
        problem.severity(),
        problem.span(),
        problem.message(),
        new LinkedHashMap<>(),
        problem.fixes());
  }
}
