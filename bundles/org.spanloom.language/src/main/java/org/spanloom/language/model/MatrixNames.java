/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.spanloom.language.model.Meaning.MatrixMeaning;
import org.spanloom.language.problem.ProblemKind;
import org.spanloom.language.syntax.Expression;
import org.spanloom.language.syntax.Expression.CallExpression;
import org.spanloom.language.syntax.Expression.NameExpression;
import org.spanloom.language.units.Dimension;

/** Gives names of matrices in expressions their meaning. */
final class MatrixNames {

  private final NameResolver names;
  private final Resolver resolver;
  private final Scope scope;
  private final Problems problems;

  MatrixNames(NameResolver names, Resolver resolver, Scope scope, Problems problems) {
    this.names = names;
    this.resolver = resolver;
    this.scope = scope;
    this.problems = problems;
  }

  /** Returns a matrix, or its derivative, in a place where it may stand. */
  Optional<Value> value(MatrixMeaning meaning, NameExpression name, Place place) {
    if (meaning.value().holdsStates() && !place.states()) {
      problems.report(
          ProblemKind.STATE_MISPLACED,
          name.span(),
          "The matrix \""
              + name.label()
              + "\" holds states and cannot stand in "
              + place.what()
              + ".");
      return Optional.empty();
    }
    Optional<MatrixValue> value =
        name.primes() == 0 ? Optional.of(meaning.value()) : derivative(meaning.value(), name);
    return value.map(MatrixAlgebra::simplest);
  }

  /** A matrix whose entries are states has a derivative. */
  private Optional<MatrixValue> derivative(MatrixValue states, NameExpression name) {
    if (scope.timeName().isEmpty()) {
      return Optional.empty();
    }
    Dimension dimension = names.over(states.dimension(), name.primes());
    List<MatrixValue.Entry> entries = new ArrayList<>();
    for (MatrixValue.Entry entry : states.entries()) {
      Optional<StateKey> key = entry.value().single().filter(k -> k.at().isEmpty());
      if (key.isEmpty()) {
        problems.report(
            ProblemKind.NAME_MISUSED,
            name.span(),
            "\""
                + name.label()
                + "\": primes count derivatives of states, and not every entry of \""
                + name.name().text()
                + "\" is one: write the derivative out.");
        return Optional.empty();
      }
      StateKey raised = StateKey.running(key.get().state(), key.get().order() + name.primes());
      entries.add(
          new MatrixValue.Entry(entry.row(), entry.column(), Quantity.state(raised, dimension)));
    }
    return Optional.of(new MatrixValue(states.rows(), states.columns(), entries, dimension));
  }

  /** Returns the transpose of the one argument of a call. */
  Optional<Value> transposed(CallExpression call, Place place) {
    Expression argument = call.arguments().getFirst().value();
    return resolver.value(argument, place).map(resolver.matrices()::transposed);
  }
}
