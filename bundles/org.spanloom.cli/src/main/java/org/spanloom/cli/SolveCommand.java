/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
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

  private static final int DEFAULT_POINTS = 101;

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
    spec.addOption(
        Options.one(
            "--points",
            "N",
            "list N evenly spaced times, both ends included; " + DEFAULT_POINTS + " if not given"));
    spec.addOption(Options.one("--at", "T,T,...", "list these times instead, in this order"));
    spec.addOption(
        Options.many(
            "--set",
            "NAME=VALUE",
            "take VALUE for the parameter NAME, in its declared unit; may be repeated"));
    spec.addOption(
        Options.one(
            "--accuracy",
            "R",
            "relative error to aim at, for example 1e-9, instead of the model's"));
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
    SequencedMap<String, Double> parameters = parameters();
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
            accuracy);
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
    write(table, path);
    streams.err().print(errors(table));
    streams.err().flush();
    return ExitCode.CLEAN;
  }

  private Sampling sampling() throws CommandFailure {
    Optional<String> points = values.one("--points");
    Optional<String> at = values.one("--at");
    if (points.isPresent() && at.isPresent()) {
      throw CommandFailure.refused("--points and --at exclude each other; give one of them");
    }
    if (at.isPresent()) {
      for (String end : List.of("--from", "--until")) {
        if (values.one(end).isPresent()) {
          throw CommandFailure.refused("--at names the times itself; leave out " + end);
        }
      }
      return new Sampling.At(NumberText.readList(at.get(), "--at"));
    }
    return new Sampling.Even(
        points.isPresent()
            ? NumberText.readCount(points.get(), 2, NumberText.LIST_LIMIT, "--points")
            : DEFAULT_POINTS);
  }

  private OptionalDouble time(String option) throws CommandFailure {
    Optional<String> text = values.one(option);
    return text.isPresent()
        ? OptionalDouble.of(NumberText.read(text.get(), option))
        : OptionalDouble.empty();
  }

  private SequencedMap<String, Double> parameters() throws CommandFailure {
    SequencedMap<String, Double> parameters = new LinkedHashMap<>();
    for (String setting : values.many("--set")) {
      int sign = setting.indexOf('=');
      if (sign < 1) {
        throw CommandFailure.refused(
            "--set: '" + NumberText.shown(setting) + "' should read NAME=VALUE");
      }
      String name = setting.substring(0, sign).strip();
      double value =
          NumberText.read(setting.substring(sign + 1), "--set " + NumberText.shown(name));
      if (parameters.put(name, value) != null) {
        throw CommandFailure.refused("--set: " + NumberText.shown(name) + " is set twice");
      }
    }
    return parameters;
  }

  private void write(SolutionTable table, Path model) throws CommandFailure {
    try (ResultSink sink = ResultSink.of(values.one("--output"), Optional.of(model), streams)) {
      List<String> names = new ArrayList<>();
      names.add(table.time().name());
      table.columns().forEach(c -> names.add(c.name()));
      sink.write(CsvLine.ofNames(names));
      double[] times = table.time().values();
      List<double[]> columns = table.columns().stream().map(SolutionTable.Column::values).toList();
      StringBuilder line = new StringBuilder();
      for (int i = 0; i < times.length; i++) {
        line.setLength(0);
        line.append(NumberText.exact(times[i]));
        for (double[] column : columns) {
          line.append(',').append(NumberText.exact(column[i]));
        }
        sink.write(line.append('\n').toString());
      }
      sink.commit();
    }
  }

  private static String errors(SolutionTable table) {
    TextTable text = new TextTable(2, "column", "unit", "estimated error", "relative to largest");
    for (SolutionTable.Column column : table.columns()) {
      double largest = 0;
      for (double value : column.values()) {
        largest = Math.max(largest, Math.abs(value));
      }
      double error = column.largestError();
      text.add(
          column.name(),
          column.unit(),
          NumberText.brief(error),
          largest > 0 ? NumberText.brief(error / largest) : "-");
    }
    String heading =
        "method: "
            + table.method()
            + "; relative error asked for: "
            + NumberText.brief(table.accuracy())
            + "\n";
    return table.reached() <= table.accuracy()
        ? heading + text
        : heading
            + "warning: this was not reached; the estimated relative error is "
            + NumberText.brief(table.reached())
            + "\n"
            + text;
  }
}
