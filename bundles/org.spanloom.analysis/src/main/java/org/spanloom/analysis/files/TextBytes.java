/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.files;

import java.nio.ByteBuffer;
import java.nio.CharBuffer;
import java.nio.charset.CharsetDecoder;
import java.nio.charset.CoderResult;
import java.nio.charset.CodingErrorAction;
import java.nio.charset.StandardCharsets;

/** What the bytes of a file say as text in UTF-8. */
public sealed interface TextBytes {

  /**
   * A text.
   *
   * @param characters its characters, without a byte order mark
   */
  record Text(String characters) implements TextBytes {}

  /**
   * No text.
   *
   * @param reason why and what to do, in words that fit behind the name of the file and a colon
   */
  record NotText(String reason) implements TextBytes {}

  /** Reads bytes as UTF-8; whatever they are, the outcome is a text or a reason. */
  static TextBytes decode(byte[] bytes) {
    if (startsWith(bytes, 0xFE, 0xFF) || startsWith(bytes, 0xFF, 0xFE)) {
      return new NotText("the text is UTF-16; save it as UTF-8");
    }
    for (int i = 0; i < bytes.length; i++) {
      if (bytes[i] == 0) {
        return new NotText("not a text file, there is a zero byte in " + place(bytes, i));
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
      return new NotText(
          "not UTF-8 text, see " + place(bytes, in.position()) + "; save it as UTF-8");
    }
    out.flip();
    if (out.hasRemaining() && out.get(0) == '\uFEFF') {
      out.get();
    }
    return new Text(out.toString());
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
