/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.editor;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.spanloom.language.editing.OutlineNode;

/**
 * A node of the outline with a key that survives edits: the path of labels, numbered where they
 * repeat.
 */
final class OutlineEntry {

  private final String key;
  private final OutlineNode node;
  private final List<OutlineEntry> children;

  private OutlineEntry(String key, OutlineNode node) {
    this.key = key;
    this.node = node;
    this.children = all(key, node.children());
  }

  static List<OutlineEntry> all(List<OutlineNode> nodes) {
    return all("", nodes);
  }

  private static List<OutlineEntry> all(String parentKey, List<OutlineNode> nodes) {
    Map<String, Integer> seen = new HashMap<>();
    List<OutlineEntry> entries = new ArrayList<>();
    for (OutlineNode node : nodes) {
      String label = node.kind() + " " + node.label();
      int number = seen.merge(label, 1, Integer::sum);
      entries.add(new OutlineEntry(parentKey + "\n" + label + "\t" + number, node));
    }
    return List.copyOf(entries);
  }

  OutlineNode node() {
    return node;
  }

  List<OutlineEntry> children() {
    return children;
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof OutlineEntry that && key.equals(that.key);
  }

  @Override
  public int hashCode() {
    return key.hashCode();
  }

  @Override
  public String toString() {
    return node.label();
  }
}
