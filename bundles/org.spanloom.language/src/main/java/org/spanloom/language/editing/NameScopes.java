/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.editing;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.IdentityHashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.spanloom.language.editing.Symbol.Declared;
import org.spanloom.language.files.FileKey;
import org.spanloom.language.syntax.Name;
import org.spanloom.language.syntax.Statement;
import org.spanloom.language.syntax.Statement.BasisStatement;
import org.spanloom.language.syntax.Statement.BoundaryStatement;
import org.spanloom.language.syntax.Statement.Declaration;
import org.spanloom.language.syntax.Statement.InitialValuesStatement;
import org.spanloom.language.syntax.Statement.InputStatement;
import org.spanloom.language.syntax.Statement.LetStatement;
import org.spanloom.language.syntax.Statement.MatrixStatement;
import org.spanloom.language.syntax.Statement.OutputStatement;
import org.spanloom.language.syntax.Statement.ParameterStatement;
import org.spanloom.language.syntax.Statement.PartStatement;
import org.spanloom.language.syntax.Statement.StateStatement;
import org.spanloom.language.syntax.Statement.SystemStatement;
import org.spanloom.language.syntax.Statement.TableStatement;
import org.spanloom.language.syntax.Statement.UnreadStatement;
import org.spanloom.language.syntax.SyntaxFile;
import org.spanloom.language.text.Span;

/**
 * The names that the bodies of a file declare, by the tree alone. The bodies of systems are looked
 * into when they are asked for.
 */
final class NameScopes {

  /** Through how many files, one importing the other, the type of a part is followed. */
  private static final int DEPTH_LIMIT = 4;

  /** Names of different rooms are different names. */
  private record Key(SymbolKind.Room room, String name) {}

  private final FileKey key;
  private final List<Symbol> declared;
  private NameScope file;
  private List<NameScopes> imported = List.of();
  private final Map<Symbol, String> partTypes = new IdentityHashMap<>();
  private final Map<String, SystemStatement> types = new HashMap<>();
  private final Map<SystemStatement, NameScope> systems = new IdentityHashMap<>();

  NameScopes(FileKey key, SyntaxFile file) {
    this.key = key;
    for (Statement statement : file.statements()) {
      if (statement instanceof SystemStatement system) {
        types.putIfAbsent(system.name().text(), system);
      }
    }
    this.declared = symbols(file.statements(), Optional.empty());
    this.file = new NameScope(Optional.empty(), declared);
  }

  /** Puts what other files declare around the names of this one; before anything is asked. */
  void importing(List<NameScopes> others) {
    imported = List.copyOf(others);
    List<Symbol> symbols = others.stream().flatMap(o -> o.declared.stream()).toList();
    file = new NameScope(Optional.of(new NameScope(Optional.empty(), symbols)), declared);
  }

  FileKey key() {
    return key;
  }

  /** Returns the names of the file. */
  NameScope file() {
    return file;
  }

  /** Returns the names of a system that can be a part here; empty where there is none. */
  Optional<NameScope> named(String system) {
    return own(system).or(() -> imported.stream().flatMap(i -> i.own(system).stream()).findFirst());
  }

  private Optional<NameScope> own(String system) {
    return Optional.ofNullable(types.get(system)).map(this::of);
  }

  /** Returns the names in a part; empty where nobody knows its system. */
  Optional<NameScope> inPart(Symbol part) {
    String type = partTypes.get(part);
    return type == null
        ? imported.stream().flatMap(i -> i.inPart(part, 1).stream()).findFirst()
        : named(type);
  }

  /** Looks for a part of a system of an imported file; files may import each other in a circle. */
  private Optional<NameScope> inPart(Symbol part, int depth) {
    String type = partTypes.get(part);
    if (type != null) {
      return named(type);
    }
    return depth == DEPTH_LIMIT
        ? Optional.empty()
        : imported.stream().flatMap(i -> i.inPart(part, depth + 1).stream()).findFirst();
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

  private List<Symbol> symbols(List<Statement> body, Optional<Symbol> first) {
    Map<Key, List<Symbol>> symbols = new LinkedHashMap<>();
    first.ifPresent(s -> add(symbols, s));
    for (Statement statement : body) {
      switch (statement) {
        case UnreadStatement unread ->
            unread
                .declares()
                .ifPresent(n -> add(symbols, symbol(kind(unread.word()), n, unread.span())));
        case Declaration declaration -> add(symbols, symbol(declaration));
        default -> {}
      }
    }
    Map<Key, Symbol> found = new LinkedHashMap<>();
    symbols.forEach((key, declared) -> found.put(key, one(declared)));
    for (Statement statement : body) {
      if (statement instanceof PartStatement part) {
        Symbol symbol = found.get(new Key(SymbolKind.PART.room(), part.name().text()));
        if (symbol != null && symbol.kind() == SymbolKind.PART) {
          partTypes.putIfAbsent(symbol, part.system().text());
        }
      }
    }
    return new ArrayList<>(found.values());
  }

  private static void add(Map<Key, List<Symbol>> symbols, Symbol symbol) {
    if (!symbol.name().isEmpty()) {
      symbols
          .computeIfAbsent(new Key(symbol.kind().room(), symbol.name()), key -> new ArrayList<>())
          .add(symbol);
    }
  }

  /** A name declared again is the same symbol; what it is, its first declaration says. */
  private static Symbol one(List<Symbol> declared) {
    Symbol first = declared.getFirst();
    return declared.size() == 1
        ? first
        : new Symbol(
            first.file(),
            first.kind(),
            first.name(),
            declared.stream().flatMap(s -> s.declarations().stream()).toList());
  }

  private Symbol symbol(Declaration declaration) {
    int primes = declaration instanceof StateStatement state ? state.primes() : 0;
    return symbol(
        kind(declaration),
        declaration.name(),
        new Declared(
            declaration.name().span(), primes, declaration.span(), declaration.documentation()));
  }

  private Symbol symbol(SymbolKind kind, Name name, Span statement) {
    return symbol(kind, name, new Declared(name.span(), 0, statement, ""));
  }

  private Symbol symbol(SymbolKind kind, Name name, Declared declared) {
    return new Symbol(key, kind, name.text(), List.of(declared));
  }

  private static SymbolKind kind(Declaration declaration) {
    return switch (declaration) {
      case SystemStatement s -> SymbolKind.SYSTEM;
      case ParameterStatement s -> SymbolKind.PARAMETER;
      case LetStatement s -> SymbolKind.LET;
      case InputStatement s -> SymbolKind.INPUT;
      case StateStatement s -> SymbolKind.STATE;
      case MatrixStatement s -> SymbolKind.MATRIX;
      case PartStatement s -> SymbolKind.PART;
      case TableStatement s -> SymbolKind.TABLE;
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
      case "part" -> SymbolKind.PART;
      case "table" -> SymbolKind.TABLE;
      case "output" -> SymbolKind.OUTPUT;
      case "initial" -> SymbolKind.INITIAL_VALUES;
      case "boundary" -> SymbolKind.BOUNDARY;
      case "basis" -> SymbolKind.BASIS;
      default -> SymbolKind.UNREAD;
    };
  }
}
