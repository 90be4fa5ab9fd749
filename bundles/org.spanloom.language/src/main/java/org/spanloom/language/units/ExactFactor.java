/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.units;

import java.math.BigInteger;

/**
 * A positive fraction, in lowest terms: the size of a unit before it is rounded to double precision
 * once.
 *
 * @param numerator positive
 * @param denominator positive
 */
record ExactFactor(BigInteger numerator, BigInteger denominator) {

  /** One. */
  static final ExactFactor ONE = new ExactFactor(BigInteger.ONE, BigInteger.ONE);

  /** More bits than any unit in use needs; a bound on work, not on meaning. */
  private static final int MOST_BITS = 20_000;

  /** More bits than a double holds, so that one rounding of the quotient is the right one. */
  private static final int QUOTIENT_BITS = 70;

  /** Checks the signs and cancels. */
  ExactFactor {
    if (numerator.signum() <= 0 || denominator.signum() <= 0) {
      throw new ArithmeticException("not positive");
    }
    if (numerator.bitLength() + denominator.bitLength() > MOST_BITS) {
      throw new ArithmeticException("too many digits");
    }
    BigInteger common = numerator.gcd(denominator);
    if (common.bitLength() > 1) {
      numerator = numerator.divide(common);
      denominator = denominator.divide(common);
    }
  }

  /**
   * Returns the value of a positive decimal number such as {@code 2.58e-4}; by hand, because the
   * first use of the library's decimal numbers costs 20 ms of the command line's start.
   */
  static ExactFactor of(String decimal) {
    int e = decimal.indexOf('e');
    String mantissa = e < 0 ? decimal : decimal.substring(0, e);
    int exponent = e < 0 ? 0 : Integer.parseInt(decimal.substring(e + 1));
    int point = mantissa.indexOf('.');
    if (point >= 0) {
      exponent -= mantissa.length() - point - 1;
      mantissa = mantissa.substring(0, point) + mantissa.substring(point + 1);
    }
    BigInteger digits = new BigInteger(mantissa);
    BigInteger power = BigInteger.TEN.pow(Math.abs(exponent));
    return exponent < 0
        ? new ExactFactor(digits, power)
        : new ExactFactor(digits.multiply(power), BigInteger.ONE);
  }

  ExactFactor times(ExactFactor other) {
    return new ExactFactor(
        numerator.multiply(other.numerator), denominator.multiply(other.denominator));
  }

  ExactFactor over(ExactFactor other) {
    return new ExactFactor(
        numerator.multiply(other.denominator), denominator.multiply(other.numerator));
  }

  /**
   * Returns a whole power.
   *
   * @throws ArithmeticException if it has too many digits to be a unit
   */
  ExactFactor power(int n) {
    long bits = (long) Math.abs(n) * (numerator.bitLength() + denominator.bitLength());
    if (bits > 2L * MOST_BITS) {
      throw new ArithmeticException("too many digits");
    }
    int size = Math.abs(n);
    return n < 0
        ? new ExactFactor(denominator.pow(size), numerator.pow(size))
        : new ExactFactor(numerator.pow(size), denominator.pow(size));
  }

  /** Returns the nearest double; 0 or infinite where it is out of range. */
  double value() {
    int shift = QUOTIENT_BITS - numerator.bitLength() + denominator.bitLength();
    BigInteger above = shift > 0 ? numerator.shiftLeft(shift) : numerator;
    BigInteger below = shift < 0 ? denominator.shiftLeft(-shift) : denominator;
    BigInteger[] division = above.divideAndRemainder(below);
    // A set last bit stands for the remainder, so that a tie is not mistaken for one.
    BigInteger quotient = division[1].signum() == 0 ? division[0] : division[0].setBit(0);
    return Math.scalb(quotient.doubleValue(), -shift);
  }
}
