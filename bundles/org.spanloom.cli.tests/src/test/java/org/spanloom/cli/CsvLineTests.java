/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.List;
import org.junit.jupiter.api.Test;

class CsvLineTests {

  @Test
  void quotesNamesThatAreMoreThanLettersAndDigits() {
    assertEquals(
        "t,T_air,\"x'\",q[2].v,\"a,b\",\"say \"\"so\"\"\"\n",
        CsvLine.ofNames(List.of("t", "T_air", "x'", "q[2].v", "a,b", "say \"so\"")));
  }
}
