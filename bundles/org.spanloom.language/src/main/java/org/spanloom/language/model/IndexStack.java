/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayList;
import java.util.List;

/** The indices of the loops and sums that are being gone through, with their present values. */
final class IndexStack {

  private final List<String> names = new ArrayList<>();
  private final List<Long> values = new ArrayList<>();

  void push(String name) {
    names.add(name);
    values.add(0L);
  }

  /** Sets the value of the innermost index. */
  void set(long value) {
    values.set(values.size() - 1, value);
  }

  void pop() {
    names.removeLast();
    values.removeLast();
  }

  boolean isEmpty() {
    return names.isEmpty();
  }

  /** Returns the names, the outermost first. */
  List<String> names() {
    return names;
  }

  /** Returns names and values, for example {@code i = 2, j = 3}. */
  String text() {
    StringBuilder text = new StringBuilder();
    for (int i = 0; i < names.size(); i++) {
      text.append(i == 0 ? "" : ", ").append(names.get(i)).append(" = ").append(values.get(i));
    }
    return text.toString();
  }
}
