/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.formatting;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.stream.Stream;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestFactory;
import org.spanloom.language.RecordText;
import org.spanloom.language.TestTexts;
import org.spanloom.language.syntax.Parser;
import org.spanloom.language.syntax.SyntaxFile;
import org.spanloom.language.text.SourceText;

public class PrinterTests {

  private static SyntaxFile parse(String text) {
    return Parser.parse(new SourceText("test.span", text));
  }

  @Test
  void aTreeHasOneLayout() {
    assertEquals(
        """
        ## Two lines
        ## of words.
        parameter k [1/h] = 2 ± 5 %
        system S over t [h] after 0 {
          state x [m] = -1 scale 10
          state x' [m/h]
          x'' = -k*(x' + k*x)/2^-1
          initial values a at 2 {
            x  = 1
            x' = 0 [m/h]
          }
          require x(before 3) <= 2 [m] throughout until 4 under a
        }
        """,
        Printer.print(
            parse(
                """
                ## Two lines
                ## of words.
                parameter   k[1/h]=2 +/-5%  # and a remark
                system S over t [h] after 0 { state x [m] = - 1 scale 10; state x ' [m/h]
                x'' = -k * (x' +
                   k*x) / 2^-1
                initial values a at 2 { x = 1; x' = 0 [m/h] }; require x(before 3) <= 2 [m] throughout until 4 under a }
                """)));
  }

  /** Reading what was written gives the tree again; so does reading what was laid out. */
  @TestFactory
  Stream<DynamicTest> printingKeepsTheTree() {
    return TestTexts.all().entrySet().stream()
        .filter(e -> parse(e.getValue()).problems().isEmpty())
        .map(e ->
            DynamicTest.dynamicTest(
                e.getKey(), () -> assertPrintsItself(parse(e.getValue()), e.getValue())));
  }

  public static void assertPrintsItself(SyntaxFile file, String text) {
    String printed = Printer.print(file);
    SyntaxFile again = parse(printed);
    RecordText.assertSame(
        RecordText.of(file.statements()), RecordText.of(again.statements()), text + printed);
    assertEquals(printed, Printer.print(again));
    assertEquals(printed, Formatter.format(printed));
  }
}
