/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.editing;

import java.util.Optional;
import org.spanloom.language.model.Model;
import org.spanloom.language.text.Span;

/** Finds declarations. */
public final class Definition {

  private Definition() {}

  /** Returns the place of the name in the declaration of what stands at an offset. */
  public static Optional<Span> at(Model model, int offset) {
    return Names.of(model.syntax())
        .at(offset)
        .flatMap(o -> o.symbol().declaration(o.primes()))
        .map(Symbol.Declared::label);
  }
}
