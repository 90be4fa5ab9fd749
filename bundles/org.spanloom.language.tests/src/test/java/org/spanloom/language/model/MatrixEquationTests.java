/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.List;
import org.hipparchus.linear.EigenDecompositionSymmetric;
import org.hipparchus.linear.MatrixUtils;
import org.hipparchus.linear.RealMatrix;
import org.junit.jupiter.api.Test;
import org.spanloom.language.model.LinearForm.MatrixEntry;
import org.spanloom.language.problem.ProblemKind;

class MatrixEquationTests {

  private static final String STATES =
      """
      system S over t [s] from 0 to 10 {
        parameter k1 [N/m] = 30
        parameter k2 [kN/m] = 0.02
        state a [m] = 1
        state b [m] = 0
        state a' [m/s] = 0
        state b' [m/s] = 0
      """;

  private static final String MATRICES =
      STATES
          + """
            matrix K(t) [N/m] =
              row k1 + k2,                        -k2
              row     -k2, k2*(1 + 0.1*sin(t/1 [s]))
            matrix M [kg] =
              row 2, 0.1
              row 0, 1.5
            matrix q [m] =
              row a
              row b
            matrix F [N] =
              row 0
              row 3
            M*q'' + 0.01 [s]*K(t)*q' + K(t)*q = F*cos(t/1 [s])
          }
          """;

  @Test
  void eachRowIsTheEquationThatOneWouldWrite() {
    SystemModel expected =
        ModelListing.system(
            STATES
                + """
                  2 [kg]*a'' + 0.1 [kg]*b'' + 0.01 [s]*(k1 + k2)*a' + 0.01 [s]*(-k2)*b' + (k1 + k2)*a + (-k2)*b = 0
                  1.5 [kg]*b'' + 0.01 [s]*(-k2)*a' + 0.01 [s]*(k2*(1 + 0.1*sin(t/1 [s])))*b' + (-k2)*a + k2*(1 + 0.1*sin(t/1 [s]))*b = 3 [N]*cos(t/1 [s])
                }
                """);
    SystemModel system = ModelListing.system(MATRICES);
    assertEquals(ModelListing.equations(expected), ModelListing.equations(system));
  }

  @Test
  void anEntryComesFromTheSummandAndFromItsPlaceInTheMatrix() {
    SystemModel system = ModelListing.system(MATRICES);
    MatrixEntry entry =
        system.equations().orElseThrow().matrix().stream()
            .filter(e -> e.row() == 1 && e.column() == 0)
            .findFirst()
            .orElseThrow();
    List<String> places =
        entry.sources().stream().map(s -> MATRICES.substring(s.start(), s.end())).toList();
    assertEquals(List.of("K(t)*q", "k1 + k2", "a"), places);
    MatrixEntry mass = system.equations().orElseThrow().mass().get(1);
    assertEquals(
        List.of("M*q''", "2"),
        mass.sources().stream().map(s -> MATRICES.substring(s.start(), s.end())).toList());
  }

  /**
   * The chain of n equal masses between walls has the frequencies 2 sqrt(k/m) sin(j pi/(2(n + 1)))
   * (common practice).
   */
  @Test
  void aChainOfSpringsHasItsFrequencies() {
    int n = 9;
    StringBuilder text = new StringBuilder("system Chain over t [s] from 0 to 1 {\n");
    StringBuilder column = new StringBuilder("matrix q [m] =\n");
    StringBuilder rows = new StringBuilder("matrix K [N/m] =\n");
    for (int i = 0; i < n; i++) {
      text.append("state x" + i + " [m] = 1\nstate x" + i + "' [m/s] = 0\n");
      column.append("row x" + i + "\n");
      for (int j = 0; j < n; j++) {
        rows.append(j == 0 ? "row " : ", ").append(i == j ? 140 : Math.abs(i - j) == 1 ? -70 : 0);
      }
      rows.append('\n');
    }
    text.append(column).append(rows).append("2.5 [kg]*q'' = -K*q\n}\n");
    LinearForm form = ModelListing.system(text.toString()).equations().orElseThrow();
    RealMatrix stiffness = MatrixUtils.createRealMatrix(n, n);
    for (MatrixEntry entry : form.matrix()) {
      if (entry.row() % 2 == 1) {
        stiffness.setEntry(
            entry.row() / 2, entry.column() / 2, -TermEvaluator.constant(entry.term()));
      }
    }
    double[] squares = new EigenDecompositionSymmetric(stiffness).getEigenvalues();
    Arrays.sort(squares);
    for (int j = 1; j <= n; j++) {
      double expected = 2 * Math.sqrt(70 / 2.5) * Math.sin(j * Math.PI / (2 * (n + 1)));
      assertEquals(expected, Math.sqrt(squares[j - 1] / 2.5), 1e-12);
    }
  }

  @Test
  void aRowWithoutMassIsReportedOnce() {
    List<String> problems =
        ModelListing.read(MATRICES.replace("row 0, 1.5", "row 0, 0")).problems().stream()
            .map(p -> p.kind().id())
            .toList();
    assertTrue(problems.contains(ProblemKind.EQUATION_WITHOUT_STATE.id()), problems.toString());
    assertTrue(problems.size() <= 2, problems.toString());
  }

  @Test
  void zeroFitsEveryShape() {
    SystemModel system =
        ModelListing.system(
            MATRICES.replace("F*cos(t/1 [s])", "0").replaceAll("(?m)^.*matrix F.*\n.*\n.*\n", ""));
    assertEquals(List.of(), system.equations().orElseThrow().forcing());
  }

  @Test
  void aFamilyByItsNameIsTheColumnOfItsMembers() {
    String rest =
        """
          matrix K [N/m] =
            row 50, -20
            row -20, 20
          matrix F [N] =
            row 0
            row 3
          2 [kg]*q'' + K*q = F*cos(t/1 [s])
          output sag [N.m] = transpose(F)*q + K[1,2]*q[2]*q_0
        }
        """;
    SystemModel expected =
        ModelListing.system(
            "system S over t [s] from 0 to 10 {\n  parameter q_0 [m] = 2\n"
                + "  state a [m] = 1\n  state b [m] = 1\n"
                + "  state a' [m/s] = 0\n  state b' [m/s] = 0\n"
                + "  matrix q [m] =\n    row a\n    row b\n"
                + rest.replace("K[1,2]*q[2]", "-20 [N/m]*b"));
    SystemModel system =
        ModelListing.system(
            "system S over t [s] from 0 to 10 {\n  parameter q_0 [m] = 2\n"
                + "  state q[1..2] [m] = 1\n  state q' [m/s] = 0\n"
                + rest);
    assertEquals(
        ModelListing.equations(expected).replace("a", "q[1]").replace("b", "q[2]"),
        ModelListing.equations(system));
  }
}
