/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.text;

import java.util.Arrays;

/** A model file's text with its name and its lines; immutable. */
public final class SourceText {

  private final String name;
  private final String content;
  private final int[] lineStarts;

  /**
   * Takes a text.
   *
   * @param name the name to show in messages, usually a path
   * @param content the text; lines end in "\n", "\r\n" or "\r"
   */
  public SourceText(String name, String content) {
    this.name = name;
    this.content = content;
    int[] starts = new int[64 + content.length() / 32];
    int count = 1;
    boolean returns = content.indexOf('\r') >= 0;
    int end = returns ? lineEnd(content, 0) : content.indexOf('\n');
    while (end >= 0) {
      if (count == starts.length) {
        starts = Arrays.copyOf(starts, 2 * count);
      }
      starts[count++] = end + 1;
      end = returns ? lineEnd(content, end + 1) : content.indexOf('\n', end + 1);
    }
    this.lineStarts = Arrays.copyOf(starts, count);
  }

  /** Returns the offset of the last character of the next line end from a place on, or -1. */
  private static int lineEnd(String content, int from) {
    for (int i = from; i < content.length(); i++) {
      char c = content.charAt(i);
      if (c == '\n' || c == '\r' && !(i + 1 < content.length() && content.charAt(i + 1) == '\n')) {
        return i;
      }
    }
    return -1;
  }

  /** Returns the name to show in messages. */
  public String name() {
    return name;
  }

  /** Returns the whole text. */
  public String content() {
    return content;
  }

  /** Returns the number of lines, at least 1. */
  public int lineCount() {
    return lineStarts.length;
  }

  /** Returns the characters of a span. */
  public String slice(Span span) {
    return content.substring(span.start(), span.end());
  }

  /** Returns the number, from 1, of the line that holds an offset. */
  public int line(int offset) {
    int found = Arrays.binarySearch(lineStarts, offset);
    return found >= 0 ? found + 1 : -found - 1;
  }

  /** Returns line and column of an offset. */
  public Position position(int offset) {
    int line = line(offset);
    return new Position(line, offset - lineStarts[line - 1] + 1);
  }

  /** Returns the span of a line without its line end; lines count from 1. */
  public Span lineSpan(int line) {
    int start = lineStarts[line - 1];
    int end = line == lineStarts.length ? content.length() : lineStarts[line];
    while (end > start && (content.charAt(end - 1) == '\n' || content.charAt(end - 1) == '\r')) {
      end--;
    }
    return new Span(start, end);
  }
}
