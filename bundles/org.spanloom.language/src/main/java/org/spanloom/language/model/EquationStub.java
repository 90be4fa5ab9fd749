/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.spanloom.language.model.Meaning.FamilyMeaning;
import org.spanloom.language.model.Meaning.StateMeaning;

/**
 * Writes equations for states that have none, those of neighbouring members of a family as a loop.
 */
final class EquationStub {

  /** Most loops and lines written for one family. */
  private static final int LONGEST = 20;

  private final Frame frame;
  private final StateVector vector;
  private final String indent;
  private final List<String> lines = new ArrayList<>();

  private EquationStub(Frame frame, StateVector vector, String indent) {
    this.frame = frame;
    this.vector = vector;
    this.indent = indent;
  }

  /**
   * Returns lines, each after a line end.
   *
   * @param states states of one declaration, in their order
   * @return nothing where the lines would be too many
   */
  static Optional<String> of(StateVector vector, List<StateMeaning> states) {
    Frame frame = states.getFirst().frame();
    String indent = frame.indent(states.getFirst().statement().span());
    EquationStub stub = new EquationStub(frame, vector, indent);
    String name = states.getFirst().statement().name().text();
    if (frame.scope().own(name).orElseThrow() instanceof FamilyMeaning family) {
      stub.family(family, states);
    } else {
      stub.line("", stub.equation(states.getFirst(), name));
    }
    return stub.lines.size() <= LONGEST
        ? Optional.of(String.join("", stub.lines))
        : Optional.empty();
  }

  private void family(FamilyMeaning family, List<StateMeaning> states) {
    IndexSpace space = family.space();
    String name = family.statement().name().text();
    if (space.rank() == 2 && states.size() == family.members().size()) {
      List<String> free = freeNames(2);
      line("", loop(free.get(0), space.lows().get(0), space.highs().get(0)));
      line("  ", loop(free.get(1), space.lows().get(1), space.highs().get(1)));
      String member = name + "[" + free.get(0) + "," + free.get(1) + "]";
      line("    ", equation(states.getFirst(), member));
      line("  ", "}");
      line("", "}");
      return;
    }
    int first = 0;
    while (first < states.size() && lines.size() <= LONGEST) {
      int last = first;
      while (last + 1 < states.size() && follows(family, states.get(last), states.get(last + 1))) {
        last++;
      }
      run(family, states.subList(first, last + 1));
      first = last + 1;
    }
  }

  /** Tells whether two members are neighbours along the last index. */
  private static boolean follows(FamilyMeaning family, StateMeaning one, StateMeaning next) {
    int start = family.members().getFirst().index();
    long[] a = family.space().indices(one.index() - start);
    long[] b = family.space().indices(next.index() - start);
    int end = a.length - 1;
    return a[0] == b[0] && end == 1 && a[1] + 1 == b[1] || end == 0 && a[0] + 1 == b[0];
  }

  private void run(FamilyMeaning family, List<StateMeaning> states) {
    if (states.size() <= 2) {
      String name = family.statement().name().text();
      int first = family.members().getFirst().index();
      states.forEach(s -> line("", equation(s, name + family.space().shown(s.index() - first))));
      return;
    }
    int start = family.members().getFirst().index();
    long[] from = family.space().indices(states.getFirst().index() - start);
    long[] to = family.space().indices(states.getLast().index() - start);
    String index = freeNames(1).getFirst();
    int end = from.length - 1;
    String name = family.statement().name().text();
    String member = end == 0 ? name + "[" + index + "]" : name + "[" + from[0] + "," + index + "]";
    line("", loop(index, from[end], to[end]));
    line("  ", equation(states.getFirst(), member));
    line("", "}");
  }

  private static String loop(String index, long from, long to) {
    return "for " + index + " from " + from + " to " + to + " {";
  }

  private String equation(StateMeaning state, String name) {
    return name + "'".repeat(vector.order(state.index())) + " = 0";
  }

  private void line(String deeper, String text) {
    lines.add("\n" + indent + deeper + text);
  }

  private List<String> freeNames(int count) {
    List<String> names = new ArrayList<>();
    for (String name : List.of("i", "j", "k", "m", "n", "ii", "jj")) {
      boolean free = frame.scope().own(name).isEmpty() && !frame.scope().isDeclaredOutside(name);
      if (free && names.size() < count) {
        names.add(name);
      }
    }
    for (int i = 1; names.size() < count; i++) {
      String name = "index_" + i;
      if (frame.scope().own(name).isEmpty() && !frame.scope().isDeclaredOutside(name)) {
        names.add(name);
      }
    }
    return names;
  }
}
