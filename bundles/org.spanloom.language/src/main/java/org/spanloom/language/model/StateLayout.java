/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalLong;
import org.spanloom.language.model.Meaning.BrokenMeaning;
import org.spanloom.language.model.Meaning.FamilyMeaning;
import org.spanloom.language.model.Meaning.StateMeaning;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.syntax.IndexRange;
import org.spanloom.language.syntax.Statement.StateStatement;
import org.spanloom.language.units.UnitOfMeasure;

/**
 * Lays out the states of a system in the order of their declarations, families member by member.
 *
 * <p>Ranges may need parameters, which are read after all names are known. So the layout is made
 * twice where that is so: before, with such families empty, and after.
 */
final class StateLayout {

  /** Most states of a system. */
  static final int STATE_LIMIT = 100_000;

  private final List<Declared> declared = new ArrayList<>();
  private final List<StateMeaning> states = new ArrayList<>();

  /** The declaration of a state or family whose name is free. */
  private static final class Declared {
    private final Frame frame;
    private final StateStatement statement;

    /** The unit; empty where it could not be read. */
    private final Optional<UnitOfMeasure> unit;

    /** The indices, once they are read; empty for a state, and where they could not be read. */
    private Optional<IndexSpace> space = Optional.empty();

    private boolean read;

    Declared(Frame frame, StateStatement statement, Optional<UnitOfMeasure> unit) {
      this.frame = frame;
      this.statement = statement;
      this.unit = unit;
    }

    /** Tells whether the ranges need parameters. */
    boolean needsParameters() {
      return statement.ranges().stream()
          .anyMatch(r ->
              !ExpressionNames.of(r.from()).isEmpty() || !ExpressionNames.of(r.to()).isEmpty());
    }
  }

  /** Returns the states; the list grows with the layout. */
  List<StateMeaning> states() {
    return states;
  }

  /** Takes the declaration of a state or family, whose name is free in its frame. */
  void declare(Frame frame, StateStatement state) {
    declared.add(new Declared(frame, state, frame.units().declared(state.unit())));
  }

  /**
   * Gives the declared states their meaning, and families theirs as far as their ranges are known
   * without parameters.
   *
   * @return whether there are families whose ranges need parameters
   */
  boolean layWithoutParameters() {
    boolean open = false;
    for (Declared state : declared) {
      boolean needsParameters = state.needsParameters();
      open |= needsParameters;
      lay(state, !needsParameters);
    }
    return open;
  }

  /** Gives all states their meaning anew, now that parameters have values. */
  void layAgain() {
    states.clear();
    declared.forEach(state -> lay(state, true));
  }

  private void lay(Declared state, boolean known) {
    StateStatement statement = state.statement;
    String name = statement.name().text();
    Scope scope = state.frame.scope();
    if (state.unit.isEmpty()) {
      scope.define(name, new BrokenMeaning(statement.name().span()));
    } else if (statement.isFamily()) {
      scope.define(name, family(state, known));
    } else {
      scope.define(name, add(state, state.frame.label(name)));
    }
  }

  private StateMeaning add(Declared state, String name) {
    StateMeaning meaning =
        new StateMeaning(
            states.size(), name, state.statement, state.frame, state.unit.orElseThrow());
    states.add(meaning);
    return meaning;
  }

  private Meaning family(Declared state, boolean known) {
    UnitOfMeasure unit = state.unit.orElseThrow();
    if (!known) {
      IndexSpace none = new IndexSpace(List.of(), List.of());
      return new FamilyMeaning(List.of(), state.statement, state.frame, unit, none);
    }
    if (!state.read) {
      state.space = space(state);
      state.read = true;
    }
    if (state.space.isEmpty()) {
      return new BrokenMeaning(state.statement.name().span());
    }
    IndexSpace space = state.space.get();
    String name = state.frame.label(state.statement.name().text());
    List<StateMeaning> members = new ArrayList<>();
    for (int i = 0; i < space.size(); i++) {
      members.add(add(state, name + space.shown(i)));
    }
    return new FamilyMeaning(members, state.statement, state.frame, unit, space);
  }

  private Optional<IndexSpace> space(Declared state) {
    IndexReader indices = state.frame.resolver().indices();
    List<Long> lows = new ArrayList<>();
    List<Long> highs = new ArrayList<>();
    for (IndexRange range : state.statement.ranges()) {
      OptionalLong low = indices.whole(range.from());
      OptionalLong high = indices.whole(range.to());
      if (low.isEmpty() || high.isEmpty() || isEmpty(state, range, low, high)) {
        return Optional.empty();
      }
      lows.add(low.getAsLong());
      highs.add(high.getAsLong());
    }
    IndexSpace space = new IndexSpace(lows, highs);
    if (space.size() > STATE_LIMIT - states.size()) {
      List<IndexRange> ranges = state.statement.ranges();
      state
          .frame
          .problems()
          .report(
              ProblemKind.EXPANSION_TOO_LARGE,
              ranges.getFirst().span().join(ranges.getLast().span()),
              "A system has at most "
                  + STATE_LIMIT
                  + " states, and with this family it would have more: make the range narrower.");
      return Optional.empty();
    }
    return Optional.of(space);
  }

  private static boolean isEmpty(
      Declared state, IndexRange range, OptionalLong low, OptionalLong high) {
    if (low.getAsLong() <= high.getAsLong()) {
      return false;
    }
    state
        .frame
        .problems()
        .report(
            ProblemKind.INDEX_INVALID,
            range.span(),
            "The range "
                + low.getAsLong()
                + ".."
                + high.getAsLong()
                + " is empty: the last index must not be smaller than the first.");
    return true;
  }
}
