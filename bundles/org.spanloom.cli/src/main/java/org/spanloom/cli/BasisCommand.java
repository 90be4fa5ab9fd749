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
import org.spanloom.analysis.basis.BasisAnswer;
import org.spanloom.analysis.basis.BasisRequest;
import org.spanloom.analysis.basis.BasisSolve;
import org.spanloom.analysis.basis.BasisTable;
import org.spanloom.numerics.basis.ConditionSample;
import picocli.CommandLine.Model.CommandSpec;

/**
 * {@code spanloom basis}: lists a basis as comma-separated values and its conditioning beside it.
 */
final class BasisCommand {

  private final Options.Values values;
  private final Streams streams;

  BasisCommand(Options.Values values, Streams streams) {
    this.values = values;
    this.streams = streams;
  }

  static void describe(CommandSpec spec) {
    spec.addPositional(Options.operand("FILE", "the model file"));
    spec.addOption(Options.one("--system", "NAME", "which system; needed if there are several"));
    spec.addOption(
        Options.one(
            "--basis",
            "NAME",
            "which basis; needed if several are declared; the principal one at the start of the"
                + " interval if none is"));
    spec.addOption(Options.required("--at", "T,T,...", "the times to list, in this order"));
    spec.addOption(MethodOption.spec());
    spec.addOption(
        Options.one("--output", "FILE", "write the list to FILE instead of standard output"));
    spec.usageMessage()
        .description(
            "Lists a basis of the solutions of the homogeneous system as comma-separated values:"
                + " one line of names, then for each time one line for each column of the basis,"
                + " with the time, the number of the column and all states in their declared"
                + " units, to 17 significant digits.",
            "The condition of the basis at each time goes to standard error, with the logarithm of"
                + " the determinant, its distance from Liouville's formula, and the decimal digits"
                + " that a result built on the basis keeps.%n");
  }

  int run() throws CommandFailure {
    String file = values.operand();
    List<Double> times = NumberText.readList(values.one("--at").orElse(""), "--at");
    Path path = ModelDoor.path(file);
    BasisRequest request =
        new BasisRequest(
            ModelDoor.open(path),
            values.one("--system"),
            values.one("--basis"),
            times,
            new LinkedHashMap<>(),
            ProjectSettings.required(path),
            values.one(MethodOption.NAME));
    BasisTable table;
    try (TerminalProgress progress = new TerminalProgress(streams, "solving " + file)) {
      table =
          switch (BasisSolve.solve(request, progress)) {
            case BasisAnswer.Solved solved -> solved.table();
            case BasisAnswer.Refused refused ->
                throw CommandFailure.of(refused.usage(), refused.message());
            case BasisAnswer.Cancelled cancelled -> throw CommandFailure.refused("cancelled");
          };
    }
    write(table, path);
    streams.err().print(conditioning(table));
    streams.err().flush();
    return ExitCode.CLEAN;
  }

  private void write(BasisTable table, Path model) throws CommandFailure {
    try (ResultSink sink = ResultSink.of(values.one("--output"), Optional.of(model), streams)) {
      List<String> names = new ArrayList<>(List.of(table.timeName(), "column"));
      names.addAll(table.states());
      sink.write(CsvLine.ofNames(names));
      StringBuilder line = new StringBuilder();
      for (BasisTable.Row row : table.rows()) {
        line.setLength(0);
        line.append(NumberText.exact(row.time())).append(',').append(row.column());
        for (double value : row.values()) {
          line.append(',').append(NumberText.exact(value));
        }
        sink.write(line.append('\n').toString());
      }
      sink.commit();
    }
  }

  private static String conditioning(BasisTable table) {
    TextTable text =
        new TextTable(
            0,
            table.timeName() + " [" + table.timeUnit() + "]",
            "condition",
            "scaled",
            "ln |det|",
            "off Liouville",
            "error",
            "digits left");
    for (ConditionSample sample : table.conditioning()) {
      text.add(
          NumberText.exact(sample.time()),
          NumberText.condition(sample.raw()),
          NumberText.condition(sample.scaled()),
          NumberText.brief(sample.logDeterminant()),
          NumberText.brief(sample.liouvilleMismatch()),
          NumberText.brief(sample.error()),
          NumberText.brief(sample.digitsLeft()));
    }
    return "basis " + table.basis() + ", method: " + table.method() + "\n" + text;
  }
}
