/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.units;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * Published sizes of units. Sources: Schadow and McDonald, The Unified Code for Units of Measure,
 * tables 1 to 24 (from memory); SI Brochure, 9th edition, tables 4, 7 and 8.
 */
class UnitReaderTests {

  static UnitOfMeasure known(String code) {
    return assertInstanceOf(UnitReader.Known.class, UnitReader.read(code), code).unit();
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      quoteCharacter = '`',
      value = {
        // base and derived units of the SI
        "1|1|1",
        "m|1|m",
        "kg|1|kg",
        "g|0.001|kg",
        "s|1|s",
        "A|1|A",
        "K|1|K",
        "mol|1|mol",
        "cd|1|cd",
        "rad|1|1",
        "Hz|1|s-1",
        "N|1|kg.m.s-2",
        "Pa|1|kg.m-1.s-2",
        "J|1|kg.m2.s-2",
        "W|1|kg.m2.s-3",
        "C|1|s.A",
        "V|1|kg.m2.s-3.A-1",
        "F|1|kg-1.m-2.s4.A2",
        "Ohm|1|kg.m2.s-3.A-2",
        "S|1|kg-1.m-2.s3.A2",
        "Wb|1|kg.m2.s-2.A-1",
        "T|1|kg.s-2.A-1",
        "H|1|kg.m2.s-2.A-2",
        "lx|1|m-2.cd",
        "Bq|1|s-1",
        "Gy|1|m2.s-2",
        // time, volume, angle
        "min|60|s",
        "h|3600|s",
        "d|86400|s",
        "wk|604800|s",
        "a|31557600|s",
        "mo|2629800|s",
        "L|0.001|m3",
        "l|0.001|m3",
        "t|1000|kg",
        "bar|100000|kg.m-1.s-2",
        "deg|0.017453292519943295|1",
        "%|0.01|1",
        "'|2.908882086657216e-4|1",
        "circ|6.283185307179586|1",
        "[pi]|3.141592653589793|1",
        // prefixes
        "um|1e-6|m",
        "uF|1e-6|kg-1.m-2.s4.A2",
        "kPa|1000|kg.m-1.s-2",
        "dam|10|m",
        "MOhm|1e6|kg.m2.s-3.A-2",
        "ng|1e-12|kg",
        "Kibit|1024|1",
        "mL|1e-6|m3",
        // compound units
        "kJ/K|1000|kg.m2.s-2.K-1",
        "MJ/K|1e6|kg.m2.s-2.K-1",
        "kW/K|1000|kg.m2.s-3.K-1",
        "kW.h|3.6e6|kg.m2.s-2",
        "W/(m2.K)|1|kg.s-3.K-1",
        "mg/L|0.001|kg.m-3",
        "10*3/uL|1e12|m-3",
        "/h|2.777777777777778e-4|s-1",
        "J/kg/K|1|m2.s-2.K-1",
        "W/m2.K|1|kg.s-3.K",
        "m.s-2|1|m.s-2",
        "m/s2|1|m.s-2",
        "m+2|1|m2",
        "10.m|10|m",
        "10*-6|1e-6|1",
        "10^3|1000|1",
        "kg{dry}|1|kg",
        "{cells}/uL|1e9|m-3",
        "mmol/(L.h)|2.777777777777778e-4|m-3.s-1.mol",
        // customary units
        "[in_i]|0.0254|m",
        "[ft_i]|0.3048|m",
        "[mi_i]|1609.344|m",
        "[lb_av]|0.45359237|kg",
        "[oz_av]|0.028349523125|kg",
        "[lbf_av]|4.4482216152605|kg.m.s-2",
        "[psi]|6894.757293168362|kg.m-1.s-2",
        "atm|101325|kg.m-1.s-2",
        "mm[Hg]|133.322|kg.m-1.s-2",
        "m[H2O]|9806.65|kg.m-1.s-2",
        "cal|4.184|kg.m2.s-2",
        "[gal_us]|0.003785411784|m3",
        "[HP]|745.6998715822702|kg.m2.s-3",
        "eV|1.602176634e-19|kg.m2.s-2",
        "Ci|3.7e10|s-1",
        "[degR]|0.5555555555555556|K",
        "[kn_i]|0.5144444444444445|m.s-1",
        "[g]|9.80665|m.s-2",
        "[c]|299792458|m.s-1"
      })
  void readsPublishedSizes(String code, double factor, String dimension) {
    UnitOfMeasure unit = known(code);
    assertEquals(factor, unit.factor(), code);
    assertEquals(0, unit.offset(), code);
    assertEquals(dimension, unit.dimension().toString(), code);
    assertEquals(code, unit.code());
  }

  @Test
  void eightyFiveKilojoulesPerKelvinAreExact() {
    assertEquals(85_000.0, known("kJ/K").toBase(85));
  }

  @ParameterizedTest
  @CsvSource({
    // SI Brochure, 9th edition, 2.3.1; freezing and boiling point on Fahrenheit's scale
    "Cel, 0, 273.15",
    "Cel, 25, 298.15",
    "Cel{air}, 25, 298.15",
    "[degF], 32, 273.15",
    "[degF], 212, 373.15",
    "[degRe], 80, 373.15"
  })
  void temperatureScalesHaveAZero(String code, double value, double kelvin) {
    assertEquals(kelvin, known(code).toBase(value), 1e-12 * kelvin);
    assertEquals(value, known(code).fromBase(kelvin), 1e-10);
  }

  @Test
  void aSecondReadingGivesTheSame() {
    assertEquals(UnitReader.read("kW.h"), UnitReader.read("kW.h"));
  }

  @Test
  void everyListedSymbolCanBeRead() {
    for (UnitReader.Symbol symbol : UnitReader.known()) {
      assertEquals(symbol.dimension(), known(symbol.code()).dimension(), symbol.code());
      if (symbol.takesPrefix()) {
        double factor = known(symbol.code()).factor();
        assertEquals(
            1000 * factor,
            known("k" + symbol.code()).factor(),
            4e-16 * 1000 * factor,
            symbol.code());
      }
    }
  }
}
