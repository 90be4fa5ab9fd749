/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.spanloom.language.model.Meaning.BoundInputMeaning;
import org.spanloom.language.model.Meaning.BrokenMeaning;
import org.spanloom.language.model.Meaning.LetMeaning;
import org.spanloom.language.model.Meaning.MatrixMeaning;
import org.spanloom.language.model.Meaning.OutputMeaning;
import org.spanloom.language.model.Meaning.ParameterMeaning;
import org.spanloom.language.problem.Fix;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.syntax.Expression.NumberExpression;
import org.spanloom.language.syntax.Name;
import org.spanloom.language.syntax.Statement.Declaration;
import org.spanloom.language.syntax.Statement.InputStatement;
import org.spanloom.language.syntax.Statement.LetStatement;
import org.spanloom.language.syntax.Statement.MatrixStatement;
import org.spanloom.language.syntax.Statement.OutputStatement;
import org.spanloom.language.syntax.Statement.ParameterStatement;
import org.spanloom.language.syntax.Statement.TableStatement;
import org.spanloom.language.syntax.Statement.Uncertainty;
import org.spanloom.language.text.Span;
import org.spanloom.language.units.Dimension;
import org.spanloom.language.units.UnitNames;
import org.spanloom.language.units.UnitOfMeasure;

/**
 * Reads the parameters, named expressions and outputs of a system or of the file around the
 * systems.
 */
final class Declarations {

  private final Frame frame;
  private final Scope scope;
  private final Problems problems;
  private final UnitResolver units;
  private final Resolver resolver;
  private final MatrixReader matrixReader;
  private final TableReader tableReader;
  private final Map<TableStatement, PiecewiseCurve> tables = new LinkedHashMap<>();
  private final Map<String, DeclaredItem> items = new LinkedHashMap<>();
  private final Map<String, Name> taken = new HashMap<>();
  private final Set<String> cyclic = new HashSet<>();
  private Optional<List<Declaration>> ordered = Optional.empty();
  private final Set<String> duplicates = new HashSet<>();
  private final InTextOrder<Parameter> parameters = new InTextOrder<>();
  private final InTextOrder<Let> lets = new InTextOrder<>();
  private final InTextOrder<ReadOutput> outputs = new InTextOrder<>();
  private final InTextOrder<NamedMatrix> matrices = new InTextOrder<>();
  private final Set<String> inBrokenMatrices = new HashSet<>();

  /** An output whose place in the state vector is not known yet. */
  record ReadOutput(OutputStatement statement, Quantity value, UnitOfMeasure unit) {}

  Declarations(Frame frame) {
    this.frame = frame;
    this.scope = frame.scope();
    this.problems = frame.problems();
    this.units = frame.units();
    this.resolver = frame.resolver();
    this.matrixReader = new MatrixReader(frame);
    this.tableReader = new TableReader(frame);
  }

  /** Returns the parameters read, in the order of the text. */
  List<Parameter> parameters() {
    return parameters.values();
  }

  /** Returns the named expressions read, in the order of the text. */
  List<Let> lets() {
    return lets.values();
  }

  /** Returns the names in matrices without a meaning: equations may give derivatives of them. */
  Set<String> inBrokenMatrices() {
    return Set.copyOf(inBrokenMatrices);
  }

  /** Returns the matrices read, in the order of the text. */
  List<NamedMatrix> matrices() {
    return matrices.values();
  }

  /** Returns the outputs read, in the order of the text. */
  List<ReadOutput> outputs() {
    return outputs.values();
  }

  Frame frame() {
    return frame;
  }

  /** Returns what a part gives a declaration of the system that it is a copy of. */
  Optional<Binding> binding(Declaration declaration) {
    return declaration instanceof ParameterStatement || declaration instanceof InputStatement
        ? frame.binding(declaration.name().text())
        : Optional.empty();
  }

  /** Returns the names of everything collected. */
  Set<String> names() {
    return items.keySet();
  }

  /**
   * Returns the declaration that a name of this frame stands for, through parts if it is dotted.
   */
  Optional<DeclaredItem> item(String name) {
    DeclaredItem own = items.get(name);
    if (own != null) {
      return Optional.of(own);
    }
    int dot = name.indexOf('.');
    return dot < 0
        ? Optional.empty()
        : scope
            .part(name.substring(0, dot))
            .flatMap(part -> part.declarations().item(name.substring(dot + 1)));
  }

  /** Takes a declaration to be read later; reports a name that is not free. */
  void collect(Declaration declaration) {
    if (takesName(declaration.name())) {
      items.put(declaration.name().text(), new DeclaredItem(this, declaration));
    }
  }

  /** Takes a name; reports it and returns false if it is not free. */
  boolean takesName(Name name) {
    String text = name.text();
    Name earlier = taken.get(text);
    boolean builtIn =
        Function.named(text).isPresent()
            || MatrixFunction.named(text).isPresent()
            || NamedConstant.named(text).isPresent()
            || text.equals(PulseTrain.NAME);
    if (builtIn) {
      problems.report(
          ProblemKind.NAME_RESERVED,
          name.span(),
          "\"" + text + "\" is built in and cannot be declared: choose another name.");
      scope.define(text, new BrokenMeaning(name.span()));
    } else if (earlier != null) {
      duplicates.add(text);
      problems.report(
          ProblemKind.NAME_DUPLICATE,
          name.span(),
          "\"" + text + "\" is declared twice: rename or remove one of the two declarations.");
    } else if (scope.isDeclaredOutside(text)) {
      problems.report(
          ProblemKind.NAME_SHADOWED,
          name.span(),
          "\""
              + text
              + "\" hides the declaration of that name outside of the system: rename one of them if"
              + " both are meant.");
    }
    if (earlier == null) {
      taken.put(text, name);
    }
    return !builtIn && earlier == null;
  }

  /** Gives everything that some frames collected a meaning. */
  static void read(List<Frame> frames) {
    new Sequence(frames).read();
  }

  /** What some frames collected, on its way to its meaning. */
  static final class Sequence {
    private final Set<String> cyclic = new HashSet<>();
    private List<DeclaredItem> open;

    Sequence(List<Frame> frames) {
      List<DeclaredItem> all = new ArrayList<>();
      frames.forEach(frame -> all.addAll(frame.declarations().items.values()));
      this.open = DeclarationOrder.of(all, cycle -> reportCycle(cycle, cyclic));
    }

    /** Gives constants that need nothing else a meaning, before the states are known. */
    void readConstants() {
      Set<String> rest = new HashSet<>();
      List<DeclaredItem> later = new ArrayList<>();
      for (DeclaredItem item : open) {
        boolean constant =
            switch (item.declaration()) {
              case ParameterStatement parameter -> true;
              case LetStatement let -> let.argument().isEmpty();
              default -> false;
            };
        boolean needsRest = item.uses().stream().anyMatch(used -> rest.contains(used.label()));
        if (constant && !needsRest) {
          read(item);
        } else {
          rest.add(item.label());
          later.add(item);
        }
      }
      open = later;
    }

    /** Gives everything else a meaning. */
    void read() {
      open.forEach(this::read);
      open = List.of();
    }

    private void read(DeclaredItem item) {
      Name name = item.declaration().name();
      Declarations owner = item.owner();
      Optional<? extends Meaning> meaning =
          cyclic.contains(item.label()) ? Optional.empty() : owner.meaning(item.declaration());
      owner.scope.define(
          name.text(), meaning.isPresent() ? meaning.get() : owner.frame.broken(name));
    }
  }

  private Optional<? extends Meaning> meaning(Declaration declaration) {
    return switch (declaration) {
      case ParameterStatement parameter -> parameter(parameter);
      case LetStatement let -> let(let);
      case InputStatement input -> input(input);
      case MatrixStatement matrix -> matrix(matrix);
      case TableStatement table -> table(table);
      case OutputStatement output -> output(output);
      default -> Optional.empty();
    };
  }

  private static void reportCycle(List<DeclaredItem> cycle, Set<String> cyclic) {
    List<String> names = new ArrayList<>();
    boolean fresh = false;
    for (DeclaredItem item : cycle) {
      names.add(item.label());
      fresh |= cyclic.add(item.label());
    }
    if (fresh) {
      names.add(names.getFirst());
      String circle =
          names.size() <= 8
              ? String.join(" -> ", names)
              : String.join(" -> ", names.subList(0, 7)) + " -> ...";
      DeclaredItem first = cycle.getFirst();
      first
          .owner()
          .problems
          .report(
              ProblemKind.NAME_CYCLE,
              first.declaration().name().span(),
              names.size() == 2
                  ? "\"" + names.getFirst() + "\" is declared by itself: give it a value."
                  : "These need each other in a circle, so that none has a value: "
                      + circle
                      + ". Break the circle.");
    }
  }

  private Optional<ParameterMeaning> parameter(ParameterStatement statement) {
    String name = statement.name().text();
    Optional<UnitOfMeasure> unit = units.declared(statement.unit());
    if (unit.isEmpty()) {
      return Optional.empty();
    }
    String what = "the parameter " + frame.label(name);
    Binding text = frame.binding(name).orElse(new Binding(frame, statement.value()));
    Optional<Quantity> value =
        text.frame().resolver().given(text.value(), unit.get(), what, Place.PARAMETER);
    if (value.isEmpty() || !isFinite(value.get(), name, text)) {
      return Optional.empty();
    }
    Term term = value.get().constant().term();
    Optional<Term> halfWidth = Optional.empty();
    if (statement.uncertainty().isPresent() && frame.binding(name).isEmpty()) {
      halfWidth = halfWidth(statement.uncertainty().get(), term, unit.get(), what);
      if (halfWidth.isEmpty()) {
        return Optional.empty();
      }
    }
    Parameter parameter =
        new Parameter(
            frame.label(name),
            unit.get(),
            term,
            halfWidth,
            statement.documentation(),
            frame.placed(statement.span()),
            frame.placed(statement.name().span()));
    parameters.put(statement.span().start(), parameter);
    return Optional.of(new ParameterMeaning(parameter, value.get().depth() + 1));
  }

  private static boolean isFinite(Quantity value, String name, Binding text) {
    Term term = value.constant().term();
    boolean finite = term instanceof Term.Constant || Double.isFinite(TermEvaluator.constant(term));
    if (!finite) {
      text.frame()
          .problems()
          .report(
              ProblemKind.NUMBER_OUT_OF_RANGE,
              text.value().span(),
              "The value of the parameter "
                  + name
                  + " is not a finite number: check divisors, roots and logarithms.");
    }
    return finite;
  }

  /** Returns half the width of the interval of uncertainty, absolute, in coherent SI units. */
  private Optional<Term> halfWidth(
      Uncertainty uncertainty, Term value, UnitOfMeasure unit, String what) {
    if (uncertainty.percent() && unit.offset() != 0) {
      problems.report(
          ProblemKind.UNIT_OFFSET,
          uncertainty.span(),
          "A relative uncertainty has no meaning on the scale "
              + unit.code()
              + ", whose zero point is arbitrary: give it as a difference, as in ± 0.5.");
      return Optional.empty();
    }
    UnitOfMeasure asked = uncertainty.percent() ? UnitOfMeasure.ONE : unit;
    Optional<Quantity> given =
        resolver.givenDifference(
            uncertainty.halfWidth(),
            asked,
            uncertainty.percent() ? "a number of per cent" : what,
            Place.UNCERTAINTY);
    if (given.isEmpty()) {
      return Optional.empty();
    }
    Term halfWidth = given.get().constant().term();
    if (!(TermEvaluator.constant(halfWidth) >= 0)) {
      problems.report(
          ProblemKind.UNCERTAINTY_INVALID,
          uncertainty.span(),
          "An uncertainty is half the width of an interval and cannot be negative: remove the"
              + " sign.");
      return Optional.empty();
    }
    return Optional.of(
        uncertainty.percent()
            ? Simplifier.product(
                Simplifier.call(Function.ABS, value),
                Simplifier.quotient(halfWidth, new Term.Constant(100)))
            : halfWidth);
  }

  private Optional<LetMeaning> let(LetStatement statement) {
    boolean ofTime = statement.argument().isPresent();
    if (ofTime && !isTime(statement.argument().get(), "a let")) {
      return Optional.empty();
    }
    Place place = ofTime ? Place.LET_OF_TIME : Place.LET;
    String what = "the named expression " + statement.name().text();
    Optional<UnitOfMeasure> unit = units.declared(statement.unit());
    if (unit.isEmpty()) {
      return Optional.empty();
    }
    Optional<Quantity> value =
        statement.unit().isPresent()
            ? resolver.given(statement.value(), unit.get(), what, place)
            : resolver.quantity(statement.value(), place);
    if (value.isEmpty()) {
      return Optional.empty();
    }
    UnitOfMeasure shown =
        statement.unit().isPresent() ? unit.get() : inferred(statement, value.get());
    Let let =
        new Let(
            frame.label(statement.name().text()),
            shown,
            value.get().constant().term(),
            ofTime,
            false,
            statement.documentation(),
            frame.placed(statement.span()),
            frame.placed(statement.name().span()));
    lets.put(statement.span().start(), let);
    return Optional.of(new LetMeaning(let, value.get().depth() + 1));
  }

  private Optional<LetMeaning> table(TableStatement statement) {
    Optional<UnitOfMeasure> unit = units.declared(statement.unit());
    if (!isTime(statement.argument(), "a table") || unit.isEmpty()) {
      return Optional.empty();
    }
    Optional<PiecewiseCurve> curve = tableReader.read(statement, unit.get());
    if (curve.isEmpty()) {
      return Optional.empty();
    }
    String name = frame.label(statement.name().text());
    Let table =
        new Let(
            name,
            unit.get(),
            new Term.CurveTerm(name, curve.get(), new Term.Time()),
            true,
            false,
            statement.documentation(),
            frame.placed(statement.span()),
            frame.placed(statement.name().span()));
    lets.put(statement.span().start(), table);
    tables.put(statement, curve.get());
    return Optional.of(new LetMeaning(table, 2));
  }

  /** Reports tables that do not cover the interval. */
  void checkTables(Times times) {
    tables.forEach((statement, curve) -> tableReader.checkRange(statement, curve, times));
  }

  private Optional<? extends Meaning> input(InputStatement statement) {
    Optional<UnitOfMeasure> unit = units.declared(statement.unit());
    if (!isTime(statement.argument(), "an input") || unit.isEmpty()) {
      return Optional.empty();
    }
    String name = statement.name().text();
    String what = "the input " + frame.label(name);
    Optional<Binding> bound = frame.binding(name);
    Binding text = bound.orElse(new Binding(frame, statement.value()));
    Place place = bound.isPresent() ? Place.BOUND_INPUT : Place.INPUT;
    Optional<Quantity> value = text.frame().resolver().given(text.value(), unit.get(), what, place);
    if (value.isEmpty()) {
      return Optional.empty();
    }
    if (value.get().holdsStates()) {
      return Optional.of(
          new BoundInputMeaning(
              placed(value.get(), text, unit.get().dimension()),
              unit.get(),
              frame.placed(statement.name().span())));
    }
    Let input =
        new Let(
            frame.label(name),
            unit.get(),
            value.get().constant().term(),
            true,
            true,
            statement.documentation(),
            frame.placed(statement.span()),
            frame.placed(statement.name().span()));
    lets.put(statement.span().start(), input);
    return Optional.of(new LetMeaning(input, value.get().depth() + 1));
  }

  /** Returns a quantity whose parts know the place of the expression it comes from. */
  private static Quantity placed(Quantity value, Binding text, Dimension dimension) {
    QuantitySum placed = new QuantitySum();
    placed.add(false, value, text.frame().placed(text.value().span()));
    return placed.total(dimension);
  }

  private Optional<MatrixMeaning> matrix(MatrixStatement statement) {
    if (statement.argument().isPresent() && !isTime(statement.argument().get(), "a matrix")) {
      return Optional.empty();
    }
    Optional<MatrixMeaning> meaning =
        units
            .declared(statement.unit())
            .filter(unit -> hasNoOffset(statement, unit))
            .flatMap(unit -> matrixReader.read(statement, unit));
    if (meaning.isEmpty()) {
      DeclaredItem.names(statement).forEach(n -> inBrokenMatrices.add(n.name().text()));
    }
    meaning.ifPresent(m -> matrices.put(statement.span().start(), m.matrix()));
    return meaning;
  }

  private boolean hasNoOffset(MatrixStatement statement, UnitOfMeasure unit) {
    if (unit.offset() == 0) {
      return true;
    }
    problems.report(
        ProblemKind.UNIT_OFFSET,
        statement.unit().orElseThrow().span(),
        "The entries of a matrix are multiplied, and cannot be in a unit with a zero point of its"
            + " own: write [K].");
    return false;
  }

  private static UnitOfMeasure inferred(LetStatement statement, Quantity value) {
    return Literals.alone(statement.value())
        .flatMap(NumberExpression::unit)
        .flatMap(UnitResolver::known)
        .orElseGet(() -> coherent(value.dimension()));
  }

  static UnitOfMeasure coherent(Dimension dimension) {
    return dimension.isNone() ? UnitOfMeasure.ONE : UnitNames.coherent(dimension);
  }

  private boolean isTime(Name argument, String what) {
    String time = scope.timeName();
    if (argument.text().equals(time)) {
      scope.markUsed(time);
      return true;
    }
    if (time.isEmpty()) {
      problems.report(
          ProblemKind.STATEMENT_MISPLACED,
          argument.span(),
          "A function of time belongs into a system, where time has a name: move the line there.");
    } else {
      problems.report(
          ProblemKind.NAME_MISUSED,
          argument.span(),
          "The argument of " + what + " is the independent variable: write " + time + ".",
          Fix.replace("Write " + time, argument.span(), time));
    }
    return false;
  }

  private Optional<OutputMeaning> output(OutputStatement statement) {
    Optional<UnitOfMeasure> unit = units.declared(statement.unit());
    if (unit.isEmpty()) {
      return Optional.empty();
    }
    Optional<Quantity> value =
        statement.unit().isPresent()
            ? resolver.given(
                statement.value(),
                unit.get(),
                "the output " + statement.name().text(),
                Place.OUTPUT)
            : resolver.quantity(statement.value(), Place.OUTPUT);
    if (value.isEmpty()) {
      return Optional.empty();
    }
    Quantity found = value.get();
    // A lone 0 given to a declared unit has its dimension, not that of a pure number.
    Dimension dimension = statement.unit().isPresent() ? unit.get().dimension() : found.dimension();
    Quantity output = placed(found, new Binding(frame, statement.value()), dimension);
    UnitOfMeasure shown = statement.unit().isPresent() ? unit.get() : coherent(dimension);
    outputs.put(statement.span().start(), new ReadOutput(statement, output, shown));
    return Optional.of(new OutputMeaning(output, shown, frame.placed(statement.name().span())));
  }

  /** Reports parameters, inputs and named expressions that nothing uses. */
  void reportUnused() {
    for (Parameter parameter : parameters()) {
      reportUnused(parameter.name(), "parameter", parameter.nameSpan());
    }
    for (NamedMatrix matrix : matrices()) {
      reportUnused(matrix.name(), "matrix", matrix.nameSpan());
    }
    for (Let let : lets()) {
      reportUnused(
          let.name(),
          let.isInput() ? "input" : let.isTable() ? "table" : "named expression",
          let.nameSpan());
    }
  }

  private void reportUnused(String name, String what, Span nameSpan) {
    if (!scope.isUsed(name) && !duplicates.contains(name)) {
      problems.report(
          ProblemKind.NAME_UNUSED,
          nameSpan,
          "The " + what + " \"" + name + "\" is used nowhere: remove it, or use it.");
    }
  }
}
