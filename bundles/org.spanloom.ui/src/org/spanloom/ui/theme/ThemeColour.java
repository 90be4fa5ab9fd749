/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.theme;

import java.util.List;

/** The colours that plugin.xml defines, with their names there. */
public enum ThemeColour {
  /** Words of the language. */
  KEYWORD("keyword"),
  /** Numbers. */
  NUMBER("number"),
  /** Units. */
  UNIT("unit"),
  /** Comments. */
  COMMENT("comment"),
  /** Documentation comments. */
  DOCUMENTATION("documentation"),
  /** Text in quotation marks. */
  TEXT("text"),
  /** Operators. */
  OPERATOR("operator"),
  /** What cannot be read. */
  BAD("bad"),
  /** Background of plots. */
  PLOT_BACKGROUND("plot.background"),
  /** Text and axes of plots. */
  PLOT_FOREGROUND("plot.foreground"),
  /** Grid of plots. */
  PLOT_GRID("plot.grid"),
  /** Cursor of plots. */
  PLOT_CURSOR("plot.cursor"),
  /** First curve. */
  SERIES_1("plot.series1"),
  /** Second curve. */
  SERIES_2("plot.series2"),
  /** Third curve. */
  SERIES_3("plot.series3"),
  /** Fourth curve. */
  SERIES_4("plot.series4"),
  /** Fifth curve. */
  SERIES_5("plot.series5"),
  /** Sixth curve. */
  SERIES_6("plot.series6"),
  /** Seventh curve. */
  SERIES_7("plot.series7"),
  /** Eighth curve. */
  SERIES_8("plot.series8");

  /** The colours of curves, in order of use. */
  public static final List<ThemeColour> SERIES =
      List.of(SERIES_1, SERIES_2, SERIES_3, SERIES_4, SERIES_5, SERIES_6, SERIES_7, SERIES_8);

  private static final String PREFIX = "org.spanloom.ui.colour.";

  private final String id;

  ThemeColour(String name) {
    this.id = PREFIX + name;
  }

  /** Returns its id in plugin.xml. */
  public String id() {
    return id;
  }

  static boolean isOurs(String id) {
    return id.startsWith(PREFIX);
  }
}
