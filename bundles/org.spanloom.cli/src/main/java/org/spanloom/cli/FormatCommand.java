/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import org.spanloom.language.formatting.Formatter;
import org.spanloom.language.problem.TextEdit;
import org.spanloom.language.syntax.Parser;
import org.spanloom.language.text.SourceText;
import picocli.CommandLine.Model.CommandSpec;

/** {@code spanloom format}: gives model files their canonical layout, or says which lack it. */
final class FormatCommand {

  private static final byte[] BYTE_ORDER_MARK = {(byte) 0xEF, (byte) 0xBB, (byte) 0xBF};

  private final Options.Values values;
  private final Streams streams;
  private boolean incomplete;
  private boolean changed;

  FormatCommand(Options.Values values, Streams streams) {
    this.values = values;
    this.streams = streams;
  }

  static void describe(CommandSpec spec) {
    spec.addPositional(
        Options.operands("PATH", "model files, and directories with model files below them"));
    spec.addOption(
        Options.flag("--check", "change nothing, and end with 1 if a file would be changed"));
    spec.usageMessage()
        .description(
            "Lays out models in one way: indentation, blanks, aligned columns. Only white space"
                + " changes, so the models mean what they meant. Lists the files it changes.",
            "Exit code 0: the files have the layout; 1: with --check, a file has not; 2: wrong"
                + " arguments, or a file that cannot be read or written.%n");
  }

  int run() throws CommandFailure {
    boolean check = values.isGiven("--check");
    ModelSearch search = ModelSearch.of(values.operands());
    search.problems().forEach(this::missed);
    try (ResultSink list = ResultSink.standardOutput(streams)) {
      for (Path file : search.found()) {
        try {
          format(file, check, list);
        } catch (CommandFailure failure) {
          missed(failure.getMessage());
        }
      }
      list.commit();
    }
    if (incomplete) {
      return ExitCode.REFUSED;
    }
    return check && changed ? ExitCode.FOUND : ExitCode.CLEAN;
  }

  private void missed(String message) {
    streams.say(message);
    incomplete = true;
  }

  private void format(Path file, boolean check, ResultSink list) throws CommandFailure {
    if (!Files.isRegularFile(file)) {
      throw CommandFailure.refused(file + ": this is no file that can be written back");
    }
    SourceText source = ModelFile.read(file);
    List<TextEdit> edits = Formatter.edits(Parser.parse(source));
    if (edits.isEmpty()) {
      return;
    }
    changed = true;
    if (check) {
      list.write("not formatted: " + file + "\n");
      return;
    }
    String mark = hasMark(file) ? "\uFEFF" : "";
    try (ResultSink sink = ResultSink.replacing(file)) {
      sink.write(mark + TextEdit.apply(source.content(), edits));
      sink.commit();
    }
    list.write("formatted: " + file + "\n");
  }

  /** Tells whether a file begins with a byte order mark, which is no part of its text. */
  private static boolean hasMark(Path file) throws CommandFailure {
    try (InputStream in = Files.newInputStream(file)) {
      return Arrays.equals(in.readNBytes(BYTE_ORDER_MARK.length), BYTE_ORDER_MARK);
    } catch (IOException e) {
      throw CommandFailure.refused(file + ": cannot be read: " + IoReason.of(e));
    }
  }
}
