/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.spanloom.language.files.FileKey;
import org.spanloom.language.files.FileKey.Resolved;
import org.spanloom.language.files.ProjectFile;
import org.spanloom.language.files.ProjectFiles;
import org.spanloom.language.problem.Fix;
import org.spanloom.language.problem.Nearest;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.syntax.QuotedText;

/** The files that a model asks for while it is read; each is read once. */
final class FileAccess {

  /** Most files that one model may name, those of its imports included. */
  static final int COUNT_LIMIT = 1000;

  /** Most characters that these files may hold together. */
  static final long TOTAL_LIMIT = 256L << 20;

  private final ProjectFiles files;
  private final Map<FileKey, ProjectFile> found = new LinkedHashMap<>();
  private long total;

  /** A text of the project. */
  record Found(FileKey key, String text) {}

  FileAccess(ProjectFiles files) {
    this.files = files;
  }

  /** Returns the key of the file being read. */
  FileKey self() {
    return files.self();
  }

  /** Returns all files asked for, whether they are there or not, in the order first asked. */
  List<FileKey> asked() {
    return List.copyOf(found.keySet());
  }

  /**
   * Returns the text that a path in a statement means; reports it if there is none.
   *
   * @param from the file that the statement stands in
   * @param path the path as written
   * @param problems takes what is wrong
   */
  Optional<Found> text(FileKey from, QuotedText path, Problems problems) {
    return switch (from.resolve(path.text())) {
      case Resolved.Inside(FileKey key) -> read(from, key, path, problems);
      case Resolved.Outside outside -> outside(path, problems);
      case Resolved.Malformed(String reason) ->
          refuse(
              ProblemKind.FILE_PATH_MALFORMED,
              path,
              problems,
              "The path " + shown(path) + " " + reason + ". Write it as in \"data/outside.csv\".");
    };
  }

  private Optional<Found> read(FileKey from, FileKey key, QuotedText path, Problems problems) {
    if (found.size() >= COUNT_LIMIT && !found.containsKey(key)) {
      return refuse(
          ProblemKind.FILE_TOO_LARGE,
          path,
          problems,
          "A model names at most "
              + COUNT_LIMIT
              + " files, those of its imports included, and this is one more: put several into"
              + " one.");
    }
    ProjectFile file = found.computeIfAbsent(key, this::bounded);
    return switch (file) {
      case ProjectFile.Content(String text) -> Optional.of(new Found(key, text));
      case ProjectFile.Missing missing -> missing(from, key, path, missing, problems);
      case ProjectFile.Outside outside -> outside(path, problems);
      case ProjectFile.TooLarge large ->
          refuse(
              ProblemKind.FILE_TOO_LARGE,
              path,
              problems,
              "The file "
                  + shown(path)
                  + " is too large: at most "
                  + megabytes(large.limit())
                  + " are read. Split it or leave out what the model does not need.");
      case ProjectFile.Unreadable(String reason) ->
          refuse(
              ProblemKind.FILE_UNREADABLE,
              path,
              problems,
              "The file " + shown(path) + " cannot be read: " + reason + ".");
    };
  }

  private ProjectFile bounded(FileKey key) {
    ProjectFile file = files.read(key);
    if (file instanceof ProjectFile.Content(String text)) {
      total += text.length();
      if (total > TOTAL_LIMIT) {
        return new ProjectFile.Unreadable(
            "with it the files of this model hold more than "
                + megabytes(TOTAL_LIMIT)
                + " together");
      }
    }
    return file;
  }

  private static String megabytes(long bytes) {
    return (bytes >> 20) + " MB";
  }

  private static Optional<Found> outside(QuotedText path, Problems problems) {
    return refuse(
        ProblemKind.FILE_OUTSIDE_PROJECT,
        path,
        problems,
        "The path "
            + shown(path)
            + " leads out of the project: only files below its folder are read. Move the file there"
            + " and write its path from the folder of this one.");
  }

  private static Optional<Found> missing(
      FileKey from, FileKey key, QuotedText path, ProjectFile.Missing missing, Problems problems) {
    Optional<FileKey> meant =
        problems.maySuggest()
            ? Nearest.of(key.name(), missing.others().stream().map(FileKey::name).toList())
                .flatMap(name ->
                    missing.others().stream().filter(k -> k.name().equals(name)).findFirst())
            : Optional.empty();
    Optional<String> text = meant.map(k -> "\"" + from.relative(k) + "\"");
    return refuse(
        ProblemKind.FILE_MISSING,
        path,
        problems,
        "There is no file "
            + shown(path)
            + text.map(t -> ": did you mean " + t + "?")
                .orElse(
                    ": write its path from the folder of this file, with \"/\" behind names of"
                        + " folders."),
        text.stream().map(t -> Fix.replace("Write " + t, path.span(), t)).toArray(Fix[]::new));
  }

  private static Optional<Found> refuse(
      ProblemKind kind, QuotedText path, Problems problems, String message, Fix... fixes) {
    problems.report(kind, path.span(), message, fixes);
    return Optional.empty();
  }

  private static String shown(QuotedText path) {
    return "\"" + Quotes.shortened(path.text()) + "\"";
  }
}
