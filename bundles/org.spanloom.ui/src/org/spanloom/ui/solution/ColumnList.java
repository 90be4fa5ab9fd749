/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.ui.solution;

import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.SequencedSet;
import org.eclipse.swt.SWT;
import org.eclipse.swt.accessibility.AccessibleAdapter;
import org.eclipse.swt.accessibility.AccessibleEvent;
import org.eclipse.swt.widgets.Composite;
import org.eclipse.swt.widgets.Control;
import org.eclipse.swt.widgets.Table;
import org.eclipse.swt.widgets.TableColumn;
import org.eclipse.swt.widgets.TableItem;
import org.spanloom.analysis.solve.SolutionTable;

/** The states and outputs of a solution, each with a check mark that puts it on the plot. */
final class ColumnList {

  private static final int NAME_WIDTH = 85;
  private static final int UNIT_WIDTH = 55;

  private final Table table;

  ColumnList(Composite parent, Runnable changed) {
    table = new Table(parent, SWT.CHECK | SWT.FULL_SELECTION | SWT.V_SCROLL);
    table.setHeaderVisible(true);
    column("Value", NAME_WIDTH);
    column("Unit", UNIT_WIDTH);
    table.addListener(
        SWT.Selection,
        e -> {
          if (e.detail == SWT.CHECK) {
            changed.run();
          }
        });
    table
        .getAccessible()
        .addAccessibleListener(
            new AccessibleAdapter() {
              @Override
              public void getDescription(AccessibleEvent event) {
                event.result = "States and outputs; those with a check mark are on the plot";
              }
            });
  }

  private void column(String title, int width) {
    TableColumn column = new TableColumn(table, SWT.NONE);
    column.setText(title);
    column.setWidth(width);
  }

  Control control() {
    return table;
  }

  /** Lists the columns of a solution and marks those chosen. */
  void show(SolutionTable solution, SequencedSet<String> chosen) {
    table.setRedraw(false);
    try {
      List<SolutionTable.Column> columns = solution.columns();
      for (int i = 0; i < columns.size(); i++) {
        TableItem item =
            i < table.getItemCount() ? table.getItem(i) : new TableItem(table, SWT.NONE);
        SolutionTable.Column column = columns.get(i);
        item.setText(new String[] {column.name(), column.unit().equals("1") ? "" : column.unit()});
        item.setChecked(chosen.contains(column.name()));
      }
      if (table.getItemCount() > columns.size()) {
        table.remove(columns.size(), table.getItemCount() - 1);
      }
    } finally {
      table.setRedraw(true);
    }
  }

  /** Returns the names of the columns marked. */
  SequencedSet<String> chosen() {
    List<String> names = new ArrayList<>();
    for (TableItem item : table.getItems()) {
      if (item.getChecked()) {
        names.add(item.getText(0));
      }
    }
    return new LinkedHashSet<>(names);
  }
}
