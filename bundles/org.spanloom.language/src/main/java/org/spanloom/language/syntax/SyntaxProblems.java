/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.syntax;

import java.util.ArrayList;
import java.util.List;
import org.spanloom.language.problem.Problem;

/**
 * The problems of one text in the order in which they are found, up to a limit beyond what is ever
 * listed, so that a text of nothing but mistakes takes no more memory than another.
 */
final class SyntaxProblems {

  /**
   * Most problems that are kept; more than a model lists, so that it can tell that some are left
   * out.
   */
  static final int LIMIT = 2000;

  private final List<Problem> problems = new ArrayList<>();

  void add(Problem problem) {
    if (problems.size() < LIMIT) {
      problems.add(problem);
    }
  }

  List<Problem> list() {
    return List.copyOf(problems);
  }
}
