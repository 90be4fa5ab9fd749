/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.Locale;
import java.util.Optional;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.syntax.Expression;
import org.spanloom.language.syntax.Expression.NumberExpression;
import org.spanloom.language.syntax.OverClause;
import org.spanloom.language.syntax.OverClause.Bound;
import org.spanloom.language.text.Span;
import org.spanloom.language.units.UnitOfMeasure;

/** Reads the interval of a system and times inside it. */
final class Times {

  private final SystemScope system;
  private final Problems problems;
  private final UnitOfMeasure unit;
  private final TimeInterval interval;
  private final boolean known;
  private final boolean unitKnown;

  Times(SystemScope system, Optional<OverClause> stated, boolean unitKnown) {
    this.system = system;
    this.problems = system.problems();
    this.unit = system.timeUnit();
    this.unitKnown = unitKnown;
    Optional<OverClause> over = unitKnown ? stated : Optional.empty();
    Optional<Double> start = over.flatMap(OverClause::start).flatMap(this::bound);
    Optional<Double> end = over.flatMap(OverClause::end).flatMap(this::bound);
    boolean startMissing = over.flatMap(OverClause::start).isEmpty();
    boolean endMissing = over.flatMap(OverClause::end).isEmpty();
    this.interval =
        new TimeInterval(
            start.orElse(Double.NEGATIVE_INFINITY),
            startMissing || over.flatMap(OverClause::start).get().open(),
            end.orElse(Double.POSITIVE_INFINITY),
            endMissing || over.flatMap(OverClause::end).get().open());
    boolean read =
        over.isPresent() && start.isPresent() != startMissing && end.isPresent() != endMissing;
    boolean empty = read && interval.start() >= interval.end();
    if (empty) {
      problems.report(
          ProblemKind.INTERVAL_EMPTY,
          over.get().start().get().span().join(over.get().end().get().span()),
          "The interval from "
              + number(interval.start())
              + " to "
              + number(interval.end())
              + " is empty: the right end must lie behind the left one.");
    }
    this.known = read && !empty;
  }

  /** Returns the interval; the whole line where it could not be read. */
  TimeInterval interval() {
    return interval;
  }

  /** Tells whether the interval could be read and is not empty. */
  boolean isKnown() {
    return known;
  }

  UnitOfMeasure unit() {
    return unit;
  }

  private Optional<Double> bound(Bound bound) {
    Expression expression = bound.value();
    Optional<Quantity> value =
        system.resolver().given(expression, unit, "the independent variable", Place.INTERVAL);
    if (value.isEmpty()) {
      return Optional.empty();
    }
    if (!(value.get().constant().term() instanceof Term.Constant(double base))) {
      problems.report(
          ProblemKind.INTERVAL_NOT_CONSTANT,
          expression.span(),
          "The ends of the interval are fixed when the model is read: write a number instead of \""
              + system.resolver().shown(expression.span())
              + "\".");
      return Optional.empty();
    }
    // A number in the declared unit stays exactly as written.
    boolean asWritten = Literals.isBare(expression) || isInTimeUnit(expression);
    return Optional.of(
        asWritten
            ? system.resolver().literals().signedValue(expression).orElseThrow()
            : unit.fromBase(base));
  }

  private boolean isInTimeUnit(Expression expression) {
    return Literals.alone(expression)
        .flatMap(NumberExpression::unit)
        .filter(u -> u.code().equals(unit.code()))
        .isPresent();
  }

  /** Returns a time inside the interval in coherent SI units. */
  Optional<Term> time(Expression expression) {
    return time(system.root(), expression);
  }

  /** Returns a time that stands in a statement of a frame, in whose unit of time a number is. */
  Optional<Term> time(Frame frame, Expression expression) {
    if (!unitKnown) {
      return Optional.empty();
    }
    return frame
        .resolver()
        .given(expression, frame.timeUnit(), "the independent variable", Place.NAMED_TIME)
        .map(q -> q.constant().term())
        .filter(t -> isInside(frame, t, expression.span()));
  }

  /** Returns where problems of the system's own statements go. */
  Problems problems() {
    return problems;
  }

  /** Returns the name of the independent variable. */
  String name() {
    return system.scope().timeName();
  }

  /** Returns the text at a place of the file being read, shortened to be quoted in a message. */
  String shown(Span placed) {
    return system.resolver().shown(placed);
  }

  /** Tells whether a time lies inside the interval, parameters as declared; reports it if not. */
  boolean isInside(Term time, Span span) {
    return isInside(system.root(), time, span);
  }

  private boolean isInside(Frame frame, Term time, Span span) {
    double base = TermEvaluator.constant(time);
    if (!Double.isFinite(base)) {
      frame
          .problems()
          .report(
              ProblemKind.NUMBER_OUT_OF_RANGE,
              span,
              "The time \""
                  + frame.resolver().shown(span)
                  + "\" is not a finite number: check it.");
      return false;
    }
    double left = unit.toBase(interval.start());
    double right = unit.toBase(interval.end());
    boolean inside =
        (interval.startOpen() ? base > left : base >= left)
            && (interval.endOpen() ? base < right : base <= right);
    if (known && !inside) {
      frame
          .problems()
          .report(
              ProblemKind.TIME_OUTSIDE_INTERVAL,
              span,
              "The time "
                  + number(unit.fromBase(base))
                  + unitText()
                  + " lies outside of the interval "
                  + shown()
                  + ": choose one inside or widen the interval.");
      return false;
    }
    return true;
  }

  /** Returns the unit of time in brackets, a blank before it; nothing for a pure number. */
  String unitText() {
    return unit.equals(UnitOfMeasure.ONE) ? "" : " [" + unit.code() + "]";
  }

  /** Returns the interval as people write it, for example {@code from 0 to 48 [h]}. */
  String shown() {
    String left =
        Double.isInfinite(interval.start())
            ? ""
            : (interval.startOpen() ? "after " : "from ") + number(interval.start());
    String right =
        Double.isInfinite(interval.end())
            ? ""
            : (interval.endOpen() ? "before " : "to ") + number(interval.end());
    String both = left.isEmpty() || right.isEmpty() ? left + right : left + " " + right;
    return both.isEmpty() ? "without ends" : both + unitText();
  }

  /** Returns the time at which initial values stand that name none, if there is one. */
  Optional<Term> initialTime() {
    return known && !interval.startOpen()
        ? Optional.of(new Term.Constant(unit.toBase(interval.start())))
        : Optional.empty();
  }

  /** Returns a number with at most 10 significant digits. */
  static String number(double value) {
    if (value == Math.rint(value) && Math.abs(value) < 1e10) {
      return String.valueOf((long) value);
    }
    String text = String.format(Locale.ROOT, "%.10g", value);
    int exponent = text.indexOf('e');
    String digits = exponent < 0 ? text : text.substring(0, exponent);
    String tail = exponent < 0 ? "" : text.substring(exponent);
    if (digits.indexOf('.') >= 0) {
      digits = digits.replaceAll("0+$", "").replaceAll("\\.$", "");
    }
    return digits + tail;
  }
}
