/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import org.spanloom.analysis.solve.MethodNames;
import picocli.CommandLine.Model.OptionSpec;

/** The option {@code --method}. */
final class MethodOption {

  static final String NAME = "--method";

  private MethodOption() {}

  static OptionSpec spec() {
    return Options.one(
        NAME,
        "NAME",
        "the method to use instead of the one chosen by the system: "
            + String.join(", ", MethodNames.all()));
  }
}
