/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

/**
 * A closed interval of real numbers that surely contains all values in question; ends may be
 * infinite, and then mean that there is no bound. Every operation encloses its result: an end that
 * is not exact is rounded outward, one that is exact is kept, so that a zero at a representable
 * place is seen as one.
 *
 * <p>Operations take operands where they are defined: dividing by [0, 0] gives {@link #EMPTY}.
 * Source: Moore, Kearfott and Cloud, Introduction to Interval Analysis, 2009, chapters 2 to 5 (from
 * memory).
 *
 * @param low least value; negative infinity for none
 * @param high greatest value; positive infinity for none
 */
public record Interval(double low, double high) {

  /** No number at all. */
  public static final Interval EMPTY =
      new Interval(Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY);

  /** All numbers. */
  public static final Interval ALL =
      new Interval(Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY);

  private static final Interval ZERO = new Interval(0, 0);

  /** Below this size the error of a product can itself be too small to be represented. */
  private static final double ERROR_UNDERFLOWS = 0x1p-960;

  /** Checks that both ends are numbers. */
  public Interval {
    if (Double.isNaN(low) || Double.isNaN(high)) {
      throw new IllegalArgumentException("an end is not a number");
    }
  }

  /** Returns the interval of one number; of all numbers where it is not finite. */
  public static Interval at(double value) {
    return Double.isFinite(value) ? new Interval(value, value) : ALL;
  }

  /** Tells whether nothing is in it. */
  public boolean isEmpty() {
    return low > high;
  }

  /** Tells whether both ends are finite. */
  public boolean isBounded() {
    return !isEmpty() && low > Double.NEGATIVE_INFINITY && high < Double.POSITIVE_INFINITY;
  }

  /** Tells whether it is one number. */
  public boolean isPoint() {
    return low == high;
  }

  /** Tells whether a number is in it. */
  public boolean contains(double value) {
    return low <= value && value <= high;
  }

  /** Returns the smallest interval that contains both. */
  public Interval hull(Interval other) {
    return new Interval(Math.min(low, other.low), Math.max(high, other.high));
  }

  /** Returns what both contain. */
  public Interval intersect(Interval other) {
    double from = Math.max(low, other.low);
    double to = Math.min(high, other.high);
    return from > to ? EMPTY : new Interval(from, to);
  }

  /** Returns the values of {@code a + b}. */
  public Interval plus(Interval other) {
    if (isEmpty() || other.isEmpty()) {
      return EMPTY;
    }
    return new Interval(sum(low, other.low, -1), sum(high, other.high, 1));
  }

  /** Returns the values of {@code a - b}. */
  public Interval minus(Interval other) {
    return plus(other.negated());
  }

  /** Returns the values of {@code -a}. */
  public Interval negated() {
    return isEmpty() ? EMPTY : new Interval(-high, -low);
  }

  /** Returns the values of {@code a b}. */
  public Interval times(Interval other) {
    if (isEmpty() || other.isEmpty()) {
      return EMPTY;
    }
    double from =
        least(
            product(low, other.low, -1),
            product(low, other.high, -1),
            product(high, other.low, -1),
            product(high, other.high, -1));
    double to =
        -least(
            -product(low, other.low, 1),
            -product(low, other.high, 1),
            -product(high, other.low, 1),
            -product(high, other.high, 1));
    return new Interval(from, to);
  }

  /** Returns the values of {@code a / b} for b other than 0. */
  public Interval over(Interval other) {
    if (isEmpty() || other.isEmpty() || other.equals(ZERO) || (other.low == 0 && other.high == 0)) {
      return EMPTY;
    }
    if (low == 0 && high == 0) {
      return ZERO;
    }
    if (other.low < 0 && other.high > 0) {
      return ALL;
    }
    if (other.high <= 0) {
      return negated().over(other.negated());
    }
    // The divisor is positive, or 0 at its low end, where quotients have no bound.
    double from = low >= 0 ? quotient(low, other.high, -1) : quotient(low, other.low, -1);
    double to = high <= 0 ? quotient(high, other.high, 1) : quotient(high, other.low, 1);
    return new Interval(from, to);
  }

  /** Returns the values of {@code a^2}, none of them negative. */
  public Interval squared() {
    if (isEmpty()) {
      return EMPTY;
    }
    Interval size = absolute();
    return new Interval(
        Math.max(0, product(size.low, size.low, -1)), product(size.high, size.high, 1));
  }

  /** Returns the values of {@code |a|}. */
  public Interval absolute() {
    if (isEmpty() || low >= 0) {
      return this;
    }
    return high <= 0 ? negated() : new Interval(0, Math.max(-low, high));
  }

  /** Returns the values of the square root where there is one. */
  public Interval squareRoot() {
    if (isEmpty() || high < 0) {
      return EMPTY;
    }
    return new Interval(root(Math.max(0, low), -1), root(high, 1));
  }

  /** Returns the values of the smaller of two. */
  public Interval smaller(Interval other) {
    if (isEmpty() || other.isEmpty()) {
      return EMPTY;
    }
    return new Interval(Math.min(low, other.low), Math.min(high, other.high));
  }

  /** Returns the values of the larger of two. */
  public Interval larger(Interval other) {
    return negated().smaller(other.negated()).negated();
  }

  /** Returns the values of the sign: -1, 0 or 1 and, as an interval, what lies between. */
  public Interval sign() {
    return isEmpty() ? EMPTY : new Interval(Math.signum(low), Math.signum(high));
  }

  /**
   * Returns the neighbour of a rounded end on the outer side, or the end itself where its error
   * points inward.
   */
  private static double outward(double rounded, double error, int side) {
    return error * side > 0 ? next(rounded, side) : rounded;
  }

  /** Returns the next number on a side: -1 for down, 1 for up. */
  static double next(double value, int side) {
    return side < 0 ? Math.nextDown(value) : Math.nextUp(value);
  }

  private static double sum(double a, double b, int side) {
    double s = a + b;
    if (!Double.isFinite(s)) {
      return overflowed(s, a, b, side);
    }
    // The exact error of a sum: Knuth, The Art of Computer Programming, volume 2, 4.2.2, theorem B.
    double t = s - a;
    return outward(s, (a - (s - t)) + (b - t), side);
  }

  private static double product(double a, double b, int side) {
    if (a == 0 || b == 0) {
      return 0;
    }
    double p = a * b;
    if (!Double.isFinite(p)) {
      return overflowed(p, a, b, side);
    }
    return Math.abs(p) < ERROR_UNDERFLOWS ? next(p, side) : outward(p, Math.fma(a, b, -p), side);
  }

  private static double quotient(double a, double b, int side) {
    if (b == 0) {
      return a > 0 ? Double.POSITIVE_INFINITY : Double.NEGATIVE_INFINITY;
    }
    if (a == 0 || Double.isInfinite(b)) {
      // With a divisor without bound the quotient comes near to 0, whatever is above.
      return 0;
    }
    double q = a / b;
    if (!Double.isFinite(q)) {
      return overflowed(q, a, b, side);
    }
    boolean tiny = Math.abs(q) < ERROR_UNDERFLOWS || Math.abs(a) < ERROR_UNDERFLOWS;
    return tiny ? next(q, side) : outward(q, -Math.fma(q, b, -a) * Math.signum(b), side);
  }

  private static double root(double a, int side) {
    if (a == 0 || Double.isInfinite(a)) {
      return a;
    }
    double r = Math.sqrt(a);
    return a < ERROR_UNDERFLOWS
        ? Math.max(0, next(r, side))
        : outward(r, -Math.fma(r, r, -a), side);
  }

  /**
   * An infinite end stays where it means that there is no bound; one that overflowed inward is the
   * largest number.
   */
  private static double overflowed(double result, double a, double b, int side) {
    if (Double.isNaN(result)) {
      return side < 0 ? Double.NEGATIVE_INFINITY : Double.POSITIVE_INFINITY;
    }
    boolean exact = Double.isInfinite(a) || Double.isInfinite(b);
    boolean outside = result * side > 0;
    return exact || outside ? result : Math.copySign(Double.MAX_VALUE, result);
  }

  private static double least(double a, double b, double c, double d) {
    return Math.min(Math.min(a, b), Math.min(c, d));
  }
}
