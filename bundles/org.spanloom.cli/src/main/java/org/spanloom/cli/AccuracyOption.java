/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import java.util.Optional;
import java.util.OptionalDouble;

/** The option {@code --accuracy}. */
final class AccuracyOption {

  private static final double LEAST = 1e-14;

  private AccuracyOption() {}

  /**
   * Reads it.
   *
   * @throws CommandFailure if it is not a number in the range that makes sense in double precision
   */
  static OptionalDouble read(Options.Values values) throws CommandFailure {
    Optional<String> text = values.one("--accuracy");
    if (text.isEmpty()) {
      return OptionalDouble.empty();
    }
    double value = NumberText.read(text.get(), "--accuracy");
    if (!(value >= LEAST && value < 1)) {
      throw CommandFailure.refused(
          "--accuracy: "
              + NumberText.shown(text.get())
              + " will not do; give a number from 1e-14 to below 1");
    }
    return OptionalDouble.of(value);
  }
}
