/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.List;
import org.spanloom.language.files.FileKey;
import org.spanloom.language.problem.Problem;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.problem.Severity;
import org.spanloom.language.syntax.SyntaxFile;
import org.spanloom.language.text.SourceText;

/**
 * What a model file means.
 *
 * @param source the text
 * @param syntax its tree
 * @param files the other files that were asked for while it was read, there or not, so that one
 *     knows when it must be read again
 * @param imports the files that its own imports name and that could be read, in the order of the
 *     text
 * @param systems its systems, in order; those with errors too, as far as they can be understood
 * @param problems everything found, in the order of the text
 */
public record Model(
    SourceText source,
    SyntaxFile syntax,
    List<FileKey> files,
    List<ImportedFile> imports,
    List<SystemModel> systems,
    List<Problem> problems) {

  /** Copies the lists. */
  public Model {
    files = List.copyOf(files);
    imports = List.copyOf(imports);
    systems = List.copyOf(systems);
    problems = List.copyOf(problems);
  }

  /**
   * Tells whether no error lies inside a system, so that it can be solved; no where problems are
   * left out.
   */
  public boolean isSound(SystemModel system) {
    return system.equations().isPresent()
        && problems.stream().noneMatch(p -> p.severity() == Severity.ERROR && concerns(p, system));
  }

  private static boolean concerns(Problem problem, SystemModel system) {
    return problem.kind() == ProblemKind.TOO_MANY_PROBLEMS
        || system.span().contains(problem.span());
  }
}
