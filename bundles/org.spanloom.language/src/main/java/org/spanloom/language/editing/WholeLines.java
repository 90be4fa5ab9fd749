/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.editing;

import org.spanloom.language.text.SourceText;
import org.spanloom.language.text.Span;

/** Places of statements with the lines they stand in. */
final class WholeLines {

  private WholeLines() {}

  /** Returns the blanks before a place; nothing where something else stands there. */
  static String indent(SourceText source, Span span) {
    Span line = source.lineSpan(source.line(span.start()));
    String before = source.slice(new Span(line.start(), span.start()));
    return before.isBlank() ? before : "";
  }

  /** Returns a place with its lines and a line end where nothing else stands on them. */
  static Span around(SourceText source, Span span) {
    int line = source.line(span.start());
    Span first = source.lineSpan(line);
    Span last = source.lineSpan(source.line(span.end()));
    boolean alone =
        line > 1
            && source.slice(new Span(first.start(), span.start())).isBlank()
            && source.slice(new Span(span.end(), last.end())).isBlank();
    return alone ? new Span(source.lineSpan(line - 1).end(), last.end()) : span;
  }
}
