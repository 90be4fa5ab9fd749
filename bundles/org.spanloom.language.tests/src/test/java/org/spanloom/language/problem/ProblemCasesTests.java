/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.problem;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.EnumSet;
import java.util.List;
import java.util.Set;
import java.util.stream.Stream;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestFactory;
import org.spanloom.language.model.Model;
import org.spanloom.language.model.ModelReader;
import org.spanloom.language.text.Position;
import org.spanloom.language.text.SourceText;

/**
 * Wrong inputs with the exact place, message and fixes. The files hold cases: a title behind {@code
 * ==}, the input, a line {@code --}, and what is found, as {@code line:column id message {fix}}. An
 * input without a system, except in system.cases, stands in the one of {@link #HEADER}, from line 2
 * on.
 */
class ProblemCasesTests {

  private static final String HEADER =
      "system S over t [s] from 0 to 10 { state x [m] = 1; x' = -x/2 [s]\n";

  private static final List<String> FILES =
      List.of(
          "text",
          "system",
          "names",
          "units",
          "linear",
          "transfers",
          "inputs",
          "jumps",
          "matrices",
          "parts",
          "switching",
          "tables",
          "families");

  private record Case(String file, String title, String input, String expected) {

    String text() {
      boolean whole = file.equals("system") || file.equals("parts") || input.contains("system ");
      return whole ? input : HEADER + input + "\n}";
    }
  }

  @TestFactory
  Stream<DynamicTest> eachCaseIsReportedExactly() {
    return cases().stream()
        .map(c ->
            DynamicTest.dynamicTest(
                c.file() + ": " + c.title(),
                () -> assertEquals(c.expected(), problems(c.text()), c.text())));
  }

  @Test
  void thereAreEnoughCases() {
    assertTrue(cases().size() >= 150, "cases: " + cases().size());
  }

  @Test
  void everyKindOfProblemHasACase() {
    // These need long texts and have tests of their own.
    Set<ProblemKind> missing =
        EnumSet.complementOf(
            EnumSet.of(
                ProblemKind.TOO_MANY_PROBLEMS,
                ProblemKind.FILE_PATH_MALFORMED,
                ProblemKind.FILE_MISSING,
                ProblemKind.FILE_OUTSIDE_PROJECT,
                ProblemKind.FILE_TOO_LARGE,
                ProblemKind.FILE_MALFORMED,
                ProblemKind.FILE_UNREADABLE,
                ProblemKind.MATRIX_TOO_LARGE,
                ProblemKind.IMPORT_TOO_DEEP,
                ProblemKind.PARTS_TOO_MANY,
                ProblemKind.NESTING_TOO_DEEP,
                ProblemKind.STATEMENT_TOO_LONG,
                ProblemKind.COEFFICIENT_UNDECIDED));
    for (Case c : cases()) {
      read(new SourceText("case.span", c.text())).problems().forEach(p -> missing.remove(p.kind()));
    }
    assertEquals(Set.of(), missing);
  }

  @Test
  void everyFixMakesItsProblemGo() {
    for (Case c : cases()) {
      SourceText source = new SourceText("case.span", c.text());
      for (Problem problem : read(source).problems()) {
        for (Fix fix : problem.fixes()) {
          String fixed = apply(source.content(), fix);
          boolean still =
              read(new SourceText("case.span", fixed)).problems().stream()
                  .anyMatch(p ->
                      p.kind() == problem.kind()
                          && p.span().start() == problem.span().start()
                          && p.message().equals(problem.message()));
          assertTrue(!still, c.title() + ": " + fix.label() + " leaves the problem in\n" + fixed);
        }
      }
    }
  }

  private static String apply(String text, Fix fix) {
    StringBuilder changed = new StringBuilder(text);
    for (TextEdit edit : fix.edits().reversed()) {
      changed.replace(edit.span().start(), edit.span().end(), edit.replacement());
    }
    return changed.toString();
  }

  private static List<Case> cases() {
    List<Case> cases = new ArrayList<>();
    for (String file : FILES) {
      for (String section : read(file).split("(?m)^== ")) {
        if (!section.isBlank()) {
          int title = section.indexOf('\n');
          int middle = section.indexOf("\n--\n");
          String input = middle > title ? section.substring(title + 1, middle) : "";
          cases.add(
              new Case(
                  file,
                  section.substring(0, title),
                  input,
                  section.substring(middle + "\n--\n".length()).strip()));
        }
      }
    }
    return cases;
  }

  private static Model read(SourceText source) {
    return ModelReader.read(source, new CaseProject(), () -> false);
  }

  private static String read(String file) {
    try (InputStream stream =
        ProblemCasesTests.class.getResourceAsStream(
            "/org/spanloom/language/problems/" + file + ".cases")) {
      return new String(stream.readAllBytes(), StandardCharsets.UTF_8);
    } catch (IOException e) {
      throw new IllegalStateException(e);
    }
  }

  private static String problems(String text) {
    SourceText source = new SourceText("case.span", text);
    StringBuilder list = new StringBuilder();
    for (Problem problem : read(source).problems()) {
      Position place = source.position(problem.span().start());
      list.append(place.line()).append(':').append(place.column()).append(' ');
      list.append(problem.kind().id()).append(' ').append(problem.message());
      problem.fixes().forEach(f -> list.append(" {").append(f.label()).append('}'));
      list.append('\n');
    }
    return list.toString().strip();
  }
}
