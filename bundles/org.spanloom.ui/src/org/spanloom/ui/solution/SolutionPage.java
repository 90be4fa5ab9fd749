/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.solution;

import java.util.List;
import java.util.Optional;
import java.util.SequencedSet;
import java.util.function.Consumer;
import org.eclipse.swt.SWT;
import org.eclipse.swt.custom.CTabFolder;
import org.eclipse.swt.custom.CTabItem;
import org.eclipse.swt.custom.SashForm;
import org.eclipse.swt.custom.StackLayout;
import org.eclipse.swt.graphics.ImageData;
import org.eclipse.swt.layout.GridData;
import org.eclipse.swt.layout.GridLayout;
import org.eclipse.swt.widgets.Composite;
import org.eclipse.swt.widgets.Control;
import org.eclipse.swt.widgets.Label;
import org.spanloom.analysis.solve.SolutionTable;
import org.spanloom.ui.Labels;

/**
 * The widgets of the view: choices above, values and curves in the middle, what is known about them
 * below.
 */
final class SolutionPage {

  private static final int[] LIST_TO_PLOT = {25, 75};
  private static final int MESSAGE_MARGIN = 12;
  private static final int ERRORS_NAMED = 3;

  private final Composite root;
  private final SolutionControls controls;
  private final Composite stack;
  private final StackLayout pages = new StackLayout();
  private final Label message;
  private final Composite messagePage;
  private final Composite resultPage;
  private final ColumnList list;
  private final SolutionPlot plot;
  private final PlotController controller;
  private final ValueTable values;
  private final Label readOut;
  private final Label status;
  private final Label method;

  SolutionPage(
      Composite parent,
      Consumer<Choice> choose,
      Consumer<PlotAxes> chooseAxes,
      Consumer<SequencedSet<String>> chooseColumns) {
    root = new Composite(parent, SWT.NONE);
    GridLayout layout = new GridLayout(1, false);
    layout.marginWidth = 0;
    layout.marginHeight = 0;
    layout.verticalSpacing = 0;
    root.setLayout(layout);
    controls = new SolutionControls(root, choose, chooseAxes);
    stack = new Composite(root, SWT.NONE);
    stack.setLayoutData(new GridData(SWT.FILL, SWT.FILL, true, true));
    stack.setLayout(pages);

    messagePage = new Composite(stack, SWT.NONE);
    GridLayout messageLayout = new GridLayout(1, false);
    messageLayout.marginWidth = MESSAGE_MARGIN;
    messageLayout.marginHeight = MESSAGE_MARGIN;
    messagePage.setLayout(messageLayout);
    message = new Label(messagePage, SWT.WRAP);
    message.setLayoutData(new GridData(SWT.FILL, SWT.TOP, true, false));

    resultPage = new Composite(stack, SWT.NONE);
    GridLayout resultLayout = new GridLayout(1, false);
    resultLayout.marginWidth = 0;
    resultLayout.marginHeight = 0;
    resultPage.setLayout(resultLayout);
    SashForm sash = new SashForm(resultPage, SWT.HORIZONTAL);
    sash.setLayoutData(new GridData(SWT.FILL, SWT.FILL, true, true));
    list = new ColumnList(sash, () -> chooseColumns.accept(chosen()));
    CTabFolder tabs = new CTabFolder(sash, SWT.BOTTOM);
    plot = new SolutionPlot(tabs);
    tab(tabs, "Plot", plot.chart());
    values = new ValueTable(tabs);
    tab(tabs, "Table", values.control());
    tabs.setSelection(0);
    sash.setWeights(LIST_TO_PLOT);
    readOut = line(resultPage);
    status = line(resultPage);
    method = line(resultPage);
    controller = new PlotController(plot, readOut::setText);
    showPage(messagePage);
  }

  private static void tab(CTabFolder tabs, String text, Control control) {
    CTabItem item = new CTabItem(tabs, SWT.NONE);
    item.setText(text);
    item.setControl(control);
  }

  private static Label line(Composite parent) {
    Label label = new Label(parent, SWT.NONE);
    GridData data = new GridData(SWT.FILL, SWT.BOTTOM, true, false);
    data.horizontalIndent = 4;
    label.setLayoutData(data);
    return label;
  }

  private SequencedSet<String> chosen() {
    return list.chosen();
  }

  Control control() {
    return root;
  }

  SolutionControls controls() {
    return controls;
  }

  private void showPage(Composite page) {
    pages.topControl = page;
    stack.layout();
  }

  /** Shows a message in place of curves. */
  void showMessage(String text) {
    message.setText(text.replace("&", "&&"));
    messagePage.layout(true);
    controls.showAxes(List.of(), new PlotAxes("", Optional.empty()));
    showPage(messagePage);
  }

  /** Leaves the curves and says below that they are not those of the text as it stands. */
  void showStale(String text) {
    setStatus(text);
  }

  /** Shows a solution. */
  void showSolution(
      SolutionTable table, SequencedSet<String> columns, PlotAxes wanted, boolean keepZoom) {
    showPage(resultPage);
    List<Curve> curves = Curve.of(table).stream().filter(c -> columns.contains(c.name())).toList();
    List<String> units = PlotAxes.units(curves);
    PlotAxes axes = wanted.keptFor(units);
    controls.showAxes(units, axes);
    list.show(table, columns);
    values.show(table, columns);
    controller.reset(table.time().name(), table.time().unit());
    plot.show(Labels.withUnit(table.time().name(), table.time().unit()), curves, axes, keepZoom);
    method.setText("Method: " + table.method());
    long notDrawn = units.stream().filter(u -> !axes.show(u)).count();
    setStatus(
        summary(table, columns)
            + (notDrawn == 0
                ? ""
                : "   Not drawn: curves in " + notDrawn + " more unit(s), see Axes."));
  }

  private static String summary(SolutionTable table, SequencedSet<String> columns) {
    List<String> errors =
        table.columns().stream()
            .filter(c -> columns.contains(c.name()))
            .limit(ERRORS_NAMED)
            .map(c -> c.name() + " \u00b1 " + Labels.error(c.largestError()) + unit(c))
            .toList();
    String more = columns.size() > ERRORS_NAMED ? ", ..." : "";
    return "Largest estimated error: " + String.join(", ", errors) + more;
  }

  private static String unit(SolutionTable.Column column) {
    return column.unit().equals("1") ? "" : " " + column.unit();
  }

  private void setStatus(String text) {
    status.setText(text.replace("&", "&&"));
    status.setToolTipText(text);
  }

  void showWhole() {
    controller.showWhole();
  }

  void back() {
    controller.back();
  }

  ImageData picture() {
    return plot.picture();
  }

  void readColours() {
    if (!root.isDisposed()) {
      plot.readColours();
    }
  }

  void setFocus() {
    if (pages.topControl == resultPage) {
      plot.area().setFocus();
    } else {
      controls.control().setFocus();
    }
  }
}
