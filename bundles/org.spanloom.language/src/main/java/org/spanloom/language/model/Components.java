/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.spanloom.language.model.AffineValue.Sample;
import org.spanloom.language.model.Meaning.FamilyMeaning;
import org.spanloom.language.model.Meaning.StateMeaning;
import org.spanloom.language.problem.Fix;
import org.spanloom.language.problem.Nearest;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.syntax.Expression;
import org.spanloom.language.syntax.Expression.NameExpression;
import org.spanloom.language.syntax.Statement.StateStatement;
import org.spanloom.language.text.Span;
import org.spanloom.language.units.UnitOfMeasure;

/** The components of a system's state vector with their declarations. */
final class Components {

  private final SystemScope system;
  private final StateVector vector;
  private final List<StateComponent> list = new ArrayList<>();
  private final List<Optional<StateStatement>> declarations = new ArrayList<>();
  private final List<Frame> frames = new ArrayList<>();
  private final Map<String, Integer> indices = new HashMap<>();

  /** Scales by their expressions; all members of a family share one. */
  private final SharedValues<Double> scales = new SharedValues<>();

  Components(SystemScope system, StateVector vector, LinearFormBuilder equations) {
    this.system = system;
    this.vector = vector;
    for (StateMeaning state : vector.states()) {
      for (int k = 0; k < vector.order(state.index()); k++) {
        add(state, k, equations.governing(state));
      }
    }
  }

  private void add(StateMeaning state, int primes, Span equation) {
    String label = StateVector.label(state, primes);
    String family = state.declaredName();
    Optional<SystemScope.Derivative> derivative =
        primes == 0 ? Optional.empty() : system.derivative(family + "'".repeat(primes));
    Frame frame = state.frame();
    Optional<StateStatement> declaration =
        primes == 0
            ? Optional.of(state.statement())
            : derivative.map(SystemScope.Derivative::statement);
    UnitOfMeasure unit =
        derivative.map(SystemScope.Derivative::unit).orElseGet(() -> state.derivativeUnit(primes));
    Span declared = frame.placed(declaration.orElse(state.statement()).span());
    boolean highest = primes == vector.order(state.index()) - 1;
    indices.put(label, list.size());
    list.add(
        new StateComponent(
            list.size(),
            label,
            family,
            primes,
            unit,
            declaration
                .flatMap(StateStatement::scale)
                .flatMap(s -> scales.of(frame, s, () -> scale(frame, s, unit)))
                .orElse(1.0),
            declaration.map(StateStatement::documentation).orElse(""),
            declared,
            highest ? equation : declared));
    declarations.add(declaration);
    frames.add(frame);
  }

  private static Optional<Double> scale(Frame frame, Expression expression, UnitOfMeasure unit) {
    Optional<Quantity> value =
        frame.resolver().givenDifference(expression, unit, "the state", Place.SCALE);
    if (value.isEmpty()) {
      return Optional.empty();
    }
    boolean plain = value.get().constant().term() instanceof Term.Constant;
    double size = plain ? TermEvaluator.constant(value.get().constant().term()) / unit.factor() : 0;
    if (!(size > 0) || Double.isInfinite(size)) {
      frame
          .problems()
          .report(
              ProblemKind.SCALE_NOT_POSITIVE,
              expression.span(),
              "A scale is a positive number in the unit of the state: \""
                  + frame.resolver().shown(expression.span())
                  + "\" is not.");
      return Optional.empty();
    }
    return Optional.of(size);
  }

  int dimension() {
    return list.size();
  }

  List<StateComponent> list() {
    return list;
  }

  StateComponent get(int index) {
    return list.get(index);
  }

  /** Returns the statement that declares a component itself; empty for a derivative without one. */
  Optional<StateStatement> declaration(int index) {
    return declarations.get(index);
  }

  /** Returns where the state of a component was declared. */
  Frame frame(int index) {
    return frames.get(index);
  }

  /** Returns the initial value that the declaration of a component or its part gives. */
  Optional<Binding> initial(int index) {
    StateComponent component = list.get(index);
    Frame frame = frames.get(index);
    // A part gives a family one value, for all of its members.
    String declared = component.name().substring(component.name().lastIndexOf('.') + 1);
    return frame
        .binding(declared + "'".repeat(component.order()))
        .or(() ->
            declarations
                .get(index)
                .flatMap(StateStatement::initial)
                .map(value -> new Binding(frame, value)));
  }

  /** Returns the labels of some components for a message. */
  String labels(List<Integer> some) {
    List<String> labels =
        some.stream().limit(5).map(i -> "\"" + list.get(i).label() + "\"").toList();
    return String.join(", ", labels)
        + (some.size() > 5 ? " and " + (some.size() - 5) + " more" : "");
  }

  /**
   * Returns some components as they can be named, a family of which all are there by its name with
   * primes.
   */
  List<String> shortest(List<Integer> some) {
    Set<Integer> wanted = new HashSet<>(some);
    List<String> names = new ArrayList<>();
    Map<String, Boolean> whole = new HashMap<>();
    for (int index : some) {
      StateComponent component = list.get(index);
      String name = component.name() + "'".repeat(component.order());
      boolean first = !whole.containsKey(name);
      boolean all = whole.computeIfAbsent(name, n -> isWhole(component, wanted));
      if (first || !all) {
        names.add(all ? name : component.label());
      }
    }
    return names;
  }

  private boolean isWhole(StateComponent component, Set<Integer> wanted) {
    return system.members(component.name()).stream()
        .map(s -> StateKey.running(s.index(), component.order()))
        .allMatch(k -> vector.isComponent(k) && wanted.contains(vector.component(k)));
  }

  /** Returns the component that a reference names, without reporting anything. */
  Optional<StateComponent> quietly(NameExpression name) {
    return system.problems().quietly(() -> find(system.root(), name)).stream().findFirst();
  }

  /** Returns the component of a name with primes, without reporting anything. */
  Optional<StateComponent> labelled(String label) {
    return Optional.ofNullable(indices.get(label)).map(list::get);
  }

  /**
   * Returns the components that a reference names: one, or that of each member for a family without
   * an index. Reports it and returns none if there is no such component.
   */
  List<StateComponent> find(Frame frame, NameExpression name) {
    Optional<Meaning> meaning = frame.scope().own(name.name().text());
    if (name.isIndexed() || meaning.isPresent() && meaning.get() instanceof FamilyMeaning) {
      return findMembers(frame, name, meaning);
    }
    Integer index = indices.get(frame.label(name.label()));
    if (index == null) {
      reportNoComponent(frame, name, meaning);
      return List.of();
    }
    return List.of(list.get(index));
  }

  private List<StateComponent> findMembers(
      Frame frame, NameExpression name, Optional<Meaning> meaning) {
    List<StateMeaning> members = List.of();
    if (!name.isIndexed() && meaning.isPresent() && meaning.get() instanceof FamilyMeaning family) {
      members = family.members();
    } else if (meaning.isEmpty() || meaning.get() instanceof Meaning.BrokenMeaning) {
      reportNoComponent(frame, name, meaning);
    } else if (frame.resolver().names().meaning(name, Place.OUTPUT).orElseThrow()
        instanceof StateMeaning member) {
      members = List.of(member);
    }
    List<StateComponent> found = new ArrayList<>();
    for (StateMeaning member : members) {
      StateKey key = StateKey.running(member.index(), name.primes());
      if (!vector.isComponent(key)) {
        reportNoComponent(frame, name, meaning);
        return List.of();
      }
      found.add(list.get(vector.component(key)));
    }
    return found;
  }

  private void reportNoComponent(Frame frame, NameExpression name, Optional<Meaning> meaning) {
    boolean broken =
        meaning.isPresent() && meaning.get() instanceof Meaning.BrokenMeaning
            || system.derivative(frame.label(name.label())).isPresent();
    if (!broken) {
      Optional<String> nearest =
          !name.isIndexed() && system.problems().maySuggest()
              ? Nearest.of(name.label(), list.stream().map(StateComponent::label).toList())
              : Optional.empty();
      system
          .problems()
          .report(
              meaning.isPresent() ? ProblemKind.NAME_MISUSED : ProblemKind.NAME_UNKNOWN,
              name.span(),
              "\""
                  + system.resolver().shown(name.span())
                  + "\" is no component of the state vector"
                  + nearest
                      .map(n -> ": did you mean " + n + "?")
                      .orElse(": name a state, with fewer primes than its equation has."),
              nearest.stream()
                  .map(n -> Fix.replace("Write " + n, name.span(), n))
                  .toArray(Fix[]::new));
    }
  }

  /**
   * Returns a quantity over the components; reports a derivative that is none of them.
   *
   * @param frame where it was read
   * @param span its place in the frame's text
   * @param unit the unit to show it in
   */
  Optional<AffineValue> affine(Frame frame, Quantity quantity, UnitOfMeasure unit, Span span) {
    List<Sample> samples = new ArrayList<>();
    for (Map.Entry<StateKey, Quantity.Part> entry : quantity.coefficients().entrySet()) {
      StateKey key = entry.getKey();
      if (!vector.isComponent(key)) {
        reportDerivative(frame, key, span);
        return Optional.empty();
      }
      samples.add(
          new Sample(vector.component(key), key.at(), key.before(), entry.getValue().term()));
    }
    samples.sort(Comparator.comparingInt(Sample::component));
    return Optional.of(
        new AffineValue(
            samples, quantity.constant().term(), quantity.dimension(), unit, frame.placed(span)));
  }

  private void reportDerivative(Frame frame, StateKey key, Span span) {
    StateMeaning state = vector.states().get(key.state());
    String found = StateVector.label(state, key.order());
    frame
        .problems()
        .report(
            ProblemKind.DERIVATIVE_MISPLACED,
            span,
            "\""
                + found
                + "\" is no component of the state vector, since the equations give it: write what"
                + " they say it is instead.");
  }
}
