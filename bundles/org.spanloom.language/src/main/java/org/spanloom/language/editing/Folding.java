/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.editing;

import java.util.ArrayList;
import java.util.List;
import org.spanloom.language.syntax.BlockLine;
import org.spanloom.language.syntax.BlockLine.RepeatedLines;
import org.spanloom.language.syntax.Statement;
import org.spanloom.language.syntax.Statement.BasisStatement;
import org.spanloom.language.syntax.Statement.BoundaryStatement;
import org.spanloom.language.syntax.Statement.ForStatement;
import org.spanloom.language.syntax.Statement.InitialValuesStatement;
import org.spanloom.language.syntax.Statement.JumpStatement;
import org.spanloom.language.syntax.Statement.SystemStatement;
import org.spanloom.language.syntax.SyntaxFile;
import org.spanloom.language.syntax.Token;
import org.spanloom.language.text.SourceText;
import org.spanloom.language.text.Span;

/** Finds what an editor can fold: statements and runs of comments over more than one line. */
public final class Folding {

  private final SourceText source;
  private final List<Span> folds = new ArrayList<>();

  private Folding(SourceText source) {
    this.source = source;
  }

  /** Returns the places that can be folded; outer ones come before those inside them. */
  public static List<Span> of(SyntaxFile file) {
    Folding folding = new Folding(file.source());
    folding.statements(file.statements());
    folding.comments(file.comments());
    return folding.folds;
  }

  private void statements(List<Statement> statements) {
    for (Statement statement : statements) {
      add(statement.span());
      switch (statement) {
        case SystemStatement system -> statements(system.body());
        case ForStatement loop -> statements(loop.body());
        case InitialValuesStatement values -> lines(values.settings());
        case BasisStatement basis -> lines(basis.rows());
        case JumpStatement jump -> lines(jump.changes());
        case BoundaryStatement boundary -> lines(boundary.conditions());
        default -> {}
      }
    }
  }

  private <T> void lines(List<BlockLine<T>> lines) {
    for (BlockLine<T> line : lines) {
      if (line instanceof RepeatedLines<T> loop) {
        add(loop.span());
        lines(loop.lines());
      }
    }
  }

  /** A run of comments is one fold if each stands alone on the line below the one before. */
  private void comments(List<Token> comments) {
    int i = 0;
    while (i < comments.size()) {
      int last = i;
      while (last + 1 < comments.size()
          && standsBelow(comments.get(last), comments.get(last + 1))) {
        last++;
      }
      if (last > i && standsAlone(comments.get(i))) {
        add(comments.get(i).span().join(comments.get(last).span()));
      }
      i = last + 1;
    }
  }

  private boolean standsBelow(Token upper, Token lower) {
    return standsAlone(lower) && source.line(lower.start()) == source.line(upper.start()) + 1;
  }

  private boolean standsAlone(Token comment) {
    Span line = source.lineSpan(source.line(comment.start()));
    return source.slice(new Span(line.start(), comment.start())).isBlank();
  }

  private void add(Span span) {
    if (source.line(span.start()) < source.line(Math.max(span.start(), span.end() - 1))) {
      folds.add(span);
    }
  }
}
