/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.editing;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;
import org.spanloom.language.files.FileKey;
import org.spanloom.language.model.ImportedFile;
import org.spanloom.language.model.Model;
import org.spanloom.language.syntax.Lexer;
import org.spanloom.language.syntax.Statement;
import org.spanloom.language.syntax.Statement.Declaration;
import org.spanloom.language.syntax.Statement.PartStatement;
import org.spanloom.language.syntax.Statement.SystemStatement;
import org.spanloom.language.syntax.SyntaxFile;
import org.spanloom.language.syntax.Token;
import org.spanloom.language.syntax.TokenKind;
import org.spanloom.language.text.SourceText;
import org.spanloom.language.text.Span;

/** What parts and imports bring into a file, by the trees alone. */
final class PartNames {

  private final Model model;

  /**
   * A declaration and the file it stands in.
   *
   * @param file the key of an imported file; that of no file for the model's own
   */
  record Found(FileKey file, SyntaxFile syntax, Declaration declaration) {}

  PartNames(Model model) {
    this.model = model;
  }

  /** Returns the systems that a part can be a copy of, those of this file first. */
  List<SystemStatement> systems() {
    return files()
        .flatMap(file -> file.syntax().statements().stream())
        .filter(SystemStatement.class::isInstance)
        .map(SystemStatement.class::cast)
        .toList();
  }

  /** Returns what the imported files declare outside of systems. */
  List<Declaration> importedGlobals() {
    return model.imports().stream()
        .flatMap(file -> file.syntax().statements().stream())
        .filter(s -> s instanceof Declaration && !(s instanceof SystemStatement))
        .map(Declaration.class::cast)
        .toList();
  }

  private Stream<ImportedFile> files() {
    return Stream.concat(
        Stream.of(new ImportedFile(FileKey.NONE, model.syntax())), model.imports().stream());
  }

  private Optional<Found> system(String name) {
    return files()
        .flatMap(file ->
            declared(file.syntax().statements(), name)
                .filter(SystemStatement.class::isInstance)
                .map(d -> new Found(file.key(), file.syntax(), d))
                .stream())
        .findFirst();
  }

  private static Optional<Declaration> declared(List<Statement> body, String name) {
    return body.stream()
        .filter(Declaration.class::isInstance)
        .map(Declaration.class::cast)
        .filter(d -> d.name().text().equals(name))
        .findFirst();
  }

  /** Returns the system that a part declared in some body is a copy of. */
  private Optional<Found> type(List<Statement> body, String part) {
    return declared(body, part)
        .filter(PartStatement.class::isInstance)
        .flatMap(d -> system(((PartStatement) d).system().text()));
  }

  /** Returns the system behind a path of parts from some body, as in {@code upper.inner}. */
  Optional<Found> inside(List<Statement> body, List<String> path) {
    Optional<Found> found = Optional.empty();
    List<Statement> at = body;
    for (String part : path) {
      found = type(at, part);
      if (found.isEmpty()) {
        return found;
      }
      at = ((SystemStatement) found.get().declaration()).body();
    }
    return found;
  }

  /** Returns the part whose braces stand around an offset. */
  Optional<PartStatement> partAt(int offset) {
    return Names.of(model.syntax()).systemAt(offset).stream()
        .flatMap(s -> s.body().stream())
        .filter(s ->
            s instanceof PartStatement part
                && part.span().touches(offset)
                && offset > part.header().end())
        .map(PartStatement.class::cast)
        .findFirst();
  }

  Optional<Found> type(PartStatement part) {
    return system(part.system().text());
  }

  /** Returns the declaration in an imported file of the name at an offset. */
  Optional<Found> importedAt(int offset) {
    List<Token> path = path(model.source(), offset);
    if (path.isEmpty()) {
      return Optional.empty();
    }
    List<String> words = path.stream().map(t -> model.source().slice(t.span())).toList();
    String last = words.getLast();
    List<Statement> body =
        Names.of(model.syntax()).systemAt(offset).map(SystemStatement::body).orElse(List.of());
    Optional<Found> found =
        words.size() > 1
            ? inside(body, words.subList(0, words.size() - 1)).flatMap(f -> member(f, last))
            : binding(offset, path.getLast().span(), last).or(() -> imported(last));
    return found.filter(f -> !f.file().equals(FileKey.NONE));
  }

  private static Optional<Found> member(Found type, String name) {
    return declared(((SystemStatement) type.declaration()).body(), name)
        .map(d -> new Found(type.file(), type.syntax(), d));
  }

  private Optional<Found> binding(int offset, Span word, String name) {
    return partAt(offset)
        .filter(
            part -> part.bindings().stream().anyMatch(b -> b.target().name().span().equals(word)))
        .flatMap(this::type)
        .flatMap(type -> member(type, name));
  }

  private Optional<Found> imported(String name) {
    return model.imports().stream()
        .flatMap(file ->
            declared(file.syntax().statements(), name)
                .map(d -> new Found(file.key(), file.syntax(), d))
                .stream())
        .findFirst();
  }

  /** Returns the words of a dotted name up to the one at an offset. */
  static List<Token> path(SourceText source, int offset) {
    if (offset < 0 || offset > source.content().length()) {
      return List.of();
    }
    int lineStart = source.lineSpan(source.line(offset)).start();
    List<Token> path = new ArrayList<>();
    int end = -1;
    for (Token token : Lexer.lexLine(source.content(), lineStart)) {
      if (token.start() > offset) {
        break;
      }
      boolean joins = token.start() == end;
      if (token.kind().isName()) {
        if (!joins) {
          path.clear();
        }
        path.add(token);
        if (token.span().touches(offset)) {
          return path;
        }
      } else if (!joins || token.kind() != TokenKind.DOT) {
        path.clear();
      }
      end = token.end();
    }
    return List.of();
  }
}
