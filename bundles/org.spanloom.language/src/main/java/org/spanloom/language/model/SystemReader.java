/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.IdentityHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.function.BooleanSupplier;
import org.spanloom.language.model.Meaning.PartMeaning;
import org.spanloom.language.model.Meaning.TimeMeaning;
import org.spanloom.language.model.PartReader.PartProblems;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.syntax.Lexer;
import org.spanloom.language.syntax.Name;
import org.spanloom.language.syntax.OverClause;
import org.spanloom.language.syntax.Statement;
import org.spanloom.language.syntax.Statement.AccuracyStatement;
import org.spanloom.language.syntax.Statement.BasisStatement;
import org.spanloom.language.syntax.Statement.BoundaryStatement;
import org.spanloom.language.syntax.Statement.Declaration;
import org.spanloom.language.syntax.Statement.EquationStatement;
import org.spanloom.language.syntax.Statement.ForStatement;
import org.spanloom.language.syntax.Statement.ImportStatement;
import org.spanloom.language.syntax.Statement.InitialValuesStatement;
import org.spanloom.language.syntax.Statement.InputStatement;
import org.spanloom.language.syntax.Statement.JumpStatement;
import org.spanloom.language.syntax.Statement.LetStatement;
import org.spanloom.language.syntax.Statement.MatrixStatement;
import org.spanloom.language.syntax.Statement.OutputStatement;
import org.spanloom.language.syntax.Statement.ParameterStatement;
import org.spanloom.language.syntax.Statement.PartStatement;
import org.spanloom.language.syntax.Statement.RequireStatement;
import org.spanloom.language.syntax.Statement.StateStatement;
import org.spanloom.language.syntax.Statement.SystemStatement;
import org.spanloom.language.syntax.Statement.TableStatement;
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
  private final FileReading file;
  private final Library library;
  private final Problems problems;
  private final BooleanSupplier cancelled;
  private final SystemScope system;
  private final List<Frame> frames = new ArrayList<>();
  private final List<ReadDerivative> derivatives = new ArrayList<>();
  private final Map<Frame, Set<String>> unreadGoverned = new IdentityHashMap<>();
  private final Map<Frame, Set<String>> unreadNames = new IdentityHashMap<>();
  private final PartReader parts;
  private final boolean timeKnown;
  private boolean hasUnread;
  private double accuracy = SystemModel.DEFAULT_ACCURACY;
  private Span accuracySpan;

  /** The declaration of a derivative with the frame it stands in. */
  private record ReadDerivative(Frame frame, StateStatement statement) {}

  SystemReader(SystemStatement statement, FileReading file, Library library) {
    this.statement = statement;
    this.file = file;
    this.library = library;
    this.problems = file.found();
    this.cancelled = library.cancelled();
    this.parts = new PartReader(statement, library.budget());
    Scope scope = new Scope(Optional.of(file.frame().scope()));
    Frame root =
        new Frame(
            file.frame().file(), statement.body(), scope, problems, "", file.place(), Map.of());
    Optional<UnitOfMeasure> timeUnit = timeUnit(statement, root.units(), problems);
    this.timeKnown = timeUnit.isPresent();
    timeUnit.ifPresent(root::setTimeUnit);
    this.system = new SystemScope(root);
    this.accuracySpan = statement.name().span();
  }

  /** Returns the parts of the system with what is wrong in them. */
  List<PartProblems> parts() {
    return parts.opened();
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
    collect(system.root(), List.of(statement));
    Declarations.Sequence declarations = new Declarations.Sequence(frames);
    if (system.layout().layWithoutParameters()) {
      declarations.readConstants();
      system.layout().layAgain();
    }
    derivatives.forEach(d -> system.declareDerivative(d.frame(), d.statement()));
    declarations.read();
    Times times = new Times(system, statement.over(), timeKnown);
    frames.forEach(frame -> frame.declarations().checkTables(times));
    EquationReader equations = new EquationReader(system);
    readEquations(equations);
    for (Frame frame : frames) {
      Set<String> broken = frame.declarations().inBrokenMatrices();
      if (!broken.isEmpty()) {
        equations.noteUnread(frame, broken);
      }
    }
    if (hasUnread) {
      equations.noteUnread();
      unreadGoverned.forEach(equations::noteUnread);
    }
    StateVector vector = equations.stateVector();
    LinearFormBuilder builder = new LinearFormBuilder(equations, vector);
    Optional<LinearForm> form = builder.build();
    reportNoStates();
    Components components = new Components(system, vector, builder);
    List<Output> outputs = outputs(components);
    InitialValuesReader initialValues = new InitialValuesReader(system, components, times);
    BasisReader bases = new BasisReader(system, components, times);
    JumpReader jumps = new JumpReader(components, times);
    initialValues.readDeclarations(statement.header());
    for (Frame frame : frames) {
      for (Statement s : frame.body()) {
        if (s instanceof JumpStatement jump) {
          jumps.read(frame, jump);
        }
      }
    }
    for (Statement s : statement.body()) {
      switch (s) {
        case InitialValuesStatement values -> initialValues.read(values);
        case BasisStatement basis -> bases.read(basis);
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
    readRequirements(requirements);
    if (file.place().isEmpty()) {
      checkDefinedness(times, form, outputs, initialValues.complete(), bases.bases());
    }
    unreadNames.getOrDefault(system.root(), Set.of()).forEach(system.scope()::markUsed);
    system.root().declarations().reportUnused();
    List<Parameter> parameters = new ArrayList<>();
    List<Let> lets = new ArrayList<>();
    List<NamedMatrix> matrices = new ArrayList<>();
    List<Frame> all = new ArrayList<>();
    library.imported().forEach(imported -> all.add(imported.frame()));
    all.add(file.frame());
    all.addAll(frames);
    for (Frame frame : all) {
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

  private void readEquations(EquationReader equations) {
    TransferReader transfers = new TransferReader(system, equations);
    for (Frame frame : frames) {
      frame
          .resolver()
          .loops()
          .statements(
              frame.body(),
              new LoopReading(frame) {
                @Override
                public boolean wants(Statement s) {
                  return s instanceof EquationStatement || s instanceof TransferStatement;
                }

                @Override
                public void read(Statement s) {
                  ModelReader.check(cancelled);
                  if (s instanceof EquationStatement equation) {
                    equations.read(frame, equation);
                  } else if (s instanceof TransferStatement transfer) {
                    transfers.read(frame, transfer);
                  }
                }
              });
    }
    transfers.finish();
  }

  private void readRequirements(RequirementReader requirements) {
    system
        .resolver()
        .loops()
        .statements(
            statement.body(),
            new LoopReading(system.root()) {
              @Override
              public boolean wants(Statement s) {
                return s instanceof RequireStatement;
              }

              @Override
              public void read(Statement s) {
                ModelReader.check(cancelled);
                if (s instanceof RequireStatement require) {
                  requirements.read(require.clause());
                }
              }
            });
  }

  /** Reads statements in loops; what a loop without turns names counts as used. */
  private abstract class LoopReading implements Loops.Reading {
    private final Frame frame;
    private final Set<Span> seen = new HashSet<>();

    LoopReading(Frame frame) {
      this.frame = frame;
    }

    @Override
    public void unread(ForStatement loop) {
      if (seen.add(loop.span())) {
        SystemReader.this.unread(frame, loop.span(), Optional.empty(), true);
      }
    }

    @Override
    public void empty(ForStatement loop) {
      if (seen.add(loop.span())) {
        namesUsed(frame, loop.span());
      }
    }
  }

  /**
   * Takes all names of a frame and of the parts in it, so that the order of declarations does not
   * matter.
   *
   * @param types the systems whose statements are being read, the innermost last
   */
  private void collect(Frame frame, List<SystemStatement> types) {
    frames.add(frame);
    collectTime(frame, types.getLast());
    Declarations declarations = frame.declarations();
    for (Statement s : frame.body()) {
      switch (s) {
        case ParameterStatement parameter -> declarations.collect(parameter);
        case LetStatement let -> declarations.collect(let);
        case InputStatement input -> declarations.collect(input);
        case MatrixStatement matrix -> declarations.collect(matrix);
        case TableStatement table -> declarations.collect(table);
        case OutputStatement output -> declarations.collect(output);
        case StateStatement state when state.primes() > 0 ->
            derivatives.add(new ReadDerivative(frame, state));
        case StateStatement state -> {
          if (declarations.takesName(state.name())) {
            system.layout().declare(frame, state);
          }
        }
        case PartStatement part -> collect(frame, types, part);
        case ImportStatement read -> misplacedImport(frame, read);
        case ForStatement loop -> loop(frame, loop);
        case UnreadStatement unread ->
            unread(frame, unread.span(), unread.declares(), mayGovern(unread));
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
  }

  private static boolean mayGovern(UnreadStatement unread) {
    return switch (unread.word()) {
      case "", "transfer", "for" -> true;
      default -> false;
    };
  }

  /** Checks what a loop repeats: equations, transfers, requirements and loops. */
  private void loop(Frame frame, ForStatement loop) {
    for (Statement s : loop.body()) {
      switch (s) {
        case EquationStatement equation -> {}
        case TransferStatement transfer -> {}
        case RequireStatement require -> {}
        case ForStatement inner -> loop(frame, inner);
        case UnreadStatement unread ->
            unread(frame, unread.span(), unread.declares(), mayGovern(unread));
        case Declaration declaration ->
            misplaced(frame, declaration, Optional.of(declaration.name()));
        case AccuracyStatement accuracy -> misplaced(frame, accuracy, Optional.empty());
        case JumpStatement jump -> misplaced(frame, jump, Optional.empty());
        case ImportStatement read -> misplacedImport(frame, read);
      }
    }
  }

  private void misplaced(Frame frame, Statement inLoop, Optional<Name> declares) {
    unread(frame, inLoop.span(), declares, false);
    frame
        .problems()
        .report(
            ProblemKind.STATEMENT_MISPLACED,
            inLoop.span(),
            "A loop repeats equations, transfers and requirements: move this out of it"
                + (inLoop instanceof JumpStatement
                    ? ", and write the loop inside of the jump."
                    : "."));
  }

  private void collectTime(Frame frame, SystemStatement type) {
    Name time = type.over().map(OverClause::name).orElse(new Name("t", type.header()));
    boolean known = frame == system.root() ? timeKnown : knowsTime(frame, type);
    if (!known) {
      frame.scope().define(time.text(), frame.broken(time));
    } else if (frame.declarations().takesName(time)) {
      frame
          .scope()
          .define(time.text(), new TimeMeaning(frame.timeUnit(), frame.placed(time.span())));
    }
  }

  /** Finds the unit of time of a part; inside of the system all times are one. */
  private static boolean knowsTime(Frame part, SystemStatement type) {
    Optional<UnitOfMeasure> unit = timeUnit(type, part.units(), part.problems());
    unit.ifPresent(part::setTimeUnit);
    return unit.isPresent();
  }

  private void collect(Frame frame, List<SystemStatement> types, PartStatement statement) {
    if (!frame.declarations().takesName(statement.name())) {
      return;
    }
    String name = statement.name().text();
    Optional<PartReader.Part> part = parts.open(frame, types, statement);
    if (part.isEmpty()) {
      frame.scope().define(name, frame.broken(statement.name()));
      noteUnread(frame);
      return;
    }
    Frame inner = part.get().frame();
    frame.scope().define(name, new PartMeaning(inner, frame.placed(statement.name().span())));
    List<SystemStatement> deeper = new ArrayList<>(types);
    deeper.add(part.get().type().statement());
    collect(inner, deeper);
    if (!statement.allRead()) {
      noteUnread(frame);
    }
    checkTime(frame, inner, statement);
  }

  /** Notes that something of a frame is not known, so that nothing is reported for want of it. */
  private void noteUnread(Frame frame) {
    hasUnread = true;
    unreadGoverned.computeIfAbsent(frame, f -> new HashSet<>());
  }

  private static void checkTime(Frame frame, Frame inner, PartStatement statement) {
    boolean known = !frame.scope().timeName().isEmpty() && !inner.scope().timeName().isEmpty();
    if (known && !frame.timeUnit().dimension().equals(inner.timeUnit().dimension())) {
      frame
          .problems()
          .report(
              ProblemKind.UNIT_MISMATCH,
              statement.system().span(),
              "The independent variable of "
                  + statement.system().text()
                  + " is "
                  + Resolver.in(inner.timeUnit().dimension())
                  + ", but that of this system is "
                  + Resolver.in(frame.timeUnit().dimension())
                  + ": a part shares it, so give both one dimension.");
    }
  }

  private static void misplacedImport(Frame frame, ImportStatement statement) {
    frame
        .problems()
        .report(
            ProblemKind.STATEMENT_MISPLACED,
            statement.span(),
            "An import stands outside of systems: move this line to the beginning of the file.");
  }

  /**
   * Notes what a statement that could not be read may declare, use or govern.
   *
   * @param mayGovern whether it may be the equation of a state named in it
   */
  private void unread(Frame frame, Span span, Optional<Name> declares, boolean mayGovern) {
    noteUnread(frame);
    declares.ifPresent(name -> {
      if (frame.scope().own(name.text()).isEmpty()) {
        frame.scope().define(name.text(), frame.broken(name));
      }
    });
    Set<String> governed = unreadGoverned.get(frame);
    for (String name : namesUsed(frame, span)) {
      if (mayGovern) {
        governed.add(name);
      }
    }
  }

  /** Notes the names in a text as used, and returns them. */
  private Set<String> namesUsed(Frame frame, Span span) {
    Set<String> names = new LinkedHashSet<>();
    String text = frame.slice(span);
    for (Token token : Lexer.lex(text)) {
      if (token.kind().isName()) {
        names.add(text.substring(token.start(), token.end()));
      }
    }
    unreadNames.computeIfAbsent(frame, f -> new HashSet<>()).addAll(names);
    return names;
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
