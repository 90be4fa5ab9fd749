/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.files;

import java.io.IOException;
import java.io.InputStream;
import java.nio.file.DirectoryStream;
import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.LinkOption;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;
import java.util.List;
import java.util.SortedSet;
import java.util.TreeSet;
import org.spanloom.analysis.settings.Settings;
import org.spanloom.language.files.FileKey;
import org.spanloom.language.files.ProjectFile;
import org.spanloom.language.files.ProjectFiles;

/**
 * The files of a project on disk. The project of a model file is the nearest folder, from its own
 * upwards, that holds a settings file or an Eclipse project description; where there is none, its
 * own folder. Nothing outside of that folder is read, not through a link either.
 */
public final class DiskFiles implements ProjectFiles {

  private static final String PROJECT_DESCRIPTION = ".project";

  /** Most entries of a folder that are looked at for similar names. */
  private static final int ENTRIES_LIMIT = 10_000;

  private final Path root;
  private final FileKey self;

  private DiskFiles(Path root, Path model) {
    this.root = root;
    this.self = key(model);
  }

  /**
   * Returns the files of the project that a model file belongs to.
   *
   * @param model the file, which need not exist
   */
  public static DiskFiles of(Path model) {
    Path file = model.toAbsolutePath().normalize();
    return new DiskFiles(root(file), file);
  }

  private static Path root(Path file) {
    Path own = file.getParent() == null ? file : file.getParent();
    for (Path folder = own; folder != null; folder = folder.getParent()) {
      if (Files.isRegularFile(folder.resolve(Settings.FILE_NAME))
          || Files.isRegularFile(folder.resolve(PROJECT_DESCRIPTION))) {
        return folder;
      }
    }
    return own;
  }

  private FileKey key(Path file) {
    StringBuilder path = new StringBuilder();
    for (Path name : root.relativize(file)) {
      path.append(path.isEmpty() ? "" : "/").append(name);
    }
    return new FileKey(path.toString());
  }

  @Override
  public FileKey self() {
    return self;
  }

  @Override
  public ProjectFile read(FileKey key) {
    try {
      Path file = root.resolve(key.path());
      Path real;
      try {
        real = file.toRealPath();
      } catch (IOException e) {
        // A file in place of a folder and a link to nothing are missing files, a circle of links
        // is not.
        boolean there = Files.exists(file, LinkOption.NOFOLLOW_LINKS);
        if (there && !(e instanceof NoSuchFileException)) {
          throw e;
        }
        return new ProjectFile.Missing(others(file.getParent()));
      }
      return isInside(real) ? content(real) : new ProjectFile.Outside();
    } catch (InvalidPathException e) {
      return new ProjectFile.Unreadable("no file can have this name");
    } catch (IOException e) {
      return new ProjectFile.Unreadable("the system does not give it out");
    }
  }

  private boolean isInside(Path real) throws IOException {
    return real.startsWith(root.toRealPath());
  }

  private static ProjectFile content(Path real) throws IOException {
    if (Files.isDirectory(real)) {
      return new ProjectFile.Unreadable("it is a folder");
    }
    if (!Files.isRegularFile(real)) {
      return new ProjectFile.Unreadable("it is no ordinary file");
    }
    if (Files.size(real) > SIZE_LIMIT) {
      return new ProjectFile.TooLarge(SIZE_LIMIT);
    }
    try (InputStream in = Files.newInputStream(real)) {
      byte[] bytes = in.readNBytes(SIZE_LIMIT + 1);
      if (bytes.length > SIZE_LIMIT) {
        return new ProjectFile.TooLarge(SIZE_LIMIT);
      }
      return switch (TextBytes.decode(bytes)) {
        case TextBytes.Text(String characters) -> new ProjectFile.Content(characters);
        case TextBytes.NotText(String reason) -> new ProjectFile.Unreadable(reason);
      };
    }
  }

  /** Returns the files of a folder, in order of name; none of a folder outside of the project. */
  private List<FileKey> others(Path folder) throws IOException {
    if (folder == null || !Files.isDirectory(folder) || !isInside(folder.toRealPath())) {
      return List.of();
    }
    SortedSet<FileKey> keys = new TreeSet<>();
    int seen = 0;
    try (DirectoryStream<Path> entries = Files.newDirectoryStream(folder)) {
      for (Path entry : entries) {
        if (++seen > ENTRIES_LIMIT) {
          break;
        }
        if (Files.isRegularFile(entry)) {
          keys.add(key(entry));
        }
      }
    }
    return keys.stream().limit(ProjectFile.Missing.OTHERS_LIMIT).toList();
  }
}
