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
import java.util.OptionalInt;
import java.util.Set;
import java.util.TreeMap;
import org.spanloom.language.model.Meaning.BrokenMeaning;
import org.spanloom.language.model.Meaning.StateMeaning;
import org.spanloom.language.problem.Fix;
import org.spanloom.language.problem.Nearest;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.syntax.Expression;
import org.spanloom.language.syntax.Expression.NameExpression;
import org.spanloom.language.syntax.Name;
import org.spanloom.language.syntax.Statement.TransferEnd;
import org.spanloom.language.syntax.Statement.TransferStatement;
import org.spanloom.language.text.Span;
import org.spanloom.language.units.Dimension;
import org.spanloom.language.units.UnitOfMeasure;

/**
 * Gives transfers their meaning: the rate of each amount is what enters it minus what leaves it.
 * One flow stands in both balances, so that nothing is lost on the way.
 */
final class TransferReader {

  private final SystemScope system;
  private final EquationReader equations;
  private final Map<Integer, Balance> balances = new TreeMap<>();
  private final List<Flow> flows = new ArrayList<>();

  /** What enters and leaves one state. */
  private static final class Balance {
    private final QuantitySum sum = new QuantitySum();
    private final Frame frame;
    private final Span first;

    Balance(Frame frame, Span first) {
      this.frame = frame;
      this.first = first;
    }
  }

  private record Flow(Frame frame, Quantity value, Span span) {}

  TransferReader(SystemScope system, EquationReader equations) {
    this.system = system;
    this.equations = equations;
  }

  /** Takes a transfer of a frame. */
  void read(Frame frame, TransferStatement transfer) {
    Optional<Quantity> flow = frame.resolver().quantity(transfer.flow(), Place.TRANSFER);
    Optional<StateMeaning> from = transfer.from().state().flatMap(end -> state(frame, end));
    Optional<StateMeaning> to = transfer.to().state().flatMap(end -> state(frame, end));
    boolean sound =
        from.isPresent() == transfer.from().state().isPresent()
            && to.isPresent() == transfer.to().state().isPresent();
    if (!sound
        || !leadsSomewhere(frame, transfer, from, to)
        || flow.isEmpty()
        || !fits(frame, transfer, from.or(() -> to).orElseThrow(), flow.get())) {
      equations.noteUnread(frame, names(transfer));
      return;
    }
    TransferDirection.reportReversed(frame, transfer);
    flows.add(new Flow(frame, flow.get(), transfer.flow().span()));
    from.ifPresent(state -> add(frame, transfer, state, true, flow.get()));
    to.ifPresent(state -> add(frame, transfer, state, false, flow.get()));
  }

  private void add(
      Frame frame, TransferStatement transfer, StateMeaning state, boolean leaves, Quantity flow) {
    balances
        .computeIfAbsent(state.index(), i -> new Balance(frame, transfer.span()))
        .sum
        .add(leaves, flow, frame.placed(transfer.flow().span()));
  }

  private static Set<String> names(TransferStatement transfer) {
    Set<String> names = new HashSet<>();
    for (TransferEnd end : List.of(transfer.from(), transfer.to())) {
      end.state().ifPresent(s -> names.add(s.name().text()));
    }
    if (names.isEmpty()) {
      // It may be meant for any state in the flow.
      ExpressionNames.of(transfer.flow()).forEach(n -> names.add(n.name().text()));
    }
    return names;
  }

  /** Hands the balances over to the equations. */
  void finish() {
    Set<Span> reported = new HashSet<>();
    for (Flow flow : flows) {
      for (StateKey key : flow.value().coefficients().keySet()) {
        if (key.order() > 0 && balances.containsKey(key.state()) && reported.add(flow.span())) {
          reportDerivative(flow, key);
        }
      }
    }
    balances.forEach((index, balance) -> {
      StateMeaning state = system.states().get(index);
      Dimension dimension = state.derivativeUnit(1).dimension();
      equations.addBalance(
          new ResolvedEquation(
              balance.frame,
              Quantity.state(StateKey.running(index, 1), dimension),
              balance.first,
              balance.sum.total(dimension),
              balance.first,
              OptionalInt.of(index),
              balance.first));
    });
  }

  private void reportDerivative(Flow flow, StateKey key) {
    String label = StateVector.label(system.states().get(key.state()), key.order());
    flow.frame()
        .problems()
        .report(
            ProblemKind.DERIVATIVE_MISPLACED,
            flow.span(),
            "\""
                + label
                + "\" follows from the transfers and cannot stand in the flow of one: write the"
                + " flow by states, parameters and functions of time.");
    equations.noteUnread();
  }

  private Optional<StateMeaning> state(Frame frame, NameExpression end) {
    Name name = end.name();
    Optional<Meaning> meaning = frame.resolver().names().meaning(end, Place.TRANSFER);
    if (meaning.isEmpty()) {
      reportUnknown(frame, name);
    } else if (meaning.get() instanceof StateMeaning state && end.primes() == 0) {
      return amount(frame, state, end);
    } else if (!(meaning.get() instanceof BrokenMeaning)) {
      frame
          .problems()
          .report(
              ProblemKind.NAME_MISUSED,
              end.span(),
              "\""
                  + frame.resolver().shown(end.span())
                  + "\" is "
                  + (end.primes() > 0 ? "a derivative" : meaning.get().kind())
                  + ": a transfer leads from a state to a state, or from or to outside.");
    }
    return Optional.empty();
  }

  private static Optional<StateMeaning> amount(
      Frame frame, StateMeaning state, NameExpression end) {
    if (state.unit().offset() == 0) {
      return Optional.of(state);
    }
    frame
        .problems()
        .report(
            ProblemKind.UNIT_OFFSET,
            end.span(),
            "\""
                + frame.resolver().shown(end.span())
                + "\" is in "
                + state.unit().code()
                + ", a unit with a zero point of its own, and so is no amount: write an equation"
                + " instead of transfers.");
    return Optional.empty();
  }

  private void reportUnknown(Frame frame, Name name) {
    Optional<String> nearest =
        frame.problems().maySuggest()
            ? Nearest.of(
                name.text(),
                system.states().stream().map(s -> s.declaredName()).distinct().toList())
            : Optional.empty();
    frame
        .problems()
        .report(
            ProblemKind.NAME_UNKNOWN,
            name.span(),
            "\""
                + Quotes.shortened(name.text())
                + "\" is not declared: "
                + nearest.map(n -> "did you mean " + n + "?").orElse("declare it as a state."),
            nearest.stream()
                .map(n -> Fix.replace("Write " + n, name.span(), n))
                .toArray(Fix[]::new));
  }

  private static boolean leadsSomewhere(
      Frame frame,
      TransferStatement transfer,
      Optional<StateMeaning> from,
      Optional<StateMeaning> to) {
    Span ends = transfer.from().span().join(transfer.to().span());
    if (from.isEmpty() && to.isEmpty()) {
      frame
          .problems()
          .report(
              ProblemKind.TRANSFER_INVALID,
              ends,
              "Both ends of this transfer are outside: name the state that it fills or empties.",
              TransferDirection.stateInFlow(frame, transfer));
      return false;
    }
    if (from.isEmpty() || to.isEmpty()) {
      return true;
    }
    if (from.get().index() == to.get().index()) {
      frame
          .problems()
          .report(
              ProblemKind.TRANSFER_INVALID,
              ends,
              "This transfer leads from \""
                  + from.get().name()
                  + "\" back to it and changes nothing: name another end.",
              Fix.replace("Lead to outside", transfer.to().span(), "outside"));
      return false;
    }
    UnitOfMeasure left = from.get().unit();
    UnitOfMeasure right = to.get().unit();
    if (!left.dimension().equals(right.dimension())) {
      frame
          .problems()
          .report(
              ProblemKind.UNIT_MISMATCH,
              ends,
              "What leaves one amount enters the other, but \""
                  + from.get().name()
                  + "\" is "
                  + Resolver.in(left.dimension())
                  + " and \""
                  + to.get().name()
                  + "\" is "
                  + Resolver.in(right.dimension())
                  + ": give both one dimension.");
      return false;
    }
    return true;
  }

  private static boolean fits(
      Frame frame, TransferStatement transfer, StateMeaning amount, Quantity flow) {
    UnitOfMeasure expected = amount.derivativeUnit(1);
    if (flow.zero()
        || frame.scope().timeName().isEmpty()
        || flow.dimension().equals(expected.dimension())) {
      return true;
    }
    Expression expression = transfer.flow();
    Fix[] fixes =
        Literals.isBare(expression)
            ? new Fix[] {
              Fix.insert(
                  "Add [" + expected.code() + "]",
                  expression.span().end(),
                  " [" + expected.code() + "]")
            }
            : new Fix[0];
    frame
        .problems()
        .report(
            ProblemKind.UNIT_MISMATCH,
            expression.span(),
            "\""
                + frame.resolver().shown(expression.span())
                + "\" is "
                + Resolver.in(flow.dimension())
                + ", but this flow is an amount over time, in "
                + expected.code()
                + ": check the factors and their units.",
            fixes);
    return false;
  }
}
