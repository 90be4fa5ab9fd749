/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.files;

import java.util.List;

/**
 * The files of a project as a model may read them: nothing outside of the project is ever read.
 *
 * <p>Whoever implements it looks a key up below the project's root, follows no link that leads out
 * of it, and reads at most {@link #SIZE_LIMIT} bytes. The same key gives the same answer as long as
 * the project does not change.
 */
public interface ProjectFiles {

  /** Largest file that is read, in bytes. */
  int SIZE_LIMIT = 64 << 20;

  /** Returns the key of the file whose text is being read. */
  FileKey self();

  /** Returns what lies at a key. */
  ProjectFile read(FileKey key);

  /** Returns the files of a text that belongs to no project: there are none. */
  static ProjectFiles none() {
    return new ProjectFiles() {
      @Override
      public FileKey self() {
        return FileKey.NONE;
      }

      @Override
      public ProjectFile read(FileKey key) {
        return new ProjectFile.Missing(List.of());
      }
    };
  }
}
