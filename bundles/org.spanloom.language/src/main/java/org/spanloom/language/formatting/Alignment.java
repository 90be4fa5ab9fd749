/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.formatting;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.spanloom.language.syntax.StatementLine;
import org.spanloom.language.syntax.TokenKind;

/**
 * Puts units, equals signs and the values of rows below each other, in runs of statements of one
 * kind on adjacent lines. What is too wide stays out of it, so that one long name does not move all
 * others.
 */
final class Alignment {

  /** How wide a name with its first word, or the left side of an equation, may be to take part. */
  private static final int HEAD_LIMIT = 32;

  /** How wide a unit may be to take part. */
  private static final int UNIT_LIMIT = 16;

  /** How wide all values of a column of rows may be for it to be aligned. */
  private static final int VALUE_LIMIT = 8;

  /** How wide all entries of a column of a matrix may be for it to be aligned. */
  private static final int ENTRY_LIMIT = 16;

  /** The kind of a row of a matrix, which names no state. */
  private static final String MATRIX_ROW = "row of a matrix";

  private final Layout layout;
  private final boolean[] unread;
  private final List<Cells> run = new ArrayList<>();

  /**
   * The parts of a statement that are aligned, by their first tokens; -1 where there is none.
   *
   * @param kind the word the statement begins with, or the sign of an equation or a change
   * @param first its first token
   * @param middle the unit, or the arrow of a transfer
   * @param equals the equals sign, or the word of a change
   * @param values values of a row; the equals sign of one of a matrix is -1
   * @param end behind the last token of its first line, comments left out
   */
  private record Cells(
      String kind, int first, int middle, int equals, List<Integer> values, int end) {}

  private Alignment(Layout layout, boolean[] unread) {
    this.layout = layout;
    this.unread = unread;
  }

  /** Adds to the blanks; those of single lines must be set. */
  static void apply(Layout layout, boolean[] unread) {
    new Alignment(layout, unread).runs();
  }

  private void runs() {
    List<StatementLine> statements = layout.statements();
    int lastLine = -2;
    for (int s = 0; s < statements.size(); s++) {
      int line = layout.line(layout.firstOfStatement(s));
      boolean alone = standsAlone(s);
      boolean adjacent = line == lastLine + 1;
      if (alone && unread[s] && adjacent) {
        // It keeps its blanks; its neighbours stay a run, so that mending it moves none of them.
        lastLine = lastLine(s);
        continue;
      }
      Optional<Cells> cells = alone && !unread[s] ? cells(s) : Optional.empty();
      if (!adjacent || cells.isEmpty() || !goesOn(cells.get())) {
        align();
        run.clear();
      }
      cells.ifPresent(run::add);
      lastLine = lastLine(s);
    }
    align();
  }

  private boolean goesOn(Cells cells) {
    return run.isEmpty() || run.getFirst().kind().equals(cells.kind());
  }

  /** Tells whether nothing but a comment shares the lines of a statement. */
  private boolean standsAlone(int statement) {
    StatementLine line = layout.statements().get(statement);
    int first = layout.firstOfStatement(statement);
    return line.end().kind() == TokenKind.NEWLINE
        && !line.tokens().isEmpty()
        && layout.first(layout.line(first)) == first;
  }

  private int lastLine(int statement) {
    int line = layout.line(layout.firstOfStatement(statement));
    while (line + 1 < layout.lineCount()
        && !layout.isBlank(line + 1)
        && layout.statement(layout.first(line + 1)) == statement) {
      line++;
    }
    return line;
  }

  /** Returns the parts of a statement that stands alone; nothing if it has none to align. */
  private Optional<Cells> cells(int statement) {
    int first = layout.firstOfStatement(statement);
    int end = layout.end(layout.line(first));
    while (end > first && layout.isComment(end - 1)) {
      end--;
    }
    String word = layout.word(statement);
    boolean declares =
        switch (word) {
          case "parameter", "let", "state", "output", "input", "table", "matrix" -> true;
          default -> false;
        };
    boolean aligned = declares || word.isEmpty() || word.equals("row") || word.equals("transfer");
    int middle = -1;
    int equals = -1;
    List<Integer> values = new ArrayList<>();
    int open = 0;
    for (int i = first; aligned && i < end; i++) {
      TokenKind kind = layout.kind(i);
      boolean unit = declares && kind == TokenKind.UNIT;
      boolean arrow = word.equals("transfer") && kind == TokenKind.ARROW;
      if (equals < 0 && middle < 0 && (unit || arrow)) {
        middle = i;
      } else if (equals < 0 && open == 0 && parts(i)) {
        equals = i;
      }
      boolean begins = i > first && (i - 1 == equals || layout.kind(i - 1) == TokenKind.COMMA);
      if (begins && word.equals("row") && open == 0) {
        values.add(i);
      }
      open += nesting(kind);
    }
    if (word.equals("row") && equals < 0 && first + 1 < end) {
      values.addFirst(first + 1);
      return Optional.of(new Cells(MATRIX_ROW, first, -1, -1, values, end));
    }
    return equals <= first
        ? Optional.empty()
        : Optional.of(
            new Cells(
                word.isEmpty() ? layout.text(equals) : word, first, middle, equals, values, end));
  }

  /** Tells whether a token parts a line in two: an equals sign, or the word of a change. */
  private boolean parts(int i) {
    return layout.kind(i) == TokenKind.EQUALS
        || layout.kind(i) == TokenKind.CLAUSE_WORD && layout.text(i).equals("becomes");
  }

  private static int nesting(TokenKind kind) {
    return switch (kind) {
      case OPEN_PARENTHESIS, OPEN_BRACKET -> 1;
      case CLOSE_PARENTHESIS, CLOSE_BRACKET -> -1;
      default -> 0;
    };
  }

  private void align() {
    if (run.size() > 1) {
      if (!run.getFirst().kind().equals(MATRIX_ROW)) {
        alignSigns();
      }
      alignValues();
    }
  }

  private void alignSigns() {
    int heads = 0;
    int units = 0;
    for (Cells cells : run) {
      if (takesPart(cells)) {
        heads = Math.max(heads, head(cells));
        units = Math.max(units, cells.middle() < 0 ? 0 : middle(cells));
      }
    }
    for (Cells cells : run) {
      if (takesPart(cells)) {
        int behindHead = heads - head(cells) + 1;
        if (cells.middle() >= 0) {
          layout.setBlanks(cells.middle(), behindHead);
          layout.setBlanks(cells.equals(), units - middle(cells) + 1);
        } else {
          layout.setBlanks(cells.equals(), behindHead + (units == 0 ? 0 : units + 1));
        }
      }
    }
  }

  private boolean takesPart(Cells cells) {
    return head(cells) <= HEAD_LIMIT && (cells.middle() < 0 || middle(cells) <= UNIT_LIMIT);
  }

  private int head(Cells cells) {
    return layout.width(cells.first(), cells.middle() < 0 ? cells.equals() : cells.middle());
  }

  private int middle(Cells cells) {
    return layout.width(cells.middle(), cells.equals());
  }

  /** Aligns the ends of values, column by column, up to the first column with a wide value. */
  private void alignValues() {
    int limit = run.getFirst().kind().equals(MATRIX_ROW) ? ENTRY_LIMIT : VALUE_LIMIT;
    int columns = run.stream().mapToInt(c -> c.values().size()).max().orElse(0);
    for (int column = 0; column < columns; column++) {
      int widest = 0;
      for (Cells cells : run) {
        widest = Math.max(widest, value(cells, column));
      }
      if (widest > limit) {
        return;
      }
      for (Cells cells : run) {
        if (column < cells.values().size()) {
          layout.setBlanks(cells.values().get(column), 1 + widest - value(cells, column));
        }
      }
    }
  }

  /** Returns the width of a value with its comma; 0 if the row has none there. */
  private int value(Cells cells, int column) {
    List<Integer> values = cells.values();
    if (column >= values.size()) {
      return 0;
    }
    int next = column + 1 < values.size() ? values.get(column + 1) : cells.end();
    boolean comma = column + 1 < values.size();
    return layout.width(values.get(column), next) - (comma ? 1 : 0);
  }
}
