/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.SequencedMap;
import org.junit.jupiter.api.Test;
import org.spanloom.analysis.coefficients.CompiledSystem;
import org.spanloom.analysis.coefficients.SystemCompiler;
import org.spanloom.analysis.requirement.RequirementResult;
import org.spanloom.analysis.solve.Sampling;
import org.spanloom.analysis.solve.SolutionTable;
import org.spanloom.analysis.solve.SolveAnswer;
import org.spanloom.analysis.solve.SolveRequest;
import org.spanloom.analysis.solve.TrajectorySolve;
import org.spanloom.language.model.Model;
import org.spanloom.language.model.ModelReader;
import org.spanloom.language.text.SourceText;
import org.spanloom.numerics.Jump;
import org.spanloom.numerics.Progress;

class JumpCheckTests {

  private static final String TANK =
      """
      system Tank over t [h] from 0 to 48 {
        parameter k [/h] = 0.25
        parameter dose [mg] = 40
        parameter pause [h] = 6
        state content [g] = 0 scale 1e-3
        content' = -k*content
        jump every pause from 0 to 42 { content becomes content + dose }
      %s
      }
      """;

  private static Checked tank(String more) {
    return Checked.of(String.format(TANK, more));
  }

  /** Just after dose N: {@code D (1 - q^N)/(1 - q)} with {@code q = e^(-k tau)}, in g. */
  private static double peak(int doses) {
    double q = Math.exp(-0.25 * 6);
    return 0.04 * (1 - Math.pow(q, doses)) / (1 - q);
  }

  private static void assertHeld(double value, RequirementResult result) {
    assertEquals(RequirementResult.Status.HELD, result.status(), result.detail());
    assertEquals(value, result.value(), 1e-12, result.detail());
  }

  @Test
  void bothSidesOfAJumpCanBeRequired() {
    Checked checked =
        tank(
            """
              require content(0) > 39 [mg]
              require content(before 0) < 1 [mg]
              require content(24) > 39 [mg]
              require content(before 24) < 39 [mg]
            """);
    assertEquals(List.of(), checked.alarms());
    assertHeld(40, checked.requirement(0));
    assertHeld(0, checked.requirement(1));
    assertHeld(1000 * peak(5), checked.requirement(2));
    assertHeld(1000 * (peak(5) - 0.04), checked.requirement(3));
  }

  @Test
  void throughoutLooksAtBothSidesOfAJump() {
    Checked checked =
        tank(
            """
              require content < 52 [mg] throughout
              require content > -1 [mg] throughout
              jump at 45 { content becomes content + 1 [g] }
              require content < 1 [g] throughout
            """);
    RequirementResult last = checked.requirement(2);
    assertEquals(RequirementResult.Status.FAILED, last.status());
    assertEquals(45, last.time().orElseThrow());
    Checked low =
        Checked.of(
            """
            system S over t from 0 to 10 {
              state x = 1
              x' = -x
              jump every 2 from 2 to 8 { x becomes x + 1 }
              require x > 0.14 throughout
              jump at 9 { x becomes x - 1 }
              require nonnegative
            }
            """);
    RequirementResult trough = low.requirement(0);
    assertEquals(RequirementResult.Status.FAILED, trough.status());
    RequirementResult negative = low.requirement(1);
    assertEquals(9, negative.time().orElseThrow());
    Checked left =
        Checked.of(
            """
            system S over t from 0 to 3 {
              state x = 1
              x' = -x
              jump at 2 { x becomes 1 }
              require x > 0.2 throughout
            }
            """);
    assertEquals(Math.exp(-2), left.requirement(0).value(), 1e-12);
    assertEquals(2, left.requirement(0).time().orElseThrow());
  }

  @Test
  void unitsAndZeroPointsAreConverted() {
    Model model =
        ModelReader.read(
            new SourceText(
                "a.span",
                """
                system S over t [h] from 0 to 9 {
                  state a [Cel] = 20
                  state b [K] = 300
                  state z [km] = 1
                  state z' [km/h] = 1
                  a' = 0 [K/h]
                  b' = 0 [K/h]
                  z'' = 0 [m/s2]
                  jump at 1 { a becomes a + 5 [K]; z' becomes z/1 [min] }
                  jump at 2 { a becomes b; b becomes a; z becomes 200 [m] }
                  jump at 3 { a becomes (a + b)/2 + 1 [K]*(t/1 [h]) }
                }
                """));
    assertEquals(List.of(), model.problems());
    CompiledSystem system =
        SystemCompiler.compile(model.systems().getFirst(), new LinkedHashMap<>());
    List<Jump> jumps = system.linear().jumps();
    double[] x = {20, 300, 1, 7};
    x = jumps.get(0).after(x, 1, true);
    assertEquals(25, x[0]);
    assertEquals(60, x[3], 1e-12);
    x = jumps.get(1).after(x, 1, true);
    assertEquals(300 - 273.15, x[0], 1e-12);
    assertEquals(298.15, x[1], 1e-12);
    assertEquals(0.2, x[2], 1e-15);
    x = jumps.get(2).after(x, 1, true);
    assertEquals((300 + 298.15) / 2 + 3 - 273.15, x[0], 1e-11);
  }

  @Test
  void jumpsAtOneTimeFollowTheOrderOfTheText() {
    Checked checked =
        Checked.of(
            """
            system S over t from 0 to 4 {
              state x = 1
              x' = 0
              jump at 2 { x becomes x + 1 }
              jump every 1 from 1 to 3 { x becomes 10*x }
              require x(2) > 109.9
              require x(4) < 1100.1
            }
            """);
    assertHeld(110, checked.requirement(0));
    assertHeld(1100, checked.requirement(1));
  }

  @Test
  void anInvariantMustSurviveJumps() {
    String loop =
        """
        system Loop over t [h] from 0 to 10 {
          state a [g] = 3
          state b [g] = 1
          transfer a -> b = a/2 [h]
          %s
          require invariant a + b
        }
        """;
    Checked moved =
        Checked.of(String.format(loop, "jump at 4 { a becomes a + b/2; b becomes b/2 }"));
    assertEquals(RequirementResult.Status.HELD, moved.requirement(0).status());
    for (String line : List.of("a becomes a + 1 [g]", "b becomes b/2", "a becomes b")) {
      Checked changed = Checked.of(String.format(loop, "jump at 4 { " + line + " }"));
      RequirementResult result = changed.requirement(0);
      assertEquals(RequirementResult.Status.FAILED, result.status(), line);
      assertEquals("the jump at t = 4 h changes it", result.detail());
    }
  }

  @Test
  void aPeriodHoldsForJumpsToo() {
    String pond =
        """
        system Pond over t [h] from 0 to 48 {
          state x [g] = 1
          x' = -x/3 [h]
          jump every 12 from %s { x becomes x/2 + 1 [g] }
          require period %s
        }
        """;
    assertEquals(
        RequirementResult.Status.HELD,
        Checked.of(pond.formatted("6 to 42", "12")).requirement(0).status());
    assertEquals(
        RequirementResult.Status.HELD,
        Checked.of(pond.formatted("12 to 36", "24")).requirement(0).status());
    assertEquals(
        "the jump at t = 6 h does not take place one period earlier or later",
        Checked.of(pond.formatted("6 to 42", "8")).requirement(0).detail());
    assertEquals(
        "the jump at t = 30 h does not take place one period earlier or later",
        Checked.of(pond.formatted("6 to 30", "12")).requirement(0).detail());
  }

  @Test
  void finitelyManyJumpsLeaveASystemStable() {
    Checked checked =
        Checked.of(
            """
            system S over t from 0 {
              state x = 1
              x' = -x
              jump at 3 { x becomes 1e9*x }
              require stable
            }
            """);
    assertEquals(RequirementResult.Status.HELD, checked.requirement(0).status());
  }

  @Test
  void aJumpThatCannotBeUndoneIsANoteWithWhatIsLost() {
    String mix =
        """
        system Mix over t [h] from 0 to 10 {
          state a [g] = 3
          state b [kg] = 1
          transfer a -> b = a/2 [h]
          jump at 4 {
            %s
          }
        %s
        }
        """;
    Checked even = Checked.of(mix.formatted("a becomes (a + b)/2; b becomes (a + b)/2", ""));
    assertEquals(List.of(), even.alarms());
    assertEquals(List.of("5 jump-singular"), even.notes());
    assertEquals(
        "the jump at t = 4 h cannot be undone: solutions that differ by b - 1000 times a just"
            + " before it are one behind it, so every basis is singular from there on; nothing to"
            + " do unless something relies on one behind it",
        even.finding("jump-singular").message());
    Checked emptied = Checked.of(mix.formatted("a becomes 0", "  basis Phi at 0"));
    assertEquals(List.of("8 basis-without-digits"), emptied.alarms());
    assertTrue(emptied.finding("jump-singular").message().contains("differ by a just before"));
    Checked early =
        Checked.of(
            mix.formatted(
                "a becomes 0", "  basis Phi at 0\n  require condition(Phi) < 1e6 until 3"));
    assertEquals(List.of(), early.alarms());
    Checked fine = Checked.of(mix.formatted("a becomes a + 1 [g]", ""));
    assertEquals(List.of(), fine.notes());
  }

  @Test
  void closedFormsMustFollowTheJumps() {
    Checked smooth =
        Checked.of(
            """
            system S over t from 0 to 4 {
              state x = 1
              x' = -x
              jump at 2 { x becomes x/2 }
              basis c(t) =
                row x = exp(-t)
            }
            """);
    assertEquals(List.of("6 basis-not-a-solution"), smooth.alarms());
    assertEquals(2, smooth.finding("basis-not-a-solution").numbers().get("time"));
    Checked added =
        Checked.of(
            """
            system S over t from 0 to 4 {
              state x = 1
              x' = -x
              jump at 2 { x becomes x + 7 }
              basis c(t) =
                row x = exp(-t)
            }
            """);
    assertEquals(List.of(), added.alarms());
  }

  private static SolveAnswer solve(Sampling sampling, SequencedMap<String, Double> parameters) {
    Model model = ModelReader.read(new SourceText("a.span", String.format(TANK, "")));
    return TrajectorySolve.solve(
        new SolveRequest(
            model,
            Optional.empty(),
            Optional.empty(),
            OptionalDouble.empty(),
            OptionalDouble.empty(),
            sampling,
            parameters,
            OptionalDouble.empty(),
            Optional.empty()),
        Progress.NONE);
  }

  @Test
  void aRowAtAJumpHoldsTheValueBehindIt() {
    SolveAnswer.Solved solved =
        assertInstanceOf(
            SolveAnswer.Solved.class, solve(new Sampling.Even(9), new LinkedHashMap<>()));
    SolutionTable table = solved.table();
    for (int k = 0; k < 8; k++) {
      assertEquals(peak(k + 1), table.columns().getFirst().values()[k], 1e-14);
    }
  }

  @Test
  void aCurveHoldsBothSides() {
    SolveAnswer.Solved solved =
        assertInstanceOf(
            SolveAnswer.Solved.class, solve(new Sampling.Curve(5, 400), new LinkedHashMap<>()));
    SolutionTable table = solved.table();
    int twice = 0;
    for (int k = 1; k < table.time().values().length; k++) {
      assertFalse(table.time().values()[k] < table.time().values()[k - 1]);
      if (table.time().values()[k] == table.time().values()[k - 1]) {
        twice++;
        double before = table.columns().getFirst().values()[k - 1];
        assertEquals(before + 0.04, table.columns().getFirst().values()[k], 1e-14);
      }
    }
    assertEquals(7, twice);
  }

  @Test
  void parametersOfARunMoveTheJumps() {
    SequencedMap<String, Double> rarely = new LinkedHashMap<>();
    rarely.put("pause", 42.0);
    SolveAnswer.Solved solved =
        assertInstanceOf(SolveAnswer.Solved.class, solve(new Sampling.Even(9), rarely));
    assertEquals(
        0.04 * Math.exp(-0.25 * 6), solved.table().columns().getFirst().values()[1], 1e-14);
    for (double pause : new double[] {-1, 0, 1e-9}) {
      SequencedMap<String, Double> wrong = new LinkedHashMap<>();
      wrong.put("pause", pause);
      SolveAnswer.Refused refused =
          assertInstanceOf(SolveAnswer.Refused.class, solve(new Sampling.Even(9), wrong));
      assertEquals(
          "with these values of parameters system Tank has no solution: "
              + (pause > 0
                  ? "jumps take place more than 100000 times."
                  : "the period of a jump is not positive, or its first time lies behind its last"
                      + " one."),
          refused.message());
    }
  }

  @Test
  void boundaryConditionsHoldAcrossJumps() {
    Checked checked =
        Checked.of(
            """
            system S over t from 0 to 4 {
              state x
              x' = -x
              jump at 2 { x becomes x + 1 }
              boundary ends { x(0) + x(4) = 1 }
              require x(0) > 0 under ends
            }
            """);
    assertEquals(List.of(), checked.alarms());
    // x(4) = (x(0) e^-2 + 1) e^-2.
    double start = (1 - Math.exp(-2)) / (1 + Math.exp(-4));
    assertEquals(start, checked.requirement(0).value(), 1e-6 * start);
  }
}
