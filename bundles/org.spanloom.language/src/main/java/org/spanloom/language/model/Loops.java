/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.Set;
import java.util.function.BooleanSupplier;
import java.util.function.Consumer;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.syntax.BlockLine;
import org.spanloom.language.syntax.BlockLine.RepeatedLines;
import org.spanloom.language.syntax.BlockLine.SingleLine;
import org.spanloom.language.syntax.Name;
import org.spanloom.language.syntax.Statement;
import org.spanloom.language.syntax.Statement.ForStatement;
import org.spanloom.language.syntax.Turns;
import org.spanloom.language.text.Span;

/**
 * Goes through the turns of loops and sums. In each turn the index is a name with a value; what is
 * wrong with a repeated statement is reported once.
 */
final class Loops {

  /** Most turns of all loops and sums of a system together. */
  static final int TURN_LIMIT = 1_000_000;

  private final Scope scope;
  private final Problems problems;
  private final IndexReader indices;
  private final RepetitionBudget repetition;
  private final Set<Span> namesSeen = new HashSet<>();
  private long turns;
  private boolean exhausted;

  Loops(Scope scope, Problems problems, IndexReader indices, RepetitionBudget repetition) {
    this.scope = scope;
    this.problems = problems;
    this.indices = indices;
    this.repetition = repetition;
  }

  /** What reads the statements of a body, loops followed. */
  interface Reading {
    /** Tells whether statements like this one are read. */
    boolean wants(Statement statement);

    void read(Statement statement);

    /** Takes a loop whose turns are not known or too many. */
    void unread(ForStatement loop);

    /** Takes a loop without a turn. */
    void empty(ForStatement loop);
  }

  /** Reads the statements of a body in the order of the text, those of loops in each turn. */
  void statements(List<Statement> body, Reading reading) {
    for (Statement statement : body) {
      if (statement instanceof ForStatement loop) {
        if (holds(loop, reading)) {
          loop(loop, reading);
        }
      } else if (reading.wants(statement)) {
        if (problems.indices().isEmpty()) {
          reading.read(statement);
        } else {
          problems.inTurn(statement, () -> reading.read(statement));
        }
      }
    }
  }

  private static boolean holds(ForStatement loop, Reading reading) {
    for (Statement statement : loop.body()) {
      boolean wanted =
          statement instanceof ForStatement inner
              ? holds(inner, reading)
              : reading.wants(statement);
      if (wanted) {
        return true;
      }
    }
    return false;
  }

  private void loop(ForStatement loop, Reading reading) {
    boolean[] empty = {true};
    boolean known =
        each(
            loop.turns(),
            loop.span(),
            () -> {
              empty[0] = false;
              statements(loop.body(), reading);
              return !exhausted;
            });
    if (!known || exhausted) {
      reading.unread(loop);
    } else if (empty[0]) {
      reading.empty(loop);
    }
  }

  /**
   * Hands out the lines of a block in the order of the text, those of loops in each turn.
   *
   * @return whether the turns of all loops are known
   */
  <T> boolean lines(List<BlockLine<T>> lines, Consumer<T> reader) {
    boolean known = true;
    for (BlockLine<T> line : lines) {
      switch (line) {
        case SingleLine<T> single when problems.indices().isEmpty() ->
            reader.accept(single.content());
        case SingleLine<T> single -> problems.inTurn(single, () -> reader.accept(single.content()));
        case RepeatedLines<T> repeated ->
            known &= each(repeated.turns(), repeated.span(), () -> lines(repeated.lines(), reader));
      }
    }
    return known && !exhausted;
  }

  /**
   * Goes through some turns.
   *
   * @param repeated the text that is read in each turn
   * @param turn done in each turn; tells whether to go on
   * @return whether the turns are known and not too many
   */
  boolean each(Turns turns, Span repeated, BooleanSupplier turn) {
    boolean outermost = problems.indices().isEmpty();
    long[] bounds = new long[2];
    boolean[] known = new boolean[1];
    if (outermost) {
      known[0] = bounds(turns, bounds);
    } else {
      problems.inTurn(turns, () -> known[0] = bounds(turns, bounds));
    }
    if (!known[0] || exhausted) {
      return false;
    }
    long count = Math.max(0, bounds[1] - bounds[0] + 1);
    if (count > TURN_LIMIT - this.turns) {
      reportTooMany(turns);
      return false;
    }
    if (!repetition.allows(count, repeated.length())) {
      reportTooMuchText(turns);
      return false;
    }
    this.turns += count;
    if (count == 0 && outermost) {
      reportEmpty(turns, bounds);
    }
    go(turns.index(), bounds, turn);
    if (outermost) {
      problems.closeTurns();
    }
    return true;
  }

  private boolean bounds(Turns turns, long[] bounds) {
    boolean free = isFree(turns.index());
    OptionalLong from = indices.whole(turns.from());
    OptionalLong to = indices.whole(turns.to());
    if (from.isEmpty() || to.isEmpty()) {
      return false;
    }
    bounds[0] = from.getAsLong();
    bounds[1] = to.getAsLong();
    return free;
  }

  private void go(Name index, long[] bounds, BooleanSupplier turn) {
    String name = index.text();
    Optional<Meaning> hidden = scope.own(name);
    problems.indices().push(name);
    for (long value = bounds[0]; value <= bounds[1]; value++) {
      scope.define(name, new Meaning.IndexMeaning(value, index.span()));
      problems.indices().set(value);
      if (!turn.getAsBoolean()) {
        break;
      }
    }
    problems.indices().pop();
    scope.restore(name, hidden);
  }

  /** Tells whether a name can be an index; reports it, once, if it cannot or hides another. */
  private boolean isFree(Name index) {
    String name = index.text();
    boolean builtIn = Function.named(name).isPresent() || NamedConstant.named(name).isPresent();
    boolean time = name.equals(scope.timeName());
    boolean first = namesSeen.add(index.span());
    if (first && builtIn) {
      problems.reportForAllTurns(
          ProblemKind.NAME_RESERVED,
          index.span(),
          "\"" + name + "\" is built in and cannot name an index: choose another name.");
    } else if (first && time) {
      problems.reportForAllTurns(
          ProblemKind.NAME_DUPLICATE,
          index.span(),
          "\""
              + name
              + "\" is the independent variable and cannot name an index: choose another name.");
    } else if (first && (scope.own(name).isPresent() || scope.isDeclaredOutside(name))) {
      problems.reportForAllTurns(
          ProblemKind.NAME_SHADOWED,
          index.span(),
          "The index \""
              + name
              + "\" hides the declaration of that name: rename one of them if both are meant.");
    }
    return !builtIn && !time;
  }

  private void reportTooMany(Turns turns) {
    exhausted = true;
    problems.report(
        ProblemKind.EXPANSION_TOO_LARGE,
        turns.span(),
        "All loops and sums of a system have at most "
            + TURN_LIMIT
            + " turns together, and this one would exceed it: make its bounds narrower.");
  }

  private void reportTooMuchText(Turns turns) {
    exhausted = true;
    problems.report(
        ProblemKind.EXPANSION_TOO_LARGE,
        turns.span(),
        "All loops and sums of a model repeat at most "
            + RepetitionBudget.TEXT_LIMIT
            + " characters of text together, and this one would exceed it: make its bounds"
            + " narrower, or what it repeats shorter.");
  }

  private void reportEmpty(Turns turns, long[] bounds) {
    problems.report(
        ProblemKind.LOOP_EMPTY,
        turns.span(),
        "There is no turn, since the last index "
            + bounds[1]
            + " is smaller than the first, "
            + bounds[0]
            + ": check the bounds.");
  }
}
