/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayList;
import java.util.Collection;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.spanloom.language.model.Meaning.BrokenMeaning;
import org.spanloom.language.model.Meaning.StateMeaning;
import org.spanloom.language.problem.Fix;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.syntax.Statement;
import org.spanloom.language.syntax.Statement.StateStatement;
import org.spanloom.language.syntax.Statement.SystemStatement;
import org.spanloom.language.text.SourceText;
import org.spanloom.language.text.Span;
import org.spanloom.language.units.Dimension;
import org.spanloom.language.units.UnitOfMeasure;

/** The names of one system and what the readers of its statements share. */
final class SystemScope {

  private final SourceText source;
  private final SystemStatement statement;
  private final Problems problems;
  private final Scope scope;
  private final UnitResolver units;
  private final Resolver resolver;
  private final UnitOfMeasure timeUnit;
  private final List<StateMeaning> states = new ArrayList<>();
  private final Map<String, Derivative> derivatives = new LinkedHashMap<>();
  private final Map<String, Integer> declaredOrders = new HashMap<>();

  /** A derivative of a state with a declaration of its own. */
  record Derivative(StateStatement statement, UnitOfMeasure unit) {}

  SystemScope(
      SourceText source,
      SystemStatement statement,
      Problems problems,
      Scope scope,
      UnitOfMeasure timeUnit) {
    this.source = source;
    this.statement = statement;
    this.problems = problems;
    this.scope = scope;
    this.units = new UnitResolver(problems);
    this.resolver = new Resolver(source, scope, problems, units);
    this.timeUnit = timeUnit;
  }

  Problems problems() {
    return problems;
  }

  Scope scope() {
    return scope;
  }

  UnitResolver units() {
    return units;
  }

  Resolver resolver() {
    return resolver;
  }

  /** Returns the unit of time; the number 1 where it could not be read. */
  UnitOfMeasure timeUnit() {
    return timeUnit;
  }

  String slice(Span span) {
    return source.slice(span);
  }

  /** Returns the states, in the order of the text. */
  List<StateMeaning> states() {
    return states;
  }

  Optional<StateMeaning> state(String name) {
    return scope.own(name).filter(StateMeaning.class::isInstance).map(StateMeaning.class::cast);
  }

  /** Takes the declaration of a state, whose name is free. */
  void declareState(StateStatement state) {
    Optional<UnitOfMeasure> unit = units.declared(state.unit());
    String name = state.name().text();
    if (unit.isEmpty()) {
      scope.define(name, new BrokenMeaning(state.name().span()));
      return;
    }
    StateMeaning meaning = new StateMeaning(states.size(), state, unit.get());
    states.add(meaning);
    scope.define(name, meaning);
  }

  /** Takes the declaration of a derivative, after all states. */
  void declareDerivative(StateStatement derivative) {
    String name = derivative.name().text();
    Optional<Meaning> meaning = scope.own(name);
    boolean timeUnknown = scope.timeName().isEmpty();
    if (timeUnknown || meaning.isPresent() && meaning.get() instanceof BrokenMeaning) {
      return;
    }
    Optional<StateMeaning> state = state(name);
    if (state.isEmpty()) {
      problems.report(
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
      reportTooManyPrimes(derivative.span());
      return;
    }
    Optional<UnitOfMeasure> declared = units.declared(derivative.unit());
    // A derivative whose unit is wrong still counts as declared, so that nothing else is reported
    // for want of it.
    UnitOfMeasure unit = derivativeUnit(state.get(), derivative.primes());
    boolean sound = declared.isPresent() && fits(derivative, state.get(), declared.get());
    boolean twice =
        derivatives.putIfAbsent(
                derivative.label(), new Derivative(derivative, sound ? declared.get() : unit))
            != null;
    if (twice) {
      problems.report(
          ProblemKind.NAME_DUPLICATE,
          derivative.name().span(),
          "\"" + derivative.label() + "\" is declared twice: remove one of the two declarations.");
    }
    declaredOrders.merge(name, derivative.primes(), Math::max);
  }

  void reportTooManyPrimes(Span span) {
    problems.report(
        ProblemKind.NESTING_TOO_DEEP,
        span,
        "A state has at most "
            + StateVector.ORDER_LIMIT
            + " primes: declare further states instead.");
  }

  private boolean fits(StateStatement derivative, StateMeaning state, UnitOfMeasure declared) {
    UnitOfMeasure expected = derivativeUnit(state, derivative.primes());
    Span span = derivative.unit().map(u -> u.span()).orElse(derivative.name().span());
    if (declared.offset() != 0) {
      problems.report(
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
      problems.report(
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
              : Fix.replace("Write [" + expected.code() + "]", span, "[" + expected.code() + "]"));
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
    return declaredOrders.getOrDefault(states.get(state).statement().name().text(), 0);
  }

  /** Returns the declaration of a derivative. */
  Optional<Derivative> derivative(String label) {
    return Optional.ofNullable(derivatives.get(label));
  }

  /**
   * Returns the unit of a derivative that is not declared: the state's over that of time for each
   * prime.
   */
  UnitOfMeasure derivativeUnit(StateMeaning state, int primes) {
    UnitOfMeasure unit = state.unit();
    if (primes == 0) {
      return unit;
    }
    String code = unit.offset() == 0 ? unit.code() : "K";
    String time = timeUnit.code();
    boolean single = time.chars().allMatch(Character::isLetter);
    boolean plain = time.equals(UnitOfMeasure.ONE.code());
    StringBuilder text = new StringBuilder(code.equals("1") && !plain ? "" : code);
    for (int i = 0; i < primes && !plain; i++) {
      text.append('/').append(single ? time : "(" + time + ")");
    }
    double base = unit.offset() == 0 ? unit.factor() : 1;
    double factor = base;
    Dimension dimension = unit.dimension();
    for (int i = 0; i < primes; i++) {
      factor /= timeUnit.factor();
      dimension = dimension.over(timeUnit.dimension());
    }
    return new UnitOfMeasure(text.toString(), dimension, factor, 0);
  }

  /** Returns the offset behind the last statement of the system. */
  int lastStatementEnd() {
    List<Statement> body = statement.body();
    return body.isEmpty() ? statement.header().end() : body.getLast().span().end();
  }

  /** Returns the blanks before the line that a statement begins in. */
  String indent(Span span) {
    Span line = source.lineSpan(source.line(span.start()));
    String text = source.slice(line);
    int blanks = 0;
    while (blanks < text.length() && (text.charAt(blanks) == ' ' || text.charAt(blanks) == '\t')) {
      blanks++;
    }
    return text.substring(0, blanks);
  }
}
