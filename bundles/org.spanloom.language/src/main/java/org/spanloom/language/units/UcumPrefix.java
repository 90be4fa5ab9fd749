/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.units;

/** The prefixes of UCUM: those of the SI up to 10^24 and those of powers of 1024. */
enum UcumPrefix {
  YOTTA("Y", "1e24"),
  ZETTA("Z", "1e21"),
  EXA("E", "1e18"),
  PETA("P", "1e15"),
  TERA("T", "1e12"),
  GIGA("G", "1e9"),
  MEGA("M", "1e6"),
  KILO("k", "1e3"),
  HECTO("h", "1e2"),
  DECA("da", "1e1"),
  DECI("d", "1e-1"),
  CENTI("c", "1e-2"),
  MILLI("m", "1e-3"),
  MICRO("u", "1e-6"),
  NANO("n", "1e-9"),
  PICO("p", "1e-12"),
  FEMTO("f", "1e-15"),
  ATTO("a", "1e-18"),
  ZEPTO("z", "1e-21"),
  YOCTO("y", "1e-24"),
  KIBI("Ki", "1024"),
  MEBI("Mi", "1048576"),
  GIBI("Gi", "1073741824"),
  TEBI("Ti", "1099511627776");

  private final String code;
  private final String factor;

  UcumPrefix(String code, String factor) {
    this.code = code;
    this.factor = factor;
  }

  /** Returns the case-sensitive code. */
  String code() {
    return code;
  }

  /** Returns what it multiplies by. */
  ExactFactor factor() {
    return ExactFactor.of(factor);
  }
}
