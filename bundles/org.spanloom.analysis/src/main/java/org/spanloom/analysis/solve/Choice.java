/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.solve;

import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.SequencedMap;
import java.util.TreeMap;
import java.util.function.Function;
import java.util.stream.Collectors;
import org.spanloom.analysis.coefficients.CompiledSystem;
import org.spanloom.analysis.coefficients.SystemCompiler;
import org.spanloom.language.model.Corners;
import org.spanloom.language.model.Let;
import org.spanloom.language.model.Model;
import org.spanloom.language.model.Parameter;
import org.spanloom.language.model.SystemModel;
import org.spanloom.language.model.TimeInterval;
import org.spanloom.language.problem.Problem;
import org.spanloom.language.problem.Severity;
import org.spanloom.language.text.Position;

/** Picks what a request means from a model, or says why it cannot. */
public final class Choice {

  /** A request that cannot be served; carries the message for the one who asked. */
  public static final class RefusedException extends Exception {
    private static final long serialVersionUID = 1L;
    private final boolean usage;

    RefusedException(boolean usage, String message) {
      super(message);
      this.usage = usage;
    }

    /** Tells whether the caller asked for something that is not there. */
    public boolean isUsage() {
      return usage;
    }
  }

  private Choice() {}

  /**
   * Picks a system, sets its parameters and compiles it.
   *
   * @param model the model
   * @param name name of the system; empty takes the only one
   * @param parameters values by name, in declared units
   */
  public static CompiledSystem system(
      Model model, Optional<String> name, SequencedMap<String, Double> parameters)
      throws RefusedException {
    if (model.systems().isEmpty()) {
      throw new RefusedException(
          false,
          model.source().name()
              + " declares no system"
              + firstError(model)
                  .map(e -> "; " + e)
                  .orElse("; write 'system NAME over t { ... }'."));
    }
    SystemModel system =
        pick("system", model.systems(), SystemModel::name, name, model.source().name());
    if (!model.isSound(system)) {
      throw new RefusedException(
          false,
          "system "
              + system.name()
              + " has errors and cannot be solved"
              + firstError(model).map(e -> "; the first is " + e).orElse("."));
    }
    Map<String, Double> values = values(system, parameters);
    Optional<String> refusal = SystemCompiler.refusal(system, values);
    if (refusal.isPresent()) {
      throw new RefusedException(
          true,
          "with these values of parameters system "
              + system.name()
              + " has no solution: "
              + refusal.get()
              + ".");
    }
    CompiledSystem compiled = SystemCompiler.compile(system, values);
    if (compiled.gap().isPresent() && compiled.gap().get() instanceof Corners.TooMany tooMany) {
      throw new RefusedException(false, Refusals.text(compiled, tooMany) + ".");
    }
    return compiled;
  }

  private static Optional<String> firstError(Model model) {
    return model.problems().stream()
        .filter(p -> p.severity() == Severity.ERROR)
        .findFirst()
        .map(p -> place(model, p) + " " + p.message());
  }

  private static String place(Model model, Problem problem) {
    Position position = model.source().position(problem.span().start());
    return model.source().name() + ":" + position.line() + ":" + position.column() + ":";
  }

  /**
   * Picks one of several named things.
   *
   * @param kind what they are, in the singular
   * @param all the things, at least one
   * @param nameOf gives a name
   * @param wanted the name wanted; empty takes the only one
   * @param owner whose things they are
   */
  public static <T> T pick(
      String kind, List<T> all, Function<T, String> nameOf, Optional<String> wanted, String owner)
      throws RefusedException {
    if (wanted.isEmpty() && all.size() == 1) {
      return all.getFirst();
    }
    if (wanted.isPresent()) {
      Optional<T> found =
          all.stream().filter(t -> nameOf.apply(t).equals(wanted.get())).findFirst();
      if (found.isPresent()) {
        return found.get();
      }
    }
    String names = all.stream().map(nameOf).collect(Collectors.joining(", "));
    throw new RefusedException(
        true,
        wanted
            .map(w ->
                String.format(
                    "there is no %s '%s' in %s; choose one of: %s.", kind, w, owner, names))
            .orElse(
                String.format(
                    "%s has several choices of %s; choose one of: %s.", owner, kind, names)));
  }

  private static Map<String, Double> values(
      SystemModel system, SequencedMap<String, Double> parameters) throws RefusedException {
    Map<String, Double> values = new TreeMap<>();
    for (Map.Entry<String, Double> entry : parameters.entrySet()) {
      refuseNamedExpression(system, entry.getKey());
      if (system.parameters().isEmpty()) {
        throw new RefusedException(
            true,
            "system "
                + system.name()
                + " has no parameter to set, so none named '"
                + entry.getKey()
                + "'.");
      }
      Parameter parameter =
          pick(
              "parameter",
              system.parameters(),
              Parameter::name,
              Optional.of(entry.getKey()),
              "system " + system.name());
      if (!Double.isFinite(entry.getValue())) {
        throw new RefusedException(
            true, "the value of parameter " + entry.getKey() + " must be a finite number.");
      }
      values.put(entry.getKey(), parameter.unit().toBase(entry.getValue()));
    }
    return values;
  }

  /** A name that is declared, but as no parameter, gets a message of its own. */
  private static void refuseNamedExpression(SystemModel system, String name)
      throws RefusedException {
    Optional<Let> named = system.lets().stream().filter(l -> l.name().equals(name)).findFirst();
    if (named.isPresent() && system.parameters().stream().noneMatch(p -> p.name().equals(name))) {
      throw new RefusedException(
          true,
          String.format(
              "'%s' is %s and cannot be set to a number; change its line in the model, or set a"
                  + " parameter in it.",
              name,
              named.get().isInput()
                  ? "an input, a function of " + system.timeName() + ","
                  : "a named expression"));
    }
  }

  /**
   * Checks that a time lies in the interval of the system.
   *
   * @return the time
   */
  public static double inside(CompiledSystem system, double t) throws RefusedException {
    TimeInterval interval = system.model().interval();
    boolean late = interval.endOpen() ? t >= interval.end() : t > interval.end();
    boolean early = interval.startOpen() ? t <= interval.start() : t < interval.start();
    if (late || early || !Double.isFinite(t)) {
      throw new RefusedException(
          true,
          String.format(
              Locale.ROOT,
              "%s = %s lies outside the interval of system %s, %s; choose a time inside.",
              system.model().timeName(),
              number(t),
              system.model().name(),
              describe(system.model())));
    }
    return t;
  }

  /**
   * Returns the relative error to aim at.
   *
   * @param wanted what was asked for; the system's own if empty
   */
  public static double accuracy(OptionalDouble wanted, CompiledSystem system)
      throws RefusedException {
    double accuracy = wanted.orElse(system.model().accuracy());
    if (!(accuracy > 0 && accuracy < 1)) {
      throw new RefusedException(
          true, "the accuracy must be a number between 0 and 1, for example 1e-8.");
    }
    return accuracy;
  }

  /** The ends of a range. */
  enum End {
    START("start", "first"),
    STOP("end", "last");

    private final String name;
    private final String time;

    End(String name, String time) {
      this.name = name;
      this.time = time;
    }
  }

  /** Returns an end of a range: the one wanted, else the one of the interval. */
  static double end(
      CompiledSystem system, OptionalDouble wanted, double own, boolean open, End word)
      throws RefusedException {
    if (wanted.isPresent()) {
      return inside(system, wanted.getAsDouble());
    }
    if (!Double.isFinite(own) || open) {
      throw new RefusedException(
          true,
          String.format(
              "the interval of system %s, %s, does not include its %s; give the %s time wanted.",
              system.model().name(), describe(system.model()), word.name, word.time));
    }
    return own;
  }

  /** Returns the interval in words, for example "t [h] from 0 to 48". */
  public static String describe(SystemModel system) {
    TimeInterval interval = system.interval();
    StringBuilder text = new StringBuilder(system.timeName());
    if (!system.timeUnit().code().equals("1")) {
      text.append(" [").append(system.timeUnit().code()).append(']');
    }
    if (!Double.isFinite(interval.start()) && !Double.isFinite(interval.end())) {
      return text.append(" on the whole line").toString();
    }
    if (Double.isFinite(interval.start())) {
      text.append(interval.startOpen() ? " after " : " from ").append(number(interval.start()));
    }
    if (Double.isFinite(interval.end())) {
      text.append(interval.endOpen() ? " before " : " to ").append(number(interval.end()));
    }
    return text.toString();
  }

  /** Returns a number as short as it can be without losing a bit; whole numbers without a point. */
  public static String number(double value) {
    return value == Math.rint(value) && Math.abs(value) < 1e15
        ? String.valueOf((long) value)
        : String.valueOf(value);
  }
}
