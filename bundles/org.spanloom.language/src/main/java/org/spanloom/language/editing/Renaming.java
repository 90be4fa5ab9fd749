/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.editing;

import java.util.List;
import java.util.Map;
import org.spanloom.language.files.FileKey;
import org.spanloom.language.problem.TextEdit;
import org.spanloom.language.text.Span;

/** What comes of the wish to rename something. */
public sealed interface Renaming {

  /**
   * The changes that rename it.
   *
   * @param edits changes by file, in the order of its text; they do not overlap
   */
  record Changes(Map<FileKey, List<TextEdit>> edits) implements Renaming {
    /** Copies the map. */
    public Changes {
      edits = Map.copyOf(edits);
    }
  }

  /**
   * Reasons not to do it.
   *
   * @param conflicts at least one
   */
  record Refused(List<Conflict> conflicts) implements Renaming {
    /** Copies the list. */
    public Refused {
      conflicts = List.copyOf(conflicts);
    }
  }

  /** There is no name of the author's at that place. */
  record NothingToRename() implements Renaming {}

  /**
   * A reason not to use a name.
   *
   * @param file the file that the reason is about
   * @param span the place in its text
   * @param message what stands in the way and what to do
   */
  record Conflict(FileKey file, Span span, String message) {}
}
