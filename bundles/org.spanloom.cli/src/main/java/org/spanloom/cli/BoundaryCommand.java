/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import java.nio.file.Path;
import org.spanloom.analysis.boundary.BoundaryReport.Verdict;
import org.spanloom.analysis.boundary.BoundaryRequest;
import org.spanloom.analysis.boundary.BoundaryResult;
import org.spanloom.analysis.boundary.BoundarySolve;
import picocli.CommandLine.Model.CommandSpec;

/** {@code spanloom boundary}: lists the solution that meets boundary conditions. */
final class BoundaryCommand {

  private final Options.Values values;
  private final Streams streams;

  BoundaryCommand(Options.Values values, Streams streams) {
    this.values = values;
    this.streams = streams;
  }

  static void describe(CommandSpec spec) {
    spec.addPositional(Options.operand("FILE", "the model file"));
    spec.addOption(Options.one("--system", "NAME", "which system; needed if there are several"));
    spec.addOption(
        Options.one(
            "--boundary", "NAME", "which boundary conditions; needed if there are several"));
    SamplingOption.describe(spec);
    spec.addOption(ParameterOption.spec());
    spec.addOption(
        Options.one(
            "--accuracy",
            "R",
            "relative error to aim at, for example 1e-9, instead of the model's"));
    spec.addOption(
        Options.one("--output", "FILE", "write the list to FILE instead of standard output"));
    spec.usageMessage()
        .description(
            "Finds the solution that meets boundary conditions at two or more times and lists it as"
                + " comma-separated values, as 'spanloom solve' does.",
            "Whether there is one solution, none or infinitely many goes to standard error, with"
                + " what the conditions leave open, and how strongly the solution answers to them."
                + " Without exactly one solution the exit code is 1; of infinitely many, the"
                + " smallest is listed.%n");
  }

  int run() throws CommandFailure {
    String file = values.operand();
    Path path = ModelDoor.path(file);
    BoundaryRequest request =
        new BoundaryRequest(
            ModelDoor.open(path),
            values.one("--system"),
            values.one("--boundary"),
            SamplingOption.read(values),
            ParameterOption.read(values),
            AccuracyOption.read(values));
    BoundaryResult result;
    try (TerminalProgress progress = new TerminalProgress(streams, "solving " + file)) {
      result = Answers.value(BoundarySolve.solve(request, progress));
    }
    streams
        .err()
        .print("boundary " + result.report().name() + ": " + result.report().detail() + "\n");
    if (result.table().isPresent()) {
      SolutionList.write(result.table().get(), values.one("--output"), path, streams);
      streams.err().print(SolutionList.errors(result.table().get()));
    }
    streams.err().flush();
    return result.report().verdict() == Verdict.UNIQUE ? ExitCode.CLEAN : ExitCode.FOUND;
  }
}
