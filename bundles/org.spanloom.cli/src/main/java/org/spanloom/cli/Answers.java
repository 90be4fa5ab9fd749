/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import org.spanloom.analysis.solve.Answer;

/** Takes the result out of an answer, or says why there is none. */
final class Answers {

  private Answers() {}

  /**
   * Returns the result.
   *
   * @throws CommandFailure if the request was refused or cancelled
   */
  static <T> T value(Answer<T> answer) throws CommandFailure {
    return switch (answer) {
      case Answer.Solved<T> solved -> solved.value();
      case Answer.Refused<T> refused -> throw CommandFailure.of(refused.usage(), refused.message());
      case Answer.Cancelled<T> cancelled -> throw CommandFailure.refused("cancelled");
    };
  }
}
