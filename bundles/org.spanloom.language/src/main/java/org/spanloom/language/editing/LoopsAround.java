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
import org.spanloom.language.syntax.Turns;

/** Finds the loops around a place in the text. */
final class LoopsAround {

  private final int offset;
  private final List<Turns> found = new ArrayList<>();

  private LoopsAround(int offset) {
    this.offset = offset;
  }

  /** Returns the turns of the loops around an offset, the innermost first. */
  static List<Turns> of(List<Statement> statements, int offset) {
    LoopsAround loops = new LoopsAround(offset);
    loops.statements(statements);
    return loops.found.reversed();
  }

  private void statements(List<Statement> statements) {
    for (Statement statement : statements) {
      if (statement.span().touches(offset)) {
        switch (statement) {
          case ForStatement loop -> {
            found.add(loop.turns());
            statements(loop.body());
          }
          case InitialValuesStatement values -> lines(values.settings());
          case BasisStatement basis -> lines(basis.rows());
          case JumpStatement jump -> lines(jump.changes());
          case BoundaryStatement boundary -> lines(boundary.conditions());
          default -> {}
        }
      }
    }
  }

  private <T> void lines(List<BlockLine<T>> lines) {
    for (BlockLine<T> line : lines) {
      if (line instanceof RepeatedLines<T> loop && loop.span().touches(offset)) {
        found.add(loop.turns());
        lines(loop.lines());
      }
    }
  }
}
