/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.formatting;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Random;
import java.util.stream.Stream;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestFactory;
import org.spanloom.language.RecordText;
import org.spanloom.language.TestTexts;
import org.spanloom.language.model.Model;
import org.spanloom.language.model.ModelReader;
import org.spanloom.language.problem.TextEdit;
import org.spanloom.language.syntax.Parser;
import org.spanloom.language.syntax.SyntaxFile;
import org.spanloom.language.text.SourceText;

/** What holds for the layout of every text, right or wrong. */
public class LayoutPropertyTests {

  @TestFactory
  Stream<DynamicTest> layoutChangesBlanksOnly() {
    return TestTexts.all().entrySet().stream()
        .map(e -> DynamicTest.dynamicTest(e.getKey(), () -> assertChangesBlanksOnly(e.getValue())));
  }

  /** The same for texts with blanks put in and taken out, where that changes nothing by itself. */
  @Test
  void roughTextsKeepTheirMeaning() {
    Random random = new Random(4);
    for (String text : TestTexts.models().values()) {
      assertChangesBlanksOnly(text.replace(" = ", random.nextBoolean() ? "=" : "   =  "));
      assertChangesBlanksOnly(text.replace("\n  ", random.nextBoolean() ? "\n" : "\n\t  "));
      assertChangesBlanksOnly(text.replace("*", random.nextBoolean() ? " * " : "*  "));
      assertChangesBlanksOnly(text.replace("\n", random.nextBoolean() ? "  \n" : "\n\n\n"));
      assertChangesBlanksOnly(text.replace("\n", "\r\n"));
    }
  }

  /** Formatting keeps meaning, findings and comments, and formatting again changes nothing. */
  public static void assertChangesBlanksOnly(String text) {
    SyntaxFile file = Parser.parse(new SourceText("test.span", text));
    List<TextEdit> edits = Formatter.edits(file);
    for (TextEdit edit : edits) {
      assertTrue(edit.replacement().isBlank(), edit + " in\n" + text);
      assertTrue(file.source().slice(edit.span()).isBlank(), edit + " in\n" + text);
    }
    String laid = TextEdit.apply(text, edits);
    RecordText.assertSame(listing(text), listing(laid), text);
    assertEquals(laid, Formatter.format(laid), text);
    assertEquals(comments(file), comments(Parser.parse(new SourceText("test.span", laid))));
  }

  private static List<String> comments(SyntaxFile file) {
    return file.comments().stream().map(c -> file.source().slice(c.span()).strip()).toList();
  }

  /** Messages and requirements quote the text, so that blanks and quoted parts do not count. */
  private static String listing(String text) {
    Model model = ModelReader.read(new SourceText("test.span", text));
    StringBuilder listing = new StringBuilder(RecordText.of(model.systems()));
    model
        .problems()
        .forEach(p ->
            listing
                .append(p.kind())
                .append(p.message().replaceAll("\"[^\"]*\"", "_"))
                .append('\n'));
    return listing.toString().replaceAll("[ \\t]", "");
  }
}
