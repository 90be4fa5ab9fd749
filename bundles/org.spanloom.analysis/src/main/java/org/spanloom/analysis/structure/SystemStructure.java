/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.structure;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.BitSet;
import java.util.Comparator;
import java.util.Deque;
import java.util.List;
import java.util.Optional;
import java.util.TreeMap;
import org.spanloom.language.model.LinearForm;
import org.spanloom.language.model.LinearForm.MatrixEntry;
import org.spanloom.language.model.SystemModel;
import org.spanloom.language.text.Span;
import org.spanloom.numerics.SparsityPattern;
import org.spanloom.numerics.structure.TriangularOrder;

/**
 * Which components of the state vector a component depends on: those whose columns stand in its row
 * of A. Named expressions and outputs are resolved, so that a dependence through them counts as the
 * direct one it is. Where highest derivatives are coupled by a mass matrix, each of them depends on
 * whatever stands in an equation of the coupled group.
 *
 * @param system the system
 * @param dependences for each component what it depends on directly, by number
 * @param blocks the strong components of A: the components in a block depend on each other, and on
 *     components of blocks before it at most
 */
public record SystemStructure(
    SystemModel system, List<List<Dependence>> dependences, List<List<Integer>> blocks) {

  /** Copies the lists. */
  public SystemStructure {
    dependences = dependences.stream().map(List::copyOf).toList();
    blocks = blocks.stream().map(List::copyOf).toList();
  }

  /**
   * One direct dependence.
   *
   * @param on number of the component depended on, from 0
   * @param sources the places in the text that make it, in the order of the text
   */
  public record Dependence(int on, List<Span> sources) {
    /** Copies the list. */
    public Dependence {
      sources = List.copyOf(sources);
    }
  }

  /** Returns the structure of a system; empty where errors leave its equations unknown. */
  public static Optional<SystemStructure> of(SystemModel system) {
    return system.equations().map(form -> of(system, form));
  }

  private static SystemStructure of(SystemModel system, LinearForm form) {
    int n = form.dimension();
    int[] group = groups(form);
    List<TreeMap<Integer, List<Span>>> sources = new ArrayList<>();
    for (int i = 0; i < n; i++) {
      sources.add(new TreeMap<>());
    }
    for (MatrixEntry entry : form.matrix()) {
      sources
          .get(group[entry.row()])
          .computeIfAbsent(entry.column(), c -> new ArrayList<>())
          .addAll(entry.sources());
    }
    List<List<Dependence>> ofGroup = new ArrayList<>();
    for (TreeMap<Integer, List<Span>> row : sources) {
      List<Dependence> dependences = new ArrayList<>();
      row.forEach((column, places) -> dependences.add(new Dependence(column, inTextOrder(places))));
      ofGroup.add(List.copyOf(dependences));
    }
    List<List<Dependence>> dependences = new ArrayList<>();
    for (int i = 0; i < n; i++) {
      dependences.add(ofGroup.get(group[i]));
    }
    return new SystemStructure(system, dependences, blocks(dependences));
  }

  private static List<Span> inTextOrder(List<Span> places) {
    return places.stream().distinct().sorted(Comparator.comparingInt(Span::start)).toList();
  }

  /** Returns for each component the first of those that the mass matrix couples it with. */
  private static int[] groups(LinearForm form) {
    int[] group = new int[form.dimension()];
    for (int i = 0; i < group.length; i++) {
      group[i] = i;
    }
    for (MatrixEntry entry : form.mass()) {
      int a = first(group, entry.row());
      int b = first(group, entry.column());
      group[Math.max(a, b)] = Math.min(a, b);
    }
    for (int i = 0; i < group.length; i++) {
      group[i] = first(group, i);
    }
    return group;
  }

  private static int first(int[] group, int member) {
    int at = member;
    while (group[at] != at) {
      group[at] = group[group[at]];
      at = group[at];
    }
    return at;
  }

  /** Turns the upper triangular order of the numerics round, so that causes come first. */
  private static List<List<Integer>> blocks(List<List<Dependence>> dependences) {
    int[] start = new int[dependences.size() + 1];
    for (int i = 0; i < dependences.size(); i++) {
      start[i + 1] = start[i] + dependences.get(i).size();
    }
    int[] columns = dependences.stream().flatMap(List::stream).mapToInt(Dependence::on).toArray();
    TriangularOrder order = TriangularOrder.of(new SparsityPattern(start, columns));
    int[] states = order.order();
    int[] blockStart = order.blockStart();
    List<List<Integer>> blocks = new ArrayList<>();
    for (int b = order.blocks() - 1; b >= 0; b--) {
      List<Integer> block = new ArrayList<>();
      for (int k = blockStart[b]; k < blockStart[b + 1]; k++) {
        block.add(states[k]);
      }
      block.sort(Comparator.naturalOrder());
      blocks.add(block);
    }
    return blocks;
  }

  /**
   * Returns the components that a component depends on, directly or through others, by number; it
   * is among them itself where it depends on itself.
   *
   * @throws IndexOutOfBoundsException if there is no such component
   */
  public List<Integer> dependsOn(int component) {
    BitSet reached = new BitSet();
    Deque<Integer> open = new ArrayDeque<>(List.of(component));
    while (!open.isEmpty()) {
      for (Dependence dependence : dependences.get(open.pop())) {
        if (!reached.get(dependence.on())) {
          reached.set(dependence.on());
          open.push(dependence.on());
        }
      }
    }
    return reached.stream().boxed().toList();
  }
}
