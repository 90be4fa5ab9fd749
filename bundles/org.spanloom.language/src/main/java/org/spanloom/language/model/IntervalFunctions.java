/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

/**
 * Encloses the values of the built-in functions over an interval. Values of {@link StrictMath} are
 * moved outward by more than their error, which is below one unit in the last place, for hyperbolic
 * functions below 2.5 (documentation of {@link Math}).
 */
final class IntervalFunctions {

  /**
   * Beyond this an angle is not reduced; the values of sine and cosine are then only known to lie
   * from -1 to 1.
   */
  private static final double LARGEST_ANGLE = 1e12;

  /** Twice the error that is promised: below a power of two the neighbours are twice as near. */
  private static final int ULPS = 2;

  private static final int HYPERBOLIC_ULPS = 5;

  private static final int LARGEST_PRODUCT = 64;

  private static final Interval UNIT = new Interval(-1, 1);
  private static final Interval POSITIVE = new Interval(0, Double.POSITIVE_INFINITY);

  private IntervalFunctions() {}

  /** Encloses the values of a function of one argument where it is defined. */
  static Interval image(Function function, Interval x) {
    if (x.isEmpty()) {
      return x;
    }
    return switch (function) {
      case SIN -> sine(x);
      case COS -> cosine(x);
      case TAN -> tangent(x);
      case ASIN -> increasing(function, x.intersect(UNIT), ULPS);
      case ACOS -> increasing(Function.ACOS, x.intersect(UNIT).negated(), ULPS, true);
      case ATAN -> increasing(function, x, ULPS);
      case SINH -> increasing(function, x, HYPERBOLIC_ULPS);
      case COSH -> increasing(function, x.absolute(), HYPERBOLIC_ULPS).larger(Interval.at(1));
      case TANH -> increasing(function, x, HYPERBOLIC_ULPS).intersect(UNIT);
      case EXP -> increasing(function, x, ULPS).intersect(POSITIVE);
      case LOG, LOG10 ->
          x.high() <= 0 ? Interval.EMPTY : increasing(function, x.intersect(POSITIVE), ULPS);
      case SQRT -> x.squareRoot();
      case ABS -> x.absolute();
      case SIGN -> x.sign();
      case MIN, MAX -> throw new IllegalArgumentException(function.code() + " has two arguments");
    };
  }

  /** Encloses the powers with one whole exponent. */
  static Interval wholePower(Interval x, double n) {
    if (x.isEmpty()) {
      return x;
    }
    if (n == 0) {
      return Interval.at(1);
    }
    if (n == 1) {
      return x;
    }
    if (n < 0) {
      return Interval.at(1).over(wholePower(x, -n));
    }
    if (n == 2) {
      return x.squared();
    }
    if (n % 2 == 0) {
      Interval size = x.absolute();
      return wholeAt(size.low(), n).hull(wholeAt(size.high(), n)).larger(Interval.at(0));
    }
    return wholeAt(x.low(), n).hull(wholeAt(x.high(), n));
  }

  /** Encloses one power; by products, which keep exact results exact, unless there are too many. */
  private static Interval wholeAt(double x, double n) {
    if (n > LARGEST_PRODUCT || Double.isInfinite(x)) {
      return new Interval(pow(x, n, -1), pow(x, n, 1));
    }
    Interval power = Interval.at(1);
    Interval square = Interval.at(x);
    for (int rest = (int) n; rest > 0; rest /= 2) {
      if (rest % 2 == 1) {
        power = power.times(square);
      }
      square = square.squared();
    }
    return power;
  }

  /** Encloses powers of the parts of the base that are not negative. */
  static Interval power(Interval base, Interval exponent) {
    Interval x = base.intersect(POSITIVE);
    if (x.isEmpty() || exponent.isEmpty()) {
      return Interval.EMPTY;
    }
    if (x.high() == 0) {
      return new Interval(0, exponent.low() > 0 ? 0 : 1);
    }
    if (exponent.isPoint() && exponent.low() > 0) {
      return new Interval(
          Math.max(0, pow(x.low(), exponent.low(), -1)), pow(x.high(), exponent.low(), 1));
    }
    return image(Function.EXP, exponent.times(image(Function.LOG, x)));
  }

  private static double pow(double x, double n, int side) {
    double p = StrictMath.pow(x, n);
    if (p == 0 && x == 0 || p == 1 && x == 1 || Double.isInfinite(x)) {
      return p;
    }
    return outward(p, ULPS, side);
  }

  private static Interval increasing(Function function, Interval x, int ulps) {
    return increasing(function, x, ulps, false);
  }

  /** Values of an increasing function, or of one that increases with the negated argument. */
  private static Interval increasing(Function function, Interval x, int ulps, boolean negated) {
    if (x.isEmpty()) {
      return x;
    }
    double low = function.apply(negated ? -x.low() : x.low());
    double high = function.apply(negated ? -x.high() : x.high());
    return new Interval(
        isExact(function, x.low(), low) ? low : outward(low, ulps, -1),
        isExact(function, x.high(), high) ? high : outward(high, ulps, 1));
  }

  /**
   * Values that hold without rounding: those at 0 of functions of the kind f(0) = 0 or 1, and
   * limits at infinity.
   */
  private static boolean isExact(Function function, double x, double value) {
    return switch (function) {
      case SINH, TANH, ASIN, ATAN -> x == 0;
      case EXP, COSH -> x == 0 || Double.isInfinite(x);
      case LOG, LOG10 -> x == 0 || x == 1 || Double.isInfinite(x);
      case ACOS -> value == 0;
      case SIN, COS, TAN, SQRT, ABS, SIGN, MIN, MAX -> false;
    };
  }

  /**
   * Moves an end outward by some units in the last place; one that overflowed inward becomes the
   * largest number.
   */
  private static double outward(double value, int ulps, int side) {
    double end = value;
    if (Double.isInfinite(value)) {
      return Interval.next(value, side);
    }
    for (int i = 0; i < ulps; i++) {
      end = Interval.next(end, side);
    }
    return end;
  }

  private static Interval sine(Interval x) {
    return wave(Function.SIN, x, 0.5);
  }

  private static Interval cosine(Interval x) {
    return wave(Function.COS, x, 0);
  }

  /**
   * Values of a wave whose crests lie at (crest + 2 k) pi and whose troughs at (crest + 1 + 2 k)
   * pi.
   */
  private static Interval wave(Function function, Interval x, double crest) {
    if (!(Math.abs(x.low()) < LARGEST_ANGLE && Math.abs(x.high()) < LARGEST_ANGLE)
        || x.high() - x.low() > 2 * Math.PI) {
      return UNIT;
    }
    double a = function.apply(x.low());
    double b = function.apply(x.high());
    boolean exactA = x.low() == 0;
    boolean exactB = x.high() == 0;
    double low = Math.min(exactA ? a : outward(a, ULPS, -1), exactB ? b : outward(b, ULPS, -1));
    double high = Math.max(exactA ? a : outward(a, ULPS, 1), exactB ? b : outward(b, ULPS, 1));
    if (mayMeet(x, crest)) {
      high = 1;
    }
    if (mayMeet(x, crest + 1)) {
      low = -1;
    }
    return new Interval(Math.max(-1, low), Math.min(1, high));
  }

  /** Tells whether some (phase + 2 k) pi may lie in x; yes when in doubt. */
  private static boolean mayMeet(Interval x, double phase) {
    double from = (x.low() / Math.PI - phase) / 2;
    double to = (x.high() / Math.PI - phase) / 2;
    double doubt = 1e-15 * (1 + Math.abs(from) + Math.abs(to));
    return Math.floor(to + doubt) >= Math.ceil(from - doubt);
  }

  /** Values of the tangent; all numbers where a pole may lie in x. */
  private static Interval tangent(Interval x) {
    if (mayHavePole(x)) {
      return Interval.ALL;
    }
    double low = Function.TAN.apply(x.low());
    double high = Function.TAN.apply(x.high());
    return new Interval(
        x.low() == 0 ? low : outward(low, ULPS, -1), x.high() == 0 ? high : outward(high, ULPS, 1));
  }

  /** Tells whether the tangent may have a pole in x; yes when in doubt. */
  static boolean mayHavePole(Interval x) {
    if (!(Math.abs(x.low()) < LARGEST_ANGLE && Math.abs(x.high()) < LARGEST_ANGLE)) {
      return true;
    }
    double from = x.low() / Math.PI - 0.5;
    double to = x.high() / Math.PI - 0.5;
    double doubt = 1e-15 * (1 + Math.abs(from) + Math.abs(to));
    return Math.floor(to + doubt) >= Math.ceil(from - doubt);
  }
}
