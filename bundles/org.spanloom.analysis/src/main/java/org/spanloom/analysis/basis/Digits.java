/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.basis;

import org.spanloom.numerics.TimeRange;
import org.spanloom.numerics.basis.ConditionProfile;
import org.spanloom.numerics.basis.ConditionSample;

/**
 * The digits that a basis leaves over a range.
 *
 * @param fewest fewest digits left, not negative
 * @param time when, nearest to the start of the basis
 * @param scaled scaled condition number there
 */
record Digits(double fewest, double time, double scaled) {

  /** Returns the fewest digits over a range. */
  static Digits of(ConditionProfile profile, TimeRange range, double startTime) {
    Digits fewest = new Digits(16, startTime, 1);
    for (ConditionSample sample : profile.samples()) {
      double digits = sample.digitsLeft();
      boolean nearer = Math.abs(sample.time() - startTime) < Math.abs(fewest.time() - startTime);
      if (range.contains(sample.time())
          && (digits < fewest.fewest() || digits == fewest.fewest() && nearer)) {
        fewest = new Digits(digits, sample.time(), sample.scaled());
      }
    }
    return fewest;
  }
}
