/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.Arrays;

/**
 * Which nodes of a tape have a say in its value: all but those that stand in a branch that is not
 * taken. For ranges of times over which a choice is open there is a doubt.
 */
final class Liveness {

  private final TermTape tape;
  private final boolean choices;
  private final boolean[] possible;
  private final boolean[] sure;

  Liveness(TermTape tape) {
    this.tape = tape;
    this.possible = new boolean[tape.size()];
    this.sure = new boolean[tape.size()];
    boolean any = false;
    for (int i = 0; i < tape.size(); i++) {
      any |= tape.node(i) instanceof Term.Switch;
    }
    this.choices = any;
    Arrays.fill(possible, !any);
    Arrays.fill(sure, !any);
  }

  /** Tells whether there is a choice at all. */
  boolean hasChoices() {
    return choices;
  }

  /** Takes the enclosures of all nodes over a range of times. */
  void update(TermIntervals intervals) {
    if (!choices) {
      return;
    }
    Arrays.fill(possible, false);
    Arrays.fill(sure, false);
    possible[possible.length - 1] = true;
    sure[sure.length - 1] = true;
    for (int i = possible.length - 1; i >= 0; i--) {
      if (!possible[i]) {
        continue;
      }
      int operands = TermTape.operands(tape.node(i)).size();
      Branch branch =
          tape.node(i) instanceof Term.Switch choice
              ? Branch.of(choice, intervals.of(tape.operand(i, 0)))
              : Branch.OPEN;
      boolean open = tape.node(i) instanceof Term.Switch && branch == Branch.OPEN;
      for (int k = 0; k < operands; k++) {
        boolean dead = k == 1 && branch == Branch.OTHERWISE || k == 2 && branch == Branch.THEN;
        int operand = tape.operand(i, k);
        possible[operand] |= !dead;
        sure[operand] |= sure[i] && !dead && !(open && k > 0);
      }
    }
  }

  /** Tells whether a guard may matter somewhere in the range. */
  boolean mayMatter(Guard guard) {
    return possible[guard.owner()] && possible[guard.node()];
  }

  /** Tells whether a guard matters everywhere in the range. */
  boolean matters(Guard guard) {
    return sure[guard.owner()] && sure[guard.node()];
  }
}
