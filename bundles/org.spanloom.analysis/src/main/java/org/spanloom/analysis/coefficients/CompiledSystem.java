/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.coefficients;

import java.util.List;
import java.util.Optional;
import java.util.stream.DoubleStream;
import org.spanloom.language.model.AffineValue;
import org.spanloom.language.model.CornerSearch;
import org.spanloom.language.model.Corners;
import org.spanloom.language.model.InitialValues;
import org.spanloom.language.model.Jump;
import org.spanloom.language.model.StateComponent;
import org.spanloom.language.model.SystemModel;
import org.spanloom.language.model.Term;
import org.spanloom.numerics.Accuracy;
import org.spanloom.numerics.CoupledSystem;
import org.spanloom.numerics.LinearSystem;
import org.spanloom.numerics.TimeRange;

/**
 * A system of a model, ready for the numerics: states and times in declared units, parameters at
 * their values or those of the run.
 *
 * @param model the system
 * @param linear its coefficients
 * @param terms compiles further terms with the same parameters
 * @param gap why breakpoints of the coefficients may be missing
 */
public record CompiledSystem(
    SystemModel model, LinearSystem linear, TermCompiler terms, Optional<Corners.Gap> gap) {

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

  /**
   * Returns the corners and jumps of a value's own coefficients.
   *
   * @param value a value affine in the states
   * @param range where to look, bounded, in the declared unit
   * @return the times beside them, from the left and from the right
   */
  public double[] besideCorners(AffineValue value, TimeRange range) {
    CornerSearch search =
        new CornerSearch(range.start(), range.end(), model.timeUnit().factor(), terms.parameters());
    value.samples().forEach(s -> search.add(s.coefficient()));
    search.add(value.constant());
    return search.result().list().stream()
        .flatMapToDouble(c -> DoubleStream.of(c.before(), c.after()))
        .toArray();
  }

  /** Returns the error asked for, with the scales of the states. */
  public Accuracy accuracy(double relative) {
    return new Accuracy(
        relative, model.states().stream().mapToDouble(StateComponent::scale).toArray());
  }
}
