/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.editing;

import java.util.List;
import java.util.Optional;
import org.spanloom.language.files.FileKey;
import org.spanloom.language.text.Span;

/**
 * Something that has a name.
 *
 * @param file the file that declares it; {@link FileKey#NONE} for what no other file sees
 * @param kind what it is
 * @param name its name, without primes
 * @param declarations where it is declared, in the order of the text: a state may have one for each
 *     of its derivatives, a name declared twice has two, a built-in one has none
 */
public record Symbol(FileKey file, SymbolKind kind, String name, List<Declared> declarations) {

  /**
   * One declaration of a name.
   *
   * @param name the place of the name, without primes
   * @param primes how many primes stand behind it
   * @param statement the whole statement
   * @param documentation documentation comments, empty if none
   */
  public record Declared(Span name, int primes, Span statement, String documentation) {
    /** Returns the place of the name with its primes. */
    public Span label() {
      return new Span(name.start(), name.end() + primes);
    }
  }

  /** Copies the list. */
  public Symbol {
    declarations = List.copyOf(declarations);
  }

  /** Makes a symbol that no other file can see: a built-in one, or an index. */
  Symbol(SymbolKind kind, String name, List<Declared> declarations) {
    this(FileKey.NONE, kind, name, declarations);
  }

  /**
   * Returns the declaration of a derivative, or of the name itself where that derivative has none.
   */
  public Optional<Declared> declaration(int primes) {
    return with(primes).or(() -> with(0)).or(() -> declarations.stream().findFirst());
  }

  private Optional<Declared> with(int primes) {
    return declarations.stream().filter(d -> d.primes() == primes).findFirst();
  }
}
