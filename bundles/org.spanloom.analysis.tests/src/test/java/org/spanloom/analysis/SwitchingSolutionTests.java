/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.List;
import org.junit.jupiter.api.Test;

/** Solutions of systems that switch, against closed forms. */
class SwitchingSolutionTests {

  @Test
  void aChainOfPulsesRipplesAsInTheClosedForm() {
    // Steady ripple of a resistor and a capacitor under a square wave (standard texts on circuits):
    // with d of the period p on, peaks are (1 - exp(-d p/T))/(1 - exp(-p/T)) of the voltage, and
    // valleys exp(-(1 - d) p/T) of the peaks.
    double peak = 12 * (1 - Math.exp(-0.3 / 0.8)) / (1 - Math.exp(-1 / 0.8));
    double valley = peak * Math.exp(-0.7 / 0.8);
    Checked checked =
        Checked.of(
            """
            system Beacon over t [ms] from 0 to 40 {
              parameter R [kOhm] = 2
              parameter C [uF] = 0.4
              state u [V] = 0
              R*C*u' = 12 [V]*pulse(t, period = 1, width = 0.3) - u
              accuracy 1e-10
              require u(39) > 0 [V]
              require u(39.3) > 0 [V]
              require u < 7 [V] throughout
            }
            """);
    assertEquals(List.of(), checked.alarms());
    assertEquals(valley, checked.requirement(0).value(), 1e-9);
    assertEquals(peak, checked.requirement(1).value(), 1e-9);
    assertEquals(peak, checked.requirement(2).value(), 1e-9);
  }

  @Test
  void aForcingInStepsGivesTheClosedForm() {
    // x' = f - x with f = 2 up to 1, then 5 up to 2.5, then 0.
    double first = 2 * (1 - Math.exp(-1));
    double second = 5 + (first - 5) * Math.exp(-1.5);
    double last = second * Math.exp(-1.5);
    for (String forcing :
        List.of(
            "let f(t) = if t < 1 then 2 else if t <= 2.5 then 5 else 0",
            "table f(t) = hold extended\nrow 0, 2\nrow 1, 5\nrow 2.5, 0")) {
      Checked checked =
          Checked.of(
              "system S over t from 0 to 4 {\n"
                  + forcing
                  + "\n"
                  + "state x = 0\n"
                  + "x' = f(t) - x\n"
                  + "accuracy 1e-11\n"
                  + "require x(1) > 0\n"
                  + "require x(2.5) > 0\n"
                  + "require x(4) > 0\n"
                  + "}");
      assertEquals(List.of(), checked.alarms());
      assertEquals(first, checked.requirement(0).value(), 1e-10);
      assertEquals(second, checked.requirement(1).value(), 1e-10);
      assertEquals(last, checked.requirement(2).value(), 1e-10);
    }
  }

  @Test
  void aSawFromATableGivesTheClosedForm() {
    // x' = f with f from 0 to 2 over [0, 1], back to 0 over [1, 4]: the area is 4.
    Checked checked =
        Checked.of(
            """
            system S over t from 0 to 5 {
              table f(t) = linear extended
                row 0, 0
                row 1, 2
                row 4, 0
              state x = 1
              x' = f(t)
              accuracy 1e-12
              require x(1) > 0
              require x(5) > 0
            }
            """);
    assertEquals(List.of(), checked.alarms());
    assertEquals(2, checked.requirement(0).value(), 1e-12);
    assertEquals(5, checked.requirement(1).value(), 1e-12);
  }

  @Test
  void bothSidesOfAStepInARequirementCount() {
    Checked checked =
        Checked.of(
            """
            system S over t from 0 to 4 {
              state x = 1
              output load = (if t < 1.7 then 2*t else 1)*x
              x' = 0
              require load < 3.5 throughout
              require load < 3.3 throughout
            }
            """);
    assertEquals(3.4, checked.requirement(0).value(), 1e-12);
    assertEquals(List.of("6 requirement-failed"), checked.alarms());
  }

  @Test
  void moreStepsThanCanBeTakenAreAFinding() {
    Checked checked =
        Checked.of(
            """
            system S over t [h] from 0 to 8760 {
              state x = 1
              x' = -pulse(t, period = 1 [s], width = 0.5 [s])*x/1 [h]
            }
            """);
    assertEquals(List.of("1 too-many-breakpoints"), checked.alarms());
  }
}
