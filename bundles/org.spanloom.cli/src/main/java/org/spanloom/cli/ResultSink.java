/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import java.io.BufferedOutputStream;
import java.io.IOException;
import java.io.OutputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.AtomicMoveNotSupportedException;
import java.nio.file.FileAlreadyExistsException;
import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.StandardOpenOption;
import java.nio.file.attribute.PosixFileAttributeView;
import java.util.Optional;

/**
 * Takes a result as text: to standard output, or to a file.
 *
 * <p>A file is written beside its place under another name and moved there by {@link #commit()}, so
 * that it holds the whole result or what it held before. {@link #close()} without commit leaves
 * nothing behind, also when the process is told to stop.
 */
final class ResultSink implements AutoCloseable {

  private static final int BUFFER = 1 << 16;

  private final OutputStream out;
  private final String name;
  private final Optional<Pending> pending;

  /** A file on its way to its place. */
  private record Pending(Path part, Path target, Thread hook) {}

  private ResultSink(OutputStream out, String name, Optional<Pending> pending) {
    this.out = new BufferedOutputStream(out, BUFFER);
    this.name = name;
    this.pending = pending;
  }

  /**
   * Returns the sink that an option {@code --output} means.
   *
   * @param output the file named; standard output if empty
   * @param input a file that must not be written over, because it is being read
   * @param streams where standard output goes
   * @throws CommandFailure if the file cannot be made there
   */
  static ResultSink of(Optional<String> output, Optional<Path> input, Streams streams)
      throws CommandFailure {
    return output.isPresent() ? file(output.get(), input) : standardOutput(streams);
  }

  /** Returns the sink that writes to standard output. */
  static ResultSink standardOutput(Streams streams) {
    return new ResultSink(streams.out(), "standard output", Optional.empty());
  }

  /**
   * Returns the sink that makes a file.
   *
   * @param name the file
   * @param input a file that must not be written over, because it is being read
   * @throws CommandFailure if the file cannot be made there
   */
  static ResultSink file(String name, Optional<Path> input) throws CommandFailure {
    Path path;
    try {
      path = Path.of(name);
    } catch (InvalidPathException e) {
      throw CommandFailure.refused("--output: this cannot be the name of a file");
    }
    try {
      return open(path, name, input);
    } catch (IOException e) {
      throw CommandFailure.refused("--output " + name + ": cannot be written: " + IoReason.of(e));
    }
  }

  /**
   * Returns the sink that gives a file new content.
   *
   * @throws CommandFailure if the file may not be written
   */
  static ResultSink replacing(Path file) throws CommandFailure {
    try {
      if (!Files.isWritable(file)) {
        throw CommandFailure.refused(file + ": may not be written");
      }
      return pending(file.toRealPath(), file.toString());
    } catch (IOException e) {
      throw CommandFailure.refused(file + ": cannot be written: " + IoReason.of(e));
    }
  }

  private static ResultSink open(Path path, String name, Optional<Path> input)
      throws IOException, CommandFailure {
    if (name.isEmpty() || Files.isDirectory(path)) {
      throw CommandFailure.refused("--output '" + name + "': name a file, not a directory");
    }
    if (name.endsWith(ModelFile.ENDING)) {
      throw CommandFailure.refused(
          "--output " + name + ": this is the name of a model; let the result end otherwise");
    }
    if (!Files.exists(path)) {
      return pending(path.toAbsolutePath(), name);
    }
    if (input.isPresent() && Files.isSameFile(path, input.get())) {
      throw CommandFailure.refused("--output " + name + ": this is the model; name another file");
    }
    if (!Files.isRegularFile(path)) {
      // A device or a pipe must stay what it is.
      return new ResultSink(
          Files.newOutputStream(path, StandardOpenOption.WRITE), name, Optional.empty());
    }
    if (!Files.isWritable(path)) {
      throw CommandFailure.refused("--output " + name + ": the file there may not be written");
    }
    return pending(path.toRealPath(), name);
  }

  private static ResultSink pending(Path target, String name) throws IOException {
    for (int i = 0; ; i++) {
      Path part = target.resolveSibling("." + target.getFileName() + "." + i + ".part");
      try {
        OutputStream out = Files.newOutputStream(part, StandardOpenOption.CREATE_NEW);
        Thread hook = new Thread(() -> delete(part));
        Runtime.getRuntime().addShutdownHook(hook);
        return new ResultSink(out, name, Optional.of(new Pending(part, target, hook)));
      } catch (FileAlreadyExistsException e) {
        if (i == 99) {
          throw e;
        }
      }
    }
  }

  /** Writes a text. */
  void write(String text) throws CommandFailure {
    try {
      out.write(text.getBytes(StandardCharsets.UTF_8));
    } catch (IOException e) {
      throw failure(e);
    }
  }

  /** Hands over what was written so far, where that can be seen. */
  void flush() throws CommandFailure {
    try {
      out.flush();
    } catch (IOException e) {
      throw failure(e);
    }
  }

  /** Ends the result: it is whole and may be seen. */
  void commit() throws CommandFailure {
    flush();
    if (pending.isPresent()) {
      try {
        out.close();
        move(pending.get());
      } catch (IOException e) {
        throw failure(e);
      }
    }
  }

  private static void move(Pending file) throws IOException {
    if (Files.exists(file.target())) {
      PosixFileAttributeView old =
          Files.getFileAttributeView(file.target(), PosixFileAttributeView.class);
      if (old != null) {
        Files.setPosixFilePermissions(file.part(), old.readAttributes().permissions());
      }
    }
    try {
      Files.move(file.part(), file.target(), StandardCopyOption.ATOMIC_MOVE);
    } catch (AtomicMoveNotSupportedException e) {
      Files.move(file.part(), file.target(), StandardCopyOption.REPLACE_EXISTING);
    }
  }

  private CommandFailure failure(IOException e) {
    return CommandFailure.refused(name + ": cannot be written: " + IoReason.of(e));
  }

  @Override
  public void close() {
    if (pending.isPresent()) {
      try {
        out.close();
      } catch (IOException e) {
        // The part file goes away in any case; the failure was told when it was written.
      }
      delete(pending.get().part());
      try {
        Runtime.getRuntime().removeShutdownHook(pending.get().hook());
      } catch (IllegalStateException e) {
        // The process is ending already, and the hook does the same.
      }
    }
  }

  private static void delete(Path part) {
    try {
      Files.deleteIfExists(part);
    } catch (IOException e) {
      // Nothing more can be done about it, and the result itself is not touched.
    }
  }
}
