/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import java.util.Arrays;
import java.util.Optional;
import java.util.function.Consumer;
import picocli.CommandLine.Model.CommandSpec;

/** The commands, in the order of the help. */
enum Command {
  /** Checks models. */
  CHECK(
      "check",
      "check models and report what is found in them",
      CheckCommand::describe,
      (v, s) -> new CheckCommand(v, s).run()),
  /** Lists a solution. */
  SOLVE(
      "solve",
      "solve an initial value problem and list the solution",
      SolveCommand::describe,
      (v, s) -> new SolveCommand(v, s).run()),
  /** Lists a basis. */
  BASIS(
      "basis",
      "list a basis of the solutions and how far it can be trusted",
      BasisCommand::describe,
      (v, s) -> new BasisCommand(v, s).run()),
  /** Lists the solution of a boundary-value problem. */
  BOUNDARY(
      "boundary",
      "list the solution that meets boundary conditions",
      BoundaryCommand::describe,
      (v, s) -> new BoundaryCommand(v, s).run()),
  /** Lists eigenvalues or multipliers. */
  SPECTRUM(
      "spectrum",
      "list eigenvalues with their modes, or multipliers of a periodic system",
      SpectrumCommand::describe,
      (v, s) -> new SpectrumCommand(v, s).run()),
  /** Lists which state depends on which. */
  STRUCTURE(
      "structure",
      "list which state depends on which, and the blocks of A",
      StructureCommand::describe,
      (v, s) -> new StructureCommand(v, s).run()),
  /** Writes matrices for other programs. */
  EXPORT(
      "export",
      "write A, b, the fundamental matrix or a basis for other programs",
      ExportCommand::describe,
      (v, s) -> new ExportCommand(v, s).run()),
  /** Lays out model files. */
  FORMAT(
      "format",
      "give model files their canonical layout",
      FormatCommand::describe,
      (v, s) -> new FormatCommand(v, s).run());

  /** Runs a command with its arguments. */
  private interface Action {
    int run(Options.Values values, Streams streams) throws CommandFailure;
  }

  private final String word;
  private final String purpose;
  private final Consumer<CommandSpec> description;
  private final Action action;

  Command(String word, String purpose, Consumer<CommandSpec> description, Action action) {
    this.word = word;
    this.purpose = purpose;
    this.description = description;
    this.action = action;
  }

  /** Returns the word that calls it. */
  String word() {
    return word;
  }

  /** Returns what it does, as the rest of a sentence. */
  String purpose() {
    return purpose;
  }

  /** Adds its arguments and its help text. */
  void describe(CommandSpec spec) {
    description.accept(spec);
  }

  /** Runs it and returns the exit code. */
  int run(Options.Values values, Streams streams) throws CommandFailure {
    return action.run(values, streams);
  }

  /** Returns the command of a word. */
  static Optional<Command> named(String word) {
    return Arrays.stream(values()).filter(c -> c.word.equals(word)).findFirst();
  }
}
