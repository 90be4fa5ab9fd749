/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;
import org.spanloom.language.files.FileKey;
import org.spanloom.language.model.Meaning.BrokenMeaning;
import org.spanloom.language.model.PartReader.PartProblems;
import org.spanloom.language.problem.Fix;
import org.spanloom.language.problem.Problem;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.problem.Severity;
import org.spanloom.language.syntax.Name;
import org.spanloom.language.syntax.Statement;
import org.spanloom.language.syntax.Statement.Declaration;
import org.spanloom.language.syntax.Statement.ImportStatement;
import org.spanloom.language.syntax.Statement.LetStatement;
import org.spanloom.language.syntax.Statement.MatrixStatement;
import org.spanloom.language.syntax.Statement.ParameterStatement;
import org.spanloom.language.syntax.Statement.SystemStatement;
import org.spanloom.language.syntax.Statement.UnreadStatement;
import org.spanloom.language.syntax.SyntaxFile;
import org.spanloom.language.text.Span;

/** Gives the names of one file their meaning, and its systems theirs. */
final class FileReading {

  private final Library library;
  private final SyntaxFile syntax;
  private final Optional<Span> place;
  private final Problems problems = new Problems();
  private final Map<String, SystemType> systems = new LinkedHashMap<>();
  private final Map<String, Imported> imported = new HashMap<>();
  private final List<PartProblems> parts = new ArrayList<>();
  private final List<ImportedFile> imports = new ArrayList<>();
  private final Frame frame;

  /** Where a name comes from that another file declares. */
  private record Imported(FileReading file, Span span) {
    String shown() {
      return "\"" + file.key().path() + "\" (line " + file.syntax.source().line(span.start()) + ")";
    }
  }

  /**
   * Prepares to read a file.
   *
   * @param place the import in the file being read that leads to this one; empty for itself
   * @param prefix what stands before its names where the file being read does not see them
   */
  FileReading(
      Library library, SyntaxFile syntax, FileKey key, Optional<Span> place, String prefix) {
    this.library = library;
    this.syntax = syntax;
    this.place = place;
    this.frame =
        new Frame(
            new SourceFile(
                key,
                syntax.source(),
                systems,
                library.files(),
                library.matrices(),
                library.repetition(),
                library.tables()),
            syntax.statements(),
            new Scope(Optional.empty()),
            problems,
            prefix,
            place,
            Map.of());
  }

  FileKey key() {
    return frame.file().key();
  }

  Frame frame() {
    return frame;
  }

  SyntaxFile syntax() {
    return syntax;
  }

  /** Returns the import in the file being read that leads to this one; empty for itself. */
  Optional<Span> place() {
    return place;
  }

  /** Gives everything outside of systems a meaning, that of imported files first. */
  void declare() {
    Declarations globals = frame.declarations();
    readImports();
    for (Statement statement : syntax.statements()) {
      switch (statement) {
        case ImportStatement read -> {}
        case ParameterStatement parameter -> collect(globals, parameter);
        case LetStatement let -> collect(globals, let);
        case MatrixStatement matrix -> collect(globals, matrix);
        case SystemStatement system -> declare(system);
        case UnreadStatement unread -> unread.declares().ifPresent(this::broken);
        default -> misplaced(statement);
      }
    }
    Declarations.read(List.of(frame));
  }

  private void collect(Declarations globals, Declaration declaration) {
    reportImported(declaration.name());
    globals.collect(declaration);
  }

  private void reportImported(Name name) {
    Imported other = imported.get(name.text());
    if (other != null) {
      problems.report(
          ProblemKind.NAME_DUPLICATE,
          name.span(),
          "\""
              + name.text()
              + "\" is declared here and in "
              + other.shown()
              + ", which this file imports: rename one of the two.");
    }
  }

  private void declare(SystemStatement system) {
    Name name = system.name();
    if (name.text().isEmpty()) {
      return;
    }
    reportImported(name);
    SystemType earlier = systems.put(name.text(), new SystemType(system, frame));
    if (earlier != null && earlier.file() == frame) {
      systems.put(name.text(), earlier);
      problems.report(
          ProblemKind.NAME_DUPLICATE,
          name.span(),
          "There are two systems named \"" + name.text() + "\": rename one of them.");
    }
  }

  private void readImports() {
    Set<FileKey> seen = new HashSet<>();
    for (Statement statement : syntax.statements()) {
      if (statement instanceof ImportStatement read) {
        read(read, seen);
      }
    }
  }

  private void read(ImportStatement read, Set<FileKey> seen) {
    if (key().resolve(read.path().text()) instanceof FileKey.Resolved.Inside(FileKey other)) {
      if (!seen.add(other)) {
        problems.report(
            ProblemKind.NAME_DUPLICATE,
            read.span(),
            "The file \"" + other.path() + "\" is imported twice: remove one of the two lines.",
            Fix.replace("Remove the line", read.span(), ""));
        return;
      }
      if (library.isOpen(other)) {
        library.reportCircle(this, read, other);
        frame.scope().open();
        return;
      }
    }
    Optional<FileReading> other =
        frame.text(read.path()).flatMap(found -> library.read(this, read, found));
    other.ifPresentOrElse(file -> bring(file, read), () -> frame.scope().open());
  }

  /** Brings the names that another file declares itself. */
  private void bring(FileReading other, ImportStatement read) {
    imports.add(new ImportedFile(other.key(), other.syntax));
    for (Statement statement : other.syntax.statements()) {
      if (statement instanceof Declaration declaration && isFree(declaration.name(), other, read)) {
        String name = declaration.name().text();
        SystemType system = other.systems.get(name);
        if (declaration instanceof SystemStatement && system != null) {
          systems.put(name, system);
        } else {
          other.frame.scope().own(name).ifPresent(m -> frame.scope().define(name, m));
        }
      }
    }
    other.reportTo(this, read);
  }

  private boolean isFree(Name name, FileReading other, ImportStatement read) {
    Imported here = new Imported(other, name.span());
    Imported earlier = imported.putIfAbsent(name.text(), here);
    if (earlier != null && earlier.file != other) {
      problems.report(
          ProblemKind.NAME_DUPLICATE,
          read.path().span(),
          "\""
              + name.text()
              + "\" is declared in "
              + earlier.shown()
              + " and in "
              + here.shown()
              + ", and this file imports both: rename one of the two.");
    }
    return earlier == null;
  }

  /** Reports to a file that imports this one that this one has errors. */
  private void reportTo(FileReading importing, ImportStatement read) {
    List<Problem> errors =
        problems.inTextOrder(syntax.problems()).stream()
            .filter(p -> p.severity() == Severity.ERROR)
            .toList();
    if (!errors.isEmpty()) {
      importing.frame.scope().open();
      int line = syntax.source().line(errors.getFirst().span().start());
      int more = errors.size() - 1;
      importing.problems.report(
          ProblemKind.IMPORT_BROKEN,
          read.path().span(),
          "The file \""
              + key().path()
              + "\" has an error in line "
              + line
              + ": "
              + errors.getFirst().message()
              + (more == 0
                  ? ""
                  : more == 1 ? " There is one more." : " There are " + more + " more."));
    }
  }

  private void broken(Name name) {
    frame.scope().define(name.text(), new BrokenMeaning(name.span()));
  }

  private void misplaced(Statement statement) {
    problems.report(
        ProblemKind.STATEMENT_MISPLACED,
        statement.span(),
        "Only imports, parameters, named expressions and matrices stand outside of systems: move"
            + " this line into a system.");
  }

  /** Gives the systems of the file their meaning. */
  List<SystemModel> readSystems() {
    List<SystemModel> models = new ArrayList<>();
    for (Statement statement : syntax.statements()) {
      if (statement instanceof SystemStatement system) {
        SystemReader reader = new SystemReader(system, this, library);
        models.add(reader.read());
        parts.addAll(reader.parts());
      }
    }
    reportParts();
    reportUnused();
    return models;
  }

  /**
   * Reports what is wrong with parts and not with the systems that they are copies of, one problem
   * for each part.
   */
  private void reportParts() {
    Map<FileReading, Set<Sort>> known = new HashMap<>();
    Set<Span> reported = new HashSet<>();
    for (PartProblems part : parts) {
      FileReading file = library.reading(part.type().file());
      if (reported.contains(part.place()) || file.problems.isFull()) {
        continue;
      }
      Set<Sort> there = known.computeIfAbsent(file, FileReading::sorts);
      part.found().inTextOrder(List.of()).stream()
          .filter(p -> p.severity() == Severity.ERROR && !there.contains(Sort.of(p)))
          .findFirst()
          .ifPresent(p -> {
            reported.add(part.place());
            problems.report(
                p.kind(), part.place(), "In the part \"" + part.part() + "\": " + p.message());
          });
    }
  }

  /** What tells problems of one text apart. */
  private record Sort(ProblemKind kind, Span span) {
    static Sort of(Problem problem) {
      return new Sort(problem.kind(), problem.span());
    }
  }

  private Set<Sort> sorts() {
    return problems.inTextOrder(List.of()).stream().map(Sort::of).collect(Collectors.toSet());
  }

  private void reportUnused() {
    boolean complete = syntax.statements().stream().noneMatch(UnreadStatement.class::isInstance);
    boolean holdsSystems = syntax.statements().stream().anyMatch(SystemStatement.class::isInstance);
    if (complete && holdsSystems) {
      frame.declarations().reportUnused();
    }
  }

  /** Returns what is wrong with the file, in the order of the text. */
  List<Problem> problems() {
    return problems.inTextOrder(syntax.problems());
  }

  /** Returns the files that its own imports name and that could be read. */
  List<ImportedFile> imports() {
    return imports;
  }

  /** Takes what is wrong with the statements of the file. */
  Problems found() {
    return problems;
  }
}
