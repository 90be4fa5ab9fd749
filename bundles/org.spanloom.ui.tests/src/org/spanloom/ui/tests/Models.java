/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.tests;

/** Texts that the tests type. */
final class Models {

  /** Decays as exp(-t/2); the closed form is the definition of the exponential function. */
  static final String DECAY =
      """
      ## A float that settles. Invented data.
      system Float over t [s] from 0 to 4 {
        parameter rate [1/s] = 0.5      ## how fast it settles
        state depth [m] = 2
        output slope [m/s] = -rate*depth
        depth' = -rate*depth
        initial values low { depth = 1 }
        basis Phi at 0
      }
      """;

  /** The same with a name that is not declared in line 6. */
  static final String DECAY_WITH_FAULT =
      DECAY.replace("depth' = -rate*depth", "depth' = -rote*depth");

  /** The line of that fault. */
  static final int FAULT_LINE = 6;

  private Models() {}
}
