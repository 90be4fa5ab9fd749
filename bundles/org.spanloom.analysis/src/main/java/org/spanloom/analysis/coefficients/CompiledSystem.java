/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.coefficients;

import java.util.List;
import java.util.Optional;
import org.spanloom.language.model.InitialValues;
import org.spanloom.language.model.Jump;
import org.spanloom.language.model.StateComponent;
import org.spanloom.language.model.SystemModel;
import org.spanloom.language.model.Term;
import org.spanloom.numerics.Accuracy;
import org.spanloom.numerics.CoupledSystem;
import org.spanloom.numerics.LinearSystem;

/**
 * A system of a model, ready for the numerics: states and times in declared units, parameters at
 * their values or those of the run.
 *
 * @param model the system
 * @param linear its coefficients
 * @param terms compiles further terms with the same parameters
 */
public record CompiledSystem(SystemModel model, LinearSystem linear, TermCompiler terms) {

  /** Returns n. */
  public int dimension() {
    return model.states().size();
  }

  /** Returns the coupling of the derivatives, if there is one. */
  public Optional<CoupledSystem> coupling() {
    return linear instanceof CoupledSystem coupled ? Optional.of(coupled) : Optional.empty();
  }

  /** Returns a constant time in the declared unit. */
  public double time(Term term) {
    return model.timeUnit().fromBase(terms.constant(term));
  }

  /** Returns the times of a jump, in the declared unit. */
  public double[] times(Jump jump) {
    return jump.times().times(model.timeUnit(), terms.parameters());
  }

  /** Returns initial values in declared units. */
  public double[] values(InitialValues initial) {
    List<StateComponent> states = model.states();
    double[] x = new double[states.size()];
    for (int i = 0; i < x.length; i++) {
      x[i] = states.get(i).unit().fromBase(terms.constant(initial.values().get(i)));
    }
    return x;
  }

  /** Returns the error asked for, with the scales of the states. */
  public Accuracy accuracy(double relative) {
    return new Accuracy(
        relative, model.states().stream().mapToDouble(StateComponent::scale).toArray());
  }
}
