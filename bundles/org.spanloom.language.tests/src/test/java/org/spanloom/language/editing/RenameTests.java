/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.editing;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;

import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestFactory;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.spanloom.language.RecordText;
import org.spanloom.language.TestTexts;
import org.spanloom.language.files.FileKey;
import org.spanloom.language.files.ProjectFiles;
import org.spanloom.language.model.Model;
import org.spanloom.language.model.ModelReader;
import org.spanloom.language.problem.Problem;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.problem.TextEdit;
import org.spanloom.language.syntax.Parser;
import org.spanloom.language.syntax.SyntaxFile;
import org.spanloom.language.text.SourceText;

/** The caret stands where the sign | is in a text. */
class RenameTests {

  private static final String MODEL =
      """
      parameter g [m/s2] = 9.81
      ## x and m in a comment, [m] in a unit
      system Gauge over t [h] from 0 to 24 {
        parameter m [kg] = 2     # m is a mass
        let tide(t) [m] = 0.8 [m]*sin(t/2 [h])
        state x [m] = 1
        state x' [m/h] = 0
        output force [N] = 3 [N/m]*(tide(t) - x) - m*g
        m*x'' = force
        initial values x { x = 0; x' = 0 }
        basis m at 0
        require condition(m) < 1e9
        require x(1) < 3 [m] under x
        let broken = m + )
      }
      system Other over t from 0 to 1 {
        parameter m = 3
        state x = m
        x' = -m*x
      }
      """;

  private static SyntaxFile file(String text) {
    return Parser.parse(new SourceText("test.span", text));
  }

  private static String renamed(String text, int offset, String name) {
    return switch (Rename.at(file(text), offset, name)) {
      case Renaming.Changes changes ->
          TextEdit.apply(text, changes.edits().getOrDefault(FileKey.NONE, List.of()));
      case Renaming.Refused refused -> "refused: " + refused.conflicts().getFirst().message();
      case Renaming.NothingToRename nothing -> "nothing";
    };
  }

  /** Returns the lines that a renaming changes. */
  private static String changed(String mark, String name) {
    int offset = MODEL.indexOf(mark.replace("|", "")) + mark.indexOf('|');
    String after = renamed(MODEL, offset, name);
    if (after.startsWith("refused") || after.startsWith("nothing")) {
      return after;
    }
    List<String> old = MODEL.lines().toList();
    List<String> now = after.lines().toList();
    StringBuilder lines = new StringBuilder();
    for (int i = 0; i < old.size(); i++) {
      if (!old.get(i).equals(now.get(i))) {
        lines.append(now.get(i).strip()).append('\n');
      }
    }
    return lines.toString();
  }

  @Test
  void aStateIsRenamedWithItsDerivativesAndNothingElse() {
    assertEquals(
        """
        state depth [m] = 1
        state depth' [m/h] = 0
        output force [N] = 3 [N/m]*(tide(t) - depth) - m*g
        m*depth'' = force
        initial values x { depth = 0; depth' = 0 }
        require depth(1) < 3 [m] under x
        """,
        changed("state x'| [m/h]", "depth"));
  }

  @Test
  void namesOfOtherKindsAndSystemsStay() {
    assertEquals(
        """
        parameter mass [kg] = 2     # m is a mass
        output force [N] = 3 [N/m]*(tide(t) - x) - mass*g
        mass*x'' = force
        let broken = mass + )
        """,
        changed("parameter |m [kg]", "mass"));
    assertEquals(
        """
        basis p at 0
        require condition(p) < 1e9
        """,
        changed("condition(|m", "p"));
    assertEquals(
        """
        initial values rest { x = 0; x' = 0 }
        require x(1) < 3 [m] under rest
        """,
        changed("under |x", "rest"));
    assertEquals("system Mast over t [h] from 0 to 24 {\n", changed("system |Gauge", "Mast"));
  }

  @Test
  void theIndependentVariableIsRenamedInItsSystem() {
    assertEquals(
        """
        system Gauge over hours [h] from 0 to 24 {
        let tide(hours) [m] = 0.8 [m]*sin(hours/2 [h])
        output force [N] = 3 [N/m]*(tide(hours) - x) - m*g
        """,
        changed("(tide(|t", "hours"));
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "2x|\"2x\" is no name: a name is made of letters, digits and _, and does not begin with a"
            + " digit.",
        "a b|\"a b\" is no name: a name is made of letters, digits and _, and does not begin with a"
            + " digit.",
        "''|\"\" is no name: a name is made of letters, digits and _, and does not begin with a"
            + " digit.",
        "state|\"state\" is a word of the language and cannot name anything: choose another name.",
        "until|\"until\" is a word of the language and cannot name anything: choose another name.",
        "sin|\"sin\" is built in and cannot be declared: choose another name.",
        "pi|\"pi\" is built in and cannot be declared: choose another name.",
        "tide|\"tide\" is declared in line 5: choose another name.",
        "g|\"g\" is declared in line 1: choose another name.",
        "t|\"t\" is declared in line 3: choose another name."
      })
  void namesThatCannotBeAreRefused(String name, String message) {
    assertEquals("refused: " + message, changed("parameter |m [kg]", name));
  }

  @Test
  void aNameOfTheFileMustNotBeHidden() {
    assertEquals(
        "refused: \"force\" is declared in line 8: choose another name.",
        changed("parameter |g", "force"));
  }

  @Test
  void namesNobodyDeclaredStayUnknown() {
    String text = "system S over t from 0 to 1 { state x = 1; x' = -y }\n";
    assertEquals(
        "refused: \"y\" would change what \"x\" in line 1 stands for: choose another name.",
        renamed(text, text.indexOf("x ="), "y"));
  }

  @Test
  void whatHasNoNameOfTheAuthorIsNotRenamed() {
    assertEquals("nothing", changed("*s|in(", "f"));
    assertEquals("nothing", changed("|1e9", "f"));
    assertEquals("nothing", changed("[|kg]", "f"));
    assertEquals("nothing", changed("# m is a |mass", "f"));
  }

  @Test
  void theSameNameChangesNothing() {
    assertEquals("", changed("parameter |m [kg]", "m"));
  }

  private static final int LONG = 50_000;
  private static final int SOME = 397;

  @TestFactory
  Stream<DynamicTest> renamingNeverChangesMeaningOrFindings() {
    return TestTexts.all().entrySet().stream()
        .map(e -> DynamicTest.dynamicTest(e.getKey(), () -> rename(e.getValue())));
  }

  private static void rename(String text) {
    SyntaxFile file = file(text);
    Set<Symbol> all = new LinkedHashSet<>();
    Names.of(file).occurrences().forEach(o -> all.add(o.symbol()));
    // Each renaming reads the whole text again: of a long one, some names stand for the others.
    int stride = text.length() < LONG ? 1 : SOME;
    List<Symbol> declared = List.copyOf(all);
    List<Symbol> symbols =
        IntStream.range(0, declared.size())
            .filter(i -> i % stride == 0)
            .mapToObj(declared::get)
            .toList();
    boolean guesses =
        ModelReader.read(file, ProjectFiles.none(), () -> false).problems().stream()
            .anyMatch(p -> p.message().contains("did you mean"));
    String before = listing(text, guesses);
    for (Symbol symbol : symbols) {
      if (NameScope.builtIn(symbol.name()).isPresent()) {
        continue;
      }
      String name = fresh(text, symbol.name().length());
      Renaming renaming = Rename.at(file, symbol.declarations().getFirst().name().start(), name);
      Map<FileKey, List<TextEdit>> edits =
          assertInstanceOf(Renaming.Changes.class, renaming, symbol + " -> " + renaming).edits();
      String after = TextEdit.apply(text, edits.get(FileKey.NONE));
      RecordText.assertSame(
          before.replaceAll("\\b" + symbol.name() + "\\b", name),
          listing(after, guesses).replaceAll("\\b" + symbol.name() + "\\b", name),
          symbol.name() + " -> " + name);
    }
  }

  /** A name of the same length, so that messages are cut short at the same places. */
  private static String fresh(String text, int length) {
    for (int c = 'z'; c >= 'A'; c--) {
      String name = Character.toString(c).repeat(length);
      if (Character.isLetter(c) && !text.contains(name)) {
        return name;
      }
    }
    return "é".repeat(length);
  }

  /**
   * What a text means and what is wrong with it.
   *
   * @param guesses whether some problem guesses at a name by its letters; then none are listed
   */
  private static String listing(String text, boolean guesses) {
    Model model = ModelReader.read(new SourceText("test.span", text));
    StringBuilder listing = new StringBuilder(RecordText.of(model.systems()));
    for (Problem problem : guesses ? List.<Problem>of() : model.problems()) {
      // One name of two that hide each other is renamed; a number and a name quoted as one word.
      if (problem.kind() == ProblemKind.NAME_SHADOWED
          || problem.kind() == ProblemKind.OPERATOR_MISSING) {
        continue;
      }
      listing.append(problem.kind()).append(problem.span()).append(problem.message()).append('\n');
    }
    return listing.toString();
  }
}
