/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.editing;

import java.util.Collection;
import java.util.EnumMap;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.spanloom.language.model.Function;
import org.spanloom.language.model.MatrixFunction;
import org.spanloom.language.model.NamedConstant;
import org.spanloom.language.model.PulseTrain;

/** The names of one body and, around them, those of the bodies that hold it. */
final class NameScope {

  private static final Map<String, Symbol> BUILT_IN = builtIn();

  private final Optional<NameScope> outer;
  private final Map<SymbolKind.Room, Map<String, Symbol>> rooms =
      new EnumMap<>(SymbolKind.Room.class);

  NameScope(Optional<NameScope> outer, Collection<Symbol> symbols) {
    this.outer = outer;
    for (Symbol symbol : symbols) {
      rooms
          .computeIfAbsent(symbol.kind().room(), r -> new LinkedHashMap<>())
          .putIfAbsent(symbol.name(), symbol);
    }
  }

  /** Returns what a name stands for here, built-in ones included. */
  Optional<Symbol> find(SymbolKind.Room room, String name) {
    Optional<Symbol> own = own(room, name);
    if (own.isPresent()) {
      return own;
    }
    if (outer.isPresent()) {
      return outer.get().find(room, name);
    }
    return room == SymbolKind.Room.VALUES ? builtIn(name) : Optional.empty();
  }

  /** Returns what a name of this very body stands for. */
  Optional<Symbol> own(SymbolKind.Room room, String name) {
    return Optional.ofNullable(rooms.getOrDefault(room, Map.of()).get(name));
  }

  /** Returns the function or constant of a name. */
  static Optional<Symbol> builtIn(String name) {
    return Optional.ofNullable(BUILT_IN.get(name));
  }

  private static Map<String, Symbol> builtIn() {
    Map<String, Symbol> symbols = new HashMap<>();
    for (Function function : Function.values()) {
      symbols.put(function.code(), builtIn(SymbolKind.FUNCTION, function.code()));
    }
    for (MatrixFunction function : MatrixFunction.values()) {
      symbols.put(function.code(), builtIn(SymbolKind.FUNCTION, function.code()));
    }
    for (NamedConstant constant : NamedConstant.values()) {
      symbols.put(constant.code(), builtIn(SymbolKind.CONSTANT, constant.code()));
    }
    symbols.put(PulseTrain.NAME, builtIn(SymbolKind.FUNCTION, PulseTrain.NAME));
    return symbols;
  }

  private static Symbol builtIn(SymbolKind kind, String code) {
    return new Symbol(kind, code, List.of());
  }
}
