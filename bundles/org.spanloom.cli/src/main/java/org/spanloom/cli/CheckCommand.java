/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import java.io.IOException;
import java.io.StringWriter;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.spanloom.analysis.CheckReport;
import org.spanloom.analysis.ModelCheck;
import org.spanloom.analysis.report.JsonReport;
import org.spanloom.analysis.report.TextReport;
import org.spanloom.analysis.settings.Settings;
import picocli.CommandLine.Model.CommandSpec;

/** {@code spanloom check}: checks models and reports what is found in them. */
final class CheckCommand {

  private final Options.Values values;
  private final Streams streams;
  private boolean incomplete;

  CheckCommand(Options.Values values, Streams streams) {
    this.values = values;
    this.streams = streams;
  }

  static void describe(CommandSpec spec) {
    spec.addPositional(
        Options.operands("PATH", "model files, and directories with model files below them"));
    spec.addOption(
        Options.one("--format", "FORMAT", "text for people (if not given) or json for machines"));
    spec.addOption(
        Options.one(
            "--settings", "FILE", "thresholds, instead of the project's own settings file"));
    spec.addOption(
        Options.one("--output", "FILE", "write the report to FILE instead of standard output"));
    spec.usageMessage()
        .description(
            "Checks models: the text, the units, whether every system is well posed, how far its"
                + " bases can be trusted, and whether its requirements hold.",
            "Exit code 0: no errors, warnings allowed; 1: errors, or a requirement that does not"
                + " hold; 2: wrong arguments, or a file that cannot be read or written.%n");
  }

  int run() throws CommandFailure {
    boolean json = jsonWanted();
    ProjectSettings settings = new ProjectSettings(namedSettings());
    ModelSearch search = ModelSearch.of(values.operands());
    search.problems().forEach(this::missed);
    List<CheckReport> reports = new ArrayList<>();
    try (ResultSink sink = ResultSink.of(values.one("--output"), Optional.empty(), streams)) {
      List<Path> files = search.found();
      for (int i = 0; i < files.size(); i++) {
        String place = files.size() == 1 ? "" : (i + 1) + " of " + files.size() + "  ";
        Optional<CheckReport> report = check(files.get(i), place, settings);
        if (report.isPresent()) {
          reports.add(report.get());
          if (!json) {
            sink.write(TextReport.of(report.get()));
            sink.flush();
          }
        }
      }
      if (!reports.isEmpty()) {
        sink.write(json ? json(reports) : TextReport.summary(reports) + "\n" + TextReport.CAUTION);
        sink.commit();
      }
    }
    settings.problems().forEach(this::missed);
    if (incomplete) {
      return ExitCode.REFUSED;
    }
    return reports.stream().allMatch(CheckReport::isClean) ? ExitCode.CLEAN : ExitCode.FOUND;
  }

  private static String json(List<CheckReport> reports) {
    StringWriter text = new StringWriter();
    try {
      JsonReport.write(reports, text);
    } catch (IOException e) {
      throw new UncheckedIOException("a text in memory cannot fail", e);
    }
    return text.toString();
  }

  private boolean jsonWanted() throws CommandFailure {
    String format = values.one("--format").orElse("text");
    return switch (format) {
      case "text" -> false;
      case "json" -> true;
      default ->
          throw CommandFailure.refused(
              "--format: there is no format '" + NumberText.shown(format) + "'; give text or json");
    };
  }

  private void missed(String message) {
    streams.say(message);
    incomplete = true;
  }

  private Optional<CheckReport> check(Path file, String place, ProjectSettings settings) {
    try (TerminalProgress progress = new TerminalProgress(streams, "checking " + place + file)) {
      Settings thresholds = settings.of(file);
      return Optional.of(ModelCheck.check(ModelDoor.open(file), thresholds, progress));
    } catch (CommandFailure failure) {
      missed(failure.getMessage());
      return Optional.empty();
    }
  }

  private Optional<Path> namedSettings() throws CommandFailure {
    Optional<String> name = values.one("--settings");
    if (name.isEmpty()) {
      return Optional.empty();
    }
    try {
      Path file = Path.of(name.get());
      if (Files.isReadable(file) && !Files.isDirectory(file)) {
        return Optional.of(file);
      }
    } catch (InvalidPathException e) {
      // The message below serves for this as well.
    }
    throw CommandFailure.refused(
        "--settings " + NumberText.shown(name.get()) + ": there is no such file that can be read");
  }
}
