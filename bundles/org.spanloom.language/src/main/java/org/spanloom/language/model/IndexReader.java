/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.OptionalLong;
import org.spanloom.language.model.Meaning.FamilyMeaning;
import org.spanloom.language.model.Meaning.StateMeaning;
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
import org.spanloom.language.units.UnitOfMeasure;

/**
 * Reads indices and the bounds of ranges: whole numbers that are fixed when the model is read, made
 * of numbers, indices and dimensionless constants.
 */
final class IndexReader {

  /** Whole numbers beyond this are not exact. */
  private static final double LARGEST = 0x1p53;

  private final Resolver resolver;
  private final Scope scope;
  private final Problems problems;

  /** Says that a problem was reported. */
  private static final double NONE = Double.NaN;

  IndexReader(Resolver resolver, Scope scope, Problems problems) {
    this.resolver = resolver;
    this.scope = scope;
    this.problems = problems;
  }

  /** Returns the value of an index or a bound; empty after a problem was reported. */
  OptionalLong whole(Expression expression) {
    double value = value(expression);
    if (Double.isNaN(value)) {
      return OptionalLong.empty();
    }
    if (value != Math.rint(value) || Math.abs(value) > LARGEST) {
      invalid(
          expression.span(),
          "is "
              + Times.number(value)
              + ", but an index is a whole number"
              + (Math.abs(value) > LARGEST ? " of at most 2^53" : "")
              + ": check it.");
      return OptionalLong.empty();
    }
    return OptionalLong.of((long) value);
  }

  /** Returns a member of a family; empty after a problem was reported. */
  Optional<StateMeaning> member(FamilyMeaning family, NameExpression name) {
    OptionalInt place = place(family.space(), name);
    return place.isEmpty() ? Optional.empty() : Optional.of(family.members().get(place.getAsInt()));
  }

  /**
   * Returns the place that the indices of a reference name, from 0, the last index running fastest;
   * empty after a problem was reported.
   */
  OptionalInt place(IndexSpace space, NameExpression name) {
    if (name.indices().size() != space.rank()) {
      String text = name.name().text();
      problems.report(
          ProblemKind.INDEX_INVALID,
          name.span(),
          "A member of \""
              + text
              + "\" has "
              + (space.rank() == 1 ? "one index" : "two indices")
              + ", as in "
              + text
              + space.shown(0)
              + ", not "
              + name.indices().size()
              + ".");
      return OptionalInt.empty();
    }
    int place = 0;
    for (int i = 0; i < space.rank(); i++) {
      OptionalLong value = whole(name.indices().get(i));
      if (value.isEmpty()) {
        return OptionalInt.empty();
      }
      if (!space.holds(i, value.getAsLong())) {
        reportOutOfRange(space, name, i, value.getAsLong());
        return OptionalInt.empty();
      }
      place = space.counted(place, i, value.getAsLong());
    }
    return OptionalInt.of(place);
  }

  /** Returns the member that a reference names, without reporting anything. */
  Optional<StateMeaning> quietMember(NameExpression name) {
    if (!(scope.own(name.name().text()).orElse(null) instanceof FamilyMeaning family)) {
      return Optional.empty();
    }
    return problems.quietly(() -> member(family, name));
  }

  private void reportOutOfRange(IndexSpace space, NameExpression name, int range, long value) {
    problems.report(
        ProblemKind.INDEX_OUT_OF_RANGE,
        name.span(),
        "The index "
            + value
            + " of \""
            + resolver.shown(name.span())
            + "\" lies outside of the range "
            + space.range(range)
            + " of \""
            + name.name().text()
            + "\": change the index, the bounds of the loop or the range.");
  }

  private double value(Expression expression) {
    return switch (expression) {
      case NumberExpression number -> number(number);
      case NameExpression name -> name(name);
      case SignedExpression signed ->
          signed.negative() ? 0.0 - value(signed.operand()) : value(signed.operand());
      case SumExpression sum -> sum(sum);
      case ProductExpression product -> product(product);
      case PowerExpression power -> StrictMath.pow(value(power.base()), value(power.exponent()));
      case ParenthesisedExpression parenthesised -> value(parenthesised.inner());
      case CallExpression call -> notConstant(call.span());
      case IndexedSumExpression sum -> notConstant(sum.span());
      case ChoiceExpression choice -> notConstant(choice.span());
      case MissingExpression missing -> NONE;
    };
  }

  private double number(NumberExpression number) {
    if (number.unit().isPresent()) {
      Span unit = number.unit().get().span();
      invalid(
          number.span(),
          "has a unit, but an index is a plain number: remove the unit.",
          Fix.replace(
              "Remove the unit",
              new Span(number.span().start() + number.digits().length(), unit.end()),
              ""));
      return NONE;
    }
    OptionalDouble value = resolver.literals().value(number);
    return value.orElse(NONE);
  }

  private double sum(SumExpression sum) {
    double total = 0;
    for (Addend addend : sum.addends()) {
      double value = value(addend.value());
      if (Double.isNaN(value)) {
        return NONE;
      }
      total += addend.subtracted() ? -value : value;
    }
    return total;
  }

  private double product(ProductExpression product) {
    double result = 1;
    for (Factor factor : product.factors()) {
      double value = value(factor.value());
      if (Double.isNaN(value)) {
        return NONE;
      }
      if (factor.divides() && value == 0) {
        invalid(product.span(), "divides by 0: check the divisor.");
        return NONE;
      }
      result = factor.divides() ? result / value : result * value;
    }
    return result;
  }

  private double name(NameExpression name) {
    if (name.isIndexed() || name.primes() > 0) {
      return notConstant(name.span());
    }
    Optional<Meaning> meaning = scope.use(name.name().text());
    if (meaning.isEmpty()) {
      return NamedConstant.named(name.name().text()).isPresent()
              || Function.named(name.name().text()).isPresent()
          ? notConstant(name.span())
          : unknown(name);
    }
    return switch (meaning.get()) {
      case Meaning.IndexMeaning index -> index.value();
      case Meaning.ParameterMeaning m when m.parameter().uncertainty().isPresent() -> {
        invalid(
            name.span(),
            "is an uncertain parameter, but an index is fixed when the model is read: declare a"
                + " parameter without uncertainty.");
        yield NONE;
      }
      case Meaning.ParameterMeaning m ->
          constant(name.span(), m.parameter().value(), m.parameter().unit());
      case Meaning.LetMeaning m when !m.let().dependsOnTime() ->
          constant(name.span(), m.let().value(), m.let().unit());
      case Meaning.LetMeaning m -> notConstant(name.span());
      case Meaning.TimeMeaning m -> notConstant(name.span());
      case StateMeaning m -> notConstant(name.span());
      case FamilyMeaning m -> notConstant(name.span());
      case Meaning.OutputMeaning m -> notConstant(name.span());
      case Meaning.MatrixMeaning m -> notConstant(name.span());
      case Meaning.BoundInputMeaning m -> notConstant(name.span());
      case Meaning.PartMeaning m -> notConstant(name.span());
      case Meaning.BrokenMeaning m -> NONE;
    };
  }

  private double unknown(NameExpression name) {
    resolver.unknown(name);
    return NONE;
  }

  private double constant(Span span, Term term, UnitOfMeasure unit) {
    if (unit.dimension().isNone()) {
      return TermEvaluator.constant(term);
    }
    invalid(
        span,
        "is "
            + Resolver.in(unit.dimension())
            + ", but an index is a plain number: divide by a value of the same dimension.");
    return NONE;
  }

  private double notConstant(Span span) {
    invalid(
        span,
        "cannot stand in an index, which is fixed when the model is read: use whole numbers,"
            + " indices of loops and dimensionless parameters.");
    return NONE;
  }

  private void invalid(Span span, String reason, Fix... fixes) {
    problems.report(
        ProblemKind.INDEX_INVALID, span, "\"" + resolver.shown(span) + "\" " + reason, fixes);
  }
}
