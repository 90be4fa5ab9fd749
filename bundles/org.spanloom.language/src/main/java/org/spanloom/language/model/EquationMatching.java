/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayDeque;
import java.util.Arrays;
import java.util.Deque;
import java.util.List;

/**
 * Finds for each state an equation that holds its highest derivative, each equation taken once: a
 * largest matching in the pattern of the mass matrix. Where it leaves a state out, the mass matrix
 * is singular whatever its values.
 *
 * <p>Augmenting paths by depth-first search with a set of visited equations shared by all searches
 * of a round (method of Pothen and Fan, ACM Transactions on Mathematical Software 16, 1990; from
 * memory).
 */
final class EquationMatching {

  private static final int NONE = -1;

  private final List<int[]> statesOf;
  private final int[] equationOfState;
  private final int[] stateOfEquation;

  private EquationMatching(List<int[]> statesOf, int states) {
    this.statesOf = statesOf;
    this.equationOfState = new int[states];
    this.stateOfEquation = new int[statesOf.size()];
    Arrays.fill(equationOfState, NONE);
    Arrays.fill(stateOfEquation, NONE);
  }

  /**
   * Matches.
   *
   * @param statesOf for each equation the states whose highest derivative it holds, the preferred
   *     one first
   * @param states number of states
   */
  static EquationMatching of(List<int[]> statesOf, int states) {
    EquationMatching matching = new EquationMatching(statesOf, states);
    matching.takeFirstChoices();
    matching.augment();
    return matching;
  }

  /** Returns the equation of a state, or -1. */
  int equationOf(int state) {
    return equationOfState[state];
  }

  /** Returns the state an equation is taken for, or -1. */
  int stateOf(int equation) {
    return stateOfEquation[equation];
  }

  private void takeFirstChoices() {
    for (int e = 0; e < stateOfEquation.length; e++) {
      for (int state : statesOf.get(e)) {
        if (equationOfState[state] == NONE) {
          match(e, state);
          break;
        }
      }
    }
  }

  private void augment() {
    boolean progress = true;
    while (progress) {
      progress = false;
      boolean[] visited = new boolean[stateOfEquation.length];
      for (int e = 0; e < stateOfEquation.length; e++) {
        if (stateOfEquation[e] == NONE && !visited[e]) {
          progress |= search(e, visited);
        }
      }
    }
  }

  /** Looks for a path from a free equation to a free state and swaps the matches along it. */
  private boolean search(int root, boolean[] visited) {
    Deque<int[]> path = new ArrayDeque<>();
    path.push(new int[] {root, 0});
    visited[root] = true;
    while (!path.isEmpty()) {
      int[] top = path.peek();
      int[] states = statesOf.get(top[0]);
      if (top[1] == states.length) {
        path.pop();
        continue;
      }
      int holder = equationOfState[states[top[1]++]];
      if (holder == NONE) {
        swapAlong(path);
        return true;
      }
      if (!visited[holder]) {
        visited[holder] = true;
        path.push(new int[] {holder, 0});
      }
    }
    return false;
  }

  private void swapAlong(Deque<int[]> path) {
    for (int[] step : path) {
      match(step[0], statesOf.get(step[0])[step[1] - 1]);
    }
  }

  private void match(int equation, int state) {
    equationOfState[state] = equation;
    stateOfEquation[equation] = state;
  }
}
