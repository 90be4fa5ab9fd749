/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.workspace.tests;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;

import javax.measure.Unit;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.spanloom.language.units.UnitReader;
import systems.uom.ucum.format.UCUMFormat;
import tech.units.indriya.unit.Units;

/**
 * The units libraries work as bundles and agree there with the language's own reader. Their parser
 * is driven by class names that one library loads for another; without the fragment {@code
 * org.spanloom.units.ucum} it fails in a workbench although it works on a class path.
 */
class UnitsInBundlesTests {

  /** Factors by definition of the units (SI Brochure, 9th edition, tables 4 and 8). */
  @ParameterizedTest
  @CsvSource({
    "kW/K, W/K, 1000",
    "MJ/K, kJ/K, 1000",
    "h, s, 3600",
    "min, s, 60",
    "d, h, 24",
    "mg/L, kg/m3, 0.001",
    "kg.m/s2, N, 1",
    "m/s2, cm/s2, 100",
    "1/h, 1/d, 24"
  })
  void readsAndConvertsUcumCode(String from, String to, double factor) throws Exception {
    Unit<?> source = parse(from);
    Unit<?> target = parse(to);
    assertEquals(factor, source.getConverterToAny(target).convert(1.0), 1e-12 * factor);
    assertEquals(factor, size(from) / size(to), 1e-12 * factor, "the language's own reader");
  }

  @Test
  void knowsTheDimensionOfACompoundUnit() {
    assertEquals(Units.WATT.getDimension(), parse("kg.m2/s3").getDimension());
  }

  private static double size(String code) {
    return assertInstanceOf(UnitReader.Known.class, UnitReader.read(code)).unit().factor();
  }

  private static Unit<?> parse(String code) {
    return UCUMFormat.getInstance(UCUMFormat.Variant.CASE_SENSITIVE).parse(code);
  }
}
