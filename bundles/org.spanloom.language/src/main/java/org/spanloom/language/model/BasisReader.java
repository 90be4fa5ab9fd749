/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import org.spanloom.language.problem.Fix;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.syntax.Expression;
import org.spanloom.language.syntax.Name;
import org.spanloom.language.syntax.Statement.BasisStatement;
import org.spanloom.language.syntax.Statement.Row;
import org.spanloom.language.text.Span;
import org.spanloom.language.units.UnitOfMeasure;

/** Reads candidate bases. */
final class BasisReader {

  private final SystemScope system;
  private final Components components;
  private final Times times;
  private final Problems problems;
  private final List<Basis> bases = new ArrayList<>();
  private final Set<String> names = new HashSet<>();

  BasisReader(SystemScope system, Components components, Times times) {
    this.system = system;
    this.components = components;
    this.times = times;
    this.problems = system.problems();
  }

  /** Returns the bases that have a meaning. */
  List<Basis> bases() {
    return bases;
  }

  /** Returns the names of all bases, with a meaning or not. */
  Set<String> names() {
    return names;
  }

  /** Notes a basis whose statement could not be read, so that uses of it are not reported. */
  void noteUnread(Name name) {
    names.add(name.text());
  }

  void read(BasisStatement statement) {
    String name = statement.name().text();
    if (!names.add(name)) {
      problems.report(
          ProblemKind.NAME_DUPLICATE,
          statement.name().span(),
          "There are two bases named \"" + name + "\": rename one of them.");
      return;
    }
    Optional<Term> time = statement.time().flatMap(times::time);
    if (statement.time().isPresent() && time.isEmpty()
        || statement.argument().isPresent() && !isTime(statement.argument().get())) {
      return;
    }
    if (!statement.hasRows()) {
      bases.add(
          new Basis.Principal(name, time.orElseThrow(), statement.span(), statement.name().span()));
      return;
    }
    Place place = time.isPresent() ? Place.GIVEN_BASIS : Place.CLOSED_FORM;
    Optional<Rows> read = rows(statement, place);
    if (read.isEmpty()) {
      return;
    }
    List<List<Term>> rows = read.get().terms;
    int columns = rows.getFirst().size();
    List<Span> spans = Arrays.asList(read.get().spans);
    bases.add(
        time.isPresent()
            ? new Basis.Given(
                name, time.get(), columns, rows, spans, statement.span(), statement.name().span())
            : new Basis.ClosedForm(
                name, columns, rows, spans, statement.span(), statement.name().span()));
  }

  private boolean isTime(Name argument) {
    String time = system.scope().timeName();
    boolean same = argument.text().equals(time);
    if (!same && !time.isEmpty()) {
      problems.report(
          ProblemKind.NAME_MISUSED,
          argument.span(),
          "The argument of a basis is the independent variable: write " + time + ".",
          Fix.replace("Write " + time, argument.span(), time));
    }
    return same;
  }

  /** The rows of a basis, by component, as far as they are read. */
  private final class Rows {
    private final Place place;
    private final List<List<Term>> terms = new ArrayList<>();
    private final Span[] spans = new Span[components.dimension()];
    private final Set<Integer> given = new HashSet<>();
    private int columns = -1;
    private boolean sound = true;

    Rows(Place place) {
      this.place = place;
      components.list().forEach(c -> terms.add(List.of()));
    }

    void add(Row row) {
      if (columns < 0) {
        columns = row.values().size();
      }
      Optional<StateComponent> component = single(row);
      if (component.isEmpty()) {
        sound = false;
      } else if (!given.add(component.get().index())) {
        sound = false;
        problems.report(
            ProblemKind.BASIS_ROW_DUPLICATE,
            row.target().span(),
            "The basis has two rows for \"" + component.get().label() + "\": remove one.");
      } else {
        Optional<List<Term>> read = row(row, component.get(), columns, place);
        read.ifPresent(t -> terms.set(component.get().index(), t));
        spans[component.get().index()] = row.span();
        sound &= read.isPresent();
      }
    }
  }

  private Optional<StateComponent> single(Row row) {
    List<StateComponent> found = components.find(system.root(), row.target());
    if (found.size() > 1) {
      problems.report(
          ProblemKind.NAME_MISUSED,
          row.target().span(),
          "\""
              + row.target().label()
              + "\" is a family, and each of its members has a row of its own: write row "
              + found.getFirst().label()
              + " = ..., or a for.");
    }
    return found.size() == 1 ? Optional.of(found.getFirst()) : Optional.empty();
  }

  private Optional<Rows> rows(BasisStatement statement, Place place) {
    Rows rows = new Rows(place);
    boolean turnsKnown = system.resolver().loops().lines(statement.rows(), rows::add);
    boolean sound = statement.allRead() && rows.sound && turnsKnown;
    if (sound) {
      sound = isComplete(statement, rows.given) && hasRightSize(statement, rows.columns);
    }
    return sound && !rows.terms.isEmpty() ? Optional.of(rows) : Optional.empty();
  }

  private boolean isComplete(BasisStatement statement, Set<Integer> given) {
    List<Integer> missing = new ArrayList<>();
    for (StateComponent component : components.list()) {
      if (!given.contains(component.index())) {
        missing.add(component.index());
      }
    }
    if (!missing.isEmpty()) {
      problems.report(
          ProblemKind.BASIS_ROW_MISSING,
          statement.name().span(),
          "The basis \""
              + statement.name().text()
              + "\" has no row for "
              + components.labels(missing)
              + ": write one for each component of the state vector.");
    }
    return missing.isEmpty();
  }

  private boolean hasRightSize(BasisStatement statement, int columns) {
    int n = components.dimension();
    if (columns == n) {
      return true;
    }
    problems.report(
        ProblemKind.BASIS_SIZE,
        statement.name().span(),
        "The basis \""
            + statement.name().text()
            + "\" has "
            + counted(columns, "column")
            + ", but the solutions form a space of dimension "
            + n
            + ": a basis has exactly "
            + counted(n, "column")
            + ".");
    return false;
  }

  private static String counted(int count, String what) {
    return count + " " + what + (count == 1 ? "" : "s");
  }

  private Optional<List<Term>> row(Row row, StateComponent component, int columns, Place place) {
    List<Term> terms = new ArrayList<>();
    boolean sound = true;
    for (Expression expression : row.values()) {
      Optional<Term> term = entry(expression, component, place);
      term.ifPresent(terms::add);
      sound &= term.isPresent();
    }
    if (sound && terms.size() != columns) {
      problems.report(
          ProblemKind.BASIS_ROW_LENGTH,
          row.span(),
          "This row has "
              + counted(terms.size(), "value")
              + ", the first row of the basis "
              + columns
              + ": each row has one value for each column.");
      return Optional.empty();
    }
    return sound ? Optional.of(terms) : Optional.empty();
  }

  /** Returns an entry in the declared unit of its component; zero points of units do not count. */
  private Optional<Term> entry(Expression expression, StateComponent component, Place place) {
    UnitOfMeasure unit = component.unit();
    if (Literals.isBare(expression)) {
      return system.resolver().literals().signedValue(expression).stream()
          .mapToObj(v -> (Term) new Term.Constant(v))
          .findFirst();
    }
    return system
        .resolver()
        .givenDifference(expression, unit, "the state " + component.label(), place)
        .map(q -> Simplifier.quotient(q.constant().term(), new Term.Constant(unit.factor())));
  }
}
