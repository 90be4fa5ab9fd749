/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.syntax;

import java.util.List;
import java.util.function.Consumer;
import org.spanloom.language.text.Span;

/**
 * A line of a block that may hold {@code for}, such as the values of initial values.
 *
 * @param <T> what a line holds
 */
public sealed interface BlockLine<T> {

  /** Returns its place. */
  Span span();

  /** {@code c[1] = 5}. */
  record SingleLine<T>(T content, Span span) implements BlockLine<T> {}

  /** {@code for i from 2 to 400 { c[i] = 0 }}. */
  record RepeatedLines<T>(Turns turns, List<BlockLine<T>> lines, Span span)
      implements BlockLine<T> {
    /** Copies the list. */
    public RepeatedLines {
      lines = List.copyOf(lines);
    }
  }

  /** Hands out what the lines hold as written, each once, in the order of the text. */
  static <T> void each(List<BlockLine<T>> lines, Consumer<T> taker) {
    for (BlockLine<T> line : lines) {
      switch (line) {
        case SingleLine<T> single -> taker.accept(single.content());
        case RepeatedLines<T> repeated -> each(repeated.lines(), taker);
      }
    }
  }
}
