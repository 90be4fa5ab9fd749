/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.syntax;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.syntax.Expression.SumExpression;
import org.spanloom.language.syntax.Statement.BasisStatement;
import org.spanloom.language.syntax.Statement.EquationStatement;
import org.spanloom.language.syntax.Statement.InitialValuesStatement;
import org.spanloom.language.syntax.Statement.LetStatement;
import org.spanloom.language.syntax.Statement.ParameterStatement;
import org.spanloom.language.syntax.Statement.StateStatement;
import org.spanloom.language.syntax.Statement.SystemStatement;
import org.spanloom.language.syntax.Statement.UnreadStatement;
import org.spanloom.language.text.SourceText;

class ParserTests {

  private static SyntaxFile parse(String text) {
    return Parser.parse(new SourceText("test.span", text));
  }

  private static List<Statement> body(String text) {
    SyntaxFile file = parse("system S over t from 0 to 1 {\n" + text + "\n}");
    return ((SystemStatement) file.statements().getFirst()).body();
  }

  /** Writes an expression with all its parentheses. */
  private static String grouped(Expression expression) {
    return switch (expression) {
      case Expression.NumberExpression n ->
          n.digits() + n.unit().map(u -> "[" + u.code() + "]").orElse("");
      case Expression.NameExpression n -> n.label() + indices(n);
      case Expression.CallExpression c ->
          c.callee().label()
              + c.arguments().stream()
                  .map(a -> (a.before() ? "before " : "") + grouped(a.value()))
                  .toList();
      case Expression.SignedExpression s ->
          (s.negative() ? "(-" : "(+") + grouped(s.operand()) + ")";
      case SumExpression s -> {
        StringBuilder text = new StringBuilder("(");
        s.addends()
            .forEach(a -> text.append(a.subtracted() ? " - " : " + ").append(grouped(a.value())));
        yield text.append(")").toString();
      }
      case Expression.ProductExpression p -> {
        StringBuilder text = new StringBuilder("(");
        p.factors().forEach(f -> text.append(f.divides() ? "/" : "*").append(grouped(f.value())));
        yield text.append(")").toString();
      }
      case Expression.PowerExpression p ->
          "(" + grouped(p.base()) + "^" + grouped(p.exponent()) + ")";
      case Expression.ChoiceExpression c ->
          "(if "
              + grouped(c.condition().left())
              + " "
              + c.condition().sign()
              + " "
              + grouped(c.condition().right())
              + " then "
              + grouped(c.then())
              + " else "
              + grouped(c.otherwise())
              + ")";
      case Expression.IndexedSumExpression s -> {
        String turns = grouped(s.turns().from()) + ".." + grouped(s.turns().to());
        yield "(sum " + s.turns().index().text() + " " + turns + ": " + grouped(s.body()) + ")";
      }
      case Expression.ParenthesisedExpression p -> grouped(p.inner());
      case Expression.MissingExpression m -> "?";
    };
  }

  private static String indices(Expression.NameExpression name) {
    return name.isIndexed()
        ? name.indices().stream().map(ParserTests::grouped).toList().toString()
        : "";
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      quoteCharacter = '`',
      value = {
        "a + b*c - d|( + a + (*b*c) - d)",
        "a/b*c|(*a/b*c)",
        "-x^2|(-(x^2))",
        "a^b^c|(a^(b^c))",
        "a^-2|(a^(-2))",
        "2*-3 [m]|(*2*(-3[m]))",
        "-(a + b)*c|(*(-( + a + b))*c)",
        "x''(before 6 [h])|x''[before 6[h]]",
        "max(a, b*2)|max[a, (*b*2)]",
        "2*6 [h]|(*2*6[h])"
      })
  void operatorsBindAsInMathematics(String text, String expected) {
    LetStatement let = (LetStatement) body("let v = " + text).getFirst();
    assertEquals(expected, grouped(let.value()));
  }

  @Test
  void everyStatementIsReadBehindABrokenOne() {
    List<Statement> body =
        body("let a = 2 +\nlet b = )\nstate x = 1\nx' = (\nparameter k = 3 [m\nlet c = 4");
    assertEquals(
        List.of(
            UnreadStatement.class,
            UnreadStatement.class,
            StateStatement.class,
            UnreadStatement.class,
            UnreadStatement.class,
            LetStatement.class),
        body.stream().map(Object::getClass).toList());
    assertEquals("k", ((UnreadStatement) body.get(4)).declares().orElseThrow().text());
  }

  @Test
  void aLineGoesOnWhereItMust() {
    List<Statement> body =
        body(
            "  x' = a +\n"
                + "    b   # remark\n"
                + "    *c\n"
                + "  y' = max(a,\n\n"
                + "    b)\n"
                + "  let k = (1 +\n"
                + "    2)");
    assertEquals(4, body.size());
    assertInstanceOf(UnreadStatement.class, body.get(1));
    assertInstanceOf(EquationStatement.class, body.get(2));
    assertEquals("( + 1 + 2)", grouped(((LetStatement) body.get(3)).value()));
  }

  @Test
  void aLineNeverGoesOnPastALineAsFarLeft() {
    List<Statement> body = body("  let a = (1 +\n  b' = 2\n  let c = (2 +\n    parameter d = 3");
    assertEquals(4, body.size());
    assertInstanceOf(EquationStatement.class, body.get(1));
    assertInstanceOf(ParameterStatement.class, body.get(3));
  }

  @Test
  void aBlockEndsBeforeAWordThatBeginsAStatement() {
    List<Statement> body = body("initial values w { a = 1; b = 2\nstate x = 1");
    InitialValuesStatement values = (InitialValuesStatement) body.get(0);
    assertEquals(2, values.settings().size());
    assertInstanceOf(StateStatement.class, body.get(1));
  }

  @Test
  void aBraceBehindTheLastRowClosesTheSystem() {
    SyntaxFile file =
        parse("system A over t {\nbasis s at 0 =\n row x = 1, 0\n row y = 0, 1 }\nparameter p = 1");
    assertTrue(file.problems().isEmpty(), file.problems().toString());
    assertEquals(2, file.statements().size());
    SystemStatement system = (SystemStatement) file.statements().getFirst();
    assertEquals(2, ((BasisStatement) system.body().getFirst()).rows().size());
  }

  @Test
  void documentationBelongsToItsLineOrTheNextDeclaration() {
    List<Statement> body =
        body(
            "## first\n"
                + "## second\n"
                + "parameter a = 1 ## third\n\n"
                + "parameter b = 2\n"
                + "state x = 1 ## fourth");
    assertEquals("first\nsecond\nthird", ((ParameterStatement) body.get(0)).documentation());
    assertEquals("", ((ParameterStatement) body.get(1)).documentation());
    assertEquals("fourth", ((StateStatement) body.get(2)).documentation());
  }

  @Test
  void spansAreExact() {
    String text = "system S over t {\n  let  k [m] = 2*a # c\n}";
    SyntaxFile file = parse(text);
    SystemStatement system = (SystemStatement) file.statements().getFirst();
    LetStatement let = (LetStatement) system.body().getFirst();
    assertEquals("let  k [m] = 2*a", file.source().slice(let.span()));
    assertEquals("k", file.source().slice(let.name().span()));
    assertEquals("[m]", file.source().slice(let.unit().orElseThrow().span()));
    assertEquals("2*a", file.source().slice(let.value().span()));
    assertEquals(text, file.source().slice(system.span()));
  }

  @ParameterizedTest
  @CsvSource({"(", "-", "2^", "sin("})
  void deepNestingIsAProblemAndNoOverflow(String piece) {
    SyntaxFile file = parse("system S over t { let a = " + piece.repeat(400_000) + "1\n}");
    assertEquals(
        List.of(ProblemKind.NESTING_TOO_DEEP),
        file.problems().stream().map(p -> p.kind()).toList());
  }

  @ParameterizedTest
  @ValueSource(strings = {"", "jump at 1 {\n", "basis p at 0 =\n"})
  void loopsInLoopsAreReadTwentyDeepAndFurtherOnesAreOneProblem(String head) {
    String line = head.startsWith("jump") ? "x becomes 2" : head.isEmpty() ? "x' = 1" : "row x = 1";
    String end = head.startsWith("jump") ? "\n}" : "";
    String loop = "for i from 1 to 2 { ";
    String sound = head + loop.repeat(20) + line + " }".repeat(20) + end + "\nlet b = 1";
    assertEquals(List.of(), parse(sound).problems());
    SyntaxFile file =
        parse(head + loop.repeat(50_000) + line + " }".repeat(50_000) + end + "\nlet b = 1");
    assertEquals(
        List.of(
            "Loops stand in one another at most 20 deep, and this one is deeper: write it outside"
                + " of the others."),
        file.problems().stream().map(p -> p.message()).distinct().toList());
    assertEquals((head + loop.repeat(20)).length(), file.problems().getFirst().span().start());
    assertInstanceOf(LetStatement.class, file.statements().getLast());
    SyntaxFile open = parse(head + loop.repeat(50_000) + line);
    assertTrue(open.problems().size() <= 3, open.problems().toString());
  }

  @Test
  void statementsBeyondTheLimitAreOneProblemAndTheNextIsRead() {
    SyntaxFile file = parse("let a = 1" + " + 1".repeat(500_000) + "\nlet b = 1");
    assertEquals(
        List.of(
            "The statement has 1000004 words, numbers and signs, more than the limit of 1000000:"
                + " name parts of it with let, or divide it."),
        file.problems().stream().map(p -> p.message()).toList());
    assertEquals(2, file.statements().size());
  }

  @Test
  void longSumsAreNoProblem() {
    SyntaxFile file = parse("let a = 1" + " + 1".repeat(200_000));
    LetStatement let = (LetStatement) file.statements().getFirst();
    assertEquals(200_001, ((SumExpression) let.value()).addends().size());
  }
}
