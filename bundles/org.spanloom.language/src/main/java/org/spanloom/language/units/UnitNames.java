/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.units;

import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;

/** Familiar codes and names of dimensions, for messages and for values whose unit is inferred. */
public final class UnitNames {

  /**
   * Coherent units of the SI by the quantity they are used for, the most familiar one of a
   * dimension first.
   */
  private static final String[][] FAMILIAR = {
    {"1", "pure number"},
    {"m", "length"},
    {"kg", "mass"},
    {"s", "time"},
    {"A", "electric current"},
    {"K", "temperature"},
    {"mol", "amount of substance"},
    {"cd", "luminous intensity"},
    {"/s", "rate"},
    {"/s2", "rate per time"},
    {"/m", "reciprocal length"},
    {"m2", "area"},
    {"m3", "volume"},
    {"m/s", "velocity"},
    {"m/s2", "acceleration"},
    {"m2/s", "diffusivity"},
    {"m3/s", "volume flow"},
    {"kg/s", "mass flow"},
    {"kg/m3", "density"},
    {"kg/m", "mass per length"},
    {"kg/m2", "mass per area"},
    {"mol/s", "amount flow"},
    {"mol/m3", "amount concentration"},
    {"kg.m", "mass times length"},
    {"kg.m2", "moment of inertia"},
    {"kg.m/s", "momentum"},
    {"N", "force"},
    {"N/m", "stiffness"},
    {"Pa", "pressure"},
    {"Pa.s", "viscosity"},
    {"J", "energy"},
    {"J.s", "angular momentum"},
    {"W", "power"},
    {"W/s", "power per time"},
    {"J/K", "heat capacity"},
    {"W/K", "heat conductance"},
    {"K/W", "thermal resistance"},
    {"K/s", "temperature rate"},
    {"K/m", "temperature gradient"},
    {"J/kg", "specific energy"},
    {"J/(kg.K)", "specific heat capacity"},
    {"J/(m3.K)", "volumetric heat capacity"},
    {"W/(m.K)", "thermal conductivity"},
    {"W/(m2.K)", "heat transfer coefficient"},
    {"W/m2", "heat flux"},
    {"W/m3", "power density"},
    {"J/mol", "molar energy"},
    {"J/(mol.K)", "molar heat capacity"},
    {"C", "electric charge"},
    {"V", "voltage"},
    {"V/s", "voltage rate"},
    {"V/m", "electric field"},
    {"A/s", "current rate"},
    {"Ohm", "resistance"},
    {"S", "conductance"},
    {"F", "capacitance"},
    {"H", "inductance"},
    {"Wb", "magnetic flux"},
    {"T", "magnetic flux density"},
    {"kg/mol", "molar mass"},
    {"m3/kg", "specific volume"},
  };

  private static final Map<Dimension, String[]> BY_DIMENSION = byDimension();

  private UnitNames() {}

  /**
   * Returns a code of the coherent SI unit of a dimension, a familiar one where there is one:
   * {@code W} and not {@code kg.m2.s-3}.
   */
  public static String describe(Dimension dimension) {
    String[] familiar = BY_DIMENSION.get(dimension);
    return familiar == null ? dimension.toString() : familiar[0];
  }

  /** Returns what a dimension is called, for example {@code power}, where it has a name. */
  public static Optional<String> quantity(Dimension dimension) {
    return Optional.ofNullable(BY_DIMENSION.get(dimension)).map(familiar -> familiar[1]);
  }

  /** Returns the coherent SI unit of a dimension, under the code of {@link #describe}. */
  public static UnitOfMeasure coherent(Dimension dimension) {
    return new UnitOfMeasure(describe(dimension), dimension, 1, 0);
  }

  private static Map<Dimension, String[]> byDimension() {
    Map<Dimension, String[]> map = new LinkedHashMap<>();
    for (String[] familiar : FAMILIAR) {
      if (UnitReader.read(familiar[0]) instanceof UnitReader.Known known) {
        map.putIfAbsent(known.unit().dimension(), familiar);
      }
    }
    return map;
  }
}
