/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.editing;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Optional;
import org.spanloom.language.files.FileKey;
import org.spanloom.language.syntax.Statement;
import org.spanloom.language.syntax.Statement.SystemStatement;
import org.spanloom.language.syntax.SyntaxFile;

/**
 * What the names in a file stand for, found by its tree alone, so that texts with errors have
 * answers too. Everything that follows a name - definition, hover, references, rename - asks here.
 * A question about one place looks at the statement around it only.
 */
public final class Names {

  private final SyntaxFile file;
  private final NameScopes scopes;

  Names(SyntaxFile file, NameScopes scopes) {
    this.file = file;
    this.scopes = scopes;
  }

  /** Returns the names of a file by itself: what it imports is not known. */
  public static Names of(SyntaxFile file) {
    return new Names(file, new NameScopes(FileKey.NONE, file));
  }

  /** Returns the file. */
  SyntaxFile file() {
    return file;
  }

  /** Returns every name that stands for something, in the order of the text. */
  public List<Occurrence> occurrences() {
    return binder().bind(scopes.file(), file.statements());
  }

  /** Returns the places where something is named, its declarations included. */
  public List<Occurrence> of(Symbol symbol) {
    return occurrences().stream().filter(o -> o.symbol().equals(symbol)).toList();
  }

  /**
   * Returns the name at an offset; a caret directly behind a name, or behind its primes, is at it.
   * The role of a derivative in an equation is found by {@link #occurrences} only.
   */
  public Optional<Occurrence> at(int offset) {
    List<Occurrence> found = new ArrayList<>();
    for (Statement outer : around(file.statements(), offset)) {
      if (outer instanceof SystemStatement system) {
        found.addAll(binder().bindHeader(system));
        found.addAll(binder().bind(scopes.of(system), around(system.body(), offset)));
      } else {
        found.addAll(binder().bind(scopes.file(), List.of(outer)));
      }
    }
    return found.stream().filter(o -> o.label().touches(offset)).reduce((a, b) -> b);
  }

  private NameBinder binder() {
    return new NameBinder(file.source(), scopes);
  }

  /** Returns the system around an offset. */
  Optional<SystemStatement> systemAt(int offset) {
    return around(file.statements(), offset).stream()
        .filter(SystemStatement.class::isInstance)
        .map(SystemStatement.class::cast)
        .findFirst();
  }

  /**
   * Returns what has a name in a body in which a symbol can be used: declared beside it, around it
   * or inside of a body around which it stands.
   */
  List<Symbol> sharingScope(Symbol symbol, String name) {
    SymbolKind.Room room = symbol.kind().room();
    boolean ofFile = scopes.file().find(room, symbol.name()).filter(symbol::equals).isPresent();
    List<Symbol> sharing = new ArrayList<>();
    if (ofFile || symbol.file().equals(scopes.key())) {
      scopes.file().find(room, name).filter(s -> !s.kind().isBuiltIn()).ifPresent(sharing::add);
    }
    for (Statement statement : file.statements()) {
      if (statement instanceof SystemStatement system) {
        NameScope scope = scopes.of(system);
        if (ofFile || scope.own(room, symbol.name()).filter(symbol::equals).isPresent()) {
          scope.own(room, name).ifPresent(sharing::add);
        }
      }
    }
    return sharing;
  }

  /** Returns the statements, one or two, that touch an offset; statements are in text order. */
  private static List<Statement> around(List<Statement> statements, int offset) {
    int low = 0;
    int high = statements.size();
    while (low < high) {
      int middle = (low + high) >>> 1;
      boolean before = statements.get(middle).span().end() < offset;
      low = before ? middle + 1 : low;
      high = before ? high : middle;
    }
    List<Statement> around = new ArrayList<>();
    while (low < statements.size() && statements.get(low).span().start() <= offset) {
      around.add(statements.get(low++));
    }
    return Collections.unmodifiableList(around);
  }
}
