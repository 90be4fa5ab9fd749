/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.editing;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Set;
import org.spanloom.language.model.Function;
import org.spanloom.language.model.MatrixFunction;
import org.spanloom.language.model.Model;
import org.spanloom.language.model.NamedConstant;
import org.spanloom.language.model.PulseTrain;
import org.spanloom.language.syntax.IndexRange;
import org.spanloom.language.syntax.Lexer;
import org.spanloom.language.syntax.OverClause;
import org.spanloom.language.syntax.Statement;
import org.spanloom.language.syntax.Statement.BasisStatement;
import org.spanloom.language.syntax.Statement.BoundaryStatement;
import org.spanloom.language.syntax.Statement.Declaration;
import org.spanloom.language.syntax.Statement.InitialValuesStatement;
import org.spanloom.language.syntax.Statement.InputStatement;
import org.spanloom.language.syntax.Statement.JumpStatement;
import org.spanloom.language.syntax.Statement.LetStatement;
import org.spanloom.language.syntax.Statement.MatrixStatement;
import org.spanloom.language.syntax.Statement.OutputStatement;
import org.spanloom.language.syntax.Statement.ParameterStatement;
import org.spanloom.language.syntax.Statement.PartStatement;
import org.spanloom.language.syntax.Statement.StateStatement;
import org.spanloom.language.syntax.Statement.SystemStatement;
import org.spanloom.language.syntax.Statement.TableStatement;
import org.spanloom.language.syntax.Statement.UnreadStatement;
import org.spanloom.language.syntax.Token;
import org.spanloom.language.syntax.TokenKind;
import org.spanloom.language.syntax.UnitText;
import org.spanloom.language.syntax.Words;
import org.spanloom.language.text.Span;
import org.spanloom.language.units.UnitNames;
import org.spanloom.language.units.UnitReader;

/** Proposes what can stand at a caret. */
public final class Completion {

  private static final List<String> OUTSIDE =
      List.of("system", "import", "parameter", "let", "matrix");
  private static final List<String> INSIDE =
      List.of(
          "parameter",
          "let",
          "input",
          "state",
          "output",
          "matrix",
          "table",
          "part",
          "transfer",
          "for",
          "jump",
          "initial values",
          "boundary",
          "basis",
          "require",
          "accuracy");
  private static final String PREFIXES = "kMGmunp";

  private final Model model;
  private final int offset;
  private final List<Token> before = new ArrayList<>();
  private final Span replaced;
  private final String prefix;
  private Reach reach = Reach.STATES;
  private String documentation = "";
  private final List<Proposal> proposals = new ArrayList<>();
  private final Set<String> offered = new HashSet<>();

  /** How much may stand in an expression: each holds what those before it hold. */
  private enum Reach {
    CONSTANTS,
    TIME,
    STATES
  }

  /**
   * A text that can stand at the caret.
   *
   * @param text the text to insert
   * @param detail what it is, in a few words
   * @param documentation documentation comments of what it names, empty if there are none
   * @param replaced the place it takes: the beginning of the word before the caret
   */
  public record Proposal(String text, String detail, String documentation, Span replaced) {}

  private Completion(Model model, int offset) {
    this.model = model;
    this.offset = offset;
    String content = model.source().content();
    int lineStart = model.source().lineSpan(model.source().line(offset)).start();
    int wordStart = offset;
    for (Token token : Lexer.lexLine(content, lineStart)) {
      if (token.start() >= offset) {
        break;
      }
      boolean unit = token.kind() == TokenKind.UNIT || token.kind() == TokenKind.OPEN_UNIT;
      if (unit && (offset < token.end() || token.kind() == TokenKind.OPEN_UNIT)) {
        wordStart = unitStart(content, token.start() + 1);
        before.add(token);
      } else if (token.kind().isWord() && offset <= token.end()) {
        wordStart = token.start();
      } else {
        before.add(token);
      }
    }
    this.replaced = new Span(wordStart, offset);
    this.prefix = content.substring(wordStart, offset);
  }

  /** Returns the offset at which the last symbol of a unit begins. */
  private int unitStart(String content, int from) {
    int start = offset;
    while (start > from && "./()".indexOf(content.charAt(start - 1)) < 0) {
      start--;
    }
    return start;
  }

  /**
   * Returns what can stand at an offset, what fits best first; of words, those that begin as the
   * text there does.
   */
  public static List<Proposal> at(Model model, int offset) {
    if (offset < 0 || offset > model.source().content().length()) {
      return List.of();
    }
    return new Completion(model, offset).propose();
  }

  private List<Proposal> propose() {
    Token last = before.isEmpty() ? new Token(TokenKind.NEWLINE, 0, 0) : before.getLast();
    switch (last.kind()) {
      case COMMENT, DOCUMENTATION, STRING, OPEN_STRING -> {
        return List.of();
      }
      case UNIT, OPEN_UNIT -> {
        boolean inside =
            offset > last.start() && (offset < last.end() || last.kind() == TokenKind.OPEN_UNIT);
        if (inside) {
          unitsBeside();
          units();
          return proposals;
        }
      }
      default -> {}
    }
    String first = firstWord();
    if (last.kind() == TokenKind.DOT) {
      inPart(last);
    } else if (first.isEmpty()) {
      beginning();
    } else {
      insideStatement(first, text(last));
    }
    return proposals;
  }

  /** Returns the first word of the statement before the caret. */
  private String firstWord() {
    String first = "";
    for (Token token : before) {
      switch (token.kind()) {
        case SEMICOLON, OPEN_BRACE, CLOSE_BRACE -> first = "";
        default -> first = first.isEmpty() ? text(token) : first;
      }
    }
    return first;
  }

  private String text(Token token) {
    return model.source().slice(token.span());
  }

  private Optional<SystemStatement> system() {
    return Names.of(model.syntax()).systemAt(offset);
  }

  /** Proposes what the part before the point declares. */
  private void inPart(Token dot) {
    List<String> path =
        PartNames.path(model.source(), dot.start()).stream().map(this::text).toList();
    List<Statement> body = system().map(SystemStatement::body).orElse(List.of());
    new PartNames(model)
        .inside(body, path)
        .map(found -> (SystemStatement) found.declaration())
        .ifPresent(type -> declarations(type.body()));
  }

  private void declarations(List<Statement> body) {
    for (Statement statement : body) {
      if (statement instanceof Declaration declaration) {
        name(declaration);
      }
    }
  }

  /** Proposes what the braces of a part can set. */
  private void bindings(PartStatement part) {
    PartNames names = new PartNames(model);
    List<Statement> body =
        names
            .type(part)
            .map(found -> ((SystemStatement) found.declaration()).body())
            .orElse(List.of());
    for (Statement statement : body) {
      switch (statement) {
        case ParameterStatement p ->
            offer(p.name().text(), "parameter" + unit(p.unit().map(u -> u.code())));
        case InputStatement i ->
            offer(i.name().text(), "input" + unit(i.unit().map(u -> u.code())));
        case StateStatement s ->
            offer(s.label(), "initial value" + unit(s.unit().map(u -> u.code())));
        default -> {}
      }
    }
  }

  private void beginning() {
    Optional<PartStatement> part = new PartNames(model).partAt(offset);
    if (part.isPresent()) {
      bindings(part.get());
      return;
    }
    boolean inside = system().filter(s -> offset > s.header().end()).isPresent();
    (inside ? INSIDE : OUTSIDE).forEach(w -> offer(w, "statement"));
    if (inside) {
      offer("row", "row of a basis or matrix");
      states();
    }
  }

  private void insideStatement(String first, String last) {
    if (first.equals("part") && last.equals("=")) {
      new PartNames(model).systems().forEach(s -> offer(s.name().text(), "system"));
      return;
    }
    switch (last) {
      case "under" -> initialValues();
      case "initial" -> offer("values", "initial values NAME { ... }");
      case "require" -> {
        Words.REQUIREMENT.forEach(w -> offer(w, "requirement"));
        values(true);
      }
      case "scaled" -> offer("condition", "2-norm condition number of a basis");
      case "state",
          "parameter",
          "let",
          "input",
          "output",
          "matrix",
          "table",
          "system",
          "values",
          "for" -> {}
      case "basis", "boundary", "part", "import" -> {}
      default -> {
        if (isCondition()) {
          bases();
        } else if (isChange()) {
          offer("becomes", "the state at once takes another value");
        } else if (first.equals("row") && before.size() == 1) {
          states();
        } else {
          reach = reach(first);
          clauses(first);
          values(true);
        }
      }
    }
  }

  /** Returns what the values of a statement may depend on. */
  private Reach reach(String first) {
    boolean ofTime =
        before.stream().anyMatch(t -> t.kind() == TokenKind.OPEN_PARENTHESIS)
            && before.stream().anyMatch(t -> t.kind() == TokenKind.EQUALS);
    return switch (first) {
      case "parameter", "state", "system", "accuracy", "initial" -> Reach.CONSTANTS;
      case "let", "matrix" -> ofTime ? Reach.TIME : Reach.CONSTANTS;
      case "input", "table", "row" -> Reach.TIME;
      default -> isInitialValue() ? Reach.CONSTANTS : Reach.STATES;
    };
  }

  /** Tells whether the caret stands behind the equals sign of an initial value. */
  private boolean isInitialValue() {
    return before.stream().anyMatch(t -> t.kind() == TokenKind.EQUALS)
        && system().map(SystemStatement::body).orElse(List.of()).stream()
            .anyMatch(s ->
                s.span().touches(offset)
                    && (s instanceof InitialValuesStatement
                        || s instanceof UnreadStatement unread && unread.word().equals("initial")));
  }

  /** Tells whether the caret stands in the parentheses behind {@code condition}. */
  private boolean isCondition() {
    int n = before.size();
    return n > 1
        && before.get(n - 1).kind() == TokenKind.OPEN_PARENTHESIS
        && text(before.get(n - 2)).equals("condition");
  }

  /** Tells whether the caret stands behind the name at the start of a line of a jump. */
  private boolean isChange() {
    Token last = before.getLast();
    int i = before.size() - (last.kind() == TokenKind.PRIMES ? 2 : 1);
    boolean alone =
        i == 0
            || i > 0
                && switch (before.get(i - 1).kind()) {
                  case SEMICOLON, OPEN_BRACE -> true;
                  default -> false;
                };
    return alone
        && before.get(i).kind().isName()
        && system().map(SystemStatement::body).orElse(List.of()).stream()
            .anyMatch(s -> s.span().touches(offset) && isJump(s));
  }

  /** A jump whose time is wrong is one nevertheless. */
  private static boolean isJump(Statement statement) {
    return statement instanceof JumpStatement
        || statement instanceof UnreadStatement unread && unread.word().equals("jump");
  }

  private void clauses(String first) {
    switch (first) {
      case "jump" -> List.of("at", "every", "from", "to").forEach(w -> offer(w, "time of a jump"));
      case "system" ->
          List.of("over", "from", "to", "after", "before").forEach(w -> offer(w, "interval"));
      case "table" ->
          List.of("file", "time", "column", "hold", "linear", "monotone cubic", "extended")
              .forEach(w -> offer(w, "table"));
      case "matrix" -> offer("file", "file \"NAME.mtx\", in the Matrix Market format");
      case "state" -> offer("scale", "size below which only absolute errors count");
      case "initial", "basis" -> offer("at", "time");
      case "for" -> List.of("from", "to").forEach(w -> offer(w, "bounds of the loop"));
      case "transfer" -> offer("outside", "where amounts come from or go to");
      case "require" ->
          List.of("throughout", "until", "under").forEach(w -> offer(w, "requirement"));
      default -> {}
    }
  }

  private void values(boolean functions) {
    List<Statement> statements = new ArrayList<>();
    system().ifPresent(s -> statements.addAll(s.body()));
    statements.addAll(model.syntax().statements());
    declarations(statements);
    new PartNames(model).importedGlobals().forEach(this::name);
    if (reach != Reach.CONSTANTS) {
      system()
          .flatMap(SystemStatement::over)
          .ifPresent(o -> offer(o.name().text(), "independent variable"));
    }
    indices().forEach(i -> offer(i, "index of a loop"));
    if (functions) {
      offer("sum over", "sum over i from 1 to 3 of c[i]");
      for (Function function : Function.values()) {
        offer(function.code(), function.meaning());
      }
      offer(PulseTrain.NAME, PulseTrain.MEANING);
      for (MatrixFunction function : MatrixFunction.values()) {
        offer(function.code(), function.meaning());
      }
      for (NamedConstant constant : NamedConstant.values()) {
        offer(constant.code(), constant.meaning());
      }
    }
  }

  private void name(Declaration declaration) {
    if (needed(declaration).compareTo(reach) > 0) {
      return;
    }
    documentation = declaration.documentation();
    named(declaration);
    documentation = "";
  }

  /** Returns what an expression must be allowed to depend on to hold a name. */
  private static Reach needed(Declaration declaration) {
    return switch (declaration) {
      case StateStatement state -> Reach.STATES;
      case OutputStatement output -> Reach.STATES;
      case InputStatement input -> Reach.TIME;
      case LetStatement let -> let.argument().isPresent() ? Reach.TIME : Reach.CONSTANTS;
      case MatrixStatement matrix -> matrix.argument().isPresent() ? Reach.TIME : Reach.CONSTANTS;
      default -> Reach.CONSTANTS;
    };
  }

  private void named(Declaration declaration) {
    String name = declaration.name().text();
    switch (declaration) {
      case ParameterStatement p -> offer(name, "parameter" + unit(p.unit().map(u -> u.code())));
      case LetStatement let ->
          offer(
              name + let.argument().map(a -> "(" + a.text() + ")").orElse(""),
              "named expression" + unit(let.unit().map(u -> u.code())));
      case InputStatement input ->
          offer(
              name + "(" + input.argument().text() + ")",
              "input" + unit(input.unit().map(u -> u.code())));
      case StateStatement state ->
          offer(
              state.isFamily() ? member(state) : state.label(),
              (state.isFamily() ? "member of a family" : "state")
                  + unit(state.unit().map(u -> u.code())));
      case TableStatement table ->
          offer(
              name + "(" + table.argument().text() + ")",
              "table" + unit(table.unit().map(u -> u.code())));
      case MatrixStatement matrix ->
          offer(
              name + matrix.argument().map(a -> "(" + a.text() + ")").orElse(""),
              "matrix" + unit(matrix.unit().map(u -> u.code())));
      case OutputStatement output -> offer(name, "output" + unit(output.unit().map(u -> u.code())));
      case PartStatement part -> offer(name, "part, a copy of " + part.system().text());
      case SystemStatement system -> {}
      case InitialValuesStatement values -> {}
      case BoundaryStatement boundary -> {}
      case BasisStatement basis -> {}
    }
  }

  private static String unit(Optional<String> code) {
    return code.map(c -> " [" + c + "]").orElse("");
  }

  private void states() {
    for (Statement statement : system().map(SystemStatement::body).orElse(List.of())) {
      if (statement instanceof StateStatement state) {
        name(state);
      }
    }
  }

  /**
   * Returns a member of a family, by the indices of the loops around the caret if there are any.
   */
  private String member(StateStatement family) {
    List<String> around = indices();
    List<String> indices = new ArrayList<>();
    for (IndexRange range : family.ranges()) {
      int free = around.size() - family.ranges().size() + indices.size();
      indices.add(free >= 0 ? around.get(free) : model.source().slice(range.from().span()));
    }
    return family.name().text() + "[" + String.join(",", indices) + "]";
  }

  /** Returns the indices of the loops around the caret, the outermost first. */
  private List<String> indices() {
    List<Statement> body = system().map(SystemStatement::body).orElse(List.of());
    return LoopsAround.of(body, offset).reversed().stream().map(t -> t.index().text()).toList();
  }

  private void initialValues() {
    for (Statement statement : system().map(SystemStatement::body).orElse(List.of())) {
      if (statement instanceof InitialValuesStatement values) {
        offer(values.name().text(), "initial values");
      }
    }
  }

  private void bases() {
    for (Statement statement : system().map(SystemStatement::body).orElse(List.of())) {
      if (statement instanceof BasisStatement basis) {
        offer(basis.name().text(), "basis");
      }
    }
  }

  /**
   * Offers whole units that are likely before all symbols: of a derivative, the unit of its state
   * over that of time; else those of the names on the line before the caret.
   */
  private void unitsBeside() {
    Token open = before.getLast();
    if (!model.source().slice(new Span(open.start() + 1, offset)).equals(prefix)) {
      return;
    }
    for (int i = before.size() - 2; i >= 0; i--) {
      if (before.get(i).kind().isName()) {
        boolean primed = before.get(i + 1).kind() == TokenKind.PRIMES;
        int primes = primed ? before.get(i + 1).span().length() : 0;
        String label = text(before.get(i)) + "'".repeat(primes);
        unitOf(text(before.get(i)), primes).ifPresent(u -> offer(u, "unit of " + label));
      }
    }
  }

  /** Returns the declared unit of a name; of a derivative, also that of its state over time. */
  private Optional<String> unitOf(String name, int primes) {
    List<Statement> statements =
        new ArrayList<>(system().map(SystemStatement::body).orElse(List.of()));
    statements.addAll(model.syntax().statements());
    Optional<String> found = Optional.empty();
    for (Statement statement : statements) {
      Optional<UnitText> unit =
          switch (statement) {
            case ParameterStatement p when isNamed(p, name) -> p.unit();
            case LetStatement let when isNamed(let, name) -> let.unit();
            case InputStatement input when isNamed(input, name) -> input.unit();
            case OutputStatement output when isNamed(output, name) -> output.unit();
            case MatrixStatement matrix when isNamed(matrix, name) -> matrix.unit();
            case StateStatement state when isNamed(state, name) && state.primes() == primes ->
                state.unit();
            case StateStatement state when isNamed(state, name) && state.primes() == 0 -> {
              found = state.unit().flatMap(u -> overTime(u.code(), primes));
              yield Optional.empty();
            }
            default -> Optional.empty();
          };
      if (unit.isPresent()) {
        return unit.map(UnitText::code);
      }
    }
    return found;
  }

  private static boolean isNamed(Declaration declaration, String name) {
    return declaration.name().text().equals(name);
  }

  private Optional<String> overTime(String code, int primes) {
    return system()
        .flatMap(SystemStatement::over)
        .flatMap(OverClause::unit)
        .map(UnitText::code)
        .filter(time -> time.chars().allMatch(Character::isLetter))
        .map(time -> code + "/" + time + (primes == 1 ? "" : primes));
  }

  private void units() {
    for (UnitReader.Symbol symbol : UnitReader.known()) {
      String quantity = UnitNames.quantity(symbol.dimension()).map(q -> ", " + q).orElse("");
      boolean metricPrefix =
          symbol.takesPrefix()
              && prefix.length() > 1
              && PREFIXES.indexOf(prefix.charAt(0)) >= 0
              && symbol.code().startsWith(prefix.substring(1));
      offer(symbol.code(), symbol.name() + quantity);
      if (metricPrefix) {
        offer(prefix.charAt(0) + symbol.code(), symbol.name() + quantity);
      }
    }
  }

  private void offer(String text, String detail) {
    boolean begins = text.toLowerCase(Locale.ROOT).startsWith(prefix.toLowerCase(Locale.ROOT));
    if (begins && !text.isEmpty() && offered.add(text)) {
      proposals.add(new Proposal(text, detail, documentation, replaced));
    }
  }
}
