/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.text;

/**
 * A range of characters of a source text.
 *
 * @param start offset of the first character
 * @param end offset behind the last character, not before {@code start}
 */
public record Span(int start, int end) {

  /** Checks the order of the ends. */
  public Span {
    if (start < 0 || end < start) {
      throw new IllegalArgumentException("span " + start + ".." + end);
    }
  }

  /** Returns the number of characters. */
  public int length() {
    return end - start;
  }

  /** Returns the smallest span that holds both. */
  public Span join(Span other) {
    return new Span(Math.min(start, other.start), Math.max(end, other.end));
  }

  /** Tells whether the offset lies in the span or directly behind it, as a caret does. */
  public boolean touches(int offset) {
    return start <= offset && offset <= end;
  }

  /** Tells whether the other span lies inside this one. */
  public boolean contains(Span other) {
    return start <= other.start && other.end <= end;
  }
}
