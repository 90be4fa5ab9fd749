/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.benchmarks;

import java.util.Locale;
import java.util.SplittableRandom;

/**
 * Java text of the same kind as {@link LargeModel}: the same quantities of the same invented heat
 * main, as a class with a method for each segment. It has the same mix of short declarations,
 * formulas and remarks, so that bytes of one compare with bytes of the other.
 */
public final class JavaText {

  private JavaText() {}

  /**
   * Returns the text of a class.
   *
   * @param length how many characters it has at least
   */
  public static String text(int length) {
    SplittableRandom random = new SplittableRandom(20_261);
    StringBuilder text = new StringBuilder(length + 3000);
    text.append(
        "/** The heat main of the Marrow Skerry field station. */\n"
            + "public final class HeatMain {\n");
    for (int i = 1; text.length() < length - 20; i++) {
      String number = Integer.toString(i);
      for (String line : LINES) {
        String value = String.format(Locale.ROOT, "%.5g", 1 + 9 * random.nextDouble());
        text.append(line.replace("#", number).replace("@", value)).append('\n');
      }
    }
    return text.append("}\n").toString();
  }

  /** One segment; # is its number, @ a value. */
  private static final String[] LINES = {
    "  static void segment#(double t, double[] x, double[] dx, double day, double soil) {",
    "    double len# = @; // m, of the segment",
    "    double dia# = @; // mm, inside",
    "    double wall# = @; // mm, thickness of the wall",
    "    double foam# = @; // mm",
    "    double rhoW# = @; // kg/m3, of the water",
    "    double cpW# = @; // kJ/(kg.K)",
    "    double rhoP# = @; // kg/m3, of the pipe",
    "    double cpP# = @; // J/(kg.K)",
    "    double lamF# = @; // W/(m.K), ages",
    "    double lamS# = @; // W/(m.K), wet soil",
    "    double depth# = @; // m, below the path",
    "    double alpha# = @; // W/(m2.K), water to wall",
    "    double leak# = @; // g/s",
    "    double pump# = @; // W, heat of friction",
    "    double fit# = @; // kg, valves and flanges",
    "    double weight# = @; // share of the sun",
    "    double sun# = @; // W/m2, through the path",
    "    double width# = @; // cm, of the trench",
    "    double shade# = @; // %",
    "    double spare# = @; // kJ/K",
    "    double area# = PI / 4 * dia# * dia#;",
    "    double face# = PI * dia# * len#;",
    "    double ring# = PI * (dia# + wall#) * wall#;",
    "    double capW# = rhoW# * area# * len# * cpW#;",
    "    double capP# = (rhoP# * ring# * len# + fit#) * cpP# + spare#;",
    "    double outer# = dia# + 2 * (wall# + foam#);",
    "    double resF# = log(outer# / (dia# + 2 * wall#)) / (2 * PI * lamF# * len#);",
    "    double resS# = log(4 * depth# / outer#) / (2 * PI * lamS# * len#);",
    "    double gS# = 1 / (resF# + resS#); // wall to soil",
    "    double gW# = alpha# * face#; // water to wall",
    "    double open# = (1 - shade#) * weight#;",
    "    double heat# = open# * sun# * width# * len# * day;",
    "    double T# = x[2 * #];",
    "    double W# = x[2 * # + 1];",
    "    double loss# = gS# * (W# - soil); // to the soil",
    "    double drop# = x[2 * # - 2] - T#;",
    "    double store# = capW# * T# + capP# * W#;",
    "    double gap# = T# - W#;",
    "    dx[2 * #] = ((FLOW - leak#) * cpW# * drop# - gW# * gap# + pump#) / capW#;",
    "    dx[2 * # + 1] = (gW# * gap# - loss# + heat#) / capP#;",
    "  }",
    "",
  };
}
