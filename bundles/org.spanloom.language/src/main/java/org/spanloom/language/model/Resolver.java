/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.spanloom.language.model.MatrixAlgebra.Summand;
import org.spanloom.language.problem.Fix;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.syntax.Expression;
import org.spanloom.language.syntax.Expression.Addend;
import org.spanloom.language.syntax.Expression.CallExpression;
import org.spanloom.language.syntax.Expression.ChoiceExpression;
import org.spanloom.language.syntax.Expression.Factor;
import org.spanloom.language.syntax.Expression.IndexedSumExpression;
import org.spanloom.language.syntax.Expression.MissingExpression;
import org.spanloom.language.syntax.Expression.NameExpression;
import org.spanloom.language.syntax.Expression.NumberExpression;
import org.spanloom.language.syntax.Expression.ParenthesisedExpression;
import org.spanloom.language.syntax.Expression.PowerExpression;
import org.spanloom.language.syntax.Expression.ProductExpression;
import org.spanloom.language.syntax.Expression.SignedExpression;
import org.spanloom.language.syntax.Expression.SumExpression;
import org.spanloom.language.text.Span;
import org.spanloom.language.units.Dimension;
import org.spanloom.language.units.UnitNames;
import org.spanloom.language.units.UnitOfMeasure;

/**
 * Gives expressions their meaning: names, units, linearity. Every method returns empty after it, or
 * something it calls, reported a problem, so that one mistake is reported once.
 */
final class Resolver {

  /** Depth of a term, named expressions followed, that whatever walks over it must stand. */
  static final int DEPTH_LIMIT = 2000;

  /** Largest size of an exponent of a base dimension. */
  private static final int DIMENSION_LIMIT = 99;

  private final Frame frame;
  private final Problems problems;
  private final Literals literals;
  private final NameResolver names;
  private final Switching switching;
  private final MatrixAlgebra matrices;
  private final IndexReader indices;
  private final Loops loops;

  Resolver(Frame frame) {
    this.frame = frame;
    this.problems = frame.problems();
    this.literals = new Literals(problems, frame.units());
    this.switching = new Switching(this, frame);
    this.names = new NameResolver(this, switching, frame.scope(), problems);
    this.matrices = new MatrixAlgebra(this, frame);
    this.indices = new IndexReader(this, frame.scope(), problems);
    this.loops = new Loops(frame.scope(), problems, indices, frame.file().repetition());
  }

  /** Returns the reader of indices. */
  IndexReader indices() {
    return indices;
  }

  /** Returns what goes through the turns of loops. */
  Loops loops() {
    return loops;
  }

  /** Returns what reports names that are misused. */
  NameResolver names() {
    return names;
  }

  /** Reports a name that is not declared. */
  void unknown(NameExpression name) {
    names.unknown(name);
  }

  Literals literals() {
    return literals;
  }

  MatrixAlgebra matrices() {
    return matrices;
  }

  /** Returns the value of an expression where a single one belongs. */
  Optional<Quantity> quantity(Expression expression, Place place) {
    Optional<? extends Value> value = value(expression, place);
    boolean refused =
        value.isPresent() && value.get() instanceof MatrixValue && names.refusesFamily(expression);
    return refused ? Optional.empty() : value.flatMap(v -> matrices.single(v, expression.span()));
  }

  /** Returns the value of an expression, which may be a matrix. */
  Optional<? extends Value> value(Expression expression, Place place) {
    Optional<? extends Value> value =
        switch (expression) {
          case NumberExpression number -> literals.quantity(number, false);
          case NameExpression name -> names.name(name, place);
          case CallExpression call -> names.call(call, place);
          case SignedExpression signed -> signed(signed, place);
          case SumExpression sum -> sum(sum, place);
          case ProductExpression product -> product(product, place);
          case PowerExpression power -> power(power, place);
          case ChoiceExpression choice ->
              switching.choice(choice, place, branch -> quantity(branch, place));
          case IndexedSumExpression indexed -> indexedSum(indexed, place);
          case ParenthesisedExpression parenthesised -> value(parenthesised.inner(), place);
          case MissingExpression missing -> Optional.empty();
        };
    return value.filter(v -> isWithinLimits(v, expression));
  }

  private static Expression inner(Expression expression) {
    return expression instanceof ParenthesisedExpression parenthesised
        ? inner(parenthesised.inner())
        : expression;
  }

  private boolean isWithinLimits(Value value, Expression expression) {
    if (value.depth() > DEPTH_LIMIT) {
      problems.report(
          ProblemKind.NESTING_TOO_DEEP,
          expression.span(),
          "The expression needs more than "
              + DEPTH_LIMIT
              + " steps one after another, named expressions included: make it shorter.");
      return false;
    }
    if (!isFinite(value)) {
      problems.report(
          ProblemKind.NUMBER_OUT_OF_RANGE,
          expression.span(),
          "The value of \"" + shown(expression.span()) + "\" is not a finite number: check it.");
      return false;
    }
    return true;
  }

  private static boolean isFinite(Value value) {
    return switch (value) {
      case Quantity single ->
          !(single.constant().term() instanceof Term.Constant(double number))
              || Double.isFinite(number);
      case MatrixValue matrix ->
          matrix.entries().stream().allMatch(entry -> isFinite(entry.value()));
    };
  }

  /**
   * Returns a value without states for something with a declared unit. A lone number takes the
   * unit.
   *
   * @param what the thing in words, for messages, for example {@code "the parameter g"}
   * @return the value in coherent SI units
   */
  Optional<Quantity> given(Expression expression, UnitOfMeasure unit, String what, Place place) {
    if (Literals.isBare(expression)) {
      OptionalDouble value = literals.signedValue(expression);
      return value.isEmpty()
          ? Optional.empty()
          : inRange(expression, unit.toBase(value.getAsDouble()), unit.dimension());
    }
    if (inner(expression) instanceof ChoiceExpression choice) {
      return switching
          .choice(choice, place, branch -> given(branch, unit, what, place))
          .filter(v -> isWithinLimits(v, expression));
    }
    return quantity(expression, place)
        .filter(v -> fits(v, unit.dimension(), unit.code(), expression.span(), what));
  }

  /**
   * Returns {@link #given} for a difference of values: the zero point of the unit does not count.
   */
  Optional<Quantity> givenDifference(
      Expression expression, UnitOfMeasure unit, String what, Place place) {
    UnitOfMeasure plain = new UnitOfMeasure(unit.code(), unit.dimension(), unit.factor(), 0);
    Optional<UnitOfMeasure> offset = Literals.offsetUnit(expression);
    if (offset.isPresent()) {
      OptionalDouble value = literals.signedValue(expression);
      return value.isEmpty()
          ? Optional.empty()
          : inRange(
                  expression, offset.get().factor() * value.getAsDouble(), offset.get().dimension())
              .filter(v -> fits(v, unit.dimension(), unit.code(), expression.span(), what));
    }
    return given(expression, plain, what, place);
  }

  private Optional<Quantity> inRange(Expression expression, double base, Dimension dimension) {
    if (Double.isInfinite(base)) {
      problems.report(
          ProblemKind.NUMBER_OUT_OF_RANGE,
          expression.span(),
          "The number " + shown(expression.span()) + " is too large in SI units.");
      return Optional.empty();
    }
    return Optional.of(Quantity.constant(new Term.Constant(base), dimension, 1));
  }

  /** Tells whether a value has the dimension asked for; reports it if not. */
  boolean fits(Value value, Dimension dimension, String code, Span span, String what) {
    if (value.zero() || value.dimension().equals(dimension)) {
      return true;
    }
    problems.report(
        ProblemKind.UNIT_MISMATCH,
        span,
        "\""
            + shown(span)
            + "\" is "
            + in(value.dimension())
            + ", but "
            + what
            + " is "
            + (dimension.isNone() ? "a pure number" : "in " + code)
            + ": check the factors and their units.");
    return false;
  }

  private Optional<? extends Value> signed(SignedExpression signed, Place place) {
    Optional<UnitOfMeasure> offset = Literals.offsetUnit(signed.operand());
    if (offset.isPresent() && signed.operand() instanceof NumberExpression number) {
      return literals.quantity(number, signed.negative());
    }
    if (offset.isPresent()) {
      return misusedOffset(signed.span(), offset.get());
    }
    Optional<? extends Value> operand = value(signed.operand(), place);
    if (operand.isEmpty() || !signed.negative()) {
      return operand;
    }
    return Optional.of(
        switch (operand.get()) {
          case Quantity single -> negated(single);
          case MatrixValue matrix -> matrix.map(Resolver::negated, matrix.dimension());
        });
  }

  private static Quantity negated(Quantity q) {
    Quantity negated = q.map(Simplifier::negation, q.dimension(), q.depth() + 1);
    return new Quantity(
        negated.coefficients(), negated.constant(), negated.dimension(), q.zero(), negated.depth());
  }

  private Optional<? extends Value> sum(SumExpression sum, Place place) {
    List<Summand> summands = new ArrayList<>(sum.addends().size());
    Optional<? extends Value> first = Optional.empty();
    Span firstSpan = sum.span();
    boolean sound = true;
    boolean single = true;
    int zeroPoints = 0;
    for (Addend addend : sum.addends()) {
      Expression expression = addend.value();
      Optional<? extends Value> value = value(expression, place);
      sound &= value.isPresent();
      if (value.isEmpty() || !sound) {
        continue;
      }
      single &= value.get() instanceof Quantity;
      if (Literals.offsetUnit(expression).isPresent()) {
        zeroPoints += addend.subtracted() ? -1 : 1;
      }
      if (first.isEmpty() && !value.get().zero()) {
        first = value;
        firstSpan = expression.span();
      } else if (!value.get().zero()) {
        sound = fitsFirst(first.orElseThrow(), firstSpan, value.get(), expression, "added");
      }
      summands.add(new Summand(addend.subtracted(), value.get(), expression.span()));
    }
    if (Math.abs(zeroPoints) > 1) {
      problems.report(
          ProblemKind.UNIT_OFFSET,
          sum.span(),
          "Absolute temperatures cannot be added: write a difference with [K].");
      return Optional.empty();
    }
    Dimension dimension = first.map(Value::dimension).orElse(Dimension.NONE);
    if (!sound) {
      return Optional.empty();
    }
    return single ? Optional.of(singleSum(summands, dimension)) : matrices.sum(summands, dimension);
  }

  private Quantity singleSum(List<Summand> summands, Dimension dimension) {
    QuantitySum total = new QuantitySum();
    for (Summand summand : summands) {
      if (summand.value() instanceof Quantity quantity) {
        total.add(summand.subtracted(), quantity, frame.placed(summand.span()));
      }
    }
    return total.total(dimension);
  }

  /** Adds the body of a sum in each of its turns; without a turn it is 0, which fits all units. */
  private Optional<Quantity> indexedSum(IndexedSumExpression indexed, Place place) {
    Expression body = indexed.body();
    Optional<UnitOfMeasure> offset = Literals.offsetUnit(body);
    if (offset.isPresent()) {
      return misusedOffset(body.span(), offset.get());
    }
    QuantitySum total = new QuantitySum();
    List<Quantity> first = new ArrayList<>();
    boolean[] sound = {true};
    boolean known =
        loops.each(
            indexed.turns(),
            body.span(),
            () -> {
              Optional<Quantity> value = quantity(body, place);
              sound[0] = value.isPresent();
              if (sound[0] && !value.get().zero()) {
                if (first.isEmpty()) {
                  first.add(value.get());
                }
                sound[0] = fitsFirst(first.getFirst(), body.span(), value.get(), body, "added");
              }
              value.ifPresent(v -> total.add(false, v, frame.placed(body.span())));
              return sound[0];
            });
    if (!known || !sound[0]) {
      return Optional.empty();
    }
    return Optional.of(
        first.isEmpty()
            ? new Quantity(Map.of(), Quantity.Part.ZERO, Dimension.NONE, true, 1)
            : total.total(first.getFirst().dimension()));
  }

  /** Tells whether two values have one dimension; reports the second one if not. */
  boolean fitsFirst(Value first, Span firstSpan, Value value, Expression expression, String done) {
    if (first.dimension().equals(value.dimension())) {
      return true;
    }
    problems.report(
        ProblemKind.UNIT_MISMATCH,
        expression.span(),
        "\""
            + shown(expression.span())
            + "\" is "
            + in(value.dimension())
            + ", but \""
            + shown(firstSpan)
            + "\" is "
            + in(first.dimension())
            + ": only values of one dimension can be "
            + done
            + "; check the factors and their units.",
        unitFix(expression, first.dimension()));
    return false;
  }

  /** Offers a unit for a number that has none. */
  static Fix[] unitFix(Expression expression, Dimension dimension) {
    if (!Literals.isBare(expression) || dimension.isNone()) {
      return new Fix[0];
    }
    String code = UnitNames.describe(dimension);
    return new Fix[] {Fix.insert("Add [" + code + "]", expression.span().end(), " [" + code + "]")};
  }

  private Optional<? extends Value> product(ProductExpression product, Place place) {
    Optional<? extends Value> result = Optional.empty();
    Span statesAt = product.span();
    boolean sound = true;
    for (Factor factor : product.factors()) {
      Expression expression = factor.value();
      Optional<UnitOfMeasure> offset = Literals.offsetUnit(expression);
      Optional<? extends Value> value =
          offset.isPresent()
              ? misusedOffset(expression.span(), offset.get())
              : value(expression, place);
      sound &= value.isPresent();
      if (!sound) {
        continue;
      }
      Value right = value.orElseThrow();
      if (right.holdsStates() && factor.divides()) {
        sound = notLinear(product.span(), "the divisor " + holding(expression));
      } else if (right.holdsStates() && result.isPresent() && result.get().holdsStates()) {
        sound =
            notLinear(
                product.span(),
                "both \""
                    + shown(statesAt)
                    + "\" and \""
                    + shown(expression.span())
                    + "\" hold states");
      } else {
        statesAt = right.holdsStates() ? expression.span() : statesAt;
        result = result.isEmpty() ? value : times(result.get(), right, factor, product);
        sound = result.isPresent();
      }
    }
    return sound ? result : Optional.empty();
  }

  private Optional<? extends Value> times(
      Value left, Value right, Factor factor, ProductExpression product) {
    boolean divides = factor.divides();
    Optional<Dimension> dimension =
        divides
            ? bounded(left.dimension().over(right.dimension()), product.span())
            : bounded(left.dimension().times(right.dimension()), product.span());
    if (dimension.isEmpty()) {
      return Optional.empty();
    }
    return left instanceof Quantity a && right instanceof Quantity b
        ? times(a, b, divides, dimension.get(), product)
        : matrices.product(left, right, factor, dimension.get(), product);
  }

  private Optional<Quantity> times(
      Quantity left,
      Quantity right,
      boolean divides,
      Dimension dimension,
      ProductExpression product) {
    int depth = Math.max(left.depth(), right.depth()) + 1;
    Term a = left.constant().term();
    Term b = right.constant().term();
    if (divides && Simplifier.isZero(b)) {
      problems.report(
          ProblemKind.NUMBER_OUT_OF_RANGE,
          product.span(),
          "\"" + shown(product.span()) + "\" divides by 0: check the divisor.");
      return Optional.empty();
    }
    if (divides) {
      return Optional.of(left.map(t -> Simplifier.quotient(t, b), dimension, depth));
    }
    return Optional.of(
        right.holdsStates()
            ? right.map(t -> Simplifier.product(a, t), dimension, depth)
            : left.map(t -> Simplifier.product(t, b), dimension, depth));
  }

  private Optional<Quantity> power(PowerExpression power, Place place) {
    Optional<UnitOfMeasure> offset = Literals.offsetUnit(power.base());
    if (offset.isPresent()) {
      return misusedOffset(power.base().span(), offset.get());
    }
    Optional<Quantity> base = quantity(power.base(), place);
    Optional<Quantity> exponent = quantity(power.exponent(), place);
    if (base.isEmpty() || exponent.isEmpty()) {
      return Optional.empty();
    }
    if (base.get().holdsStates() || exponent.get().holdsStates()) {
      Expression guilty = base.get().holdsStates() ? power.base() : power.exponent();
      notLinear(power.span(), holding(guilty));
      return Optional.empty();
    }
    if (!fits(exponent.get(), Dimension.NONE, "1", power.exponent().span(), "an exponent")) {
      return Optional.empty();
    }
    Term b = base.get().constant().term();
    Term e = exponent.get().constant().term();
    int depth = Math.max(base.get().depth(), exponent.get().depth()) + 1;
    return dimensionOfPower(base.get().dimension(), e, power)
        .map(dimension -> Quantity.constant(Simplifier.power(b, e), dimension, depth));
  }

  private Optional<Dimension> dimensionOfPower(
      Dimension base, Term exponent, PowerExpression power) {
    if (base.isNone()) {
      return Optional.of(base);
    }
    if (!(exponent instanceof Term.Constant(double n))) {
      problems.report(
          ProblemKind.EXPONENT_NOT_CONSTANT,
          power.exponent().span(),
          "The base \""
              + shown(power.base().span())
              + "\" is "
              + in(base)
              + ", so the exponent must be a number as written, such as 2: otherwise the unit is"
              + " unknown.");
      return Optional.empty();
    }
    int[] exponents = base.exponents();
    for (int i = 0; i < exponents.length; i++) {
      double raised = exponents[i] * n;
      if (raised != Math.rint(raised)) {
        problems.report(
            ProblemKind.UNIT_MISMATCH,
            power.span(),
            "\""
                + shown(power.base().span())
                + "\" is "
                + in(base)
                + "; this power of it has no unit: check the exponent.");
        return Optional.empty();
      }
      exponents[i] = (int) Math.max(-1000, Math.min(1000, raised));
    }
    return bounded(new Dimension(exponents), power.span());
  }

  private Optional<Dimension> bounded(Dimension dimension, Span span) {
    for (int exponent : dimension.exponents()) {
      if (Math.abs(exponent) > DIMENSION_LIMIT) {
        problems.report(
            ProblemKind.NUMBER_OUT_OF_RANGE,
            span,
            "The unit of \""
                + shown(span)
                + "\" has an exponent beyond "
                + DIMENSION_LIMIT
                + ": check the powers.");
        return Optional.empty();
      }
    }
    return Optional.of(dimension);
  }

  private Optional<Quantity> misusedOffset(Span span, UnitOfMeasure unit) {
    problems.report(
        ProblemKind.UNIT_OFFSET,
        span,
        "\""
            + shown(span)
            + "\" is an absolute value on a scale with a zero point of its own and cannot be"
            + " multiplied, divided, raised to a power or negated: write a difference with ["
            + UnitNames.describe(unit.dimension())
            + "].");
    return Optional.empty();
  }

  boolean notLinear(Span span, String reason) {
    problems.report(
        ProblemKind.NOT_LINEAR,
        span,
        "\""
            + shown(span)
            + "\" is not linear in the states: "
            + reason
            + ". A state may be multiplied by numbers, parameters and functions of time only.");
    return false;
  }

  /** Says in a few words which state an expression holds. */
  String holding(Expression expression) {
    String text = "\"" + shown(expression.span()) + "\"";
    List<NameExpression> states =
        ExpressionNames.of(expression).stream().filter(names::isStateOrOutput).toList();
    if (states.isEmpty()) {
      return text + " holds a state";
    }
    String first = "\"" + shown(states.getFirst().span()) + "\"";
    return first.equals(text) ? text + " is a state" : text + " holds the state " + first;
  }

  /** Returns the text of a span, shortened to be quoted in a message. */
  String shown(Span span) {
    return Quotes.shortened(frame.slice(span));
  }

  static String in(Dimension dimension) {
    return dimension.isNone() ? "a pure number" : "in " + UnitNames.describe(dimension);
  }
}
