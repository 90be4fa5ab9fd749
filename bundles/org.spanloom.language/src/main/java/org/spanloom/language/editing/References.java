/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.editing;

import java.util.List;
import org.spanloom.language.syntax.SyntaxFile;

/** Finds every place where a name stands. */
public final class References {

  private References() {}

  /**
   * Returns the places of what is named at an offset, its declarations included, in the order of
   * the text; none where nothing is named. Those of a state hold its derivatives.
   */
  public static List<Occurrence> at(SyntaxFile file, int offset) {
    Names names = Names.of(file);
    return names.at(offset).map(o -> names.of(o.symbol())).orElse(List.of());
  }
}
