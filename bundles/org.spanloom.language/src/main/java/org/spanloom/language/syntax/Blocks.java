/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.syntax;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;
import org.spanloom.language.problem.Fix;
import org.spanloom.language.problem.Problem;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.syntax.BlockLine.RepeatedLines;
import org.spanloom.language.syntax.BlockLine.SingleLine;
import org.spanloom.language.text.SourceText;
import org.spanloom.language.text.Span;

/** Reads what stands in braces, and the first lines of loops. */
final class Blocks {

  /** Most loops in one another. */
  static final int LOOP_DEPTH_LIMIT = 20;

  private final SourceText source;
  private final String text;
  private final StatementSplitter lines;
  private final SyntaxProblems problems;

  /** How many loops are being read, one in another. */
  private int depth;

  /** Whether a loop inside of the outermost one being read was reported as nested too deep. */
  private boolean tooDeepReported;

  Blocks(SourceText source, StatementSplitter lines, SyntaxProblems problems) {
    this.source = source;
    this.text = source.content();
    this.lines = lines;
    this.problems = problems;
  }

  /**
   * Returns a block whose opening brace was taken: {@code block = "{", { line, ( ";" | line end ) |
   * loop }, "}" ;}
   *
   * @param head the line before the brace
   * @param word the word each line begins with, empty if none
   * @param reader reads a line
   */
  <T> Block<T> block(
      StatementLine head, String word, Function<StatementParser, Optional<T>> reader) {
    Block<T> block = new Block<>(head, word, reader);
    block.read();
    return block;
  }

  /**
   * The lines of a block.
   *
   * @param <T> what a line holds
   */
  final class Block<T> {
    private final StatementLine head;
    private final String word;
    private final Function<StatementParser, Optional<T>> reader;
    private final List<BlockLine<T>> content = new ArrayList<>();
    private boolean allRead = true;
    private boolean closed;
    private boolean reported;
    private int end;

    /** The column of the first line that does not share its line with the head; -1 if none. */
    private int column = -1;

    private Block(StatementLine head, String word, Function<StatementParser, Optional<T>> reader) {
      this.head = head;
      this.word = word;
      this.reader = reader;
      this.end = head.end().end();
    }

    /** Returns the lines that could be read. */
    List<BlockLine<T>> content() {
      return content;
    }

    /** Tells whether every line could be read and the block is closed. */
    boolean allRead() {
      return allRead && closed;
    }

    /** Tells whether the closing brace is missing and that was not reported yet. */
    boolean lacksBrace() {
      return !closed && !reported;
    }

    /** Returns its place, its first line included. */
    Span span() {
      return new Span(head.span().start(), end);
    }

    private void read() {
      while (!closed && !reported && !endsBlock(lines.peek())) {
        noteColumn(lines.peek());
        StatementLine line = lines.next();
        if (isWord(line, "for")) {
          loop(line);
        } else {
          line(line);
        }
      }
      if (!closed) {
        end = content.isEmpty() ? head.end().end() : content.getLast().span().end();
      }
    }

    private void noteColumn(Token first) {
      if (column < 0 && lineOf(first) != lineOf(head.end()) && beginsLine(first)) {
        column = Blocks.this.column(first);
      }
    }

    private void line(StatementLine line) {
      end = line.end().end();
      closed = line.closesBlock();
      if (!line.tokens().isEmpty()) {
        Optional<T> found = word.isEmpty() || isWord(line, word) ? content(line) : stray(line);
        found.ifPresent(t -> content.add(new SingleLine<>(t, line.span())));
        allRead &= found.isPresent();
      }
      if (line.opensBlock()) {
        end = skip();
        allRead = false;
      }
    }

    private Optional<T> content(StatementLine line) {
      StatementParser parser = new StatementParser(text, line);
      Optional<T> found = reader.apply(parser);
      parser.expectNoBlock();
      parser.cursor().problem().ifPresent(problems::add);
      return found;
    }

    private Optional<T> stray(StatementLine line) {
      problem(
          ProblemKind.STATEMENT_MISPLACED,
          line.span(),
          "Only lines that begin with \"" + word + "\" stand in this block: move this one out.");
      return Optional.empty();
    }

    private void loop(StatementLine line) {
      boolean opened = line.opensBlock() || !line.closesBlock() && acceptOpeningBrace();
      if (!enterLoop(line)) {
        end = opened ? skip() : line.end().end();
        allRead = false;
        closed = !opened && line.closesBlock();
        reported = opened && atEndOfText();
        return;
      }
      loop(line, opened);
      leaveLoop();
    }

    private void loop(StatementLine line, boolean opened) {
      Optional<Turns> turns = loopHead(line, opened);
      end = line.end().end();
      if (!opened) {
        allRead = false;
        closed = line.closesBlock();
        return;
      }
      Block<T> inner = block(line, word, reader);
      if (inner.lacksBrace()) {
        reportOpenLoop(line);
      }
      reported = !inner.closed;
      end = inner.end;
      allRead &= inner.allRead() && turns.isPresent();
      Span span = new Span(line.span().start(), end);
      turns.ifPresent(t -> content.add(new RepeatedLines<>(t, inner.content, span)));
    }

    /**
     * Tells whether the block cannot go on here: at the end of the text and before a word that
     * begins another statement. A loop belongs to it unless it stands left of the first line.
     */
    private boolean endsBlock(Token next) {
      if (next.start() >= text.length()) {
        return true;
      }
      boolean loop =
          Blocks.this.isWord(next, "for")
              && (Blocks.this.column(next) >= column || !beginsLine(next));
      boolean own = !word.isEmpty() && Blocks.this.isWord(next, word);
      return next.kind() == TokenKind.STATEMENT_WORD && !loop && !own;
    }
  }

  /**
   * Reads {@code for} and its turns, and reports what is wrong with it.
   *
   * @param opened whether a brace follows
   * @return the turns, or empty if something is wrong
   */
  Optional<Turns> loopHead(StatementLine line, boolean opened) {
    StatementParser parser = new StatementParser(text, line);
    Turns turns = parser.loopHead();
    Cursor cursor = parser.cursor();
    if (!opened && !cursor.failed()) {
      int end = line.span().end();
      cursor.fail(
          ProblemKind.BRACE_MISSING,
          new Span(end, end),
          "What is repeated stands in braces: write \"{\" at the end of this line.",
          Fix.insert("Insert {", end, " {"));
    }
    cursor.problem().ifPresent(problems::add);
    return cursor.failed() ? Optional.empty() : Optional.of(turns);
  }

  /**
   * Begins to read a loop, to be followed by {@link #leaveLoop}.
   *
   * @return whether it may be read; if not, that was reported and there is nothing to leave
   */
  boolean enterLoop(StatementLine head) {
    if (depth < LOOP_DEPTH_LIMIT) {
      depth++;
      return true;
    }
    if (!tooDeepReported) {
      problem(
          ProblemKind.NESTING_TOO_DEEP,
          head.span(),
          "Loops stand in one another at most "
              + LOOP_DEPTH_LIMIT
              + " deep, and this one is deeper: write it outside of the others.");
    }
    tooDeepReported = true;
    return false;
  }

  /** Tells whether the loop being read stands in another. */
  boolean isInnerLoop() {
    return depth > 1;
  }

  /** Ends the reading of a loop. */
  void leaveLoop() {
    depth--;
    tooDeepReported &= depth > 0;
  }

  /** Tells whether nothing more is to come. */
  boolean atEndOfText() {
    return lines.peek().start() >= text.length();
  }

  /** Reports a loop whose closing brace is missing. */
  void reportOpenLoop(StatementLine head) {
    problem(
        ProblemKind.BRACE_MISSING,
        head.span(),
        "This \"for\" is not closed: write \"}\" behind the last line that it repeats.");
  }

  /** Takes an opening brace on a line of its own and tells whether there was one. */
  boolean acceptOpeningBrace() {
    boolean found = lines.peek().kind() == TokenKind.OPEN_BRACE;
    if (found) {
      lines.next();
    }
    return found;
  }

  /**
   * Passes over everything up to the brace that closes the block and returns the offset behind it.
   */
  int skip() {
    int depth = 1;
    int end = lines.peek().start();
    while (depth > 0 && lines.peek().start() < text.length()) {
      StatementLine line = lines.next();
      depth += line.opensBlock() ? 1 : line.closesBlock() ? -1 : 0;
      end = line.end().end();
    }
    return end;
  }

  /** Tells whether nothing but blanks stands before a token on its line. */
  private boolean beginsLine(Token token) {
    int start = source.lineSpan(lineOf(token)).start();
    return text.substring(start, token.start()).isBlank();
  }

  /** Returns how many characters stand before a token on its line. */
  int column(Token token) {
    return token.start() - source.lineSpan(lineOf(token)).start();
  }

  /** Returns the number of the line of a token. */
  int lineOf(Token token) {
    return source.line(token.start());
  }

  private boolean isWord(StatementLine line, String word) {
    return !line.tokens().isEmpty() && isWord(line.tokens().getFirst(), word);
  }

  private boolean isWord(Token token, String word) {
    return token.kind() == TokenKind.STATEMENT_WORD
        && token.span().length() == word.length()
        && text.startsWith(word, token.start());
  }

  private void problem(ProblemKind kind, Span span, String message) {
    problems.add(new Problem(kind, span, message, List.of()));
  }
}
