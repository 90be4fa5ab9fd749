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
import java.util.stream.Collectors;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.spanloom.language.model.Model;
import org.spanloom.language.model.ModelReader;
import org.spanloom.language.text.SourceText;

/** The caret stands where the sign | is in a text. */
class EditingTests {

  private static final String MODEL =
      """
      parameter gravity [m/s2] = 9.81
      # a remark
      # of two lines
      system Gauge over t [h] from 0 to 24 {
        parameter k [N/m] = 40 ± 5 %   ## stiffness of the spring
        parameter m [kg] = 2
        let tide(t) [m] = 0.8 [m]*sin(t/2 [h])
        let twice [N/m] = 2*k
        state x [mm] = 1
        state x' [mm/s] = 0
        output force [N] = twice*(tide(t) - x) - m*gravity
        m*x'' = force
        initial values rest { x = 0; x' = 0 }
        basis p at 0
        require condition(p) < 1e9
        require x(1) < 3 [m] under rest
        let broken = )
      }
      """;

  private static Model model(String text) {
    return ModelReader.read(new SourceText("test.span", text));
  }

  private static int after(String mark) {
    return MODEL.indexOf(mark) + mark.length();
  }

  private static String outline(List<OutlineNode> nodes, String indent) {
    return nodes.stream()
        .map(n ->
            indent
                + n.kind()
                + " "
                + (n.label() + " " + n.detail()).strip()
                + "\n"
                + outline(n.children(), indent + "  "))
        .collect(Collectors.joining());
  }

  @Test
  void outlineListsEveryStatement() {
    assertEquals(
        """
        PARAMETER gravity [m/s2]
        SYSTEM Gauge over t [h] from 0 to 24
          PARAMETER k [N/m]
          PARAMETER m [kg]
          LET tide(t) [m]
          LET twice [N/m]
          STATE x [mm]
          STATE x' [mm/s]
          OUTPUT force [N]
          EQUATION m*x'' = force
          INITIAL_VALUES rest initial values
          BASIS p basis
          REQUIREMENT condition(p) < 1e9
          REQUIREMENT x(1) < 3 [m] under rest
          UNREAD let broken = )
        """,
        outline(Outline.of(model(MODEL).syntax()), ""));
  }

  @Test
  void blocksAndRunsOfCommentsFold() {
    Model model = model(MODEL);
    List<String> folds =
        Folding.of(model.syntax()).stream()
            .map(s -> model.source().line(s.start()) + ".." + model.source().line(s.end() - 1))
            .toList();
    assertEquals(List.of("4..18", "2..3"), folds);
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "output force [N] = twi|let twice|4",
        "(tide|let tide|4",
        "- m*grav|parameter gravity|10",
        "tide(t) - x|state x|6",
        "m*x''|state x|6",
        "rest { x = 0; x'|state x'|6",
        "condition(p|basis p|6",
        "under re|initial values rest|15",
        "sin(t|over t|5"
      })
  void namesLeadToTheirDeclarations(String mark, String declaration, int offset) {
    int expected = MODEL.indexOf(declaration) + offset;
    assertEquals(
        Optional.of(expected), Definition.at(model(MODEL), after(mark)).map(s -> s.start()));
  }

  @Test
  void nothingIsDeclaredAtNumbersAndFunctions() {
    assertFalse(Definition.at(model(MODEL), after("9.8")).isPresent());
    assertFalse(Definition.at(model(MODEL), after("*si")).isPresent());
  }

  private static List<String> hover(String mark) {
    return Hover.at(model(MODEL), after(mark)).map(HoverText::lines).orElse(List.of());
  }

  @Test
  void hoverTellsValueUnitAndLine() {
    assertEquals(
        List.of(
            "parameter k [N/m] = 40 ± 5 %",
            "parameter: 40 (38 to 42) [N/m]", "stiffness of the spring", "line 5"),
        hover("2*k"));
    assertEquals(List.of("let twice [N/m] = 2*k", "value: 80 [N/m]", "line 8"), hover("[N] = tw"));
    assertEquals(
        List.of("let tide(t) [m] = 0.8 [m]*sin(t/2 [h])", "function of time [m]", "line 7"),
        hover("(tid"));
    assertEquals(List.of("sin: sine of an angle in radians"), hover("*si"));
    assertEquals(List.of("[N/m]: stiffness", "1 [N/m] = 1 [N/m]"), hover("parameter k [N"));
    assertEquals(List.of("independent variable: over t [h] from 0 to 24"), hover("sin(t"));
    assertEquals(List.of(), hover("9.8"));
  }

  @Test
  void hoverTellsThePlaceOfAState() {
    List<String> lines = hover("tide(t) - x");
    assertTrue(lines.contains("component 1 of 2 [mm]"), lines.toString());
    assertTrue(hover("0; x'").contains("component 2 of 2 [mm/s]"), hover("0; x'").toString());
  }

  private static List<String> complete(String text) {
    int offset = text.indexOf('|');
    String without = text.substring(0, offset) + text.substring(offset + 1);
    return Completion.at(model(without), offset).stream().map(Completion.Proposal::text).toList();
  }

  @Test
  void completionKnowsWhatIsLegal() {
    String before = MODEL.substring(0, MODEL.indexOf("  let broken"));
    assertEquals(List.of("system"), complete("sy|"));
    assertEquals(List.of("require", "row"), complete(before + "  r|\n}"));
    assertEquals(
        List.of("tide(t)", "tan", "tanh", "transpose", "twice").stream().sorted().toList(),
        complete(before + "  output a = t|\n}").stream()
            .filter(s -> s.startsWith("t") && s.length() > 1)
            .sorted()
            .toList());
    assertEquals(List.of("rest"), complete(before + "  require x(1) < 2 [m] under |\n}"));
    assertEquals(List.of("p"), complete(before + "  require condition(|\n}"));
    assertEquals(List.of("values"), complete(before + "  initial v|\n}"));
    assertTrue(complete(before + "  require sc|\n}").contains("scaled"));
    assertTrue(complete(before + "  require x < 3 [m] thr|\n}").contains("throughout"));
    assertTrue(complete(before + "  parameter z [k|\n}").contains("kat"));
    assertTrue(complete(before + "  parameter z [W/K|]\n}").contains("K"));
    assertTrue(complete(before + "  parameter z [kPa|]\n}").contains("kPa"));
    assertEquals(List.of(), complete(before + "  # par|\n}"));
    assertEquals(List.of(), complete(before + "  parameter n|\n}"));
  }

  @Test
  void completionOffersWhatMayStandInAPlace() {
    String before = MODEL.substring(0, MODEL.indexOf("  let broken"));
    List<String> constants = complete(before + "  parameter z = |\n}");
    assertTrue(constants.containsAll(List.of("k", "m", "twice", "gravity", "pi")));
    assertFalse(constants.contains("x") || constants.contains("force"));
    assertFalse(constants.contains("tide(t)") || constants.contains("t"));
    List<String> ofTime = complete(before + "  let y(t) = |\n}");
    assertTrue(ofTime.containsAll(List.of("k", "tide(t)", "t")));
    assertFalse(ofTime.contains("x"));
    assertTrue(complete(before + "  output y = |\n}").containsAll(List.of("x", "force", "t")));
    List<String> initial = complete(before + "  initial values b { x = |}\n}");
    assertTrue(initial.contains("k"));
    assertFalse(initial.contains("x") || initial.contains("t"));
  }

  @Test
  void completionOffersUnitsThatFitFirst() {
    String before = MODEL.substring(0, MODEL.indexOf("  let broken"));
    assertEquals("mm", complete(before + "  require x < 3 [|\n}").getFirst());
    assertEquals("mm/s", complete(before + "  require x' < 3 [|\n}").getFirst());
    assertEquals("mm/h2", complete(before + "  let y = x'' + 3 [|\n}").getFirst());
    assertEquals("N/m", complete(before + "  let y = k + 3 [N|\n}").getFirst());
  }

  @Test
  void completionShowsDocumentation() {
    String text = "## Stiffness.\nparameter k = 2\nlet twice = k";
    Completion.Proposal proposal = Completion.at(model(text), text.length()).getFirst();
    assertEquals("k", proposal.text());
    assertEquals("Stiffness.", proposal.documentation());
  }

  @Test
  void completionReplacesTheWordBegun() {
    String text = "system S over t from 0 to 1 { state x = 1; x' = -x\n  req\n}";
    Completion.Proposal proposal = Completion.at(model(text), text.indexOf("req") + 3).getFirst();
    assertEquals("require", proposal.text());
    assertEquals(text.indexOf("req"), proposal.replaced().start());
    assertEquals(text.indexOf("req") + 3, proposal.replaced().end());
  }
}
