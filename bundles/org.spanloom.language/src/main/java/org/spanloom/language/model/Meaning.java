/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.List;
import org.spanloom.language.syntax.Statement.StateStatement;
import org.spanloom.language.text.Span;
import org.spanloom.language.units.UnitOfMeasure;

/** What a declared name stands for. */
sealed interface Meaning {

  /** Returns the place of the name in its declaration. */
  Span nameSpan();

  /** The independent variable. */
  record TimeMeaning(UnitOfMeasure unit, Span nameSpan) implements Meaning {}

  /** A parameter. */
  record ParameterMeaning(Parameter parameter, int depth) implements Meaning {
    @Override
    public Span nameSpan() {
      return parameter.nameSpan();
    }
  }

  /** A named expression. */
  record LetMeaning(Let let, int depth) implements Meaning {
    @Override
    public Span nameSpan() {
      return let.nameSpan();
    }
  }

  /**
   * A state.
   *
   * @param index place among the states of the system
   * @param name how the whole system names it, a member of a family with its indices
   * @param statement its declaration
   * @param frame where that was read
   * @param unit its unit
   */
  record StateMeaning(
      int index, String name, StateStatement statement, Frame frame, UnitOfMeasure unit)
      implements Meaning {
    @Override
    public Span nameSpan() {
      return frame.placed(statement.name().span());
    }

    /** Returns the name with primes, as the whole system uses it. */
    String label(int primes) {
      return primes == 0 ? name : name + "'".repeat(primes);
    }

    /**
     * Returns the name of its declaration as the whole system uses it, of a member its family's.
     */
    String declaredName() {
      return frame.label(statement.name().text());
    }

    /** Returns the place of the declaration. */
    Span declared() {
      return frame.placed(statement.span());
    }

    /** Returns the unit of a derivative that is not declared. */
    UnitOfMeasure derivativeUnit(int primes) {
      return frame.derivativeUnit(unit, primes);
    }
  }

  /**
   * A matrix.
   *
   * @param matrix its declaration
   * @param value its entries
   */
  record MatrixMeaning(NamedMatrix matrix, MatrixValue value) implements Meaning {
    @Override
    public Span nameSpan() {
      return matrix.nameSpan();
    }
  }

  /**
   * A family of states.
   *
   * @param members its members, the last index running fastest; none while the ranges are not known
   * @param statement its declaration
   * @param frame where that was read
   * @param unit the unit of each member
   * @param space its indices
   */
  record FamilyMeaning(
      List<StateMeaning> members,
      StateStatement statement,
      Frame frame,
      UnitOfMeasure unit,
      IndexSpace space)
      implements Meaning {
    /** Copies the list. */
    public FamilyMeaning {
      members = List.copyOf(members);
    }

    @Override
    public Span nameSpan() {
      return frame.placed(statement.name().span());
    }
  }

  /** The index of a loop or sum in one of its turns. */
  record IndexMeaning(long value, Span nameSpan) implements Meaning {}

  /** An output. */
  record OutputMeaning(Quantity value, UnitOfMeasure unit, Span nameSpan) implements Meaning {}

  /**
   * An input of a part that is bound to something that holds states of the surrounding system.
   *
   * @param value what it is bound to
   * @param unit its declared unit
   */
  record BoundInputMeaning(Quantity value, UnitOfMeasure unit, Span nameSpan) implements Meaning {}

  /**
   * A part.
   *
   * @param frame where its statements are read
   */
  record PartMeaning(Frame frame, Span nameSpan) implements Meaning {}

  /** Something whose declaration has a problem of its own; uses of it are not reported again. */
  record BrokenMeaning(Span nameSpan) implements Meaning {}

  /** Returns what this is, for messages. */
  default String kind() {
    return switch (this) {
      case TimeMeaning m -> "the independent variable";
      case ParameterMeaning m -> "a parameter";
      case LetMeaning m ->
          m.let().isInput() ? "an input" : m.let().isTable() ? "a table" : "a named expression";
      case StateMeaning m -> "a state";
      case MatrixMeaning m -> "a matrix";
      case FamilyMeaning m -> "a family";
      case IndexMeaning m -> "an index";
      case OutputMeaning m -> "an output";
      case BoundInputMeaning m -> "an input";
      case PartMeaning m -> "a part";
      case BrokenMeaning m -> "a broken declaration";
    };
  }
}
