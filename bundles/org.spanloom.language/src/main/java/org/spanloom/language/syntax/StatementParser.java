/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.syntax;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.spanloom.language.problem.Fix;
import org.spanloom.language.problem.Nearest;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.syntax.Expression.NameExpression;
import org.spanloom.language.syntax.OverClause.Bound;
import org.spanloom.language.syntax.Statement.AccuracyStatement;
import org.spanloom.language.syntax.Statement.Change;
import org.spanloom.language.syntax.Statement.Condition;
import org.spanloom.language.syntax.Statement.EquationStatement;
import org.spanloom.language.syntax.Statement.ImportStatement;
import org.spanloom.language.syntax.Statement.InputStatement;
import org.spanloom.language.syntax.Statement.JumpTime;
import org.spanloom.language.syntax.Statement.LetStatement;
import org.spanloom.language.syntax.Statement.OutputStatement;
import org.spanloom.language.syntax.Statement.ParameterStatement;
import org.spanloom.language.syntax.Statement.PartStatement;
import org.spanloom.language.syntax.Statement.RequireStatement;
import org.spanloom.language.syntax.Statement.Row;
import org.spanloom.language.syntax.Statement.Setting;
import org.spanloom.language.syntax.Statement.StateStatement;
import org.spanloom.language.syntax.Statement.TransferEnd;
import org.spanloom.language.syntax.Statement.TransferStatement;
import org.spanloom.language.syntax.Statement.Uncertainty;
import org.spanloom.language.syntax.Statement.UnreadStatement;
import org.spanloom.language.text.Span;

/**
 * Reads statements of one line and the first lines of blocks; each method carries its rule in EBNF
 * (ISO/IEC 14977). After a problem the rest of the line is skipped.
 */
final class StatementParser {

  private final Cursor cursor;
  private final ExpressionParser expressions;
  private final StatementLine line;

  StatementParser(String text, StatementLine line) {
    this.line = line;
    this.cursor = new Cursor(text, line);
    this.expressions = new ExpressionParser(cursor);
  }

  Cursor cursor() {
    return cursor;
  }

  ExpressionParser expressions() {
    return expressions;
  }

  StatementLine line() {
    return line;
  }

  /**
   * {@code simple statement = import | parameter | let | input | state | output | require |
   * accuracy | transfer | equation ;} for any other word see {@link Parser}.
   */
  Statement statement() {
    String word = firstWord();
    Statement statement =
        switch (word) {
          case "parameter" -> parameter();
          case "let" -> let();
          case "input" -> input();
          case "state" -> state();
          case "output" -> output();
          case "require" -> require();
          case "accuracy" -> accuracy();
          case "transfer" -> transfer();
          case "import" -> importOfFile();
          default -> equation();
        };
    expectEnd();
    return cursor.failed() ? unread() : statement;
  }

  /** Returns the line as one that could not be read, with the name it declares if there is one. */
  UnreadStatement unread() {
    String word = firstWord();
    int place = word.equals("initial") ? 2 : 1;
    boolean declares =
        !word.isEmpty()
            && !word.equals("row")
            && !word.equals("require")
            && !word.equals("transfer")
            && !word.equals("import")
            && !word.equals("jump")
            && line.tokens().size() > place
            && line.tokens().get(place).kind().isName();
    Optional<Name> name =
        declares ? Optional.of(nameOf(line.tokens().get(place))) : Optional.empty();
    return new UnreadStatement(word, cursor.text(line.span()), name, line.span());
  }

  private String firstWord() {
    Token first = line.tokens().getFirst();
    return first.kind() == TokenKind.STATEMENT_WORD ? cursor.text(first) : "";
  }

  /** {@code parameter = "parameter", name, [ unit ], "=", expression, [ uncertainty ] ;} */
  private Statement parameter() {
    cursor.take();
    Name name = name("parameter");
    Optional<UnitText> unit = unit();
    equalsSign();
    Expression value = expressions.expression();
    Optional<Uncertainty> uncertainty =
        cursor.is(TokenKind.PLUS_MINUS) ? Optional.of(uncertainty()) : Optional.empty();
    return new ParameterStatement(
        name, unit, value, uncertainty, line.documentation(), line.span());
  }

  /** {@code uncertainty = ( "±" | "+/-" ), expression, [ "%" ] ;} */
  private Uncertainty uncertainty() {
    int start = cursor.take().start();
    Expression halfWidth = expressions.expression();
    boolean percent = cursor.accept(TokenKind.PERCENT);
    return new Uncertainty(halfWidth, percent, cursor.from(start));
  }

  /** {@code let = "let", name, [ "(", name, ")" ], [ unit ], "=", expression ;} */
  private Statement let() {
    cursor.take();
    Name name = name("named expression");
    Optional<Name> argument = argument();
    Optional<UnitText> unit = unit();
    equalsSign();
    return new LetStatement(
        name, argument, unit, expressions.expression(), line.documentation(), line.span());
  }

  /** {@code input = "input", name, "(", name, ")", [ unit ], "=", expression ;} */
  private Statement input() {
    cursor.take();
    Name name = name("input");
    Optional<Name> argument = argument();
    if (argument.isEmpty() && !cursor.failed()) {
      cursor.failHere(
          ProblemKind.WORD_UNEXPECTED,
          "An input is a function of the independent variable: \"(t)\" or the like belongs here");
    }
    Optional<UnitText> unit = unit();
    equalsSign();
    Expression value = expressions.expression();
    return new InputStatement(
        name, argument.orElse(name), unit, value, line.documentation(), line.span());
  }

  /**
   * {@code state = "state", name, [ ranges | primes ], [ unit ], [ "=", expression ], [ "scale",
   * expression ] ;}
   */
  private Statement state() {
    cursor.take();
    Name name = name("state");
    List<IndexRange> ranges = cursor.is(TokenKind.INDEX_RANGE) ? ranges() : List.of();
    int primes = cursor.is(TokenKind.PRIMES) ? cursor.take().span().length() : 0;
    if (primes > 0 && !ranges.isEmpty()) {
      Span range = new Span(name.span().end(), ranges.getLast().span().end() + 1);
      cursor.fail(
          ProblemKind.WORD_UNEXPECTED,
          range,
          "The range stands in the declaration of the family itself: write state "
              + name.text()
              + "' for its derivative.",
          Fix.replace("Remove the range", range, ""));
    }
    Optional<UnitText> unit = unit();
    Optional<Expression> initial =
        cursor.accept(TokenKind.EQUALS) ? Optional.of(expressions.expression()) : Optional.empty();
    Optional<Expression> scale =
        cursor.acceptWord("scale") ? Optional.of(expressions.expression()) : Optional.empty();
    return new StateStatement(
        name, ranges, primes, unit, initial, scale, line.documentation(), line.span());
  }

  /**
   * {@code ranges = "[", range, [ ",", range ], "]" ; range = expression, "..", expression ;} read
   * as one token.
   */
  private List<IndexRange> ranges() {
    Span token = cursor.take().span();
    Cursor inner = cursor.inside(new Span(token.start() + 1, token.end() - 1));
    ExpressionParser bounds = new ExpressionParser(inner);
    List<IndexRange> ranges = new ArrayList<>();
    do {
      int start = inner.peek().start();
      Expression from = bounds.expression();
      if (!inner.failed() && !inner.accept(TokenKind.RANGE)) {
        inner.failHere(ProblemKind.WORD_UNEXPECTED, "\"..\" and the last index belong here");
      }
      Expression to = bounds.expression();
      ranges.add(new IndexRange(from, to, inner.from(start)));
    } while (inner.accept(TokenKind.COMMA));
    if (!inner.failed() && ranges.size() > 2) {
      inner.fail(
          ProblemKind.WORD_UNEXPECTED,
          token,
          "A family has one or two index ranges, not " + ranges.size() + ": remove some.");
    }
    if (!inner.failed() && !inner.atEnd()) {
      inner.failHere(ProblemKind.WORD_UNEXPECTED, "The index range should end here");
    }
    inner.problem().ifPresent(cursor::fail);
    return ranges;
  }

  /** {@code output = "output", name, [ unit ], "=", expression ;} */
  private Statement output() {
    cursor.take();
    Name name = name("output");
    Optional<UnitText> unit = unit();
    equalsSign();
    return new OutputStatement(
        name, unit, expressions.expression(), line.documentation(), line.span());
  }

  /** {@code require = "require", clause ;} */
  private Statement require() {
    cursor.take();
    return new RequireStatement(
        new RequireParser(cursor, expressions).clause(), line.documentation(), line.span());
  }

  /** {@code accuracy = "accuracy", expression ;} */
  private Statement accuracy() {
    cursor.take();
    return new AccuracyStatement(expressions.expression(), line.span());
  }

  /** {@code transfer = "transfer", end, "->", end, "=", expression ;} */
  private Statement transfer() {
    cursor.take();
    TransferEnd from = transferEnd("The state it comes from belongs here, or \"outside\"");
    if (!cursor.failed() && !cursor.accept(TokenKind.ARROW)) {
      cursor.failHere(ProblemKind.WORD_UNEXPECTED, "\"->\" and the state it goes to belong here");
    }
    TransferEnd to = transferEnd("The state it goes to belongs here, or \"outside\"");
    equalsSign();
    Expression flow = expressions.expression();
    return new TransferStatement(from, to, flow, line.documentation(), line.span());
  }

  /** {@code transfer end = name, [ indices ] | "outside" ;} */
  private TransferEnd transferEnd(String expected) {
    if (cursor.isWord("outside")) {
      return new TransferEnd(Optional.empty(), cursor.take().span());
    }
    NameExpression state = target(expected);
    return new TransferEnd(Optional.of(state), state.span());
  }

  /** {@code equation = expression, "=", expression ;} */
  private Statement equation() {
    if (failMisspeltWord()) {
      return unread();
    }
    Expression left = expressions.expression();
    if (!cursor.failed() && cursor.atEnd()) {
      cursor.fail(
          ProblemKind.STATEMENT_UNKNOWN,
          line.span(),
          "This line is neither a statement nor an equation: an equation has one \"=\", and every"
              + " other statement begins with its word, such as state or require.");
    }
    if (!cursor.failed() && !cursor.accept(TokenKind.EQUALS)) {
      expressions.failOperator("An operator or \"=\" belongs here");
    }
    Expression right = expressions.expression();
    return new EquationStatement(left, right, line.documentation(), line.span());
  }

  /** Two names in a row at the start can only be a statement whose word is misspelt. */
  private boolean failMisspeltWord() {
    Token first = cursor.peek();
    boolean sum = cursor.isWord("sum") && cursor.isWordAfter("over");
    if (sum || !first.kind().isName() || !cursor.kindAfter().isWord()) {
      return false;
    }
    if (cursor.isWordAfter("becomes")) {
      cursor.fail(
          ProblemKind.STATEMENT_MISPLACED,
          line.span(),
          "A state changes at once in a jump only: write jump at TIME { ... } around this line.");
      return true;
    }
    String word = cursor.text(first);
    Optional<String> meant = Nearest.of(word, Words.STATEMENT);
    cursor.fail(
        ProblemKind.STATEMENT_UNKNOWN,
        first.span(),
        "No statement begins with \""
            + word
            + "\""
            + meant
                .map(m -> ": did you mean " + m + "?")
                .orElse(
                    ": write an equation, or one of system, parameter, let, input, state, output,"
                        + " transfer, jump, initial values, boundary, basis, require and"
                        + " accuracy."),
        meant.stream().map(m -> Fix.replace("Write " + m, first.span(), m)).toArray(Fix[]::new));
    return true;
  }

  /** {@code system header = "system", name, over ;} before the opening brace. */
  Optional<OverClause> systemHeader() {
    if (!cursor.isWord("over")) {
      cursor.failHere(
          ProblemKind.WORD_UNEXPECTED,
          "A system names its independent variable and its interval, as in \"over t [h] from 0 to"
              + " 48\"");
      return Optional.empty();
    }
    OverClause over = over();
    expectEnd();
    return cursor.failed() && over.name().text().isEmpty() ? Optional.empty() : Optional.of(over);
  }

  /**
   * {@code over = "over", name, [ unit ], [ ( "from" | "after" ), expression ], [ ( "to" | "before"
   * ), expression ] ;}
   */
  private OverClause over() {
    int start = cursor.take().start();
    Name name = name("independent variable");
    Optional<UnitText> unit = unit();
    Optional<Bound> left = bound("from", "after");
    Optional<Bound> right = bound("to", "before");
    return new OverClause(name, unit, left, right, cursor.from(start));
  }

  private Optional<Bound> bound(String closed, String open) {
    boolean isOpen = cursor.isWord(open);
    if (cursor.failed() || !isOpen && !cursor.isWord(closed)) {
      return Optional.empty();
    }
    int start = cursor.take().start();
    Expression value = expressions.expression();
    return Optional.of(new Bound(value, isOpen, cursor.from(start)));
  }

  /** {@code time = "at", expression ;} */
  Optional<Expression> time() {
    return cursor.acceptWord("at") ? Optional.of(expressions.expression()) : Optional.empty();
  }

  /** {@code loop head = "for", turns ;} before the opening brace. */
  Turns loopHead() {
    cursor.take();
    Turns turns = expressions.turns();
    expectEnd();
    return turns;
  }

  /** {@code setting = target, "=", expression ;} */
  Optional<Setting> setting() {
    NameExpression target = target("The name of a state belongs here, as in \"T = 293\"");
    equalsSign();
    Expression value = expressions.expression();
    expectEnd();
    return cursor.failed()
        ? Optional.empty()
        : Optional.of(new Setting(target, value, line.span()));
  }

  /**
   * {@code jump = "jump", ( time | repetition ), "{", { change, ( ";" | line end ) }, "}" ;} before
   * the brace; {@code repetition = "every", expression, "from", expression, "to", expression ;}.
   */
  JumpTime jumpTime() {
    cursor.take();
    int start = cursor.peek().start();
    if (cursor.acceptWord("at")) {
      return new JumpTime.Once(expressions.expression(), cursor.from(start));
    }
    if (!cursor.acceptWord("every")) {
      cursor.failHere(
          ProblemKind.WORD_UNEXPECTED,
          "A jump has a time, as in \"at 6\", or a period, as in \"every 8 from 0 to 40\"");
    }
    Expression period = expressions.expression();
    Expression first = repetition("from", "time of the first jump");
    Expression last = repetition("to", "time of the last jump");
    return new JumpTime.Repeated(period, first, last, cursor.from(start));
  }

  private Expression repetition(String word, String what) {
    if (!cursor.failed() && !cursor.acceptWord(word)) {
      cursor.failHere(
          ProblemKind.WORD_UNEXPECTED, "\"" + word + "\" and the " + what + " belong here");
    }
    return expressions.expression();
  }

  /** {@code change = target, "becomes", expression ;} */
  Optional<Change> change() {
    NameExpression target =
        target("The name of a state belongs here, as in \"gut becomes gut + 250\"");
    if (!cursor.failed() && !cursor.acceptWord("becomes")) {
      boolean equals = cursor.is(TokenKind.EQUALS);
      cursor.failHere(
          ProblemKind.WORD_UNEXPECTED,
          "\"becomes\" belongs here",
          equals
              ? new Fix[] {Fix.replace("Write becomes", cursor.peek().span(), "becomes")}
              : new Fix[0]);
    }
    Expression value = expressions.expression();
    expectEnd();
    return cursor.failed() ? Optional.empty() : Optional.of(new Change(target, value, line.span()));
  }

  /** {@code condition = expression, "=", expression ;} in the block of a boundary. */
  Optional<Condition> condition() {
    Expression left = expressions.expression();
    if (!cursor.failed() && !cursor.accept(TokenKind.EQUALS)) {
      expressions.failOperator("An operator or \"=\" belongs here");
    }
    Expression right = expressions.expression();
    expectEnd();
    return cursor.failed()
        ? Optional.empty()
        : Optional.of(new Condition(left, right, line.span()));
  }

  /** {@code row = "row", target, "=", expression, { ",", expression } ;} */
  Optional<Row> row() {
    cursor.take();
    NameExpression target = target("The name of a state belongs here, as in \"row x = 1, 0\"");
    equalsSign();
    List<Expression> values = new ArrayList<>();
    do {
      values.add(expressions.expression());
    } while (cursor.accept(TokenKind.COMMA));
    expectEnd();
    return cursor.failed() ? Optional.empty() : Optional.of(new Row(target, values, line.span()));
  }

  /** {@code import = "import", text ;} */
  private Statement importOfFile() {
    cursor.take();
    QuotedText path = quoted("The path of a file belongs here, as in import \"materials.span\"");
    if (!cursor.failed() && !cursor.atEnd()) {
      cursor.failHere(ProblemKind.WORD_UNEXPECTED, "The statement should end here");
    }
    return new ImportStatement(path, line.span());
  }

  /** {@code part = "part", name, "=", name, [ "{", ... "}" ] ;} before the opening brace. */
  PartStatement part() {
    cursor.take();
    Name name = name("part");
    equalsSign();
    Name system = cursor.failed() ? name : name("system");
    expectEnd();
    return new PartStatement(
        name, system, List.of(), true, line.documentation(), line.span(), line.span());
  }

  /** {@code binding = name, [ primes ], "=", expression ;} */
  Optional<Setting> binding() {
    NameExpression target = target("The name of a parameter, an input or a state of the part");
    if (!cursor.failed() && cursor.is(TokenKind.OPEN_PARENTHESIS)) {
      int open = cursor.peek().start();
      while (!cursor.atEnd() && !cursor.is(TokenKind.EQUALS)) {
        cursor.take();
      }
      Span arguments = cursor.from(open);
      cursor.fail(
          ProblemKind.WORD_UNEXPECTED,
          arguments,
          "An input is bound by its name alone, as in "
              + target.label()
              + " = upper.T: remove the parentheses.",
          Fix.replace("Remove them", arguments, ""));
    }
    equalsSign();
    Expression value = expressions.expression();
    expectEnd();
    return cursor.failed()
        ? Optional.empty()
        : Optional.of(new Setting(target, value, line.span()));
  }

  /** {@code target = name, [ indices ], [ primes ] ;} */
  private NameExpression target(String expected) {
    if (!cursor.kind().isName()) {
      cursor.failHere(ProblemKind.NAME_MISSING, expected);
      Span here = cursor.peek().span();
      return new NameExpression(new Name("", here), 0, here);
    }
    return expressions.reference();
  }

  /**
   * {@code name = letter, { letter | digit | "_" } ;} that is no reserved word; names of outputs
   * and such have no primes.
   */
  Name name(String what) {
    Token token = cursor.peek();
    if (token.kind().isName()) {
      cursor.take();
      if (!what.equals("state") && cursor.is(TokenKind.PRIMES)) {
        cursor.fail(
            ProblemKind.WORD_UNEXPECTED,
            cursor.peek().span(),
            "Primes stand on states only: remove them.",
            Fix.replace("Remove the primes", cursor.peek().span(), ""));
      }
      return nameOf(token);
    }
    if (token.kind().isWord()) {
      cursor.fail(
          ProblemKind.NAME_RESERVED,
          token.span(),
          "\""
              + cursor.text(token)
              + "\" is a word of the language and cannot name anything: choose another name.");
    } else {
      cursor.failHere(ProblemKind.NAME_MISSING, "The name of the " + what + " belongs here");
    }
    return new Name("", token.span());
  }

  private Name nameOf(Token token) {
    return new Name(cursor.text(token), token.span());
  }

  /** {@code argument = "(", name, ")" ;} the independent variable. */
  Optional<Name> argument() {
    if (!cursor.accept(TokenKind.OPEN_PARENTHESIS)) {
      return Optional.empty();
    }
    Name name = name("independent variable");
    if (!cursor.accept(TokenKind.CLOSE_PARENTHESIS)) {
      cursor.failHere(ProblemKind.PARENTHESIS_NOT_CLOSED, "\")\" belongs here");
    }
    return Optional.of(name);
  }

  Optional<UnitText> unit() {
    if (cursor.is(TokenKind.UNIT)) {
      return Optional.of(expressions.unit());
    }
    if (cursor.is(TokenKind.INDEX_RANGE)) {
      cursor.fail(
          ProblemKind.WORD_UNEXPECTED,
          cursor.peek().span(),
          "An index range stands directly behind the name of a state, as in state c[1..4] [mol]:"
              + " remove it or move it there.",
          Fix.replace("Remove it", cursor.peek().span(), ""));
    } else if (cursor.is(TokenKind.OPEN_UNIT)) {
      cursor.failBadToken();
    }
    return Optional.empty();
  }

  /**
   * {@code text = '"', { any character but '"' and line ends }, '"' ;}
   *
   * @param expected what belongs here, for a message
   */
  QuotedText quoted(String expected) {
    Token token = cursor.peek();
    if (cursor.accept(TokenKind.STRING)) {
      return new QuotedText(
          cursor.text(new Span(token.start() + 1, token.end() - 1)), token.span());
    }
    cursor.failHere(ProblemKind.WORD_UNEXPECTED, expected);
    return new QuotedText("", token.span());
  }

  void equalsSign() {
    if (!cursor.accept(TokenKind.EQUALS) && !cursor.failed()) {
      cursor.failHere(ProblemKind.WORD_UNEXPECTED, "\"=\" belongs here");
    }
  }

  /** Reports whatever stands behind a complete statement. */
  void expectEnd() {
    if (!cursor.failed() && !cursor.atEnd()) {
      expressions.failOperator("The statement should end here");
    }
  }

  /** Reports a block behind a statement that has none. */
  void expectNoBlock() {
    if (!cursor.failed() && line.opensBlock()) {
      cursor.fail(
          ProblemKind.WORD_UNEXPECTED,
          line.end().span(),
          "This statement has no block: remove the brace.",
          Fix.replace("Remove it", line.end().span(), ""));
    }
  }
}
