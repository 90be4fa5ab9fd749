/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import org.spanloom.analysis.files.DiskFiles;
import org.spanloom.language.model.Model;
import org.spanloom.language.model.ModelReader;

/** Where the name of a file becomes a model. */
final class ModelDoor {

  private ModelDoor() {}

  /**
   * Returns the path that a name means.
   *
   * @throws CommandFailure if no file can have that name
   */
  static Path path(String file) throws CommandFailure {
    try {
      return Path.of(file);
    } catch (InvalidPathException e) {
      throw CommandFailure.refused(
          "'" + NumberText.shown(file) + "': this cannot be the name of a file");
    }
  }

  /**
   * Reads the model of a file.
   *
   * @throws CommandFailure if the file cannot be read
   */
  static Model open(Path file) throws CommandFailure {
    return ModelReader.read(ModelFile.read(file), DiskFiles.of(file), () -> false);
  }
}
