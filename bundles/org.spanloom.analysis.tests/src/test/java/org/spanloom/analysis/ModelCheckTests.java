/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.spanloom.analysis.requirement.RequirementResult;
import org.spanloom.analysis.requirement.RequirementResult.Status;
import org.spanloom.analysis.settings.Settings;

class ModelCheckTests {

  /** Two tanks of the station's rain water supply, one above the other. Invented. */
  private static final String TANKS =
      """
      system Tanks over t [h] from 0 to 10 {
        parameter k [/h] = 0.5
        parameter inflow [m3/h] = 0
        state upper [m3] = 2
        state lower [m3] = 0
        upper' = inflow - k*upper
        lower' = k*upper - 2 [/h]*lower
        accuracy 1e-9
      %s
      }
      """;

  private static Checked tanks(String more) {
    return Checked.of(String.format(TANKS, more));
  }

  @Test
  void aSoundSystemGivesNoAlarmAndItsPrincipalBasis() {
    Checked checked = tanks("");
    assertEquals(List.of(), checked.alarms());
    assertEquals("principal", checked.basis().name());
    assertFalse(checked.basis().declared());
    assertTrue(checked.report().isClean());
  }

  /**
   * The principal basis of upper' = -k upper, lower' = k upper - c lower is known in closed form.
   */
  @Test
  void theConditionOfABasisIsThatOfItsClosedForm() {
    Checked checked = tanks("  basis Phi at 0");
    double up = Math.exp(-0.5 * 10);
    double down = Math.exp(-2.0 * 10);
    double mixed = 0.5 / (2 - 0.5) * (up - down);
    double sum = up * up + down * down + mixed * mixed;
    double det = up * down;
    double root = Math.sqrt(sum * sum - 4 * det * det);
    double expected = (sum + root) / (2 * det);
    assertEquals(expected, checked.basis().worstRaw(), 1e-6 * expected);
    assertEquals(10, checked.basis().worstRawTime(), 1e-9);
    double column = Math.hypot(up, mixed);
    double cosine = mixed / column;
    double scaled = Math.sqrt((1 + cosine) / (1 - cosine));
    assertEquals(scaled, checked.basis().worstScaled(), 1e-6 * scaled);
  }

  @Test
  void requirementsAtATimeCarryValueMarginAndError() {
    Checked checked =
        tanks(
            """
              require upper(2 [h]) < 0.8 [m3]
              require upper(120 [min]) > 0.8 [m3]
              require 2*upper(0) - upper(1) >= 2700 [L]
            """);
    RequirementResult held = checked.requirement(0);
    double value = 2 * Math.exp(-1);
    assertEquals(Status.HELD, held.status());
    assertEquals(value, held.value(), 1e-9);
    assertEquals(0.8, held.limit(), 1e-15);
    assertEquals(0.8 - value, held.margin(), 1e-9);
    assertEquals(OptionalDouble.of(2), held.time());
    assertTrue(held.error() > 0 && held.error() < 1e-8, "error " + held.error());
    assertEquals(Status.FAILED, checked.requirement(1).status());
    assertEquals(value - 0.8, checked.requirement(1).margin(), 1e-9);
    assertEquals(Status.HELD, checked.requirement(2).status());
    assertEquals(List.of("10 requirement-failed"), checked.alarms());
    assertFalse(checked.report().isClean());
  }

  @Test
  void aMarginWithinItsErrorIsUndecidedAndCountsAsFailed() {
    Checked checked = tanks("  require upper(2) < " + 2 * Math.exp(-1) + " [m3]");
    assertEquals(Status.UNDECIDED, checked.requirement(0).status());
    assertEquals(List.of("9 requirement-undecided"), checked.alarms());
    assertFalse(checked.report().isClean());
  }

  /** lower(t) = 2/3 (e^(-t/2) - e^(-2t)), largest at t = ln(4)/1.5. */
  @Test
  void throughoutFindsTheExtremumBetweenTheSamples() {
    Checked checked =
        tanks(
            """
              require lower < 0.32 [m3] throughout
              require lower < 0.3 [m3] throughout until 0.5 [h]
            """);
    double peak = Math.log(4) / 1.5;
    double value = 2.0 / 3 * (Math.exp(-peak / 2) - Math.exp(-2 * peak));
    RequirementResult result = checked.requirement(0);
    assertEquals(value, result.value(), 1e-9);
    assertEquals(peak, result.time().getAsDouble(), 1e-4);
    assertEquals(Status.HELD, result.status());
    assertEquals(0.5, checked.requirement(1).time().getAsDouble(), 1e-9);
  }

  @Test
  void nonnegativeInvariantAndPeriodAreJudged() {
    Checked checked =
        Checked.of(
            """
            system Loop over t [h] from 0 to 10 {
              let pump(t) = 0.4 [/h]*(1 + 0.5*sin(2*pi*t/(2 [h])))
              state a [m3] = 2
              state b [m3] = 0
              a' = -pump(t)*a + 1 [/h]*b
              b' = pump(t)*a - 1 [/h]*b
              require nonnegative
              require invariant a + b
              require invariant a + 2*b
              require period 2 [h]
              require period 1.5 [h]
            }
            """);
    assertEquals(
        List.of(Status.HELD, Status.HELD, Status.FAILED, Status.HELD, Status.FAILED),
        checked.report().systems().getFirst().requirements().stream()
            .map(RequirementResult::status)
            .toList());
  }

  @Test
  void stabilityOfConstantCoefficientsIsTheSpectralAbscissa() {
    Checked checked =
        Checked.of(
            """
            system Mooring over t [s] from 0 {
              parameter m [kg] = 120
              parameter c [N.s/m] = 48
              parameter k [N/m] = 1400
              state x [m] = 0.1
              state x' [m/s] = 0
              m*x'' + c*x' + k*x = 0 [N]
              require stable
            }
            """);
    assertEquals(Status.HELD, checked.requirement(0).status());
    assertEquals(-48.0 / (2 * 120), checked.requirement(0).value(), 1e-12);
  }

  @Test
  void stabilityOfAPeriodicSystemIsItsLargestMultiplier() {
    Checked checked =
        Checked.of(
            """
            system Damper over t [s] from 0 {
              state x = 1
              x' = (cos(2*pi*t/(3 [s])) - 0.25)*x*1 [/s]
              require stable
              require period 3 [s]
            }
            """);
    assertEquals(Status.HELD, checked.requirement(0).status());
    assertEquals(Math.exp(-0.75), checked.requirement(0).value(), 1e-8);
  }

  /**
   * The integral of |sin(pi t / 1 h)| over 10 h is 20/pi h; of sign(t - 3.3 h) over 10 h it is 3.4
   * h.
   */
  @Test
  void cornersAndJumpsCostNoDigits() {
    Checked checked =
        Checked.of(
            """
            system Pump over t [h] from 0 to 10 {
              state lifted [m3] = 0
              state level [m3] = 0
              lifted' = abs(sin(pi*t/(1 [h])))*1 [m3/h]
              level' = sign(t - 3.3 [h])*1 [m3/h]
              accuracy 1e-10
              require lifted(10) > 1 [m3]
              require level(10) > 1 [m3]
            }
            """);
    for (int k = 0; k < 2; k++) {
      RequirementResult result = checked.requirement(k);
      double error = Math.abs(result.value() - (k == 0 ? 20 / Math.PI : 3.4));
      assertTrue(error <= result.error() && result.error() < 1e-9, error + ", " + result.error());
    }
  }

  @Test
  void dependentColumnsAreNamedWithTheirCombination() {
    Checked checked =
        tanks(
            """
              basis S at 0 =
                row upper = 1, 2
                row lower = 3, 6
            """);
    assertEquals(List.of("9 basis-dependent"), checked.alarms());
    String message = checked.finding("basis-dependent").message();
    assertTrue(message.contains("column 1") && message.contains("column 2"), message);
  }

  @Test
  void closedFormsAreHeldAgainstTheEquations() {
    String right =
        """
          basis C(t) =
            row upper = 1 [m3]*exp(-k*t), 0
            row lower = k/(2 [/h] - k)*1 [m3]*exp(-k*t), 1 [m3]*exp(-2 [/h]*t)
        """;
    assertEquals(List.of(), tanks(right).alarms());
    Checked wrong = tanks(right.replace("exp(-2 [/h]*t)", "exp(-3 [/h]*t)"));
    assertEquals(List.of("11 basis-not-a-solution"), wrong.alarms());
    Finding finding = wrong.finding("basis-not-a-solution");
    assertEquals(0.2, finding.numbers().get("residual"), 0.05);
    assertTrue(finding.message().contains("column 2"), finding.message());
  }

  /** Rates 40/h and 1/h: after 1 h the fast direction is at e^-40, below what doubles resolve. */
  private static final String STIFF =
      """
      system Sampler over t [h] from 0 to 2 {
        state tube [mg] = 1
        state flask [mg] = 0
        tube' = -40 [/h]*tube + 20 [/h]*flask
        flask' = 30 [/h]*tube - 16 [/h]*flask
      %s
      }
      """;

  @Test
  void aDegeneratingPrincipalBasisIsANoteUntilTheModelReliesOnIt() {
    Checked property = Checked.of(String.format(STIFF, ""));
    assertEquals(List.of(), property.alarms());
    assertEquals(List.of("1 basis-degenerates"), property.notes());
    assertTrue(property.basis().windows().getAsInt() > 1);
    Checked declared = Checked.of(String.format(STIFF, "  basis Phi at 0"));
    assertEquals(List.of("6 basis-without-digits"), declared.alarms());
    Checked relied =
        Checked.of(
            String.format(STIFF, "  basis Phi at 0\n  require condition(Phi) < 1e4 until 3 [min]"));
    assertEquals(List.of(), relied.alarms());
    assertEquals(List.of("6 basis-degenerates"), relied.notes());
  }

  @Test
  void thresholdsComeFromTheSettings() {
    String text = String.format(STIFF.replace("to 2 ", "to 0.15 "), "  basis Phi at 0");
    Settings strict = new Settings(OptionalDouble.of(12), 1, 1e8, 1e-10, 1e-8);
    Settings lax = new Settings(OptionalDouble.of(2), 1, 1e8, 1e-10, 1e-8);
    assertEquals(List.of("6 basis-ill-conditioned"), Checked.of(text, strict).alarms());
    assertEquals(List.of(), Checked.of(text, lax).alarms());
  }

  @Test
  void coupledDerivativesThatCannotBeSolvedAreFound() {
    Checked checked =
        Checked.of(
            """
            system Boom over t [s] from 0 to 1 {
              parameter m [kg] = 3
              state x [m] = 0
              state x' [m/s] = 0
              state y [m] = 1
              state y' [m/s] = 0
              m*x'' + m*y'' = -2 [N/m]*x
              m*x'' + m*y'' = -5 [N/m]*y
            }
            """);
    assertEquals(List.of("1 mass-matrix-singular"), checked.alarms());
  }

  @Test
  void growthBeyondTheLargestNumberIsFoundAndNotComputed() {
    Checked checked =
        Checked.of(
            """
            system Runaway over t [h] from 0 to 1000 {
              state x = 1
              x' = 5 [/h]*x
            }
            """);
    assertTrue(
        checked.alarms().contains("2 solution-missing")
            || checked.alarms().contains("1 solution-missing"),
        checked.alarms().toString());
  }

  @Test
  void anUnboundedRangeIsSaidAndNothingIsInvented() {
    Checked checked =
        Checked.of(
            """
            system Leak over t [h] from 0 {
              state x = 1
              x' = -1 [/h]*x
            }
            """);
    assertEquals(List.of(), checked.alarms());
    assertEquals(List.of(), checked.notes());
    assertEquals(List.of(), checked.report().systems().getFirst().bases());
    Checked declared =
        Checked.of(
            """
            system Leak over t [h] from 0 {
              state x = 1
              x' = -1 [/h]*x
              basis Phi at 0
            }
            """);
    assertEquals(List.of("1 range-unbounded"), declared.notes());
  }

  @Test
  void aLargeSystemHasNoBasisUnlessItDeclaresOne() {
    StringBuilder text = new StringBuilder("system Chain over t [h] from 0 to 1 {\n");
    for (int i = 0; i <= 200; i++) {
      text.append("  state c").append(i).append(" = 1\n");
      text.append("  c").append(i).append("' = -1 [/h]*c").append(i).append('\n');
    }
    Checked checked = Checked.of(text.append("}\n").toString());
    assertEquals(List.of(), checked.alarms());
    assertEquals(List.of("1 basis-not-followed"), checked.notes());
  }

  @Test
  void theSameTextGivesTheSameReport() {
    String text = String.format(STIFF, "  basis Phi at 0\n  require tube(1) < 2 [mg]");
    assertEquals(
        Checked.of(text).report().systems().toString(),
        Checked.of(text).report().systems().toString());
  }

  @Test
  void aSystemWithErrorsIsNotSolvedAndTheOthersAre() {
    Checked checked =
        Checked.of(
            """
            system Broken over t [h] from 0 to 1 {
              state x = 1
              x' = -1 [/h]*x*x
            }
            system Whole over t [h] from 0 to 1 {
              state x = 1
              x' = -1 [/h]*x
              require x(1) < 0.5
            }
            """);
    assertEquals(1, checked.report().systems().size());
    assertEquals("Whole", checked.report().systems().getFirst().system().name());
    assertEquals(Status.HELD, checked.requirement(0).status());
  }
}
