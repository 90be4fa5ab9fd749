/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.numerics.boundary;

import java.util.List;
import org.spanloom.numerics.solution.Solution;

/** What is known of a boundary-value problem of n conditions for n states. */
public sealed interface BoundaryAnswer {

  /**
   * There is exactly one solution.
   *
   * @param solution the solution, with error estimates
   * @param conditioning how it answers to changes
   */
  record Unique(Solution solution, Conditioning conditioning) implements BoundaryAnswer {}

  /**
   * No solution meets all conditions: the homogeneous problem has solutions of its own, and the
   * right sides do not fit them (the alternative of Fredholm).
   *
   * @param directions solutions of the homogeneous problem, independent, at least one
   * @param mismatch the part of the right sides that no solution meets, relative to their size
   * @param smallest the smallest singular value of the equations over the largest
   */
  record None(List<NullSolution> directions, double mismatch, double smallest)
      implements BoundaryAnswer {
    /** Copies the list. */
    public None {
      directions = List.copyOf(directions);
    }
  }

  /**
   * Infinitely many solutions: one, plus any combination of solutions of the homogeneous problem.
   *
   * @param particular the smallest of the solutions, measured at the times of the conditions and
   *     relative to the scales
   * @param directions solutions of the homogeneous problem, independent, at least one
   * @param smallest the smallest singular value of the equations over the largest
   */
  record Family(Solution particular, List<NullSolution> directions, double smallest)
      implements BoundaryAnswer {
    /** Copies the list. */
    public Family {
      directions = List.copyOf(directions);
    }
  }

  /**
   * How a solution answers to changes, in states divided by their scales and conditions divided by
   * the size of their coefficients (Ascher, Mattheij &amp; Russell 1988, section 3.4; from memory).
   *
   * @param toConditions the largest change of the solution for conditions changed by 1 each
   * @param toForcing the largest change of the solution for a forcing changed by 1 scale per unit
   *     of time, from a sample of times
   * @param smallest the smallest singular value of the condensed equations over the largest
   */
  record Conditioning(double toConditions, double toForcing, double smallest) {}

  /**
   * A solution of the homogeneous problem, not zero, where it is largest.
   *
   * @param time that time
   * @param values n values there; the largest is the scale of its state
   */
  record NullSolution(double time, double[] values) {
    /** Copies the array. */
    public NullSolution {
      values = values.clone();
    }

    @Override
    public double[] values() {
      return values.clone();
    }
  }
}
