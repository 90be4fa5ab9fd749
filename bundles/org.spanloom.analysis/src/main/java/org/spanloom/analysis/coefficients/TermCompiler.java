/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.coefficients;

import java.util.List;
import java.util.Map;
import org.spanloom.language.model.Term;

/** Compiles terms of one system with one set of parameter values. */
public final class TermCompiler {

  private final double timeFactor;
  private final Map<String, Double> parameters;

  /**
   * Takes the values.
   *
   * @param timeFactor size of the declared time unit in coherent SI units
   * @param parameters values that replace those of parameters, by name, in coherent SI units
   */
  public TermCompiler(double timeFactor, Map<String, Double> parameters) {
    this.timeFactor = timeFactor;
    this.parameters = Map.copyOf(parameters);
  }

  /** Returns the values that replace those of parameters, in coherent SI units, by name. */
  Map<String, Double> parameters() {
    return parameters;
  }

  /** Starts an empty graph for terms of the system. */
  TermGraph graph() {
    return new TermGraph(timeFactor, parameters);
  }

  /** Compiles terms to functions of time in the declared unit, with values in coherent SI units. */
  public CompiledTerms compile(List<Term> terms) {
    TermGraph graph = graph();
    return new CompiledTerms(graph, terms.stream().mapToInt(graph::add).toArray());
  }

  /**
   * Returns the value of a term that does not depend on time, in coherent SI units.
   *
   * @throws IllegalArgumentException if it depends on time
   */
  public double constant(Term term) {
    TermGraph graph = graph();
    int node = graph.add(term);
    if (!graph.isConstant(node)) {
      throw new IllegalArgumentException("the term depends on time: " + term);
    }
    return graph.node(node).value();
  }
}
