/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.problem;

import java.util.Collection;
import java.util.Locale;
import java.util.Optional;

/** Finds the word someone may have meant. */
public final class Nearest {

  private static final int LONGEST = 60;

  private Nearest() {}

  /**
   * Returns the candidate with the fewest single-letter changes (inserted, left out, replaced or
   * two neighbours swapped; optimal string alignment distance), if it is near enough: one change in
   * short words, two in words of more than four letters. A difference in capitals alone counts as
   * near. Of equally near ones the first is returned.
   */
  public static Optional<String> of(String word, Collection<String> candidates) {
    int limit = word.length() > 4 ? 2 : 1;
    if (word.length() > LONGEST) {
      return Optional.empty();
    }
    String best = "";
    int fewest = limit + 1;
    for (String candidate : candidates) {
      if (candidate.equals(word) || Math.abs(candidate.length() - word.length()) > limit) {
        continue;
      }
      int changes =
          candidate.toLowerCase(Locale.ROOT).equals(word.toLowerCase(Locale.ROOT))
              ? 1
              : changes(word, candidate);
      if (changes < fewest && changes < Math.max(word.length(), candidate.length())) {
        fewest = changes;
        best = candidate;
      }
    }
    return best.isEmpty() ? Optional.empty() : Optional.of(best);
  }

  private static int changes(String a, String b) {
    int[] older = new int[b.length() + 1];
    int[] old = new int[b.length() + 1];
    int[] row = new int[b.length() + 1];
    for (int j = 0; j <= b.length(); j++) {
      old[j] = j;
    }
    for (int i = 1; i <= a.length(); i++) {
      row[0] = i;
      for (int j = 1; j <= b.length(); j++) {
        int replaced = old[j - 1] + (a.charAt(i - 1) == b.charAt(j - 1) ? 0 : 1);
        row[j] = Math.min(replaced, 1 + Math.min(old[j], row[j - 1]));
        boolean swapped =
            i > 1
                && j > 1
                && a.charAt(i - 1) == b.charAt(j - 2)
                && a.charAt(i - 2) == b.charAt(j - 1);
        if (swapped) {
          row[j] = Math.min(row[j], older[j - 2] + 1);
        }
      }
      int[] free = older;
      older = old;
      old = row;
      row = free;
    }
    return old[b.length()];
  }
}
