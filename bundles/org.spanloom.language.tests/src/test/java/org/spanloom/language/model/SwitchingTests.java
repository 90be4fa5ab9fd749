/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.spanloom.language.model.TestTerms.T;
import static org.spanloom.language.model.TestTerms.c;
import static org.spanloom.language.model.TestTerms.div;
import static org.spanloom.language.model.TestTerms.f;
import static org.spanloom.language.model.TestTerms.mul;
import static org.spanloom.language.model.TestTerms.pow;
import static org.spanloom.language.model.TestTerms.sub;

import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.spanloom.language.text.SourceText;
import org.spanloom.language.units.Dimension;
import org.spanloom.language.units.UnitOfMeasure;

/** What choices and pulses mean, from the text to the value. */
class SwitchingTests {

  private static final UnitOfMeasure SECOND = new UnitOfMeasure("s", Dimension.TIME, 1, 0);

  private static SystemModel system(String text) {
    Model model = ModelReader.read(new SourceText("model.span", text));
    assertEquals(List.of(), model.problems(), text);
    return model.systems().getFirst();
  }

  private static Term let(String expression) {
    return system(
            "system S over t [h] from 0 to 48 {\nlet f(t) = "
                + expression
                + "\nstate x = 1\nx' = -f(t)*x/1 [h]\n}")
        .lets()
        .getFirst()
        .value();
  }

  private static double at(Term term, double hours) {
    return TermEvaluator.of(term).at(hours * 3600);
  }

  @Test
  void aChoiceTakesTheBranchOfItsCondition() {
    Term steps = let("if t < 6 then 1 else if t <= 8 [h] then 2 else if 10 > t then 3 else 4");
    assertEquals(1, at(steps, 0));
    assertEquals(2, at(steps, 6));
    assertEquals(2, at(steps, 8));
    assertEquals(3, at(steps, 8.001));
    assertEquals(4, at(steps, 10));
  }

  @Test
  void aLoneNumberTakesTheUnitOfWhatItIsGivenTo() {
    SystemModel system =
        system(
            """
            system S over t [h] from 0 to 48 {
              input heat(t) [kW] = if t < 360 [min] then 1.2 else (if t > 7 then 2 else 0)
              state E [kJ] = 0
              E' = heat(t)
            }
            """);
    assertEquals(1200, at(system.lets().getFirst().value(), 5.9));
    assertEquals(2000, at(system.lets().getFirst().value(), 7.1));
  }

  @Test
  void factorsOfStatesChangeWithTheCondition() {
    SystemModel system =
        system(
            """
            system S over t [s] from 0 to 10 {
              state x = 1
              state y = 1
              x' = (if t < 3 then -2*x + y else y + 5)/1 [s]
              y' = 0 [/s]
            }
            """);
    LinearForm form = system.equations().orElseThrow();
    assertEquals(2, form.matrix().size());
    assertEquals(-2, TermEvaluator.of(form.matrix().get(0).term()).at(1));
    assertEquals(0, TermEvaluator.of(form.matrix().get(0).term()).at(4));
    assertEquals("1", TermPrinter.text(form.matrix().get(1).term(), "t"));
    assertEquals(0, TermEvaluator.of(form.forcing().getFirst().term()).at(1));
    assertEquals(5, TermEvaluator.of(form.forcing().getFirst().term()).at(4));
  }

  @Test
  void aPulseIsOneWhileItLasts() {
    Term pulse = let("pulse(t, width = 10 [min], period = 6)");
    assertEquals(1, at(pulse, 0));
    assertEquals(1, at(pulse, 0.16));
    assertEquals(0, at(pulse, 0.17));
    assertEquals(1, at(pulse, 42));
    assertEquals(0, at(let("pulse(t, period = 6, width = 1, start = 2)"), 1.9));
    assertEquals(1, at(let("pulse(t, period = 6, width = 1, start = 2)"), 8.5));
  }

  @Test
  void anOutputAtANamedTimeTakesTheBranchOfThatTime() {
    SystemModel system =
        system(
            """
            system S over t [h] from 0 to 48 {
              state x = 1
              output o = (if t < 6 then 2 else 3)*x + pulse(t, period = 8, width = 1)
              x' = -x/1 [h]
              require o(7) < 100
            }
            """);
    Requirement.AtTime at = (Requirement.AtTime) system.requirements().getFirst();
    assertEquals(3, TermEvaluator.constant(at.left().samples().getFirst().coefficient()));
    assertEquals(Term.ZERO, at.left().constant());
  }

  @Test
  void onlyWhatDoesNothingIsLeftOut() {
    Term gap = sub(T, c(1));
    assertSame(T, Simplifier.choice(c(-1), false, T, c(2)));
    assertEquals(c(2), Simplifier.choice(c(0), false, T, c(2)));
    assertSame(T, Simplifier.choice(c(0), true, T, c(2)));
    assertEquals(c(2), Simplifier.choice(gap, true, c(2), c(2)));
    assertInstanceOf(Term.Switch.class, Simplifier.choice(div(c(1), T), true, c(2), c(2)));
    assertEquals(c(1), Simplifier.pulse(c(7), c(6), c(2), c(0)));
  }

  @Test
  void aDerivativeIsThatOfTheBranch() {
    Term choice = new Term.Switch(sub(T, c(1)), false, pow(T, 2), mul(c(5), T));
    Term derivative = TimeDerivative.of(choice);
    assertEquals(1, TermEvaluator.of(derivative).at(0.5));
    assertEquals(5, TermEvaluator.of(derivative).at(1.5));
    assertEquals(Term.ZERO, TimeDerivative.of(new Term.Pulse(T, c(6), c(2), c(0))));
  }

  @Test
  void termsAreWrittenAsTheyAreRead() {
    assertEquals(
        "if t < 21600 then 1 else if t <= 0 then 2 else 3",
        TermPrinter.text(let("if t < 6 then 1 else if t <= 0*6 [h] then 2 else 3"), "t"));
    assertEquals(
        "2*(if 0 < t then 1 else t/3600)",
        TermPrinter.text(let("2*(if 0 < t then 1 else t/1 [h])"), "t").replace("-t < 0", "0 < t"));
    assertEquals(
        "pulse(t, period = 3600, width = 60, start = 0)",
        TermPrinter.text(let("pulse(t, period = 1, width = 1 [min])"), "t"));
  }

  @Test
  void enclosuresHoldEveryValue() {
    Random random = new Random(7);
    for (int round = 0; round < 2000; round++) {
      Term a = TestTerms.random(random, 2, true);
      Term b = TestTerms.random(random, 2, true);
      Term term =
          random.nextBoolean()
              ? new Term.Switch(a, random.nextBoolean(), b, new Term.Negation(b))
              : mul(b, new Term.Pulse(T, c(0.7), c(0.2), c(random.nextInt(3))));
      double from = 4 * random.nextDouble() - 2;
      double to = from + random.nextDouble();
      Interval range = TermIntervals.range(term, new Interval(from, to));
      for (int sample = 0; sample < 20; sample++) {
        double t = from + (to - from) * random.nextDouble();
        assertTrue(range.contains(TermEvaluator.of(term).at(t)), TermPrinter.text(term, "t"));
      }
    }
  }

  @Test
  void aBranchThatIsNotTakenNeedsNoValue() {
    TimeInterval interval = new TimeInterval(0, false, 10, false);
    Term pole = div(c(1), sub(T, c(4)));
    assertInstanceOf(
        Definedness.Defined.class,
        Definedness.of(new Term.Switch(sub(c(5), T), false, pole, c(0)), interval, SECOND, 0));
    Definedness taken =
        Definedness.of(new Term.Switch(sub(c(3), T), false, pole, c(0)), interval, SECOND, 0);
    assertEquals(4, assertInstanceOf(Definedness.Undefined.class, taken).time());
    Term root = f(Function.SQRT, sub(c(3), T));
    assertInstanceOf(
        Definedness.Defined.class,
        Definedness.of(new Term.Switch(sub(T, c(3)), false, root, c(0)), interval, SECOND, 0));
    Term divisor = new Term.Switch(sub(T, c(1)), false, sub(c(3), T), c(2));
    assertInstanceOf(
        Definedness.Defined.class, Definedness.of(div(c(1), divisor), interval, SECOND, 0));
  }
}
