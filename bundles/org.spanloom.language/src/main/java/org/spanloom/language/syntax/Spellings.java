/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.syntax;

/**
 * Gives the words of a text, one string for each spelling however often it occurs: less to keep,
 * and names compare fast, because the string knows its hash code.
 */
final class Spellings {

  /** How many places are tried; texts made to collide only lose the sharing. */
  private static final int TRIES = 8;

  private final String text;
  private String[] table = new String[32];
  private int count;

  Spellings(String text) {
    this.text = text;
  }

  /**
   * Returns the characters of a range.
   *
   * @param start offset of the first
   * @param end offset behind the last
   * @param hash the hash code that a string of these characters has
   */
  String of(int start, int end, int hash) {
    if (2 * count > table.length) {
      grow();
    }
    for (int i = 0; i < TRIES; i++) {
      int place = place(hash, i);
      String known = table[place];
      if (known == null) {
        String fresh = text.substring(start, end);
        table[place] = fresh;
        count++;
        return fresh;
      }
      if (known.hashCode() == hash
          && known.length() == end - start
          && text.startsWith(known, start)) {
        return known;
      }
    }
    return text.substring(start, end);
  }

  private int place(int hash, int attempt) {
    return (hash ^ hash >>> 15) + attempt & table.length - 1;
  }

  private void grow() {
    String[] old = table;
    table = new String[4 * old.length];
    count = 0;
    for (String known : old) {
      if (known != null) {
        keep(known);
      }
    }
  }

  private void keep(String known) {
    for (int i = 0; i < TRIES; i++) {
      int place = place(known.hashCode(), i);
      if (table[place] == null) {
        table[place] = known;
        count++;
        return;
      }
    }
  }
}
