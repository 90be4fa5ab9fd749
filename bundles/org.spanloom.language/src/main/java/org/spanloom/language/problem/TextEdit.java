/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.problem;

import java.util.List;
import org.spanloom.language.text.Span;

/**
 * A change of text.
 *
 * @param span what is replaced; empty for an insertion
 * @param replacement the new text
 */
public record TextEdit(Span span, String replacement) {

  /**
   * Returns a text with changes made.
   *
   * @param edits changes that do not overlap, in the order of the text
   */
  public static String apply(String text, List<TextEdit> edits) {
    StringBuilder changed = new StringBuilder(text.length());
    int at = 0;
    for (TextEdit edit : edits) {
      changed.append(text, at, edit.span().start()).append(edit.replacement());
      at = edit.span().end();
    }
    return changed.append(text, at, text.length()).toString();
  }
}
