/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import picocli.CommandLine.ParameterException;

/** Entry of the command line. */
public final class Main {

  private static final String TRACE = "spanloom.trace";

  private Main() {}

  /**
   * Runs one command and ends the process with its exit code.
   *
   * @param arguments what was typed after the name of the program
   */
  public static void main(String[] arguments) {
    int code = run(arguments, Streams.ofProcess());
    if (code != ExitCode.CLEAN) {
      System.exit(code);
    }
  }

  /**
   * Runs one command. This is the one place where a failure becomes a message: nobody sees a stack
   * trace who did not ask for it.
   *
   * @param arguments what was typed after the name of the program
   * @param streams where to write
   * @return the exit code
   */
  static int run(String[] arguments, Streams streams) {
    try {
      return dispatch(List.of(arguments), streams);
    } catch (CommandFailure failure) {
      streams.say(failure.getMessage());
      return failure.exitCode();
    } catch (OutOfMemoryError e) {
      streams.say(
          "out of memory; give the Java virtual machine more with SPANLOOM_JAVA_OPTS=-Xmx4g");
      return ExitCode.REFUSED;
    } catch (RuntimeException | Error e) {
      streams.say(internal(e));
      if (Boolean.getBoolean(TRACE)) {
        e.printStackTrace(streams.err());
      }
      return ExitCode.REFUSED;
    }
  }

  private static int dispatch(List<String> arguments, Streams streams) throws CommandFailure {
    if (arguments.isEmpty()) {
      streams.err().print(Overview.text());
      return ExitCode.REFUSED;
    }
    String first = arguments.getFirst();
    if (first.equals("--version") || first.equals("-V")) {
      return show(Overview.version(), streams);
    }
    if (first.equals("--help") || first.equals("-h")) {
      return show(Overview.text(), streams);
    }
    Optional<Command> command = Command.named(first);
    if (command.isEmpty()) {
      throw CommandFailure.refused(Overview.unknown(first));
    }
    return run(command.get(), arguments.subList(1, arguments.size()), streams);
  }

  private static int run(Command command, List<String> arguments, Streams streams)
      throws CommandFailure {
    Options options = Options.of(command);
    try {
      Options.Values values = options.parse(arguments);
      if (values.helpWanted()) {
        return show(options.help(), streams);
      }
      return command.run(values, streams);
    } catch (ParameterException e) {
      throw CommandFailure.refused(
          ArgumentFault.message(e)
              + "; spanloom "
              + command.word()
              + " --help shows what can be given");
    }
  }

  private static int show(String text, Streams streams) throws CommandFailure {
    try (ResultSink sink = ResultSink.standardOutput(streams)) {
      sink.write(text);
      sink.commit();
    }
    return ExitCode.CLEAN;
  }

  /**
   * Names the place in this program where something went wrong that its authors did not foresee.
   */
  private static String internal(Throwable e) {
    String place =
        Arrays.stream(e.getStackTrace())
            .filter(f -> f.getClassName().startsWith("org.spanloom."))
            .findFirst()
            .map(f -> simpleName(f.getClassName()) + "." + f.getLineNumber())
            .orElse("unknown");
    return "internal error "
        + place
        + "-"
        + e.getClass().getSimpleName()
        + "; please report this id together with the model (SPANLOOM_JAVA_OPTS=-D"
        + TRACE
        + "=true shows more)";
  }

  private static String simpleName(String className) {
    return className.substring(className.lastIndexOf('.') + 1);
  }
}
