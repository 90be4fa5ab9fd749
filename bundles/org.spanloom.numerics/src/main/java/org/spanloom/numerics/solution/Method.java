/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.solution;

/** The ways to solve a linear system that the solver knows. */
public enum Method {
  /** Constant coefficients: the exponential of the matrix, to about the unit roundoff. */
  MATRIX_EXPONENTIAL,
  /** Magnus integrators: smooth coefficients, oscillatory systems or small ones. */
  MAGNUS,
  /** Collocation at Radau points: varying coefficients with fast decaying directions. */
  RADAU_COLLOCATION,
  /** Collocation at Gauss points: varying coefficients, oscillatory or slow. */
  GAUSS_COLLOCATION
}
