/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.HashMap;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Map;
import java.util.function.Consumer;

/**
 * Puts declarations into an order in which each comes after those it uses, by depth-first search;
 * the order of the text decides wherever it can. Declarations that need each other are handed out
 * as cycles.
 */
final class DeclarationOrder {

  private enum Colour {
    UNSEEN,
    OPEN,
    DONE
  }

  private final List<DeclaredItem> items;
  private final Map<Declarations, Map<String, Integer>> places = new IdentityHashMap<>();
  private final Colour[] colours;
  private final List<DeclaredItem> ordered = new ArrayList<>();
  private final Consumer<List<DeclaredItem>> cycles;

  /** A declaration whose uses are being followed. */
  private static final class Visit {
    private final int place;
    private final List<DeclaredItem> uses;
    private int next;

    Visit(int place, List<DeclaredItem> uses) {
      this.place = place;
      this.uses = uses;
    }
  }

  private DeclarationOrder(List<DeclaredItem> items, Consumer<List<DeclaredItem>> cycles) {
    this.items = items;
    this.cycles = cycles;
    this.colours = new Colour[items.size()];
    for (int i = 0; i < colours.length; i++) {
      places
          .computeIfAbsent(items.get(i).owner(), owner -> new HashMap<>())
          .put(items.get(i).declaration().name().text(), i);
      colours[i] = Colour.UNSEEN;
    }
  }

  /**
   * Returns the declarations in order.
   *
   * @param items parameters, named expressions and outputs with names of their own
   * @param cycles takes each cycle found, in the order of use
   */
  static List<DeclaredItem> of(List<DeclaredItem> items, Consumer<List<DeclaredItem>> cycles) {
    DeclarationOrder order = new DeclarationOrder(items, cycles);
    for (int i = 0; i < items.size(); i++) {
      if (order.colours[i] == Colour.UNSEEN) {
        order.visit(i);
      }
    }
    return order.ordered;
  }

  private void visit(int root) {
    Deque<Visit> path = new ArrayDeque<>();
    path.push(open(root));
    while (!path.isEmpty()) {
      Visit top = path.peek();
      if (top.next == top.uses.size()) {
        path.pop();
        colours[top.place] = Colour.DONE;
        ordered.add(items.get(top.place));
        continue;
      }
      DeclaredItem next = top.uses.get(top.next++);
      Map<String, Integer> siblings = places.getOrDefault(next.owner(), Map.of());
      Integer used = siblings.get(next.declaration().name().text());
      if (used != null && colours[used] == Colour.UNSEEN) {
        path.push(open(used));
      } else if (used != null && colours[used] == Colour.OPEN) {
        reportCycle(path, used);
      }
    }
  }

  private Visit open(int place) {
    colours[place] = Colour.OPEN;
    return new Visit(place, items.get(place).uses());
  }

  private void reportCycle(Deque<Visit> path, int first) {
    List<DeclaredItem> cycle = new ArrayList<>();
    for (Visit visit : path) {
      cycle.addFirst(items.get(visit.place));
      if (visit.place == first) {
        break;
      }
    }
    cycles.accept(cycle);
  }
}
