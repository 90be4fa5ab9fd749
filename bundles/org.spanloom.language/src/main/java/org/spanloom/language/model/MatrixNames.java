/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.spanloom.language.model.Meaning.FamilyMeaning;
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

  /**
   * Returns the members of a family, or their derivatives, as a column; those of a family with two
   * indices as a matrix.
   */
  Optional<Value> column(FamilyMeaning family, NameExpression name) {
    if (name.primes() > 0 && scope.timeName().isEmpty()) {
      return Optional.empty();
    }
    Dimension dimension = names.over(family.unit().dimension(), name.primes());
    int members = family.members().size();
    int columns = family.space().rank() == 1 ? 1 : (int) family.space().length(1);
    List<MatrixValue.Entry> entries = new ArrayList<>(members);
    for (int i = 0; i < members; i++) {
      StateKey key = StateKey.running(family.members().get(i).index(), name.primes());
      entries.add(new MatrixValue.Entry(i / columns, i % columns, Quantity.state(key, dimension)));
    }
    return Optional.of(
        MatrixAlgebra.simplest(new MatrixValue(members / columns, columns, entries, dimension)));
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
