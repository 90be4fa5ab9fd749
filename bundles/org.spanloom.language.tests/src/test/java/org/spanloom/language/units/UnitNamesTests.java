/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.units;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.math.BigInteger;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class UnitNamesTests {

  @ParameterizedTest
  @CsvSource({
    "kg.m2/s3, W, power",
    "kg.m2/s2, J, energy",
    "kJ/K, J/K, heat capacity",
    "W/(m2.K), W/(m2.K), heat transfer coefficient",
    "N/m, N/m, stiffness",
    "kg.m-1.s-2, Pa, pressure",
    "1/min, /s, rate",
    "deg, 1, pure number",
    "A.s, C, electric charge"
  })
  void prefersFamiliarUnits(String code, String familiar, String quantity) {
    Dimension dimension = UnitReaderTests.known(code).dimension();
    assertEquals(familiar, UnitNames.describe(dimension));
    assertEquals(Optional.of(quantity), UnitNames.quantity(dimension));
    assertEquals(dimension, UnitReaderTests.known(UnitNames.describe(dimension)).dimension());
    assertEquals(1, UnitReaderTests.known(familiar).factor());
  }

  @Test
  void namesTheRestByBaseUnits() {
    Dimension odd = UnitReaderTests.known("kg2.m/K3").dimension();
    assertEquals("kg2.m.K-3", UnitNames.describe(odd));
    assertEquals(Optional.empty(), UnitNames.quantity(odd));
    assertEquals(odd, UnitNames.coherent(odd).dimension());
  }

  @ParameterizedTest
  @CsvSource({
    "K, h, K/h",
    "Cel, h, K/h",
    "m, s, m/s",
    "m/s, s, m/s/s",
    "mg, W/K, mg/(W/K)",
    "kg, 1, kg",
    "'[degF]', min, '[degR]/min'"
  })
  void quotientsOfUnits(String above, String below, String code) {
    UnitOfMeasure a = UnitReaderTests.known(above);
    UnitOfMeasure b = UnitReaderTests.known(below);
    UnitOfMeasure quotient = a.over(b);
    assertEquals(code, quotient.code());
    assertEquals(a.dimension().over(b.dimension()), quotient.dimension());
    assertEquals(a.factor() / b.factor(), quotient.factor());
    assertEquals(0, quotient.offset());
    assertEquals(
        quotient.factor(), UnitReaderTests.known(code).factor(), 2e-16 * quotient.factor());
  }

  @ParameterizedTest
  @CsvSource({"1, 3", "2, 3", "1, 10", "459670, 1800", "7, 1000000007", "9007199254740993, 1"})
  void fractionsAreRoundedOnce(long numerator, long denominator) {
    double expected =
        new java.math.BigDecimal(numerator)
            .divide(new java.math.BigDecimal(denominator), new java.math.MathContext(80))
            .doubleValue();
    assertEquals(
        expected,
        new ExactFactor(BigInteger.valueOf(numerator), BigInteger.valueOf(denominator)).value());
  }
}
