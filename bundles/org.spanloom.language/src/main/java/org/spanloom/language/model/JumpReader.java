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

  private final SystemScope system;
  private final Components components;
  private final Times times;
  private final Problems problems;
  private final List<Jump> jumps = new ArrayList<>();
  private long count;

  JumpReader(SystemScope system, Components components, Times times) {
    this.system = system;
    this.components = components;
    this.times = times;
    this.problems = system.problems();
  }

  /** Returns the jumps that have a meaning, in the order of the text. */
  List<Jump> jumps() {
    return jumps;
  }

  void read(JumpStatement statement) {
    Optional<JumpTimes> when = times(statement.time());
    Optional<List<Jump.Change>> changes = changes(statement);
    if (when.isEmpty() || changes.isEmpty() || !times.isKnown()) {
      return;
    }
    if (fewEnough(when.get(), statement.time().span()) && areDefined(when.get(), changes.get())) {
      jumps.add(new Jump(when.get(), changes.get(), statement.time().span(), statement.span()));
    }
  }

  private Optional<JumpTimes> times(JumpTime stated) {
    return switch (stated) {
      case JumpTime.Once once -> times.time(once.time()).map(JumpTimes.Once::new);
      case JumpTime.Repeated repeated -> repeated(repeated);
    };
  }

  private Optional<JumpTimes> repeated(JumpTime.Repeated stated) {
    Optional<Term> period =
        system
            .resolver()
            .given(stated.period(), times.unit(), "the independent variable", Place.PERIOD)
            .map(q -> q.constant().term());
    Optional<Term> first = times.time(stated.first());
    Optional<Term> last = times.time(stated.last());
    if (period.isEmpty() || first.isEmpty() || last.isEmpty()) {
      return Optional.empty();
    }
    double step = TermEvaluator.constant(period.get());
    if (!(step > 0) || Double.isInfinite(step)) {
      return invalid(stated.period().span(), "A period is positive and finite: check its value.");
    }
    if (TermEvaluator.constant(first.get()) > TermEvaluator.constant(last.get())) {
      return invalid(
          stated.first().span().join(stated.last().span()),
          "The first jump lies behind the last one: the times behind \"from\" and \"to\" ascend.");
    }
    return Optional.of(new JumpTimes.Repeated(period.get(), first.get(), last.get()));
  }

  private boolean fewEnough(JumpTimes when, Span span) {
    long more = when.count(Map.of());
    if (more <= JumpTimes.LIMIT - count) {
      count += more;
      return true;
    }
    invalid(
        span,
        "The jumps of a system take place at most "
            + JumpTimes.LIMIT
            + " times, and here are "
            + (more > 1_000_000_000L ? "more than 1000000000" : String.valueOf(count + more))
            + ": choose a longer period or a shorter range.");
    return false;
  }

  private Optional<List<Jump.Change>> changes(JumpStatement statement) {
    List<Jump.Change> changes = new ArrayList<>();
    Set<Integer> changed = new HashSet<>();
    boolean sound = statement.allRead();
    for (Change line : statement.changes()) {
      Optional<StateComponent> component = components.find(system.root(), line.target());
      if (component.isPresent() && !changed.add(component.get().index())) {
        invalid(
            line.target().span(),
            "\""
                + component.get().label()
                + "\" becomes two values in this jump: all lines of a jump take place at once;"
                + " remove one.");
        sound = false;
        continue;
      }
      Optional<AffineValue> value = component.flatMap(c -> value(c, line));
      component
          .flatMap(c -> value.map(v -> new Jump.Change(c.index(), v, line.span())))
          .ifPresent(changes::add);
      sound &= value.isPresent();
    }
    if (sound && changes.isEmpty()) {
      invalid(
          statement.header(),
          "This jump changes nothing: write a line such as \"x becomes x + 1\" in its braces.");
      return Optional.empty();
    }
    return sound ? Optional.of(changes) : Optional.empty();
  }

  /** Returns what a component becomes; a lone number takes its unit. */
  private Optional<AffineValue> value(StateComponent component, Change line) {
    String what = "the state " + component.label();
    Resolver resolver = system.resolver();
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
    return value.flatMap(
        q -> components.affine(system.root(), q, component.unit(), line.value().span()));
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
        problems.report(
            ProblemKind.COEFFICIENT_UNDEFINED,
            span,
            "\""
                + system.resolver().shown(span)
                + "\" has no finite value"
                + (constant
                    ? ""
                    : " when the jump takes place at "
                        + system.scope().timeName()
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

  private <T> Optional<T> invalid(Span span, String message) {
    problems.report(ProblemKind.JUMP_INVALID, span, message);
    return Optional.empty();
  }
}
