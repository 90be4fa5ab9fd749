/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.function.Function;
import org.spanloom.language.model.Quantity.Part;
import org.spanloom.language.problem.Fix;
import org.spanloom.language.problem.Nearest;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.syntax.Comparison;
import org.spanloom.language.syntax.Expression;
import org.spanloom.language.syntax.Expression.Argument;
import org.spanloom.language.syntax.Expression.CallExpression;
import org.spanloom.language.syntax.Expression.ChoiceExpression;
import org.spanloom.language.syntax.Expression.NameExpression;
import org.spanloom.language.syntax.Name;
import org.spanloom.language.text.Span;
import org.spanloom.language.units.Dimension;

/** Gives choices and pulses their meaning: expressions that change with time in steps. */
final class Switching {

  private static final List<String> LABELS = List.of("period", "width", "start");

  private final Resolver resolver;
  private final Frame frame;
  private final Scope scope;
  private final Problems problems;

  Switching(Resolver resolver, Frame frame) {
    this.resolver = resolver;
    this.frame = frame;
    this.scope = frame.scope();
    this.problems = frame.problems();
  }

  /**
   * Returns the value of a choice. Both branches are read, so that what is wrong in either is
   * reported; states in them keep one factor each, which changes with the condition.
   *
   * @param branch reads a branch
   */
  Optional<Quantity> choice(
      ChoiceExpression choice, Place place, Function<Expression, Optional<Quantity>> branch) {
    Optional<Condition> condition = condition(choice.condition(), place);
    Optional<Quantity> then = branch.apply(choice.then());
    Optional<Quantity> otherwise = branch.apply(choice.otherwise());
    if (condition.isEmpty() || then.isEmpty() || otherwise.isEmpty()) {
      return Optional.empty();
    }
    Quantity a = then.get();
    Quantity b = otherwise.get();
    boolean alike =
        a.zero()
            || b.zero()
            || resolver.fitsFirst(a, choice.then().span(), b, choice.otherwise(), "chosen between");
    return alike ? Optional.of(joined(choice, condition.get(), a, b)) : Optional.empty();
  }

  /** The gap of a condition and the depth of its term. */
  private record Condition(Term gap, boolean atZero, int depth) {}

  private Optional<Condition> condition(Comparison condition, Place place) {
    Optional<Quantity> left = side(condition.left(), condition.right(), place);
    Optional<Quantity> right = side(condition.right(), condition.left(), place);
    if (left.isEmpty() || right.isEmpty()) {
      return Optional.empty();
    }
    for (Expression side : List.of(condition.left(), condition.right())) {
      Quantity value = side == condition.left() ? left.get() : right.get();
      if (value.holdsStates()) {
        problems.report(
            ProblemKind.NOT_LINEAR,
            condition.span(),
            "The model would not be linear: in the condition \""
                + resolver.shown(condition.span())
                + "\", "
                + resolver.holding(side)
                + ". A condition may hold time and parameters only.");
        return Optional.empty();
      }
    }
    boolean alike =
        left.get().zero()
            || right.get().zero()
            || resolver.fitsFirst(
                left.get(), condition.left().span(), right.get(), condition.right(), "compared");
    if (!alike) {
      return Optional.empty();
    }
    Term a = left.get().constant().term();
    Term b = right.get().constant().term();
    int depth = Math.max(left.get().depth(), right.get().depth()) + 1;
    return switch (condition.sign()) {
      case LESS -> Optional.of(new Condition(Simplifier.difference(a, b), false, depth));
      case AT_MOST -> Optional.of(new Condition(Simplifier.difference(a, b), true, depth));
      case GREATER -> Optional.of(new Condition(Simplifier.difference(b, a), false, depth));
      case AT_LEAST -> Optional.of(new Condition(Simplifier.difference(b, a), true, depth));
      default -> Optional.empty();
    };
  }

  /** Reads one side of a condition; a lone number compared with time takes the unit of time. */
  private Optional<Quantity> side(Expression side, Expression other, Place place) {
    if (isTime(other) && Literals.isBare(side)) {
      return resolver.given(side, frame.timeUnit(), "the independent variable", place.condition());
    }
    return resolver.quantity(side, place.condition());
  }

  private boolean isTime(Expression expression) {
    return expression instanceof NameExpression name
        && !scope.timeName().isEmpty()
        && name.label().equals(scope.timeName());
  }

  private Quantity joined(ChoiceExpression choice, Condition condition, Quantity a, Quantity b) {
    Set<StateKey> keys = new LinkedHashSet<>(a.coefficients().keySet());
    keys.addAll(b.coefficients().keySet());
    Map<StateKey, Part> coefficients = new LinkedHashMap<>();
    for (StateKey key : keys) {
      Part part =
          joined(
              choice,
              condition,
              a.coefficients().getOrDefault(key, Part.ZERO),
              b.coefficients().getOrDefault(key, Part.ZERO));
      if (!Simplifier.isZero(part.term())) {
        coefficients.put(key, part);
      }
    }
    Part constant = joined(choice, condition, a.constant(), b.constant());
    Dimension dimension = a.zero() ? b.dimension() : a.dimension();
    int depth = Math.max(condition.depth(), Math.max(a.depth(), b.depth())) + 1;
    return new Quantity(coefficients, constant, dimension, a.zero() && b.zero(), depth);
  }

  private Part joined(ChoiceExpression choice, Condition condition, Part a, Part b) {
    Term term = Simplifier.choice(condition.gap(), condition.atZero(), a.term(), b.term());
    Set<Span> sources = new LinkedHashSet<>();
    for (Part part : List.of(a, b)) {
      if (!Simplifier.isZero(part.term())) {
        Expression branch = part == a ? choice.then() : choice.otherwise();
        sources.addAll(part.placedAt(frame.placed(branch.span())).sources());
      }
    }
    return sources.isEmpty() ? Part.ZERO : new Part(term, List.copyOf(sources), true);
  }

  /** Returns the value of {@code pulse(t, period = P, width = W, start = S)}. */
  Optional<Quantity> pulse(CallExpression call, Place place) {
    Optional<Map<String, Argument>> arguments = arguments(call);
    Optional<Quantity> time = arguments.flatMap(a -> resolver.quantity(a.get("").value(), place));
    if (time.isEmpty()) {
      return Optional.empty();
    }
    Map<String, Term> shape = new LinkedHashMap<>();
    int depth = 1;
    for (String label : LABELS) {
      Argument argument = arguments.get().get(label);
      if (argument == null) {
        shape.put(label, Term.ZERO);
        continue;
      }
      Optional<Quantity> value =
          resolver.given(
              argument.value(), frame.timeUnit(), "the " + label + " of a pulse", Place.PULSE);
      if (value.isEmpty()) {
        return Optional.empty();
      }
      shape.put(label, value.get().constant().term());
      depth = Math.max(depth, value.get().depth());
    }
    return isSound(shape, arguments.get())
        ? Optional.of(
            Quantity.constant(
                Simplifier.pulse(
                    time.get().constant().term(),
                    shape.get("period"),
                    shape.get("width"),
                    shape.get("start")),
                Dimension.NONE,
                depth + 1))
        : Optional.empty();
  }

  /** Sorts the arguments by label, the running time under the empty one. */
  private Optional<Map<String, Argument>> arguments(CallExpression call) {
    Map<String, Argument> sorted = new LinkedHashMap<>();
    for (Argument argument : call.arguments()) {
      boolean first = argument == call.arguments().getFirst();
      String label = argument.label().map(Name::text).orElse("");
      if (argument.before() || label.isEmpty() != first || !first && !LABELS.contains(label)) {
        return misplaced(argument, first, sorted);
      }
      if (sorted.put(label, argument) != null) {
        return refused(
            argument.span(),
            "The " + label + " of the pulse is given twice: remove one of the two.");
      }
    }
    if (!sorted.containsKey("") || !isTime(sorted.get("").value())) {
      return refused(
          call.span(),
          "A pulse is a function of the running time, which stands first: write pulse("
              + (scope.timeName().isEmpty() ? "t" : scope.timeName())
              + ", period = ..., width = ...), and start = ... to shift it.");
    }
    for (String label : LABELS.subList(0, 2)) {
      if (!sorted.containsKey(label)) {
        return refused(
            call.span(),
            "The "
                + label
                + " of the pulse is missing: write "
                + label
                + " = and a time behind the others.");
      }
    }
    return Optional.of(sorted);
  }

  private Optional<Map<String, Argument>> misplaced(
      Argument argument, boolean first, Map<String, Argument> sorted) {
    if (argument.label().isPresent() && !first) {
      Name label = argument.label().get();
      Optional<String> nearest = Nearest.of(label.text(), LABELS);
      return refused(
          label.span(),
          "A pulse has no \""
              + Quotes.shortened(label.text())
              + "\": it has a period, a width and a start.",
          nearest.stream()
              .map(n -> Fix.replace("Write " + n, label.span(), n))
              .toArray(Fix[]::new));
    }
    Optional<String> free = LABELS.stream().filter(l -> !sorted.containsKey(l)).findFirst();
    boolean nameless = !first && argument.label().isEmpty() && free.isPresent();
    return refused(
        argument.span(),
        first
            ? "The running time stands first in a pulse, without a name, as in pulse(t, period = 6"
                + " [h], width = 10 [min])."
            : "The times of a pulse are named: write period =, width = or start = before \""
                + resolver.shown(argument.span())
                + "\".",
        nameless
            ? new Fix[] {
              Fix.insert("Write " + free.get() + " =", argument.span().start(), free.get() + " = ")
            }
            : new Fix[0]);
  }

  private Optional<Map<String, Argument>> refused(Span span, String message, Fix... fixes) {
    problems.report(ProblemKind.ARGUMENT_COUNT, span, message, fixes);
    return Optional.empty();
  }

  private boolean isSound(Map<String, Term> shape, Map<String, Argument> arguments) {
    double period = TermEvaluator.constant(shape.get("period"));
    double width = TermEvaluator.constant(shape.get("width"));
    if (new PulseTrain(period, width, TermEvaluator.constant(shape.get("start"))).isSound()) {
      return true;
    }
    String guilty = !(period > 0) ? "period" : "width";
    problems.report(
        ProblemKind.PULSE_INVALID,
        arguments.get(guilty).span(),
        guilty.equals("period")
            ? "The period of a pulse must be positive, and \""
                + resolver.shown(arguments.get(guilty).value().span())
                + "\" is not."
            : "The width of a pulse must be positive and not more than its period, and \""
                + resolver.shown(arguments.get(guilty).value().span())
                + "\" is not.");
    return false;
  }
}
