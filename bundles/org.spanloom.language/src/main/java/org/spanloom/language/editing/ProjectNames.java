/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.editing;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.SortedMap;
import java.util.TreeMap;
import org.spanloom.language.files.FileKey;
import org.spanloom.language.syntax.Statement;
import org.spanloom.language.syntax.Statement.ImportStatement;
import org.spanloom.language.syntax.SyntaxFile;

/** What the names in several files stand for; a file sees what the files it imports declare. */
public final class ProjectNames {

  private final SortedMap<FileKey, SyntaxFile> files;
  private final SortedMap<FileKey, Names> names = new TreeMap<>();

  private ProjectNames(Map<FileKey, SyntaxFile> files) {
    this.files = new TreeMap<>(files);
    Map<FileKey, NameScopes> scopes = new TreeMap<>();
    files.forEach((key, file) -> scopes.put(key, new NameScopes(key, file)));
    this.files.forEach((key, file) -> {
      List<NameScopes> imported = new ArrayList<>();
      for (Statement statement : file.statements()) {
        if (statement instanceof ImportStatement read
            && key.resolve(read.path().text()) instanceof FileKey.Resolved.Inside inside
            && !inside.key().equals(key)
            && scopes.containsKey(inside.key())) {
          imported.add(scopes.get(inside.key()));
        }
      }
      scopes.get(key).importing(imported);
      names.put(key, new Names(file, scopes.get(key)));
    });
  }

  /** Returns the names of files; what is imported from none of them is not known. */
  public static ProjectNames of(Map<FileKey, SyntaxFile> files) {
    return new ProjectNames(files);
  }

  /** Returns the files. */
  SortedMap<FileKey, SyntaxFile> files() {
    return files;
  }

  /** Returns the names of each file. */
  SortedMap<FileKey, Names> names() {
    return names;
  }

  /** Returns the name at an offset of a file. */
  public Optional<Occurrence> at(FileKey file, int offset) {
    return Optional.ofNullable(names.get(file)).flatMap(n -> n.at(offset));
  }

  /**
   * Returns the places where something is named, by file; files without such a place are left out.
   */
  public SortedMap<FileKey, List<Occurrence>> of(Symbol symbol) {
    SortedMap<FileKey, List<Occurrence>> found = new TreeMap<>();
    names.forEach((key, in) -> {
      List<Occurrence> places = in.of(symbol);
      if (!places.isEmpty()) {
        found.put(key, places);
      }
    });
    return found;
  }
}
