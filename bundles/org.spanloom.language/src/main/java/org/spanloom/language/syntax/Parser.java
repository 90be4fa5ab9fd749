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
import org.spanloom.language.syntax.MatrixSource.MatrixRow;
import org.spanloom.language.syntax.MatrixSource.MatrixRows;
import org.spanloom.language.syntax.Statement.BasisStatement;
import org.spanloom.language.syntax.Statement.ForStatement;
import org.spanloom.language.syntax.Statement.MatrixStatement;
import org.spanloom.language.syntax.Statement.Row;
import org.spanloom.language.syntax.Statement.SystemStatement;
import org.spanloom.language.syntax.Statement.TableStatement;
import org.spanloom.language.syntax.Statement.UnreadStatement;
import org.spanloom.language.syntax.TableSource.TableRow;
import org.spanloom.language.syntax.TableSource.TableRows;
import org.spanloom.language.text.SourceText;
import org.spanloom.language.text.Span;

/**
 * Reads the text of a model file into a tree; never fails. Each statement has at most one problem,
 * and what cannot be read stays in the tree as its text. The work is linear in the length of the
 * text.
 *
 * <p>{@code file = { statement } ; statement = simple statement | system | basis | initial values |
 * jump | boundary ;} where a line end or {@code ;} stands between statements.
 */
public final class Parser {

  private final SourceText source;
  private final String text;
  private final StatementSplitter lines;
  private final SyntaxProblems problems = new SyntaxProblems();
  private final Blocks blocks;
  private final BlockParser blockStatements;

  /** Whether the statements of a system are being read. */
  private boolean inSystem;

  /** Whether a loop that reaches to the end of the system was reported as not closed. */
  private boolean openLoopReported;

  /**
   * The last line of the statement read last, rows included; its end may close the block around the
   * statement.
   */
  private StatementLine last;

  private Parser(SourceText source) {
    this.source = source;
    this.text = source.content();
    this.lines = new StatementSplitter(text);
    this.blocks = new Blocks(source, lines, problems);
    this.blockStatements = new BlockParser(text, problems, blocks);
    this.last = closed(0);
  }

  /** Returns the tree of a text. */
  public static SyntaxFile parse(SourceText source) {
    return new Parser(source).file();
  }

  private SyntaxFile file() {
    List<Statement> statements = new ArrayList<>();
    while (!isEndOfText(lines.peek())) {
      StatementLine line = take();
      if (isWord(line, "system")) {
        system(line, statements);
      } else {
        if (!line.tokens().isEmpty()) {
          statements.add(statement(line));
        } else if (line.opensBlock()) {
          blocks.skip();
        }
        if (last.closesBlock()) {
          closesNothing(last.end());
        }
      }
    }
    return new SyntaxFile(source, statements, lines.comments(), problems.list());
  }

  private boolean isEndOfText(Token token) {
    return token.start() == text.length();
  }

  /**
   * {@code system = "system", name, over, "{", { statement }, "}" ;} A system whose closing brace
   * is missing ends before the next one.
   */
  private void system(StatementLine line, List<Statement> statements) {
    StatementParser parser = new StatementParser(text, line);
    parser.cursor().take();
    Name name = parser.name("system");
    Optional<OverClause> over = parser.systemHeader();
    boolean open = line.opensBlock() || blocks.acceptOpeningBrace();
    if (!open && !parser.cursor().failed()) {
      int end = line.span().end();
      parser
          .cursor()
          .fail(
              ProblemKind.BRACE_MISSING,
              new Span(end, end),
              "The statements of a system stand in braces: write \"{\" at the end of this line.",
              Fix.insert("Insert {", end, " {"));
    }
    note(parser.cursor());
    List<Statement> body = new ArrayList<>();
    inSystem = true;
    int end = line.closesBlock() ? line.span().end() : body(name, body);
    inSystem = false;
    statements.add(
        new SystemStatement(
            name,
            over,
            body,
            line.documentation(),
            line.span(),
            new Span(line.span().start(), end)));
  }

  private StatementLine take() {
    last = lines.next();
    return last;
  }

  /** Returns a line that ends nothing, for a place behind a block that has closed itself. */
  private static StatementLine closed(int end) {
    return new StatementLine(List.of(), new Token(TokenKind.NEWLINE, end, end), "");
  }

  /** {@code loop = "for", turns, "{", { statement }, "}" ;} */
  private Statement loop(StatementLine line) {
    boolean opened = line.opensBlock() || !line.closesBlock() && blocks.acceptOpeningBrace();
    if (!blocks.enterLoop(line)) {
      return loopNotRead(line, opened);
    }
    Statement loop = loop(line, opened);
    blocks.leaveLoop();
    return loop;
  }

  /** Passes over a loop that is nested too deep. */
  private Statement loopNotRead(StatementLine line, boolean opened) {
    if (!opened) {
      return new StatementParser(text, line).unread();
    }
    Span span = new Span(line.span().start(), blocks.skip());
    openLoopReported |= blocks.atEndOfText();
    last = closed(span.end());
    return new UnreadStatement("for", source.slice(span), Optional.empty(), span);
  }

  private Statement loop(StatementLine line, boolean opened) {
    Optional<Turns> turns = blocks.loopHead(line, opened);
    if (!opened && line.closesBlock()) {
      return new StatementParser(text, line).unread();
    }
    List<Statement> body = new ArrayList<>();
    Span span = new Span(line.span().start(), loopBody(line, opened, body));
    last = closed(span.end());
    return turns.isPresent()
        ? new ForStatement(turns.get(), body, span)
        : new UnreadStatement("for", source.slice(span), Optional.empty(), span);
  }

  /**
   * Reads what a loop repeats and returns the offset behind it. A loop whose closing brace is
   * missing ends before the next system, and before a declaration that is not indented deeper. One
   * whose opening brace is missing holds what is indented deeper; a brace behind it is its own if
   * nothing is around it.
   */
  private int loopBody(StatementLine head, boolean opened, List<Statement> body) {
    int end = head.span().end();
    int column = blocks.column(head.tokens().getFirst());
    while (true) {
      Token next = lines.peek();
      boolean over = isEndOfText(next) || isWord(next, "system");
      boolean deeper =
          blocks.column(next) > column || blocks.lineOf(next) == blocks.lineOf(head.end());
      if (over || !deeper && (!opened || isDeclaration(next))) {
        boolean closes = !over && next.kind() == TokenKind.CLOSE_BRACE;
        boolean alone = !inSystem && !blocks.isInnerLoop();
        if (closes && (alone || blocks.column(next) == column)) {
          return lines.next().end().end();
        }
        if (opened && !openLoopReported) {
          blocks.reportOpenLoop(head);
          openLoopReported = over;
        }
        return end;
      }
      StatementLine line = take();
      if (!line.tokens().isEmpty()) {
        Statement statement = statement(line);
        body.add(statement);
        end = Math.max(end, statement.span().end());
      } else if (line.opensBlock()) {
        strayBlock(line);
      }
      if (last.closesBlock()) {
        return last.end().end();
      }
    }
  }

  private boolean isDeclaration(Token token) {
    return token.kind() == TokenKind.STATEMENT_WORD
        && switch (text(token)) {
          case "for", "require", "transfer", "row" -> false;
          default -> true;
        };
  }

  private void strayBlock(StatementLine line) {
    problem(
        ProblemKind.WORD_UNEXPECTED,
        line.end().span(),
        "A block belongs to the statement before it: remove the brace or write the statement.");
    blocks.skip();
  }

  /** Reads statements up to the closing brace and returns the offset behind it. */
  private int body(Name system, List<Statement> body) {
    int end = system.span().end();
    while (true) {
      Token next = lines.peek();
      boolean over = isEndOfText(next);
      if (over || isWord(next, "system")) {
        if (!openLoopReported) {
          problem(
              ProblemKind.BRACE_MISSING,
              system.span(),
              "The system "
                  + system.text()
                  + " is not closed: write \"}\" behind its last statement.",
              Fix.insert("Insert }", end, "\n}"));
        }
        openLoopReported = false;
        return end;
      }
      StatementLine line = take();
      if (!line.tokens().isEmpty()) {
        Statement statement = statement(line);
        body.add(statement);
        end = Math.max(end, statement.span().end());
      } else if (line.opensBlock()) {
        strayBlock(line);
      }
      if (last.closesBlock()) {
        return last.end().end();
      }
    }
  }

  private Statement statement(StatementLine line) {
    Token first = line.tokens().getFirst();
    String word = first.kind() == TokenKind.STATEMENT_WORD ? text(first) : "";
    return switch (word) {
      case "initial" -> blockStatements.initialValues(line);
      case "jump" -> blockStatements.jump(line);
      case "boundary" -> blockStatements.boundary(line);
      case "basis" -> basis(line);
      case "for" -> loop(line);
      case "matrix" -> matrix(line);
      case "table" -> table(line);
      case "row" -> strayRow(line);
      case "part" -> blockStatements.part(line);
      default -> simple(line);
    };
  }

  private Statement simple(StatementLine line) {
    StatementParser parser = new StatementParser(text, line);
    Statement statement = parser.statement();
    parser.expectNoBlock();
    note(parser.cursor());
    if (line.opensBlock()) {
      blocks.skip();
      return parser.unread();
    }
    return statement;
  }

  /**
   * {@code basis = "basis", name, ( time, [ "=", rows ] | "(", name, ")", "=", rows ) ; rows = row,
   * { row } ;} each row on a line of its own.
   */
  private Statement basis(StatementLine line) {
    StatementParser parser = new StatementParser(text, line);
    Cursor cursor = parser.cursor();
    cursor.take();
    Name name = parser.name("basis");
    Optional<Name> argument = parser.argument();
    Optional<Expression> time = parser.time();
    if (time.isEmpty() && argument.isEmpty() && !cursor.failed()) {
      cursor.failHere(
          ProblemKind.WORD_UNEXPECTED,
          "A basis has a time, as in \"basis p at 0\", or closed forms, as in \"basis c(t) =\"");
    }
    if (time.isPresent() && argument.isPresent()) {
      cursor.fail(
          ProblemKind.WORD_UNEXPECTED,
          time.get().span(),
          "Closed forms hold at every time: remove the time or the argument of the basis.");
    }
    boolean hasRows = cursor.accept(TokenKind.EQUALS);
    if (argument.isPresent() && !hasRows && !cursor.failed()) {
      cursor.failHere(
          ProblemKind.WORD_UNEXPECTED, "\"=\" belongs here, and the rows on the lines below");
    }
    if (hasRows && !cursor.atEnd()) {
      cursor.failHere(
          ProblemKind.WORD_UNEXPECTED, "The rows stand on the lines below, as in \"row x = 1, 0\"");
    }
    parser.expectEnd();
    parser.expectNoBlock();
    List<BlockLine<Row>> rows = new ArrayList<>();
    boolean allRead = true;
    Span span = line.span();
    boolean mayHaveRows = hasRows || cursor.failed();
    while (mayHaveRows && !last.closesBlock() && !last.opensBlock()) {
      if (isWord(lines.peek(), "row")) {
        take();
        Optional<Row> row = row(last);
        StatementLine rowLine = last;
        row.ifPresent(r -> rows.add(new SingleLine<>(r, rowLine.span())));
        allRead &= row.isPresent();
        span = span.join(last.span());
      } else if (lines.loopHolds("row")) {
        take();
        allRead &= rowLoop(last, rows);
        span = new Span(span.start(), last.end().end());
      } else {
        break;
      }
    }
    if (hasRows && allRead && rows.isEmpty() && !cursor.failed()) {
      cursor.fail(
          ProblemKind.WORD_UNEXPECTED,
          cursor.peek().span(),
          "The rows of the basis are missing: write a line such as \"row x = 1, 0\" for each state"
              + " below.");
    }
    note(cursor);
    if (last.opensBlock()) {
      blocks.skip();
    }
    return cursor.failed()
        ? parser.unread()
        : new BasisStatement(
            name, argument, time, hasRows, rows, allRead, line.documentation(), span);
  }

  /**
   * The rows below the first line of a statement.
   *
   * @param allRead whether each of them could be read
   * @param span the statement with its rows
   */
  private record RowLines<R>(List<R> rows, boolean allRead, Span span) {}

  private <R> RowLines<R> rows(
      StatementLine line, boolean mayFollow, Function<StatementParser, Optional<R>> reader) {
    List<R> rows = new ArrayList<>();
    boolean allRead = true;
    Span span = line.span();
    while (mayFollow && !last.closesBlock() && !last.opensBlock() && isWord(lines.peek(), "row")) {
      take();
      StatementParser parser = new StatementParser(text, last);
      Optional<R> row = reader.apply(parser);
      parser.expectNoBlock();
      note(parser.cursor());
      row.ifPresent(rows::add);
      allRead &= row.isPresent();
      span = span.join(last.span());
    }
    return new RowLines<>(rows, allRead, span);
  }

  /** A matrix with its rows, if it has any; see {@link MatrixParser}. */
  private Statement matrix(StatementLine line) {
    StatementParser parser = new StatementParser(text, line);
    MatrixParser matrix = new MatrixParser(parser);
    MatrixStatement head = matrix.head();
    boolean hasRows = head.source() instanceof MatrixRows || parser.cursor().failed();
    RowLines<MatrixRow> found = rows(line, hasRows, MatrixParser::row);
    if (hasRows && found.allRead() && found.rows().isEmpty()) {
      matrix.failWithoutRows();
    }
    note(parser.cursor());
    if (last.opensBlock()) {
      blocks.skip();
    }
    if (parser.cursor().failed()) {
      return parser.unread();
    }
    MatrixSource source = hasRows ? new MatrixRows(found.rows(), found.allRead()) : head.source();
    return new MatrixStatement(
        head.name(), head.argument(), head.unit(), source, head.documentation(), found.span());
  }

  /** A table with its rows, if it has any; see {@link TableParser}. */
  private Statement table(StatementLine line) {
    StatementParser parser = new StatementParser(text, line);
    TableParser table = new TableParser(parser);
    TableStatement head = table.head();
    boolean hasRows = head.source() instanceof TableRows || parser.cursor().failed();
    RowLines<TableRow> found = rows(line, hasRows, TableParser::row);
    if (hasRows && found.allRead() && found.rows().isEmpty()) {
      table.failWithoutRows();
    }
    note(parser.cursor());
    if (last.opensBlock()) {
      blocks.skip();
    }
    if (parser.cursor().failed()) {
      return parser.unread();
    }
    return new TableStatement(
        head.name(),
        head.argument(),
        head.unit(),
        hasRows ? new TableRows(found.rows(), found.allRead()) : head.source(),
        head.method(),
        head.extended(),
        head.documentation(),
        found.span());
  }

  private Optional<Row> row(StatementLine line) {
    StatementParser parser = new StatementParser(text, line);
    Optional<Row> row = parser.row();
    parser.expectNoBlock();
    note(parser.cursor());
    return row;
  }

  /** Reads a loop over rows and tells whether all of it could be read. */
  private boolean rowLoop(StatementLine line, List<BlockLine<Row>> rows) {
    Optional<Turns> turns = blocks.loopHead(line, true);
    blocks.enterLoop(line);
    Blocks.Block<Row> block = blocks.block(line, "row", StatementParser::row);
    blocks.leaveLoop();
    if (block.lacksBrace()) {
      blocks.reportOpenLoop(line);
    }
    Span span = block.span();
    turns.ifPresent(t -> rows.add(new RepeatedLines<>(t, block.content(), span)));
    last = closed(span.end());
    return turns.isPresent() && block.allRead();
  }

  private Statement strayRow(StatementLine line) {
    StatementParser parser = new StatementParser(text, line);
    problem(
        ProblemKind.STATEMENT_MISPLACED,
        line.span(),
        "A row belongs to the basis or matrix in the lines before it: end the first line of that"
            + " with \"=\".");
    if (line.opensBlock()) {
      blocks.skip();
    }
    return parser.unread();
  }

  private void closesNothing(Token brace) {
    problem(
        ProblemKind.BRACE_NOT_OPEN,
        brace.span(),
        "\"}\" closes nothing: remove it.",
        Fix.replace("Remove it", brace.span(), ""));
  }

  private boolean isWord(StatementLine line, String word) {
    return !line.tokens().isEmpty() && isWord(line.tokens().getFirst(), word);
  }

  private boolean isWord(Token token, String word) {
    return token.kind() == TokenKind.STATEMENT_WORD && text(token).equals(word);
  }

  private String text(Token token) {
    return token.word();
  }

  private void note(Cursor cursor) {
    cursor.problem().ifPresent(problems::add);
  }

  private void problem(ProblemKind kind, Span span, String message, Fix... fixes) {
    problems.add(new Problem(kind, span, message, List.of(fixes)));
  }
}
