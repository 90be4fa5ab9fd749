/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.tests;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.eclipse.e4.ui.css.swt.theme.IThemeEngine;
import org.eclipse.swt.SWT;
import org.eclipse.swt.custom.StyleRange;
import org.eclipse.swt.custom.StyledText;
import org.eclipse.swt.graphics.Color;
import org.eclipse.swt.graphics.RGB;
import org.eclipse.swtchart.Chart;
import org.eclipse.swtchart.ILineSeries;
import org.eclipse.ui.PlatformUI;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.extension.RegisterExtension;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.spanloom.ui.UiIds;
import org.spanloom.ui.editor.ModelEditor;
import org.spanloom.ui.theme.ThemeColour;
import org.spanloom.ui.theme.ThemeColours;

/** Colours of text and plots, in both themes. */
class ThemeTests {

  static final String LIGHT = "org.eclipse.e4.ui.css.theme.e4_default";
  static final String DARK = "org.eclipse.e4.ui.css.theme.e4_dark";

  @RegisterExtension final Workbench workbench = new Workbench();

  @AfterEach
  void backToLight() {
    setTheme(LIGHT);
  }

  static void setTheme(String id) {
    IThemeEngine engine = PlatformUI.getWorkbench().getService(IThemeEngine.class);
    engine.setTheme(id, false);
    Workbench.drain();
  }

  private static RGB colourAt(ModelEditor editor, String word) {
    StyledText text = editor.viewer().getTextWidget();
    StyleRange style = text.getStyleRangeAtOffset(text.getText().indexOf(word));
    return style == null || style.foreground == null
        ? text.getForeground().getRGB()
        : style.foreground.getRGB();
  }

  @ParameterizedTest
  @EnumSource(ThemeColour.class)
  void everyColourIsDefinedInBothThemes(ThemeColour colour) {
    setTheme(LIGHT);
    assertTrue(ThemeColours.find(colour).isPresent(), colour.id());
    RGB light = ThemeColours.get(colour).getRGB();
    setTheme(DARK);
    assertNotEquals(light, ThemeColours.get(colour).getRGB(), colour.id());
  }

  @Test
  void coloursTheTextByTheLexer() throws Exception {
    ModelEditor editor =
        Workbench.open(Workbench.file(Workbench.project("station"), "float.span", Models.DECAY));
    assertEquals(ThemeColours.get(ThemeColour.KEYWORD).getRGB(), colourAt(editor, "parameter"));
    assertEquals(ThemeColours.get(ThemeColour.UNIT).getRGB(), colourAt(editor, "[1/s]"));
    assertEquals(ThemeColours.get(ThemeColour.NUMBER).getRGB(), colourAt(editor, "0.5"));
    assertEquals(ThemeColours.get(ThemeColour.DOCUMENTATION).getRGB(), colourAt(editor, "## how"));
    StyledText text = editor.viewer().getTextWidget();
    int keyword = text.getText().indexOf("system");
    assertEquals(SWT.BOLD, text.getStyleRangeAtOffset(keyword).fontStyle);
    editor.document().replace(0, 2, "# ");
    assertEquals(ThemeColours.get(ThemeColour.COMMENT).getRGB(), colourAt(editor, "# "));
  }

  @Test
  void coloursOpenEditorsAnewWhenTheThemeChanges() throws Exception {
    ModelEditor editor =
        Workbench.open(Workbench.file(Workbench.project("station"), "float.span", Models.DECAY));
    RGB light = colourAt(editor, "parameter");
    setTheme(DARK);
    RGB dark = ThemeColours.get(ThemeColour.KEYWORD).getRGB();
    Workbench.waitUntil("the dark colour", () -> colourAt(editor, "parameter").equals(dark));
    assertNotEquals(light, dark);
    assertReadable(dark, editor.viewer().getTextWidget().getBackground());
    setTheme(LIGHT);
    Workbench.waitUntil("the light colour", () -> colourAt(editor, "parameter").equals(light));
  }

  @Test
  void coloursThePlotAnewWhenTheThemeChanges() throws Exception {
    Workbench.page().showView(UiIds.SOLUTION_VIEW);
    Workbench.open(Workbench.file(Workbench.project("station"), "float.span", Models.DECAY));
    SolutionViewTests.waitForCurve("depth");
    setTheme(DARK);
    Chart chart = SolutionViewTests.chart();
    RGB background = ThemeColours.get(ThemeColour.PLOT_BACKGROUND).getRGB();
    RGB curve = ThemeColours.get(ThemeColour.SERIES_1).getRGB();
    Workbench.waitUntil(
        "the dark plot", () -> chart.getPlotArea().getBackground().getRGB().equals(background));
    ILineSeries<?> depth = (ILineSeries<?>) chart.getSeriesSet().getSeries("depth");
    assertEquals(curve, depth.getLineColor().getRGB());
    assertEquals(background, chart.getLegend().getBackground().getRGB());
    assertReadable(curve, chart.getPlotArea().getBackground());
    assertReadable(
        chart.getAxisSet().getXAxis(0).getTick().getForeground().getRGB(), chart.getBackground());
  }

  @ParameterizedTest
  @EnumSource(value = ThemeColour.class, mode = EnumSource.Mode.MATCH_ALL, names = "SERIES.*")
  void everyCurveStandsOutFromThePlot(ThemeColour colour) {
    for (String theme : new String[] {LIGHT, DARK}) {
      setTheme(theme);
      assertReadable(
          ThemeColours.get(colour).getRGB(), ThemeColours.get(ThemeColour.PLOT_BACKGROUND));
    }
  }

  /**
   * Contrast as WCAG 2.1 defines it, success criterion 1.4.11: at least 3 to 1 for what is not
   * text.
   */
  private static void assertReadable(RGB foreground, Color background) {
    double one = luminance(foreground);
    double other = luminance(background.getRGB());
    double contrast = (Math.max(one, other) + 0.05) / (Math.min(one, other) + 0.05);
    assertTrue(contrast >= 3, foreground + " on " + background + " has a contrast of " + contrast);
  }

  private static double luminance(RGB colour) {
    return 0.2126 * linear(colour.red)
        + 0.7152 * linear(colour.green)
        + 0.0722 * linear(colour.blue);
  }

  private static double linear(int part) {
    double share = part / 255.0;
    return share <= 0.04045 ? share / 12.92 : Math.pow((share + 0.055) / 1.055, 2.4);
  }
}
