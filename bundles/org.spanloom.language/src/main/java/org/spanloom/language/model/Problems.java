/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import org.spanloom.language.problem.Fix;
import org.spanloom.language.problem.Problem;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.text.Span;

/** Collects what is found while a model is resolved, up to a limit. */
final class Problems {

  /** Most problems listed for one text. */
  static final int LIMIT = 1000;

  /**
   * Most problems for which a similar name is looked for; bounds the work for files with many
   * names.
   */
  private static final int SUGGESTIONS = 200;

  private final List<Problem> found = new ArrayList<>();
  private boolean cut;
  private int suggestions;

  void report(ProblemKind kind, Span span, String message, Fix... fixes) {
    if (isFull()) {
      cut = true;
    } else {
      found.add(new Problem(kind, span, message, List.of(fixes)));
    }
  }

  /** Tells whether further problems are dropped, so that costly suggestions can be left out. */
  boolean isFull() {
    return found.size() >= LIMIT;
  }

  /**
   * Tells whether a name may still be looked for that someone may have meant; each look goes
   * through all names.
   */
  boolean maySuggest() {
    return !isFull() && ++suggestions <= SUGGESTIONS;
  }

  /**
   * Returns these problems and others in the order of the text, at most {@link #LIMIT} and a last
   * one that says so.
   */
  List<Problem> inTextOrder(List<Problem> others) {
    List<Problem> all = new ArrayList<>(others);
    all.addAll(found);
    all.sort(
        Comparator.<Problem>comparingInt(p -> p.span().start())
            .thenComparingInt(p -> p.span().end()));
    if (all.size() <= LIMIT && !cut) {
      return all;
    }
    int kept = Math.min(LIMIT, all.size());
    List<Problem> first = new ArrayList<>(all.subList(0, kept));
    first.add(
        new Problem(
            ProblemKind.TOO_MANY_PROBLEMS,
            first.getLast().span(),
            "There are more than " + LIMIT + " problems; the rest is not listed: mend these first.",
            List.of()));
    return first;
  }
}
