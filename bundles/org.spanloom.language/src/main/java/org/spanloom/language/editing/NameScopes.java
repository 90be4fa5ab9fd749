/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.editing;

import java.util.ArrayList;
import java.util.IdentityHashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.spanloom.language.editing.Symbol.Declared;
import org.spanloom.language.syntax.Name;
import org.spanloom.language.syntax.Statement;
import org.spanloom.language.syntax.Statement.BasisStatement;
import org.spanloom.language.syntax.Statement.BoundaryStatement;
import org.spanloom.language.syntax.Statement.Declaration;
import org.spanloom.language.syntax.Statement.InitialValuesStatement;
import org.spanloom.language.syntax.Statement.InputStatement;
import org.spanloom.language.syntax.Statement.LaterStatement;
import org.spanloom.language.syntax.Statement.LetStatement;
import org.spanloom.language.syntax.Statement.MatrixStatement;
import org.spanloom.language.syntax.Statement.OutputStatement;
import org.spanloom.language.syntax.Statement.ParameterStatement;
import org.spanloom.language.syntax.Statement.StateStatement;
import org.spanloom.language.syntax.Statement.SystemStatement;
import org.spanloom.language.syntax.Statement.UnreadStatement;
import org.spanloom.language.syntax.SyntaxFile;
import org.spanloom.language.text.Span;

/**
 * The names that the bodies of a file declare, by the tree alone. The bodies of systems are looked
 * into when they are asked for.
 */
final class NameScopes {

  private final NameScope file;
  private final Map<SystemStatement, NameScope> systems = new IdentityHashMap<>();

  NameScopes(SyntaxFile file) {
    this.file = new NameScope(Optional.empty(), symbols(file.statements(), Optional.empty()));
  }

  /** Returns the names of the file. */
  NameScope file() {
    return file;
  }

  /** Returns the names of a system. */
  NameScope of(SystemStatement system) {
    return systems.computeIfAbsent(
        system,
        s ->
            new NameScope(
                Optional.of(file),
                symbols(
                    s.body(),
                    s.over()
                        .filter(o -> !o.name().text().isEmpty())
                        .map(o ->
                            symbol(
                                SymbolKind.TIME,
                                o.name(),
                                new Declared(o.name().span(), 0, o.span(), ""))))));
  }

  private static List<Symbol> symbols(List<Statement> body, Optional<Symbol> first) {
    Map<String, Symbol> symbols = new LinkedHashMap<>();
    first.ifPresent(s -> add(symbols, s));
    for (Statement statement : body) {
      switch (statement) {
        case UnreadStatement unread ->
            unread
                .declares()
                .ifPresent(n -> add(symbols, symbol(kind(unread.word()), n, unread.span())));
        case LaterStatement later ->
            later
                .declares()
                .ifPresent(n -> add(symbols, symbol(SymbolKind.UNREAD, n, later.span())));
        case Declaration declaration -> add(symbols, symbol(declaration));
        default -> {}
      }
    }
    return new ArrayList<>(symbols.values());
  }

  /** A name declared again is the same symbol; what it is, its first declaration says. */
  private static void add(Map<String, Symbol> symbols, Symbol symbol) {
    if (symbol.name().isEmpty()) {
      return;
    }
    symbols.merge(
        symbol.kind().room() + " " + symbol.name(),
        symbol,
        (old, more) -> {
          List<Declared> both = new ArrayList<>(old.declarations());
          both.addAll(more.declarations());
          return new Symbol(old.kind(), old.name(), both);
        });
  }

  private static Symbol symbol(Declaration declaration) {
    int primes = declaration instanceof StateStatement state ? state.primes() : 0;
    return symbol(
        kind(declaration),
        declaration.name(),
        new Declared(
            declaration.name().span(), primes, declaration.span(), declaration.documentation()));
  }

  private static Symbol symbol(SymbolKind kind, Name name, Span statement) {
    return symbol(kind, name, new Declared(name.span(), 0, statement, ""));
  }

  private static Symbol symbol(SymbolKind kind, Name name, Declared declared) {
    return new Symbol(kind, name.text(), List.of(declared));
  }

  private static SymbolKind kind(Declaration declaration) {
    return switch (declaration) {
      case SystemStatement s -> SymbolKind.SYSTEM;
      case ParameterStatement s -> SymbolKind.PARAMETER;
      case LetStatement s -> SymbolKind.LET;
      case InputStatement s -> SymbolKind.INPUT;
      case StateStatement s -> SymbolKind.STATE;
      case MatrixStatement s -> SymbolKind.MATRIX;
      case OutputStatement s -> SymbolKind.OUTPUT;
      case InitialValuesStatement s -> SymbolKind.INITIAL_VALUES;
      case BoundaryStatement s -> SymbolKind.BOUNDARY;
      case BasisStatement s -> SymbolKind.BASIS;
    };
  }

  /** Returns what a statement that could not be read would have declared. */
  private static SymbolKind kind(String word) {
    return switch (word) {
      case "system" -> SymbolKind.SYSTEM;
      case "parameter" -> SymbolKind.PARAMETER;
      case "let" -> SymbolKind.LET;
      case "input" -> SymbolKind.INPUT;
      case "state" -> SymbolKind.STATE;
      case "matrix" -> SymbolKind.MATRIX;
      case "output" -> SymbolKind.OUTPUT;
      case "initial" -> SymbolKind.INITIAL_VALUES;
      case "boundary" -> SymbolKind.BOUNDARY;
      case "basis" -> SymbolKind.BASIS;
      default -> SymbolKind.UNREAD;
    };
  }
}
