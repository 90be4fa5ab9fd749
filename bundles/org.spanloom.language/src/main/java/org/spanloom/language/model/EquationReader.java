/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashSet;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.Set;
import org.spanloom.language.model.Meaning.MatrixMeaning;
import org.spanloom.language.model.Meaning.StateMeaning;
import org.spanloom.language.problem.Fix;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.syntax.Expression.NameExpression;
import org.spanloom.language.syntax.Statement.EquationStatement;
import org.spanloom.language.syntax.Statement.StateStatement;
import org.spanloom.language.text.Span;

/** Gives the equations of a system their meaning and finds the orders of its states. */
final class EquationReader {

  private final SystemScope system;
  private final List<ResolvedEquation> equations = new ArrayList<>();
  private final boolean[] mentioned;
  private final int[] orders;
  private final Map<EquationStatement, List<NameExpression>> derivatives = new IdentityHashMap<>();
  private final List<ResolvedEquation> balances = new ArrayList<>();

  /** Families of which a member with an index that is wrong stands in some equation. */
  private final Set<String> unclear = new HashSet<>();

  private final Set<Span> refused = new HashSet<>();
  private boolean allRead = true;

  EquationReader(SystemScope system) {
    this.system = system;
    this.orders = new int[system.states().size()];
    this.mentioned = new boolean[orders.length];
  }

  /** Takes an equation of a frame. */
  void read(Frame frame, EquationStatement statement) {
    for (NameExpression name : derivatives.computeIfAbsent(statement, s -> derivatives(s))) {
      note(frame, name);
    }
    Optional<? extends Value> left = frame.resolver().value(statement.left(), Place.EQUATION);
    Optional<? extends Value> right = frame.resolver().value(statement.right(), Place.EQUATION);
    if (left.isEmpty()
        || right.isEmpty()
        || !sidesAgree(frame, statement, left.get(), right.get())) {
      allRead = false;
    } else if (left.get() instanceof Quantity l && right.get() instanceof Quantity r) {
      add(frame, statement, l, r);
    } else {
      addRows(frame, statement, left.get(), right.get());
    }
  }

  private void add(Frame frame, EquationStatement statement, Quantity left, Quantity right) {
    equations.add(
        new ResolvedEquation(
            frame,
            left,
            statement.left().span(),
            right,
            statement.right().span(),
            OptionalInt.empty(),
            statement.span()));
    noteOrders(left);
    noteOrders(right);
  }

  /** An equation between matrices is one equation for each entry. */
  private void addRows(Frame frame, EquationStatement statement, Value left, Value right) {
    MatrixValue shape = (MatrixValue) (left instanceof MatrixValue ? left : right);
    for (int row = 0; row < shape.rows(); row++) {
      for (int column = 0; column < shape.columns(); column++) {
        add(frame, statement, entry(left, row, column), entry(right, row, column));
      }
    }
  }

  private static Quantity entry(Value side, int row, int column) {
    return switch (side) {
      case Quantity zero -> zero;
      case MatrixValue matrix -> matrix.at(row, column);
    };
  }

  /**
   * Notes that an equation may be missing because a statement could not be read.
   *
   * @param frame where the statement was read
   * @param names states whose equation it may be
   */
  void noteUnread(Frame frame, Set<String> names) {
    allRead = false;
    for (String name : names) {
      frame.states(name).forEach(state -> mentioned[state.index()] = true);
    }
  }

  /** Takes the balance of a state that transfers govern. */
  void addBalance(ResolvedEquation balance) {
    balances.add(balance);
    noteOrders(balance.left());
    noteOrders(balance.right());
  }

  /** Notes that something which may be part of an equation has no meaning. */
  void noteUnread() {
    allRead = false;
  }

  /** Returns the balances and the equations that have a meaning, balances first. */
  List<ResolvedEquation> equations() {
    List<ResolvedEquation> all = new ArrayList<>(balances);
    all.addAll(equations);
    return all;
  }

  /** Tells whether every equation has a meaning. */
  boolean allRead() {
    return allRead;
  }

  /** Tells whether a derivative of a state stands in some equation, with or without a meaning. */
  boolean isMentioned(int state) {
    return mentioned[state];
  }

  private static List<NameExpression> derivatives(EquationStatement statement) {
    List<NameExpression> names = new ArrayList<>(ExpressionNames.of(statement.left()));
    names.addAll(ExpressionNames.of(statement.right()));
    names.removeIf(name -> name.primes() == 0);
    return List.copyOf(names);
  }

  /**
   * Notes a derivative as written, so that it counts even where it cancels or the equation has no
   * meaning. Of a family without a known index it may be that of any member.
   */
  private void note(Frame frame, NameExpression name) {
    List<StateMeaning> states = frame.states(name.name().text());
    if (name.isIndexed() && !states.isEmpty()) {
      Optional<StateMeaning> member = frame.resolver().indices().quietMember(name);
      if (member.isEmpty()) {
        if (unclear.add(frame.label(name.name().text()))) {
          states.forEach(state -> mentioned[state.index()] = true);
        }
        return;
      }
      states = List.of(member.get());
    }
    states.forEach(state -> mention(state.index(), name.primes()));
    if (frame.scope().own(name.name().text()).orElse(null) instanceof MatrixMeaning m) {
      noteDerivatives(m.value(), name.primes());
    }
  }

  private void noteDerivatives(MatrixValue states, int primes) {
    for (MatrixValue.Entry entry : states.entries()) {
      entry.value().single().ifPresent(key -> mention(key.state(), key.order() + primes));
    }
  }

  private void mention(int state, int order) {
    mentioned[state] = true;
    raise(state, order);
  }

  private void noteOrders(Quantity side) {
    side.coefficients().keySet().forEach(key -> raise(key.state(), key.order()));
  }

  private void raise(int state, int order) {
    orders[state] = Math.max(orders[state], Math.min(order, StateVector.ORDER_LIMIT));
  }

  private static boolean sidesAgree(
      Frame frame, EquationStatement statement, Value left, Value right) {
    if (left.zero() || right.zero()) {
      return true;
    }
    String leftShape = MatrixAlgebra.shape(left);
    String rightShape = MatrixAlgebra.shape(right);
    if (!leftShape.equals(rightShape)) {
      frame
          .problems()
          .report(
              ProblemKind.SHAPE_MISMATCH,
              statement.span(),
              "The left side is "
                  + leftShape
                  + ", but the right side is "
                  + rightShape
                  + ": both sides of an equation have one shape.");
      return false;
    }
    if (left.dimension().equals(right.dimension())) {
      return true;
    }
    frame
        .problems()
        .report(
            ProblemKind.UNIT_MISMATCH,
            statement.span(),
            "The left side is "
                + Resolver.in(left.dimension())
                + ", but the right side is "
                + Resolver.in(right.dimension())
                + ": both sides of an equation have one dimension; check the factors and their"
                + " units.");
    return false;
  }

  /**
   * Returns the components of the state vector, known from the equations; where a state has none,
   * from its declarations. Reports derivatives that are declared but no component.
   */
  StateVector stateVector() {
    balances.forEach(b -> refuseHigherOrders(b.balanced().getAsInt()));
    int[] known = new int[orders.length];
    Arrays.setAll(
        known, i -> orders[i] > 0 ? orders[i] : Math.max(1, system.declaredDerivatives(i) + 1));
    for (SystemScope.Derivative derivative : system.derivatives()) {
      Optional<StateMeaning> lower =
          derivative.states().stream()
              .filter(state -> derivative.statement().primes() >= known[state.index()])
              .findFirst();
      if (lower.isPresent()) {
        reportDerivativeAlone(derivative.statement(), lower.get(), known[lower.get().index()]);
        allRead = false;
      }
    }
    return new StateVector(system.states(), known);
  }

  /** Transfers give the first derivative of a state, so that no equation can give a higher one. */
  private void refuseHigherOrders(int state) {
    if (orders[state] < 2) {
      return;
    }
    for (ResolvedEquation equation : List.copyOf(equations)) {
      if (holdsHigher(equation.left(), state) || holdsHigher(equation.right(), state)) {
        String name = system.states().get(state).name();
        equations.remove(equation);
        if (!refused.add(equation.span())) {
          continue;
        }
        equation
            .frame()
            .problems()
            .report(
                ProblemKind.TOO_MANY_EQUATIONS,
                equation.span(),
                "\""
                    + name
                    + "\" is governed by transfers, which give \""
                    + name
                    + "'\", so no higher derivative of it can stand in an equation: remove the"
                    + " primes or the transfers.");
      }
    }
    orders[state] = 1;
    allRead = false;
  }

  private static boolean holdsHigher(Quantity side, int state) {
    return side.coefficients().keySet().stream().anyMatch(k -> k.state() == state && k.order() > 1);
  }

  private static void reportDerivativeAlone(
      StateStatement statement, StateMeaning state, int order) {
    state
        .frame()
        .problems()
        .report(
            ProblemKind.STATE_WITHOUT_EQUATION,
            statement.span(),
            "\""
                + statement.label()
                + "\" is declared, but no equation holds \""
                + state.label(statement.primes() + 1)
                + "\": the equations of \""
                + state.name()
                + "\" go up to \""
                + state.label(order)
                + "\". Remove the declaration or write an equation of higher order.",
            Fix.replace("Remove the declaration", statement.span(), ""));
  }
}
