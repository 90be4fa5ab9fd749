/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.editing;

import java.util.Optional;
import org.spanloom.language.files.FileKey;
import org.spanloom.language.model.Model;
import org.spanloom.language.text.Span;

/** Finds declarations. */
public final class Definition {

  private Definition() {}

  /**
   * A declaration in another file.
   *
   * @param file the file
   * @param span the place of the name in its text
   */
  public record Elsewhere(FileKey file, Span span) {}

  /** Returns the declaration, in an imported file, of what stands at an offset. */
  public static Optional<Elsewhere> elsewhere(Model model, int offset) {
    return new PartNames(model)
        .importedAt(offset)
        .map(f -> new Elsewhere(f.file(), f.declaration().name().span()));
  }

  /** Returns the place of the name in the declaration of what stands at an offset. */
  public static Optional<Span> at(Model model, int offset) {
    return Names.of(model.syntax())
        .at(offset)
        .flatMap(o -> o.symbol().declaration(o.primes()))
        .map(Symbol.Declared::label);
  }
}
