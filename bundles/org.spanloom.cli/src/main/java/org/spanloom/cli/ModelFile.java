/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import org.spanloom.analysis.files.TextBytes;
import org.spanloom.language.text.SourceText;

/** Reads one model file; whatever stands in it, the outcome is a text or one clear message. */
final class ModelFile {

  /** How a model file's name ends. */
  static final String ENDING = ".span";

  /** Largest file that is read, in bytes. */
  static final int LIMIT = 64 << 20;

  private ModelFile() {}

  /**
   * Reads a file.
   *
   * @param path the file; what is not a regular file, such as a pipe, is read to its end
   * @return its text, named by the path as given
   * @throws CommandFailure if there is no such file, or it is no UTF-8 text of at most {@link
   *     #LIMIT} bytes
   */
  static SourceText read(Path path) throws CommandFailure {
    return new SourceText(path.toString(), decode(path, bytes(path)));
  }

  private static byte[] bytes(Path path) throws CommandFailure {
    try {
      if (Files.isDirectory(path)) {
        throw CommandFailure.refused(path + ": this is a directory; name a model file in it");
      }
      if (Files.isRegularFile(path) && Files.size(path) > LIMIT) {
        throw tooLarge(path);
      }
      try (InputStream in = Files.newInputStream(path)) {
        byte[] bytes = in.readNBytes(LIMIT + 1);
        if (bytes.length > LIMIT) {
          throw tooLarge(path);
        }
        return bytes;
      }
    } catch (IOException e) {
      throw CommandFailure.refused(path + ": cannot be read: " + IoReason.of(e));
    }
  }

  private static CommandFailure tooLarge(Path path) {
    return CommandFailure.refused(
        path + ": larger than " + (LIMIT >> 20) + " MB, the most that is read as one model file");
  }

  private static String decode(Path path, byte[] bytes) throws CommandFailure {
    return switch (TextBytes.decode(bytes)) {
      case TextBytes.Text(String characters) -> characters;
      case TextBytes.NotText(String reason) -> throw CommandFailure.refused(path + ": " + reason);
    };
  }
}
