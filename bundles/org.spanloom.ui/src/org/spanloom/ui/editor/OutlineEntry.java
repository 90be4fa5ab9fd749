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
 *
 * <p>A level shows a bounded number of nodes, since each costs a widget; the last one tells how
 * many more there are.
 */
final class OutlineEntry {

  private static final int MOST = 1000;

  private final String key;
  private final String label;
  private final String detail;
  private final OutlineNode node;
  private final List<OutlineEntry> children;

  private OutlineEntry(
      String key, String label, String detail, OutlineNode node, List<OutlineEntry> children) {
    this.key = key;
    this.label = label;
    this.detail = detail;
    this.node = node;
    this.children = children;
  }

  static List<OutlineEntry> all(List<OutlineNode> nodes) {
    return all("", nodes);
  }

  private static List<OutlineEntry> all(String parentKey, List<OutlineNode> nodes) {
    Map<String, Integer> seen = new HashMap<>();
    List<OutlineEntry> entries = new ArrayList<>();
    for (OutlineNode node : nodes.subList(0, Math.min(MOST, nodes.size()))) {
      String name = node.kind() + " " + node.label();
      String key = parentKey + "\n" + name + "\t" + seen.merge(name, 1, Integer::sum);
      entries.add(
          new OutlineEntry(key, node.label(), node.detail(), node, all(key, node.children())));
    }
    if (nodes.size() > MOST) {
      entries.add(
          new OutlineEntry(
              parentKey + "\nmore",
              "and " + (nodes.size() - MOST) + " more",
              "",
              nodes.get(MOST),
              List.of()));
    }
    return List.copyOf(entries);
  }

  OutlineNode node() {
    return node;
  }

  String detail() {
    return detail;
  }

  List<OutlineEntry> children() {
    return children;
  }

  /** Tells whether two lists look the same on the screen, down to the last level. */
  static boolean lookSame(List<OutlineEntry> one, List<OutlineEntry> other) {
    if (!one.equals(other)) {
      return false;
    }
    for (int i = 0; i < one.size(); i++) {
      boolean same =
          one.get(i).detail.equals(other.get(i).detail)
              && lookSame(one.get(i).children, other.get(i).children);
      if (!same) {
        return false;
      }
    }
    return true;
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
    return label;
  }
}
