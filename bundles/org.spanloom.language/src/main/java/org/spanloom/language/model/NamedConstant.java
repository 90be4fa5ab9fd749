/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.Arrays;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Collectors;

/** Pure numbers that a model may name; the base of natural logarithms is {@code exp(1)}. */
public enum NamedConstant {
  /** Half the circumference of the unit circle. */
  PI("pi", Math.PI, "ratio of a circle's circumference to its diameter");

  private static final Map<String, NamedConstant> BY_NAME =
      Arrays.stream(values()).collect(Collectors.toUnmodifiableMap(NamedConstant::code, c -> c));

  private final String code;
  private final double value;
  private final String meaning;

  NamedConstant(String code, double value, String meaning) {
    this.code = code;
    this.value = value;
    this.meaning = meaning;
  }

  /** Returns the name in a model. */
  public String code() {
    return code;
  }

  /** Returns the value, rounded to double precision. */
  public double value() {
    return value;
  }

  /** Returns a few words that say what it is. */
  public String meaning() {
    return meaning;
  }

  /** Returns the constant of a name, matched exactly. */
  public static Optional<NamedConstant> named(String name) {
    return Optional.ofNullable(BY_NAME.get(name));
  }
}
