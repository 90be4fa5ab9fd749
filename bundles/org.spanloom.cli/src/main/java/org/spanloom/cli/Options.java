/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import java.util.List;
import java.util.Optional;
import picocli.CommandLine;
import picocli.CommandLine.Help.Ansi;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Model.OptionSpec;
import picocli.CommandLine.Model.PositionalParamSpec;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.ParseResult;

/**
 * The arguments of one command. They are declared in code: reading annotations would cost start-up
 * time.
 */
final class Options {

  private static final int HELP_WIDTH = 90;

  private final CommandLine line;

  private Options(CommandLine line) {
    this.line = line;
  }

  /** Returns the arguments a command takes. */
  static Options of(Command command) {
    CommandSpec spec = CommandSpec.create().name("spanloom " + command.word());
    spec.addOption(
        OptionSpec.builder("-h", "--help").usageHelp(true).description("show this text").build());
    command.describe(spec);
    String operand = spec.positionalParameters().getFirst().paramLabel();
    boolean several = spec.positionalParameters().getFirst().isMultiValue();
    spec.usageMessage()
        .width(HELP_WIDTH)
        .sortOptions(false)
        .customSynopsis(
            "spanloom " + command.word() + " " + operand + (several ? "..." : "") + " [OPTION]...");
    CommandLine line = new CommandLine(spec);
    // "-10" behind an option is its value, not another option.
    line.setUnmatchedOptionsAllowedAsOptionParameters(true);
    return new Options(line);
  }

  /** Returns an option that takes one text. */
  static OptionSpec one(String name, String label, String... description) {
    return OptionSpec.builder(name)
        .paramLabel(label)
        .arity("1")
        .type(String.class)
        .description(description)
        .build();
  }

  /** Returns an option that takes nothing. */
  static OptionSpec flag(String name, String... description) {
    return OptionSpec.builder(name).description(description).build();
  }

  /** Returns an option that takes one text and must be given. */
  static OptionSpec required(String name, String label, String... description) {
    return OptionSpec.builder(one(name, label, description)).required(true).build();
  }

  /** Returns an option that takes one text each time and may be repeated. */
  static OptionSpec many(String name, String label, String... description) {
    return OptionSpec.builder(name)
        .paramLabel(label)
        .arity("1")
        .type(List.class)
        .auxiliaryTypes(String.class)
        .description(description)
        .build();
  }

  /** Returns the argument that names one file. */
  static PositionalParamSpec operand(String label, String... description) {
    return PositionalParamSpec.builder()
        .paramLabel(label)
        .index("0")
        .arity("1")
        .required(true)
        .type(String.class)
        .description(description)
        .build();
  }

  /** Returns the argument that names files or directories, one or more. */
  static PositionalParamSpec operands(String label, String... description) {
    return PositionalParamSpec.builder()
        .paramLabel(label)
        .index("0..*")
        .arity("1..*")
        .required(true)
        .type(List.class)
        .auxiliaryTypes(String.class)
        .description(description)
        .build();
  }

  /**
   * Reads arguments.
   *
   * @throws ParameterException if they are not what the command takes
   */
  Values parse(List<String> arguments) {
    return new Values(line.parseArgs(arguments.toArray(new String[0])));
  }

  /** Returns the help text. */
  String help() {
    line.setSeparator(" ");
    return line.getUsageMessage(Ansi.OFF).replace("\r\n", "\n");
  }

  /** Arguments as given. */
  static final class Values {
    private final ParseResult result;

    Values(ParseResult result) {
      this.result = result;
    }

    boolean helpWanted() {
      return result.isUsageHelpRequested();
    }

    boolean isGiven(String option) {
      return result.hasMatchedOption(option);
    }

    /** Returns the value of an option, if given. */
    Optional<String> one(String option) {
      return Optional.ofNullable(result.matchedOptionValue(option, null));
    }

    /** Returns the values of an option, none if not given. */
    List<String> many(String option) {
      return result.matchedOptionValue(option, List.of());
    }

    /** Returns the argument that is no option. */
    String operand() {
      return result.matchedPositionalValue(0, "");
    }

    /** Returns the arguments that are no options. */
    List<String> operands() {
      return result.matchedPositionalValue(0, List.of());
    }
  }
}
