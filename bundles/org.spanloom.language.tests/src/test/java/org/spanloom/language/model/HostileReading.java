/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.lang.management.ManagementFactory;
import java.util.Locale;
import java.util.Map;
import java.util.function.Supplier;
import org.spanloom.language.editing.Completion;
import org.spanloom.language.editing.Folding;
import org.spanloom.language.editing.Hover;
import org.spanloom.language.editing.Outline;
import org.spanloom.language.formatting.Formatter;
import org.spanloom.language.text.SourceText;

/**
 * A program that reads the hostile texts, one after another, and writes a line for each: seconds of
 * processor time for reading, for the editor's part, the number of problems, the first message.
 */
final class HostileReading {

  private HostileReading() {}

  public static void main(String[] only) {
    boolean on = only.length == 0;
    for (Map.Entry<String, Supplier<String>> entry : HostileTexts.all().entrySet()) {
      on |= only.length > 0 && entry.getKey().contains(only[0]);
      if (on) {
        System.out.println(entry.getKey() + "\t" + read(entry.getValue().get()));
      }
    }
  }

  private static String read(String text) {
    try {
      double start = seconds();
      Model model =
          ModelReader.read(new SourceText("hostile.span", text), new HostileProject(), () -> false);
      double read = seconds();
      Formatter.format(text);
      Outline.of(model.syntax());
      Folding.of(model.syntax());
      Completion.at(model, text.length() / 2);
      Hover.at(model, text.length() / 2);
      double edited = seconds();
      String first =
          model.problems().isEmpty()
              ? "none"
              : model.problems().getFirst().kind() + ": " + model.problems().getFirst().message();
      return String.format(
          Locale.ROOT,
          "%.2f\t%.2f\t%d\t%s",
          read - start,
          edited - read,
          model.problems().size(),
          first.substring(0, Math.min(first.length(), 200)));
    } catch (RuntimeException | StackOverflowError | OutOfMemoryError e) {
      StackTraceElement[] trace = e.getStackTrace();
      return "failed\t" + e + "\t" + (trace.length == 0 ? "" : trace[0]);
    }
  }

  private static double seconds() {
    return ManagementFactory.getThreadMXBean().getCurrentThreadCpuTime() / 1e9;
  }
}
