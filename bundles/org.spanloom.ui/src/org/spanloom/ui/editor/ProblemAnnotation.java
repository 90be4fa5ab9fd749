/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.editor;

import org.eclipse.jface.text.quickassist.IQuickFixableAnnotation;
import org.eclipse.jface.text.source.Annotation;
import org.spanloom.language.problem.Problem;
import org.spanloom.language.problem.Severity;

/** A problem of the text, shown while it is being edited. */
public final class ProblemAnnotation extends Annotation implements IQuickFixableAnnotation {

  private final Problem problem;

  ProblemAnnotation(Problem problem) {
    super(type(problem.severity()), false, problem.message());
    this.problem = problem;
  }

  /** Returns the problem. */
  public Problem problem() {
    return problem;
  }

  private static String type(Severity severity) {
    return switch (severity) {
      case ERROR -> "org.spanloom.ui.live.error";
      case WARNING -> "org.spanloom.ui.live.warning";
      case NOTE -> "org.spanloom.ui.live.note";
    };
  }

  @Override
  public void setQuickFixable(boolean state) {
    // Follows from the problem.
  }

  @Override
  public boolean isQuickFixableStateSet() {
    return true;
  }

  @Override
  public boolean isQuickFixable() {
    return !problem.fixes().isEmpty();
  }
}
