/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.problem;

import java.util.List;
import org.spanloom.language.text.Span;

/**
 * A way to mend a problem.
 *
 * @param label what it does, in the imperative
 * @param edits changes that do not overlap, in the order of the text
 */
public record Fix(String label, List<TextEdit> edits) {

  /** Copies the list. */
  public Fix {
    edits = List.copyOf(edits);
  }

  /** Returns a fix that inserts a text. */
  public static Fix insert(String label, int offset, String text) {
    return new Fix(label, List.of(new TextEdit(new Span(offset, offset), text)));
  }

  /** Returns a fix that puts a text in the place of another. */
  public static Fix replace(String label, Span span, String text) {
    return new Fix(label, List.of(new TextEdit(span, text)));
  }
}
