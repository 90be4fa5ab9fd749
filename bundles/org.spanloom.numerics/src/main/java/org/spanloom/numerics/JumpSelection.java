/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics;

import java.util.List;

/**
 * A system with other jumps than it has, for work on a part of its range.
 *
 * @param whole the system
 * @param jumps the jumps that count, by time
 */
public record JumpSelection(LinearSystem whole, List<Jump> jumps) implements LinearSystem {

  /** Copies the list. */
  public JumpSelection {
    jumps = List.copyOf(jumps);
  }

  /** Returns a system without its jumps. */
  public static LinearSystem without(LinearSystem system) {
    return system.jumps().isEmpty() ? system : new JumpSelection(whole(system), List.of());
  }

  /** Returns a system with those of its jumps that lie strictly between two times. */
  public static LinearSystem between(LinearSystem system, double from, double to) {
    return system.jumps().isEmpty()
        ? system
        : new JumpSelection(
            whole(system),
            system.jumps().stream().filter(j -> j.time() > from && j.time() < to).toList());
  }

  private static LinearSystem whole(LinearSystem system) {
    return system instanceof JumpSelection selection ? selection.whole() : system;
  }

  @Override
  public int dimension() {
    return whole.dimension();
  }

  @Override
  public TimeRange range() {
    return whole.range();
  }

  @Override
  public void matrix(double t, Side side, double[] a) {
    whole.matrix(t, side, a);
  }

  @Override
  public void forcing(double t, Side side, double[] b) {
    whole.forcing(t, side, b);
  }

  @Override
  public boolean hasConstantMatrix() {
    return whole.hasConstantMatrix();
  }

  @Override
  public boolean hasConstantForcing() {
    return whole.hasConstantForcing();
  }

  @Override
  public SparsityPattern pattern() {
    return whole.pattern();
  }

  @Override
  public double[] breakpoints() {
    return whole.breakpoints();
  }

  @Override
  public double[] breakpoints(double from, double to) {
    return whole.breakpoints(from, to);
  }
}
