/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Collectors;
import org.spanloom.language.units.Dimension;

/**
 * The functions a model may call. Values are those of {@link StrictMath}, so that every machine
 * gets the same bits; whatever compiles terms calls the same methods.
 */
public enum Function {
  /** Sine of an angle in radians. */
  SIN("sin", 1, DimensionRule.PURE, Domain.EVERYWHERE, "sine of an angle in radians"),
  /** Cosine of an angle in radians. */
  COS("cos", 1, DimensionRule.PURE, Domain.EVERYWHERE, "cosine of an angle in radians"),
  /** Tangent of an angle in radians. */
  TAN("tan", 1, DimensionRule.PURE, Domain.NOT_ODD_QUARTER_TURNS, "tangent of an angle in radians"),
  /** Inverse sine, in radians from -pi/2 to pi/2. */
  ASIN("asin", 1, DimensionRule.PURE, Domain.FROM_MINUS_ONE_TO_ONE, "inverse sine, in radians"),
  /** Inverse cosine, in radians from 0 to pi. */
  ACOS("acos", 1, DimensionRule.PURE, Domain.FROM_MINUS_ONE_TO_ONE, "inverse cosine, in radians"),
  /** Inverse tangent, in radians from -pi/2 to pi/2. */
  ATAN("atan", 1, DimensionRule.PURE, Domain.EVERYWHERE, "inverse tangent, in radians"),
  /** Hyperbolic sine. */
  SINH("sinh", 1, DimensionRule.PURE, Domain.EVERYWHERE, "hyperbolic sine"),
  /** Hyperbolic cosine. */
  COSH("cosh", 1, DimensionRule.PURE, Domain.EVERYWHERE, "hyperbolic cosine"),
  /** Hyperbolic tangent. */
  TANH("tanh", 1, DimensionRule.PURE, Domain.EVERYWHERE, "hyperbolic tangent"),
  /** Exponential function. */
  EXP("exp", 1, DimensionRule.PURE, Domain.EVERYWHERE, "exponential function"),
  /** Natural logarithm. */
  LOG("log", 1, DimensionRule.PURE, Domain.POSITIVE, "natural logarithm"),
  /** Logarithm to base 10. */
  LOG10("log10", 1, DimensionRule.PURE, Domain.POSITIVE, "logarithm to base 10"),
  /** Square root; halves the exponents of the dimension, which must be even. */
  SQRT("sqrt", 1, DimensionRule.HALVED, Domain.NOT_NEGATIVE, "square root"),
  /** Absolute value. */
  ABS("abs", 1, DimensionRule.KEPT, Domain.EVERYWHERE, "absolute value"),
  /** Sign: -1, 0 or 1. */
  SIGN("sign", 1, DimensionRule.DROPPED, Domain.EVERYWHERE, "sign: -1, 0 or 1"),
  /** Smaller of two values of the same dimension. */
  MIN("min", 2, DimensionRule.KEPT, Domain.EVERYWHERE, "smaller of two values"),
  /** Larger of two values of the same dimension. */
  MAX("max", 2, DimensionRule.KEPT, Domain.EVERYWHERE, "larger of two values");

  /** How the dimension of the value follows from those of the arguments. */
  public enum DimensionRule {
    /** A pure number of a pure number. */
    PURE,
    /** Arguments of any one dimension; the value has the same. */
    KEPT,
    /** Arguments of any one dimension; the value is a pure number. */
    DROPPED,
    /** An argument whose dimension has even exponents; the value has half of each. */
    HALVED
  }

  /** Where a function of one argument is defined in real numbers. */
  public enum Domain {
    /** For all real numbers. */
    EVERYWHERE,
    /** For positive numbers. */
    POSITIVE,
    /** For positive numbers and 0. */
    NOT_NEGATIVE,
    /** From -1 to 1, ends included. */
    FROM_MINUS_ONE_TO_ONE,
    /** Everywhere but at pi/2 + k pi for whole k, where there are poles. */
    NOT_ODD_QUARTER_TURNS
  }

  private static final Map<String, Function> BY_NAME =
      Arrays.stream(values()).collect(Collectors.toUnmodifiableMap(Function::code, f -> f));

  private final String code;
  private final int arity;
  private final DimensionRule rule;
  private final Domain domain;
  private final String meaning;

  Function(String code, int arity, DimensionRule rule, Domain domain, String meaning) {
    this.code = code;
    this.arity = arity;
    this.rule = rule;
    this.domain = domain;
    this.meaning = meaning;
  }

  /** Returns the name in a model. */
  public String code() {
    return code;
  }

  /** Returns the number of arguments. */
  public int arity() {
    return arity;
  }

  /** Returns the rule for dimensions. */
  public DimensionRule dimensionRule() {
    return rule;
  }

  /** Returns where it is defined. */
  public Domain domain() {
    return domain;
  }

  /** Returns a few words that say what it is. */
  public String meaning() {
    return meaning;
  }

  /** Returns the function of a name, matched exactly. */
  public static Optional<Function> named(String name) {
    return Optional.ofNullable(BY_NAME.get(name));
  }

  /**
   * Returns the dimension of the value.
   *
   * @param arguments dimensions of the arguments, {@link #arity()} of them
   * @return the dimension, or empty where the arguments break {@link #dimensionRule()}
   */
  public Optional<Dimension> dimension(List<Dimension> arguments) {
    requireArity(arguments.size());
    Dimension first = arguments.getFirst();
    if (!arguments.stream().allMatch(first::equals)) {
      return Optional.empty();
    }
    return switch (rule) {
      case PURE -> first.isNone() ? Optional.of(Dimension.NONE) : Optional.empty();
      case KEPT -> Optional.of(first);
      case DROPPED -> Optional.of(Dimension.NONE);
      case HALVED -> halved(first);
    };
  }

  private static Optional<Dimension> halved(Dimension dimension) {
    int[] exponents = dimension.exponents();
    for (int i = 0; i < exponents.length; i++) {
      if (exponents[i] % 2 != 0) {
        return Optional.empty();
      }
      exponents[i] /= 2;
    }
    return Optional.of(new Dimension(exponents));
  }

  /**
   * Returns the value.
   *
   * @param x arguments, {@link #arity()} of them
   * @return the value in floating point; not a number or infinite outside the domain
   */
  public double apply(double... x) {
    requireArity(x.length);
    return switch (this) {
      case SIN -> StrictMath.sin(x[0]);
      case COS -> StrictMath.cos(x[0]);
      case TAN -> StrictMath.tan(x[0]);
      case ASIN -> StrictMath.asin(x[0]);
      case ACOS -> StrictMath.acos(x[0]);
      case ATAN -> StrictMath.atan(x[0]);
      case SINH -> StrictMath.sinh(x[0]);
      case COSH -> StrictMath.cosh(x[0]);
      case TANH -> StrictMath.tanh(x[0]);
      case EXP -> StrictMath.exp(x[0]);
      case LOG -> StrictMath.log(x[0]);
      case LOG10 -> StrictMath.log10(x[0]);
      case SQRT -> StrictMath.sqrt(x[0]);
      case ABS -> StrictMath.abs(x[0]);
      case SIGN -> StrictMath.signum(x[0]);
      case MIN -> StrictMath.min(x[0], x[1]);
      case MAX -> StrictMath.max(x[0], x[1]);
    };
  }

  private void requireArity(int count) {
    if (count != arity) {
      throw new IllegalArgumentException(code + " takes " + arity + " arguments, not " + count);
    }
  }
}
