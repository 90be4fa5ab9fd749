/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.benchmarks;

import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStreamReader;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.List;

/** CVODE of SUNDIALS, through the driver in C beside this class; there only where it was built. */
final class CvodeDriver {

  /** Names the program; the script sets it where the program could be built. */
  private static final String PROPERTY = "spanloom.cvode";

  private CvodeDriver() {}

  /** Tells whether the driver was built. */
  static boolean isThere() {
    return !System.getProperty(PROPERTY, "").isEmpty();
  }

  /**
   * What a run gave.
   *
   * @param seconds processor time of the best of its runs
   * @param values values at the end
   */
  @SuppressWarnings("ArrayRecordComponent") // nobody compares results
  record Result(double seconds, double[] values) {}

  /**
   * Runs the driver, and there the problem at most so many times; values that are not numbers where
   * it failed.
   */
  static Result run(PeerProblem problem, double tolerance, int runs) {
    try {
      Process process =
          new ProcessBuilder(
                  System.getProperty(PROPERTY),
                  problem.driverName(),
                  String.valueOf(tolerance),
                  String.valueOf(runs))
              .redirectError(ProcessBuilder.Redirect.DISCARD)
              .start();
      try (BufferedReader reader =
          new BufferedReader(
              new InputStreamReader(process.getInputStream(), StandardCharsets.US_ASCII))) {
        List<String> lines = reader.lines().toList();
        double[] numbers = lines.stream().mapToDouble(Double::parseDouble).toArray();
        return numbers.length < 2
            ? new Result(Double.NaN, failed(problem))
            : new Result(numbers[0], Arrays.copyOfRange(numbers, 1, numbers.length));
      }
    } catch (IOException e) {
      return new Result(Double.NaN, failed(problem));
    }
  }

  private static double[] failed(PeerProblem problem) {
    double[] values = problem.reference();
    Arrays.fill(values, Double.NaN);
    return values;
  }
}
