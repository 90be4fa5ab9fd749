/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.basis;

/** What came of a request for a basis. */
public sealed interface BasisAnswer {

  /** The basis. */
  record Solved(BasisTable table) implements BasisAnswer {}

  /**
   * The request cannot be served as it stands.
   *
   * @param usage whether the caller asked for something that is not there, rather than the model
   *     being at fault
   * @param message what was found, what was expected and what to do
   */
  record Refused(boolean usage, String message) implements BasisAnswer {}

  /** The caller cancelled. */
  record Cancelled() implements BasisAnswer {}
}
