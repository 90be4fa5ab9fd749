/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.List;
import org.spanloom.language.text.Span;

/**
 * A complete set of initial values.
 *
 * @param name its name; empty for the values given in the declarations of the states
 * @param time when they hold, in coherent SI units
 * @param values one value for each component, in coherent SI units
 * @param span the statement; the system's header for the set of the declarations
 */
public record InitialValues(String name, Term time, List<Term> values, Span span) {

  /** Copies the list. */
  public InitialValues {
    values = List.copyOf(values);
  }
}
