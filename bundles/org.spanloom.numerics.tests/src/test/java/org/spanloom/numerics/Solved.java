/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics;

import static org.junit.jupiter.api.Assertions.assertInstanceOf;

/** Takes the result out of an outcome, or fails the test. */
public final class Solved {

  private Solved() {}

  /** Returns the result. */
  public static <T> T of(Outcome<T> outcome) {
    return switch (outcome) {
      case Outcome.Solved<T> solved -> solved.value();
      case Outcome.Unsolved<T> unsolved -> throw new AssertionError(unsolved.toString());
      case Outcome.Cancelled<T> cancelled -> throw new AssertionError(cancelled.toString());
    };
  }

  /** Returns the failure, which must be one. */
  public static <T> Outcome.Unsolved<T> not(Outcome<T> outcome) {
    @SuppressWarnings("unchecked")
    Outcome.Unsolved<T> unsolved = assertInstanceOf(Outcome.Unsolved.class, outcome);
    return unsolved;
  }
}
