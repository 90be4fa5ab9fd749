/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.workspace;

/**
 * Names of the attributes of our markers, beside those of the platform. Numbers are text in the
 * form of {@link Double#toString}, since a marker holds no doubles.
 */
public final class MarkerAttributes {

  /** Stable id of the finding, for example {@code unit-mismatch}. */
  public static final String CODE = "code";

  /** Ways to mend it, as {@link FixText} writes them. */
  public static final String FIXES = "fixes";

  /** Name of the system. */
  public static final String SYSTEM = "system";

  /** Name of the basis. */
  public static final String BASIS = "basis";

  /** Largest condition number. */
  public static final String RAW = "raw";

  /** When it is reached, in {@link #TIME_UNIT}. */
  public static final String RAW_TIME = "rawTime";

  /** Largest condition number after scaling each column. */
  public static final String SCALED = "scaled";

  /** When it is reached, in {@link #TIME_UNIT}. */
  public static final String SCALED_TIME = "scaledTime";

  /** Unit of both times, in UCUM code. */
  public static final String TIME_UNIT = "timeUnit";

  /** Fewest decimal digits left for a result built on the basis. */
  public static final String DIGITS_LEFT = "digitsLeft";

  /** Number of windows advised; empty if it could not be counted. */
  public static final String WINDOWS = "windows";

  /** Status of a requirement: {@code HELD}, {@code FAILED} or {@code UNDECIDED}. */
  public static final String STATUS = "status";

  /** Value found for a requirement. */
  public static final String VALUE = "value";

  /** What the value is compared with. */
  public static final String LIMIT = "limit";

  /** How far the value is on the good side. */
  public static final String MARGIN = "margin";

  /** Unit of value, limit and margin, in UCUM code. */
  public static final String UNIT = "unit";

  private MarkerAttributes() {}
}
