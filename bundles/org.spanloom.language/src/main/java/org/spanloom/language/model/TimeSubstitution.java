/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayList;
import java.util.IdentityHashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.spanloom.language.model.Quantity.Part;

/** Puts a named time in the place of the running time. */
final class TimeSubstitution {

  private final Term at;
  private final Map<Term, Term> done = new IdentityHashMap<>();
  private final Map<Let, Term> lets = new IdentityHashMap<>();

  private TimeSubstitution(Term at) {
    this.at = at;
  }

  /** Returns an output's value at a named time. */
  static Quantity of(Quantity quantity, Term at, boolean before) {
    TimeSubstitution substitution = new TimeSubstitution(at);
    Map<StateKey, Part> coefficients = new LinkedHashMap<>();
    quantity
        .coefficients()
        .forEach((key, part) ->
            coefficients.put(
                new StateKey(key.state(), key.order(), Optional.of(at), before),
                part.map(substitution::in)));
    return new Quantity(
            coefficients,
            quantity.constant().map(substitution::in),
            quantity.dimension(),
            quantity.zero(),
            quantity.depth() + 1)
        .inherited();
  }

  private Term in(Term term) {
    Term known = done.get(term);
    if (known == null) {
      known = compute(term);
      done.put(term, known);
    }
    return known;
  }

  private Term compute(Term term) {
    return switch (term) {
      case Term.Constant c -> c;
      case Term.ParameterTerm p -> p;
      case Term.Time t -> at;
      case Term.LetTerm(Let let) -> let.dependsOnTime() ? let(let) : term;
      case Term.Sum(Term a, Term b) -> Simplifier.sum(in(a), in(b));
      case Term.Difference(Term a, Term b) -> Simplifier.difference(in(a), in(b));
      case Term.Product(Term a, Term b) -> Simplifier.product(in(a), in(b));
      case Term.Quotient(Term a, Term b) -> Simplifier.quotient(in(a), in(b));
      case Term.Negation(Term a) -> Simplifier.negation(in(a));
      case Term.Power(Term a, Term b) -> Simplifier.power(in(a), in(b));
      case Term.Switch(Term gap, boolean atZero, Term a, Term b) ->
          Simplifier.choice(in(gap), atZero, in(a), in(b));
      case Term.Pulse(Term time, Term period, Term width, Term start) ->
          Simplifier.pulse(in(time), period, width, start);
      case Term.CurveTerm(String name, PiecewiseCurve curve, Term time) ->
          Simplifier.curve(name, curve, in(time));
      case Term.FunctionTerm(Function function, List<Term> arguments) -> {
        List<Term> changed = new ArrayList<>();
        arguments.forEach(a -> changed.add(in(a)));
        yield Simplifier.call(function, changed);
      }
    };
  }

  private Term let(Let let) {
    Term known = lets.get(let);
    if (known == null) {
      known = in(let.value());
      lets.put(let, known);
    }
    return known;
  }
}
