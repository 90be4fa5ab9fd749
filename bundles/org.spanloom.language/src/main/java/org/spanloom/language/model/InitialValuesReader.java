/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.spanloom.language.problem.Fix;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.syntax.Expression;
import org.spanloom.language.syntax.Name;
import org.spanloom.language.syntax.Statement.InitialValuesStatement;
import org.spanloom.language.syntax.Statement.Setting;
import org.spanloom.language.syntax.Statement.StateStatement;
import org.spanloom.language.text.Span;

/** Reads sets of initial values: the one of the declarations and the named ones. */
final class InitialValuesReader {

  private final SystemScope system;
  private final Components components;
  private final Times times;
  private final Problems problems;
  private final List<InitialValues> complete = new ArrayList<>();
  private final Map<String, Span> declared = new LinkedHashMap<>();
  private boolean declarationsHaveValues;

  InitialValuesReader(SystemScope system, Components components, Times times) {
    this.system = system;
    this.components = components;
    this.times = times;
    this.problems = system.problems();
  }

  /** Returns the complete sets. */
  List<InitialValues> complete() {
    return complete;
  }

  /** Returns the names of all named sets, complete or not. */
  Set<String> names() {
    return declared.keySet();
  }

  /** Tells whether declarations of states give values, be they complete or not. */
  boolean declarationsHaveValues() {
    return declarationsHaveValues;
  }

  /** Reads the values in the declarations of the states. */
  void readDeclarations(Span header) {
    List<Integer> missing = new ArrayList<>();
    Term[] values = new Term[components.dimension()];
    SharedValues<Term> shared = new SharedValues<>();
    boolean sound = true;
    for (StateComponent component : components.list()) {
      Optional<Binding> initial = components.initial(component.index());
      if (initial.isEmpty()) {
        missing.add(component.index());
        continue;
      }
      declarationsHaveValues = true;
      // All members of a family share the expression and its value.
      Frame frame = initial.get().frame();
      Expression expression = initial.get().value();
      Optional<Term> value =
          shared.of(frame, expression, () -> value(frame, component, component.name(), expression));
      value.ifPresent(v -> values[component.index()] = v);
      sound &= value.isPresent();
    }
    if (!declarationsHaveValues) {
      return;
    }
    if (!missing.isEmpty()) {
      reportMissingDeclarations(missing);
      return;
    }
    Optional<Term> time = times.initialTime();
    if (time.isEmpty() && times.isKnown()) {
      problems.report(
          ProblemKind.INITIAL_TIME_MISSING,
          components.get(0).declaration(),
          "The interval ("
              + times.shown()
              + ") holds no left end at which these values stand: write initial values NAME at TIME"
              + " { ... } instead.");
    }
    if (sound && time.isPresent()) {
      complete.add(new InitialValues("", time.get(), Arrays.asList(values), header));
    }
  }

  private void reportMissingDeclarations(List<Integer> missing) {
    StateComponent first = components.get(missing.getFirst());
    if (components.frame(first.index()).isElsewhere()) {
      problems.report(
          ProblemKind.INITIAL_VALUE_MISSING,
          first.declaration(),
          "Other states have initial values, but "
              + components.labels(missing)
              + (missing.size() == 1 ? " has" : " have")
              + " none: give one in the braces of the part, or where the state is declared.");
      return;
    }
    Optional<StateStatement> declaration = components.declaration(first.index());
    String name = first.name() + "'".repeat(first.order());
    String code = first.unit().code();
    String unit = code.equals("1") ? "" : " [" + code + "]";
    Fix fix =
        declaration
            .map(d ->
                Fix.insert(
                    "Add = 0", d.unit().map(u -> u.span().end()).orElse(d.headEnd()), " = 0"))
            .orElseGet(() ->
                Fix.insert(
                    "Declare " + name,
                    first.declaration().end(),
                    "\n"
                        + system.root().indent(first.declaration())
                        + "state "
                        + name
                        + unit
                        + " = 0"));
    problems.report(
        ProblemKind.INITIAL_VALUE_MISSING,
        first.declaration(),
        "Other states have initial values, but "
            + components.labels(missing)
            + (missing.size() == 1 ? " has" : " have")
            + " none: "
            + (declaration.isPresent()
                ? "give one in the declaration."
                : "write state " + name + unit + " = 0 or another value."),
        fix);
  }

  /** Notes a set whose statement could not be read, so that uses of it are not reported. */
  void noteUnread(Name name) {
    declared.putIfAbsent(name.text(), name.span());
  }

  /** Reads a named set. */
  void read(InitialValuesStatement statement) {
    String name = statement.name().text();
    if (declared.putIfAbsent(name, statement.name().span()) != null) {
      problems.report(
          ProblemKind.NAME_DUPLICATE,
          statement.name().span(),
          "There are two sets of initial values named \"" + name + "\": rename one of them.");
      return;
    }
    Term[] values = new Term[components.dimension()];
    Set<Integer> given = new HashSet<>();
    boolean[] allSound = {statement.allRead()};
    boolean turnsKnown =
        system
            .resolver()
            .loops()
            .lines(statement.settings(), setting -> allSound[0] &= set(setting, values, given));
    boolean sound = allSound[0] && turnsKnown;
    Optional<Term> time = time(statement);
    List<Integer> missing = new ArrayList<>();
    for (int i = 0; i < values.length; i++) {
      if (!given.contains(i)) {
        missing.add(i);
      }
    }
    if (!missing.isEmpty() && sound) {
      reportMissingSettings(statement, missing);
    }
    if (sound && missing.isEmpty() && time.isPresent()) {
      complete.add(new InitialValues(name, time.get(), Arrays.asList(values), statement.span()));
    }
  }

  /** Takes a value, of each member for a family without an index; returns false if it is wrong. */
  private boolean set(Setting setting, Term[] values, Set<Integer> given) {
    List<StateComponent> targets = components.find(system.root(), setting.target());
    if (targets.isEmpty()) {
      return false;
    }
    for (StateComponent component : targets) {
      if (!given.add(component.index())) {
        problems.report(
            ProblemKind.INITIAL_VALUE_DUPLICATE,
            setting.target().span(),
            "\"" + component.label() + "\" has two values in this set: remove one.");
        return false;
      }
    }
    StateComponent first = targets.getFirst();
    Optional<Term> value =
        value(
            system.root(),
            first,
            targets.size() == 1 ? first.label() : first.name(),
            setting.value());
    value.ifPresent(v -> targets.forEach(c -> values[c.index()] = v));
    return value.isPresent();
  }

  private Optional<Term> time(InitialValuesStatement statement) {
    if (statement.time().isPresent()) {
      return times.time(statement.time().get());
    }
    Optional<Term> time = times.initialTime();
    if (time.isEmpty() && times.isKnown()) {
      int end = statement.name().span().end();
      problems.report(
          ProblemKind.INITIAL_TIME_MISSING,
          statement.name().span(),
          "The interval ("
              + times.shown()
              + ") holds no left end at which these values stand: write at and a time behind the"
              + " name.",
          Fix.insert("Insert at", end, " at 1"));
    }
    return time;
  }

  private void reportMissingSettings(InitialValuesStatement statement, List<Integer> missing) {
    StringBuilder text = new StringBuilder();
    for (String target : components.shortest(missing)) {
      boolean first = text.isEmpty() && statement.settings().isEmpty();
      text.append(first ? " " : "; ").append(target).append(" = 0");
    }
    int offset =
        statement.settings().isEmpty()
            ? Math.max(statement.span().start(), statement.span().end() - 1)
            : statement.settings().getLast().span().end();
    problems.report(
        ProblemKind.INITIAL_VALUE_MISSING,
        statement.name().span(),
        "The initial values \""
            + statement.name().text()
            + "\" lack "
            + components.labels(missing)
            + ": a set gives every component of the state vector a value.",
        Fix.insert("Add the missing values", offset, text.toString()));
  }

  private static Optional<Term> value(
      Frame frame, StateComponent component, String label, Expression expression) {
    Optional<Term> value =
        frame
            .resolver()
            .given(expression, component.unit(), "the state " + label, Place.INITIAL)
            .map(q -> q.constant().term());
    if (value.isPresent() && !Double.isFinite(TermEvaluator.constant(value.get()))) {
      frame
          .problems()
          .report(
              ProblemKind.NUMBER_OUT_OF_RANGE,
              expression.span(),
              "The initial value \""
                  + frame.resolver().shown(expression.span())
                  + "\" is not a finite number: check it.");
      return Optional.empty();
    }
    return value;
  }
}
