/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.solution;

import java.util.Optional;
import org.eclipse.swt.SWT;
import org.eclipse.swt.events.PaintEvent;
import org.eclipse.swt.graphics.Point;
import org.eclipse.swt.graphics.Rectangle;
import org.eclipse.swtchart.ICustomPaintListener;

/** The sample under the pointer and the rubber band, drawn over the curves. */
final class PlotCursor implements ICustomPaintListener {

  private static final int RADIUS = 4;

  private final SolutionPlot plot;
  private Optional<Reading> reading = Optional.empty();
  private Optional<Rectangle> band = Optional.empty();

  /**
   * A sample of a curve.
   *
   * @param curve the curve
   * @param sample number of the sample
   */
  record Reading(Curve curve, int sample) {

    double time() {
      return curve.times()[sample];
    }

    double value() {
      return curve.values()[sample];
    }

    double error() {
      return sample < curve.errors().length ? curve.errors()[sample] : Double.NaN;
    }
  }

  PlotCursor(SolutionPlot plot) {
    this.plot = plot;
    plot.chart().getPlotArea().addCustomPaintListener(this);
  }

  Optional<Reading> reading() {
    return reading;
  }

  void clear() {
    reading = Optional.empty();
    plot.area().redraw();
  }

  /**
   * Takes the sample nearest to a place of the plot area: of all curves, the one nearest at that
   * time.
   */
  void moveTo(int x, int y) {
    double time = plot.timeAxis().getDataCoordinate(x);
    Reading nearest = null;
    double distance = Double.POSITIVE_INFINITY;
    for (Curve curve : plot.visibleCurves()) {
      Reading candidate = new Reading(curve, curve.nearest(time));
      Point at = pixel(candidate);
      double away = Math.hypot(at.x - x, at.y - y);
      if (away < distance) {
        distance = away;
        nearest = candidate;
      }
    }
    reading = Optional.ofNullable(nearest);
    plot.area().redraw();
  }

  /** Moves along the curve by samples; begins with the first curve. */
  void step(int samples) {
    reading =
        reading
            .map(r ->
                new Reading(
                    r.curve(),
                    Math.clamp(r.sample() + (long) samples, 0, r.curve().times().length - 1)))
            .or(() -> plot.visibleCurves().stream().findFirst().map(c -> new Reading(c, 0)));
    plot.area().redraw();
  }

  void showBand(Rectangle rectangle) {
    band = Optional.of(rectangle);
    plot.area().redraw();
  }

  void hideBand() {
    band = Optional.empty();
    plot.area().redraw();
  }

  private Point pixel(Reading r) {
    return new Point(
        plot.timeAxis().getPixelCoordinate(r.time()),
        plot.axisOf(r.curve()).getPixelCoordinate(r.value()));
  }

  @Override
  public void paintControl(PaintEvent event) {
    event.gc.setForeground(plot.palette().cursor());
    event.gc.setLineWidth(1);
    reading
        .filter(r -> plot.visibleCurves().contains(r.curve()))
        .ifPresent(r -> {
          Point at = pixel(r);
          event.gc.setLineStyle(SWT.LINE_DOT);
          event.gc.drawLine(at.x, 0, at.x, plot.area().getSize().y);
          event.gc.setLineStyle(SWT.LINE_SOLID);
          event.gc.drawOval(at.x - RADIUS, at.y - RADIUS, 2 * RADIUS, 2 * RADIUS);
        });
    band.ifPresent(b -> {
      event.gc.setLineStyle(SWT.LINE_DASH);
      event.gc.drawRectangle(b);
    });
  }

  @Override
  public boolean drawBehindSeries() {
    return false;
  }
}
