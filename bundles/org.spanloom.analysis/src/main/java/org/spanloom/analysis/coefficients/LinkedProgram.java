/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.coefficients;

import java.util.List;
import org.spanloom.language.model.Curve;

/**
 * A program of several classes that share variables.
 *
 * @param parts the classes, in the order to run
 * @param variables number of shared variables
 * @param curves what the programs take values of
 */
record LinkedProgram(List<Part> parts, int variables, Curve[] curves) implements Program {

  LinkedProgram(List<Part> parts, int variables, List<Curve> curves) {
    this(List.copyOf(parts), variables, curves.toArray(Curve[]::new));
  }

  /** The interface of a written class. */
  interface Part {
    /**
     * Computes variables and values.
     *
     * @param t time, in the declared unit of the system
     * @param variables shared with the other parts
     * @param out receives values at their places
     * @param curves by number
     */
    void run(double t, double[] variables, double[] out, Curve[] curves);
  }

  @Override
  public void run(double t, double[] out) {
    double[] shared = new double[variables];
    for (Part part : parts) {
      part.run(t, shared, out, curves);
    }
  }
}
