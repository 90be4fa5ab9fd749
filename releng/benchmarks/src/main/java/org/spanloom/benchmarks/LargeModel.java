/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.benchmarks;

import java.util.Locale;
import java.util.SplittableRandom;

/**
 * A generated model of any size: the heat main of the fictional Marrow Skerry field station, a ring
 * of buried pipe. Each segment has the water in it and the pipe's wall as states, and its own
 * dimensions, materials and soil as parameters; a segment is 40 statements. All numbers are
 * invented; the same size gives the same text.
 */
public final class LargeModel {

  /** Statements of one segment. */
  public static final int STATEMENTS_PER_SEGMENT = 40;

  /** States of one segment. */
  public static final int STATES_PER_SEGMENT = 2;

  private LargeModel() {}

  /**
   * Returns the text of a model.
   *
   * @param statements about how many statements it has; at least 120
   */
  public static String text(int statements) {
    int segments = segments(statements);
    SplittableRandom random = new SplittableRandom(20_261);
    StringBuilder text = new StringBuilder(segments * 2200);
    text.append(
        """
        # Heat main of the Marrow Skerry field station. The station and all numbers are invented.
        parameter T_mean [K] = 281.4               ## of the soil at the depth of the pipe
        parameter T_year [K] = 4.2                 ## swing over the year
        parameter year   [d] = 365.25

        ## Water in a ring of buried pipe, segment after segment, and the wall of the pipe around it.
        system HeatMain over t [h] from 0 to 48 {

          parameter flow [kg/s] = 2.35 ± 3 %
          let T_soil(t) = T_mean + T_year*sin(2*pi*t/year)
          let day(t) = max(0, cos(2*pi*(t - 13 [h])/(24 [h])))
        """);
    text.append("  input boiler(t) [kW] = ").append(segments / 20.0).append("\n\n");
    for (int i = 1; i <= segments; i++) {
      segment(text, i, i == 1 ? segments : i - 1, random);
    }
    text.append("  initial values cold {\n");
    for (int i = 1; i <= segments; i++) {
      text.append("    T").append(i).append(" = 283; W").append(i).append(" = 282\n");
    }
    text.append("  }\n  require T1 < 398 [K] throughout\n  accuracy 1e-7\n}\n");
    return text.toString();
  }

  /** Returns the number of states of the model. */
  public static int states(int statements) {
    return segments(statements) * STATES_PER_SEGMENT;
  }

  private static int segments(int statements) {
    return Math.max(3, statements / STATEMENTS_PER_SEGMENT);
  }

  private static void segment(StringBuilder text, int i, int before, SplittableRandom random) {
    parameter(text, "len", i, "[m]", 8 + 6 * random.nextDouble(), "of the segment");
    parameter(text, "dia", i, "[mm]", 50 + 8 * random.nextDouble(), "inside");
    parameter(text, "wall", i, "[mm]", 3 + random.nextDouble(), "thickness of the wall");
    parameter(text, "foam", i, "[mm]", 38 + 9 * random.nextDouble(), "");
    parameter(text, "rho_w", i, "[kg/m3]", 975 + 9 * random.nextDouble(), "of the water");
    parameter(text, "cp_w", i, "[kJ/(kg.K)]", 4.1 + 0.1 * random.nextDouble(), "");
    parameter(text, "rho_p", i, "[kg/m3]", 7800 + 50 * random.nextDouble(), "of the pipe");
    parameter(text, "cp_p", i, "[J/(kg.K)]", 460 + 20 * random.nextDouble(), "");
    parameter(text, "lam_f", i, "[W/(m.K)]", 0.026 + 0.004 * random.nextDouble(), "ages");
    parameter(text, "lam_s", i, "[W/(m.K)]", 1.1 + 0.6 * random.nextDouble(), "wet soil");
    parameter(text, "depth", i, "[m]", 0.7 + 0.2 * random.nextDouble(), "below the path");
    parameter(text, "alpha", i, "[W/(m2.K)]", 900 + 300 * random.nextDouble(), "water to wall");
    parameter(text, "leak", i, "[g/s]", 0.2 * random.nextDouble(), "");
    parameter(text, "pump", i, "[W]", 5 + 20 * random.nextDouble(), "heat of friction");
    parameter(text, "fit", i, "[kg]", 1 + 3 * random.nextDouble(), "valves and flanges");
    parameter(text, "weight", i, "", 0.8 + 0.4 * random.nextDouble(), "share of the sun");
    parameter(text, "sun", i, "[W/m2]", 40 + 60 * random.nextDouble(), "through the path");
    parameter(text, "width", i, "[cm]", 60 + 30 * random.nextDouble(), "of the trench");
    parameter(text, "shade", i, "[%]", 20 + 30 * random.nextDouble(), "");
    parameter(text, "spare", i, "[kJ/K]", 10 + 5 * random.nextDouble(), "");
    String heater = (i == 1 ? "boiler(t) + pump" : "pump") + i;
    for (String line : SEGMENT_LINES) {
      String own = line.replace("~", Integer.toString(i)).replace("@", Integer.toString(before));
      text.append(own.replace("%", heater)).append('\n');
    }
    text.append('\n');
  }

  private static void parameter(
      StringBuilder text, String name, int i, String unit, double value, String documentation) {
    text.append("  parameter ").append(name).append(i).append(' ').append(unit);
    text.append(unit.isEmpty() ? "= " : " = ");
    text.append(String.format(Locale.ROOT, "%.5g", value));
    if (i % 5 == 0) {
      text.append(" ± 5 %");
    }
    if (!documentation.isEmpty()) {
      text.append("   ## ").append(documentation);
    }
    text.append('\n');
  }

  /**
   * What each segment has beside its parameters; ~ is its number, @ that of the one before. %
   * stands for what heats the water.
   */
  private static final String[] SEGMENT_LINES = {
    "  let area~ = pi/4*dia~^2",
    "  let face~ = pi*dia~*len~",
    "  let ring~ = pi*(dia~ + wall~)*wall~",
    "  let C_w~ = rho_w~*area~*len~*cp_w~",
    "  let C_p~ = (rho_p~*ring~*len~ + fit~)*cp_p~ + spare~",
    "  let outer~ = dia~ + 2*(wall~ + foam~)",
    "  let R_f~ = log(outer~/(dia~ + 2*wall~))/(2*pi*lam_f~*len~)",
    "  let R_s~ = log(4*depth~/outer~)/(2*pi*lam_s~*len~)",
    "  let g_s~ = 1/(R_f~ + R_s~)                 ## wall to soil",
    "  let g_w~ = alpha~*face~                    ## water to wall",
    "  let open~ = (1 - shade~)*weight~",
    "  let heat~(t) = open~*sun~*width~*len~*day(t)",
    "  state T~ [K] = 341 scale 10",
    "  state W~ [K] = 339 scale 10",
    "  output loss~ [W] = g_s~*(W~ - T_soil(t))   ## to the soil",
    "  output drop~ [K] = T@ - T~",
    "  output store~ [MJ] = C_w~*T~ + C_p~*W~",
    "  output gap~ [K] = T~ - W~",
    "  C_w~*T~' = (flow - leak~)*cp_w~*(T@ - T~) - g_w~*(T~ - W~) + %",
    "  C_p~*W~' = g_w~*(T~ - W~) - g_s~*(W~ - T_soil(t)) + heat~(t)",
  };
}
