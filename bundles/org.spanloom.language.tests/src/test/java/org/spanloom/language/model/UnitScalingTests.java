/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestFactory;
import org.spanloom.language.TestTexts;
import org.spanloom.language.syntax.Parser;
import org.spanloom.language.text.SourceText;

/** A model written in other units is the same model. */
class UnitScalingTests {

  private static final int MODELS = 15;
  private static final int TIMES = 7;

  private static Optional<String> scaled(String text) {
    return UnitScaling.of(Parser.parse(new SourceText("test.span", text)));
  }

  @Test
  void numbersFollowTheirUnits() {
    assertEquals(
        """
        system S over t [s] from 0.0 to 7200.0 {
          state x [mm] = 3000.0 scale 10000.0
          x' = -x/1800.0 [s]
          require x(3600.0) < 2000.0 [mm]
        }
        """,
        scaled(
                """
                system S over t [h] from 0 to 2 {
                  state x [m] = 3 scale 10
                  x' = -x/0.5 [h]
                  require x(1) < 2 [m]
                }
                """)
            .orElseThrow());
  }

  @TestFactory
  List<DynamicTest> modelsInOtherUnitsHaveTheSameCoefficients() {
    List<DynamicTest> tests = new ArrayList<>();
    for (Map.Entry<String, String> e : TestTexts.models().entrySet()) {
      Optional<String> other = scaled(e.getValue());
      if (other.isPresent() && !other.get().equals(e.getValue())) {
        tests.add(DynamicTest.dynamicTest(e.getKey(), () -> assertSame(e.getValue(), other.get())));
      }
    }
    assertTrue(tests.size() >= MODELS, "models: " + tests.size());
    return tests;
  }

  private static void assertSame(String text, String other) {
    Model model = ModelListing.read(text);
    Model changed = ModelListing.read(other);
    assertEquals(
        model.problems().stream().map(p -> p.kind()).toList(),
        changed.problems().stream().map(p -> p.kind()).toList(),
        other);
    for (int i = 0; i < model.systems().size(); i++) {
      double[] before = values(model.systems().get(i), model.systems().get(i).interval());
      double[] after = values(changed.systems().get(i), changed.systems().get(i).interval());
      assertEquals(before.length, after.length, other);
      assertNotEquals(0, before.length);
      for (int k = 0; k < before.length; k++) {
        assertEquals(before[k], after[k], 1e-12 * Math.abs(before[k]), other);
      }
    }
  }

  /** Evaluates, in SI units, all of M, K, f, the outputs and the initial values. */
  private static double[] values(SystemModel system, TimeInterval interval) {
    List<Term> terms = new ArrayList<>();
    system
        .equations()
        .ifPresent(form -> {
          form.mass().forEach(e -> terms.add(e.term()));
          form.matrix().forEach(e -> terms.add(e.term()));
          form.forcing().forEach(e -> terms.add(e.term()));
        });
    for (Output output : system.outputs()) {
      output.value().samples().forEach(s -> terms.add(s.coefficient()));
      terms.add(output.value().constant());
    }
    system.initialValues().forEach(values -> terms.addAll(values.values()));
    double second = system.timeUnit().factor();
    double start = Math.max(interval.start() * second, -1e6);
    double end = Math.min(interval.end() * second, 1e6);
    List<Double> values = new ArrayList<>(List.of(start, end));
    for (Term term : terms) {
      TermEvaluator evaluator = TermEvaluator.of(term);
      for (int i = 1; i <= TIMES; i++) {
        values.add(evaluator.at(start + (end - start) * i / (TIMES + 1)));
      }
    }
    return values.stream().mapToDouble(Double::doubleValue).toArray();
  }
}
