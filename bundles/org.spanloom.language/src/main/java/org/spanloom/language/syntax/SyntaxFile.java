/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.syntax;

import java.util.List;
import org.spanloom.language.problem.Problem;
import org.spanloom.language.text.SourceText;

/**
 * The tree of a model file. It is there for every text, as complete as the text allows, and knows
 * no meaning.
 *
 * @param source the text
 * @param statements its statements; those of systems stand in their bodies
 * @param comments comments and documentation comments, in order
 * @param problems what could not be read, in the order of the text
 */
public record SyntaxFile(
    SourceText source, List<Statement> statements, List<Token> comments, List<Problem> problems) {

  /** Copies the lists. */
  public SyntaxFile {
    statements = List.copyOf(statements);
    comments = List.copyOf(comments);
    problems = List.copyOf(problems);
  }
}
