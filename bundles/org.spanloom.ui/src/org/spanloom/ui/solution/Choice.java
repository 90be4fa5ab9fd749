/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.solution;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.spanloom.language.model.InitialValues;
import org.spanloom.language.model.Model;
import org.spanloom.language.model.SystemModel;

/**
 * What of a model is to be solved.
 *
 * @param system name of the system
 * @param initial name of the initial values, empty for those of the declarations
 * @param until last time, in the unit of the system; the end of its interval if empty
 */
record Choice(String system, String initial, OptionalDouble until) {

  /**
   * Returns what to choose when nothing is chosen yet, or when what was chosen is no longer there.
   */
  static Optional<Choice> in(Model model, Optional<Choice> before) {
    Optional<SystemModel> system =
        before.flatMap(b -> find(model, b.system())).or(() -> model.systems().stream().findFirst());
    return system.map(s -> {
      boolean same = before.filter(b -> b.system().equals(s.name())).isPresent();
      List<String> sets = s.initialValues().stream().map(InitialValues::name).toList();
      String first = sets.isEmpty() ? "" : sets.getFirst();
      String initial =
          before.map(Choice::initial).filter(i -> same && sets.contains(i)).orElse(first);
      OptionalDouble until = same ? before.get().until() : OptionalDouble.empty();
      return new Choice(s.name(), initial, until);
    });
  }

  /** Returns the system chosen. */
  Optional<SystemModel> systemIn(Model model) {
    return find(model, system);
  }

  private static Optional<SystemModel> find(Model model, String name) {
    return model.systems().stream().filter(s -> s.name().equals(name)).findFirst();
  }
}
