/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.solution;

import java.util.ArrayList;
import java.util.List;
import java.util.SequencedSet;
import org.eclipse.swt.SWT;
import org.eclipse.swt.widgets.Composite;
import org.eclipse.swt.widgets.Control;
import org.eclipse.swt.widgets.Table;
import org.eclipse.swt.widgets.TableColumn;
import org.eclipse.swt.widgets.TableItem;
import org.spanloom.analysis.solve.SolutionTable;
import org.spanloom.ui.Labels;

/**
 * The values behind the curves, for reading and for screen readers; only the lines in sight are
 * filled.
 */
final class ValueTable {

  private static final int WIDTH = 110;
  private static final int DIGITS = 10;

  private final Table table;
  private List<double[]> values = List.of();

  ValueTable(Composite parent) {
    table = new Table(parent, SWT.VIRTUAL | SWT.FULL_SELECTION | SWT.MULTI);
    table.setHeaderVisible(true);
    table.setLinesVisible(true);
    table.addListener(SWT.SetData, e -> fill((TableItem) e.item, e.index));
  }

  Control control() {
    return table;
  }

  /** Shows the time and the columns chosen. */
  void show(SolutionTable solution, SequencedSet<String> chosen) {
    List<SolutionTable.Column> columns = new ArrayList<>();
    columns.add(solution.time());
    solution.columns().stream().filter(c -> chosen.contains(c.name())).forEach(columns::add);
    table.setRedraw(false);
    try {
      table.removeAll();
      values = columns.stream().map(SolutionTable.Column::values).toList();
      for (int i = 0; i < columns.size(); i++) {
        TableColumn column =
            i < table.getColumnCount() ? table.getColumn(i) : new TableColumn(table, SWT.RIGHT);
        column.setText(Labels.withUnit(columns.get(i).name(), columns.get(i).unit()));
        column.setWidth(WIDTH);
      }
      for (int i = table.getColumnCount() - 1; i >= columns.size(); i--) {
        table.getColumn(i).dispose();
      }
      table.setItemCount(values.getFirst().length);
    } finally {
      table.setRedraw(true);
    }
  }

  private void fill(TableItem item, int row) {
    for (int i = 0; i < values.size(); i++) {
      item.setText(i, Labels.number(values.get(i)[row], DIGITS));
    }
  }
}
