/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.requirement;

import java.util.OptionalDouble;
import org.spanloom.language.text.Span;

/**
 * What came of one requirement.
 *
 * @param system name of the system
 * @param text the requirement as written
 * @param status whether it holds
 * @param value the value found, in {@code unit}; NaN where the requirement has none
 * @param limit what it is compared with, in {@code unit}; NaN where there is none
 * @param margin how far the value is on the good side, in {@code unit}; negative when it fails; NaN
 *     where there is none
 * @param error estimated error of the margin, in {@code unit}; NaN where there is none
 * @param unit UCUM code of value, limit and margin
 * @param time when the margin is smallest, in the time unit
 * @param detail one sentence for people
 * @param span the requirement
 */
public record RequirementResult(
    String system,
    String text,
    Status status,
    double value,
    double limit,
    double margin,
    double error,
    String unit,
    OptionalDouble time,
    String detail,
    Span span) {

  /** Whether a requirement holds. */
  public enum Status {
    /** It holds, and the margin is larger than its estimated error. */
    HELD,
    /** It does not hold. */
    FAILED,
    /**
     * It could not be decided: the margin is within its error, or there is no result. Counts as
     * failed.
     */
    UNDECIDED
  }
}
