/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.editing;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.spanloom.language.model.Model;
import org.spanloom.language.model.ModelReader;
import org.spanloom.language.text.SourceText;

class JumpEditingTests {

  private static final String MODEL =
      """
      system Gut over t [h] from 0 to 24 {
        parameter dose [mg] = 40
        state gut [mg] = 0
        gut' = -gut/2 [h]
        jump every 8 from 0 to 16 {
          gut becomes gut + dose
        }
        jump at 3 { gut becomes 0 }
        ## What was found.
        boundary found { gut(24) = 3 }
      }
      """;

  private static Model model(String text) {
    return ModelReader.read(new SourceText("test.span", text));
  }

  private static int after(String mark) {
    return MODEL.indexOf(mark) + mark.length();
  }

  @Test
  void jumpsAndBoundaryConditionsAreOutlined() {
    List<OutlineNode> nodes = Outline.of(model(MODEL).syntax()).getFirst().children();
    assertEquals(
        List.of(
            "PARAMETER dose",
            "STATE gut",
            "EQUATION gut' = -gut/2 [h]",
            "JUMP jump every 8 from 0 to 16",
            "JUMP jump at 3",
            "BOUNDARY found"),
        nodes.stream().map(n -> n.kind() + " " + n.label()).toList());
  }

  @Test
  void aJumpOfSeveralLinesFolds() {
    Model model = model(MODEL);
    assertEquals(
        List.of("1..11", "5..7"),
        Folding.of(model.syntax()).stream()
            .map(s -> model.source().line(s.start()) + ".." + model.source().line(s.end() - 1))
            .toList());
  }

  @Test
  void hoverTellsWhichJumpsChangeAState() {
    assertEquals(
        List.of(
            "state gut [mg] = 0",
            "component 1 of 1 [mg]",
            "governed by: gut' = -gut/2 [h]",
            "changed by: jump every 8 from 0 to 16",
            "changed by: jump at 3",
            "line 3"),
        Hover.at(model(MODEL), after("gut becomes gu")).map(HoverText::lines).orElse(List.of()));
    assertEquals(
        List.of("boundary found { gut(24) = 3 }", "What was found.", "line 10"),
        Hover.at(model(MODEL), after("boundary fou")).map(HoverText::lines).orElse(List.of()));
  }

  @Test
  void namesInAJumpLeadToTheirDeclarations() {
    assertEquals(
        Optional.of(MODEL.indexOf("parameter dose") + 10),
        Definition.at(model(MODEL), after("gut + dos")).map(s -> s.start()));
    assertEquals(
        Optional.of(MODEL.indexOf("state gut") + 6),
        Definition.at(model(MODEL), after("gut + dose\n  }\n  jump at 3 { gu"))
            .map(s -> s.start()));
  }

  private static List<String> offers(String text) {
    String whole = MODEL.substring(0, MODEL.indexOf("  jump")) + text + "\n}\n";
    return Completion.at(model(whole), whole.indexOf(text) + text.length()).stream()
        .map(Completion.Proposal::text)
        .toList();
  }

  @Test
  void completionKnowsTheWordsOfAJump() {
    assertTrue(offers("  ju").contains("jump"));
    assertTrue(offers("  jump e").contains("every"));
    assertTrue(offers("  jump every 3 f").contains("from"));
    assertEquals(List.of("becomes"), offers("  jump at 3 { gut be"));
    assertEquals(List.of("becomes"), offers("  jump at 3 {\n    gut "));
    assertTrue(offers("  jump at 3 {\n    gut becomes do").contains("dose"));
    assertTrue(offers("  jump at 3 {\n    g").contains("gut"));
    assertFalse(offers("  gut ").contains("becomes"));
    assertTrue(offers("  boun").contains("boundary"));
  }
}
