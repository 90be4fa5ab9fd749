/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.editing;

import java.util.Optional;
import org.spanloom.language.model.Model;
import org.spanloom.language.syntax.SyntaxFile;
import org.spanloom.language.text.Span;

/** Finds declarations. */
public final class Definition {

  private Definition() {}

  /** Returns the place of the name in the declaration of what stands at an offset. */
  public static Optional<Span> at(Model model, int offset) {
    SyntaxFile file = model.syntax();
    return Word.at(model.source(), offset)
        .flatMap(word ->
            word.declaration(file)
                .map(Word::nameSpan)
                .or(() -> word.time(file).map(over -> over.name().span())));
  }
}
