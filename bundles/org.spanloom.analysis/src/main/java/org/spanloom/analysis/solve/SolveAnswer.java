/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.solve;

/** What came of a request to solve. */
public sealed interface SolveAnswer {

  /** The solution. */
  record Solved(SolutionTable table) implements SolveAnswer {}

  /**
   * The request cannot be served as it stands.
   *
   * @param usage whether the caller asked for something that is not there, rather than the model
   *     being at fault
   * @param message what was found, what was expected and what to do
   */
  record Refused(boolean usage, String message) implements SolveAnswer {}

  /** The caller cancelled. */
  record Cancelled() implements SolveAnswer {}
}
