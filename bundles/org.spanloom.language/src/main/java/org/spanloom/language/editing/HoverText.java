/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.editing;

import java.util.List;
import org.spanloom.language.text.Span;

/**
 * What to say about a place.
 *
 * @param span the word it is about
 * @param lines plain lines of text
 */
public record HoverText(Span span, List<String> lines) {

  /** Copies the list. */
  public HoverText {
    lines = List.copyOf(lines);
  }
}
