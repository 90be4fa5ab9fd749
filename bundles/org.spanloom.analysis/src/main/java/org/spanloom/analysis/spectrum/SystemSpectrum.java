/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.analysis.spectrum;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.spanloom.numerics.spectrum.Equilibrium;
import org.spanloom.numerics.spectrum.FloquetMultipliers;
import org.spanloom.numerics.spectrum.LogarithmicNorm;
import org.spanloom.numerics.spectrum.Modes.Mode;
import org.spanloom.numerics.structure.ConservedQuantities;

/** The spectrum of a system; rates are per unit of its declared time. */
public sealed interface SystemSpectrum {

  /** Returns what the spectrum is of. */
  Subject subject();

  /**
   * A system as reports name it.
   *
   * @param system its name
   * @param timeName name of the independent variable
   * @param timeUnit UCUM code of its unit
   * @param states labels of the components
   * @param conserved combinations of states, in declared units, that keep their value
   */
  record Subject(
      String system,
      String timeName,
      String timeUnit,
      List<String> states,
      ConservedQuantities conserved) {
    /** Copies the list. */
    public Subject {
      states = List.copyOf(states);
    }
  }

  /**
   * Eigenvalues of A.
   *
   * @param at the time at which A was frozen; empty where it is constant
   * @param modes by falling real part
   * @param norm logarithmic norms, states divided by their scales
   * @param nonnegative whether no entry beside the diagonal is negative, so that amounts that are
   *     not negative stay so without negative forcing (Metzler matrix)
   * @param equilibrium where the system stands still; empty where A or b varies
   */
  record Eigenvalues(
      Subject subject,
      OptionalDouble at,
      List<Mode> modes,
      LogarithmicNorm norm,
      boolean nonnegative,
      Optional<Equilibrium> equilibrium)
      implements SystemSpectrum {
    /** Copies the list. */
    public Eigenvalues {
      modes = List.copyOf(modes);
    }

    /**
     * Returns the largest over the smallest real part of decaying modes, a measure of stiffness; 1
     * without two of them.
     */
    public double stiffness() {
      double fastest = 0;
      double slowest = Double.POSITIVE_INFINITY;
      for (Mode mode : modes) {
        double rate = -mode.eigenvalue().real();
        if (rate > mode.error()) {
          fastest = Math.max(fastest, rate);
          slowest = Math.min(slowest, rate);
        }
      }
      return fastest > 0 ? fastest / slowest : 1;
    }
  }

  /**
   * Multipliers over one period.
   *
   * @param floquet the multipliers by falling modulus
   */
  record Multipliers(Subject subject, FloquetMultipliers floquet) implements SystemSpectrum {}
}
