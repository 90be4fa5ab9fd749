/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.boundary;

import java.util.List;
import org.spanloom.numerics.Side;

/**
 * One condition on a solution, {@code sum_k c_k x_(i_k)(t_k) = value}.
 *
 * @param samples the terms of the sum, at least one
 * @param value the right side
 */
public record BoundaryCondition(List<Sample> samples, double value) {

  /** Copies the list. */
  public BoundaryCondition {
    samples = List.copyOf(samples);
  }

  /**
   * One term.
   *
   * @param time the time t_k, finite
   * @param side which value is meant where the solution jumps
   * @param component the component i_k, from 0
   * @param coefficient the factor c_k
   */
  public record Sample(double time, Side side, int component, double coefficient) {}
}
