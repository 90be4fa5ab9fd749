/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.formatting;

import java.util.ArrayList;
import java.util.List;
import org.spanloom.language.problem.Problem;
import org.spanloom.language.problem.TextEdit;
import org.spanloom.language.syntax.Parser;
import org.spanloom.language.syntax.StatementLine;
import org.spanloom.language.syntax.StatementLines;
import org.spanloom.language.syntax.SyntaxFile;
import org.spanloom.language.syntax.Token;
import org.spanloom.language.syntax.TokenKind;
import org.spanloom.language.text.SourceText;
import org.spanloom.language.text.Span;

/**
 * Lays out model files in the canonical way. Only white space changes: blanks in lines, blank
 * lines, and the line end behind the last line. Line ends stay what they are. The work is linear in
 * the length of the text.
 */
public final class Formatter {

  private final SourceText source;
  private final Layout layout;
  private final List<TextEdit> edits = new ArrayList<>();

  private Formatter(SourceText source) {
    this.source = source;
    this.layout = new Layout(source.content());
  }

  /**
   * Returns the changes that give a text its canonical layout; none if it has it.
   *
   * @param file the tree of the text; statements with problems keep their blanks but for the
   *     indentation
   * @return changes that do not overlap, in the order of the text
   */
  public static List<TextEdit> edits(SyntaxFile file) {
    Formatter formatter = new Formatter(file.source());
    formatter.lay(formatter.unread(file.problems()));
    formatter.compare();
    return formatter.changesBlanksOnly() ? List.copyOf(formatter.edits) : List.of();
  }

  /** Returns a text in its canonical layout. */
  public static String format(String text) {
    return TextEdit.apply(text, edits(Parser.parse(new SourceText("", text))));
  }

  private void lay(boolean[] unread) {
    Spacing.apply(layout, unread);
    Indentation.apply(layout);
    Alignment.apply(layout, unread);
    CommentColumns.apply(layout);
  }

  /** Tells for each statement whether it has a problem of its own. */
  private boolean[] unread(List<Problem> problems) {
    List<StatementLine> statements = layout.statements();
    boolean[] unread = new boolean[statements.size()];
    for (Problem problem : problems) {
      boolean ofStatement =
          switch (problem.kind()) {
            case BRACE_MISSING, BRACE_NOT_OPEN -> false;
            case STATEMENT_MISPLACED -> false;
            default -> true;
          };
      int low = -1;
      int high = statements.size();
      while (high - low > 1) {
        int middle = (low + high) >>> 1;
        boolean before = statements.get(middle).span().start() <= problem.span().start();
        low = before ? middle : low;
        high = before ? high : middle;
      }
      if (ofStatement && low >= 0) {
        unread[low] = true;
      }
    }
    return unread;
  }

  /** Makes an edit of each place where the white space is not the wanted one. */
  private void compare() {
    int behind = 0;
    int line = 0;
    while (line < layout.lineCount()) {
      if (layout.isBlank(line)) {
        int next = line;
        while (next < layout.lineCount() && layout.isBlank(next)) {
          next++;
        }
        behind = blankLines(line, next, behind);
        line = next;
      } else {
        behind = line(line, behind);
        line++;
      }
    }
  }

  /** Leaves one of several blank lines, none at the ends of a text and before a closing brace. */
  private int blankLines(int from, int to, int behind) {
    String content = source.content();
    if (to == layout.lineCount()) {
      edit(behind, content.length(), "");
      return content.length();
    }
    int end = layout.token(layout.first(to) - 1).end();
    boolean none = from == 0 || layout.kind(layout.first(to)) == TokenKind.CLOSE_BRACE;
    Token kept = layout.token(layout.first(from));
    edit(behind, end, none ? "" : content.substring(kept.start(), kept.end()));
    return end;
  }

  /** Compares one line that is not blank and returns the offset behind its line end. */
  private int line(int line, int behind) {
    int at = behind;
    for (int i = layout.first(line); i < layout.end(line); i++) {
      int start = layout.token(i).start();
      if (layout.blanks(i) != Layout.KEPT) {
        edit(at, start, " ".repeat(layout.blanks(i)));
      }
      at = layout.token(i).end();
    }
    if (layout.end(line) == layout.size()) {
      edit(at, source.content().length(), lineEnd());
      return source.content().length();
    }
    Token newline = layout.token(layout.end(line));
    edit(at, newline.start(), "");
    return newline.end();
  }

  /** Returns the first line end of the text, or a line feed if it has none. */
  private String lineEnd() {
    int first = layout.end(0);
    return first == layout.size() ? "\n" : layout.text(first);
  }

  /** Notes a change, without what the old and the new white space have in common at their ends. */
  private void edit(int from, int to, String wanted) {
    String content = source.content();
    int shorter = Math.min(to - from, wanted.length());
    int front = 0;
    while (front < shorter && content.charAt(from + front) == wanted.charAt(front)) {
      front++;
    }
    int back = 0;
    while (back < shorter - front
        && content.charAt(to - 1 - back) == wanted.charAt(wanted.length() - 1 - back)) {
      back++;
    }
    if (to - from > front + back || wanted.length() > front + back) {
      Span span = new Span(from + front, to - back);
      edits.add(new TextEdit(span, wanted.substring(front, wanted.length() - back)));
    }
  }

  /**
   * Tells whether the same statements are read from the changed text. Blanks can carry meaning in
   * texts that are wrong: a line goes on in a deeper one, and a unit may lack its bracket.
   */
  private boolean changesBlanksOnly() {
    if (edits.isEmpty()) {
      return true;
    }
    String before = source.content();
    String after = TextEdit.apply(before, edits);
    List<StatementLine> laid = StatementLines.of(after);
    List<StatementLine> statements = layout.statements();
    boolean same = laid.size() == statements.size();
    for (int i = 0; same && i < laid.size(); i++) {
      same = same(before, statements.get(i), after, laid.get(i));
    }
    return same;
  }

  private static boolean same(
      String text, StatementLine statement, String otherText, StatementLine other) {
    List<Token> tokens = statement.tokens();
    List<Token> others = other.tokens();
    boolean same =
        tokens.size() == others.size()
            && statement.end().kind() == other.end().kind()
            && statement.documentation().equals(other.documentation());
    for (int i = 0; same && i < tokens.size(); i++) {
      Token a = tokens.get(i);
      Token b = others.get(i);
      int length = a.span().length();
      same =
          a.kind() == b.kind()
              && length == b.span().length()
              && text.regionMatches(a.start(), otherText, b.start(), length);
    }
    return same;
  }
}
