/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.util.Map;
import org.junit.jupiter.api.Test;

class JumpTests {

  private static final String HEAD =
      """
      system Tank over t [h] from 0 to 48 {
        state a [g] = 1
        state b [kg] = 2
        parameter dose [mg] = 250
        parameter pause [h] = 8
        a' = -dose*a/1 [mg.h]
        b' = -b/pause
      """;

  private static SystemModel read(String statements) {
    return ModelListing.system(HEAD + statements + "\n}");
  }

  private static double[] times(SystemModel system, Map<String, Double> replaced) {
    return system.jumps().getFirst().times().times(system.timeUnit(), replaced);
  }

  @Test
  void linesBecomeRowsInSiUnits() {
    SystemModel system = read("jump at 6 { b becomes 2*a + b/4 + dose; a becomes 3 }");
    Jump jump = system.jumps().getFirst();
    assertEquals(1, jump.changes().get(0).component());
    assertEquals(
        "(2) a + (0.25) b + dose", ModelListing.affine(system, jump.changes().get(0).value()));
    assertEquals(0, jump.changes().get(1).component());
    assertEquals("0.003", ModelListing.affine(system, jump.changes().get(1).value()));
    assertArrayEquals(new double[] {6}, times(system, Map.of()));
  }

  @Test
  void ratesCanJump() {
    SystemModel system =
        ModelListing.system(
            """
            system Ball over t [s] from 0 to 3 {
              state z [m] = 1
              state z' [m/s] = 0
              z'' = -9.81 [m/s2]
              jump at 0.5 { z' becomes -0.8*z' }
            }
            """);
    Jump.Change change = system.jumps().getFirst().changes().getFirst();
    assertEquals(1, change.component());
    assertEquals("(-0.8) z' + 0", ModelListing.affine(system, change.value()));
  }

  @Test
  void outputsAndFunctionsOfTimeStandInALine() {
    SystemModel system =
        read("output sum [g] = a + b\nlet f(t) = t/1 [h]\njump at 6 { a becomes f(t)*sum }");
    assertEquals(
        "(f(t)) a + (f(t)) b + 0",
        ModelListing.affine(system, system.jumps().getFirst().changes().getFirst().value()));
  }

  @Test
  void bothEndsOfARepetitionCount() {
    SystemModel system = read("jump every 8 from 0 to 40 { a becomes 0 }");
    assertArrayEquals(new double[] {0, 8, 16, 24, 32, 40}, times(system, Map.of()));
  }

  @Test
  void theLastTimeNeedNotBeAMultiple() {
    SystemModel system = read("jump every 9 from 1 to 20 { a becomes 0 }");
    assertArrayEquals(new double[] {1, 10, 19}, times(system, Map.of()));
  }

  @Test
  void timesAreTheNumbersThatAPersonWouldWrite() {
    SystemModel system = read("jump every 0.1 from 0 to 0.7 { a becomes 0 }");
    assertArrayEquals(
        new double[] {0, 0.1, 0.2, 0.3, 0.4, 0.5, 0.6, 0.7}, times(system, Map.of()), 0);
    SystemModel minutes = read("jump every 6 [min] from 0 to 0.3 { a becomes 0 }");
    assertArrayEquals(new double[] {0, 0.1, 0.2, 0.3}, times(minutes, Map.of()), 0);
  }

  @Test
  void aThirdOfTheRangeReachesItsEnd() {
    SystemModel system = read("jump every 1 [h]/3 from 1 to 2 { a becomes 0 }");
    double[] times = times(system, Map.of());
    assertEquals(4, times.length);
    assertEquals(2, times[3], 0);
  }

  @Test
  void timesFollowTheParametersOfARun() {
    SystemModel system = read("jump every pause from 0 to 16 { a becomes 0 }");
    assertArrayEquals(new double[] {0, 8, 16}, times(system, Map.of()));
    assertArrayEquals(new double[] {0, 16}, times(system, Map.of("pause", 16 * 3600.0)));
    assertEquals(0, system.jumps().getFirst().times().count(Map.of("pause", -1.0)));
    assertThrows(IllegalArgumentException.class, () -> times(system, Map.of("pause", 1e-6)));
  }

  @Test
  void everyIsANameElsewhere() {
    SystemModel system = read("state every [g] = 1\nevery' = -every/1 [h]");
    assertEquals("every", system.states().getLast().label());
  }
}
