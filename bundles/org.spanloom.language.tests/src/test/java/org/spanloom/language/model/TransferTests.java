/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.spanloom.language.model.ModelListing.equations;
import static org.spanloom.language.model.ModelListing.system;

import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.spanloom.language.text.Span;

class TransferTests {

  @Test
  void whatLeavesOneAmountEntersTheOther() {
    SystemModel system =
        system(
            """
            system Dose over t [h] from 0 to 48 {
              parameter k_a [/h] = 0.9
              parameter k_e [/h] = 0.2
              let drip(t) = 3 [mg/h]*exp(-t/2 [h])
              state gut [mg] = 250
              state blood [g] = 0
              transfer outside -> gut = drip(t)
              transfer gut -> blood = k_a*gut
              transfer blood -> outside = k_e*blood
            }
            """);
    assertEquals(
        """
        M[gut, gut] = 1
        M[blood, blood] = 1
        K[gut, gut] = -k_a
        K[blood, gut] = k_a
        K[blood, blood] = -k_e
        f[gut] = drip(t)
        """,
        equations(system));
  }

  @Test
  void aReversibleFlowStandsInBothBalances() {
    SystemModel system =
        system(
            """
            system Pair over t from 0 to 1 {
              state a = 1
              state b = 0
              output net = 2*a - 3*b
              transfer a -> b = net
            }
            """);
    assertEquals(
        """
        M[a, a] = 1
        M[b, b] = 1
        K[a, a] = -2
        K[a, b] = 3
        K[b, a] = 2
        K[b, b] = -3
        """,
        equations(system));
  }

  /** The columns of K and f sum to what crosses the border, whatever the network between. */
  @Test
  void theBalanceHoldsByConstruction() {
    StringBuilder text = new StringBuilder("system Net over t from 0 to 1 {\n");
    int n = 12;
    for (int i = 0; i < n; i++) {
      text.append(" state q" + i + " = 1\n");
    }
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        if (i != j && (i * 7 + j * 3) % 4 == 0) {
          text.append(" transfer q" + i + " -> q" + j + " = (0.1 + t)*" + (i + 1) + "*q" + i);
          text.append(" - q" + j + "*sin(" + j + "*t)\n");
        }
      }
    }
    text.append(" transfer q3 -> outside = 0.25*q3\n transfer outside -> q5 = 2*t\n}\n");
    LinearForm form = system(text.toString()).equations().orElseThrow();
    double t = 0.625;
    double[] sums = new double[n];
    form.matrix().forEach(e -> sums[e.column()] += at(e.term(), t));
    for (int i = 0; i < n; i++) {
      assertEquals(i == 3 ? -0.25 : 0, sums[i], 1e-13, "column " + i);
    }
    assertEquals(1, form.forcing().size());
    assertEquals(1.25, at(form.forcing().getFirst().term(), t));
  }

  private static double at(Term term, double t) {
    return TermEvaluator.of(term, Map.of()).at(t);
  }

  @Test
  void transfersAndEquationsGovernDifferentStates() {
    SystemModel system =
        system(
            """
            system S over t from 0 to 1 {
              state held = 1
              state level = 0
              state level' = 0
              transfer outside -> held = level' - 0.5*held
              level'' + level' = held'
            }
            """);
    assertEquals(
        """
        M[held, held] = 1
        M[level, level] = 1
        M[level', held] = -1
        M[level', level'] = 1
        K[held, held] = -0.5
        K[held, level'] = 1
        K[level, level'] = 1
        K[level', level'] = -1
        """,
        equations(system));
  }

  @Test
  void everyEntryAndStateLeadsBackToItsTransfer() {
    String text =
        "system S over t from 0 to 1 {\n state a = 1; state b = 1\n transfer a -> b = 2*a + t\n"
            + " transfer b -> outside = 3*b\n}";
    SystemModel system = system(text);
    LinearForm form = system.equations().orElseThrow();
    assertEquals(
        List.of("2*a", "2*a", "3*b"),
        form.matrix().stream().map(e -> slice(text, e.sources().getFirst())).toList());
    assertEquals(
        List.of("t", "t"),
        form.forcing().stream().map(e -> slice(text, e.sources().getFirst())).toList());
    assertEquals("transfer a -> b = 2*a + t", slice(text, system.states().get(1).equation()));
  }

  private static String slice(String text, Span span) {
    return text.substring(span.start(), span.end());
  }

  @Test
  void outsideIsANameElsewhere() {
    SystemModel system =
        system(
            """
            system S over t from 0 to 1 {
              parameter outside = 3
              state a = 1
              transfer outside -> a = outside*a
            }
            """);
    assertEquals("M[a, a] = 1\nK[a, a] = outside\n", equations(system));
  }

  @Test
  void aBrokenTransferLeavesNoHalfBalance() {
    Model model =
        ModelListing.read(
            "system S over t from 0 to 1 {\n state a = 1; state b = 1\n transfer a -> b = 2*a\n"
                + " transfer b -> outside = a*b\n}");
    assertEquals(List.of("not-linear"), model.problems().stream().map(p -> p.kind().id()).toList());
    assertTrue(model.systems().getFirst().equations().isEmpty());
    assertFalse(model.systems().getFirst().states().isEmpty());
  }

  /** Many flows into one amount: neither deep terms nor square cost. */
  @Test
  void manyTransfersIntoOneState() {
    StringBuilder text = new StringBuilder("system Delta over t from 0 to 1 {\n state sea = 0\n");
    for (int i = 0; i < 5000; i++) {
      text.append(" state r" + i + " = 1\n transfer r" + i + " -> sea = " + (i + 2) + "*r" + i);
      text.append("\n");
    }
    LinearForm form = system(text.append("}").toString()).equations().orElseThrow();
    assertEquals(10_000, form.matrix().size());
  }
}
