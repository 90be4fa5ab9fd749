/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.files;

import java.util.ArrayList;
import java.util.List;

/** The lines of a file in the Matrix Market format, cut into words. */
final class MarketLines {

  /** More words than this are never asked for in one line. */
  private static final int MOST_WORDS = 6;

  private final String text;
  private int at;
  private int number;
  private int start;
  private int end;
  private boolean atEnd;

  MarketLines(String text) {
    this.text = text;
  }

  /** Returns the number of the line taken last, from 1. */
  int number() {
    return Math.max(1, number);
  }

  /** Returns the line taken last. */
  String text() {
    return text.substring(start, end).strip();
  }

  /** Tells whether no line was left when one was asked for. */
  boolean atEnd() {
    return atEnd;
  }

  /** Takes the first line. */
  List<String> first() {
    advance();
    return words();
  }

  /** Takes the coming line that is neither empty nor a comment; returns nothing at the end. */
  List<String> next() {
    while (advance()) {
      int i = start;
      while (i < end && text.charAt(i) <= ' ') {
        i++;
      }
      if (i < end && text.charAt(i) != '%') {
        return words();
      }
    }
    return List.of();
  }

  private boolean advance() {
    if (at >= text.length()) {
      atEnd = true;
      return false;
    }
    number++;
    start = at;
    end = at;
    while (end < text.length() && text.charAt(end) != '\n' && text.charAt(end) != '\r') {
      end++;
    }
    boolean pair = text.startsWith("\r\n", end);
    at = end + (pair ? 2 : 1);
    return true;
  }

  private List<String> words() {
    List<String> words = new ArrayList<>(3);
    int i = start;
    while (i < end && words.size() < MOST_WORDS) {
      while (i < end && text.charAt(i) <= ' ') {
        i++;
      }
      int from = i;
      while (i < end && text.charAt(i) > ' ') {
        i++;
      }
      if (i > from) {
        words.add(text.substring(from, i));
      }
    }
    return words;
  }
}
