/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.List;
import org.spanloom.language.model.Meaning.StateMeaning;

/**
 * The components of the state vector: for each state, in order of declaration, the state and its
 * derivatives below the highest one that the equations hold.
 */
final class StateVector {

  /** Highest derivative of a state. */
  static final int ORDER_LIMIT = 20;

  private final List<StateMeaning> states;
  private final int[] orders;
  private final int[] firsts;
  private final int dimension;

  /**
   * Lays out the components.
   *
   * @param states the states
   * @param orders order of the highest derivative of each, at least 1
   */
  StateVector(List<StateMeaning> states, int[] orders) {
    this.states = List.copyOf(states);
    this.orders = orders.clone();
    this.firsts = new int[orders.length];
    int next = 0;
    for (int i = 0; i < orders.length; i++) {
      firsts[i] = next;
      next += orders[i];
    }
    this.dimension = next;
  }

  int dimension() {
    return dimension;
  }

  List<StateMeaning> states() {
    return states;
  }

  /** Returns the order of the highest derivative of a state. */
  int order(int state) {
    return orders[state];
  }

  /** Returns the component of a state itself. */
  int first(int state) {
    return firsts[state];
  }

  /** Returns the component whose derivative is the highest one of a state. */
  int last(int state) {
    return firsts[state] + orders[state] - 1;
  }

  boolean isComponent(StateKey key) {
    return key.order() < orders[key.state()];
  }

  int component(StateKey key) {
    return firsts[key.state()] + key.order();
  }

  boolean isHighestDerivative(StateKey key) {
    return key.order() == orders[key.state()];
  }

  static String label(StateMeaning state, int primes) {
    return state.label(primes);
  }
}
