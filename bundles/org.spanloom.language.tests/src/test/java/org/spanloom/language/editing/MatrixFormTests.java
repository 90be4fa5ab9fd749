/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.editing;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.spanloom.language.formatting.Formatter;
import org.spanloom.language.model.LinearForm;
import org.spanloom.language.model.Model;
import org.spanloom.language.model.ModelReader;
import org.spanloom.language.model.TermEvaluator;
import org.spanloom.language.problem.TextEdit;
import org.spanloom.language.text.SourceText;

class MatrixFormTests {

  private static final String STORES =
      """
      system Stores over t [h] from 0 to 48 {
        parameter C [kJ/K] = 85
        parameter g [kW/K] = 0.12
        parameter h [kW/K] = 0.07
        state north [K] = 277
        state south [K] = 279
        state loft  [K] = 281
        # heat from the loft
        north' = -(g + h)/C*north + g/C*(loft - south/3) + 12 [kJ/h]/C
        loft'  = g*(north - loft)/C - 0.02 [/h]*loft
        south' = -h*(south - 273 [K])/C
        require loft(48) < 300 [K]
      }
      """;

  private static Model read(String text) {
    return ModelReader.read(new SourceText("test.span", text));
  }

  private static Optional<String> converted(String text) {
    return MatrixForm.at(read(text), text.indexOf("state"))
        .map(f -> TextEdit.apply(text, f.edits()));
  }

  private static LinearForm form(String text) {
    Model model = read(text);
    assertEquals(List.of(), model.problems(), text);
    return model.systems().getFirst().equations().orElseThrow();
  }

  @Test
  void equationsBecomeRows() {
    assertEquals(
        """
        system Stores over t [h] from 0 to 48 {
          parameter C [kJ/K] = 85
          parameter g [kW/K] = 0.12
          parameter h [kW/K] = 0.07
          state north [K] = 277
          state south [K] = 279
          state loft  [K] = 281
          # heat from the loft
          matrix A [/h] =
            row -(g + h)/C, -g/C/3, g/C
            row 0, -h/C, 0
            row g/C, 0, -g/C - 0.02 [/h]
          matrix b [K/h] =
            row 12 [kJ/h]/C
            row h*273 [K]/C
            row 0
          matrix x [K] =
            row north
            row south
            row loft
          x' = A*x + b
          require loft(48) < 300 [K]
        }
        """
            .replace("-g/C/3", "-g/C*(1/3)")
            .replace("row h*273 [K]/C", "row h*(273 [K])/C"),
        converted(STORES).orElseThrow());
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "0.5 [/h]*north - 0.25 [/h]*south",
        "-(g + h)/C*north + g/C*(loft - south)",
        "g/C*(loft*0.3*exp(-t/3 [h]) - (south - 2*north))/7",
        "north*g/C + loft/3 [h] + sin(t/1 [h])*1 [K/h]",
      })
  void theNumbersStayWhatTheyAre(String right) {
    String text = STORES.replaceAll("north' = .*", "north' = " + right);
    String converted = converted(text).orElseThrow();
    LinearForm before = form(text);
    LinearForm after = form(converted);
    assertEquals(values(before), values(after), converted);
    assertEquals(Formatter.format(converted), Formatter.format(Formatter.format(converted)));
  }

  private static List<String> values(LinearForm form) {
    return Stream.concat(
            form.matrix().stream()
                .map(e -> e.row() + "," + e.column() + "=" + TermEvaluator.of(e.term()).at(7200)),
            form.forcing().stream().map(e -> e.row() + "=" + TermEvaluator.of(e.term()).at(7200)))
        .toList();
  }

  @Test
  void otherFormsAreLeftAlone() {
    assertTrue(converted(STORES.replace("loft'  =", "2*loft' =")).isEmpty());
    assertTrue(converted(STORES.replace("state loft  [K]", "state loft [kg]")).isEmpty());
    assertTrue(converted(STORES.replace("south' = -h", "south' = -k")).isEmpty());
    assertTrue(converted("system S over t {\n  state x = 1\n  x' = -x\n}\n").isEmpty());
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "-(g + h)/C*north + g/C*(loft - south)",
        "g/C*(loft*0.3*exp(-t/3 [h]) - (south - 2*north))/7",
        "north*g/C + loft/3 [h] + sin(t/1 [h])*1 [K/h]",
      })
  void theWayBackKeepsTheNumbers(String right) {
    String text = STORES.replaceAll("north' = .*", "north' = " + right);
    String matrices = converted(text).orElseThrow();
    String scalars = scalars(matrices, "x' =").orElseThrow();
    assertEquals(values(form(text)), values(form(scalars)), scalars);
    assertTrue(!scalars.contains("matrix"), scalars);
  }

  private static Optional<String> scalars(String text, String at) {
    return ScalarForm.at(read(text), text.indexOf(at)).map(f -> TextEdit.apply(text, f.edits()));
  }

  @Test
  void aMassMatrixGivesCoupledEquations() {
    String text =
        """
        system Boom over t [s] from 0 to 20 {
          parameter k [N/m] = 30
          state a [m] = 1
          state b [m] = 0
          state a' [m/s] = 0
          state b' [m/s] = 0
          matrix M [kg] =
            row 2, 0.5
            row 0, 1.5
          matrix K(t) [N/m] =
            row k + 2 [N/m], -k
            row -k, k*(1 + 0.1*sin(t/1 [s]))
          matrix q [m] =
            row a
            row b
          M*q'' = -K(t)*q
        }
        """;
    String scalars = scalars(text, "M*q''").orElseThrow();
    assertEquals(
        """
        system Boom over t [s] from 0 to 20 {
          parameter k [N/m] = 30
          state a [m] = 1
          state b [m] = 0
          state a' [m/s] = 0
          state b' [m/s] = 0
          2 [kg]*a'' + 0.5 [kg]*b'' = -(k + 2 [N/m])*a + k*b
          1.5 [kg]*b'' = k*a - k*(1 + 0.1*sin(t/1 [s]))*b
        }
        """,
        scalars);
    assertEquals(values(form(text)), values(form(scalars)));
  }

  @Test
  void whatIsUsedElsewhereStays() {
    String text = converted(STORES).orElseThrow();
    String sound = text.replace("  require loft", "  output y = transpose(b)*x\n  require loft");
    String scalars = scalars(sound, "x' =").orElseThrow();
    assertTrue(scalars.contains("matrix b") && scalars.contains("matrix x"), scalars);
    assertTrue(!scalars.contains("matrix A"), scalars);
  }
}
