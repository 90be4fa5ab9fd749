/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.solution;

import java.util.ArrayDeque;
import java.util.Deque;
import java.util.Optional;
import java.util.function.Consumer;
import org.eclipse.swt.SWT;
import org.eclipse.swt.graphics.Point;
import org.eclipse.swt.graphics.Rectangle;
import org.eclipse.swt.widgets.Control;
import org.eclipse.swt.widgets.Event;
import org.eclipse.swtchart.IAxis;
import org.spanloom.ui.Labels;

/**
 * Zoom, pan and cursor of a plot.
 *
 * <table>
 * <caption>Gestures</caption>
 * <tr><td>drag</td><td>zoom to the rectangle</td></tr>
 * <tr><td>drag with Shift, or with the middle or right button</td><td>move</td></tr>
 * <tr><td>wheel; with Ctrl; with Shift</td><td>zoom at the pointer; time only; values only</td></tr>
 * <tr><td>double click, Home</td><td>show all</td></tr>
 * <tr><td>plus, minus, arrows</td><td>zoom and move</td></tr>
 * <tr><td>Backspace</td><td>back to what was shown before</td></tr>
 * <tr><td>Page Up, Page Down</td><td>cursor to the sample before, after</td></tr>
 * <tr><td>click in the legend</td><td>hide or show a curve</td></tr>
 * </table>
 */
final class PlotController {

  private static final double ZOOM_IN = 0.8;
  private static final double STEP = 0.1;
  private static final int LEAST_DRAG = 6;
  private static final int REMEMBERED = 50;
  private static final int DIGITS = 9;
  private static final int TIME_DIGITS = 6;
  private static final int SECOND_BUTTON = 2;
  private static final int THIRD_BUTTON = 3;

  private final SolutionPlot plot;
  private final PlotCursor cursor;
  private final Consumer<String> readOut;
  private String timeName = "";
  private String timeUnit = "";
  private final Deque<Zoom> past = new ArrayDeque<>();
  private Optional<Drag> drag = Optional.empty();

  /** A mouse button held down. */
  private record Drag(Point from, boolean pans, Zoom before) {}

  /**
   * Takes over the gestures of a plot.
   *
   * @param readOut told the value under the cursor, empty where there is none
   */
  PlotController(SolutionPlot plot, Consumer<String> readOut) {
    this.plot = plot;
    this.cursor = new PlotCursor(plot);
    this.readOut = readOut;
    Control area = plot.area();
    area.addListener(SWT.MouseDown, this::pressed);
    area.addListener(SWT.MouseMove, this::moved);
    area.addListener(SWT.MouseUp, this::released);
    area.addListener(SWT.MouseDoubleClick, e -> showWhole());
    area.addListener(SWT.MouseExit, e -> left());
    area.addListener(SWT.MouseVerticalWheel, this::wheelTurned);
    area.addListener(SWT.KeyDown, this::keyPressed);
    area.addListener(SWT.MenuDetect, e -> e.doit = false);
    plot.legend().ifPresent(l -> l.addListener(SWT.MouseDown, this::legendPressed));
  }

  /** Forgets cursor and history, for new curves. */
  void reset(String newTimeName, String newTimeUnit) {
    timeName = newTimeName;
    timeUnit = newTimeUnit;
    cursor.clear();
    readOut.accept("");
  }

  /** Shows all of the curves. */
  void showWhole() {
    go(plot.whole());
  }

  /** Goes back to what was shown before. */
  void back() {
    if (!past.isEmpty()) {
      plot.apply(past.pop());
    }
  }

  private void go(Zoom zoom) {
    remember(plot.zoom());
    plot.apply(zoom);
  }

  private void remember(Zoom zoom) {
    if (!zoom.equals(past.peek())) {
      past.push(zoom);
    }
    if (past.size() > REMEMBERED) {
      past.removeLast();
    }
  }

  private void pressed(Event event) {
    plot.area().forceFocus();
    boolean other = event.button == SECOND_BUTTON || event.button == THIRD_BUTTON;
    boolean pans = other || (event.stateMask & SWT.SHIFT) != 0;
    if (event.count <= 1) {
      drag = Optional.of(new Drag(new Point(event.x, event.y), pans, plot.zoom()));
    }
  }

  private void moved(Event event) {
    if (drag.isEmpty()) {
      cursor.moveTo(event.x, event.y);
      tell();
    } else if (drag.get().pans()) {
      pan(drag.get(), event);
    } else {
      cursor.showBand(rectangle(drag.get(), event));
    }
  }

  private void released(Event event) {
    drag.ifPresent(d -> {
      drag = Optional.empty();
      cursor.hideBand();
      Rectangle chosen = rectangle(d, event);
      boolean dragged = chosen.width >= LEAST_DRAG && chosen.height >= LEAST_DRAG;
      if (d.pans()) {
        remember(d.before());
      } else if (dragged) {
        go(zoomTo(chosen));
      }
    });
  }

  private void left() {
    if (drag.isEmpty()) {
      cursor.clear();
      readOut.accept("");
    }
  }

  private static Rectangle rectangle(Drag drag, Event event) {
    return new Rectangle(
        Math.min(drag.from().x, event.x),
        Math.min(drag.from().y, event.y),
        Math.abs(event.x - drag.from().x),
        Math.abs(event.y - drag.from().y));
  }

  private Zoom zoomTo(Rectangle r) {
    Zoom now = plot.zoom();
    return new Zoom(
        usable(between(plot.timeAxis(), r.x, r.x + r.width), now.time()),
        usable(between(plot.leftAxis(), r.y + r.height, r.y), now.left()),
        usable(between(plot.rightAxis(), r.y + r.height, r.y), now.right()));
  }

  private static Extent between(IAxis axis, int from, int to) {
    return new Extent(axis.getDataCoordinate(from), axis.getDataCoordinate(to));
  }

  private static Extent usable(Extent wanted, Extent otherwise) {
    return wanted.isUsable() ? wanted : otherwise;
  }

  private void pan(Drag d, Event event) {
    Point size = plot.area().getSize();
    double across = (double) (d.from().x - event.x) / Math.max(1, size.x);
    double up = (double) (event.y - d.from().y) / Math.max(1, size.y);
    plot.apply(d.before().withTime(e -> e.moved(across)).withValues(e -> e.moved(up)));
  }

  private void wheelTurned(Event event) {
    if (event.count == 0) {
      return;
    }
    double factor = event.count > 0 ? ZOOM_IN : 1 / ZOOM_IN;
    boolean timeOnly = (event.stateMask & SWT.MOD1) != 0;
    boolean valuesOnly = (event.stateMask & SWT.SHIFT) != 0;
    Zoom now = plot.zoom();
    double t = plot.timeAxis().getDataCoordinate(event.x);
    double l = plot.leftAxis().getDataCoordinate(event.y);
    double r = plot.rightAxis().getDataCoordinate(event.y);
    go(
        new Zoom(
            valuesOnly ? now.time() : now.time().scaled(t, factor),
            timeOnly ? now.left() : now.left().scaled(l, factor),
            timeOnly ? now.right() : now.right().scaled(r, factor)));
    event.doit = false;
  }

  private void keyPressed(Event event) {
    switch (event.keyCode) {
      case SWT.HOME -> showWhole();
      case SWT.ARROW_LEFT -> go(plot.zoom().withTime(e -> e.moved(-STEP)));
      case SWT.ARROW_RIGHT -> go(plot.zoom().withTime(e -> e.moved(STEP)));
      case SWT.ARROW_UP -> go(plot.zoom().withValues(e -> e.moved(STEP)));
      case SWT.ARROW_DOWN -> go(plot.zoom().withValues(e -> e.moved(-STEP)));
      case SWT.PAGE_UP -> stepCursor(-1);
      case SWT.PAGE_DOWN -> stepCursor(1);
      case SWT.BS -> back();
      case SWT.KEYPAD_ADD -> zoomAtMiddle(ZOOM_IN);
      case SWT.KEYPAD_SUBTRACT -> zoomAtMiddle(1 / ZOOM_IN);
      default -> {
        if (event.character == '+' || event.character == '=') {
          zoomAtMiddle(ZOOM_IN);
        } else if (event.character == '-') {
          zoomAtMiddle(1 / ZOOM_IN);
        }
      }
    }
  }

  private void zoomAtMiddle(double factor) {
    go(
        plot.zoom()
            .withTime(e -> e.scaled(e.middle(), factor))
            .withValues(e -> e.scaled(e.middle(), factor)));
  }

  private void stepCursor(int samples) {
    cursor.step(samples);
    tell();
  }

  private void tell() {
    readOut.accept(
        cursor
            .reading()
            .map(r ->
                "%s = %s   %s = %s"
                    .formatted(
                        timeName,
                        Labels.amount(r.time(), timeUnit, TIME_DIGITS),
                        r.curve().name(),
                        Labels.amount(r.value(), r.error(), r.curve().unit(), DIGITS)))
            .orElse(""));
  }

  private void legendPressed(Event event) {
    plot.legendEntryAt(event.x, event.y).ifPresent(plot::toggle);
  }
}
