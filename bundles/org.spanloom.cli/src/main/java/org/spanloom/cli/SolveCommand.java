/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.SequencedMap;
import org.spanloom.analysis.solve.Sampling;
import org.spanloom.analysis.solve.SolutionTable;
import org.spanloom.analysis.solve.SolveAnswer;
import org.spanloom.analysis.solve.SolveRequest;
import org.spanloom.analysis.solve.TrajectorySolve;
import org.spanloom.language.model.Model;
import picocli.CommandLine.Model.CommandSpec;

/**
 * {@code spanloom solve}: lists the solution of an initial value problem as comma-separated values.
 */
final class SolveCommand {

  private final Options.Values values;
  private final Streams streams;

  SolveCommand(Options.Values values, Streams streams) {
    this.values = values;
    this.streams = streams;
  }

  static void describe(CommandSpec spec) {
    spec.addPositional(Options.operand("FILE", "the model file"));
    spec.addOption(Options.one("--system", "NAME", "which system; needed if there are several"));
    spec.addOption(
        Options.one("--initial", "NAME", "which initial values; needed if there are several"));
    spec.addOption(
        Options.one("--from", "T", "first time to list; the start of the interval if not given"));
    spec.addOption(
        Options.one("--until", "T", "last time to list; the end of the interval if not given"));
    SamplingOption.describe(spec);
    spec.addOption(ParameterOption.spec());
    spec.addOption(
        Options.one(
            "--accuracy",
            "R",
            "relative error to aim at, for example 1e-9, instead of the model's"));
    spec.addOption(MethodOption.spec());
    spec.addOption(
        Options.one("--output", "FILE", "write the list to FILE instead of standard output"));
    spec.usageMessage()
        .description(
            "Solves an initial value problem and lists the solution as comma-separated values: one"
                + " line of names, then one line for each time, with the time, all states and all"
                + " outputs in their declared units, to 17 significant digits.",
            "The estimated error of each column goes to standard error. All times are in the time"
                + " unit of the system.%n");
  }

  int run() throws CommandFailure {
    String file = values.operand();
    Sampling sampling = sampling();
    SequencedMap<String, Double> parameters = ParameterOption.read(values);
    OptionalDouble from = time("--from");
    OptionalDouble until = time("--until");
    OptionalDouble accuracy = AccuracyOption.read(values);
    Path path = ModelDoor.path(file);
    Model model = ModelDoor.open(path);
    SolveRequest request =
        new SolveRequest(
            model,
            values.one("--system"),
            values.one("--initial"),
            from,
            until,
            sampling,
            parameters,
            accuracy,
            values.one(MethodOption.NAME));
    SolutionTable table;
    try (TerminalProgress progress = new TerminalProgress(streams, "solving " + file)) {
      table =
          switch (TrajectorySolve.solve(request, progress)) {
            case SolveAnswer.Solved solved -> solved.table();
            case SolveAnswer.Refused refused ->
                throw CommandFailure.of(refused.usage(), refused.message());
            case SolveAnswer.Cancelled cancelled -> throw CommandFailure.refused("cancelled");
          };
    }
    SolutionList.write(table, values.one("--output"), path, streams);
    streams.err().print(SolutionList.errors(table));
    streams.err().flush();
    return ExitCode.CLEAN;
  }

  private Sampling sampling() throws CommandFailure {
    if (values.one("--at").isPresent()) {
      for (String end : List.of("--from", "--until")) {
        if (values.one(end).isPresent()) {
          throw CommandFailure.refused("--at names the times itself; leave out " + end);
        }
      }
    }
    return SamplingOption.read(values);
  }

  private OptionalDouble time(String option) throws CommandFailure {
    Optional<String> text = values.one(option);
    return text.isPresent()
        ? OptionalDouble.of(NumberText.read(text.get(), option))
        : OptionalDouble.empty();
  }
}
