/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.files;

import java.util.Map;
import java.util.SortedMap;
import java.util.TreeMap;

/** A project held in memory: texts by their keys. */
public final class TextFiles implements ProjectFiles {

  private final FileKey self;
  private final SortedMap<FileKey, String> texts = new TreeMap<>();

  /**
   * Takes a project.
   *
   * @param self path of the file being read
   * @param texts texts of the other files by their paths
   */
  public TextFiles(String self, Map<String, String> texts) {
    this.self = new FileKey(self);
    texts.forEach((path, text) -> this.texts.put(new FileKey(path), text));
  }

  @Override
  public FileKey self() {
    return self;
  }

  @Override
  public ProjectFile read(FileKey key) {
    String text = texts.get(key);
    return text == null
        ? new ProjectFile.Missing(
            texts.keySet().stream()
                .filter(other -> folder(other).equals(folder(key)))
                .limit(ProjectFile.Missing.OTHERS_LIMIT)
                .toList())
        : new ProjectFile.Content(text);
  }

  private static String folder(FileKey key) {
    return key.path().substring(0, key.path().length() - key.name().length());
  }
}
