/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import java.io.IOException;
import java.io.InputStream;
import java.nio.ByteBuffer;
import java.nio.CharBuffer;
import java.nio.charset.CharsetDecoder;
import java.nio.charset.CoderResult;
import java.nio.charset.CodingErrorAction;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import org.spanloom.language.text.SourceText;

/** Reads one model file; whatever stands in it, the outcome is a text or one clear message. */
final class ModelFile {

  /** How a model file's name ends. */
  static final String ENDING = ".span";

  /** Largest file that is read, in bytes. */
  static final int LIMIT = 64 << 20;

  private static final char BYTE_ORDER_MARK = '\uFEFF';

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
    if (startsWith(bytes, 0xFE, 0xFF) || startsWith(bytes, 0xFF, 0xFE)) {
      throw CommandFailure.refused(path + ": the text is UTF-16; save it as UTF-8");
    }
    for (int i = 0; i < bytes.length; i++) {
      if (bytes[i] == 0) {
        throw CommandFailure.refused(
            path + ": not a text file, there is a zero byte in " + place(bytes, i));
      }
    }
    CharsetDecoder decoder =
        StandardCharsets.UTF_8
            .newDecoder()
            .onMalformedInput(CodingErrorAction.REPORT)
            .onUnmappableCharacter(CodingErrorAction.REPORT);
    ByteBuffer in = ByteBuffer.wrap(bytes);
    CharBuffer out = CharBuffer.allocate(bytes.length);
    CoderResult result = decoder.decode(in, out, true);
    if (result.isError()) {
      throw CommandFailure.refused(
          path + ": not UTF-8 text, see " + place(bytes, in.position()) + "; save it as UTF-8");
    }
    out.flip();
    if (out.hasRemaining() && out.get(0) == BYTE_ORDER_MARK) {
      out.get();
    }
    return out.toString();
  }

  private static boolean startsWith(byte[] bytes, int first, int second) {
    return bytes.length >= 2 && (bytes[0] & 0xFF) == first && (bytes[1] & 0xFF) == second;
  }

  /** Names the place of a byte as an editor would show it. */
  private static String place(byte[] bytes, int offset) {
    int line = 1;
    for (int i = 0; i < offset; i++) {
      if (bytes[i] == '\n') {
        line++;
      }
    }
    return "line " + line + " (byte " + offset + ")";
  }
}
