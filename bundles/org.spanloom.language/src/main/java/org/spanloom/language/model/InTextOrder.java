/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;

/**
 * Things put in any order and listed in the order of the text.
 *
 * @param <T> what they are
 */
final class InTextOrder<T> {

  private record Placed<T>(int start, T thing) {}

  private final List<Placed<T>> things = new ArrayList<>();
  private List<T> listed = List.of();

  /**
   * Puts a thing.
   *
   * @param start offset at which it stands, different for each
   */
  void put(int start, T thing) {
    things.add(new Placed<>(start, thing));
  }

  /** Returns what was put so far. */
  List<T> values() {
    if (listed.size() < things.size()) {
      things.sort(Comparator.comparingInt(Placed::start));
      listed = things.stream().map(Placed::thing).toList();
    }
    return listed;
  }
}
