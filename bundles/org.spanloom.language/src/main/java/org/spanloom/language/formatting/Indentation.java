/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.formatting;

import java.util.ArrayDeque;
import java.util.Deque;
import java.util.List;
import org.spanloom.language.syntax.StatementLine;
import org.spanloom.language.syntax.TokenKind;

/**
 * Sets the blanks at the start of each line: two for each block around it, two more for the rows of
 * a basis or matrix, four more where a statement goes on. A comment stands like the line below it.
 */
final class Indentation {

  /** Blanks for each block, and for rows. */
  static final int STEP = 2;

  /** Blanks for the lines in which a statement goes on. */
  static final int CONTINUATION = 4;

  /** More blocks than this are not indented further; it bounds what a wrong text can grow to. */
  private static final int DEEPEST = 20;

  private final Layout layout;
  private final int[] levels;

  /** For each statement the line whose indentation another must exceed for it to go on there. */
  private final int[] baseLines;

  private final Deque<String> blocks = new ArrayDeque<>();
  private String lastWord = "";
  private boolean rowsFollow;

  private Indentation(Layout layout) {
    this.layout = layout;
    this.levels = new int[layout.statements().size()];
    this.baseLines = new int[levels.length];
  }

  /** Sets the blanks of the first token of each line. */
  static void apply(Layout layout) {
    Indentation indentation = new Indentation(layout);
    for (int i = 0; i < indentation.levels.length; i++) {
      indentation.level(i);
    }
    indentation.lines();
  }

  /** Finds how far a statement would be indented if it began a line, and enters its block. */
  private void level(int index) {
    StatementLine statement = layout.statements().get(index);
    String word = layout.word(index);
    boolean row = word.equals("row") && rowsFollow;
    if (word.equals("system")) {
      // A system ends the one before it, closed or not.
      blocks.clear();
    } else if (!word.isEmpty() && holdsLinesOnly(blocks.peek())) {
      // Such a block holds lines of its own only; another statement ends it, closed or not.
      blocks.pop();
    }
    if (!statement.tokens().isEmpty()) {
      lastWord = word;
      rowsFollow = row || word.equals("basis") || word.equals("matrix") || word.equals("table");
    }
    boolean brace = statement.tokens().isEmpty() && statement.closesBlock();
    if (brace && !blocks.isEmpty()) {
      blocks.pop();
    }
    int first = layout.firstOfStatement(index);
    boolean beginsLine = layout.first(layout.line(first)) == first;
    baseLines[index] = beginsLine || index == 0 ? layout.line(first) : baseLines[index - 1];
    levels[index] = STEP * (depth() + (row ? 1 : 0));
    if (statement.closesBlock() && !brace && !blocks.isEmpty()) {
      blocks.pop();
    }
    if (statement.opensBlock()) {
      blocks.push(lastWord);
    }
    rowsFollow &= !statement.opensBlock() && !statement.closesBlock();
  }

  private static boolean holdsLinesOnly(String block) {
    return "initial".equals(block) || "jump".equals(block) || "boundary".equals(block);
  }

  private int depth() {
    return Math.min(blocks.size(), DEEPEST);
  }

  private void lines() {
    int[] indents = new int[layout.lineCount()];
    for (int line = 0; line < indents.length; line++) {
      if (!layout.isBlank(line)) {
        int first = layout.first(line);
        int statement = layout.statement(first);
        if (statement >= 0) {
          indents[line] = indent(first, statement, indents);
          layout.setBlanks(first, indents[line]);
        }
      }
    }
    comments(indents);
  }

  private int indent(int first, int statement, int[] indents) {
    if (layout.firstOfStatement(statement) != first) {
      return indents[baseLines[statement]] + CONTINUATION;
    }
    if (statement > 0 && goesOnIfDeeper(statement)) {
      // The statement before is not finished and would take in a line that is deeper than its own.
      return Math.min(levels[statement], indents[baseLines[statement - 1]]);
    }
    return levels[statement];
  }

  private boolean goesOnIfDeeper(int statement) {
    TokenKind first = layout.kind(layout.firstOfStatement(statement));
    return layout.statements().get(statement - 1).isUnfinished()
        && first != TokenKind.STATEMENT_WORD
        && first != TokenKind.CLOSE_BRACE;
  }

  /** Places comments that stand alone and belong to no statement, from the end on. */
  private void comments(int[] indents) {
    List<StatementLine> statements = layout.statements();
    int below = STEP * depth();
    for (int line = indents.length - 1; line >= 0; line--) {
      if (layout.isBlank(line)) {
        continue;
      }
      int first = layout.first(line);
      int statement = layout.statement(first);
      if (statement < 0) {
        layout.setBlanks(first, below);
      } else if (layout.firstOfStatement(statement) == first) {
        boolean closes =
            statements.get(statement).tokens().isEmpty() && statements.get(statement).closesBlock();
        below = indents[line] + (closes ? STEP : 0);
      }
    }
  }
}
