/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import java.util.Arrays;
import java.util.Optional;
import picocli.CommandLine.Model.CommandSpec;

/** The commands, in the order of the help. */
enum Command {
  /** Checks models. */
  CHECK("check", "check models and report what is found in them") {
    @Override
    void describe(CommandSpec spec) {
      CheckCommand.describe(spec);
    }

    @Override
    int run(Options.Values values, Streams streams) throws CommandFailure {
      return new CheckCommand(values, streams).run();
    }
  },
  /** Lists a solution. */
  SOLVE("solve", "solve an initial value problem and list the solution") {
    @Override
    void describe(CommandSpec spec) {
      SolveCommand.describe(spec);
    }

    @Override
    int run(Options.Values values, Streams streams) throws CommandFailure {
      return new SolveCommand(values, streams).run();
    }
  },
  /** Lists a basis. */
  BASIS("basis", "list a basis of the solutions and how far it can be trusted") {
    @Override
    void describe(CommandSpec spec) {
      BasisCommand.describe(spec);
    }

    @Override
    int run(Options.Values values, Streams streams) throws CommandFailure {
      return new BasisCommand(values, streams).run();
    }
  },
  /** Lists the solution of a boundary-value problem. */
  BOUNDARY("boundary", "list the solution that meets boundary conditions") {
    @Override
    void describe(CommandSpec spec) {
      BoundaryCommand.describe(spec);
    }

    @Override
    int run(Options.Values values, Streams streams) throws CommandFailure {
      return new BoundaryCommand(values, streams).run();
    }
  },
  /** Lists eigenvalues or multipliers. */
  SPECTRUM("spectrum", "list eigenvalues with their modes, or multipliers of a periodic system") {
    @Override
    void describe(CommandSpec spec) {
      SpectrumCommand.describe(spec);
    }

    @Override
    int run(Options.Values values, Streams streams) throws CommandFailure {
      return new SpectrumCommand(values, streams).run();
    }
  },
  /** Lists which state depends on which. */
  STRUCTURE("structure", "list which state depends on which, and the blocks of A") {
    @Override
    void describe(CommandSpec spec) {
      StructureCommand.describe(spec);
    }

    @Override
    int run(Options.Values values, Streams streams) throws CommandFailure {
      return new StructureCommand(values, streams).run();
    }
  },
  /** Writes matrices for other programs. */
  EXPORT("export", "write A, b, the fundamental matrix or a basis for other programs") {
    @Override
    void describe(CommandSpec spec) {
      ExportCommand.describe(spec);
    }

    @Override
    int run(Options.Values values, Streams streams) throws CommandFailure {
      return new ExportCommand(values, streams).run();
    }
  },
  /** Lays out model files. */
  FORMAT("format", "give model files their canonical layout") {
    @Override
    void describe(CommandSpec spec) {
      FormatCommand.describe(spec);
    }

    @Override
    int run(Options.Values values, Streams streams) throws CommandFailure {
      return new FormatCommand(values, streams).run();
    }
  };

  private final String word;
  private final String purpose;

  Command(String word, String purpose) {
    this.word = word;
    this.purpose = purpose;
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
  abstract void describe(CommandSpec spec);

  /** Runs it and returns the exit code. */
  abstract int run(Options.Values values, Streams streams) throws CommandFailure;

  /** Returns the command of a word. */
  static Optional<Command> named(String word) {
    return Arrays.stream(values()).filter(c -> c.word.equals(word)).findFirst();
  }
}
