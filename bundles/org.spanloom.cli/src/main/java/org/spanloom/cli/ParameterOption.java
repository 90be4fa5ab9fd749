/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import java.util.LinkedHashMap;
import java.util.SequencedMap;
import picocli.CommandLine.Model.OptionSpec;

/** {@code --set NAME=VALUE}: values in place of those of parameters. */
final class ParameterOption {

  private ParameterOption() {}

  static OptionSpec spec() {
    return Options.many(
        "--set",
        "NAME=VALUE",
        "take VALUE for the parameter NAME, in its declared unit; may be repeated");
  }

  /** Returns the values by name, in the order given. */
  static SequencedMap<String, Double> read(Options.Values values) throws CommandFailure {
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
}
