/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.List;
import java.util.concurrent.CancellationException;
import java.util.function.BooleanSupplier;
import org.spanloom.language.files.ProjectFiles;
import org.spanloom.language.syntax.Parser;
import org.spanloom.language.syntax.SyntaxFile;
import org.spanloom.language.text.SourceText;

/**
 * Reads a model file: text to tree to meaning. Every text has a model; what is wrong with it is
 * among the problems of the model. The same text gives the same model.
 */
public final class ModelReader {

  private ModelReader() {}

  /** Returns the model of a text that belongs to no project: every file it names is missing. */
  public static Model read(SourceText source) {
    return read(source, ProjectFiles.none(), () -> false);
  }

  /**
   * Returns the model of a text.
   *
   * @param source the text
   * @param files the files that it may name
   * @param cancelled asked now and then; once it says true, the work ends
   * @throws CancellationException if the work was cancelled
   */
  public static Model read(SourceText source, ProjectFiles files, BooleanSupplier cancelled) {
    return read(Parser.parse(source), files, cancelled);
  }

  /**
   * Returns the model of a tree.
   *
   * @param file the tree
   * @param files the files that it may name
   * @param cancelled asked now and then; once it says true, the work ends
   * @throws CancellationException if the work was cancelled
   */
  public static Model read(SyntaxFile file, ProjectFiles files, BooleanSupplier cancelled) {
    check(cancelled);
    FileAccess access = new FileAccess(files);
    FileReading reading = new Library(access, cancelled).read(file);
    List<SystemModel> systems = reading.readSystems();
    return new Model(
        file.source(), file, access.asked(), reading.imports(), systems, reading.problems());
  }

  static void check(BooleanSupplier cancelled) {
    if (cancelled.getAsBoolean()) {
      throw new CancellationException("reading the model was cancelled");
    }
  }
}
