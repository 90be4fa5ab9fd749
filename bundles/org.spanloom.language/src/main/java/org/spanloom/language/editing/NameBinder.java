/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.editing;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Consumer;
import org.spanloom.language.editing.Occurrence.Role;
import org.spanloom.language.editing.Symbol.Declared;
import org.spanloom.language.editing.SymbolKind.Room;
import org.spanloom.language.syntax.BlockLine;
import org.spanloom.language.syntax.BlockLine.RepeatedLines;
import org.spanloom.language.syntax.BlockLine.SingleLine;
import org.spanloom.language.syntax.Comparison;
import org.spanloom.language.syntax.Expression;
import org.spanloom.language.syntax.Expression.CallExpression;
import org.spanloom.language.syntax.Expression.ChoiceExpression;
import org.spanloom.language.syntax.Expression.IndexedSumExpression;
import org.spanloom.language.syntax.Expression.MissingExpression;
import org.spanloom.language.syntax.Expression.NameExpression;
import org.spanloom.language.syntax.Expression.NumberExpression;
import org.spanloom.language.syntax.Expression.ParenthesisedExpression;
import org.spanloom.language.syntax.Expression.PowerExpression;
import org.spanloom.language.syntax.Expression.ProductExpression;
import org.spanloom.language.syntax.Expression.SignedExpression;
import org.spanloom.language.syntax.Expression.SumExpression;
import org.spanloom.language.syntax.IndexRange;
import org.spanloom.language.syntax.Lexer;
import org.spanloom.language.syntax.MatrixSource.MatrixExpression;
import org.spanloom.language.syntax.MatrixSource.MatrixFile;
import org.spanloom.language.syntax.MatrixSource.MatrixRow;
import org.spanloom.language.syntax.MatrixSource.MatrixRows;
import org.spanloom.language.syntax.Name;
import org.spanloom.language.syntax.OverClause;
import org.spanloom.language.syntax.RequireClause;
import org.spanloom.language.syntax.RequireClause.Compares;
import org.spanloom.language.syntax.RequireClause.HasPeriod;
import org.spanloom.language.syntax.RequireClause.IsInvariant;
import org.spanloom.language.syntax.RequireClause.IsNonnegative;
import org.spanloom.language.syntax.RequireClause.IsStable;
import org.spanloom.language.syntax.RequireClause.LimitsCondition;
import org.spanloom.language.syntax.Statement;
import org.spanloom.language.syntax.Statement.AccuracyStatement;
import org.spanloom.language.syntax.Statement.BasisStatement;
import org.spanloom.language.syntax.Statement.BoundaryStatement;
import org.spanloom.language.syntax.Statement.EquationStatement;
import org.spanloom.language.syntax.Statement.ForStatement;
import org.spanloom.language.syntax.Statement.ImportStatement;
import org.spanloom.language.syntax.Statement.InitialValuesStatement;
import org.spanloom.language.syntax.Statement.InputStatement;
import org.spanloom.language.syntax.Statement.JumpStatement;
import org.spanloom.language.syntax.Statement.JumpTime.Once;
import org.spanloom.language.syntax.Statement.JumpTime.Repeated;
import org.spanloom.language.syntax.Statement.LetStatement;
import org.spanloom.language.syntax.Statement.MatrixStatement;
import org.spanloom.language.syntax.Statement.OutputStatement;
import org.spanloom.language.syntax.Statement.ParameterStatement;
import org.spanloom.language.syntax.Statement.PartStatement;
import org.spanloom.language.syntax.Statement.RequireStatement;
import org.spanloom.language.syntax.Statement.Setting;
import org.spanloom.language.syntax.Statement.StateStatement;
import org.spanloom.language.syntax.Statement.SystemStatement;
import org.spanloom.language.syntax.Statement.TableStatement;
import org.spanloom.language.syntax.Statement.TransferEnd;
import org.spanloom.language.syntax.Statement.TransferStatement;
import org.spanloom.language.syntax.Statement.UnreadStatement;
import org.spanloom.language.syntax.TableSource.TableFile;
import org.spanloom.language.syntax.TableSource.TableRow;
import org.spanloom.language.syntax.TableSource.TableRows;
import org.spanloom.language.syntax.Token;
import org.spanloom.language.syntax.TokenKind;
import org.spanloom.language.syntax.Turns;
import org.spanloom.language.text.SourceText;
import org.spanloom.language.text.Span;

/**
 * Finds what the names in statements stand for. In what could not be read, the words tell: each
 * that is a name in scope is an occurrence of it.
 */
final class NameBinder {

  private final SourceText source;
  private final NameScopes scopes;
  private final List<Occurrence> found = new ArrayList<>();
  private final List<Occurrence> derivatives = new ArrayList<>();
  private NameScope scope;
  private boolean inEquation;

  NameBinder(SourceText source, NameScopes scopes) {
    this.source = source;
    this.scopes = scopes;
    this.scope = scopes.file();
  }

  /** Returns the names in statements of one body, in the order of the text. */
  List<Occurrence> bind(NameScope body, List<Statement> statements) {
    scope = body;
    statements.forEach(this::statement);
    return inTextOrder();
  }

  /** Returns the names in the first line of a system. */
  List<Occurrence> bindHeader(SystemStatement system) {
    header(system);
    return inTextOrder();
  }

  private void statement(Statement statement) {
    switch (statement) {
      case SystemStatement system -> system(system);
      case ParameterStatement parameter -> {
        declared(Room.VALUES, parameter.name(), 0);
        expression(parameter.value());
        parameter.uncertainty().ifPresent(u -> expression(u.halfWidth()));
      }
      case LetStatement let -> {
        declared(Room.VALUES, let.name(), 0);
        let.argument().ifPresent(this::value);
        expression(let.value());
      }
      case InputStatement input -> {
        declared(Room.VALUES, input.name(), 0);
        value(input.argument());
        expression(input.value());
      }
      case StateStatement state -> {
        declared(Room.VALUES, state.name(), state.primes());
        for (IndexRange range : state.ranges()) {
          expression(range.from());
          expression(range.to());
        }
        state.initial().ifPresent(this::expression);
        state.scale().ifPresent(this::expression);
      }
      case MatrixStatement matrix -> matrix(matrix);
      case TableStatement table -> table(table);
      case OutputStatement output -> {
        declared(Room.VALUES, output.name(), 0);
        expression(output.value());
      }
      case EquationStatement equation -> {
        inEquation = true;
        expression(equation.left());
        expression(equation.right());
        inEquation = false;
      }
      case TransferStatement transfer -> {
        end(transfer.from());
        end(transfer.to());
        expression(transfer.flow());
      }
      case PartStatement part -> part(part);
      case ImportStatement read -> {}
      case ForStatement loop -> turns(loop.turns(), () -> loop.body().forEach(this::statement));
      case JumpStatement jump -> jump(jump);
      case InitialValuesStatement values -> initialValues(values);
      case BoundaryStatement boundary -> boundary(boundary);
      case BasisStatement basis -> basis(basis);
      case RequireStatement require -> clause(require.clause());
      case AccuracyStatement accuracy -> expression(accuracy.value());
      case UnreadStatement unread -> words(unread.span());
    }
  }

  private void part(PartStatement part) {
    if (!part.allRead()) {
      words(part.span());
      return;
    }
    declared(Room.VALUES, part.name(), 0);
    used(Room.SYSTEMS, part.system());
    Optional<NameScope> inner = scopes.named(part.system().text());
    for (Setting binding : part.bindings()) {
      NameExpression target = binding.target();
      inner
          .flatMap(names -> names.own(Room.VALUES, target.name().text()))
          .ifPresent(symbol ->
              found.add(
                  new Occurrence(symbol, Role.WRITTEN, target.name().span(), target.primes())));
      expression(binding.value());
    }
  }

  private void table(TableStatement table) {
    if (table.source() instanceof TableRows rows && !rows.allRead()) {
      words(table.span());
      return;
    }
    declared(Room.VALUES, table.name(), 0);
    value(table.argument());
    switch (table.source()) {
      case TableFile file -> {}
      case TableRows rows -> {
        for (TableRow row : rows.rows()) {
          expression(row.time());
          expression(row.value());
        }
      }
    }
  }

  private void matrix(MatrixStatement matrix) {
    if (matrix.source() instanceof MatrixRows rows && !rows.allRead()) {
      words(matrix.span());
      return;
    }
    declared(Room.VALUES, matrix.name(), 0);
    matrix.argument().ifPresent(this::value);
    switch (matrix.source()) {
      case MatrixFile file -> {}
      case MatrixExpression expression -> expression(expression.value());
      case MatrixRows rows -> {
        for (MatrixRow row : rows.rows()) {
          row.values().forEach(this::expression);
        }
      }
    }
  }

  private void system(SystemStatement system) {
    NameScope around = scope;
    header(system);
    system.body().forEach(this::statement);
    scope = around;
  }

  /** Takes the first line of a system; from there on its names are in scope. */
  private void header(SystemStatement system) {
    declared(Room.SYSTEMS, system.name(), 0);
    scope = scopes.of(system);
    if (system.over().isPresent()) {
      over(system.over().get());
    } else {
      words(new Span(system.name().span().end(), system.header().end()));
    }
  }

  private void over(OverClause over) {
    declared(Room.VALUES, over.name(), 0);
    over.start().ifPresent(b -> expression(b.value()));
    over.end().ifPresent(b -> expression(b.value()));
  }

  private void end(TransferEnd end) {
    end.state().ifPresent(state -> name(state, Role.WRITTEN));
  }

  private void jump(JumpStatement jump) {
    if (!jump.allRead()) {
      words(jump.span());
      return;
    }
    switch (jump.time()) {
      case Once once -> expression(once.time());
      case Repeated repeated -> {
        expression(repeated.period());
        expression(repeated.first());
        expression(repeated.last());
      }
    }
    lines(
        jump.changes(),
        change -> {
          name(change.target(), Role.WRITTEN);
          expression(change.value());
        });
  }

  private void boundary(BoundaryStatement boundary) {
    if (!boundary.allRead()) {
      words(boundary.span());
      return;
    }
    declared(Room.CONDITIONS, boundary.name(), 0);
    lines(
        boundary.conditions(),
        condition -> {
          expression(condition.left());
          expression(condition.right());
        });
  }

  private void initialValues(InitialValuesStatement values) {
    if (!values.allRead()) {
      words(values.span());
      return;
    }
    declared(Room.CONDITIONS, values.name(), 0);
    values.time().ifPresent(this::expression);
    lines(
        values.settings(),
        setting -> {
          name(setting.target(), Role.WRITTEN);
          expression(setting.value());
        });
  }

  private void basis(BasisStatement basis) {
    if (!basis.allRead()) {
      words(basis.span());
      return;
    }
    declared(Room.BASES, basis.name(), 0);
    basis.argument().ifPresent(this::value);
    basis.time().ifPresent(this::expression);
    lines(
        basis.rows(),
        row -> {
          name(row.target(), Role.WRITTEN);
          row.values().forEach(this::expression);
        });
  }

  private <T> void lines(List<BlockLine<T>> lines, Consumer<T> reader) {
    for (BlockLine<T> line : lines) {
      switch (line) {
        case SingleLine<T> single -> reader.accept(single.content());
        case RepeatedLines<T> loop -> turns(loop.turns(), () -> lines(loop.lines(), reader));
      }
    }
  }

  /** Takes the bounds of a loop or sum, and its body, in which the index has a name. */
  private void turns(Turns turns, Runnable body) {
    expression(turns.from());
    expression(turns.to());
    NameScope around = scope;
    Name index = turns.index();
    boolean time =
        scope.find(Room.VALUES, index.text()).filter(s -> s.kind() == SymbolKind.TIME).isPresent();
    if (time) {
      // The independent variable cannot be an index; it stays what it is.
      value(index);
      body.run();
      return;
    }
    Declared declared = new Declared(index.span(), 0, turns.span(), "");
    Symbol symbol = new Symbol(SymbolKind.INDEX, index.text(), List.of(declared));
    scope = new NameScope(Optional.of(around), List.of(symbol));
    declared(Room.VALUES, index, 0);
    body.run();
    scope = around;
  }

  private void clause(RequireClause clause) {
    switch (clause) {
      case Compares compares -> {
        comparison(compares.comparison());
        compares.until().ifPresent(this::expression);
        compares.under().ifPresent(n -> used(Room.CONDITIONS, n));
      }
      case LimitsCondition limits -> {
        used(Room.BASES, limits.basis());
        expression(limits.limit());
        limits.until().ifPresent(this::expression);
      }
      case IsStable stable -> {}
      case IsNonnegative nonnegative ->
          nonnegative.under().ifPresent(n -> used(Room.CONDITIONS, n));
      case IsInvariant invariant -> expression(invariant.value());
      case HasPeriod period -> expression(period.period());
    }
  }

  private void comparison(Comparison comparison) {
    expression(comparison.left());
    expression(comparison.right());
  }

  private void expression(Expression expression) {
    switch (expression) {
      case NumberExpression number -> {}
      case MissingExpression missing -> {}
      case NameExpression name -> name(name, Role.READ);
      case CallExpression call -> {
        name(call.callee(), Role.READ);
        call.arguments().forEach(a -> expression(a.value()));
      }
      case SignedExpression signed -> expression(signed.operand());
      case SumExpression sum -> sum.addends().forEach(a -> expression(a.value()));
      case ProductExpression product -> product.factors().forEach(f -> expression(f.value()));
      case PowerExpression power -> {
        expression(power.base());
        expression(power.exponent());
      }
      case ChoiceExpression choice -> {
        comparison(choice.condition());
        expression(choice.then());
        expression(choice.otherwise());
      }
      case IndexedSumExpression sum -> turns(sum.turns(), () -> expression(sum.body()));
      case ParenthesisedExpression parenthesised -> expression(parenthesised.inner());
    }
  }

  private void value(Name name) {
    used(Room.VALUES, name);
  }

  private void name(NameExpression name, Role role) {
    if (name.name().text().indexOf('.') > 0) {
      dotted(name, role);
      return;
    }
    add(Room.VALUES, name.name().text(), role, name.name().span(), name.primes());
    name.indices().forEach(this::expression);
  }

  /** Takes each word of a name such as {@code lower.T}: all but the last one are parts. */
  private void dotted(NameExpression name, Role role) {
    String[] words = name.name().text().split("\\.");
    int start = name.name().span().start();
    Optional<NameScope> names = Optional.of(scope);
    for (int i = 0; i < words.length && names.isPresent(); i++) {
      String word = words[i];
      Optional<Symbol> symbol =
          i == 0 ? names.get().find(Room.VALUES, word) : names.get().own(Room.VALUES, word);
      boolean last = i == words.length - 1;
      Span span = new Span(start, start + word.length());
      int primes = last ? name.primes() : 0;
      boolean derivative = inEquation && primes > 0;
      symbol.ifPresent(s ->
          (derivative ? derivatives : found)
              .add(new Occurrence(s, last ? role : Role.READ, span, primes)));
      names = symbol.flatMap(scopes::inPart);
      start = span.end() + 1;
    }
  }

  private void used(Room room, Name name) {
    add(room, name.text(), Role.READ, name.span(), 0);
  }

  private void declared(Room room, Name name, int primes) {
    add(room, name.text(), Role.DECLARED, name.span(), primes);
  }

  private void add(Room room, String name, Role role, Span span, int primes) {
    boolean derivative = inEquation && primes > 0;
    scope
        .find(room, name)
        .ifPresent(
            s -> (derivative ? derivatives : found).add(new Occurrence(s, role, span, primes)));
  }

  /** Takes the words of a text that could not be read. */
  private void words(Span span) {
    String text = source.slice(span);
    List<Token> tokens = Lexer.lex(text);
    for (int i = 0; i < tokens.size(); i++) {
      if (tokens.get(i).kind() != TokenKind.NAME) {
        continue;
      }
      String word = word(text, tokens, i);
      Span place =
          new Span(span.start() + tokens.get(i).start(), span.start() + tokens.get(i).end());
      boolean primed = i + 1 < tokens.size() && tokens.get(i + 1).kind() == TokenKind.PRIMES;
      int primes = primed ? tokens.get(i + 1).span().length() : 0;
      Optional<Symbol> symbol = scope.find(room(text, tokens, i), word);
      boolean declares =
          symbol.stream()
              .flatMap(s -> s.declarations().stream())
              .anyMatch(d -> d.name().equals(place));
      symbol.ifPresent(
          s -> found.add(new Occurrence(s, declares ? Role.DECLARED : Role.READ, place, primes)));
    }
  }

  /** Names of initial values, boundary conditions and bases stand behind certain words only. */
  private static Room room(String text, List<Token> tokens, int i) {
    return switch (word(text, tokens, i - 1)) {
      case "under", "values", "boundary" -> Room.CONDITIONS;
      case "basis" -> Room.BASES;
      case "system" -> Room.SYSTEMS;
      case "=" -> word(text, tokens, i - 3).equals("part") ? Room.SYSTEMS : Room.VALUES;
      case "(" -> word(text, tokens, i - 2).equals("condition") ? Room.BASES : Room.VALUES;
      default -> Room.VALUES;
    };
  }

  private static String word(String text, List<Token> tokens, int i) {
    return i < 0 ? "" : text.substring(tokens.get(i).start(), tokens.get(i).end());
  }

  /**
   * Returns what was found, in the order of the text. Of the derivatives in equations, the highest
   * one of each state is written; all others are read.
   */
  private List<Occurrence> inTextOrder() {
    Map<Symbol, Integer> highest = new IdentityHashMap<>();
    for (Occurrence derivative : derivatives) {
      highest.merge(derivative.symbol(), derivative.primes(), Math::max);
    }
    for (Occurrence derivative : derivatives) {
      boolean governs = derivative.primes() == highest.get(derivative.symbol());
      found.add(governs ? derivative.as(Role.WRITTEN) : derivative);
    }
    return found.stream().sorted(Comparator.comparingInt(o -> o.span().start())).toList();
  }
}
