/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.List;

/**
 * The indices of a family: one or two ranges of whole numbers. Members are counted from 0, the last
 * index running fastest.
 *
 * @param lows smallest index of each range
 * @param highs largest index of each range
 */
record IndexSpace(List<Long> lows, List<Long> highs) {

  /** Copies the lists. */
  IndexSpace {
    lows = List.copyOf(lows);
    highs = List.copyOf(highs);
  }

  /** Returns the number of indices a member has. */
  int rank() {
    return lows.size();
  }

  /** Returns the number of indices in a range. */
  long length(int range) {
    return highs.get(range) - lows.get(range) + 1;
  }

  /** Returns the number of members, or {@link Long#MAX_VALUE} if there are more. */
  long size() {
    long size = 1;
    for (int i = 0; i < rank(); i++) {
      boolean fits = length(i) <= Integer.MAX_VALUE && size <= Integer.MAX_VALUE;
      size = fits ? size * length(i) : Long.MAX_VALUE;
    }
    return size;
  }

  boolean holds(int range, long index) {
    return index >= lows.get(range) && index <= highs.get(range);
  }

  /** Adds an index to the count of those before it; begin with 0. */
  int counted(int before, int range, long index) {
    return (int) (before * length(range) + index - lows.get(range));
  }

  /** Returns the indices of a member. */
  long[] indices(int member) {
    long[] indices = new long[rank()];
    long rest = member;
    for (int i = rank() - 1; i >= 0; i--) {
      indices[i] = lows.get(i) + rest % length(i);
      rest /= length(i);
    }
    return indices;
  }

  /** Returns the indices of a member as they are written, for example {@code [1,2]}. */
  String shown(int member) {
    StringBuilder text = new StringBuilder("[");
    for (long index : indices(member)) {
      text.append(text.length() == 1 ? "" : ",").append(index);
    }
    return text.append(']').toString();
  }

  /** Returns a range as it is written, for example {@code 1..400}. */
  String range(int range) {
    return lows.get(range) + ".." + highs.get(range);
  }
}
