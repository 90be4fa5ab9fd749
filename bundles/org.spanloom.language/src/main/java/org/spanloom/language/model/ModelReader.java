/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.concurrent.CancellationException;
import java.util.function.BooleanSupplier;
import org.spanloom.language.files.ProjectFiles;
import org.spanloom.language.model.Meaning.BrokenMeaning;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.syntax.Name;
import org.spanloom.language.syntax.Parser;
import org.spanloom.language.syntax.Statement;
import org.spanloom.language.syntax.Statement.LaterStatement;
import org.spanloom.language.syntax.Statement.LetStatement;
import org.spanloom.language.syntax.Statement.MatrixStatement;
import org.spanloom.language.syntax.Statement.ParameterStatement;
import org.spanloom.language.syntax.Statement.SystemStatement;
import org.spanloom.language.syntax.Statement.UnreadStatement;
import org.spanloom.language.syntax.SyntaxFile;
import org.spanloom.language.text.SourceText;

/**
 * Reads a model file: text to tree to meaning. Every text has a model; what is wrong with it is
 * among the problems of the model. The same text gives the same model.
 */
public final class ModelReader {

  private final SyntaxFile file;
  private final BooleanSupplier cancelled;
  private final FileAccess files;
  private final Problems problems = new Problems();
  private final Frame frame;
  private final Declarations globals;

  private ModelReader(SyntaxFile file, ProjectFiles files, BooleanSupplier cancelled) {
    this.file = file;
    this.files = new FileAccess(files);
    this.cancelled = cancelled;
    this.frame =
        new Frame(
            new SourceFile(files.self(), file.source(), this.files),
            file.statements(),
            new Scope(Optional.empty()),
            problems,
            "");
    this.globals = frame.declarations();
  }

  /** Returns the model of a text that belongs to no project: every file it names is missing. */
  public static Model read(SourceText source) {
    return read(source, ProjectFiles.none(), () -> false);
  }

  /**
   * Returns the model of a text.
   *
   * @param source the text
   * @param files the files that it may name
   * @param cancelled asked now and then; once it says true, the work ends
   * @throws CancellationException if the work was cancelled
   */
  public static Model read(SourceText source, ProjectFiles files, BooleanSupplier cancelled) {
    return read(Parser.parse(source), files, cancelled);
  }

  /**
   * Returns the model of a tree.
   *
   * @param file the tree
   * @param files the files that it may name
   * @param cancelled asked now and then; once it says true, the work ends
   * @throws CancellationException if the work was cancelled
   */
  public static Model read(SyntaxFile file, ProjectFiles files, BooleanSupplier cancelled) {
    check(cancelled);
    return new ModelReader(file, files, cancelled).read();
  }

  static void check(BooleanSupplier cancelled) {
    if (cancelled.getAsBoolean()) {
      throw new CancellationException("reading the model was cancelled");
    }
  }

  private Model read() {
    for (Statement statement : file.statements()) {
      switch (statement) {
        case ParameterStatement parameter -> globals.collect(parameter);
        case LetStatement let -> globals.collect(let);
        case MatrixStatement matrix -> globals.collect(matrix);
        case SystemStatement system -> {}
        case UnreadStatement unread -> unread.declares().ifPresent(this::broken);
        case LaterStatement later -> later.declares().ifPresent(this::broken);
        default -> misplaced(statement);
      }
    }
    globals.read();
    List<SystemModel> systems = new ArrayList<>();
    Set<String> names = new HashSet<>();
    for (Statement statement : file.statements()) {
      if (statement instanceof SystemStatement system) {
        reportDuplicate(system.name(), names);
        systems.add(new SystemReader(system, frame, problems, cancelled).read());
      }
    }
    boolean complete =
        file.statements().stream()
            .noneMatch(s -> s instanceof UnreadStatement || s instanceof LaterStatement);
    if (complete) {
      globals.reportUnused();
    }
    return new Model(
        file.source(), file, files.asked(), systems, problems.inTextOrder(file.problems()));
  }

  private void broken(Name name) {
    frame.scope().define(name.text(), new BrokenMeaning(name.span()));
  }

  private void misplaced(Statement statement) {
    problems.report(
        ProblemKind.STATEMENT_MISPLACED,
        statement.span(),
        "Only parameters, named expressions and matrices stand outside of systems: move this line"
            + " into a system.");
  }

  private void reportDuplicate(Name name, Set<String> names) {
    if (!name.text().isEmpty() && !names.add(name.text())) {
      problems.report(
          ProblemKind.NAME_DUPLICATE,
          name.span(),
          "There are two systems named \"" + name.text() + "\": rename one of them.");
    }
  }
}
