/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.List;
import org.spanloom.language.text.Span;

/**
 * A change of the state vector at fixed times: {@code x(s) = J x(s-) + d}. Every right side is
 * taken just before; components without a change stay as they are.
 *
 * @param times when it takes place
 * @param changes the rows of J and d that are not those of the identity, by component; at most one
 *     for each
 * @param timesSpan where the times stand
 * @param span the statement
 */
public record Jump(JumpTimes times, List<Change> changes, Span timesSpan, Span span) {

  /** Copies the list. */
  public Jump {
    changes = List.copyOf(changes);
  }

  /**
   * One row of J and d.
   *
   * @param component index of the component that changes
   * @param value what it becomes: samples at the running time are values just before the jump, and
   *     functions of time in it are taken at the time of the jump, from the left
   * @param span the line
   */
  public record Change(int component, AffineValue value, Span span) {}
}
