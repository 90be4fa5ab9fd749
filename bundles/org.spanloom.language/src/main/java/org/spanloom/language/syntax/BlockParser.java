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
import org.spanloom.language.problem.Problem;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.syntax.Statement.BoundaryStatement;
import org.spanloom.language.syntax.Statement.Change;
import org.spanloom.language.syntax.Statement.Condition;
import org.spanloom.language.syntax.Statement.InitialValuesStatement;
import org.spanloom.language.syntax.Statement.JumpStatement;
import org.spanloom.language.syntax.Statement.JumpTime;
import org.spanloom.language.syntax.Statement.PartStatement;
import org.spanloom.language.syntax.Statement.Setting;
import org.spanloom.language.syntax.Statement.UnreadStatement;
import org.spanloom.language.text.Span;

/**
 * Reads statements whose lines of one kind stand in braces: initial values, jumps and boundary
 * conditions. Each line has a problem of its own, and a block that is not closed ends before the
 * next statement.
 */
final class BlockParser {

  private final String text;
  private final SyntaxProblems problems;
  private final Blocks blocks;

  BlockParser(String text, SyntaxProblems problems, Blocks blocks) {
    this.text = text;
    this.problems = problems;
    this.blocks = blocks;
  }

  /**
   * {@code initial values = "initial", "values", name, [ time ], "{", { setting, ( ";" | line end )
   * | loop }, "}" ;}
   */
  Statement initialValues(StatementLine line) {
    StatementParser parser = new StatementParser(text, line);
    Cursor cursor = parser.cursor();
    cursor.take();
    if (!cursor.acceptWord("values")) {
      cursor.failHere(
          ProblemKind.WORD_UNEXPECTED,
          "The word \"values\" belongs here, as in \"initial values warm { ... }\"");
    }
    Name name = cursor.failed() ? new Name("", line.span()) : parser.name("initial values");
    Optional<Expression> time = parser.time();
    if (!opens(line, parser, "The values stand in braces, as in \"{ T = 293; P = 0 }\"")) {
      return parser.unread();
    }
    Blocks.Block<Setting> block =
        block(
            line,
            StatementParser::setting,
            "The block of initial values is not closed: write \"}\" behind its last value.");
    return cursor.failed()
        ? unread("initial", named(name), block)
        : new InitialValuesStatement(
            name, time, block.content(), block.allRead(), line.documentation(), block.span());
  }

  /** {@code jump = "jump", jump time, "{", { change, ( ";" | line end ) }, "}" ;} */
  Statement jump(StatementLine line) {
    StatementParser parser = new StatementParser(text, line);
    JumpTime time = parser.jumpTime();
    if (!opens(line, parser, "What changes stands in braces, as in \"{ x becomes x + 1 }\"")) {
      return parser.unread();
    }
    Blocks.Block<Change> block =
        block(
            line,
            StatementParser::change,
            "The jump is not closed: write \"}\" behind its last line.");
    return parser.cursor().failed()
        ? unread("jump", Optional.empty(), block)
        : new JumpStatement(
            time,
            block.content(),
            block.allRead(),
            line.documentation(),
            line.span(),
            block.span());
  }

  /** {@code boundary = "boundary", name, "{", { condition, ( ";" | line end ) }, "}" ;} */
  Statement boundary(StatementLine line) {
    StatementParser parser = new StatementParser(text, line);
    parser.cursor().take();
    Name name = parser.name("boundary conditions");
    if (!opens(
        line, parser, "The conditions stand in braces, as in \"{ T(0) = 277; T(48) = 280 }\"")) {
      return parser.unread();
    }
    Blocks.Block<Condition> block =
        block(
            line,
            StatementParser::condition,
            "The block of boundary conditions is not closed: write \"}\" behind its last"
                + " condition.");
    return parser.cursor().failed()
        ? unread("boundary", named(name), block)
        : new BoundaryStatement(
            name, block.content(), block.allRead(), line.documentation(), block.span());
  }

  /** {@code part = "part", name, "=", name, [ "{", { binding, ( ";" | line end ) }, "}" ] ;} */
  Statement part(StatementLine line) {
    StatementParser parser = new StatementParser(text, line);
    PartStatement head = parser.part();
    parser.cursor().problem().ifPresent(problems::add);
    if (!line.opensBlock() && (line.closesBlock() || !blocks.acceptOpeningBrace())) {
      return parser.cursor().failed() ? parser.unread() : head;
    }
    Blocks.Block<Setting> block =
        block(
            line,
            StatementParser::binding,
            "The part is not closed: write \"}\" behind its last line.");
    List<Setting> bindings = new ArrayList<>();
    BlockLine.each(block.content(), bindings::add);
    return parser.cursor().failed()
        ? unread("part", named(head.name()), block)
        : new PartStatement(
            head.name(),
            head.system(),
            bindings,
            block.allRead(),
            head.documentation(),
            line.span(),
            block.span());
  }

  private static Optional<Name> named(Name name) {
    return name.text().isEmpty() ? Optional.empty() : Optional.of(name);
  }

  private UnreadStatement unread(String word, Optional<Name> declares, Blocks.Block<?> block) {
    Span span = block.span();
    return new UnreadStatement(word, text.substring(span.start(), span.end()), declares, span);
  }

  /** Ends the first line of a block and tells whether its brace is there. */
  private boolean opens(StatementLine line, StatementParser parser, String what) {
    parser.expectEnd();
    Cursor cursor = parser.cursor();
    boolean open = line.opensBlock() || !line.closesBlock() && blocks.acceptOpeningBrace();
    if (!open && !cursor.failed()) {
      cursor.fail(ProblemKind.BRACE_MISSING, cursor.peek().span(), what + ": write them here.");
    }
    cursor.problem().ifPresent(problems::add);
    return open;
  }

  /** Reads the lines of a block up to its closing brace. */
  private <T> Blocks.Block<T> block(
      StatementLine header, Function<StatementParser, Optional<T>> reader, String notClosed) {
    Blocks.Block<T> block = blocks.block(header, "", reader);
    if (block.lacksBrace()) {
      problems.add(new Problem(ProblemKind.BRACE_MISSING, header.span(), notClosed, List.of()));
    }
    return block;
  }
}
