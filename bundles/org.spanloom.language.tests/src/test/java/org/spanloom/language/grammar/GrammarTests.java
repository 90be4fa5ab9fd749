/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.grammar;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestFactory;
import org.spanloom.language.TestTexts;
import org.spanloom.language.formatting.LayoutPropertyTests;
import org.spanloom.language.formatting.PrinterTests;
import org.spanloom.language.syntax.Parser;
import org.spanloom.language.syntax.SyntaxFile;
import org.spanloom.language.text.SourceText;

/** The grammar of the help is the language that the parser reads. */
class GrammarTests {

  private static final Grammar GRAMMAR = Grammar.ofTheHelp();

  private static final int SENTENCES = 4000;

  private static SyntaxFile parse(String text) {
    return Parser.parse(new SourceText("test.span", text));
  }

  private static List<String> messages(String text) {
    return parse(text).problems().stream().map(p -> p.message()).toList();
  }

  @Test
  void everySentenceIsRead() {
    Sentences sentences = new Sentences(GRAMMAR, 20261201, 14);
    int longest = 0;
    for (int i = 0; i < SENTENCES; i++) {
      String text = sentences.sentence("statement");
      longest = Math.max(longest, text.length());
      assertEquals(List.of(), parse(text).problems().stream().map(p -> p.message()).toList(), text);
    }
    assertTrue(longest > 1000, "longest: " + longest);
  }

  @Test
  void everySentenceIsPrintedAsItWasRead() {
    Sentences sentences = new Sentences(GRAMMAR, 19770101, 12);
    for (int i = 0; i < SENTENCES / 4; i++) {
      String text = sentences.sentence("file");
      assertEquals(List.of(), messages(text), text);
      PrinterTests.assertPrintsItself(parse(text), text);
      LayoutPropertyTests.assertChangesBlanksOnly(text);
    }
  }

  @Test
  void theReaderOfTheGrammarTellsWhatIsWrong() {
    assertThrows(IllegalStateException.class, () -> Grammar.of("a = \"b\""));
    assertThrows(IllegalStateException.class, () -> Grammar.of("a = , ;"));
    assertThrows(IllegalStateException.class, () -> Grammar.of("a = \"b\" ; a = \"c\" ;"));
    assertThrows(IllegalStateException.class, () -> Grammar.of("a = \"b\" @ ;"));
  }

  /**
   * The recogniser goes as deep as a text has statements, so a generated one is too long for it.
   */
  private static Map<String, String> examples() {
    Map<String, String> texts = new LinkedHashMap<>(TestTexts.models());
    texts.values().removeIf(text -> text.length() > 50_000);
    return texts;
  }

  @TestFactory
  List<DynamicTest> everyExampleFollowsTheGrammar() {
    return examples().entrySet().stream()
        .map(e ->
            DynamicTest.dynamicTest(
                e.getKey(),
                () ->
                    assertTrue(
                        new Recogniser(GRAMMAR, e.getValue()).matches("file"), e.getValue())))
        .toList();
  }

  /** Whatever the grammar allows, a reader finds an example of. */
  @Test
  void everyRuleAndAlternativeOccursInAnExample() {
    Set<String> missing = new TreeSet<>(Recogniser.choices(GRAMMAR));
    for (Map.Entry<String, String> example : examples().entrySet()) {
      Recogniser recogniser = new Recogniser(GRAMMAR, example.getValue());
      if (recogniser.matches("file")) {
        missing.removeAll(recogniser.taken());
      }
    }
    // Blank lines are no tokens of a statement.
    missing.removeIf(choice -> choice.endsWith(": separator") || choice.endsWith(": line end"));
    assertEquals(Set.of(), missing);
  }
}
