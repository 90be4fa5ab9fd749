/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.units;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import javax.measure.Unit;
import org.junit.jupiter.api.Test;
import systems.uom.ucum.format.UCUMFormat;

/** Compares every symbol with the UCUM system of the units library of JSR 385. */
class UnitLibraryTests {

  /** Symbols whose value is newer or whose meaning differs here, with the reason. */
  private static final Map<String, String> DIFFERENT =
      Map.of(
          "eV", "SI since 2019",
          "u", "SI Brochure, 9th edition, table 8",
          "AU", "International Astronomical Union, 2012",
          "[h]", "SI since 2019",
          "[k]", "SI since 2019",
          "[e]", "SI since 2019",
          "Ky", "one per centimetre; the library takes one centimetre",
          "RAD", "100 erg/g are 0.01 J/kg; the library takes erg/kg",
          "REM", "as RAD",
          "[HP]", "550 foot-pounds-force per second; the library leaves out the 550");

  @Test
  void sizesAgreeWithTheLibrary() {
    UCUMFormat format = UCUMFormat.getInstance(UCUMFormat.Variant.CASE_SENSITIVE);
    List<String> wrong = new ArrayList<>();
    List<String> unknownThere = new ArrayList<>();
    int compared = 0;
    for (UnitReader.Symbol symbol : UnitReader.known()) {
      UnitOfMeasure ours = UnitReaderTests.known(symbol.code());
      Unit<?> theirs;
      try {
        theirs = format.parse(symbol.code());
      } catch (RuntimeException | LinkageError unknown) {
        unknownThere.add(symbol.code());
        continue;
      }
      compared++;
      double value = valueInBase(theirs, 1);
      double expected = ours.toBase(1);
      if (!(Math.abs(value - expected) <= 1e-14 * expected)
          && !DIFFERENT.containsKey(symbol.code())) {
        wrong.add(symbol.code() + ": " + expected + " here, " + value + " there");
      }
    }
    assertEquals(List.of(), wrong);
    assertTrue(compared > 140, () -> "not known there: " + unknownThere);
  }

  @SuppressWarnings({"unchecked", "rawtypes"})
  private static double valueInBase(Unit unit, double value) {
    return unit.getConverterTo(unit.getSystemUnit()).convert(value);
  }
}
