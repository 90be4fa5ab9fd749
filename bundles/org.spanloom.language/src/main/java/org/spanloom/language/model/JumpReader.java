/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.syntax.Statement.Change;
import org.spanloom.language.syntax.Statement.JumpStatement;
import org.spanloom.language.syntax.Statement.JumpTime;
import org.spanloom.language.text.Span;

/** Reads jumps. */
final class JumpReader {

  private final Components components;
  private final Times times;
  private final List<Jump> jumps = new ArrayList<>();
  private long count;

  JumpReader(Components components, Times times) {
    this.components = components;
    this.times = times;
  }

  /** Returns the jumps that have a meaning, in the order of the text. */
  List<Jump> jumps() {
    return jumps;
  }

  /** Takes a jump of a frame. */
  void read(Frame frame, JumpStatement statement) {
    Optional<JumpTimes> when = times(frame, statement.time());
    Optional<List<Jump.Change>> changes = changes(frame, statement);
    if (when.isEmpty() || changes.isEmpty() || !times.isKnown()) {
      return;
    }
    if (fewEnough(frame, when.get(), statement.time().span())
        && areDefined(when.get(), changes.get())) {
      jumps.add(
          new Jump(
              when.get(),
              changes.get(),
              frame.placed(statement.time().span()),
              frame.placed(statement.span())));
    }
  }

  private Optional<JumpTimes> times(Frame frame, JumpTime stated) {
    return switch (stated) {
      case JumpTime.Once once -> times.time(frame, once.time()).map(JumpTimes.Once::new);
      case JumpTime.Repeated repeated -> repeated(frame, repeated);
    };
  }

  private Optional<JumpTimes> repeated(Frame frame, JumpTime.Repeated stated) {
    Optional<Term> period =
        frame
            .resolver()
            .given(stated.period(), frame.timeUnit(), "the independent variable", Place.PERIOD)
            .map(q -> q.constant().term());
    Optional<Term> first = times.time(frame, stated.first());
    Optional<Term> last = times.time(frame, stated.last());
    if (period.isEmpty() || first.isEmpty() || last.isEmpty()) {
      return Optional.empty();
    }
    double step = TermEvaluator.constant(period.get());
    if (!(step > 0) || Double.isInfinite(step)) {
      return invalid(
          frame, stated.period().span(), "A period is positive and finite: check its value.");
    }
    if (TermEvaluator.constant(first.get()) > TermEvaluator.constant(last.get())) {
      return invalid(
          frame,
          stated.first().span().join(stated.last().span()),
          "The first jump lies behind the last one: the times behind \"from\" and \"to\" ascend.");
    }
    return Optional.of(new JumpTimes.Repeated(period.get(), first.get(), last.get()));
  }

  private boolean fewEnough(Frame frame, JumpTimes when, Span span) {
    long more = when.count(Map.of());
    if (more <= JumpTimes.LIMIT - count) {
      count += more;
      return true;
    }
    invalid(
        frame,
        span,
        "The jumps of a system take place at most "
            + JumpTimes.LIMIT
            + " times, and here are "
            + (more > 1_000_000_000L ? "more than 1000000000" : String.valueOf(count + more))
            + ": choose a longer period or a shorter range.");
    return false;
  }

  private Optional<List<Jump.Change>> changes(Frame frame, JumpStatement statement) {
    List<Jump.Change> changes = new ArrayList<>();
    Set<Integer> changed = new HashSet<>();
    boolean[] allSound = {statement.allRead()};
    boolean turnsKnown =
        frame
            .resolver()
            .loops()
            .lines(
                statement.changes(), line -> allSound[0] &= change(frame, line, changes, changed));
    boolean sound = allSound[0] && turnsKnown;
    if (sound && changes.isEmpty()) {
      invalid(
          frame,
          statement.header(),
          "This jump changes nothing: write a line such as \"x becomes x + 1\" in its braces.");
      return Optional.empty();
    }
    return sound ? Optional.of(changes) : Optional.empty();
  }

  /** Takes a line, for each member of a family without an index; returns false if it is wrong. */
  private boolean change(
      Frame frame, Change line, List<Jump.Change> changes, Set<Integer> changed) {
    List<StateComponent> targets = components.find(frame, line.target());
    for (StateComponent component : targets) {
      if (!changed.add(component.index())) {
        invalid(
            frame,
            line.target().span(),
            "\""
                + component.label()
                + "\" becomes two values in this jump: all lines of a jump take place at once;"
                + " remove one.");
        return false;
      }
    }
    Optional<AffineValue> value =
        targets.isEmpty() ? Optional.empty() : value(frame, targets.getFirst(), line);
    value.ifPresent(v ->
        targets.forEach(
            c -> changes.add(new Jump.Change(c.index(), v, frame.placed(line.span())))));
    return value.isPresent();
  }

  /** Returns what a component becomes; a lone number takes its unit. */
  private Optional<AffineValue> value(Frame frame, StateComponent component, Change line) {
    String what = "the state " + component.label();
    Resolver resolver = frame.resolver();
    Optional<Quantity> value =
        Literals.isBare(line.value())
            ? resolver.given(line.value(), component.unit(), what, Place.JUMP)
            : resolver
                .quantity(line.value(), Place.JUMP)
                .filter(q ->
                    resolver.fits(
                        q,
                        component.unit().dimension(),
                        component.unit().code(),
                        line.value().span(),
                        what));
    return value.flatMap(q -> components.affine(frame, q, component.unit(), line.value().span()));
  }

  /** Tells whether every number in the lines is finite at every time of the jump. */
  private boolean areDefined(JumpTimes when, List<Jump.Change> changes) {
    double[] at = when.times(times.unit(), Map.of());
    boolean defined = true;
    for (Jump.Change change : changes) {
      List<Term> terms = new ArrayList<>();
      change.value().samples().forEach(s -> terms.add(s.coefficient()));
      terms.add(change.value().constant());
      defined &= terms.stream().allMatch(term -> isDefined(term, at, change.value().span()));
    }
    return defined;
  }

  private boolean isDefined(Term term, double[] at, Span span) {
    if (term instanceof Term.Constant(double value) && Double.isFinite(value)) {
      return true;
    }
    TermEvaluator evaluator = TermEvaluator.of(term);
    boolean constant = TimeDependence.of(term) != TimeDependence.TIME;
    for (double time : at) {
      if (!Double.isFinite(evaluator.at(times.unit().toBase(time)))) {
        times
            .problems()
            .report(
                ProblemKind.COEFFICIENT_UNDEFINED,
                span,
                "\""
                    + times.shown(span)
                    + "\" has no finite value"
                    + (constant
                        ? ""
                        : " when the jump takes place at "
                            + times.name()
                            + " = "
                            + Times.number(time)
                            + times.unitText())
                    + ": check its divisors, roots and logarithms.");
        return false;
      }
      if (constant) {
        break;
      }
    }
    return true;
  }

  private static <T> Optional<T> invalid(Frame frame, Span span, String message) {
    frame.problems().report(ProblemKind.JUMP_INVALID, span, message);
    return Optional.empty();
  }
}
