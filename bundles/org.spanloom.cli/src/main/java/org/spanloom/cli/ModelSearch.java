/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import java.io.IOException;
import java.nio.file.FileVisitResult;
import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.nio.file.SimpleFileVisitor;
import java.nio.file.attribute.BasicFileAttributes;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashSet;
import java.util.List;
import java.util.Set;

/**
 * Finds the model files that arguments name: files themselves, directories with everything below
 * them.
 *
 * <p>Hidden directories are left out, and so are links that lead out of the directory named, since
 * they would make the result depend on more than the project. A file is listed once, however often
 * it is named. Directories are sorted by name with "/" between the parts, so that every machine
 * lists the same order.
 */
final class ModelSearch {

  private final List<Path> found = new ArrayList<>();
  private final List<String> problems = new ArrayList<>();
  private final Set<Path> known = new HashSet<>();

  private ModelSearch() {}

  /**
   * Searches.
   *
   * @param arguments files and directories
   * @return the files found and what could not be looked at
   */
  static ModelSearch of(List<String> arguments) {
    ModelSearch search = new ModelSearch();
    for (String argument : arguments) {
      search.add(argument);
    }
    return search;
  }

  /** Returns the files, those of one argument after those of the argument before. */
  List<Path> found() {
    return List.copyOf(found);
  }

  /** Returns a message for each place that could not be read or holds no model. */
  List<String> problems() {
    return List.copyOf(problems);
  }

  private void add(String argument) {
    Path path;
    try {
      path = Path.of(argument);
    } catch (InvalidPathException e) {
      problems.add("'" + argument.replace('\0', '?') + "': this cannot be the name of a file");
      return;
    }
    if (Files.isDirectory(path)) {
      addBelow(path);
    } else if (Files.exists(path)) {
      addFile(path);
    } else {
      problems.add(path + ": there is no such file or directory");
    }
  }

  private void addFile(Path file) {
    try {
      if (known.add(file.toRealPath())) {
        found.add(file);
      }
    } catch (IOException e) {
      problems.add(file + ": cannot be read: " + IoReason.of(e));
    }
  }

  private void addBelow(Path directory) {
    List<Path> models = new ArrayList<>();
    int before = problems.size();
    try {
      Files.walkFileTree(directory, new Collector(directory, models));
    } catch (IOException e) {
      problems.add(directory + ": cannot be read: " + IoReason.of(e));
    }
    if (models.isEmpty() && problems.size() == before) {
      problems.add(
          directory + ": no model file (*" + ModelFile.ENDING + ") in this directory or below it");
    }
    models.sort(Comparator.comparing(ModelSearch::sortKey));
    models.forEach(this::addFile);
  }

  private static String sortKey(Path path) {
    return path.toString().replace('\\', '/');
  }

  /** Collects models below one directory. */
  private final class Collector extends SimpleFileVisitor<Path> {
    private final Path root;
    private final List<Path> models;

    Collector(Path root, List<Path> models) {
      this.root = root;
      this.models = models;
    }

    @Override
    public FileVisitResult preVisitDirectory(Path directory, BasicFileAttributes attributes) {
      boolean hidden =
          !directory.equals(root) && directory.getFileName().toString().startsWith(".");
      return hidden ? FileVisitResult.SKIP_SUBTREE : FileVisitResult.CONTINUE;
    }

    @Override
    public FileVisitResult visitFile(Path file, BasicFileAttributes attributes) {
      if (file.getFileName().toString().endsWith(ModelFile.ENDING)
          && (attributes.isRegularFile() || (attributes.isSymbolicLink() && staysInside(file)))) {
        models.add(file);
      }
      return FileVisitResult.CONTINUE;
    }

    @Override
    public FileVisitResult visitFileFailed(Path file, IOException failure) {
      problems.add(file + ": cannot be read: " + IoReason.of(failure));
      return FileVisitResult.CONTINUE;
    }

    private boolean staysInside(Path link) {
      try {
        Path target = link.toRealPath();
        return Files.isRegularFile(target) && target.startsWith(root.toRealPath());
      } catch (IOException e) {
        problems.add(link + ": this link leads nowhere");
        return false;
      }
    }
  }
}
