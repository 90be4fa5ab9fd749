/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.syntax.Expression;
import org.spanloom.language.syntax.Name;
import org.spanloom.language.syntax.Statement.BoundaryStatement;
import org.spanloom.language.syntax.Statement.Condition;
import org.spanloom.language.text.Span;
import org.spanloom.language.units.UnitOfMeasure;

/** Reads boundary conditions. */
final class BoundaryReader {

  private final SystemScope system;
  private final Components components;
  private final NamedValues named;
  private final Set<String> initialValues;
  private final Problems problems;
  private final List<Boundary> boundaries = new ArrayList<>();
  private final Set<String> names = new LinkedHashSet<>();

  /**
   * Prepares.
   *
   * @param initialValues names of sets of initial values, which boundary conditions do not share
   */
  BoundaryReader(
      SystemScope system, Components components, Times times, Set<String> initialValues) {
    this.system = system;
    this.components = components;
    this.named = new NamedValues(system, components, times);
    this.initialValues = initialValues;
    this.problems = system.problems();
  }

  /** Returns the complete ones, in the order of the text. */
  List<Boundary> boundaries() {
    return boundaries;
  }

  /** Returns the names of all of them, complete or not. */
  Set<String> names() {
    return names;
  }

  /** Notes conditions whose statement could not be read, so that uses of them are not reported. */
  void noteUnread(Name name) {
    names.add(name.text());
  }

  void read(BoundaryStatement statement) {
    String name = statement.name().text();
    if (!isFree(statement.name())) {
      return;
    }
    List<Boundary.Condition> conditions = new ArrayList<>();
    boolean[] allSound = {statement.allRead()};
    boolean turnsKnown =
        system
            .resolver()
            .loops()
            .lines(
                statement.conditions(),
                line -> {
                  Optional<Boundary.Condition> condition = condition(line);
                  condition.ifPresent(conditions::add);
                  allSound[0] &= condition.isPresent();
                });
    if (allSound[0] && turnsKnown && isRightNumber(statement, conditions.size())) {
      boundaries.add(new Boundary(name, conditions, statement.span(), statement.name().span()));
    }
  }

  private boolean isFree(Name name) {
    boolean values = initialValues.contains(name.text());
    boolean free = names.add(name.text()) && !values;
    if (!free) {
      problems.report(
          ProblemKind.NAME_DUPLICATE,
          name.span(),
          (values
                  ? "There is a set of initial values"
                  : "There are two sets of boundary conditions")
              + " named \""
              + name.text()
              + "\": rename one of them.");
    }
    return free;
  }

  private boolean isRightNumber(BoundaryStatement statement, int found) {
    int n = components.dimension();
    if (found == n || n == 0) {
      return n > 0;
    }
    problems.report(
        ProblemKind.BOUNDARY_COUNT,
        statement.name().span(),
        "\""
            + statement.name().text()
            + "\" has "
            + counted(found)
            + ", but the solutions form a space of dimension "
            + n
            + ": exactly "
            + counted(n)
            + (n == 1 ? " picks" : " pick")
            + " one of them.");
    return false;
  }

  private static String counted(int count) {
    return count + (count == 1 ? " condition" : " conditions");
  }

  private Optional<Boundary.Condition> condition(Condition line) {
    Optional<UnitOfMeasure> unit =
        named.unitOfName(line.left()).or(() -> named.unitOfName(line.right()));
    Optional<Quantity> left = side(line.left(), line.right());
    Optional<Quantity> right = side(line.right(), line.left());
    if (left.isEmpty() || right.isEmpty() || !sidesAgree(line, left.get(), right.get())) {
      return Optional.empty();
    }
    QuantitySum sum = new QuantitySum();
    sum.add(false, left.get(), line.span());
    sum.add(true, right.get(), line.span());
    Quantity difference =
        sum.total(left.get().zero() ? right.get().dimension() : left.get().dimension());
    if (!standsAtNamedTimes(difference, line.span())
        || !named.timesInside(List.of(line.left(), line.right()))) {
      return Optional.empty();
    }
    return components
        .affine(
            system.root(),
            difference,
            unit.orElseGet(() -> Declarations.coherent(difference.dimension())),
            line.span())
        .map(v ->
            new Boundary.Condition(
                v.samples(),
                Simplifier.negation(v.constant()),
                v.dimension(),
                v.unit(),
                line.span()));
  }

  /** Returns the value of a side; a lone number takes the unit of a lone state or output. */
  private Optional<Quantity> side(Expression side, Expression other) {
    Optional<UnitOfMeasure> unit = named.unitOfName(other);
    return Literals.isBare(side) && unit.isPresent()
        ? system
            .resolver()
            .given(
                side,
                unit.get(),
                "\"" + system.resolver().shown(other.span()) + "\"",
                Place.BOUNDARY)
        : system.resolver().quantity(side, Place.BOUNDARY);
  }

  private boolean sidesAgree(Condition line, Quantity left, Quantity right) {
    if (left.zero() || right.zero() || left.dimension().equals(right.dimension())) {
      return true;
    }
    problems.report(
        ProblemKind.UNIT_MISMATCH,
        line.span(),
        "The left side is "
            + Resolver.in(left.dimension())
            + ", but the right side is "
            + Resolver.in(right.dimension())
            + ": both sides of a condition have one dimension; check the factors and their units.",
        Resolver.unitFix(line.right(), left.dimension()));
    return false;
  }

  private boolean standsAtNamedTimes(Quantity difference, Span span) {
    Optional<StateKey> running =
        difference.coefficients().keySet().stream().filter(k -> k.at().isEmpty()).findFirst();
    if (running.isPresent()) {
      String label =
          StateVector.label(system.states().get(running.get().state()), running.get().order());
      problems.report(
          ProblemKind.BOUNDARY_INVALID,
          span,
          "\""
              + label
              + "\" has no time in this condition: write "
              + label
              + "(2) or another time of the interval.");
    } else if (!difference.holdsStates()) {
      problems.report(
          ProblemKind.BOUNDARY_INVALID,
          span,
          "This condition holds no state, or states that cancel: write the value of one at a time,"
              + " as in x(2) = 1.");
    }
    return running.isEmpty() && difference.holdsStates();
  }
}
