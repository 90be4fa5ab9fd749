/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.Collection;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.spanloom.language.model.Meaning.StateMeaning;
import org.spanloom.language.problem.Fix;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.syntax.Statement.StateStatement;
import org.spanloom.language.text.Span;
import org.spanloom.language.units.UnitOfMeasure;

/** The states of one system, over all its frames, and what the readers of its statements share. */
final class SystemScope {

  private final Frame root;
  private final StateLayout layout = new StateLayout();
  private final Map<String, Derivative> derivatives = new LinkedHashMap<>();
  private final Map<Integer, Integer> declaredOrders = new HashMap<>();

  /** A derivative of a state, or of all members of a family, with a declaration of its own. */
  record Derivative(List<StateMeaning> states, StateStatement statement, UnitOfMeasure unit) {
    /** Copies the list. */
    Derivative {
      states = List.copyOf(states);
    }
  }

  SystemScope(Frame root) {
    this.root = root;
  }

  /** Returns the frame of the system's own statements. */
  Frame root() {
    return root;
  }

  /** Returns where problems of the system's own statements go. */
  Problems problems() {
    return root.problems();
  }

  /** Returns the names that the system's own statements use. */
  Scope scope() {
    return root.scope();
  }

  /** Returns what reads the expressions of the system's own statements. */
  Resolver resolver() {
    return root.resolver();
  }

  /** Returns the unit of time; the number 1 where it could not be read. */
  UnitOfMeasure timeUnit() {
    return root.timeUnit();
  }

  String slice(Span span) {
    return root.slice(span);
  }

  /** Returns the states, in the order of the text. */
  List<StateMeaning> states() {
    return layout.states();
  }

  /** Returns what lays out the states. */
  StateLayout layout() {
    return layout;
  }

  /** Takes the declaration of a derivative, after all states of its frame. */
  void declareDerivative(Frame frame, StateStatement derivative) {
    String name = derivative.name().text();
    if (frame.scope().timeName().isEmpty() || frame.isBroken(name)) {
      return;
    }
    List<StateMeaning> named = frame.states(name);
    if (named.isEmpty()) {
      frame
          .problems()
          .report(
              ProblemKind.NAME_UNKNOWN,
              derivative.name().span(),
              "\""
                  + derivative.label()
                  + "\" is a derivative of \""
                  + name
                  + "\", which is no state of this system: declare it with state "
                  + name
                  + ".");
      return;
    }
    if (derivative.primes() > StateVector.ORDER_LIMIT) {
      reportTooManyPrimes(frame, derivative.span());
      return;
    }
    Optional<UnitOfMeasure> declared = frame.units().declared(derivative.unit());
    // A derivative whose unit is wrong still counts as declared, so that nothing else is reported
    // for want of it.
    StateMeaning state = named.getFirst();
    UnitOfMeasure unit = state.derivativeUnit(derivative.primes());
    boolean sound = declared.isPresent() && fits(derivative, state, declared.get());
    boolean twice =
        derivatives.putIfAbsent(
                state.declaredName() + "'".repeat(derivative.primes()),
                new Derivative(named, derivative, sound ? declared.get() : unit))
            != null;
    if (twice) {
      frame
          .problems()
          .report(
              ProblemKind.NAME_DUPLICATE,
              derivative.name().span(),
              "\""
                  + derivative.label()
                  + "\" is declared twice: remove one of the two declarations.");
    }
    named.forEach(s -> declaredOrders.merge(s.index(), derivative.primes(), Math::max));
  }

  private static void reportTooManyPrimes(Frame frame, Span span) {
    frame
        .problems()
        .report(
            ProblemKind.NESTING_TOO_DEEP,
            span,
            "A state has at most "
                + StateVector.ORDER_LIMIT
                + " primes: declare further states instead.");
  }

  private static boolean fits(
      StateStatement derivative, StateMeaning state, UnitOfMeasure declared) {
    UnitOfMeasure expected = state.derivativeUnit(derivative.primes());
    Span span = derivative.unit().map(u -> u.span()).orElse(derivative.name().span());
    if (declared.offset() != 0) {
      state
          .frame()
          .problems()
          .report(
              ProblemKind.UNIT_OFFSET,
              span,
              "A derivative is a difference over time and cannot be in "
                  + declared.code()
                  + ": write ["
                  + expected.code()
                  + "].");
      return false;
    }
    if (!declared.dimension().equals(expected.dimension())) {
      state
          .frame()
          .problems()
          .report(
              ProblemKind.UNIT_MISMATCH,
              span,
              "\""
                  + derivative.label()
                  + "\" is declared "
                  + Resolver.in(declared.dimension())
                  + ", but it is "
                  + Resolver.in(expected.dimension())
                  + ": write ["
                  + expected.code()
                  + "] or another unit of that dimension.",
              derivative.unit().isEmpty()
                  ? Fix.insert(
                      "Add [" + expected.code() + "]",
                      derivative.name().span().end() + derivative.primes(),
                      " [" + expected.code() + "]")
                  : Fix.replace(
                      "Write [" + expected.code() + "]", span, "[" + expected.code() + "]"));
      return false;
    }
    return true;
  }

  /** Returns the declared derivatives, in the order of the text. */
  Collection<Derivative> derivatives() {
    return derivatives.values();
  }

  /** Returns the highest number of primes a state is declared with, 0 if only it itself is. */
  int declaredDerivatives(int state) {
    return declaredOrders.getOrDefault(state, 0);
  }

  /** Returns the state, or the members of the family, of a name that the whole system uses. */
  List<StateMeaning> members(String declaredName) {
    return states().stream().filter(s -> s.declaredName().equals(declaredName)).toList();
  }

  /** Returns the declaration of a derivative, by the declared name with its primes. */
  Optional<Derivative> derivative(String label) {
    return Optional.ofNullable(derivatives.get(label));
  }
}
