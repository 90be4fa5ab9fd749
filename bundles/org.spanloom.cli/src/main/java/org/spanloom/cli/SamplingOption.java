/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import java.util.Optional;
import org.spanloom.analysis.solve.Sampling;
import picocli.CommandLine.Model.CommandSpec;

/** {@code --points N} and {@code --at T,T,...}: the times to list. */
final class SamplingOption {

  private static final int DEFAULT_POINTS = 101;

  private SamplingOption() {}

  static void describe(CommandSpec spec) {
    spec.addOption(
        Options.one(
            "--points",
            "N",
            "list N evenly spaced times, both ends included; " + DEFAULT_POINTS + " if not given"));
    spec.addOption(Options.one("--at", "T,T,...", "list these times instead, in this order"));
  }

  /** Returns the times to list. */
  static Sampling read(Options.Values values) throws CommandFailure {
    Optional<String> points = values.one("--points");
    Optional<String> at = values.one("--at");
    if (points.isPresent() && at.isPresent()) {
      throw CommandFailure.refused("--points and --at exclude each other; give one of them");
    }
    if (at.isPresent()) {
      return new Sampling.At(NumberText.readList(at.get(), "--at"));
    }
    return new Sampling.Even(
        points.isPresent()
            ? NumberText.readCount(points.get(), 2, NumberText.LIST_LIMIT, "--points")
            : DEFAULT_POINTS);
  }
}
