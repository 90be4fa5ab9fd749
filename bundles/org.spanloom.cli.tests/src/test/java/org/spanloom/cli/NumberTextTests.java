/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class NumberTextTests {

  /** Expected texts are those of the format %.17g of C (ISO/IEC 9899:2011, 7.21.6.1). */
  @ParameterizedTest
  @CsvSource({
    "0, 0",
    "-0.0, -0",
    "277, 277",
    "-3, -3",
    "0.5, 0.5",
    "0.1, 0.10000000000000001",
    "0.0001, 0.0001",
    "0.00001, 1.0000000000000001e-05",
    "1e16, 10000000000000000",
    "1e17, 1e+17",
    "-2.5e-7, -2.4999999999999999e-07",
    "1.7976931348623157e308, 1.7976931348623157e+308",
    "4.9e-324, 4.9406564584124654e-324",
    "123456789.125, 123456789.125",
    "NaN, NaN",
    "Infinity, Infinity"
  })
  void writesSeventeenDigits(double value, String expected) {
    assertEquals(expected, NumberText.exact(value));
  }

  @Test
  void anyDoubleIsReadBackBitForBitFromSeventeenCorrectDigits() {
    SplittableRandom random = new SplittableRandom(20260401);
    for (int i = 0; i < 20_000; i++) {
      double value = Double.longBitsToDouble(random.nextLong());
      if (!Double.isFinite(value)) {
        continue;
      }
      String text = NumberText.exact(value);
      assertEquals(value, Double.parseDouble(text), text);
      BigDecimal rounded = new BigDecimal(value).round(new MathContext(17, RoundingMode.HALF_EVEN));
      assertEquals(0, rounded.compareTo(new BigDecimal(text)), text);
    }
  }

  @ParameterizedTest
  @CsvSource({
    "0, 0",
    "1234.5, 1230",
    "0.00123, 0.00123",
    "1e-9, 1.00e-09",
    "1e6, 1.00e+06",
    "-12.34, -12.3",
    "NaN, unknown",
    "Infinity, infinite"
  })
  void writesThreeDigitsForPeople(double value, String expected) {
    assertEquals(expected, NumberText.brief(value));
  }

  @ParameterizedTest
  @ValueSource(
      strings = {"", "x", "1,5", "NaN", "Infinity", "0x1p3", "1d", "1e", "--1", "1 2", "1e999"})
  void refusesWhatIsNoFiniteDecimalNumber(String text) {
    CommandFailure failure =
        assertThrows(CommandFailure.class, () -> NumberText.read(text, "--from"));
    assertEquals(2, failure.exitCode());
    assertTrue(failure.getMessage().startsWith("--from: "), failure.getMessage());
  }

  @Test
  void readsNumbersAndLists() throws CommandFailure {
    assertEquals(-0.5, NumberText.read(" -.5 ", "x"));
    assertEquals(12e3, NumberText.read("+12.E3", "x"));
    assertEquals(List.of(1.0, -2.5, 3e-3), NumberText.readList("1, -2.5,3e-3", "x"));
  }

  @ParameterizedTest
  @ValueSource(strings = {",", "1,,2", "1,", "1;2"})
  void refusesListsWithGaps(String text) {
    assertThrows(CommandFailure.class, () -> NumberText.readList(text, "--at"));
  }

  @Test
  void aLongWrongTextIsCutInTheMessage() {
    CommandFailure failure =
        assertThrows(
            CommandFailure.class, () -> NumberText.read("y\n" + "y".repeat(100_000), "--from"));
    assertTrue(failure.getMessage().length() < 200, failure.getMessage());
    assertEquals(1, failure.getMessage().lines().count());
  }
}
