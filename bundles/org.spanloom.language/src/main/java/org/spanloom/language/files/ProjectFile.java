/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.files;

import java.util.List;

/** What was found where a model expects a file of its project. */
public sealed interface ProjectFile {

  /**
   * A text.
   *
   * @param text its characters, without a byte order mark
   */
  record Content(String text) implements ProjectFile {}

  /**
   * There is no such file.
   *
   * @param others the files in the same folder, in order of name; at most {@link #OTHERS_LIMIT}
   */
  record Missing(List<FileKey> others) implements ProjectFile {

    /** Most names of other files handed out. */
    public static final int OTHERS_LIMIT = 1000;

    /** Copies the list. */
    public Missing {
      others = List.copyOf(others);
    }
  }

  /** The path leads out of the project, for example through a link. */
  record Outside() implements ProjectFile {}

  /**
   * There is more than is read.
   *
   * @param limit the most that is read, in bytes
   */
  record TooLarge(long limit) implements ProjectFile {}

  /**
   * There is something, but it is no text.
   *
   * @param reason why, in words that fit behind the name of the file and a colon
   */
  record Unreadable(String reason) implements ProjectFile {}
}
