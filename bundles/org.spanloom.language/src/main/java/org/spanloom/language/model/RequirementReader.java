/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayList;
import java.util.Collection;
import java.util.List;
import java.util.Optional;
import org.spanloom.language.problem.Fix;
import org.spanloom.language.problem.Nearest;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.syntax.Comparison;
import org.spanloom.language.syntax.Expression;
import org.spanloom.language.syntax.Expression.NumberExpression;
import org.spanloom.language.syntax.Name;
import org.spanloom.language.syntax.RequireClause;
import org.spanloom.language.syntax.RequireClause.Compares;
import org.spanloom.language.syntax.RequireClause.HasPeriod;
import org.spanloom.language.syntax.RequireClause.IsInvariant;
import org.spanloom.language.syntax.RequireClause.IsNonnegative;
import org.spanloom.language.syntax.RequireClause.IsStable;
import org.spanloom.language.syntax.RequireClause.LimitsCondition;
import org.spanloom.language.syntax.TokenKind;
import org.spanloom.language.text.Span;
import org.spanloom.language.units.UnitOfMeasure;

/** Reads requirements. */
final class RequirementReader {

  private final SystemScope system;
  private final Components components;
  private final Times times;
  private final InitialValuesReader initialValues;
  private final BoundaryReader boundaries;
  private final BasisReader bases;
  private final NamedValues named;
  private final Problems problems;
  private final List<Requirement> requirements = new ArrayList<>();

  RequirementReader(
      SystemScope system,
      Components components,
      Times times,
      InitialValuesReader initialValues,
      BoundaryReader boundaries,
      BasisReader bases) {
    this.system = system;
    this.components = components;
    this.times = times;
    this.initialValues = initialValues;
    this.boundaries = boundaries;
    this.bases = bases;
    this.named = new NamedValues(system, components, times);
    this.problems = system.problems();
  }

  /** Returns the requirements that have a meaning. */
  List<Requirement> requirements() {
    return requirements;
  }

  void read(RequireClause clause) {
    Optional<? extends Requirement> requirement =
        switch (clause) {
          case Compares compares -> compares(compares);
          case LimitsCondition condition -> condition(condition);
          case IsStable stable -> Optional.of(new Requirement.Stable(stable.span(), text(stable)));
          case IsNonnegative nonnegative ->
              under(nonnegative.under(), true, nonnegative.span())
                  .map(u -> new Requirement.Nonnegative(u, nonnegative.span(), text(nonnegative)));
          case IsInvariant invariant -> invariant(invariant);
          case HasPeriod period -> period(period);
        };
    requirement.ifPresent(requirements::add);
  }

  /** Returns the text of a requirement, and in a loop for which turn it stands. */
  private String text(RequireClause clause) {
    String text = system.slice(clause.span());
    IndexStack indices = problems.indices();
    return indices.isEmpty() ? text : text + " (" + indices.text() + ")";
  }

  private Optional<Requirement> compares(Compares clause) {
    Comparison comparison = clause.comparison();
    Optional<Quantity> left = system.resolver().quantity(comparison.left(), Place.COMPARISON);
    Optional<Quantity> right = system.resolver().quantity(comparison.right(), Place.COMPARISON);
    if (left.isEmpty() || right.isEmpty() || !sidesAgree(comparison, left.get(), right.get())) {
      return Optional.empty();
    }
    boolean samples = holdsSample(left.get()) || holdsSample(right.get());
    boolean running = dependsOnTime(left.get()) || dependsOnTime(right.get());
    if (clause.throughout() && samples) {
      return incomplete(
          comparison.span(),
          "A requirement throughout the interval names no times: remove the times in parentheses,"
              + " or \"throughout\".");
    }
    if (!clause.throughout() && running) {
      return incomplete(
          comparison.span(),
          samples
              ? "Some values in it stand at named times and some at the running time: name a time"
                  + " for all of them."
              : "It does not say when it must hold: name a time, as in x(2), or write throughout.",
          samples
              ? new Fix[0]
              : new Fix[] {Fix.insert("Add throughout", comparison.span().end(), " throughout")});
    }
    Optional<Term> until = clause.until().flatMap(times::time);
    if (clause.until().isPresent() && until.isEmpty()
        || !named.timesInside(List.of(comparison.left(), comparison.right()))) {
      return Optional.empty();
    }
    boolean needsSolution = left.get().holdsStates() || right.get().holdsStates();
    Optional<String> under = under(clause.under(), needsSolution, clause.span());
    UnitOfMeasure unit = shownUnit(comparison, left.get(), right.get());
    Optional<AffineValue> a =
        components.affine(system.root(), left.get(), unit, comparison.left().span());
    Optional<AffineValue> b =
        components.affine(system.root(), right.get(), unit, comparison.right().span());
    if (under.isEmpty() || a.isEmpty() || b.isEmpty()) {
      return Optional.empty();
    }
    Relation relation = relation(comparison.sign());
    return Optional.of(
        clause.throughout()
            ? new Requirement.Throughout(
                a.get(), relation, b.get(), until, under.get(), clause.span(), text(clause))
            : new Requirement.AtTime(
                a.get(), relation, b.get(), under.get(), clause.span(), text(clause)));
  }

  private boolean sidesAgree(Comparison comparison, Quantity left, Quantity right) {
    if (left.zero() != right.zero()) {
      return zeroIsClear(left.zero() ? comparison.left() : comparison.right(), comparison);
    }
    if (left.dimension().equals(right.dimension())) {
      return true;
    }
    problems.report(
        ProblemKind.UNIT_MISMATCH,
        comparison.span(),
        "The left side is "
            + Resolver.in(left.dimension())
            + ", but the right side is "
            + Resolver.in(right.dimension())
            + ": only values of one dimension can be compared; give numbers their units.",
        Resolver.unitFix(comparison.right(), left.dimension()));
    return false;
  }

  /** A bare 0 fits every dimension, but not a scale with a zero point of its own. */
  private boolean zeroIsClear(Expression zero, Comparison comparison) {
    Expression other = zero.equals(comparison.left()) ? comparison.right() : comparison.left();
    Optional<UnitOfMeasure> unit = named.unitOfName(other).filter(u -> u.offset() != 0);
    if (unit.isEmpty()) {
      return true;
    }
    String code = unit.get().code();
    problems.report(
        ProblemKind.UNIT_OFFSET,
        zero.span(),
        "\""
            + system.resolver().shown(other.span())
            + "\" is on the scale "
            + code
            + ", and 0 without a unit does not say on which scale it is: write 0 ["
            + code
            + "] or 0 [K].",
        Fix.insert("Add [" + code + "]", zero.span().end(), " [" + code + "]"));
    return false;
  }

  private static boolean holdsSample(Quantity quantity) {
    return quantity.coefficients().keySet().stream().anyMatch(k -> k.at().isPresent());
  }

  private static boolean dependsOnTime(Quantity quantity) {
    return quantity.coefficients().keySet().stream().anyMatch(k -> k.at().isEmpty())
        || TimeDependence.of(quantity.constant().term()) == TimeDependence.TIME;
  }

  /**
   * Returns the unit to show a comparison in: that of a lone number, else that of a lone name, else
   * a coherent one.
   */
  private UnitOfMeasure shownUnit(Comparison comparison, Quantity left, Quantity right) {
    for (Expression side : List.of(comparison.right(), comparison.left())) {
      Optional<UnitOfMeasure> unit =
          Literals.alone(side)
              .flatMap(NumberExpression::unit)
              .flatMap(UnitResolver::known)
              .or(() -> named.unitOfName(side));
      if (unit.isPresent()) {
        return unit.get();
      }
    }
    return Declarations.coherent(left.zero() ? right.dimension() : left.dimension());
  }

  private Optional<Requirement> condition(LimitsCondition clause) {
    boolean known = bases.names().contains(clause.basis().text());
    if (!known) {
      unknown(clause.basis(), "basis", bases.names());
    }
    Optional<Term> limit =
        plain(clause.limit(), UnitOfMeasure.ONE, "a condition number", Place.LIMIT);
    Optional<Term> until = clause.until().flatMap(times::time);
    boolean upper = relation(clause.sign()).isUpperLimit();
    if (!upper) {
      return incomplete(clause.span(), "A condition number is limited from above: write < or <=.");
    }
    if (!known || limit.isEmpty() || clause.until().isPresent() && until.isEmpty()) {
      return Optional.empty();
    }
    return Optional.of(
        new Requirement.Condition(
            clause.basis().text(),
            clause.scaled(),
            relation(clause.sign()),
            limit.get(),
            until,
            clause.span(),
            text(clause)));
  }

  private Optional<Requirement> invariant(IsInvariant clause) {
    return system
        .resolver()
        .quantity(clause.value(), Place.INVARIANT)
        .flatMap(q ->
            components.affine(
                system.root(),
                q,
                named
                    .unitOfName(clause.value())
                    .orElseGet(() -> Declarations.coherent(q.dimension())),
                clause.value().span()))
        .map(v -> new Requirement.Invariant(v, clause.span(), text(clause)));
  }

  private Optional<Requirement> period(HasPeriod clause) {
    Optional<Term> period =
        plain(clause.period(), times.unit(), "the independent variable", Place.PERIOD);
    if (period.isPresent() && !(TermEvaluator.constant(period.get()) > 0)) {
      return incomplete(clause.period().span(), "A period is positive: check its value.");
    }
    return period.map(p -> new Requirement.Period(p, clause.span(), text(clause)));
  }

  private Optional<Term> plain(
      Expression expression, UnitOfMeasure unit, String what, Place place) {
    return system.resolver().given(expression, unit, what, place).map(q -> q.constant().term());
  }

  /**
   * Returns the name of the initial values or boundary conditions meant, empty for the values of
   * the declarations.
   */
  private Optional<String> under(Optional<Name> name, boolean needed, Span span) {
    List<String> names = new ArrayList<>(initialValues.names());
    names.addAll(boundaries.names());
    if (name.isPresent()) {
      boolean known = names.contains(name.get().text());
      if (!known) {
        unknown(
            name.get(),
            boundaries.names().isEmpty()
                ? "set of initial values"
                : "set of initial values or boundary conditions",
            names);
      }
      return known ? Optional.of(name.get().text()) : Optional.empty();
    }
    if (!needed || initialValues.declarationsHaveValues()) {
      return Optional.of("");
    }
    return incomplete(
            span,
            names.isEmpty()
                ? "It needs a solution, and there are no initial values: give the states values, as"
                    + " in state x = 1."
                : "It does not say for which "
                    + (boundaries.names().isEmpty()
                        ? "initial values"
                        : "initial values or boundary conditions")
                    + ": write under and one of "
                    + String.join(", ", names)
                    + ".",
            names.stream()
                .limit(3)
                .map(n -> Fix.insert("Add under " + n, span.end(), " under " + n))
                .toArray(Fix[]::new))
        .map(Requirement::text);
  }

  private void unknown(Name name, String what, Collection<String> names) {
    Optional<String> nearest =
        problems.maySuggest()
            ? Nearest.of(name.text(), names.stream().sorted().toList())
            : Optional.empty();
    problems.report(
        ProblemKind.NAME_UNKNOWN,
        name.span(),
        "There is no "
            + what
            + " \""
            + name.text()
            + "\""
            + nearest
                .map(n -> ": did you mean " + n + "?")
                .orElse(
                    names.isEmpty()
                        ? ": declare one."
                        : ": there is "
                            + String.join(", ", names.stream().sorted().limit(5).toList())
                            + "."),
        nearest.stream().map(n -> Fix.replace("Write " + n, name.span(), n)).toArray(Fix[]::new));
  }

  private Optional<Requirement> incomplete(Span span, String message, Fix... fixes) {
    problems.report(ProblemKind.REQUIREMENT_INCOMPLETE, span, message, fixes);
    return Optional.empty();
  }

  private static Relation relation(TokenKind sign) {
    return switch (sign) {
      case LESS -> Relation.LESS;
      case AT_MOST -> Relation.AT_MOST;
      case GREATER -> Relation.GREATER;
      default -> Relation.AT_LEAST;
    };
  }
}
