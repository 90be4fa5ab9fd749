/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.function.BooleanSupplier;
import org.spanloom.language.model.Meaning.BrokenMeaning;
import org.spanloom.language.model.Meaning.TimeMeaning;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.syntax.Lexer;
import org.spanloom.language.syntax.Name;
import org.spanloom.language.syntax.OverClause;
import org.spanloom.language.syntax.Statement;
import org.spanloom.language.syntax.Statement.AccuracyStatement;
import org.spanloom.language.syntax.Statement.BasisStatement;
import org.spanloom.language.syntax.Statement.BoundaryStatement;
import org.spanloom.language.syntax.Statement.EquationStatement;
import org.spanloom.language.syntax.Statement.InitialValuesStatement;
import org.spanloom.language.syntax.Statement.InputStatement;
import org.spanloom.language.syntax.Statement.JumpStatement;
import org.spanloom.language.syntax.Statement.LaterStatement;
import org.spanloom.language.syntax.Statement.LetStatement;
import org.spanloom.language.syntax.Statement.MatrixStatement;
import org.spanloom.language.syntax.Statement.OutputStatement;
import org.spanloom.language.syntax.Statement.ParameterStatement;
import org.spanloom.language.syntax.Statement.RequireStatement;
import org.spanloom.language.syntax.Statement.StateStatement;
import org.spanloom.language.syntax.Statement.SystemStatement;
import org.spanloom.language.syntax.Statement.TransferStatement;
import org.spanloom.language.syntax.Statement.UnreadStatement;
import org.spanloom.language.syntax.Token;
import org.spanloom.language.text.Span;
import org.spanloom.language.units.UnitOfMeasure;

/** Gives one system its meaning. */
final class SystemReader {

  private static final double SMALLEST_ACCURACY = 1e-14;
  private static final double LARGEST_ACCURACY = 1;

  private final SystemStatement statement;
  private final Frame file;
  private final Problems problems;
  private final BooleanSupplier cancelled;
  private final SystemScope system;
  private final List<Frame> frames = new ArrayList<>();
  private final Set<String> unreadGoverned = new HashSet<>();
  private final Set<String> unreadNames = new HashSet<>();
  private final boolean timeKnown;
  private boolean hasUnread;
  private double accuracy = SystemModel.DEFAULT_ACCURACY;
  private Span accuracySpan;

  SystemReader(
      SystemStatement statement, Frame file, Problems problems, BooleanSupplier cancelled) {
    this.statement = statement;
    this.file = file;
    this.problems = problems;
    this.cancelled = cancelled;
    Scope scope = new Scope(Optional.of(file.scope()));
    Frame root = new Frame(file.file(), statement.body(), scope, problems, "");
    Optional<UnitOfMeasure> timeUnit = timeUnit(statement, root.units(), problems);
    this.timeKnown = timeUnit.isPresent();
    timeUnit.ifPresent(root::setTimeUnit);
    this.system = new SystemScope(root);
    this.frames.add(root);
    this.accuracySpan = statement.name().span();
  }

  /** Returns the unit of time, or empty where there is no sound one. */
  private static Optional<UnitOfMeasure> timeUnit(
      SystemStatement statement, UnitResolver units, Problems problems) {
    if (statement.over().isEmpty() || statement.over().get().name().text().isEmpty()) {
      return Optional.empty();
    }
    Optional<UnitOfMeasure> unit = units.declared(statement.over().get().unit());
    if (unit.isPresent() && unit.get().offset() != 0) {
      problems.report(
          ProblemKind.UNIT_OFFSET,
          statement.over().flatMap(OverClause::unit).get().span(),
          "The independent variable cannot be in a unit with a zero point of its own: write [K].");
      return Optional.empty();
    }
    return unit;
  }

  SystemModel read() {
    frames.forEach(this::collect);
    frames.forEach(frame -> frame.declarations().read());
    Times times = new Times(system, statement.over(), timeKnown);
    EquationReader equations = new EquationReader(system);
    for (Frame frame : frames) {
      readEquations(frame, equations);
      Set<String> broken = frame.declarations().inBrokenMatrices();
      if (!broken.isEmpty()) {
        equations.noteUnread(frame, broken);
      }
    }
    readTransfers(equations);
    if (hasUnread) {
      equations.noteUnread(system.root(), unreadGoverned);
    }
    StateVector vector = equations.stateVector();
    LinearFormBuilder builder = new LinearFormBuilder(equations, vector);
    Optional<LinearForm> form = builder.build();
    reportNoStates();
    Components components = new Components(system, vector, builder);
    List<Output> outputs = outputs(components);
    InitialValuesReader initialValues = new InitialValuesReader(system, components, times);
    BasisReader bases = new BasisReader(system, components, times);
    JumpReader jumps = new JumpReader(system, components, times);
    initialValues.readDeclarations(statement.header());
    for (Statement s : statement.body()) {
      switch (s) {
        case InitialValuesStatement values -> initialValues.read(values);
        case BasisStatement basis -> bases.read(basis);
        case JumpStatement jump -> jumps.read(jump);
        case AccuracyStatement stated -> accuracy(stated);
        case UnreadStatement unread when unread.word().equals("initial") ->
            unread.declares().ifPresent(initialValues::noteUnread);
        case UnreadStatement unread when unread.word().equals("basis") ->
            unread.declares().ifPresent(bases::noteUnread);
        default -> {}
      }
    }
    BoundaryReader boundaries =
        new BoundaryReader(system, components, times, initialValues.names());
    for (Statement s : statement.body()) {
      switch (s) {
        case BoundaryStatement boundary -> boundaries.read(boundary);
        case UnreadStatement unread when unread.word().equals("boundary") ->
            unread.declares().ifPresent(boundaries::noteUnread);
        default -> {}
      }
    }
    RequirementReader requirements =
        new RequirementReader(system, components, times, initialValues, boundaries, bases);
    for (Statement s : statement.body()) {
      if (s instanceof RequireStatement require) {
        requirements.read(require.clause());
      }
    }
    checkDefinedness(times, form, outputs, initialValues.complete(), bases.bases());
    unreadNames.forEach(system.scope()::markUsed);
    system.root().declarations().reportUnused();
    List<Parameter> parameters = new ArrayList<>(file.declarations().parameters());
    List<Let> lets = new ArrayList<>(file.declarations().lets());
    List<NamedMatrix> matrices = new ArrayList<>(file.declarations().matrices());
    for (Frame frame : frames) {
      parameters.addAll(frame.declarations().parameters());
      lets.addAll(frame.declarations().lets());
      matrices.addAll(frame.declarations().matrices());
    }
    return new SystemModel(
        statement.name().text(),
        system.scope().timeName(),
        system.timeUnit(),
        times.interval(),
        parameters,
        lets,
        matrices,
        components.list(),
        outputs,
        form,
        jumps.jumps(),
        initialValues.complete(),
        boundaries.boundaries(),
        bases.bases(),
        requirements.requirements(),
        accuracy,
        accuracySpan,
        statement.documentation(),
        statement.span(),
        statement.name().span());
  }

  private void readEquations(Frame frame, EquationReader equations) {
    for (Statement s : frame.body()) {
      ModelReader.check(cancelled);
      if (s instanceof EquationStatement equation) {
        equations.read(frame, equation);
      }
    }
  }

  private void readTransfers(EquationReader equations) {
    TransferReader transfers = new TransferReader(system, equations);
    for (Frame frame : frames) {
      for (Statement s : frame.body()) {
        ModelReader.check(cancelled);
        if (s instanceof TransferStatement transfer) {
          transfers.read(frame, transfer);
        }
      }
    }
    transfers.finish();
  }

  /** Takes all names of a frame, so that the order of declarations does not matter. */
  private void collect(Frame frame) {
    Scope scope = frame.scope();
    Declarations declarations = frame.declarations();
    Name time = statement.over().map(OverClause::name).orElse(new Name("t", statement.header()));
    if (!timeKnown) {
      scope.define(time.text(), new BrokenMeaning(time.span()));
    } else if (declarations.takesName(time)) {
      scope.define(time.text(), new TimeMeaning(frame.timeUnit(), time.span()));
    }
    List<StateStatement> derivatives = new ArrayList<>();
    for (Statement s : frame.body()) {
      switch (s) {
        case ParameterStatement parameter -> declarations.collect(parameter);
        case LetStatement let -> declarations.collect(let);
        case InputStatement input -> declarations.collect(input);
        case MatrixStatement matrix -> declarations.collect(matrix);
        case OutputStatement output -> declarations.collect(output);
        case StateStatement state when state.primes() > 0 -> derivatives.add(state);
        case StateStatement state -> {
          if (declarations.takesName(state.name())) {
            system.declareState(frame, state);
          }
        }
        case UnreadStatement unread ->
            unread(
                unread.span(),
                unread.declares(),
                unread.word().isEmpty() || unread.word().equals("transfer"));
        case LaterStatement later -> unread(later.span(), later.declares(), true);
        case SystemStatement inner -> {}
        case EquationStatement equation -> {}
        case TransferStatement transfer -> {}
        case JumpStatement jump -> {}
        case InitialValuesStatement values -> {}
        case BoundaryStatement boundary -> {}
        case BasisStatement basis -> {}
        case RequireStatement require -> {}
        case AccuracyStatement stated -> {}
      }
    }
    derivatives.forEach(d -> system.declareDerivative(frame, d));
  }

  /**
   * Notes what a statement that could not be read may declare, use or govern.
   *
   * @param mayGovern whether it may be the equation of a state named in it
   */
  private void unread(Span span, Optional<Name> declares, boolean mayGovern) {
    hasUnread = true;
    declares.ifPresent(name -> {
      if (system.scope().own(name.text()).isEmpty()) {
        system.scope().define(name.text(), new BrokenMeaning(name.span()));
      }
    });
    String text = system.slice(span);
    for (Token token : Lexer.lex(text)) {
      if (token.kind().isName()) {
        String name = text.substring(token.start(), token.end());
        unreadNames.add(name);
        if (mayGovern) {
          unreadGoverned.add(name);
        }
      }
    }
  }

  private void reportNoStates() {
    boolean broken = hasUnread || !system.states().isEmpty();
    boolean declared = statement.body().stream().anyMatch(StateStatement.class::isInstance);
    if (!broken && !declared) {
      problems.report(
          ProblemKind.SYSTEM_WITHOUT_STATES,
          statement.name().span(),
          "The system "
              + statement.name().text()
              + " has no state: declare one, as in state x = 1, and its equation, as in x' = -x.");
    }
  }

  private List<Output> outputs(Components components) {
    List<Output> outputs = new ArrayList<>();
    for (Frame frame : frames) {
      for (Declarations.ReadOutput output : frame.declarations().outputs()) {
        OutputStatement text = output.statement();
        components
            .affine(frame, output.value(), output.unit(), text.value().span())
            .map(value ->
                new Output(
                    frame.label(text.name().text()),
                    output.unit(),
                    value,
                    text.documentation(),
                    frame.placed(text.span()),
                    frame.placed(text.name().span())))
            .ifPresent(outputs::add);
      }
    }
    return outputs;
  }

  private void checkDefinedness(
      Times times,
      Optional<LinearForm> form,
      List<Output> outputs,
      List<InitialValues> values,
      List<Basis> bases) {
    if (times.isKnown()) {
      double start = DefinednessCheck.start(times, values, bases);
      DefinednessCheck check = new DefinednessCheck(system, times, start, cancelled);
      frames.forEach(frame -> check.lets(frame.declarations().lets()));
      form.ifPresent(check::equations);
      check.outputs(outputs);
      check.closedForms(bases);
    }
  }

  private void accuracy(AccuracyStatement stated) {
    if (!accuracySpan.equals(statement.name().span())) {
      problems.report(
          ProblemKind.STATEMENT_MISPLACED,
          stated.span(),
          "The accuracy of the system is stated twice: remove one of the two lines.");
      return;
    }
    accuracySpan = stated.span();
    Optional<Quantity> value =
        system.resolver().given(stated.value(), UnitOfMeasure.ONE, "an accuracy", Place.ACCURACY);
    if (value.isEmpty()) {
      return;
    }
    double asked =
        value.get().constant().term() instanceof Term.Constant(double number) ? number : Double.NaN;
    if (asked >= SMALLEST_ACCURACY && asked <= LARGEST_ACCURACY) {
      accuracy = asked;
    } else {
      problems.report(
          ProblemKind.ACCURACY_OUT_OF_RANGE,
          stated.value().span(),
          "An accuracy is a plain number from 1e-14 to 1, relative to the values: \""
              + system.resolver().shown(stated.value().span())
              + "\" is not.");
    }
  }
}
