/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.coefficients;

import java.util.Arrays;
import java.util.Optional;

/**
 * A fixed list of values, each a constant or a compiled function of time. Safe for use by several
 * threads.
 */
public final class CompiledTerms {

  private final double[] constants;
  private final boolean[] varies;
  private final Optional<Program> program;

  CompiledTerms(TermGraph graph, int[] nodes) {
    constants = new double[nodes.length];
    varies = new boolean[nodes.length];
    int[] targets = new int[nodes.length];
    boolean any = false;
    for (int i = 0; i < nodes.length; i++) {
      if (nodes[i] < 0) {
        targets[i] = -1;
      } else if (graph.isConstant(nodes[i])) {
        constants[i] = graph.node(nodes[i]).value();
        targets[i] = -1;
      } else {
        targets[i] = nodes[i];
        varies[i] = true;
        any = true;
      }
    }
    program = any ? Optional.of(ProgramWriter.write(graph, targets)) : Optional.empty();
  }

  /** Returns the number of values. */
  public int size() {
    return constants.length;
  }

  /** Tells whether no value varies with time. */
  public boolean isConstant() {
    return program.isEmpty();
  }

  /** Tells whether a value varies with time. */
  public boolean varies(int place) {
    return varies[place];
  }

  /**
   * Writes all values.
   *
   * @param t time, in the declared unit
   * @param out receives {@link #size()} values
   */
  public void evaluate(double t, double[] out) {
    System.arraycopy(constants, 0, out, 0, constants.length);
    if (program.isPresent()) {
      program.get().run(t, out);
    }
  }

  /** Returns all values at a time, in a fresh array. */
  public double[] at(double t) {
    double[] out = new double[constants.length];
    evaluate(t, out);
    return out;
  }

  @Override
  public String toString() {
    return "CompiledTerms" + Arrays.toString(constants);
  }
}
