/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.api.Assertions.fail;

import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.spanloom.language.editing.Completion;
import org.spanloom.language.editing.Definition;
import org.spanloom.language.editing.Folding;
import org.spanloom.language.editing.Hover;
import org.spanloom.language.editing.Outline;
import org.spanloom.language.formatting.Formatter;
import org.spanloom.language.problem.Fix;
import org.spanloom.language.problem.Problem;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.problem.TextEdit;
import org.spanloom.language.syntax.Statement;
import org.spanloom.language.syntax.Statement.SystemStatement;
import org.spanloom.language.text.SourceText;
import org.spanloom.language.text.Span;

/**
 * Texts spoilt at random, the same in every run: reading them never throws, takes bounded time, and
 * whatever it says lies inside the text. Runs for some seconds; {@code -Dspanloom.fuzz.seconds=N}
 * makes it run longer.
 */
class FuzzTests {

  private static final int SECONDS = Integer.getInteger("spanloom.fuzz.seconds", 5);

  private static final String SOUND =
      """
      parameter gravity [m/s2] = 9.81 ± 0.5 %
      ## Tide gauge of the Marrow Skerry field station. Invented data.
      system Gauge over t [h] from 0 to 24 {
        parameter m [kg] = 2.5; parameter k [N/m] = 40
        parameter c [N.s/m] = 0.3 +/- 10 %   ## damping
        let tide(t) [m] = 0.8 [m]*sin(2*pi*t/12.4 [h]) + 1/(t + 1 [h])*1 [m.h]
        state x [mm] = 1 scale 10
        state x' [mm/s] = 0
        state T [Cel] = 12
        output force [N] = k*(tide(t) - x)
        m*x'' + c*x' = force - m*gravity*0.01
        T' = (20 [Cel] - T)/3 [h]
        initial values rest at 0 { x = 0; x' = 0; T = 10 }
        basis p at 0
        basis s at 1 =
          row x = 1, 0, 0
          row x' = 0, 1, 0
          row T = 0, 0, 1
        basis q(t) =
          row x = exp(-t/1 [h])*1 [mm], 0, 0
          row x' = 0, 1, 0
          row T = 0, 0, exp(-t/3 [h])*1 [K]
        require condition(p) < 1e9 until 1 [h]
        require x(before 12) < 3 [m] under rest
        require T < 30 [Cel] throughout until 20
        require stable
        require invariant x + 2*x
        accuracy 1e-7
      }
      """;

  private static final List<String> PIECES =
      List.of(
          "(",
          ")",
          "[",
          "]",
          "{",
          "}",
          "'",
          "\"",
          "#",
          "##",
          ";",
          ",",
          "=",
          "+",
          "-",
          "*",
          "/",
          "^",
          "<",
          "..",
          ".",
          "±",
          "%",
          "->",
          "\n",
          "\r\n",
          "\t",
          "1e400",
          "1e-400",
          "0",
          "1",
          ".5",
          "2^3^4",
          "t",
          "x",
          "x'",
          "x''",
          "T",
          "k",
          "system ",
          "state ",
          "let ",
          "row ",
          "basis ",
          "require ",
          "initial values ",
          "at ",
          "over ",
          "from ",
          "until ",
          "under ",
          "scale ",
          "if ",
          "for ",
          "table ",
          "matrix ",
          " [m]",
          " [Cel]",
          " [",
          "[1..3]",
          "exp(",
          "log(",
          "sqrt(",
          "tan(",
          "max(",
          "condition(",
          "§",
          "\u0000",
          "\uD83D",
          "é",
          "−",
          "((((((((",
          "--------",
          "1/0",
          "t/t",
          "1/(t - 3 [h])",
          "pi",
          "9e99",
          "^9e99",
          "[10*400]");

  @Test
  void spoiltTextsAreReadAllTheSame() {
    assertEquals(
        List.of(), ModelListing.read(SOUND).problems().stream().map(Problem::message).toList());
    Random random = new Random(4711);
    long end = System.nanoTime() + SECONDS * 1_000_000_000L;
    int rounds = 0;
    while (System.nanoTime() < end) {
      String text = spoilt(random);
      long start = System.nanoTime();
      try {
        check(text, random);
      } catch (RuntimeException | StackOverflowError e) {
        fail("after " + rounds + " rounds in\n" + text, e);
      }
      double seconds = (System.nanoTime() - start) / 1e9;
      assertTrue(seconds < 20, seconds + " s for\n" + text);
      rounds++;
    }
    assertTrue(rounds > 20, "rounds: " + rounds);
  }

  private static String spoilt(Random random) {
    StringBuilder text = new StringBuilder(SOUND);
    int changes = 1 + random.nextInt(random.nextInt(4) == 0 ? 40 : 4);
    for (int i = 0; i < changes; i++) {
      int at = random.nextInt(text.length() + 1);
      int length = Math.min(random.nextInt(12), text.length() - at);
      switch (random.nextInt(6)) {
        case 0 -> text.delete(at, at + length);
        case 1 -> text.insert(at, PIECES.get(random.nextInt(PIECES.size())));
        case 2 -> text.replace(at, at + length, PIECES.get(random.nextInt(PIECES.size())));
        case 3 -> text.insert(at, text.substring(at, at + length).repeat(1 + random.nextInt(3)));
        case 4 -> {
          int from = random.nextInt(text.length() + 1);
          int to = Math.min(text.length(), from + random.nextInt(60));
          text.insert(at, text.substring(from, to));
        }
        default -> {
          if (random.nextInt(10) == 0) {
            text.setLength(at);
          }
        }
      }
    }
    return text.toString();
  }

  private static void check(String text, Random random) {
    SourceText source = new SourceText("fuzz.span", text);
    Model model = ModelReader.read(source);
    Span whole = new Span(0, text.length());
    int last = 0;
    for (Problem problem : model.problems()) {
      assertTrue(whole.contains(problem.span()), problem.toString());
      assertTrue(problem.span().start() >= last, "not in the order of the text");
      assertTrue(problem.message().length() < 1000, problem.message());
      last = problem.span().start();
      for (Fix fix : problem.fixes()) {
        for (TextEdit edit : fix.edits()) {
          assertTrue(whole.contains(edit.span()), problem.toString());
        }
      }
    }
    statements(model.syntax().statements(), whole);
    for (SystemModel system : model.systems()) {
      if (model.isSound(system)) {
        ModelListing.equations(system);
      }
    }
    layout(model);
    Outline.of(model.syntax());
    Folding.of(model.syntax());
    for (int i = 0; i < 5; i++) {
      int offset = random.nextInt(text.length() + 1);
      Completion.at(model, offset);
      Definition.at(model, offset).ifPresent(s -> assertTrue(whole.contains(s)));
      Hover.at(model, offset).ifPresent(h -> assertTrue(whole.contains(h.span())));
    }
  }

  /** A laid out text is read as the one before, and is laid out. */
  private static void layout(Model model) {
    String laid = Formatter.format(model.syntax().source().content());
    assertEquals(laid, Formatter.format(laid));
    Model other = ModelReader.read(new SourceText("fuzz.span", laid));
    assertEquals(kinds(model), kinds(other), laid);
    for (int i = 0; i < model.systems().size(); i++) {
      SystemModel system = model.systems().get(i);
      if (model.isSound(system)) {
        assertEquals(
            ModelListing.equations(system), ModelListing.equations(other.systems().get(i)), laid);
      }
    }
  }

  private static List<ProblemKind> kinds(Model model) {
    return model.problems().stream().map(Problem::kind).toList();
  }

  private static void statements(List<Statement> statements, Span around) {
    int last = around.start();
    for (Statement statement : statements) {
      Span span = statement.span();
      assertTrue(around.contains(span) && span.start() >= last, statement.toString());
      last = span.start();
      if (statement instanceof SystemStatement system) {
        statements(system.body(), span);
      }
    }
  }

  @Test
  void twentyThousandLinesAreReadFast() {
    StringBuilder text = new StringBuilder("system Chain over t [h] from 0 to 10 {\n");
    int n = 5000;
    for (int i = 0; i < n; i++) {
      text.append("  parameter C")
          .append(i)
          .append(" [kJ/K] = ")
          .append(10 + i % 7)
          .append("  ## heat capacity\n");
      text.append("  parameter g")
          .append(i)
          .append(" [W/K] = ")
          .append(1 + i % 5)
          .append(" ± 5 %\n");
      text.append("  state T").append(i).append(" [K] = ").append(280 + i % 9).append("\n");
      text.append("  C").append(i).append("*T").append(i).append("' = g").append(i);
      text.append("*(T")
          .append((i + 1) % n)
          .append(" - T")
          .append(i)
          .append(") + 2 [W]*exp(-t/1 [h])\n");
    }
    text.append("}\n");
    long start = System.nanoTime();
    SystemModel system = ModelListing.system(text.toString());
    double seconds = (System.nanoTime() - start) / 1e9;
    assertEquals(n, system.equations().orElseThrow().dimension());
    assertTrue(seconds < 30, seconds + " s");
  }
}
