/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.structure;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.stream.Collectors;
import org.junit.jupiter.api.Test;
import org.spanloom.analysis.structure.SystemStructure.Dependence;
import org.spanloom.language.model.Model;
import org.spanloom.language.model.ModelReader;
import org.spanloom.language.text.SourceText;

class SystemStructureTests {

  private static final String CHAIN =
      """
      system Chain over t from 0 to 1 {
        state c = 1
        state b = 1
        state a = 1
        state d = 1
        output flow = 2*b - d
        a' = -a
        b' = 0.5*a - b + 3*d
        c' = flow - c
        d' = b - d
      }
      """;

  private static SystemStructure structure(String text) {
    Model model = ModelReader.read(new SourceText("test.span", text));
    assertEquals(List.of(), model.problems());
    return SystemStructure.of(model.systems().getFirst()).orElseThrow();
  }

  private static String labels(SystemStructure structure, List<Integer> components) {
    return components.stream()
        .map(i -> structure.system().states().get(i).label())
        .collect(Collectors.joining(" "));
  }

  private static String direct(SystemStructure structure, int component) {
    return labels(
        structure, structure.dependences().get(component).stream().map(Dependence::on).toList());
  }

  @Test
  void outputsAreResolved() {
    SystemStructure structure = structure(CHAIN);
    assertEquals("c b d", direct(structure, 0));
    assertEquals("b a d", direct(structure, 1));
    assertEquals("a", direct(structure, 2));
    assertEquals("b d", direct(structure, 3));
  }

  @Test
  void dependencesThroughOthersAreFound() {
    SystemStructure structure = structure(CHAIN);
    assertEquals("c b a d", labels(structure, structure.dependsOn(0)));
    assertEquals("b a d", labels(structure, structure.dependsOn(3)));
    assertEquals("a", labels(structure, structure.dependsOn(2)));
  }

  @Test
  void blocksComeAfterTheirCauses() {
    SystemStructure structure = structure(CHAIN);
    assertEquals(
        List.of("a", "b d", "c"),
        structure.blocks().stream().map(b -> labels(structure, b)).toList());
  }

  @Test
  void theLinesThatMakeADependenceAreNamed() {
    SystemStructure structure = structure(CHAIN);
    Dependence onD = structure.dependences().get(1).get(2);
    assertEquals(3, onD.on());
    assertEquals(
        List.of("3*d"),
        onD.sources().stream().map(s -> CHAIN.substring(s.start(), s.end())).toList());
  }

  @Test
  void aMassMatrixCouplesWhatItsEquationsHold() {
    SystemStructure structure =
        structure(
            """
            system Coupled over t from 0 to 1 {
              state a = 1
              state b = 1
              state c = 1
              state d = 1
              2*a' + b' = -a
              a' + 3*b' = c
              c' = -c
              d' = a
            }
            """);
    assertEquals("a c", direct(structure, 0));
    assertEquals("a c", direct(structure, 1));
    assertEquals("c", direct(structure, 2));
    assertTrue(structure.dependsOn(3).contains(2));
    assertEquals(
        List.of("c", "a", "b", "d"),
        structure.blocks().stream().map(b -> labels(structure, b)).toList());
  }

  @Test
  void anOscillatorIsOneBlock() {
    SystemStructure structure =
        structure(
            """
            system Swing over t from 0 to 1 {
              state x = 1
              state x' = 0
              x'' = -4*x - 0.1*x'
            }
            """);
    assertEquals(
        List.of("x x'"), structure.blocks().stream().map(b -> labels(structure, b)).toList());
  }

  @Test
  void equationsWithErrorsHaveNoStructure() {
    Model model =
        ModelReader.read(new SourceText("test.span", "system S over t { state x = 1; x' = x*x }"));
    assertTrue(SystemStructure.of(model.systems().getFirst()).isEmpty());
  }
}
