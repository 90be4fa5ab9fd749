/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.units;

/**
 * A unit symbol of UCUM with its definition.
 *
 * @param code case-sensitive code
 * @param kind what may be done with it
 * @param value number of defining units
 * @param definition defining unit, in UCUM code
 * @param name its name in English
 */
record UcumAtom(String code, Kind kind, String value, String definition, String name) {

  /** What may be done with a symbol. */
  enum Kind {
    /** Takes prefixes. */
    METRIC,
    /** Takes no prefix. */
    PLAIN,
    /** A scale with a zero of its own; stands alone. */
    SCALE,
    /** A logarithm of a ratio; not read. */
    LOGARITHM
  }
}
