/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.Optional;

/**
 * A state or a derivative of one inside an expression, before it is known which derivatives are
 * components.
 *
 * @param state place of the state among the states of the system, from 0
 * @param order number of primes
 * @param at the time named, in coherent SI units; empty for the running time
 * @param before whether the limit from the left is meant
 */
record StateKey(int state, int order, Optional<Term> at, boolean before) {

  static StateKey running(int state, int order) {
    return new StateKey(state, order, Optional.empty(), false);
  }

  /**
   * Times are compared by identity: terms may share so much that comparing them by value has no
   * end.
   */
  @Override
  public boolean equals(Object other) {
    return other instanceof StateKey that
        && state == that.state
        && order == that.order
        && before == that.before
        && at.isPresent() == that.at.isPresent()
        && (at.isEmpty() || isSame(at.get(), that.at.get()));
  }

  @SuppressWarnings("ReferenceEquality")
  private static boolean isSame(Term a, Term b) {
    return a == b || a instanceof Term.Constant && a.equals(b);
  }

  @Override
  public int hashCode() {
    return 31 * (31 * state + order) + (before ? 2 : 0) + (at.isPresent() ? 1 : 0);
  }
}
