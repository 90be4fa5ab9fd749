/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.tests;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.List;
import org.eclipse.core.resources.IProject;
import org.eclipse.swt.SWT;
import org.eclipse.swt.custom.CTabFolder;
import org.eclipse.swt.graphics.ImageData;
import org.eclipse.swt.graphics.RGB;
import org.eclipse.swt.graphics.Rectangle;
import org.eclipse.swt.widgets.Combo;
import org.eclipse.swt.widgets.Control;
import org.eclipse.swt.widgets.Event;
import org.eclipse.swt.widgets.Label;
import org.eclipse.swt.widgets.Table;
import org.eclipse.swt.widgets.Text;
import org.eclipse.swtchart.Chart;
import org.eclipse.swtchart.IAxis;
import org.eclipse.swtchart.ISeries;
import org.eclipse.swtchart.Range;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.extension.RegisterExtension;
import org.spanloom.ui.UiIds;
import org.spanloom.ui.editor.ModelEditor;
import org.spanloom.ui.solution.SolutionView;

/** The curve of the active editor's model, and what can be done with it. */
class SolutionViewTests {

  @RegisterExtension final Workbench workbench = new Workbench();

  private IProject project;
  private ModelEditor editor;

  @BeforeEach
  void openModel() throws Exception {
    project = Workbench.project("station");
    Workbench.page().showView(UiIds.SOLUTION_VIEW);
    editor = Workbench.open(Workbench.file(project, "float.span", Models.DECAY));
    waitForCurve("depth");
  }

  static Chart chart() {
    return Workbench.find(Chart.class, Workbench.shell()).stream()
        .findFirst()
        .orElseThrow(() -> new AssertionError("no chart can be seen; " + labels()));
  }

  static void waitForCurve(String name) {
    Workbench.waitUntil(
        "the curve " + name,
        () -> {
          List<Chart> charts = Workbench.find(Chart.class, Workbench.shell());
          return !charts.isEmpty() && charts.getFirst().getSeriesSet().getSeries(name) != null;
        },
        () -> labels().toString());
  }

  static List<String> labels() {
    return Workbench.find(Label.class, Workbench.shell()).stream().map(Label::getText).toList();
  }

  private static void waitForLabel(String part) {
    Workbench.waitUntil(
        "the text '" + part + "'",
        () -> labels().stream().anyMatch(l -> l.contains(part)),
        () -> labels().toString());
  }

  @Test
  void drawsTheSolution() {
    ISeries<?> depth = chart().getSeriesSet().getSeries("depth");
    double[] times = depth.getXSeries();
    double[] values = depth.getYSeries();
    assertTrue(times.length >= 100);
    assertEquals(0, times[0]);
    assertEquals(4, times[times.length - 1]);
    for (int i = 0; i < times.length; i++) {
      // depth' = -depth/2 from 2 m: 2 exp(-t/2).
      assertEquals(2 * Math.exp(-times[i] / 2), values[i], 1e-5, "at " + times[i]);
    }
    double[] slope = chart().getSeriesSet().getSeries("slope").getYSeries();
    assertEquals(-1, slope[0], 1e-5);
  }

  @Test
  void namesUnitsAtTheAxes() {
    IAxis[] values = chart().getAxisSet().getYAxes();
    assertEquals("t [s]", chart().getAxisSet().getXAxis(0).getTitle().getText());
    assertEquals("depth [m]", values[0].getTitle().getText());
    assertEquals("slope [m/s]", values[1].getTitle().getText());
    assertEquals("depth [m]", chart().getSeriesSet().getSeries("depth").getDescription());
  }

  @Test
  void saysTheEstimatedErrorAndTheMethod() {
    waitForLabel("Largest estimated error: depth \u00b1 ");
    waitForLabel("Method: ");
  }

  @Test
  void followsTheText() {
    Workbench.type(editor, Models.DECAY.replace("depth [m] = 2", "depth [m] = 6"));
    Workbench.waitUntil(
        "the new curve",
        () -> Math.abs(chart().getSeriesSet().getSeries("depth").getYSeries()[0] - 6) < 1e-9);
  }

  @Test
  void keepsTheCurveAndSaysWhyWhileTheTextIsWrong() {
    Workbench.type(editor, Models.DECAY_WITH_FAULT);
    waitForLabel("Not up to date. Line " + Models.FAULT_LINE);
    assertEquals(2.0, chart().getSeriesSet().getSeries("depth").getYSeries()[0], 1e-9);
    Workbench.type(editor, Models.DECAY);
    waitForLabel("Largest estimated error");
  }

  @Test
  void choosesInitialValues() {
    Combo initial =
        Workbench.find(Combo.class, Workbench.shell()).stream()
            .filter(c -> Arrays.asList(c.getItems()).contains("low"))
            .findFirst()
            .orElseThrow();
    assertEquals("as declared", initial.getText());
    initial.select(1);
    Workbench.send(initial, SWT.Selection, e -> {});
    Workbench.waitUntil(
        "the curve from 1 m",
        () -> Math.abs(chart().getSeriesSet().getSeries("depth").getYSeries()[0] - 1) < 1e-9);
  }

  @Test
  void showsAPartOfTheInterval() {
    Text until = until();
    until.setText("1.5");
    Workbench.send(until, SWT.DefaultSelection, e -> {});
    Workbench.waitUntil("the shorter curve", () -> lastTime() == 1.5);
  }

  private static double lastTime() {
    double[] times = chart().getSeriesSet().getSeries("depth").getXSeries();
    return times[times.length - 1];
  }

  @Test
  void zoomsByDragAndByWheelAndBack() {
    Control area = chart().getPlotArea().getControl();
    Range whole = range(0);
    int width = area.getSize().x;
    int height = area.getSize().y;
    Workbench.send(area, SWT.MouseDown, e -> at(e, width / 4, height / 4, 1));
    Workbench.send(area, SWT.MouseMove, e -> at(e, width / 2, height / 2, 0));
    Workbench.send(area, SWT.MouseUp, e -> at(e, width / 2, height / 2, 1));
    Range dragged = range(0);
    assertEquals(0.25, (dragged.upper - dragged.lower) / (whole.upper - whole.lower), 0.02);
    assertTrue(dragged.lower > whole.lower);

    Workbench.send(
        area,
        SWT.MouseVerticalWheel,
        e -> {
          at(e, width / 2, height / 2, 0);
          e.count = 3;
        });
    assertTrue(range(0).upper - range(0).lower < dragged.upper - dragged.lower);

    Workbench.send(area, SWT.KeyDown, e -> e.keyCode = SWT.BS);
    assertRange(dragged, range(0));
    Workbench.send(area, SWT.MouseDoubleClick, e -> at(e, width / 2, height / 2, 1));
    assertRange(whole, range(0));
  }

  @Test
  void movesByShiftDragAndByKeys() {
    Control area = chart().getPlotArea().getControl();
    Range whole = range(0);
    Workbench.send(
        area,
        SWT.MouseDown,
        e -> {
          at(e, 100, 50, 1);
          e.stateMask = SWT.SHIFT;
        });
    Workbench.send(area, SWT.MouseMove, e -> at(e, 50, 50, 0));
    Workbench.send(area, SWT.MouseUp, e -> at(e, 50, 50, 1));
    assertTrue(range(0).lower > whole.lower);
    assertEquals(whole.upper - whole.lower, range(0).upper - range(0).lower, 1e-9);
    Workbench.send(area, SWT.KeyDown, e -> e.keyCode = SWT.HOME);
    assertRange(whole, range(0));
    Workbench.send(area, SWT.KeyDown, e -> e.character = '+');
    assertTrue(range(0).upper < whole.upper);
    Workbench.send(area, SWT.KeyDown, e -> e.character = '-');
    assertRange(whole, range(0));
    Workbench.send(area, SWT.KeyDown, e -> e.keyCode = SWT.ARROW_RIGHT);
    assertTrue(range(0).lower > whole.lower);
  }

  @Test
  void survivesAnyAmountOfZooming() {
    Control area = chart().getPlotArea().getControl();
    for (int i = 0; i < 400; i++) {
      Workbench.send(area, SWT.KeyDown, e -> e.character = '+');
    }
    Range narrow = range(0);
    assertTrue(narrow.upper > narrow.lower);
    for (int i = 0; i < 3000; i++) {
      area.notifyListeners(SWT.KeyDown, key('-'));
    }
    assertTrue(Double.isFinite(range(0).upper));
  }

  private static Event key(char character) {
    Event event = new Event();
    event.character = character;
    return event;
  }

  @Test
  void readsOutTheValueUnderThePointer() {
    Control area = chart().getPlotArea().getControl();
    int x = chart().getAxisSet().getXAxis(0).getPixelCoordinate(2);
    int y = chart().getAxisSet().getYAxis(0).getPixelCoordinate(2 * Math.exp(-1));
    Workbench.send(area, SWT.MouseMove, e -> at(e, x, y, 0));
    waitForLabel("depth = 0.7");
    waitForLabel("t = ");
    waitForLabel(" \u00b1 ");
    Workbench.send(area, SWT.MouseExit, e -> {});
    assertFalse(labels().stream().anyMatch(l -> l.contains("depth = 0.7")));
    Workbench.send(area, SWT.KeyDown, e -> e.keyCode = SWT.PAGE_DOWN);
    waitForLabel("depth = 2 \u00b1 ");
  }

  @Test
  void hidesACurveByItsLegend() {
    Chart chart = chart();
    Workbench.waitUntil(
        "the legend", () -> chart.getLegend().getBounds("slope") != null && chart.isVisible());
    Rectangle entry = chart.getLegend().getBounds("slope");
    Control legend = (Control) chart.getLegend();
    Workbench.send(legend, SWT.MouseDown, e -> at(e, entry.x + 2, entry.y + 2, 1));
    assertFalse(chart.getSeriesSet().getSeries("slope").isVisible());
    assertEquals("slope [m/s] (hidden)", chart.getSeriesSet().getSeries("slope").getDescription());
    Rectangle again = chart.getLegend().getBounds("slope");
    Workbench.send(legend, SWT.MouseDown, e -> at(e, again.x + 2, again.y + 2, 1));
    assertTrue(chart.getSeriesSet().getSeries("slope").isVisible());
  }

  @Test
  void putsOnlyTheValuesMarkedOnThePlot() {
    Table list =
        Workbench.find(Table.class, Workbench.shell()).stream()
            .filter(t -> (t.getStyle() & SWT.CHECK) != 0)
            .findFirst()
            .orElseThrow();
    assertEquals("depth", list.getItem(0).getText(0));
    assertEquals("m", list.getItem(0).getText(1));
    list.getItem(0).setChecked(false);
    Workbench.send(list, SWT.Selection, e -> e.detail = SWT.CHECK);
    assertEquals(1, chart().getSeriesSet().getSeries().length);
    assertEquals("slope", chart().getSeriesSet().getSeries()[0].getId());
    list.getItem(0).setChecked(true);
    Workbench.send(list, SWT.Selection, e -> e.detail = SWT.CHECK);
    assertEquals(2, chart().getSeriesSet().getSeries().length);
  }

  @Test
  void showsTheNumbersInATable() {
    CTabFolder tabs = (CTabFolder) chart().getParent();
    tabs.setSelection(1);
    Workbench.drain();
    Table table = Workbench.find(Table.class, tabs).stream().findFirst().orElseThrow();
    assertEquals("t [s]", table.getColumn(0).getText());
    assertEquals("depth [m]", table.getColumn(1).getText());
    Workbench.waitUntil("the first line", () -> table.getItem(0).getText(1).equals("2"));
    tabs.setSelection(0);
  }

  @Test
  void refusesInsideTheViewAndAsksForWhatIsMissing() {
    Workbench.type(editor, Models.DECAY.replace(" over t [s] from 0 to 4", " over t [s] from 0"));
    Workbench.waitUntil(
        "a reason",
        () -> labels().stream().anyMatch(l -> l.contains("interval of system Float")),
        () -> labels().toString());
    assertEquals(List.of(), Workbench.find(Chart.class, Workbench.shell()));
    Text until = until();
    until.setText("3");
    Workbench.send(until, SWT.DefaultSelection, e -> {});
    waitForCurve("depth");
    Workbench.waitUntil("the curve up to 3 s", () -> lastTime() == 3);
  }

  @Test
  void aWordInPlaceOfATimeIsNotTaken() {
    Text until = until();
    until.setText("soon");
    Workbench.send(until, SWT.DefaultSelection, e -> {});
    assertEquals("", until.getText());
    assertEquals(4, lastTime());
  }

  @Test
  void exportsWhatTheCommandLineWouldWrite() {
    String text = view().tableText().orElseThrow();
    List<String> lines = text.lines().toList();
    assertEquals("t,depth,slope", lines.getFirst());
    String[] first = lines.get(1).split(",");
    assertEquals(0, Double.parseDouble(first[0]));
    assertEquals(2, Double.parseDouble(first[1]), 1e-12);
    // 17 significant digits give the double back.
    double[] drawn = chart().getSeriesSet().getSeries("depth").getYSeries();
    assertEquals(drawn[7], Double.parseDouble(lines.get(8).split(",")[1]));
    assertEquals(drawn.length + 1, lines.size());
  }

  @Test
  void exportsAPictureForWhitePaperInAnyTheme() {
    ThemeTests.setTheme(ThemeTests.DARK);
    try {
      ImageData picture = view().picture().orElseThrow();
      assertEquals(2 * chart().getSize().x, picture.width);
      RGB corner = picture.palette.getRGB(picture.getPixel(2, 2));
      assertEquals(new RGB(255, 255, 255), corner);
      RGB onScreen = chart().getBackground().getRGB();
      assertTrue(onScreen.red < 100, "the plot on the screen stays dark");
    } finally {
      ThemeTests.setTheme(ThemeTests.LIGHT);
    }
  }

  private static SolutionView view() {
    return (SolutionView) Workbench.page().findView(UiIds.SOLUTION_VIEW);
  }

  private static Text until() {
    return Workbench.find(Text.class, Workbench.shell()).stream()
        .filter(t -> t.getMessage().equals("end") || t.getMessage().equals("a number"))
        .findFirst()
        .orElseThrow();
  }

  @Test
  void changesToAnotherEditor() throws Exception {
    Workbench.open(Workbench.file(project, "other.span", Models.DECAY.replace("depth", "height")));
    waitForCurve("height");
    Workbench.page().activate(editor);
    waitForCurve("depth");
  }

  @Test
  void saysWhatIsMissingWhenThereIsNothingToShow() {
    Workbench.page().closeAllEditors(false);
    waitForLabel("Open a model file to see its solution.");
  }

  private static Range range(int axis) {
    return new Range(chart().getAxisSet().getXAxis(axis).getRange());
  }

  private static void assertRange(Range expected, Range actual) {
    double size = expected.upper - expected.lower;
    assertEquals(expected.lower, actual.lower, 1e-9 * size);
    assertEquals(expected.upper, actual.upper, 1e-9 * size);
  }

  private static void at(Event event, int x, int y, int button) {
    event.x = x;
    event.y = y;
    event.button = button;
    event.count = 1;
  }
}
