/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.LinkedHashMap;
import java.util.Map;
import java.util.function.IntFunction;
import java.util.function.Supplier;

/** Texts made to cost time or memory, each about something else. */
final class HostileTexts {

  private final Map<String, Supplier<String>> texts = new LinkedHashMap<>();

  private HostileTexts() {}

  /** Returns the texts by a name, each made when it is asked for. */
  static Map<String, Supplier<String>> all() {
    HostileTexts all = new HostileTexts();
    all.nesting();
    all.lengths();
    all.repetition();
    all.growth();
    all.searches();
    all.turns();
    all.tables();
    all.files();
    all.steps();
    return all.texts;
  }

  private void nesting() {
    line("parentheses, open", () -> "let a = " + "(".repeat(1_000_000));
    line("parentheses, closed", () -> "let a = " + "(".repeat(300_000) + "1" + ")".repeat(300_000));
    line("calls in calls", () -> "let a = " + "sin(".repeat(300_000) + "1");
    line("indices in indices", () -> "x' = " + "x[".repeat(300_000) + "1");
    line("signs", () -> "let a = " + "-".repeat(1_000_000) + "1");
    line("powers", () -> "let a = 2" + "^9".repeat(300_000));
    line("choices", () -> "let a(t) = " + "if t < 1 [h] then 1 else ".repeat(100_000) + "2");
    line("sums over", () -> "x' = " + "sum over i from 1 to 9 of ".repeat(100_000) + "x/1 [h]");
    line("opening braces", () -> "{".repeat(1_000_000));
    line("closing braces", () -> "}".repeat(1_000_000));
    line("loops in loops", () -> "for i from 1 to 2 { ".repeat(100_000));
    line("unit with parentheses", () -> "let a = 1 [" + "(".repeat(100_000) + "m");
  }

  private void lengths() {
    line("unit", () -> "let a = 1 [" + "m.".repeat(50_000) + "m]");
    line("unit not closed", () -> "let a = 1 [" + "m".repeat(1_000_000));
    line("power of a unit", () -> "let a = 1 [m" + "9".repeat(100_000) + "]");
    line("primes of an unknown name", () -> "y" + "'".repeat(1_000_000) + " = 1");
    line("primes of a state", () -> "x" + "'".repeat(1_000_000) + " = 1");
    line("primes of a declaration", () -> "state y" + "'".repeat(1_000_000) + " [m] = 1");
    line("name", () -> "let " + "a".repeat(1_000_000) + " = 1");
    line("digits", () -> "let a = " + "9".repeat(1_000_000));
    line("exponent", () -> "let a = 1e" + "9".repeat(1_000_000));
    line("comment", () -> "let a = 1 # " + "remark ".repeat(1_000_000));
    line("sum on one line", () -> "let a = " + "1 + ".repeat(1_000_000) + "1");
    line("product on one line", () -> "let a = " + "2*".repeat(1_000_000) + "1");
    line("row", () -> "basis s at 0 =\n row x = " + "1, ".repeat(1_000_000) + "1");
    line("quotation marks", () -> "\"".repeat(1_000_001));
    line("signs that mean nothing", () -> "§".repeat(1_000_000));
    line("half a character", () -> "\uD83D".repeat(1_000_000));
    line("blank lines", () -> "let a = (" + "\n".repeat(1_000_000));
    line("remarks in parentheses", () -> "let a = (1\n" + "  # remark\n".repeat(200_000) + "  )");
    line("argument list", () -> "let a = max(" + "1, ".repeat(1_000_000) + "1)");
  }

  private void repetition() {
    lines("statements with an error", 300_000, i -> "let = 1");
    lines("unknown names", 200_000, i -> "let a" + i + " = b" + i);
    lines("declared twice", 300_000, i -> "let a = 1");
    lines("missing equations", 100_000, i -> "state y" + i + " = 1");
    lines("rows without a basis", 300_000, i -> "row x = 1");
    lines("bases without rows", 100_000, i -> "basis s" + i + " at 0 =");
    lines("initial values not closed", 100_000, i -> "initial values w" + i + " {");
    lines("jumps not closed", 100_000, i -> "jump at 1 {");
    lines("boundaries not closed", 100_000, i -> "boundary b" + i + " {");
    lines("requirements", 50_000, i -> "require x(1) < k");
    lines("bases", 5_000, i -> "basis p" + i + " at 0");
    lines("systems in a system", 100_000, i -> "system A" + i + " over t from 0 to 1 {");
    lines("long names, misspelt", 2_000, i -> "let a" + i + " = " + "b".repeat(4_000) + i);
    lines("matrices without rows", 100_000, i -> "matrix M" + i + " =");
    lines("imports", 100_000, i -> "import \"part" + i + ".span\"");
    lines("tables without rows", 100_000, i -> "table w" + i + "(t) = linear");
    lines("unreadable lines", 100_000, i -> "let a" + i + " = x x");
    line("turns of a loop", () -> "for i from 1 to 1000000000000 { c[i]' = 1 }");
    line(
        "turns of loops in loops",
        () -> "for i from 1 to 9999 { for j from 1 to 9999 { for k from 1 to 9999 { c[i]' = 1 }}}");
    line("family", () -> "state c[1..1000000000000] = 0");
    line("family of two ranges", () -> "state c[1..1000000, 1..1000000] = 0");
    line("sum over many", () -> "x' = sum over i from 1 to 1000000000000 of x/1 [h]");
    line(
        "sums over sums",
        () ->
            "x' = sum over i from 1 to 9999 of sum over j from 1 to 9999 of sum over k from 1 to"
                + " 9999 of x/1 [h]");
    line("jumps", () -> "jump every 1e-12 from 0 to 1 { x becomes 2*x }");
    line("pulses", () -> "let a(t) = pulse(t, period = 1e-12 [h], width = 1e-13 [h])");
  }

  private void growth() {
    lines("doubling", 100_000, i -> "let a" + i + " = " + (i == 0 ? "1" : twice("a", i)));
    lines("doubling in time", 20_000, i -> "let a" + i + "(t) = " + (i == 0 ? "t" : twiceOfT(i)));
    lines("doubling outputs", 50_000, i -> "output a" + i + " = " + (i == 0 ? "x" : twice("a", i)));
    lines("functions of functions", 100_000, i -> "let a" + i + "(t) = " + nested(i));
    lines("multiplying units", 10_000, i -> "let a" + i + " = " + (i == 0 ? "2 [m]" : square(i)));
    lines("multiplying numbers", 50_000, i -> "let a" + i + " = " + (i == 0 ? "2" : square(i)));
    lines(
        "outputs of outputs",
        20_000,
        i ->
            "state y"
                + i
                + " = 1; y"
                + i
                + "' = 0; output a"
                + i
                + " = "
                + (i == 0 ? "x" : "a" + (i - 1) + " + y" + i));
    lines("circle", 100_000, i -> "let a" + i + " = a" + (i + 1) % 100_000);
    lines("squares of a matrix", 100, i -> i == 0 ? matrix(30) : powerOfMatrix(i));
    line("large matrix", () -> matrix(600));
    lines(
        "powers of polynomials",
        1_000,
        i -> "let a" + i + "(t) = " + (i == 0 ? "(1 + t/1 [h])" : square(i, "(t)")) + "^2");
  }

  private void searches() {
    lines("poles", 20_000, i -> "let z" + i + "(t) = 1/(t - 0." + i + " [h])");
    lines(
        "limits that are met",
        3_000,
        i ->
            "let z"
                + i
                + "(t) = sqrt(1 - sin(t/"
                + i
                + ".5 [h])^2 - cos(t/"
                + i
                + ".5 [h])^2 + 1e-17)");
    lines(
        "bounds too wide",
        3_000,
        i -> "let z" + i + "(t) = 1/(1.0001 - sin(9*t/1 [h])^2*sin(t/0.0" + (i + 1) + " [h])^2)");
    line("product of poles", () -> "let z(t) = " + "1/(t - 0.5 [h])*1 [h]*".repeat(900) + "1");
    line("fast wave", () -> "let z(t) = 1/sin(1e12*t/1 [h])");
    lines("corners", 2_000, i -> "let z" + i + "(t) = abs(sin(1e6*t/" + (i + 1) + " [h]))");
  }

  private void turns() {
    line("family times family", () -> "state c[1..100000] = 0\nstate d[1..100000, 1..100000] = 0");
    line("families", () -> "state c[1..60000] = 0\nstate d[1..60000] = 0");
    line("family without equations", () -> "state c[1..100000] = 0");
    line("negative range", () -> "state c[-1000000000..1000000000] = 0");
    line("index beyond all", () -> "state c[1..3] = 0\nx' = c[1000000000000000000000]");
    line(
        "long body, many turns",
        () -> "for i from 1 to 1000000 {\n" + "x' = -x/1 [h]\n".repeat(20_000) + "}");
    line(
        "long sum, many turns",
        () -> "x' = sum over i from 1 to 1000000 of (x" + " + x".repeat(20_000) + ")/1 [h]");
    line(
        "loops without equations",
        () -> "for i from 1 to 1000000 {\n" + "parameter q = 1\n".repeat(100_000) + "}");
    line(
        "values in turns",
        () -> "initial values w {\nfor i from 1 to 1000000 { " + "x = 1; ".repeat(10_000) + "}\n}");
    line(
        "rows in turns",
        () -> "basis p at 0 =\nfor i from 1 to 1000000 {\n" + "row x = 1\n".repeat(10_000) + "}");
    line("requirements in turns", () -> "for i from 1 to 1000000 { require x(1) < i }");
    lines("loops without turns", 100_000, i -> "for i from 1 to 0 { x' = 1 }");
    line("braceless loops", () -> deeper("for i from 1 to 2", 2_000));
    line("loops in values", () -> "initial values w { " + "for i from 1 to 2 { ".repeat(100_000));
    line("loops over rows", () -> "basis p at 0 =\n" + "for i from 1 to 2 { ".repeat(100_000));
    line("choices, left", () -> "let a(t) = " + "if t < 1 [h] then (".repeat(100_000) + "1");
  }

  private static String deeper(String line, int depth) {
    StringBuilder text = new StringBuilder();
    for (int i = 0; i < depth; i++) {
      text.append(" ".repeat(i)).append(line).append('\n');
    }
    return text.toString();
  }

  private void tables() {
    lines("table, rows", 100_000, i -> i == 0 ? "table w(t) = linear" : "row " + i + ", 1");
    lines("table, falling", 100_000, i -> i == 0 ? "table w(t) = hold" : "row -" + i + ", 1");
    lines(
        "table, smooth", 100_000, i -> i == 0 ? "table w(t) = monotone cubic" : "row " + i + ", 1");
    for (String file : new String[] {"endless", "rows", "rising", "commas", "quote", "heads"}) {
      line(
          "table of " + file,
          () ->
              "table w(t) = file \""
                  + file
                  + ".csv\" time \"hour\" [h] column \"air\" monotone cubic");
    }
    lines(
        "tables of one file",
        10_000,
        i -> "table w" + i + "(t) = file \"rising.csv\" time \"hour\" column \"air\" hold");
  }

  private void files() {
    for (String file : new String[] {"endless", "claims", "dense"}) {
      line("matrix of " + file, () -> "matrix M = file \"" + file + ".mtx\"");
    }
    texts.put("import of itself", () -> "import \"hostile.span\"\n");
    texts.put("import of one that imports itself", () -> "import \"self.span\"\n");
    texts.put("import in a ring", () -> "import \"ring.span\"\n");
    texts.put("import without end", () -> "import \"doubling0.span\"\n");
    texts.put("large import", () -> "import \"endless.span\"\n");
    texts.put("path upwards", () -> "import \"../../secret.span\"\n");
    texts.put("path from the root", () -> "import \"/etc/passwd\"\n");
    texts.put("path with a drive", () -> "import \"C:\\\\secret.span\"\n");
    texts.put("path that is long", () -> "import \"" + "a/".repeat(500_000) + "b.span\"\n");
    texts.put("path up and up", () -> "import \"" + "../".repeat(300_000) + "b.span\"\n");
    texts.put("parts that double", () -> doublingParts(40));
    texts.put("parts in a chain", () -> chainOfParts(5_000));
    texts.put("part of itself", () -> "system S over t from 0 to 1 { part a = S }\n");
  }

  private static String doublingParts(int count) {
    StringBuilder text = new StringBuilder();
    for (int i = 0; i < count; i++) {
      text.append("system D").append(i).append(" over t [h] from 0 to 1 { state x = 1; x' = 0; ");
      text.append("part a = D").append(i + 1).append("; part b = D").append(i + 1).append(" }\n");
    }
    return text + "system D" + count + " over t [h] from 0 to 1 { state x = 1; x' = 0 }\n";
  }

  private static String chainOfParts(int count) {
    StringBuilder text = new StringBuilder();
    for (int i = 0; i < count; i++) {
      text.append("system D").append(i).append(" over t [h] from 0 to 1 { state x = 1; x' = 0; ");
      text.append("part a = D").append(i + 1).append(" }\n");
    }
    return text + "system D" + count + " over t [h] from 0 to 1 { state x = 1; x' = 0 }\n";
  }

  private void steps() {
    line("jumps, frequent", () -> "jump every 1e-9 from 0 to 1 { x becomes 2*x }");
    lines("jumps, many", 100_000, i -> "jump at 0." + (i + 1) + " { x becomes 2*x }");
    line("jump that changes much", () -> "jump at 0.5 {\n" + "x becomes x\n".repeat(100_000) + "}");
    line(
        "jump in turns",
        () ->
            "jump at 0.5 {\nfor i from 1 to 1000000 { " + "x becomes x; ".repeat(10_000) + "}\n}");
    line(
        "boundary in turns",
        () -> "boundary b {\nfor i from 1 to 1000000 { " + "x(0) = 1; ".repeat(10_000) + "}\n}");
    line("boundary with much", () -> "boundary b {\n" + "x(0) = x(1)\n".repeat(100_000) + "}");
    lines("pulses in pulses", 2_000, i -> "let p" + i + "(t) = " + pulse(i));
  }

  private static String pulse(int i) {
    return i == 0
        ? "t"
        : "p" + (i - 1) + "(t)*pulse(t, period = 1e-" + i % 9 + " [h], width = 1e-12 [h])";
  }

  private static String twice(String name, int i) {
    return name + (i - 1) + " + " + name + (i - 1);
  }

  private static String twiceOfT(int i) {
    return "a" + (i - 1) + "(t)*0.5 + a" + (i - 1) + "(t)*0.5";
  }

  private static String nested(int i) {
    return i % 1900 == 0 ? "exp(-t/1 [h])" : "exp(-a" + (i - 1) + "(t))";
  }

  private static String square(int i) {
    return square(i, "");
  }

  private static String square(int i, String argument) {
    String one = "a" + (i - 1) + argument;
    return one + "*" + one;
  }

  private static String matrix(int n) {
    return "matrix M0 =" + ("\nrow 0" + ", 1".repeat(n - 1)).repeat(n);
  }

  private static String powerOfMatrix(int i) {
    return "matrix M" + i + " = M" + (i - 1) + "*M" + (i - 1);
  }

  private void lines(String name, int count, IntFunction<String> line) {
    line(
        name,
        () -> {
          StringBuilder text = new StringBuilder();
          for (int i = 0; i < count; i++) {
            text.append(line.apply(i)).append('\n');
          }
          return text.toString();
        });
  }

  private void line(String name, Supplier<String> body) {
    texts.put(
        name,
        () ->
            "system S over t [h] from 0 to 1 {\n  state x = 1; x' = -x/1 [h]\n"
                + body.get()
                + "\n}\n");
  }
}
