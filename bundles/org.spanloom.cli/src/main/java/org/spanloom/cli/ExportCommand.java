/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import java.io.IOException;
import java.io.StringWriter;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;
import org.spanloom.analysis.export.Export;
import org.spanloom.analysis.export.ExportJson;
import org.spanloom.analysis.export.ExportRequest;
import org.spanloom.analysis.export.Exported;
import picocli.CommandLine.Model.CommandSpec;

/** {@code spanloom export}: writes A, b, the fundamental matrix or a basis for other programs. */
final class ExportCommand {

  private final Options.Values values;
  private final Streams streams;

  ExportCommand(Options.Values values, Streams streams) {
    this.values = values;
    this.streams = streams;
  }

  static void describe(CommandSpec spec) {
    spec.addPositional(Options.operand("FILE", "the model file"));
    spec.addOption(Options.required("--what", "WHAT", "A, b, Phi or basis"));
    spec.addOption(Options.required("--at", "T,T,...", "the times, in this order"));
    spec.addOption(Options.one("--format", "FORMAT", "csv (if not given), json or matrix-market"));
    spec.addOption(Options.one("--system", "NAME", "which system; needed if there are several"));
    spec.addOption(
        Options.one("--basis", "NAME", "which basis; needed for WHAT basis if there are several"));
    spec.addOption(ParameterOption.spec());
    spec.addOption(Options.one("--output", "FILE", "write to FILE instead of standard output"));
    spec.usageMessage()
        .description(
            "Writes matrices of a system, x' = A x + b, at times: the coefficients A or b, the"
                + " fundamental matrix Phi that is the identity at the start of the interval, or a"
                + " declared basis, its vectors in columns. Everything is in declared units.",
            "csv has one line for each entry that is not zero: time, row, column, value and"
                + " estimated error. matrix-market is the exchange format of that name and holds"
                + " one matrix, so one time.%n");
  }

  int run() throws CommandFailure {
    String file = values.operand();
    Exported.What what = what();
    Format format = format();
    List<Double> times = NumberText.readList(values.one("--at").orElse(""), "--at");
    if (format == Format.MATRIX_MARKET && times.size() != 1) {
      throw CommandFailure.refused(
          "--format matrix-market holds one matrix; give one time with --at");
    }
    if (values.one("--basis").isPresent() && what != Exported.What.BASIS) {
      throw CommandFailure.refused("--basis belongs to --what basis; leave it out");
    }
    Path path = ModelDoor.path(file);
    ExportRequest request =
        new ExportRequest(
            ModelDoor.open(path),
            values.one("--system"),
            what,
            values.one("--basis"),
            times,
            ParameterOption.read(values),
            ProjectSettings.required(path));
    Exported exported;
    try (TerminalProgress progress = new TerminalProgress(streams, "solving " + file)) {
      exported = Answers.value(Export.of(request, progress));
    }
    try (ResultSink sink = ResultSink.of(values.one("--output"), Optional.of(path), streams)) {
      switch (format) {
        case CSV -> csv(exported, sink);
        case JSON -> sink.write(json(exported));
        case MATRIX_MARKET -> MatrixMarketText.write(exported, sink);
      }
      sink.commit();
    }
    return ExitCode.CLEAN;
  }

  private enum Format {
    CSV("csv"),
    JSON("json"),
    MATRIX_MARKET("matrix-market");

    private final String word;

    Format(String word) {
      this.word = word;
    }
  }

  private Exported.What what() throws CommandFailure {
    String word = values.one("--what").orElse("");
    return Arrays.stream(Exported.What.values())
        .filter(w -> w.word().equals(word))
        .findFirst()
        .orElseThrow(() ->
            CommandFailure.refused(
                "--what: '"
                    + NumberText.shown(word)
                    + "' should be one of "
                    + Arrays.stream(Exported.What.values())
                        .map(Exported.What::word)
                        .collect(Collectors.joining(", "))));
  }

  private Format format() throws CommandFailure {
    String word = values.one("--format").orElse(Format.CSV.word);
    return Arrays.stream(Format.values())
        .filter(f -> f.word.equals(word))
        .findFirst()
        .orElseThrow(() ->
            CommandFailure.refused(
                "--format: '"
                    + NumberText.shown(word)
                    + "' should be one of csv, json, matrix-market"));
  }

  private static void csv(Exported exported, ResultSink sink) throws CommandFailure {
    sink.write(CsvLine.ofNames(List.of(exported.timeName(), "row", "column", "value", "error")));
    int m = exported.columns().size();
    for (Exported.Matrix matrix : exported.matrices()) {
      double[] entries = matrix.values();
      double[] errors = matrix.errors();
      for (int i = 0; i < exported.rows().size(); i++) {
        for (int j = 0; j < m; j++) {
          double value = entries[i * m + j];
          if (value != 0 || errors[i * m + j] != 0) {
            String names =
                CsvLine.ofNames(List.of(exported.rows().get(i), exported.columns().get(j)));
            sink.write(
                NumberText.exact(matrix.time())
                    + ","
                    + names.stripTrailing()
                    + ","
                    + NumberText.exact(value)
                    + ","
                    + NumberText.exact(errors[i * m + j])
                    + "\n");
          }
        }
      }
    }
  }

  private static String json(Exported exported) {
    StringWriter text = new StringWriter();
    try {
      ExportJson.write(exported, text);
    } catch (IOException e) {
      throw new IllegalStateException("a text in memory cannot fail", e);
    }
    return text.toString();
  }
}
