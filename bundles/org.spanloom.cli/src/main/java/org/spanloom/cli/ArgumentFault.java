/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import java.util.stream.Collectors;
import picocli.CommandLine.MaxValuesExceededException;
import picocli.CommandLine.MissingParameterException;
import picocli.CommandLine.Model.ArgSpec;
import picocli.CommandLine.OverwrittenOptionException;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.UnmatchedArgumentException;

/** Says in the words of this program what is wrong with arguments. */
final class ArgumentFault {

  private ArgumentFault() {}

  /** Returns what is wrong, without a full stop. */
  static String message(ParameterException fault) {
    return switch (fault) {
      case MissingParameterException e when !e.getMissing().isEmpty() -> missing(e);
      case UnmatchedArgumentException e -> unmatched(e);
      case OverwrittenOptionException e -> label(e.getOverwritten()) + " may be given only once";
      case MaxValuesExceededException e -> "too many values";
      default -> NumberText.shown(String.valueOf(fault.getMessage()));
    };
  }

  private static String missing(MissingParameterException e) {
    String what =
        e.getMissing().stream().map(ArgumentFault::label).collect(Collectors.joining(" and "));
    return e.getMissing().getFirst().required() ? what + " is missing" : what + " needs a value";
  }

  private static String unmatched(UnmatchedArgumentException e) {
    String first = e.getUnmatched().getFirst();
    return (first.startsWith("-") ? "there is no option '" : "one argument too many: '")
        + NumberText.shown(first)
        + "'";
  }

  private static String label(ArgSpec argument) {
    return argument.isOption()
        ? ((picocli.CommandLine.Model.OptionSpec) argument).longestName()
        : argument.paramLabel();
  }
}
