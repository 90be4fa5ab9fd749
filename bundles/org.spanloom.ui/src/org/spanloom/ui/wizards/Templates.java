/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.wizards;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;

/** The texts that new files start with. */
public enum Templates {
  /** A whole model of a drying room; the first model of a project. */
  DRYING_ROOM("drying-room.span"),
  /**
   * A system with one state, for a new model file; {@code NAME} stands for the name of the system.
   */
  MODEL("model.span"),
  /** Settings with every default in a comment. */
  SETTINGS("spanloom.settings"),
  /** What a new project is about; {@code PROJECT} stands for its name. */
  README("README.md");

  private final String file;

  Templates(String file) {
    this.file = file;
  }

  /** Returns the text. */
  public String text() {
    try (InputStream in = Templates.class.getResourceAsStream("/templates/" + file)) {
      if (in == null) {
        throw new IllegalStateException("the template " + file + " is not in the bundle");
      }
      return new String(in.readAllBytes(), StandardCharsets.UTF_8);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  /** Returns the name of the file that a new project gets. */
  String fileName() {
    return file;
  }
}
