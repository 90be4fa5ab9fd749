/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.editing;

import java.util.List;
import java.util.Optional;
import org.spanloom.language.syntax.Lexer;
import org.spanloom.language.syntax.Name;
import org.spanloom.language.syntax.OverClause;
import org.spanloom.language.syntax.Statement;
import org.spanloom.language.syntax.Statement.BasisStatement;
import org.spanloom.language.syntax.Statement.BoundaryStatement;
import org.spanloom.language.syntax.Statement.Declaration;
import org.spanloom.language.syntax.Statement.InitialValuesStatement;
import org.spanloom.language.syntax.Statement.StateStatement;
import org.spanloom.language.syntax.Statement.SystemStatement;
import org.spanloom.language.syntax.SyntaxFile;
import org.spanloom.language.syntax.Token;
import org.spanloom.language.syntax.TokenKind;
import org.spanloom.language.text.SourceText;
import org.spanloom.language.text.Span;

/**
 * The word under a caret and what it may name.
 *
 * @param token the word, or the unit
 * @param text its text
 * @param primes primes behind it
 * @param previous the word before it on the line, empty if something else stands there
 * @param twoBefore the token before that, as text; empty if there is none
 */
record Word(Token token, String text, int primes, String previous, String twoBefore) {

  /** Returns the word at an offset; a caret directly behind a word is at it. */
  static Optional<Word> at(SourceText source, int offset) {
    String content = source.content();
    if (offset < 0 || offset > content.length()) {
      return Optional.empty();
    }
    int lineStart = source.lineSpan(source.line(offset)).start();
    List<Token> tokens = Lexer.lexLine(content, lineStart);
    int found = -1;
    for (int i = 0; i < tokens.size(); i++) {
      Token token = tokens.get(i);
      boolean wanted = token.kind().isWord() || token.kind() == TokenKind.UNIT;
      if (wanted && token.span().touches(offset)) {
        found = i;
        if (offset < token.end()) {
          break;
        }
      }
      boolean primes = token.kind() == TokenKind.PRIMES && token.span().touches(offset) && i > 0;
      if (primes && tokens.get(i - 1).kind().isName()) {
        found = i - 1;
      }
    }
    return found < 0 ? Optional.empty() : Optional.of(word(content, tokens, found));
  }

  private static Word word(String content, List<Token> tokens, int i) {
    Token token = tokens.get(i);
    boolean primed = i + 1 < tokens.size() && tokens.get(i + 1).kind() == TokenKind.PRIMES;
    return new Word(
        token,
        content.substring(token.start(), token.end()),
        primed ? tokens.get(i + 1).span().length() : 0,
        text(content, tokens, i - 1),
        text(content, tokens, i - 2));
  }

  private static String text(String content, List<Token> tokens, int i) {
    return i < 0 ? "" : content.substring(tokens.get(i).start(), tokens.get(i).end());
  }

  /** Returns the word with its primes. */
  Span span() {
    return new Span(token.start(), token.end() + primes);
  }

  /** Returns the system around an offset. */
  static Optional<SystemStatement> systemAt(SyntaxFile file, int offset) {
    return file.statements().stream()
        .filter(SystemStatement.class::isInstance)
        .map(SystemStatement.class::cast)
        .filter(s -> s.span().touches(offset))
        .findFirst();
  }

  /** Returns the independent variable of the system around the word, if the word names it. */
  Optional<OverClause> time(SyntaxFile file) {
    return systemAt(file, token.start())
        .flatMap(SystemStatement::over)
        .filter(over -> primes == 0 && over.name().text().equals(text));
  }

  /** Returns the statement that declares what the word names, found by the tree alone. */
  Optional<Declaration> declaration(SyntaxFile file) {
    Optional<SystemStatement> system = systemAt(file, token.start());
    Optional<Declaration> inside = system.flatMap(s -> declaration(s.body()));
    return inside.or(() -> declaration(file.statements()));
  }

  /**
   * Bases, sets of initial values and boundary conditions have names of their own kind, which stand
   * at certain places only.
   */
  private Optional<Declaration> declaration(List<Statement> statements) {
    boolean wantsBasis = previous.equals("basis") || twoBefore.equals("condition");
    boolean wantsBoundary = previous.equals("boundary");
    boolean wantsValues = previous.equals("under") || previous.equals("values");
    Optional<Declaration> state = Optional.empty();
    for (Statement statement : statements) {
      if (!(statement instanceof Declaration declaration)
          || !declaration.name().text().equals(text)
          || wantsBasis != declaration instanceof BasisStatement
          || wantsBoundary != declaration instanceof BoundaryStatement
          || wantsValues != declaration instanceof InitialValuesStatement) {
        continue;
      }
      boolean samePrimes = !(declaration instanceof StateStatement s) || s.primes() == primes;
      if (samePrimes) {
        return Optional.of(declaration);
      }
      if (((StateStatement) declaration).primes() == 0) {
        state = Optional.of(declaration);
      }
    }
    return state;
  }

  /** Returns the place of the name in a declaration, with its primes. */
  static Span nameSpan(Declaration declaration) {
    Name name = declaration.name();
    int behind = declaration instanceof StateStatement state ? state.primes() : 0;
    return new Span(name.span().start(), name.span().end() + behind);
  }
}
