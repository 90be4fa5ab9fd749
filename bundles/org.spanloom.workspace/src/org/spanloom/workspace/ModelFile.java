/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.workspace;

import java.io.IOException;
import java.io.InputStream;
import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.Charset;
import java.nio.charset.CodingErrorAction;
import java.nio.charset.IllegalCharsetNameException;
import java.nio.charset.UnsupportedCharsetException;
import org.eclipse.core.filesystem.EFS;
import org.eclipse.core.resources.IFile;
import org.eclipse.core.runtime.CoreException;
import org.eclipse.core.runtime.Platform;
import org.eclipse.core.runtime.content.IContentType;
import org.spanloom.analysis.settings.Settings;
import org.spanloom.language.text.SourceText;

/** Reads model files, which nobody vouches for: of bounded size, and only if they are text. */
public final class ModelFile {

  /** Largest file that is read, in bytes: 64 MiB. */
  public static final int LARGEST = 64 << 20;

  private static final String EXTENSION = "span";
  private static final String TOO_LARGE = "file-too-large";

  private ModelFile() {}

  /** What came of reading a file. */
  public sealed interface Content {

    /** The text. */
    record Readable(SourceText text) implements Content {}

    /**
     * There is no text.
     *
     * @param code stable id of the finding
     * @param message why, and what to do
     */
    record Unreadable(String code, String message) implements Content {
      /** Tells whether there is more than is read. */
      boolean isTooLarge() {
        return code.equals(TOO_LARGE);
      }
    }
  }

  /**
   * Tells whether a file holds a model, going by the name alone or by the content type the user
   * gave it.
   */
  public static boolean isModel(IFile file) {
    if (EXTENSION.equals(file.getFileExtension())) {
      return true;
    }
    IContentType type = Platform.getContentTypeManager().findContentTypeFor(file.getName());
    return type != null && type.getId().equals(Ids.MODEL_CONTENT_TYPE);
  }

  /** Tells whether a file holds the settings of the models beside and below it. */
  public static boolean isSettings(IFile file) {
    return file.getName().equals(Settings.FILE_NAME);
  }

  /** Reads a file as it is on disk. */
  public static Content read(IFile file) {
    try {
      if (file.getLocationURI() != null) {
        long length = EFS.getStore(file.getLocationURI()).fetchInfo().getLength();
        if (length > LARGEST) {
          return tooLarge();
        }
      }
      try (InputStream in = file.getContents(true)) {
        byte[] bytes = in.readNBytes(LARGEST + 1);
        return bytes.length > LARGEST ? tooLarge() : decode(file, bytes);
      }
    } catch (CoreException | IOException e) {
      return new Content.Unreadable(
          "file-unreadable", "The file cannot be read: " + e.getMessage());
    }
  }

  private static Content tooLarge() {
    return new Content.Unreadable(
        TOO_LARGE,
        "The file is larger than "
            + (LARGEST >> 20)
            + " MiB and is not read. Split the model, or check that this is a model file.");
  }

  private static Content decode(IFile file, byte[] bytes) throws CoreException {
    String name = file.getFullPath().makeRelative().toString();
    for (byte b : bytes) {
      if (b == 0) {
        return new Content.Unreadable(
            "file-not-text",
            "The file holds bytes that are not text. Check that this is a model file, saved as"
                + " UTF-8.");
      }
    }
    String charset = file.getCharset();
    try {
      String text =
          Charset.forName(charset)
              .newDecoder()
              .onMalformedInput(CodingErrorAction.REPORT)
              .onUnmappableCharacter(CodingErrorAction.REPORT)
              .decode(ByteBuffer.wrap(bytes))
              .toString();
      // Editors do not show the byte order mark; without it, offsets here and there agree.
      return new Content.Readable(
          new SourceText(name, text.startsWith("\uFEFF") ? text.substring(1) : text));
    } catch (CharacterCodingException e) {
      return new Content.Unreadable(
          "file-not-text",
          "The file is not "
              + charset
              + " text. Save it as UTF-8, or set its encoding in its properties.");
    } catch (IllegalCharsetNameException | UnsupportedCharsetException e) {
      return new Content.Unreadable(
          "file-not-text",
          "The encoding "
              + charset
              + " is not known here. Choose UTF-8 in the properties of the file.");
    }
  }
}
