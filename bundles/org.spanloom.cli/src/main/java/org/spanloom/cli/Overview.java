/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import java.util.Arrays;
import java.util.Locale;
import java.util.Optional;
import java.util.stream.Collectors;

/** What the program says about itself. */
final class Overview {

  private Overview() {}

  /** Returns name, version and the Java it runs on. */
  static String version() {
    String version =
        Optional.ofNullable(Overview.class.getPackage().getImplementationVersion())
            .orElse("(run from its classes)");
    return "Spanloom " + version + ", Java " + Runtime.version().feature() + "\n";
  }

  /** Returns the help of the whole program. */
  static String text() {
    StringBuilder text = new StringBuilder();
    text.append("Spanloom keeps linear dynamic models honest: x' = A(t) x + b(t), as text.\n\n");
    for (Command command : Command.values()) {
      text.append(
          String.format(Locale.ROOT, "  spanloom %-9s %s%n", command.word(), command.purpose())
              .replace(System.lineSeparator(), "\n"));
    }
    text.append(
        """

        spanloom COMMAND --help tells more; spanloom --version names the version.

        Exit codes: 0 nothing wrong (warnings allowed); 1 the model has errors, a requirement does
        not hold, or format --check found a file to change; 2 wrong arguments, or a file that
        cannot be read or written.

        Numerical results are approximations with an estimated error, and a model that passes
        every check can still be the wrong model. Results that bear on people's health, on
        structures, pressure, electricity or radiation need review by a qualified practitioner.
        """);
    return text.toString();
  }

  /** Returns the message for a word that is no command. */
  static String unknown(String word) {
    String commands =
        Arrays.stream(Command.values()).map(Command::word).collect(Collectors.joining(", "));
    String found = word.startsWith("-") ? "a command comes first, before " : "there is no command ";
    return found + "'" + NumberText.shown(word) + "'; the commands are " + commands;
  }
}
