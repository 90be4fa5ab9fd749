/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.editing;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.spanloom.language.files.FileKey;
import org.spanloom.language.files.TextFiles;
import org.spanloom.language.model.Model;
import org.spanloom.language.model.ModelReader;
import org.spanloom.language.text.SourceText;

/** The caret stands where the sign | is in a text. */
class PartEditingTests {

  private static final String ROOM =
      """
      parameter loss [W/K] = 3  ## of a metre of wall
      system Room over t [h] from 0 to 24 {
        parameter C [kJ/K] = 60
        input heater(t) [W] = 0
        state T [K] = 281   ## air
        output waste [W] = loss*(T - 270 [K])
        C*T' = heater(t) - waste
      }
      """;

  private static final String ROW =
      """
      import "room.span"
      system Own over t [h] from 0 to 24 {
        state level = 1
        level' = -level/2 [h]
      }
      system Row over t [h] from 0 to 24 {
        part paint = Room { C = 80 [kJ/K]; heater = 2*tins.waste }
        part tins  = Room
        part vat   = Own
        output both [W] = paint.waste + tins.waste
        output deep = 2*vat.level
      }
      """;

  private static int caret(String marked) {
    return marked.indexOf('|');
  }

  private static Model model(String text) {
    return ModelReader.read(
        new SourceText("row.span", text),
        new TextFiles("row.span", Map.of("room.span", ROOM)),
        () -> false);
  }

  private static List<String> proposals(String marked) {
    return Completion.at(model(marked.replace("|", "")), caret(marked)).stream()
        .map(Completion.Proposal::text)
        .toList();
  }

  private static List<String> hover(String marked) {
    return Hover.at(model(marked.replace("|", "")), caret(marked))
        .map(HoverText::lines)
        .orElse(List.of());
  }

  private static String marked(String text, String place) {
    return text.replace(place.replace("|", ""), place);
  }

  @Test
  void theModelIsSound() {
    assertEquals(List.of(), model(ROW).problems());
  }

  @Test
  void namesOfAPartAreProposedBehindItsPoint() {
    assertEquals(
        List.of("C", "heater(t)", "T", "waste"),
        proposals(marked(ROW, "= paint.waste +").replace("paint.waste +", "paint.| +")));
    assertEquals(
        List.of("waste"),
        proposals(marked(ROW, "= paint.waste").replace("paint.waste", "paint.w|")));
  }

  @Test
  void systemsAreProposedForAPart() {
    assertEquals(List.of("Own", "Row", "Room"), proposals(ROW.replace("vat   = Own", "vat   = |")));
    assertEquals(List.of("Room"), proposals(ROW.replace("vat   = Own", "vat   = Roo|")));
  }

  @Test
  void bindingsAreProposedInTheBraces() {
    assertEquals(
        List.of("C", "heater", "T"), proposals(ROW.replace("tins  = Room", "tins  = Room { | }")));
  }

  @Test
  void importedNamesAreProposed() {
    assertEquals(List.of("loss"), proposals(ROW.replace("2*vat.level", "2*lo|")).subList(0, 1));
  }

  @Test
  void aNameOfAnImportedPartSaysWhatItIsAndWhereItStands() {
    assertEquals(
        List.of("output waste [W] = loss*(T - 270 [K])", "output [W]", "room.span, line 6"),
        hover(marked(ROW, "2*tins.wa|ste")));
    assertEquals(
        List.of("parameter C [kJ/K] = 60", "room.span, line 3"), hover(marked(ROW, "{ |C = 80")));
    assertEquals(
        List.of("system Room over t [h] from 0 to 24 {", "room.span, line 2"),
        hover(marked(ROW, "tins  = Ro|om")));
    assertEquals(
        List.of("parameter loss [W/K] = 3", "parameter: 3 [W/K]"),
        hover(ROW.replace("2*vat.level", "2*lo|ss")).subList(0, 2));
    assertEquals(
        List.of("state level = 1", "component 3 of 3", "line 3"),
        hover(marked(ROW, "2*vat.lev|el")));
  }

  @Test
  void theDeclarationOfAnImportedNameIsInItsFile() {
    Model model = model(ROW);
    Definition.Elsewhere waste =
        Definition.elsewhere(model, ROW.indexOf("tins.waste") + 7).orElseThrow();
    assertEquals(new FileKey("room.span"), waste.file());
    assertEquals("waste", new SourceText("", ROOM).slice(waste.span()));
    int level = ROW.indexOf("vat.level") + 5;
    assertEquals(Optional.empty(), Definition.elsewhere(model, level));
    assertEquals(ROW.indexOf("level = 1"), Definition.at(model, level).orElseThrow().start());
    int part = ROW.indexOf("vat.level");
    assertEquals(ROW.indexOf("vat   ="), Definition.at(model, part).orElseThrow().start());
  }
}
