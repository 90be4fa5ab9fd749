/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.model;

import java.util.List;
import java.util.Optional;
import org.spanloom.language.syntax.Expression;
import org.spanloom.language.syntax.Expression.CallExpression;
import org.spanloom.language.syntax.Expression.NameExpression;
import org.spanloom.language.units.UnitOfMeasure;

/** What requirements and boundary conditions ask about the names in their expressions. */
final class NamedValues {

  private final SystemScope system;
  private final Components components;
  private final Times times;

  NamedValues(SystemScope system, Components components, Times times) {
    this.system = system;
    this.components = components;
    this.times = times;
  }

  /**
   * Tells whether all times named behind states and outputs lie inside; reports those that do not.
   */
  boolean timesInside(List<Expression> expressions) {
    boolean inside = true;
    for (Expression expression : expressions) {
      for (CallExpression call : ExpressionNames.calls(expression)) {
        if (isSample(call)) {
          inside &= times.time(call.arguments().getFirst().value()).isPresent();
        }
      }
    }
    return inside;
  }

  private boolean isSample(CallExpression call) {
    boolean sampled =
        system
            .scope()
            .own(call.callee().name().text())
            .filter(m ->
                m instanceof Meaning.StateMeaning
                    || m instanceof Meaning.FamilyMeaning
                    || m instanceof Meaning.OutputMeaning)
            .isPresent();
    boolean running =
        call.arguments().getFirst().value() instanceof NameExpression name
            && name.name().text().equals(system.scope().timeName());
    return sampled && !running;
  }

  /** Returns the declared unit of an expression that is nothing but a name, with a time or not. */
  Optional<UnitOfMeasure> unitOfName(Expression side) {
    Expression name = side instanceof CallExpression call ? call.callee() : side;
    if (!(name instanceof NameExpression reference)) {
      return Optional.empty();
    }
    if (reference.primes() > 0) {
      return (reference.isIndexed()
              ? components.quietly(reference)
              : components.labelled(reference.label()))
          .map(StateComponent::unit);
    }
    Optional<Meaning> meaning = system.scope().use(reference.name().text());
    return meaning.flatMap(m ->
        switch (m) {
          case Meaning.StateMeaning state -> Optional.of(state.unit());
          case Meaning.FamilyMeaning family -> Optional.of(family.unit());
          case Meaning.IndexMeaning index -> Optional.of(UnitOfMeasure.ONE);
          case Meaning.OutputMeaning output -> Optional.of(output.unit());
          case Meaning.ParameterMeaning parameter -> Optional.of(parameter.parameter().unit());
          case Meaning.LetMeaning let -> Optional.of(let.let().unit());
          case Meaning.TimeMeaning time -> Optional.of(time.unit());
          case Meaning.MatrixMeaning matrix -> Optional.of(matrix.matrix().unit());
          case Meaning.BoundInputMeaning input -> Optional.of(input.unit());
          case Meaning.PartMeaning part -> Optional.empty();
          case Meaning.BrokenMeaning broken -> Optional.empty();
        });
  }
}
