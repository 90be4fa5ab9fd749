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

  private final Deque<Block> blocks = new ArrayDeque<>();
  private int depth;
  private String lastWord = "";
  private int lastColumn;
  private boolean rowsFollow;
  private boolean rowLoopFollows;

  /**
   * What is open around a statement.
   *
   * <p>It has a kind, the column its head begins in now, and how much deeper its lines stand.
   */
  private static final class Block {
    private final BlockKind kind;
    private final int column;
    private final int steps;

    /**
     * The column of the first line in it that does not share its line with the head; -1 if none.
     */
    private int content = -1;

    Block(BlockKind kind, int column, int steps) {
      this.kind = kind;
      this.column = column;
      this.steps = steps;
    }
  }

  private enum BlockKind {
    SYSTEM,
    /** Initial values, a jump or boundary conditions, and loops in them. */
    VALUES,
    LOOP,
    /** A loop over rows; it is indented like a row. */
    ROWS,
    /** A loop without its brace; it holds what is deeper. */
    BRACELESS
  }

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
    boolean brace = statement.tokens().isEmpty() && statement.closesBlock();
    int first = layout.firstOfStatement(index);
    int column = layout.column(first);
    boolean beginsLine = layout.first(layout.line(first)) == first;
    boolean closesRows = leave(word, column, brace, beginsLine);
    if (beginsLine && !brace && !blocks.isEmpty() && blocks.peek().content < 0) {
      blocks.peek().content = column;
    }
    boolean rowLoop = word.equals("for") && rowsFollow && holdsRows(index);
    boolean likeRow = rowsFollow && (word.equals("row") || rowLoop) || closesRows;
    if (!statement.tokens().isEmpty()) {
      lastWord = word;
      lastColumn = column;
      rowLoopFollows = rowLoop;
      rowsFollow = likeRow || word.equals("basis") || word.equals("matrix") || word.equals("table");
    }
    baseLines[index] = beginsLine || index == 0 ? layout.line(first) : baseLines[index - 1];
    levels[index] = STEP * (Math.min(depth, DEEPEST) + (likeRow ? 1 : 0));
    if (statement.closesBlock() && !brace) {
      closesRows = pop();
    }
    if (statement.opensBlock()) {
      push(kindOfBlock(), lastColumn);
    } else if (word.equals("for") && !opensLater(index) && !statement.closesBlock()) {
      push(BlockKind.BRACELESS, column);
    }
    rowsFollow &= !statement.opensBlock() && !statement.closesBlock();
    rowsFollow |= closesRows;
  }

  /**
   * Leaves the blocks that end before a statement, closed or not, and tells whether its brace
   * closes a loop over rows. A system ends everything; initial values and loops end before
   * statements that cannot stand in them.
   */
  private boolean leave(String word, int column, boolean brace, boolean beginsLine) {
    if (word.equals("system")) {
      blocks.clear();
      depth = 0;
    }
    while (!blocks.isEmpty() && !brace && ends(blocks.peek(), word, column, beginsLine)) {
      pop();
    }
    while (brace
        && !blocks.isEmpty()
        && blocks.peek().kind == BlockKind.BRACELESS
        && column < blocks.peek().column) {
      pop();
    }
    return brace && pop();
  }

  private static boolean ends(Block block, String word, int column, boolean beginsLine) {
    boolean deeper = column > block.column || !beginsLine;
    boolean inside = column >= block.content || !beginsLine;
    return switch (block.kind) {
      case SYSTEM -> false;
      case VALUES -> !word.isEmpty() && !(word.equals("for") && inside);
      case ROWS -> !word.isEmpty() && !word.equals("row") && !(word.equals("for") && inside);
      case LOOP -> isDeclaration(word) && !deeper;
      case BRACELESS -> !deeper;
    };
  }

  private static boolean isDeclaration(String word) {
    return switch (word) {
      case "", "for", "require", "transfer", "row" -> false;
      default -> true;
    };
  }

  /** Tells whether the first line of a loop, loops in it aside, is a row. */
  private boolean holdsRows(int index) {
    int inner = index;
    while (inner < index + 2 * DEEPEST
        && inner < levels.length
        && layout.word(inner).equals("for")
        && opensLater(inner)) {
      boolean alone = !layout.statements().get(inner).opensBlock();
      inner += alone ? 2 : 1;
    }
    return inner < levels.length && layout.word(inner).equals("row");
  }

  /** Tells whether a brace opens a block at the end of a statement or on the next line. */
  private boolean opensLater(int index) {
    StatementLine statement = layout.statements().get(index);
    if (statement.opensBlock() || index + 1 == levels.length) {
      return statement.opensBlock();
    }
    StatementLine next = layout.statements().get(index + 1);
    return next.tokens().isEmpty() && next.opensBlock();
  }

  private BlockKind kindOfBlock() {
    boolean inValues = !blocks.isEmpty() && blocks.peek().kind == BlockKind.VALUES;
    boolean inRows = !blocks.isEmpty() && blocks.peek().kind == BlockKind.ROWS;
    return switch (lastWord) {
      case "initial", "jump", "boundary" -> BlockKind.VALUES;
      case "for" ->
          inValues ? BlockKind.VALUES : rowLoopFollows || inRows ? BlockKind.ROWS : BlockKind.LOOP;
      default -> BlockKind.SYSTEM;
    };
  }

  private void push(BlockKind kind, int column) {
    int steps = kind == BlockKind.ROWS && rowLoopFollows ? 2 : 1;
    blocks.push(new Block(kind, column, steps));
    depth += steps;
  }

  /** Leaves the innermost block and tells whether it was a loop that is indented like a row. */
  private boolean pop() {
    if (blocks.isEmpty()) {
      return false;
    }
    Block block = blocks.pop();
    depth -= block.steps;
    return block.steps == 2;
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
    int below = STEP * Math.min(depth, DEEPEST);
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
