/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.settings;

import java.util.OptionalDouble;

/**
 * Thresholds of a project, from the file {@value #FILE_NAME} in its root folder.
 *
 * <p>They are argued from digits. Double precision gives about 16; a basis with scaled condition
 * number K, whose entries are known to a relative error e, leaves {@code -log10(K max(e, 2^-53))}
 * of them to a result built on it. A basis deserves a warning when it leaves fewer digits than the
 * system asks of its results, and it is useless when it leaves less than one.
 *
 * @param digitsWanted digits a basis must leave, or it is ill-conditioned; the digits of the
 *     system's accuracy if empty
 * @param digitsLeast digits below which a basis has nothing left, an error where something relies
 *     on it
 * @param windowCondition scaled condition number up to which one window of a basis may go; 1e8
 *     spends half of the digits of double precision on the basis and leaves the other half
 * @param basisAccuracy relative error asked of a basis; tight, so that its condition is judged by
 *     its digits and not by a loose integration
 * @param residualLimit relative residual above which a closed form is no solution; 1e-8 leaves room
 *     for rounding and for constants written with 9 digits
 */
public record Settings(
    OptionalDouble digitsWanted,
    double digitsLeast,
    double windowCondition,
    double basisAccuracy,
    double residualLimit) {

  /** Name of the file, in the root folder of a project. */
  public static final String FILE_NAME = "spanloom.settings";

  /** What holds where a project says nothing. */
  public static final Settings DEFAULTS = new Settings(OptionalDouble.empty(), 1, 1e8, 1e-10, 1e-8);

  /** Returns the digits a basis must leave in a system that asks for a relative error. */
  public double digitsWanted(double accuracy) {
    return digitsWanted.orElse(-Math.log10(accuracy));
  }
}
