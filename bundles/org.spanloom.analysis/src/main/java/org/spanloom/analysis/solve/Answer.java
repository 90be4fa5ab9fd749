/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.solve;

/**
 * What came of a request.
 *
 * @param <T> what was asked for
 */
public sealed interface Answer<T> {

  /**
   * The result.
   *
   * @param <T> what was asked for
   */
  record Solved<T>(T value) implements Answer<T> {}

  /**
   * The request cannot be served as it stands.
   *
   * @param <T> what was asked for
   * @param usage whether the caller asked for something that is not there, rather than the model
   *     being at fault
   * @param message what was found, what was expected and what to do
   */
  record Refused<T>(boolean usage, String message) implements Answer<T> {}

  /**
   * The caller cancelled.
   *
   * @param <T> what was asked for
   */
  record Cancelled<T>() implements Answer<T> {}
}
