/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.workspace.tests;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.spanloom.language.problem.Fix;
import org.spanloom.language.problem.TextEdit;
import org.spanloom.language.text.SourceText;
import org.spanloom.language.text.Span;
import org.spanloom.workspace.FixText;

/** Fixes survive being kept as text. */
class FixTextTests {

  private static final SourceText SOURCE = new SourceText("tank.span", "level' = -leek*level");

  @Test
  void readsWhatItWrote() {
    Fix one = new Fix("Write leak", List.of(new TextEdit(new Span(10, 14), "leak")));
    Fix two =
        new Fix(
            "Declare leek",
            List.of(
                new TextEdit(new Span(0, 0), "parameter leek [1/h] = 1\n"),
                new TextEdit(new Span(15, 20), "")));
    List<FixText.Anchored> read = FixText.read(FixText.write(List.of(one, two), SOURCE));
    assertEquals(List.of(one, two), read.stream().map(FixText.Anchored::fix).toList());
    assertEquals(List.of("leek"), read.getFirst().replaced());
    assertEquals(List.of("", "level"), read.getLast().replaced());
  }

  @Test
  void leavesOutWhatWouldNotFitIntoAMarker() {
    Fix large = new Fix("Large", List.of(new TextEdit(new Span(0, 0), "x".repeat(30_000))));
    Fix small = new Fix("Small", List.of());
    assertEquals("Small", FixText.write(List.of(small, large), SOURCE));
    assertTrue(FixText.write(List.of(large), SOURCE).isEmpty());
  }

  @Test
  void otherTextGivesNoFixes() {
    assertEquals(List.of(), FixText.read(""));
    assertEquals(List.of(), FixText.read("a\u001fb"));
    assertEquals(List.of(), FixText.read("a\u001fb\u001fc\u001fd"));
  }
}
