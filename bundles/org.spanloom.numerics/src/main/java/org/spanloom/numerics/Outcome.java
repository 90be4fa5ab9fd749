/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics;

/**
 * What came of a computation. Nothing in the numerics throws for a system that is hard, wrong or
 * cancelled.
 *
 * @param <T> the result
 */
public sealed interface Outcome<T> {

  /**
   * The result is there.
   *
   * @param <T> the result
   * @param value the result
   */
  record Solved<T>(T value) implements Outcome<T> {}

  /**
   * The caller cancelled.
   *
   * @param <T> the result that would have been
   */
  record Cancelled<T>() implements Outcome<T> {}

  /**
   * There is no result that could be trusted.
   *
   * @param <T> the result that would have been
   * @param reason why
   * @param time where on the time axis it became impossible
   * @param detail the numbers behind it, as part of a sentence, for example "step size below 1e-14
   *     of the range"
   */
  record Unsolved<T>(Reason reason, double time, String detail) implements Outcome<T> {}

  /** Why there is no result. */
  enum Reason {
    /** A coefficient, a start value or an entry of a table is not a finite number. */
    COEFFICIENT_NOT_FINITE,
    /** The solution grows beyond the largest floating point number. */
    OVERFLOW,
    /** The step size fell below what the time axis resolves. */
    STEP_TOO_SMALL,
    /** The work limit was reached. */
    TOO_MUCH_WORK,
    /** A jump that cannot be undone lies between the values given and those asked for. */
    JUMP_SINGULAR,
    /** The range asked for is not bounded or not inside the system's range. */
    RANGE,
    /** The method asked for does not apply to the system. */
    METHOD
  }
}
