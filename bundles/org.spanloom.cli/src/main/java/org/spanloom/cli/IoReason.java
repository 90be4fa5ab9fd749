/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import java.io.IOException;
import java.nio.file.AccessDeniedException;
import java.nio.file.DirectoryNotEmptyException;
import java.nio.file.FileAlreadyExistsException;
import java.nio.file.FileSystemException;
import java.nio.file.FileSystemLoopException;
import java.nio.file.NoSuchFileException;
import java.nio.file.NotDirectoryException;

/** Says in words why a file could not be used. */
final class IoReason {

  private IoReason() {}

  /** Returns the reason without the name of the file. */
  static String of(IOException failure) {
    return switch (failure) {
      case NoSuchFileException e -> "there is no such file or directory";
      case AccessDeniedException e -> "permission denied";
      case NotDirectoryException e -> "not a directory";
      case FileAlreadyExistsException e -> "it exists already";
      case DirectoryNotEmptyException e -> "it is a directory";
      case FileSystemLoopException e -> "its links lead in a circle";
      case FileSystemException e when e.getReason() != null -> e.getReason();
      default ->
          failure.getMessage() == null ? failure.getClass().getSimpleName() : failure.getMessage();
    };
  }
}
