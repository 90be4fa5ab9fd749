/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import org.spanloom.language.units.UnitOfMeasure;

/**
 * Whether a term has a finite value at every time of an interval, so that the theorem of existence
 * on the whole interval applies to a system with this coefficient.
 *
 * <p>Decided by interval arithmetic: what is called defined is proved to be so, at every real time
 * and not only at sampled ones. Parameters have their declared values.
 */
public sealed interface Definedness {

  /** The term has a finite value at every time of the interval. */
  record Defined() implements Definedness {}

  /**
   * There is a time at which the term has no finite value.
   *
   * @param time the place nearest to the start, in the unit of time; as near as 1e-9 of the
   *     interval's length (of the distance from the start where the interval is not bounded)
   * @param cause why it has none
   * @param operand the divisor or the argument at fault
   * @param always whether it is at fault at all times
   * @param from left end of the largest interval around the start on which the term is defined, in
   *     the unit of time; the interval's own end if nothing lies in between
   * @param to right end of it; equal to {@code from} where the term is undefined at the start
   *     itself
   */
  record Undefined(double time, Cause cause, Term operand, boolean always, double from, double to)
      implements Definedness {}

  /**
   * Neither could be shown with bounded work.
   *
   * @param time from where on it is open, in the unit of time
   * @param operand the divisor or the argument in question
   * @param reason why, in a few words that begin with a small letter
   */
  record Undecided(double time, Term operand, String reason) implements Definedness {}

  /** Why a term has no value. */
  enum Cause {
    /** The divisor is 0, or a tangent is taken of a quarter turn: no bound near by. */
    POLE("the divisor is 0"),
    /**
     * Divisor and dividend are both 0 and the quotient stays bounded: it has a limit but no value.
     */
    GAP("divisor and dividend are both 0; the quotient has a limit there but no value"),
    /** The argument of a logarithm is 0 or negative. */
    LOGARITHM("the argument of the logarithm is not positive"),
    /** A square root of a negative number. */
    ROOT("the argument of the square root is negative"),
    /** A power of a number for which it has no real value. */
    POWER("the base of the power is negative, or 0 with a negative exponent"),
    /** An inverse sine or cosine of a number beyond 1. */
    INVERSE("the argument of the inverse function is not between -1 and 1"),
    /** The tangent of an odd number of quarter turns. */
    TANGENT("the tangent has a pole"),
    /** The value exceeds the largest number. */
    OVERFLOW("the value exceeds 1.8e308, the largest number");

    private final String wording;

    Cause(String wording) {
      this.wording = wording;
    }

    /** Returns the cause in a few words that begin with a small letter. */
    public String wording() {
      return wording;
    }
  }

  /**
   * Examines a term.
   *
   * @param term the term, in coherent SI units
   * @param interval the interval, in the unit of time; a fault exactly at an open end does not
   *     count
   * @param timeUnit the unit of time
   * @param start a time of the interval, in the unit of time, from which one looks to both sides;
   *     one outside or at an open end is moved inside
   */
  static Definedness of(Term term, TimeInterval interval, UnitOfMeasure timeUnit, double start) {
    return new DefinednessSearch(TermTape.of(term), interval, timeUnit, start, new SearchBudget())
        .result();
  }
}
