/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.solution;

import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import org.eclipse.jface.resource.JFaceResources;
import org.eclipse.swt.SWT;
import org.eclipse.swt.accessibility.AccessibleAdapter;
import org.eclipse.swt.accessibility.AccessibleEvent;
import org.eclipse.swt.graphics.GC;
import org.eclipse.swt.graphics.Image;
import org.eclipse.swt.graphics.ImageData;
import org.eclipse.swt.graphics.Point;
import org.eclipse.swt.graphics.Rectangle;
import org.eclipse.swt.widgets.Composite;
import org.eclipse.swt.widgets.Control;
import org.eclipse.swtchart.Chart;
import org.eclipse.swtchart.IAxis;
import org.eclipse.swtchart.ILineSeries;
import org.eclipse.swtchart.ILineSeries.PlotSymbolType;
import org.eclipse.swtchart.ISeries;
import org.eclipse.swtchart.ISeries.SeriesType;
import org.eclipse.swtchart.LineStyle;
import org.eclipse.swtchart.Range;
import org.eclipse.swtchart.model.DoubleArraySeriesModel;
import org.spanloom.ui.Labels;

/** Draws curves over one time axis and up to two value axes, each for one unit. */
final class SolutionPlot {

  /** Without it, every move of the mouse would paint the chart anew. */
  private static final int STYLE = Chart.NO_AXIS_POSITION_UPDATE;

  private static final String CSS_OFF = "org.eclipse.e4.ui.css.disabled";
  private static final int LINE_WIDTH = 2;
  private static final int NAMES_AT_AXIS = 3;
  private static final int EXPORT_SCALE = 2;

  /** Told apart without colours too. */
  private static final LineStyle[] STYLES = {
    LineStyle.SOLID, LineStyle.DASH, LineStyle.DOT, LineStyle.DASHDOT
  };

  private final Chart chart;
  private final IAxis time;
  private final IAxis left;
  private final IAxis right;
  private final Set<String> hidden = new HashSet<>();
  private List<Curve> curves = List.of();
  private PlotAxes axes = new PlotAxes("", Optional.empty());
  private Zoom whole = new Zoom(new Extent(0, 1), new Extent(0, 1), new Extent(0, 1));
  private PlotPalette palette = PlotPalette.ofTheme();
  private String summary = "";

  SolutionPlot(Composite parent) {
    chart = new Chart(parent, SWT.NONE | STYLE);
    chart.getTitle().setVisible(false);
    chart.getLegend().setPosition(SWT.TOP);
    time = chart.getAxisSet().getXAxis(0);
    left = chart.getAxisSet().getYAxis(0);
    right = chart.getAxisSet().getYAxis(chart.getAxisSet().createYAxis());
    right.setPosition(IAxis.Position.Secondary);
    right.getGrid().setStyle(LineStyle.NONE);
    for (IAxis axis : List.of(time, left, right)) {
      axis.getTick().setFormat(new TickFormat());
      axis.getTitle().setFont(JFaceResources.getDefaultFont());
    }
    ownColours(chart);
    describe();
    paint(palette);
  }

  /** The dark stylesheet would give the parts of the chart colours of its own. */
  private static void ownColours(Control control) {
    control.setData(CSS_OFF, Boolean.TRUE);
    if (control instanceof Composite composite) {
      for (Control child : composite.getChildren()) {
        ownColours(child);
      }
    }
  }

  private void describe() {
    area()
        .getAccessible()
        .addAccessibleListener(
            new AccessibleAdapter() {
              @Override
              public void getName(AccessibleEvent event) {
                event.result = "Plot of the solution";
              }

              @Override
              public void getDescription(AccessibleEvent event) {
                event.result = summary;
              }
            });
  }

  Chart chart() {
    return chart;
  }

  /** Returns the control that the curves are drawn in. */
  Control area() {
    return chart.getPlotArea().getControl();
  }

  Optional<Control> legend() {
    return chart.getLegend() instanceof Control control ? Optional.of(control) : Optional.empty();
  }

  /**
   * Replaces the curves.
   *
   * @param timeLabel name and unit of the time axis
   * @param newCurves the curves to draw
   * @param keepZoom whether what is shown stays shown
   */
  void show(String timeLabel, List<Curve> newCurves, PlotAxes newAxes, boolean keepZoom) {
    Optional<Zoom> kept = keepZoom && !isWhole() ? Optional.of(zoom()) : Optional.empty();
    curves = newCurves.stream().filter(c -> newAxes.show(c.unit())).toList();
    axes = newAxes;
    chart.suspendUpdate(true);
    try {
      for (ISeries<?> series : chart.getSeriesSet().getSeries()) {
        chart.getSeriesSet().deleteSeries(series.getId());
      }
      for (Curve curve : curves) {
        addSeries(curve);
      }
      time.getTitle().setText(timeLabel);
      left.getTitle().setText(axisTitle(axes.left()));
      right.getTitle().setText(axes.right().map(this::axisTitle).orElse(""));
      right.getTitle().setVisible(axes.right().isPresent());
      right.getTick().setVisible(axes.right().isPresent());
      paintSeries();
      whole = wholeZoom();
      apply(kept.orElse(whole));
    } finally {
      chart.suspendUpdate(false);
    }
    summary =
        timeLabel + "; " + String.join(", ", curves.stream().map(Curve::label).distinct().toList());
    chart.redraw();
  }

  private void addSeries(Curve curve) {
    ILineSeries<?> series =
        (ILineSeries<?>) chart.getSeriesSet().createSeries(SeriesType.LINE, curve.id());
    setData(series, curve);
    series.setDescription(curve.label());
    series.setVisibleInLegend(curve.piece() == 0);
    series.setSymbolType(curve.times().length == 1 ? PlotSymbolType.CIRCLE : PlotSymbolType.NONE);
    series.setLineWidth(LINE_WIDTH);
    series.setLineStyle(STYLES[curve.column() % STYLES.length]);
    series.setAntialias(SWT.ON);
    if (axes.isRight(curve.unit())) {
      series.setYAxisId(right.getId());
    }
    showHidden(series, curve);
  }

  /** The series of this chart are all made of plain arrays, which is what its raw type hides. */
  @SuppressWarnings({"unchecked", "rawtypes"})
  private static void setData(ISeries series, Curve curve) {
    series.setDataModel(new DoubleArraySeriesModel(curve.times(), curve.values()));
  }

  private String axisTitle(String unit) {
    List<String> names =
        curves.stream().filter(c -> c.unit().equals(unit)).map(Curve::name).distinct().toList();
    String words =
        names.size() <= NAMES_AT_AXIS ? String.join(", ", names) : names.size() + " values";
    return Labels.withUnit(words, unit);
  }

  private Zoom wholeZoom() {
    double start = curves.stream().mapToDouble(c -> c.times()[0]).min().orElse(0);
    double end = curves.stream().mapToDouble(c -> c.times()[c.times().length - 1]).max().orElse(1);
    return new Zoom(
        Extent.exactly(start, end), valueExtent(axes.left()), valueExtent(axes.right().orElse("")));
  }

  private Extent valueExtent(String unit) {
    List<Curve> shown =
        curves.stream().filter(c -> c.unit().equals(unit) && !hidden.contains(c.name())).toList();
    if (shown.isEmpty()) {
      return new Extent(0, 1);
    }
    return Extent.around(
        shown.stream().mapToDouble(Curve::least).min().orElse(0),
        shown.stream().mapToDouble(Curve::most).max().orElse(1));
  }

  /** Returns the curves drawn, hidden ones left out. */
  List<Curve> visibleCurves() {
    return curves.stream().filter(c -> !hidden.contains(c.name())).toList();
  }

  /** Hides a column that is shown, or shows it again. */
  void toggle(String name) {
    if (!hidden.remove(name)) {
      hidden.add(name);
    }
    boolean wasWhole = isWhole();
    for (Curve curve : curves) {
      showHidden(chart.getSeriesSet().getSeries(curve.id()), curve);
    }
    whole = wholeZoom();
    if (wasWhole) {
      apply(whole);
    }
    chart.updateLayout();
    chart.redraw();
  }

  private void showHidden(ISeries<?> series, Curve curve) {
    boolean isHidden = hidden.contains(curve.name());
    series.setVisible(!isHidden);
    series.setDescription(isHidden ? curve.label() + " (hidden)" : curve.label());
  }

  /** Returns the column whose entry of the legend is at a place, if there is one. */
  Optional<String> legendEntryAt(int x, int y) {
    return curves.stream()
        .filter(c -> c.piece() == 0)
        .filter(c -> {
          Rectangle bounds = chart.getLegend().getBounds(c.id());
          return bounds != null && bounds.contains(x, y);
        })
        .map(Curve::name)
        .findFirst();
  }

  /** Returns what is shown. */
  Zoom zoom() {
    return new Zoom(extent(time), extent(left), extent(right));
  }

  private static Extent extent(IAxis axis) {
    return new Extent(axis.getRange().lower, axis.getRange().upper);
  }

  /** Returns what shows all of the curves. */
  Zoom whole() {
    return whole;
  }

  private boolean isWhole() {
    return zoom().equals(whole);
  }

  /** Shows a part of the curves. */
  void apply(Zoom zoom) {
    set(time, zoom.time());
    set(left, zoom.left());
    set(right, zoom.right());
    chart.redraw();
  }

  private static void set(IAxis axis, Extent extent) {
    if (extent.isUsable()) {
      axis.setRange(new Range(extent.lower(), extent.upper()));
    }
  }

  IAxis timeAxis() {
    return time;
  }

  IAxis leftAxis() {
    return left;
  }

  IAxis rightAxis() {
    return right;
  }

  /** Returns the axis that a curve belongs to. */
  IAxis axisOf(Curve curve) {
    return axes.isRight(curve.unit()) ? right : left;
  }

  PlotPalette palette() {
    return palette;
  }

  /** Takes the colours of the current theme. */
  void readColours() {
    palette = PlotPalette.ofTheme();
    paint(palette);
    chart.redraw();
  }

  private void paint(PlotPalette colours) {
    chart.setBackground(colours.background());
    chart.getPlotArea().setBackground(colours.background());
    chart.getLegend().setBackground(colours.background());
    chart.getLegend().setForeground(colours.foreground());
    for (IAxis axis : List.of(time, left, right)) {
      axis.getTitle().setForeground(colours.foreground());
      axis.getTick().setForeground(colours.foreground());
      axis.getGrid().setForeground(colours.grid());
    }
    paintSeries(colours);
  }

  private void paintSeries() {
    paintSeries(palette);
  }

  private void paintSeries(PlotPalette colours) {
    for (Curve curve : curves) {
      if (chart.getSeriesSet().getSeries(curve.id()) instanceof ILineSeries<?> series) {
        series.setLineColor(colours.series(curve.column()));
        series.setSymbolColor(colours.series(curve.column()));
      }
    }
  }

  /**
   * Returns a picture of the plot, at twice the size of the screen and in colours for white paper.
   */
  ImageData picture() {
    Point size = chart.getSize();
    Image image =
        new Image(
            chart.getDisplay(),
            Math.max(1, size.x) * EXPORT_SCALE,
            Math.max(1, size.y) * EXPORT_SCALE);
    GC gc = new GC(image);
    paint(PlotPalette.forPaper());
    try {
      chart.printChart(gc, image.getBounds());
      return image.getImageData();
    } finally {
      paint(palette);
      gc.dispose();
      image.dispose();
    }
  }
}
