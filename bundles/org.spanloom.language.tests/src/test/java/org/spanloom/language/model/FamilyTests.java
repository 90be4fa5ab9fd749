/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.stream.IntStream;
import org.hipparchus.linear.EigenDecompositionSymmetric;
import org.hipparchus.linear.MatrixUtils;
import org.hipparchus.linear.RealMatrix;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.spanloom.language.text.Span;

/** Families, loops and sums mean the same as the statements they stand for. */
class FamilyTests {

  private static String listing(String body) {
    return ModelListing.equations(
        ModelListing.system("system S over t from 0 to 10 {\n" + body + "\n}"));
  }

  /** Gives members of families names of their own: c[3] becomes c_3, T[1,2] becomes T_1_2. */
  private static String flat(String listing) {
    return listing
        .replaceAll("(?<=[a-z])\\[(\\d+)]", "_$1")
        .replaceAll("\\[(\\d+),(\\d+)]", "_$1_$2");
  }

  @Test
  void aLoopMeansItsEquationsOneByOne() {
    String family =
        """
        parameter k = 2
        state c[1..4] = 1
        c[1]' = -k*c[1]
        for i from 2 to 3 { c[i]' = k*(c[i-1] - 2*c[i] + c[i+1]) + i }
        c[4]' = k*c[3]
        """;
    String alone =
        """
        parameter k = 2
        state c_1 = 1
        state c_2 = 1
        state c_3 = 1
        state c_4 = 1
        c_1' = -k*c_1
        c_2' = k*(c_1 - 2*c_2 + c_3) + 2
        c_3' = k*(c_2 - 2*c_3 + c_4) + 3
        c_4' = k*c_3
        """;
    assertEquals(listing(alone), flat(listing(family)));
  }

  @Test
  void nestedLoopsAndSumsOverTwoIndices() {
    String family =
        """
        state T[0..1, 1..2] = 1
        for i from 0 to 1 {
          for j from i + 1 to 2 { T[i,j]' = sum over k from 1 to j of k*T[i,k] }
        }
        T[1,1]' = -T[1,1] + sum over i from 0 to 1 of sum over j from 1 to 2 of (i + j)*T[i, j]
        """;
    String alone =
        """
        state T_0_1 = 1
        state T_0_2 = 1
        state T_1_1 = 1
        state T_1_2 = 1
        T_0_1' = T_0_1
        T_0_2' = T_0_1 + 2*T_0_2
        T_1_2' = T_1_1 + 2*T_1_2
        T_1_1' = -T_1_1 + ((T_0_1 + 2*T_0_2) + (2*T_1_1 + 3*T_1_2))
        """;
    assertEquals(listing(alone), flat(listing(family)));
  }

  @Test
  void theBodyOfASumIsOneProduct() {
    assertEquals(
        listing("state c_1 = 1\nstate c_2 = 1\nc_1' = 3*c_1 + 3*c_2 - 5\nc_2' = 2*(c_1 + c_2)"),
        flat(
            listing(
                """
                state c[1..2] = 1
                c[1]' = sum over i from 1 to 2 of 3*c[i] - 5
                c[2]' = 2*sum over i from 1 to 2 of c[i]
                """)));
  }

  @Test
  void familiesOfSecondOrderHaveRates() {
    SystemModel system =
        ModelListing.system(
            """
            system S over t [s] from 0 to 1 {
              state q[1..2] [m] = 1 scale 3
              state q' [mm/s] = 5 scale 7
              for i from 1 to 2 { q[i]'' = -i*q[i]/1 [s2] }
            }
            """);
    assertEquals(
        List.of("q[1]", "q[1]'", "q[2]", "q[2]'"),
        system.states().stream().map(StateComponent::label).toList());
    assertEquals(
        List.of(3.0, 7.0, 3.0, 7.0), system.states().stream().map(StateComponent::scale).toList());
    assertEquals(
        List.of(1.0, 0.005, 1.0, 0.005),
        system.initialValues().getFirst().values().stream().map(TermEvaluator::constant).toList());
    assertEquals("mm/s", system.states().get(3).unit().code());
  }

  @Test
  void transfersInALoopKeepTheBalance() {
    String family =
        """
        state q[1..3] = 0
        transfer outside -> q[1] = 1
        for i from 1 to 2 { transfer q[i] -> q[i+1] = 2*q[i] }
        """;
    String alone =
        """
        state q_1 = 0
        state q_2 = 0
        state q_3 = 0
        transfer outside -> q_1 = 1
        transfer q_1 -> q_2 = 2*q_1
        transfer q_2 -> q_3 = 2*q_2
        """;
    assertEquals(listing(alone), flat(listing(family)));
  }

  @Test
  void rangesAndBoundsMayUseParametersOfTheSystemAndTheFile() {
    SystemModel system =
        ModelListing.system(
            """
            parameter n = 2^2
            system S over t from 0 to 1 {
              output all = sum over i from low to n of c[i]
              state x = 1
              state c[low..n] = 1
              state y = 1
              let low = m/2
              parameter m = 4
              x' = -x
              y' = -y
              for i from low to n { c[i]' = -i*c[i] }
            }
            """);
    assertEquals(
        List.of("x", "c[2]", "c[3]", "c[4]", "y"),
        system.states().stream().map(StateComponent::label).toList());
    assertEquals(
        "(1) c[2] + (1) c[3] + (1) c[4] + 0",
        ModelListing.affine(system, system.outputs().getFirst().value()));
  }

  @Test
  void namedValuesMaySetAWholeFamilyAndLoop() {
    SystemModel system =
        ModelListing.system(
            """
            system S over t from 0 to 1 {
              state c[1..3]
              state d[1..3]
              for i from 1 to 3 { c[i]' = -c[i]; d[i]' = -d[i] }
              initial values a { c = 7; d[1] = 0; for i from 2 to 3 { d[i] = 10*i } }
            }
            """);
    assertEquals(
        List.of(7.0, 7.0, 7.0, 0.0, 20.0, 30.0),
        system.initialValues().getFirst().values().stream().map(TermEvaluator::constant).toList());
  }

  @Test
  void jumpsBoundariesAndRowsMayLoop() {
    SystemModel system =
        ModelListing.system(
            """
            system S over t from 0 to 9 {
              state c[1..3]
              for i from 1 to 3 { c[i]' = -c[i] }
              jump at 3 { for i from 2 to 3 { c[i] becomes c[i-1] + i } }
              jump at 4 { c becomes 2 }
              boundary b { for i from 1 to 3 { c[i](i) = 2*i } }
              basis s at 0 =
                row c[1] = 1, 2, 3
                for i from 2 to 3 {
                  row c[i] = 0, i, i^2
                }
            }
            """);
    assertEquals(2, system.jumps().getFirst().changes().size());
    assertEquals(
        "(1) c[2] + 3",
        ModelListing.affine(system, system.jumps().getFirst().changes().get(1).value()));
    assertEquals(3, system.jumps().get(1).changes().size());
    assertEquals(3, system.boundaries().getFirst().conditions().size());
    Basis.Given basis = (Basis.Given) system.bases().getFirst();
    assertEquals("0, 3, 9", ModelListing.texts(system, basis.rows().get(2)));
  }

  @Test
  void requirementsInALoopSayTheirTurn() {
    SystemModel system =
        ModelListing.system(
            """
            system S over t from 0 to 9 {
              state c[1..2] = 1
              for i from 1 to 2 {
                c[i]' = -c[i]
                require c[i](before 6) < 3
              }
            }
            """);
    assertEquals(
        List.of("c[i](before 6) < 3 (i = 1)", "c[i](before 6) < 3 (i = 2)"),
        system.requirements().stream().map(Requirement::text).toList());
  }

  @Test
  void entriesLeadBackToTheLineInTheLoop() {
    String text =
        """
        system S over t from 0 to 9 {
          state c[1..3] = 1
          c[1]' = -c[1]
          for i from 2 to 3 { c[i]' = 4*c[i-1] - c[i] }
        }
        """;
    LinearForm form = ModelListing.system(text).equations().orElseThrow();
    LinearForm.MatrixEntry entry =
        form.matrix().stream()
            .filter(e -> e.row() == 2 && e.column() == 1)
            .findFirst()
            .orElseThrow();
    Span span = entry.sources().getFirst();
    assertEquals("4*c[i-1]", text.substring(span.start(), span.end()));
  }

  /**
   * The matrix of second differences has the eigenvalues {@code -4/h^2 sin^2(k pi/(2(n+1)))}, k = 1
   * to n (any text on finite differences, common practice).
   */
  @ParameterizedTest
  @ValueSource(ints = {2, 7, 40})
  void secondDifferencesHaveTheirEigenvalues(int n) {
    LinearForm form =
        ModelListing.system(
                """
                parameter n = %d
                system Bar over t from 0 to 9 {
                  parameter h = 0.5
                  state T[1..n] = 1
                  T[1]' = (T[2] - 2*T[1])/h^2
                  for i from 2 to n-1 { T[i]' = (T[i-1] - 2*T[i] + T[i+1])/h^2 }
                  T[n]' = (T[n-1] - 2*T[n])/h^2
                }
                """
                    .formatted(n)
                    .replace(
                        "for i from 2 to n-1", n == 2 ? "for i from 1 to 0" : "for i from 2 to n-1")
                    .replace("for i from 1 to 0 { T[i]' = (T[i-1] - 2*T[i] + T[i+1])/h^2 }", ""))
            .equations()
            .orElseThrow();
    RealMatrix matrix = MatrixUtils.createRealMatrix(n, n);
    form.matrix()
        .forEach(e -> matrix.setEntry(e.row(), e.column(), TermEvaluator.constant(e.term())));
    double[] found = new EigenDecompositionSymmetric(matrix).getEigenvalues();
    double[] expected =
        IntStream.rangeClosed(1, n)
            .mapToDouble(k -> -4 / 0.25 * Math.pow(Math.sin(k * Math.PI / (2 * (n + 1))), 2))
            .toArray();
    for (int i = 0; i < n; i++) {
      assertEquals(expected[i], found[i], 1e-11);
    }
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "state c[1..2] = 1; for i from 1 to 10^12 { c[i]' = -c[i] } | expansion-too-large",
        "state c[1..10^9] = 1; c[1]' = 2 | expansion-too-large",
        "state c[1..10^5,1..10^5] = 1; c[1,1]' = 2 | expansion-too-large",
        "state c[-10^15..10^15] = 1; c[1]' = 2 | expansion-too-large",
        "state x = 1; "
            + "x' = sum over i from 1 to 10^6 of sum over j from 1 to 10^6 of x |"
            + " expansion-too-large",
      })
  void whatIsTooLargeIsRefusedBeforeItIsBuilt(String body, String id) {
    Model model = ModelListing.read("system S over t from 0 to 1 {\n" + body + "\n}");
    assertEquals(List.of(id), model.problems().stream().map(p -> p.kind().id()).toList());
  }

  @Test
  void aSumOfManyStatesIsFlat() {
    SystemModel system =
        ModelListing.system(
            """
            system S over t from 0 to 1 {
              state c[1..3000] = 1
              output all = sum over i from 1 to 3000 of c[i]
              for i from 1 to 3000 { c[i]' = -c[i] }
            }
            """);
    assertEquals(3000, system.outputs().getFirst().value().samples().size());
    assertTrue(
        system.outputs().getFirst().value().samples().stream()
            .allMatch(s -> Simplifier.isOne(s.coefficient())));
  }
}
