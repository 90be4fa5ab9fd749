/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.BooleanSupplier;
import org.spanloom.language.files.FileKey;
import org.spanloom.language.problem.Fix;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.syntax.Parser;
import org.spanloom.language.syntax.Statement.ImportStatement;
import org.spanloom.language.syntax.SyntaxFile;
import org.spanloom.language.text.SourceText;
import org.spanloom.language.text.Span;

/** The model files that take part in one model: the one being read and those it imports. */
final class Library {

  /** Longest chain of files that import each other; bounds the depth of the work. */
  private static final int DEPTH_LIMIT = 50;

  private final FileAccess files;
  private final BooleanSupplier cancelled;
  private final PartBudget budget = new PartBudget();
  private final MatrixBudget matrices = new MatrixBudget();
  private final RepetitionBudget repetition = new RepetitionBudget();
  private final TableBudget tables = new TableBudget();
  private final Map<FileKey, FileReading> done = new HashMap<>();
  private final List<FileReading> inOrder = new ArrayList<>();
  private final List<FileReading> open = new ArrayList<>();
  private final Map<Frame, FileReading> byFrame = new IdentityHashMap<>();

  Library(FileAccess files, BooleanSupplier cancelled) {
    this.files = files;
    this.cancelled = cancelled;
  }

  FileAccess files() {
    return files;
  }

  BooleanSupplier cancelled() {
    return cancelled;
  }

  PartBudget budget() {
    return budget;
  }

  MatrixBudget matrices() {
    return matrices;
  }

  RepetitionBudget repetition() {
    return repetition;
  }

  TableBudget tables() {
    return tables;
  }

  /** Returns the imported files that were read, each after those it imports itself. */
  List<FileReading> imported() {
    return inOrder;
  }

  /** Returns the reading of a file from its frame. */
  FileReading reading(Frame file) {
    return byFrame.get(file);
  }

  /** Reads the names of the file whose model is asked for. */
  FileReading read(SyntaxFile syntax) {
    FileReading file = new FileReading(this, syntax, files.self(), Optional.empty(), "");
    declare(file);
    return file;
  }

  private void declare(FileReading file) {
    byFrame.put(file.frame(), file);
    open.add(file);
    file.declare();
    open.removeLast();
  }

  /** Returns the reading of a file that another one imports; reports why there is none. */
  Optional<FileReading> read(FileReading from, ImportStatement statement, FileAccess.Found found) {
    ModelReader.check(cancelled);
    FileReading known = done.get(found.key());
    if (known != null) {
      return Optional.of(known);
    }
    if (open.size() > DEPTH_LIMIT) {
      from.found()
          .report(
              ProblemKind.IMPORT_TOO_DEEP,
              statement.path().span(),
              "Files import each other in a chain of more than "
                  + DEPTH_LIMIT
                  + ": import this one from fewer steps away.");
      return Optional.empty();
    }
    // What an imported file imports is not seen by the file being read, and its names get those of
    // the file in front so that they differ from others.
    boolean direct = from.place().isEmpty();
    String path = found.key().path();
    String prefix = direct ? "" : path.substring(0, Math.max(0, path.lastIndexOf('.'))) + ".";
    Span place = from.place().orElse(statement.path().span());
    SyntaxFile syntax = Parser.parse(new SourceText(path, found.text()));
    FileReading file = new FileReading(this, syntax, found.key(), Optional.of(place), prefix);
    declare(file);
    file.readSystems();
    done.put(found.key(), file);
    inOrder.add(file);
    return Optional.of(file);
  }

  /** Tells whether a file is one of those whose imports are being read. */
  boolean isOpen(FileKey key) {
    return open.stream().anyMatch(file -> file.key().equals(key));
  }

  /** Reports an import of a file that is being read. */
  void reportCircle(FileReading from, ImportStatement statement, FileKey first) {
    List<String> names = new ArrayList<>();
    open.stream()
        .map(file -> file.key())
        .dropWhile(key -> !key.equals(first))
        .forEach(key -> names.add(key.path()));
    names.add(first.path());
    from.found()
        .report(
            ProblemKind.IMPORT_CYCLE,
            statement.path().span(),
            names.size() == 2
                ? "This file imports itself: remove the line."
                : "These files import each other in a circle: "
                    + String.join(" -> ", names)
                    + ". Move what both need into a file of its own.",
            names.size() == 2
                ? new Fix[] {Fix.replace("Remove the line", statement.span(), "")}
                : new Fix[0]);
  }
}
