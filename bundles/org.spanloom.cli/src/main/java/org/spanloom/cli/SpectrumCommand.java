/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.stream.IntStream;
import org.spanloom.analysis.Figures;
import org.spanloom.analysis.spectrum.SpectrumRequest;
import org.spanloom.analysis.spectrum.SpectrumSolve;
import org.spanloom.analysis.spectrum.SystemSpectrum;
import org.spanloom.analysis.spectrum.SystemSpectrum.Eigenvalues;
import org.spanloom.analysis.spectrum.SystemSpectrum.Multipliers;
import org.spanloom.numerics.spectrum.Equilibrium;
import org.spanloom.numerics.spectrum.FloquetMultipliers.Multiplier;
import org.spanloom.numerics.spectrum.Modes.Mode;
import picocli.CommandLine.Model.CommandSpec;

/** {@code spanloom spectrum}: lists eigenvalues with their modes, or multipliers. */
final class SpectrumCommand {

  private static final int STATES_SHOWN = 3;
  private static final int ROWS_SHOWN = 40;

  private final Options.Values values;
  private final Streams streams;

  SpectrumCommand(Options.Values values, Streams streams) {
    this.values = values;
    this.streams = streams;
  }

  static void describe(CommandSpec spec) {
    spec.addPositional(Options.operand("FILE", "the model file"));
    spec.addOption(Options.one("--system", "NAME", "which system; needed if there are several"));
    spec.addOption(
        Options.one(
            "--at", "T", "freeze A at this time; needed where A varies and no period is stated"));
    spec.addOption(
        Options.one("--output", "FILE", "write the list to FILE instead of standard output"));
    spec.usageMessage()
        .description(
            "Lists the eigenvalues of A as comma-separated values, by falling real part: number,"
                + " real and imaginary part, estimated error, condition, and the share of each"
                + " state in the mode. For a system whose period is stated by 'require period P' it"
                + " lists the multipliers over one period instead: modulus, logarithm of the"
                + " modulus, phase, estimated error, and rate and frequency of the exponent.",
            "A summary for people goes to standard error: the states that make up each mode,"
                + " equilibria, conserved quantities, stiffness and logarithmic norms.%n");
  }

  int run() throws CommandFailure {
    String file = values.operand();
    OptionalDouble at =
        values.one("--at").isPresent()
            ? OptionalDouble.of(NumberText.read(values.one("--at").get(), "--at"))
            : OptionalDouble.empty();
    Path path = ModelDoor.path(file);
    SpectrumRequest request =
        new SpectrumRequest(
            ModelDoor.open(path),
            values.one("--system"),
            at,
            new LinkedHashMap<>(),
            ProjectSettings.required(path));
    SystemSpectrum spectrum;
    try (TerminalProgress progress = new TerminalProgress(streams, "solving " + file)) {
      spectrum = Answers.value(SpectrumSolve.solve(request, progress));
    }
    try (ResultSink sink = ResultSink.of(values.one("--output"), Optional.of(path), streams)) {
      switch (spectrum) {
        case Eigenvalues e -> write(e, sink);
        case Multipliers m -> write(m, sink);
      }
      sink.commit();
    }
    String summary =
        switch (spectrum) {
          case Eigenvalues e -> summary(e);
          case Multipliers m -> summary(m);
        };
    streams.err().print(summary + conserved(spectrum.subject()));
    streams.err().flush();
    return ExitCode.CLEAN;
  }

  private static void write(Eigenvalues spectrum, ResultSink sink) throws CommandFailure {
    List<String> names =
        new ArrayList<>(List.of("number", "real", "imaginary", "error", "condition"));
    names.addAll(spectrum.subject().states());
    sink.write(CsvLine.ofNames(names));
    int number = 0;
    for (Mode mode : spectrum.modes()) {
      StringBuilder line = new StringBuilder().append(++number);
      line.append(',').append(NumberText.exact(mode.eigenvalue().real()));
      line.append(',').append(NumberText.exact(mode.eigenvalue().imaginary()));
      line.append(',').append(NumberText.exact(mode.error()));
      line.append(',').append(NumberText.exact(mode.condition()));
      for (double share : mode.shares()) {
        line.append(',').append(NumberText.exact(share));
      }
      sink.write(line.append('\n').toString());
    }
  }

  private static void write(Multipliers spectrum, ResultSink sink) throws CommandFailure {
    sink.write(
        CsvLine.ofNames(
            List.of("number", "modulus", "log_modulus", "phase", "error", "rate", "frequency")));
    int number = 0;
    for (Multiplier m : spectrum.floquet().multipliers()) {
      sink.write(
          String.join(
                  ",",
                  String.valueOf(++number),
                  NumberText.exact(m.modulus()),
                  NumberText.exact(m.logModulus()),
                  NumberText.exact(m.phase()),
                  NumberText.exact(m.error()),
                  NumberText.exact(spectrum.floquet().rate(m)),
                  NumberText.exact(spectrum.floquet().frequency(m)))
              + "\n");
    }
  }

  private static String summary(Eigenvalues spectrum) {
    SystemSpectrum.Subject subject = spectrum.subject();
    String per = subject.timeUnit().equals("1") ? "" : " [1/" + subject.timeUnit() + "]";
    TextTable table =
        new TextTable(
            1, "states of the mode", "real" + per, "imaginary" + per, "error", "condition");
    List<Mode> shown =
        spectrum.modes().stream().filter(m -> m.eigenvalue().imaginary() >= 0).toList();
    for (Mode mode : shown.subList(0, Math.min(ROWS_SHOWN, shown.size()))) {
      double imaginary = mode.eigenvalue().imaginary();
      table.add(
          mainStates(mode, subject.states()),
          Math.abs(mode.eigenvalue().real()) <= mode.error()
              ? "0"
              : NumberText.brief(mode.eigenvalue().real()),
          (imaginary > 0 ? "± " : "") + NumberText.brief(imaginary),
          NumberText.brief(mode.error()),
          mode.isNearlyDefective() ? "defective" : NumberText.brief(mode.condition()));
    }
    StringBuilder text = new StringBuilder("system ").append(subject.system());
    text.append(
        spectrum.at().isPresent()
            ? ", A frozen at "
                + subject.timeName()
                + " = "
                + Figures.text(spectrum.at().getAsDouble(), 6, subject.timeUnit())
                + ": eigenvalues at one time do not decide stability\n"
            : ", A constant\n");
    text.append(table);
    if (shown.size() > ROWS_SHOWN) {
      text.append("... and ").append(shown.size() - ROWS_SHOWN).append(" more\n");
    }
    if (spectrum.modes().isEmpty()) {
      return text.toString();
    }
    text.append("stiffness ").append(NumberText.brief(spectrum.stiffness()));
    text.append(", logarithmic norm ").append(NumberText.brief(spectrum.norm().euclidean()));
    text.append(" (2-norm) and ").append(NumberText.brief(spectrum.norm().largestRow()));
    text.append(" (largest row), states divided by their scales\n");
    if (spectrum.nonnegative()) {
      text.append("no entry beside the diagonal of A is negative: amounts stay nonnegative\n");
    }
    spectrum.equilibrium().ifPresent(e -> text.append(equilibrium(e, subject.states())));
    return text.toString();
  }

  private static String mainStates(Mode mode, List<String> states) {
    double[] shares = mode.shares();
    List<String> main =
        IntStream.range(0, shares.length)
            .boxed()
            .sorted(Comparator.comparingDouble((Integer i) -> -shares[i]))
            .limit(STATES_SHOWN)
            .filter(i -> shares[i] > 0.05)
            .map(i -> states.get(i) + " " + Math.round(100 * shares[i]) + " %")
            .toList();
    return String.join(", ", main);
  }

  private static String equilibrium(Equilibrium equilibrium, List<String> states) {
    return switch (equilibrium) {
      case Equilibrium.One one -> {
        TextTable table = new TextTable(1, "equilibrium", "value", "error");
        for (int i = 0; i < states.size() && i < ROWS_SHOWN; i++) {
          table.add(states.get(i), NumberText.brief(one.x()[i]), NumberText.brief(one.errors()[i]));
        }
        yield table
            + (states.size() > ROWS_SHOWN
                ? "... and " + (states.size() - ROWS_SHOWN) + " more\n"
                : "");
      }
      case Equilibrium.None none ->
          "no equilibrium: "
              + combination(none.combination(), states)
              + " changes at the constant rate "
              + NumberText.brief(none.rate())
              + "\n";
      case Equilibrium.Line line -> {
        StringBuilder text = new StringBuilder("equilibria: infinitely many, in the directions\n");
        line.directions().forEach(d -> text.append("  ").append(values(d, states)).append('\n'));
        yield text.toString();
      }
    };
  }

  private static String conserved(SystemSpectrum.Subject subject) {
    StringBuilder text = new StringBuilder();
    for (double[] combination : subject.conserved().combinations()) {
      text.append("conserved: ").append(combination(combination, subject.states())).append('\n');
    }
    return text.toString();
  }

  private static String combination(double[] factors, List<String> states) {
    StringBuilder text = new StringBuilder();
    int shown = 0;
    for (int i = 0; i < factors.length; i++) {
      if (factors[i] != 0 && ++shown <= ROWS_SHOWN) {
        double size = Math.abs(factors[i]);
        String sign = factors[i] < 0 ? "-" : "+";
        text.append(text.isEmpty() ? (sign.equals("-") ? "-" : "") : " " + sign + " ");
        text.append(Math.abs(size - 1) < 1e-9 ? "" : Figures.text(size, 6) + "*");
        text.append(states.get(i));
      }
    }
    return text + (shown > ROWS_SHOWN ? " + ... (" + shown + " states)" : "");
  }

  private static String values(double[] direction, List<String> states) {
    List<String> parts = new ArrayList<>();
    for (int i = 0; i < direction.length && parts.size() < ROWS_SHOWN; i++) {
      if (direction[i] != 0) {
        parts.add(states.get(i) + " " + Figures.text(direction[i], 6));
      }
    }
    return String.join(", ", parts);
  }

  private static String summary(Multipliers spectrum) {
    SystemSpectrum.Subject subject = spectrum.subject();
    String per = subject.timeUnit().equals("1") ? "" : " [1/" + subject.timeUnit() + "]";
    TextTable table =
        new TextTable(0, "modulus", "phase", "error", "rate" + per, "frequency" + per);
    List<Multiplier> all = spectrum.floquet().multipliers();
    for (Multiplier m : all.subList(0, Math.min(ROWS_SHOWN, all.size()))) {
      table.add(
          NumberText.brief(m.modulus()),
          NumberText.brief(m.phase()),
          NumberText.brief(m.error()),
          NumberText.brief(spectrum.floquet().rate(m)),
          NumberText.brief(spectrum.floquet().frequency(m)));
    }
    String verdict = "";
    if (!all.isEmpty()) {
      Multiplier largest = all.getFirst();
      boolean decided = Math.abs(largest.logModulus()) > largest.error();
      verdict =
          !decided
              ? "the largest modulus cannot be told from 1\n"
              : largest.logModulus() < 0
                  ? "stable: the slowest decay is by a factor of "
                      + NumberText.brief(largest.modulus())
                      + " in a period\n"
                  : "unstable: the fastest growth is by a factor of "
                      + NumberText.brief(largest.modulus())
                      + " in a period\n";
    }
    return "system "
        + subject.system()
        + ", multipliers over a period of "
        + Figures.text(spectrum.floquet().period(), 6, subject.timeUnit())
        + "\n"
        + table
        + (all.size() > ROWS_SHOWN ? "... and " + (all.size() - ROWS_SHOWN) + " more\n" : "")
        + verdict;
  }
}
