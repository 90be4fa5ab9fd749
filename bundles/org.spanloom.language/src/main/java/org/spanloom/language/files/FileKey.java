/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.files;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * A file of a project: its path from the project's root, with {@code /} between the names and
 * neither {@code .} nor {@code ..} in it. Two keys are equal if they mean the same file.
 *
 * @param path the path, for example {@code stores/zone.span}; empty for a text without a file
 */
public record FileKey(String path) implements Comparable<FileKey> {

  /** Longest path that is looked at, in characters. */
  public static final int LENGTH_LIMIT = 1000;

  /** The key of a text that is no file of a project. */
  public static final FileKey NONE = new FileKey("");

  /** What the name of a file in a model may mean. */
  public sealed interface Resolved {

    /** A file below the project's root, which may exist or not. */
    record Inside(FileKey key) implements Resolved {}

    /** A place outside of the project: an absolute path, or one that climbs too far. */
    record Outside() implements Resolved {}

    /**
     * Not a path.
     *
     * @param reason why, in words that fit behind "the path"
     */
    record Malformed(String reason) implements Resolved {}
  }

  /**
   * Returns what a path that stands in this file means: it is relative to the folder of this file,
   * with {@code /} between the names, and never leaves the project.
   */
  public Resolved resolve(String text) {
    Optional<String> fault = fault(text);
    if (fault.isPresent()) {
      return new Resolved.Malformed(fault.get());
    }
    if (text.startsWith("/") || text.length() > 1 && text.charAt(1) == ':') {
      return new Resolved.Outside();
    }
    List<String> names = new ArrayList<>(List.of(path.split("/")));
    names.removeLast();
    for (String name : text.split("/")) {
      if (name.equals("..")) {
        if (names.isEmpty()) {
          return new Resolved.Outside();
        }
        names.removeLast();
      } else if (!name.equals(".")) {
        names.add(name);
      }
    }
    return names.isEmpty()
        ? new Resolved.Malformed("names no file")
        : new Resolved.Inside(new FileKey(String.join("/", names)));
  }

  private static Optional<String> fault(String text) {
    if (text.isBlank()) {
      return Optional.of("is empty");
    }
    if (text.length() > LENGTH_LIMIT) {
      return Optional.of("is longer than " + LENGTH_LIMIT + " characters");
    }
    if (text.indexOf('\\') >= 0) {
      return Optional.of("holds \"\\\": names of folders end in \"/\"");
    }
    if (text.chars().anyMatch(c -> c < ' ' || c == 0x7F)) {
      return Optional.of("holds a character that cannot be seen");
    }
    if (text.endsWith("/") || text.substring(1).contains("//")) {
      return Optional.of("holds an empty name");
    }
    return Optional.empty();
  }

  /** Returns the path of another file as it is written in this one. */
  public String relative(FileKey other) {
    List<String> from = List.of(path.split("/"));
    List<String> to = List.of(other.path.split("/"));
    int common = 0;
    while (common < from.size() - 1
        && common < to.size() - 1
        && from.get(common).equals(to.get(common))) {
      common++;
    }
    return "../".repeat(from.size() - 1 - common) + String.join("/", to.subList(common, to.size()));
  }

  /** Returns the last name of the path. */
  public String name() {
    return path.substring(path.lastIndexOf('/') + 1);
  }

  @Override
  public int compareTo(FileKey other) {
    return path.compareTo(other.path);
  }

  @Override
  public String toString() {
    return path;
  }
}
