/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.cli;

import java.nio.file.Path;

/** Small models that several tests use. */
final class Models {

  /** Two reservoirs, x = 8 exp(-t/2): one system, initial values in the declarations. */
  static final String DRAIN =
      """
      ## Two pools at Marrow Skerry, the upper one drains into the lower one. Invented data.
      system Pools over t [h] from 0 to 10 {
        parameter k [/h] = 0.5
        state upper [L] = 8
        state lower [mL] = 0
        output total [L] = upper + lower
        upper' = -k*upper
        lower' = k*upper
        accuracy 1e-10
      }
      """;

  /** Two systems, one of them with two sets of initial values and two bases. */
  static final String TWO_SYSTEMS =
      """
      system Swing over t [s] from 0 to 20 {
        state x [m]
        state x' [m/s]
        x'' = -4 [/s2]*x
        initial values pulled { x = 1; x' = 0 }
        initial values pushed { x = 0; x' = 1 }
        basis start at 0
        basis pair at 0 =
          row x  = 1, 1
          row x' = 1, -1
        accuracy 1e-10
      }
      system Fall over t [s] from 0 {
        state v [m/s] = 0
        v' = 9.81 [m/s2] - 0.1 [/s]*v
      }
      """;

  private Models() {}

  static Path drain(Path folder) {
    return CommandRun.model(folder, "pools.span", DRAIN);
  }

  static Path twoSystems(Path folder) {
    return CommandRun.model(folder, "two.span", TWO_SYSTEMS);
  }
}
