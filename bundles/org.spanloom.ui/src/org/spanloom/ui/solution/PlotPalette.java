/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.solution;

import java.util.List;
import org.eclipse.swt.graphics.Color;
import org.spanloom.ui.theme.ThemeColour;
import org.spanloom.ui.theme.ThemeColours;

/**
 * The colours of a plot.
 *
 * @param background background
 * @param foreground text, ticks and frame
 * @param grid grid
 * @param cursor cursor and rubber band
 * @param series curves, used in turn
 */
record PlotPalette(
    Color background, Color foreground, Color grid, Color cursor, List<Color> series) {

  PlotPalette {
    series = List.copyOf(series);
  }

  /** Returns the colours of the current theme. */
  static PlotPalette ofTheme() {
    return new PlotPalette(
        ThemeColours.get(ThemeColour.PLOT_BACKGROUND),
        ThemeColours.get(ThemeColour.PLOT_FOREGROUND),
        ThemeColours.get(ThemeColour.PLOT_GRID),
        ThemeColours.get(ThemeColour.PLOT_CURSOR),
        ThemeColour.SERIES.stream().map(ThemeColours::get).toList());
  }

  /** Returns colours for white paper, whatever the theme. */
  static PlotPalette forPaper() {
    return new PlotPalette(
        new Color(255, 255, 255),
        new Color(43, 43, 43),
        new Color(218, 221, 224),
        new Color(106, 106, 106),
        List.of(
            new Color(0, 103, 165),
            new Color(194, 78, 0),
            new Color(0, 128, 92),
            new Color(161, 65, 138),
            new Color(128, 102, 0),
            new Color(70, 70, 168),
            new Color(179, 38, 46),
            new Color(85, 85, 85)));
  }

  Color series(int number) {
    return series.get(number % series.size());
  }
}
