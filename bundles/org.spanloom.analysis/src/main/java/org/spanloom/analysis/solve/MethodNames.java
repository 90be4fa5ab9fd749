/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.solve;

import java.util.List;
import java.util.Optional;
import org.spanloom.numerics.solution.MethodChoice;

/** The names by which a request may ask for a method. */
public final class MethodNames {

  private MethodNames() {}

  /** Returns all names, in a fixed order. */
  public static List<String> all() {
    return MethodChoice.names();
  }

  /**
   * Reads a name.
   *
   * @param name a name, or empty to leave the choice to the system
   * @throws Choice.RefusedException when no method has that name
   */
  public static Optional<MethodChoice> read(Optional<String> name) throws Choice.RefusedException {
    if (name.isEmpty()) {
      return Optional.empty();
    }
    Optional<MethodChoice> choice = MethodChoice.named(name.get());
    if (choice.isEmpty()) {
      throw new Choice.RefusedException(
          true,
          "there is no method '"
              + name.get()
              + "'; choose one of: "
              + String.join(", ", all())
              + ", or leave it out and it is chosen by the system.");
    }
    return choice;
  }
}
