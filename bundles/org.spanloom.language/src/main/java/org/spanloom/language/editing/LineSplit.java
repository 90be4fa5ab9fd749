/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.editing;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.spanloom.language.problem.Fix;
import org.spanloom.language.problem.TextEdit;
import org.spanloom.language.syntax.StatementLine;
import org.spanloom.language.syntax.StatementLines;
import org.spanloom.language.syntax.Token;
import org.spanloom.language.syntax.TokenKind;
import org.spanloom.language.text.SourceText;
import org.spanloom.language.text.Span;

/**
 * Breaks a statement on an over-long line behind signs and commas, where it goes on by itself. Of
 * the places that fit, the outermost is taken, of those the loosest sign, of those the last.
 */
public final class LineSplit {

  /** Lines with more characters than this are split. */
  public static final int LONGEST = 100;

  /** Blanks by which the lines below are deeper than the first. */
  private static final int CONTINUATION = 4;

  private final SourceText source;
  private final List<Token> tokens;
  private final String indent;
  private final List<TextEdit> edits = new ArrayList<>();

  /**
   * A place to break.
   *
   * @param after the token in front of it
   * @param depth how many brackets are open there
   * @param rank how tight the sign binds, 0 for the loosest
   */
  private record Break(int after, int depth, int rank) {

    boolean isBetterThan(Break other) {
      return depth != other.depth ? depth < other.depth : rank <= other.rank;
    }
  }

  private LineSplit(SourceText source, List<Token> tokens, String indent) {
    this.source = source;
    this.tokens = tokens;
    this.indent = indent;
  }

  /** Returns the edit that splits the statement at an offset, if its line is too long. */
  public static Optional<Fix> at(SourceText source, int offset) {
    for (StatementLine line : StatementLines.of(source.content())) {
      Span span = line.span();
      if (!line.tokens().isEmpty() && span.touches(offset)) {
        return split(source, line);
      }
    }
    return Optional.empty();
  }

  private static Optional<Fix> split(SourceText source, StatementLine line) {
    Span first = source.lineSpan(source.line(line.span().start()));
    boolean oneLine = source.line(line.span().end()) == source.line(first.start());
    String before = source.slice(new Span(first.start(), line.span().start()));
    int width = line.span().end() - first.start();
    if (!oneLine || width <= LONGEST || !before.isBlank()) {
      return Optional.empty();
    }
    LineSplit split = new LineSplit(source, line.tokens(), before + " ".repeat(CONTINUATION));
    split.run(first.start());
    return split.edits.isEmpty()
        ? Optional.empty()
        : Optional.of(new Fix("Split the line", split.edits));
  }

  private void run(int lineStart) {
    List<Break> breaks = breaks();
    // Where the text of the line at hand would begin if it stood in the place that it has now.
    int start = lineStart;
    int from = 0;
    while (tokens.getLast().end() - start > LONGEST && from < breaks.size()) {
      int chosen = from;
      for (int i = from + 1; i < breaks.size() && end(breaks.get(i)) - start <= LONGEST; i++) {
        chosen = breaks.get(i).isBetterThan(breaks.get(chosen)) ? i : chosen;
      }
      int at = breaks.get(chosen).after();
      int next = tokens.get(at + 1).start();
      edits.add(new TextEdit(new Span(tokens.get(at).end(), next), lineEnd() + indent));
      start = next - indent.length();
      from = chosen + 1;
    }
  }

  private int end(Break place) {
    return tokens.get(place.after()).end();
  }

  private String lineEnd() {
    return source.content().contains("\r\n") ? "\r\n" : "\n";
  }

  private List<Break> breaks() {
    List<Break> breaks = new ArrayList<>();
    int depth = 0;
    for (int i = 0; i + 1 < tokens.size(); i++) {
      TokenKind kind = tokens.get(i).kind();
      depth +=
          switch (kind) {
            case OPEN_PARENTHESIS, OPEN_BRACKET -> 1;
            case CLOSE_PARENTHESIS, CLOSE_BRACKET -> -1;
            default -> 0;
          };
      int rank =
          switch (kind) {
            case EQUALS, COMMA, LESS, AT_MOST, GREATER, AT_LEAST, PLUS_MINUS, ARROW -> 0;
            case PLUS, MINUS -> i > 0 && endsOperand(tokens.get(i - 1).kind()) ? 1 : -1;
            case TIMES, DIVIDE -> 2;
            default -> -1;
          };
      if (rank >= 0) {
        breaks.add(new Break(i, depth, rank));
      }
    }
    return breaks;
  }

  private static boolean endsOperand(TokenKind kind) {
    return switch (kind) {
      case NAME, CONTEXT_WORD, NUMBER, UNIT, PRIMES, CLOSE_PARENTHESIS, CLOSE_BRACKET -> true;
      default -> false;
    };
  }
}
