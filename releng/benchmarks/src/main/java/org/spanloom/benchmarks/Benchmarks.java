/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.benchmarks;

import java.util.Collection;
import java.util.List;
import org.openjdk.jmh.results.RunResult;
import org.openjdk.jmh.runner.Runner;
import org.openjdk.jmh.runner.RunnerException;
import org.openjdk.jmh.runner.options.CommandLineOptionException;
import org.openjdk.jmh.runner.options.CommandLineOptions;

/** Runs the benchmarks and prints, behind the results, what follows from them. */
public final class Benchmarks {

  private Benchmarks() {}

  /**
   * Runs.
   *
   * @param arguments {@code --model STATEMENTS}, {@code --peers [PROBLEM...]}, or options of JMH
   *     and names of benchmarks
   */
  public static void main(String[] arguments)
      throws CommandLineOptionException, RunnerException, java.io.IOException {
    if (arguments.length == 2 && arguments[0].equals("--model")) {
      System.out.write(
          LargeModel.text(Integer.parseInt(arguments[1]))
              .getBytes(java.nio.charset.StandardCharsets.UTF_8));
      System.out.flush();
      return;
    }
    if (arguments.length > 0 && arguments[0].equals("--peers")) {
      PeerTable.print(List.of(arguments).subList(1, arguments.length), System.out);
      return;
    }
    CommandLineOptions options = new CommandLineOptions(arguments);
    if (options.shouldHelp()) {
      options.showHelp();
      return;
    }
    Runner runner = new Runner(options);
    if (options.shouldList()) {
      runner.list();
      return;
    }
    Collection<RunResult> results = runner.run();
    FrontEndSummary.print(results, System.out);
  }
}
