/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.editing;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.List;
import java.util.stream.Collectors;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestFactory;
import org.spanloom.language.TestTexts;
import org.spanloom.language.syntax.Parser;
import org.spanloom.language.syntax.SyntaxFile;
import org.spanloom.language.text.SourceText;

/** The caret stands where the sign | is in a text. */
class ReferencesTests {

  private static SyntaxFile file(String text) {
    return Parser.parse(new SourceText("test.span", text));
  }

  /** Returns line:column role of each place of what stands at the caret. */
  private static String references(String text) {
    int offset = text.indexOf('|');
    SyntaxFile file = file(text.substring(0, offset) + text.substring(offset + 1));
    return References.at(file, offset).stream()
        .map(o -> {
          var place = file.source().position(o.span().start());
          return place.line()
              + ":"
              + place.column()
              + " "
              + o.role()
              + " "
              + file.source().slice(o.label());
        })
        .collect(Collectors.joining("\n"));
  }

  @Test
  void placesHaveRoles() {
    String text =
        """
        system S over t from 0 to 1 {
          state x = 1
          state x' = 0
          output v = x'
          x'' = -x - x'|
          initial values a { x = 1; x' = 0 }
          basis b at 0 =
            row x = 1, 0
            row x' = 0, 1
          require x < 2 throughout under a
        }
        """;
    assertEquals(
        """
        2:9 DECLARED x
        3:9 DECLARED x'
        4:14 READ x'
        5:3 WRITTEN x''
        5:10 READ x
        5:14 READ x'
        6:22 WRITTEN x
        6:29 WRITTEN x'
        8:9 WRITTEN x
        9:9 WRITTEN x'
        10:11 READ x\
        """
            .strip(),
        references(text));
  }

  @Test
  void transfersWriteBothEnds() {
    assertEquals(
        """
        2:9 DECLARED gut
        3:12 WRITTEN gut
        3:33 READ gut\
        """,
        references(
            """
            system S over t from 0 to 1 {
              state gut = 1
              transfer |gut -> outside = 0.2*gut
            }
            """));
  }

  @Test
  void builtInFunctionsHaveUsesAndNoDeclaration() {
    assertEquals(
        "1:11 READ exp\n2:11 READ exp", references("let a = 1/exp(1)\nlet b = 1/|exp(2)\n"));
  }

  @Test
  void aDeclarationInsideHidesOneOutside() {
    String text =
        """
        parameter k = 1
        system A over t from 0 to 1 { parameter k = 2; state x = k; x' = -k*x }
        system B over t from 0 to 1 { state x = |k; x' = -k*x }
        """;
    assertEquals("1:11 DECLARED k\n3:41 READ k\n3:50 READ k", references(text));
  }

  @Test
  void linesThatCannotBeReadCount() {
    String text =
        """
        system S over t from 0 to 1 {
          parameter k| = 1
          let c = k + + 3 #k
          basis k at 0
          basis p at 0 =
            row x = k, )
          initial values k { x = k; x = ( }
        }
        """;
    assertEquals("2:13 DECLARED k\n3:11 READ k\n6:13 READ k\n7:26 READ k", references(text));
  }

  @Test
  void nothingIsNamedAtNumbersWordsAndUnits() {
    assertEquals("", references("parameter k [k|g] = 1"));
    assertEquals("", references("para|meter kg [kg] = 1"));
    assertEquals("", references("parameter k = 1|2"));
    assertEquals("", references("## a |k\nparameter k = 12"));
    assertEquals("", references("|"));
  }

  /** A question about one place has the answer of the whole list. */
  @TestFactory
  List<DynamicTest> onePlaceIsWhatTheListSays() {
    return TestTexts.all().entrySet().stream()
        .map(e ->
            DynamicTest.dynamicTest(
                e.getKey(),
                () -> {
                  Names names = Names.of(file(e.getValue()));
                  for (Occurrence o : names.occurrences()) {
                    Occurrence found = names.at(o.span().start()).orElseThrow();
                    assertEquals(o.symbol(), found.symbol());
                    assertEquals(o.label(), found.label());
                    assertEquals(o.symbol().name(), names.file().source().slice(o.span()));
                  }
                }))
        .toList();
  }
}
